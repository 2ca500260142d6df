// An issued package, sent away and looked at by somebody else; and what may have happened to it on the way.
import { copyFileSync, existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { beforeAll, describe, expect, test } from "vitest";
import type { Runner } from "../../kernel/record/index.ts";
import type { CalculationRecord, Entry } from "../../lib/sheet/index.ts";
import { forged, hingebook, jobFolder, newFolder, recordOf, runnerFor, verified } from "./command.ts";

const job = jobFolder();
const issued = join(job, "issued");
const name = "frame-P1.html";
let record: CalculationRecord;
let runner: Runner;
let bytes: Buffer;

beforeAll(async () => {
  const done = hingebook(
    job,
    "issue",
    "frame.ipynb",
    "--rev",
    "P1",
    "--why",
    "first issue",
    "--date",
    "2031-04-30",
  );
  expect(done.err).toBe("");
  expect(done.code).toBe(0);
  bytes = readFileSync(join(issued, name));
  record = recordOf(join(issued, name));
  runner = await runnerFor(record);
});

/** A copy of the issued file beside a copy of its register, its matter changed. */
function altered(change: (bytes: Buffer) => Buffer | string): string {
  const folder = newFolder();
  copyFileSync(join(issued, "register.json"), join(folder, "register.json"));
  writeFileSync(join(folder, name), change(Buffer.from(bytes)));
  return join(folder, name);
}

// A generator with a seed, so that a failure can be looked at again (Park and Miller, 1988).
function random(seed: number): (below: number) => number {
  let state = seed;
  return (below) => {
    state = (state * 48271) % 2147483647;
    return state % below;
  };
}

describe("verify(issued package)", () => {
  test("alone in an empty folder, by the command: every value reproduced, every equation re-added", () => {
    const folder = newFolder();
    copyFileSync(join(issued, name), join(folder, name));
    const { code, out, err } = hingebook(folder, "verify", name, "--run");
    expect(err).toBe("");
    expect(out).toMatch(/--run: the notebook in this file is run now/);
    const [, some, all] = /values +(\d+) of (\d+) values reproduced/.exec(out) ?? [];
    expect(some).toBe(all);
    expect(Number(all)).toBeGreaterThan(70);
    const [, added, equations] = /equations +(\d+) of (\d+) re-added/.exec(out) ?? [];
    expect(added).toBe(equations);
    expect(Number(equations)).toBe(record.entries.filter((e) => "terms" in e).length);
    expect(out).toMatch(/page +shows what the record says/);
    expect(out).toMatch(/no register beside it/);
    expect(out).toMatch(/^verified$/m);
    expect(code).toBe(0);
    expect(readdirSync(folder)).toEqual([name]);
  });

  test("beside its register: the current issue", async () => {
    const { code, out } = await verified(join(issued, name), runner);
    expect(out).toMatch(/register +issue 1 of 1, frame\.ipynb P1 of 2031-04-30, the current one/);
    expect(code).toBe(0);
  });

  test("100 random single-byte changes to the record and the shown values are all found", async () => {
    const seed = 20310430;
    const next = random(seed);
    const text = bytes.toString("latin1");
    const json = text.indexOf('id="record">') + 'id="record">'.length;
    const places = {
      record: { from: json, to: text.indexOf("</script>", json) },
      shown: { from: text.indexOf("<main>"), to: text.indexOf("</main>") },
    };
    const missed: string[] = [];
    for (let i = 0; i < 100; i++) {
      const { from, to } = i % 2 === 0 ? places.record : places.shown;
      const at = from + next(to - from);
      const by = 1 + next(255);
      const path = altered((matter) => {
        matter[at] = (matter[at] ?? 0) ^ by;
        return matter;
      });
      const { code, out, err } = await verified(path, runner);
      if (code === 0 || !/seal.*broken/i.test(out + err))
        missed.push(`seed ${seed}, byte ${at} xor ${by}: ${out}${err}`);
    }
    expect(missed).toEqual([]);
  });

  test("a shown value changed: the page is named with the line, what it shows and what is due", async () => {
    const path = altered((matter) =>
      matter.toString().replace(/(<a class="num"[^>]*>)128.kN·m/, "$1129 kN·m"),
    );
    const { code, out } = await verified(path, runner);
    expect(code).toBe(1);
    expect(out).toMatch(/seal +WRONG: broken/);
    expect(out).toMatch(/page +WRONG: does not show what the record says in 1 place$/m);
    expect(out).toMatch(/shows ".*129.*", due is ".*128.*"/);
    expect(out).toMatch(/NOT VERIFIED: seal, page, register/);
  });

  test("values altered in the record, the page made from it and sealed afresh: the register and the sums tell", async () => {
    const entries = record.entries.map(
      (entry): Entry =>
        entry.id === "M_B" && entry.kind === "result"
          ? { ...entry, value: { ...entry.value, si: -78e3, text: "−78.0 kN·m" } }
          : entry,
    );
    const path = altered(() => "");
    writeFileSync(path, await forged({ ...record, entries }, runner));
    const { code, out } = await verified(path, runner, { run: true });
    expect(code).toBe(1);
    expect(out).toMatch(/seal +unbroken/);
    expect(out).toMatch(/page +shows what the record says/);
    expect(out).toMatch(/register +WRONG: not the file that was issued as frame\.ipynb P1 on 2031-04-30/);
    expect(out).toMatch(/its record was altered/);
    expect(out).toMatch(/formulas +WRONG: .*\n.*used M_B = -88060\.\d+, the record says -78000/);
    const [, some, all] =
      /values +WRONG: (\d+) of (\d+) values reproduced\n.*M_B: the file says −78\.0 kN·m/.exec(out) ?? [];
    expect(Number(all) - Number(some)).toBe(1);
    expect(out).not.toMatch(/its words, references or figure/);
  });

  test("one digit of an equation altered, page and seal made afresh: the equation no longer adds up", async () => {
    const entries = record.entries.map(
      (entry): Entry =>
        entry.kind === "step" && entry.terms.length > 1
          ? {
              ...entry,
              terms: entry.terms.map((term, i) => (i === 0 ? { ...term, value: term.value + 100 } : term)),
            }
          : entry,
    );
    const path = join(newFolder(), name);
    writeFileSync(path, await forged({ ...record, entries }, runner));
    const { code, out } = await verified(path, runner);
    expect(code).toBe(1);
    expect(out).toMatch(/equations +WRONG: \d+ do not hold, of \d+\n.*the equation adds up to/);
  });

  test("a mark of issue the register does not know is refused", async () => {
    const other = { ...record, issue: { revision: "P9", why: "none", number: 9, follows: "0".repeat(64) } };
    const folder = newFolder();
    copyFileSync(join(issued, "register.json"), join(folder, "register.json"));
    const path = join(folder, "other.html");
    writeFileSync(path, await forged(other, runner));
    const { code, out } = await verified(path, runner);
    expect(code).toBe(1);
    expect(out).toMatch(
      /register +WRONG: revision P9 says that it is an issue, but the register does not know it/,
    );
  });

  test.each([
    ["a row's words", (text: string) => text.replace("first issue", "best issue")],
    ["a file's digest", (text: string) => text.replace(/"fileDigest": "./, '"fileDigest": "f')],
    ["the state", (text: string) => text.replace('"current"', '"superseded"')],
  ])("a register altered in %s is found", async (_, change) => {
    const path = altered((matter) => matter);
    const register = join(path, "..", "register.json");
    const before = readFileSync(register, "utf8");
    writeFileSync(register, change(before));
    expect(readFileSync(register, "utf8")).not.toBe(before);
    const { code, out } = await verified(path, runner);
    expect(code).toBe(1);
    expect(out).toMatch(/register +WRONG/);
  });

  test("cut short, without its seal, or another file altogether", async () => {
    const cases: readonly (readonly [Buffer | string, RegExp, number])[] = [
      [bytes.subarray(0, 5000), /there is no record in it/, 3],
      [bytes.subarray(0, -10), /seal +WRONG: not there/, 1],
      ["<p>a page</p>", /no package, there is no record in it/, 3],
      ["", /no package/, 3],
    ];
    for (const [matter, words, due] of cases) {
      const path = join(newFolder(), name);
      writeFileSync(path, matter);
      const { code, out, err } = await verified(path, runner);
      expect(out + err).toMatch(words);
      expect(code).toBe(due);
    }
    expect(hingebook(job, "verify", "nothing.html").code).toBe(3);
    expect(existsSync(join(job, "nothing.html"))).toBe(false);
  });

  test("files the cells import travel with the package", async () => {
    const folder = jobFolder((source) =>
      source
        .replace('sheet.given("g", "4.6 kN/m"', 'sheet.given("g", roof')
        .replace("const sheet", 'import { roof } from "./loads/roof.ts";\nconst sheet'),
    );
    mkdirSync(join(folder, "loads"));
    writeFileSync(join(folder, "loads/roof.ts"), 'export const roof = "4.6 kN/m" as const;\n');
    expect(hingebook(folder, "run", "frame.ipynb")).toMatchObject({ code: 0, err: "" });
    const alone = newFolder();
    copyFileSync(join(folder, "out/frame.html"), join(alone, "frame.html"));
    expect(recordOf(join(alone, "frame.html")).files).toEqual([
      { path: "loads/roof.ts", text: 'export const roof = "4.6 kN/m" as const;\n' },
    ]);
    const { code, out } = hingebook(alone, "verify", "frame.html", "--run");
    expect(out).toMatch(/values +(\d+) of \1 values reproduced/);
    expect(code).toBe(0);
  });
});
