import { createHash } from "node:crypto";
import { describe, expect, it } from "vitest";
import { lineAnchor } from "../../lib/report/book.ts";
import { renderPackage } from "../../lib/report/index.ts";
import { type CalculationRecord, type Entry, readUse } from "../../lib/sheet/index.ts";
import { expectGolden } from "../drawing/golden.ts";
import { incomplete, outdated, record } from "./fixtures.ts";

const withoutJson = (html: string): string =>
  html.replace(/<script type="application\/json"[\s\S]*?<\/script>/, "");

const change = (id: string, with_: Partial<Entry>): CalculationRecord => ({
  ...record,
  entries: record.entries.map((e) => (e.id === id ? ({ ...e, ...with_ } as Entry) : e)),
});

const lineOf = (html: string, id: string): string => {
  const start = html.indexOf(`id="${lineAnchor(id)}"`);
  expect(start, `line of ${id}`).toBeGreaterThan(0);
  return html.slice(start, html.indexOf('<div class="line', start));
};

const hostile = `"><script>alert(1)</script><img src=x onerror=alert(2)>'</style></title>`;
const KEEP = new Set(
  "format,kind,version,cell,id,uses,complete,outOfDate,governing,passed,spec,dimension,tex,lines,versions".split(
    ",",
  ),
);
function poisoned<T>(value: T): T {
  if (typeof value === "string") return `${hostile}${value}` as T;
  if (Array.isArray(value)) return value.map(poisoned) as T;
  if (typeof value !== "object" || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([k, v]) => [k, KEEP.has(k) ? v : poisoned(v)])) as T;
}

