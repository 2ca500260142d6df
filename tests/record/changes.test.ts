// Two packages of the demonstration compared by the command: exactly what was edited, and what stands on it.
import { readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { type CalculationRecord, type Changes, standingOn } from "../../lib/sheet/index.ts";
import { hingebook, jobFolder, recordOf, rewrite } from "./command.ts";

interface Compared {
  readonly changes: Changes;
  readonly text: string;
  readonly after: CalculationRecord;
}

const job = jobFolder();
const original = readFileSync(join(job, "frame.ipynb"), "utf8");
hingebook(job, "run", "frame.ipynb", "--out", "before");

/** Runs the notebook with an edit and compares. */
function compared(edit: (source: string) => string): Compared {
  rewrite(job, edit);
  expect(readFileSync(join(job, "frame.ipynb"), "utf8")).not.toBe(original);
  expect(hingebook(job, "run", "frame.ipynb", "--out", "after")).toMatchObject({ code: 0, err: "" });
  rewrite(job, () => "");
  const words = ["changes", "before/frame.html", "after/frame.html"] as const;
  const { code, out: json } = hingebook(job, ...words, "--json");
  expect(code).toBe(0);
  const text = hingebook(job, ...words).out;
  const after = recordOf(join(job, "after/frame.html"));
  return { changes: JSON.parse(json).changes, text, after };
}

const ids = (list: readonly { readonly id: string }[]): readonly string[] => [
  ...new Set(list.map(({ id }) => id)),
];

describe("hingebook changes", () => {
  test("one load changed: that given and the lines that stand on it, no other", () => {
    const { changes, text, after } = compared(
      restored((source) => source.replace('"6.3 kN/m"', '"6.9 kN/m"')),
    );
    const standing = standingOn(after.entries, "s");
    expect(changes.grounds).toEqual([
      {
        id: "s",
        name: "s",
        kind: "given",
        value: { before: "6.30 kN/m", after: "6.90 kN/m", percent: expect.closeTo(9.5238, 3) },
        standing,
      },
    ]);
    expect(ids(changes.results).filter((id) => !standing.includes(id))).toEqual([]);
    expect(ids(changes.checks).filter((id) => !standing.includes(id))).toEqual([]);
    // Every force is in proportion to g + s: 10.9 to 11.5 kN/m.
    const forces = changes.results.filter(({ id }) => !["s", "load case S"].includes(id));
    expect(forces.length).toBeGreaterThan(40);
    for (const { value } of forces) expect(value.percent).toBeCloseTo((0.6 / 10.9) * 100, 9);
    const { head, raised, settled, words, added, removed } = changes;
    expect([head, raised, settled, words, added, removed].flat()).toEqual([]);
    expect(text).toMatch(/s +6\.30 kN\/m +-> +6\.90 kN\/m +\+9\.5 % +\d+ lines stand on it/);
    // what a reader needs first stands first, tables and equations a line each, whatever their numbers
    expect(text.split("\n").length).toBeLessThan(40);
    expect(text.indexOf("results changed")).toBeLessThan(text.indexOf("numbers of tables"));
    expect(text).toMatch(/Internal forces under G \+ S: \d+ of \d+ values, each \+5\.5 %/);
    for (const [was, is] of text
      .split("\n")
      .slice(1)
      .map((line) => line.split(/ +-> +/)))
      if (is !== undefined) expect(was?.endsWith(` ${is}`)).toBe(false);
    expect(text).toMatch(/governs +M_B +−88\.1 kN·m +-> +−92\.9 kN·m +\+5\.5 %/);
  });

  test("known edits in words, source, reason and formula: exactly those", () => {
    const { changes } = compared(
      restored((source) =>
        source
          .replace(
            '"span between column centrelines", { from: "drawing BS-11 rev A" }',
            '"span between column centrelines", { from: "drawing BS-11 rev C" }',
          )
          .replace("first guess of sizes: I", "sizes of drawing BS-14: I")
          .replace('"M_0 = w*L^2/8"', '"M_0 = w*L*L/8"')
          .replace('title: "Boat shed, main frame on line 3"', 'title: "Boat shed, main frame on line 4"')
          .replace(
            'sheet.note("A frame',
            'sheet.query("Is the slip crane to be hung from this frame?");\nsheet.note("Any frame',
          ),
      ),
    );
    expect(changes.head.map(({ field }) => field)).toEqual(["title"]);
    expect(changes.grounds.map(({ id, source, value }) => [id, source?.after, value])).toEqual([
      ["L", "drawing BS-11 rev C", undefined],
      ["r_I", "sizes of drawing BS-14: I of the beam over I of a column", undefined],
    ]);
    expect(changes.grounds[0]?.standing.length).toBeGreaterThan(30);
    expect(changes.words.map(({ id, before, after }) => [id, before, after])).toEqual([
      ["M_0", expect.stringContaining("w*L^2/8"), expect.stringContaining("w*L*L/8")],
    ]);
    expect(changes.raised.map(({ name }) => name)).toEqual(["Is the slip crane to be hung from this frame?"]);
    expect(changes.added.map(({ kind }) => kind)).toEqual(["note"]);
    expect(changes.removed.map(({ kind }) => kind)).toEqual(["note"]);
    expect(changes.results).toEqual([]);
    expect(changes.checks).toEqual([]);
  });

  test("a hinge moved out of its range: the assumption, what it moves, and the query it raises", () => {
    const { changes } = compared(
      restored((source) => source.replaceAll('"0.115 L"', '"0.28 L"').replaceAll("0.10*", "5*")),
    );
    expect(changes.grounds.map(({ id }) => id)).toEqual(["hinge h1 (G + S)", "hinge h2 (G + S)"]);
    expect(changes.raised.map(({ name }) => name)).toEqual([
      expect.stringMatching(/Hinge h1 .* lies outside the isolated-span range/),
      expect.stringMatching(/Hinge h2 .* lies outside the isolated-span range/),
    ]);
    expect(ids(changes.results)).toContain("M_B");
    expect(ids(changes.results)).not.toContain("M_0");
  });

  test("the same twice: nothing changed", () => {
    const { code, out } = hingebook(job, "changes", "before/frame.html", "before/frame.html");
    expect(out).toMatch(/nothing changed/);
    expect(code).toBe(0);
  });
});

/** An edit applied to the original notebook, whatever the edit before left. */
function restored(edit: (source: string) => string): (source: string) => string {
  let cell = 0;
  const cells = JSON.parse(original).cells.filter((one: { cell_type: string }) => one.cell_type === "code");
  return () => edit([cells[cell++].source].flat().join(""));
}
