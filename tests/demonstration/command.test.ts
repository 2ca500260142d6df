// The main job: the demonstration notebook through the built command, without Jupyter.
import { readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import type { Entry, TableCell } from "../../lib/sheet/record.ts";
import { demonstration, recordIn, run, variant } from "./command.ts";

const plain = run(demonstration);
const record = recordIn(plain.folder, "boat-shed-frame.html");

const idOf = (use: string): string => use.replace(/@\d+$/, "");

/** Everything that stands on an entry, however far up. */
function standingOn(entries: readonly Entry[], id: string): ReadonlySet<string> {
  const found = new Set([id]);
  for (let grown = -1; grown !== found.size; ) {
    grown = found.size;
    for (const entry of entries) if (entry.uses.some((use) => found.has(idOf(use)))) found.add(entry.id);
  }
  return found;
}

const siOf = (entry: Entry): number | undefined =>
  "value" in entry && entry.value !== undefined ? entry.value.si : undefined;

const cellsOf = (entry: Entry): readonly Exclude<TableCell, string>[] =>
  entry.kind === "table" ? entry.rows.flat().filter((cell) => typeof cell !== "string") : [];

describe("hingebook run boat-shed-frame.ipynb", () => {
  test("exits 0, prints a line per cell, the status, the governing results and where the package lies", () => {
    expect(plain.err).toBe("");
    expect(plain.code).toBe(0);
    expect(plain.files).toEqual(["boat-shed-frame.html"]);
    expect(plain.out.match(/^ {2}cell +\d+ /gm)?.length).toBe(13);
    expect(plain.out).toContain("Boat shed, main frame on line 3: preliminary");
    expect(plain.out).toMatch(/M_B = −88\.1 kN·m/);
    expect(plain.out).toMatch(
      /true value 90 % between −\d.* of this\), least −.*, greatest −.* kN·m, in the middle \d/,
    );
    expect(plain.out).toMatch(
      /bands: of the stiffnesses tried; loads, geometry, cracking and second order not varied/,
    );
    expect(plain.out).toMatch(/package: .*boat-shed-frame\.html/);
  });

  test("agrees with statics worked by hand", () => {
    // w = 10.9 kN/m, L = 12.6 m, hinge at x = 0.115 L: M_B = -w x (L - x)/2, M_m = wL²/8 + M_B, H = M_B/h, V = wL/2.
    const x = 0.115 * 12.6;
    const knee = (-10.9 * x * (12.6 - x)) / 2;
    const found = Object.fromEntries(
      record.entries.flatMap((e) => (e.kind === "result" ? [[e.symbol, e.value.si / 1e3]] : [])),
    );
    expect(found.M_B).toBeCloseTo(knee, 9);
    expect(found.M_m).toBeCloseTo((10.9 * 12.6 ** 2) / 8 + knee, 9);
    expect(found.H_A).toBeCloseTo(-knee / 4.8, 9);
    expect(found.N_A).toBeCloseTo((-10.9 * 12.6) / 2, 9);
  });

  test("every number from a calculation, a step or a table says what it stands on, and that is on the sheet", () => {
    const known = new Set(record.entries.map(({ id, version }) => `${id}@${version}`));
    const numbers = record.entries.filter(({ kind }) => ["calc", "check", "step", "result"].includes(kind));
    const cells = record.entries.flatMap(cellsOf);
    expect(numbers.length).toBeGreaterThan(30);
    expect(cells.length).toBeGreaterThan(20);
    expect(numbers.filter(({ uses }) => uses.length === 0).map(({ id }) => id)).toEqual([]);
    expect(cells.filter(({ uses }) => uses.length === 0)).toEqual([]);
    const unknown = [...numbers, ...cells].flatMap(({ uses }) => uses.filter((use) => !known.has(use)));
    expect(unknown).toEqual([]);
  });

  test("every hand result carries its band, in results and tables, and nothing else does", () => {
    const results = record.entries.flatMap((entry) => (entry.kind === "result" ? [entry] : []));
    expect(results.map(({ symbol, band }) => [symbol, band?.uses[0]])).toEqual(
      ["M_B", "M_m", "N_A", "H_A"].map((symbol) => [symbol, "unknowns of frame ABCD@1"]),
    );
    const cells = (id: string) => record.entries.filter((entry) => entry.id === id).flatMap(cellsOf);
    expect(cells("internal forces G + S").length).toBe(21);
    expect(cells("internal forces G + S").every(({ band }) => band !== undefined)).toBe(true);
    expect(cells("reactions G + S").map(({ band }) => band !== undefined)).toEqual([
      true,
      true,
      true,
      true,
      false,
      false,
    ]);
    expect(cells("load case G").some(({ band }) => band !== undefined)).toBe(false);
    const spread = record.entries.find(({ id }) => id === "spread G + S");
    expect(spread?.kind === "table" ? spread.rows.length : 0).toBe(6);
    expect(spread?.kind === "table" ? spread.caption : "").toContain("moved by less than 0.5 %: M_B by");
  });

  test("says what was not considered, for the cover", () => {
    expect(record.notConsidered).toEqual(["Wind, which the bracing in the end bays carries."]);
  });

  test("is the same to the byte on every run", () => {
    const again = run(demonstration);
    const bytes = (folder: string): Buffer => readFileSync(join(folder, "boat-shed-frame.html"));
    expect(bytes(again.folder).equals(bytes(plain.folder))).toBe(true);
  });
});