describe("renderPackage", () => {
  it("renderPackage is the same on every run", async () => {
    expect(await renderPackage(record)).toBe(await renderPackage(record));
  });

  it("renderPackage(record without figures) is the kept page", async () => {
    const entries = record.entries.filter((e) => e.kind !== "figure");
    expectGolden(import.meta.url, "package.golden.html", await renderPackage({ ...record, entries }));
  });

  it("renderPackage reaches for nothing outside itself", async () => {
    const html = withoutJson(await renderPackage(record));
    expect(/\s(?:src|srcset|action|poster|data|background)=/.test(html)).toBe(false);
    for (const [, target] of html.matchAll(/\shref="([^"]*)"/g)) expect(target).toMatch(/^#/);
    expect(/@import|url\((?!#)/.test(html)).toBe(false);
    expect(/\sstyle="/.test(html)).toBe(false);
  });

  it("renderPackage: the security policy allows exactly this style and this script", async () => {
    const html = await renderPackage(record);
    const policy = /Content-Security-Policy" content="([^"]*)"/.exec(html)?.[1] ?? "";
    const digest = (text: string) => `&#39;sha256-${createHash("sha256").update(text).digest("base64")}&#39;`;
    expect(policy).toContain("default-src &#39;none&#39;");
    expect(policy).toContain(`style-src ${digest(/<style>([\s\S]*?)<\/style>/.exec(html)?.[1] ?? "")}`);
    expect(policy).toContain(`script-src ${digest(/<script>([\s\S]*?)<\/script>/.exec(html)?.[1] ?? "")}`);
    expect(/unsafe|https?:|\*/.test(policy)).toBe(false);
  });

  it.each([
    ["complete", record],
    ["incomplete", incomplete],
    ["out of date", outdated],
  ])("renderPackage(%s record): every link arrives, no id is there twice", async (_, rec) => {
    const html = withoutJson(await renderPackage(rec));
    const ids = [...html.matchAll(/\sid="([^"]*)"/g)].map((m) => m[1] ?? "");
    expect(new Set(ids).size).toBe(ids.length);
    const targets = [...html.matchAll(/href="#([^"]*)"/g)].map((m) => m[1] ?? "");
    expect(targets.length).toBeGreaterThan(80);
    expect(targets.filter((t) => !ids.includes(t))).toEqual([]);
  });

  const worked = record.entries.filter((e) =>
    ["calc", "step", "result", "check", "finding"].includes(e.kind),
  );
  it.each(worked.map((e) => [e.kind, e.id, e] as const))(
    "renderPackage: %s %s shows in its line and in the list everything it stands on",
    async (_kind, id, entry) => {
      const html = await renderPackage(record);
      const line = lineOf(html, id);
      const row = html.slice(html.indexOf(`<li id="why-${lineAnchor(id).slice(2)}"`)).split("</li>")[0] ?? "";
      expect(entry.uses.length).toBeGreaterThan(0);
      for (const use of entry.uses) {
        // A run of lines is written by its ends and names the others for the page's script.
        const link = new RegExp(
          `(?:href="#|data-lines="[^"]*)${lineAnchor(readUse(use).id).replaceAll(".", "\\.")}[ "]`,
        );
        expect(line).toMatch(link);
        expect(row.split("what stands on it")[0]).toMatch(link);
      }
      expect(line).toContain(`href="#why-${lineAnchor(id).slice(2)}"`);
    },
  );

  it("renderPackage: a given says what stands on it, and a result which givens it rests on in the end", async () => {
    const html = await renderPackage(record);
    const row = (id: string) => html.slice(html.indexOf(`<li id="why-${id}"`)).split("</li>")[0] ?? "";
    expect(row("f_y")).toContain(`href="#${lineAnchor("M_Rd")}"`);
    const roots = row("M_B").split("rests in the end on")[1]?.split("</p>")[0] ?? "";
    for (const id of ["L", "h", "g", "s", "hinge h1"]) expect(roots).toContain(`href="#${lineAnchor(id)}"`);
    expect(roots).not.toContain(`href="#${lineAnchor("f_y")}"`);
  });

  it("renderPackage: cells of a table lead to what each stands on", async () => {
    const html = await renderPackage(record);
    expect(html).toContain('href="#why-reactions.0">24.9 kN</a>');
    expect(html).toContain('href="#why-reactions.1">89.6 kN</a>');
    const group = html.slice(html.indexOf('<li id="why-reactions.1"')).split("</li>")[0] ?? "";
    expect(group).toContain(`href="#${lineAnchor("A_y")}"`);
    expect(group).not.toContain(`href="#${lineAnchor("A_x")}"`);
  });

  it("renderPackage: cover names the status, the failing check, the query, and what was set from outside", async () => {
    const html = await renderPackage(record);
    const cover = html.slice(0, html.indexOf('<nav class="contents"'));
    expect(cover).toContain("PRELIMINARY, NOT FOR CONSTRUCTION");
    expect(cover).toContain("(2 DO NOT HOLD)");
    expect(cover).toContain("DOES NOT HOLD, utilisation 1.18");
    expect(cover).toContain("has base fixity been considered?");
    expect(cover).toMatch(/set from outside: <math>.*<\/math> = 6\.00 kN\/m, notebook says 5\.20 kN\/m/);
    expect(cover).toMatch(/set from outside: <math>.*<\/math> = 2\.50, notebook says 2\.00/);
    expect(cover).toContain("licensed");
    expect(cover).not.toContain("INCOMPLETE");
    expect(cover).not.toContain("OUT OF DATE");
  });

  it("renderPackage: closures take one line of the cover, and only one that fails is named by itself", async () => {
    const html = await renderPackage(record);
    const cover = html.slice(0, html.indexOf('<nav class="contents"'));
    expect(cover).toContain("equilibrium: 1 of 2 equations left over close (lines ");
    expect(cover).toContain("roof: joint B: the equation left over closes by itself");
    expect(cover).not.toContain("roof: column AB");
    const shut = change("closure 2", { passed: true } as Partial<Entry>);
    const good = (await renderPackage(shut)).split('<nav class="contents"')[0] ?? "";
    expect(good).toContain("equilibrium: 2 of 2 equations left over close (lines ");
    expect(good).not.toContain("roof: joint B");
  });

  it("renderPackage: closures of the calculation stand in a group, a line each, a failed one marked", async () => {
    const html = await renderPackage(record);
    const group = html.split('<section class="closures">')[1]?.split("</section>")[0] ?? "";
    expect(group).toContain("Equilibrium, roof, the equation left over closes by itself: ");
    expect(group).toContain('<strong class="fails">1 of 2 close</strong>');
    expect(group.match(/class="line check closure"/g)).toHaveLength(2);
    expect(group.match(/DOES NOT HOLD/g)).toHaveLength(1);
  });

  it("renderPackage: a valued assumption says its value once, and a heading left empty is not printed", async () => {
    const html = withoutJson(await renderPackage(record));
    expect(lineOf(html, "r_I").match(/2\.50/g)).toHaveLength(2);
    expect(lineOf(html, "r_I")).not.toContain("r_I = 2.50");
    expect(html).not.toContain("<h4>Given</h4>");
  });

  it("renderPackage: what the verdict of a finding says is not said again in its working", async () => {
    const said = change("determinacy", {
      verdict: "3m + r - 3j - c = 9 + 4 - 12 - 0 = 1, to the 1st degree",
    } as Partial<Entry>);
    const line = lineOf(withoutJson(await renderPackage(said)), "determinacy");
    expect(line.match(/9 \+ 4/g)).toHaveLength(1);
    expect(line).toContain("9 + 4 − 12 − 0 = 1");
  });

  it("renderPackage: a body's figure and equations stand together under its name, said once", async () => {
    const html = withoutJson(await renderPackage(record));
    const body =
      html.slice(html.indexOf('<h3 class="body-name">column AB with beam to h1')).split("</section>")[0] ??
      "";
    for (const id of ["knee body", "A_y", "A_x"]) expect(body).toContain(`id="${lineAnchor(id)}"`);
    expect(body.split("<svg")[0]?.match(/column AB with beam to h1/g)).toHaveLength(1);
  });

  it("renderPackage(status for construction) prints that instead", async () => {
    const html = await renderPackage({ ...record, head: { ...record.head, status: "for construction" } });
    expect(html).toContain('<p class="status">FOR CONSTRUCTION</p>');
    expect(html).not.toContain("NOT FOR CONSTRUCTION");
  });

  it("renderPackage(utilisation a hair over 1) is not printed as 1.00", async () => {
    const html = await renderPackage(change("check 2", { utilisation: 1.0004 } as Partial<Entry>));
    expect(html).toContain("DOES NOT HOLD, utilisation 1.0004");
  });

  it("renderPackage(incomplete) says so in title, banner, running foot and with the failure in full", async () => {
    const html = await renderPackage(incomplete);
    expect(html).toContain("<title>INCOMPLETE: 2031");
    expect(html).toContain('class="banner"');
    expect(html).toMatch(/@bottom-left \{ content: "INCOMPLETE, NOT A RESULT"/);
    expect(html).toContain("cell 6, line 3");
    expect(html).toContain("joints are A, B, C, D");
    expect(html).toContain("sheet.freeBodies(gravity, &quot;E&quot;);");
  });

  it("renderPackage(out of date) marks exactly the entries that are, and names what changed", async () => {
    const html = await renderPackage(outdated);
    const stale = outdated.entries.filter((e) => e.outOfDate);
    expect(stale.length).toBeGreaterThan(4);
    for (const entry of outdated.entries) {
      if (entry.id === "text 2") continue;
      expect(lineOf(html, entry.id).includes("OUT OF DATE"), entry.id).toBe(entry.outOfDate);
    }
    expect(lineOf(html, "M_m")).toContain("(changed since)");
    expect(html).toContain(`OUT OF DATE: ${stale.length} of ${outdated.entries.length} entries`);
  });

  it("renderPackage(reference to an entry that is gone) says so", async () => {
    const html = await renderPackage(change("note 1", { uses: ["gone@1"] }));
    expect(lineOf(html, "note 1")).toContain("gone (no longer on the sheet)");
  });

  it("renderPackage keeps the record in the file, whole", async () => {
    const html = await renderPackage(poisoned(record));
    const json = /<script type="application\/json" id="record">([\s\S]*?)<\/script>/.exec(html)?.[1] ?? "";
    expect(JSON.parse(json)).toEqual(poisoned(record));
  });

  it("renderPackage(hostile text in every field) holds no markup but its own", async () => {
    const bad = {
      ...poisoned(record),
      complete: false,
      failure: poisoned(incomplete.failure),
    } as CalculationRecord;
    const html = withoutJson(await renderPackage(bad));
    expect(html.match(/<script/g)).toHaveLength(1);
    expect(html.match(/<\/style>/g)).toHaveLength(1);
    expect(html.match(/<\/title>/g)?.length).toBe(
      1 + record.entries.filter((e) => e.kind === "figure").length,
    );
    expect(/<img|<[a-z][^<>]*\sonerror=/.test(html.replace(/="[^"]*"/g, ""))).toBe(false);
    expect(html.match(/&lt;script&gt;/g)?.length ?? 0).toBeGreaterThan(60);
  });

  const texts: readonly (readonly [string, string, RegExp])[] = [
    ["HTML", "<b>bold</b>", /&lt;b&gt;bold&lt;\/b&gt;/],
    ["a script link", "[press](javascript:alert(1))", /\[press\]\(javascript:alert\(1\)\)/],
    [
      "a picture from elsewhere",
      "![sketch](https://example.invalid/a.png)",
      /picture not in this file: sketch/,
    ],
    ["a heading", "# Loads", /<h3>Loads<\/h3>/],
    ["maths", "span $L_1$", /span <math><msub>/],
    ["money, not maths", "from $5 to $6", /from \$5 to \$6/],
  ];
  it.each(texts)("renderPackage(text cell with %s)", async (_, markdown, expected) => {
    const html = withoutJson(await renderPackage(change("text 1", { markdown } as Partial<Entry>)));
    expect(expected.test(html)).toBe(true);
    expect(/<img|href="(?:javascript|https?):/.test(html)).toBe(false);
  });

  it.each([
    [
      "an id twice",
      { ...record, entries: [...record.entries, ...record.entries.filter((e) => e.id === "L")] },
      /entry "L" is there twice/,
    ],
    [
      "a use without version",
      change("w", { uses: ["g"] }),
      /"g" is not an entry and its version, such as "L@1"/,
    ],
    [
      "an unknown figure",
      change("frame", { spec: { kind: "painting" } } as Partial<Entry>),
      /figure "frame" \(Frame, loads and hinges\.\): figure kind "painting" is unknown; kinds are structure/,
    ],
  ] as const)("renderPackage(%s) is refused, naming it", async (_, rec, message) => {
    await expect(renderPackage(rec)).rejects.toThrow(message);
  });
});