describe("hingebook run --set", () => {
  test.each([
    ["g", "6 kN/m"],
    ["s", "2 kN/m"],
    ["L", "11 m"],
    ["h", "5.5 m"],
    ["r_I", "4"],
  ])("%s = %s changes what stands on it and nothing else, and the package shows it", (symbol, measure) => {
    const { code, folder } = run(demonstration, ["--set", `${symbol}=${measure}`]);
    expect(code).toBe(0);
    const { entries } = recordIn(folder, "boat-shed-frame.html");
    expect(entries.map(({ id }) => id)).toEqual(record.entries.map(({ id }) => id));
    const above = standingOn(record.entries, symbol);
    const moved = entries.filter((entry, i) => {
      const before = record.entries[i];
      return (
        before !== undefined &&
        Math.abs((siOf(entry) ?? 0) - (siOf(before) ?? 0)) > 1e-9 * Math.abs(siOf(before) ?? 0)
      );
    });
    expect(moved.map(({ id }) => id).filter((id) => !above.has(id))).toEqual([]);
    expect(moved.length).toBeGreaterThan(1);
    expect(entries.find(({ id }) => id === symbol)).toHaveProperty("overridden");
    const html = readFileSync(join(folder, "boat-shed-frame.html"), "utf8");
    expect(html).toContain("Set from outside");
  });

  test("g changes every governing result", () => {
    const { folder } = run(demonstration, ["--set", "g=6 kN/m"]);
    const { entries } = recordIn(folder, "boat-shed-frame.html");
    const governing = entries.flatMap((entry, i) =>
      entry.kind === "result" && entry.governing ? [[entry, record.entries[i]] as const] : [],
    );
    expect(governing.length).toBe(4);
    for (const [now, before] of governing)
      expect(now.value.si / (before === undefined ? 0 : (siOf(before) ?? 0))).toBeCloseTo(12.3 / 10.9, 9);
  });

  test.each([
    ["w=12 kN/m", /w is calculated, not given: it stands on g, s; set one of those/],
    ["M_B=3 kN m", /M_B is calculated, not given: it stands on .*g.*; set one of those/],
    ["g=6 kN", /"6 kN" is a force; a force per length is wanted/],
    ["zz=3 m", /--set "zz" was not used; the givens are L, h, g, s.*can be set too: .*"hinge h1 \(G \+ S\)"/],
  ])("%s is refused and an earlier package stays", (set, words) => {
    const good = run(demonstration);
    const before = readFileSync(join(good.folder, "boat-shed-frame.html"));
    const refused = run(demonstration, ["--set", set], good.folder);
    expect(refused.code).toBe(1);
    expect(refused.err).toMatch(words);
    expect(readFileSync(join(good.folder, "boat-shed-frame.html")).equals(before)).toBe(true);
  });
});

describe("hingebook run on a notebook with a mistake", () => {
  test.each([
    [
      "a force for a span",
      (source: string) => source.replace("span: L,", 'span: "14 kN",'),
      /cell 6 .*line \d+.*\n.*span: "14 kN" is not a length; write for example "14 m"/,
    ],
    [
      "an unknown symbol in a formula",
      (source: string) => source.replace('"M_0 = w*L^2/8"', '"M_0 = w*Lx^2/8"'),
      /no symbol "Lx" on this sheet; did you mean "L"/,
    ],
    [
      "metres added to kilonewtons",
      (source: string) => source.replace('"w = g + s"', '"w = L + g"'),
      /cannot add L = 12\.6 m \(length\) and g = 4\.6 kN\/m \(force per length\)/,
    ],
    [
      "one-sided snow on the symmetric hinges",
      (source: string) =>
        source.replace('uniform("BC", s)', 'uniform("BC", s, { from: "0 L", to: "0.5 L" })'),
      /S with hinges h1 and h2: nothing resists sway.*Give S a hinge set of its own.*G can keep these hinges/,
    ],
  ])(
    "%s: stops, names cell and line, shows the code, leaves INCOMPLETE beside the good package",
    (_, change, words) => {
      const good = run(demonstration);
      const before = readFileSync(join(good.folder, "boat-shed-frame.html"));
      const bad = run(variant(change), [], good.folder);
      expect(bad.code).toBe(1);
      expect(bad.err).toMatch(words);
      expect(bad.err).toMatch(/^> +\d+ \| /m);
      expect(bad.files).toEqual(["boat-shed-frame.INCOMPLETE.html", "boat-shed-frame.html"]);
      expect(readFileSync(join(good.folder, "boat-shed-frame.html")).equals(before)).toBe(true);
      const left = recordIn(bad.folder, "boat-shed-frame.INCOMPLETE.html");
      expect(left.complete).toBe(false);
      expect(left.failure?.message).toMatch(/\S/);
      const again = run(demonstration, [], good.folder);
      expect(again.files).toEqual(["boat-shed-frame.html"]);
    },
  );
});
