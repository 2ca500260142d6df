import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { type RunState, runNotebooks } from "../../kernel/run.ts";
import { fixtureLibrary } from "./fixture-library.ts";
import { notebookText, type TestCell } from "./notebook-file.ts";

let folder = "";
let printed = "";
let complained = "";

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "hingebook-"));
});
afterEach(() => rmSync(folder, { recursive: true }));

const save = (name: string, cells: readonly TestCell[]): string => {
  const path = join(folder, name);
  writeFileSync(path, notebookText(cells));
  return path;
};
const run = (
  files: readonly string[],
  overrides: Readonly<Record<string, string>> = {},
): Promise<readonly RunState[]> => {
  printed = "";
  complained = "";
  return runNotebooks({
    files,
    out: join(folder, "out"),
    overrides: new Map(Object.entries(overrides)),
    terminal: {
      out: (text) => {
        printed += text;
      },
      err: (text) => {
        complained += text;
      },
    },
    versions: { hingebook: "test" },
    library: fixtureLibrary,
    types: join(import.meta.dirname, "fixture-library.ts"),
  });
};
const written = (): string[] =>
  existsSync(join(folder, "out")) ? readdirSync(join(folder, "out")).sort() : [];
const content = (name: string): string => readFileSync(join(folder, "out", name), "utf8");

const OPEN =
  'import { openSheet, span } from "hingebook";\nconst sheet = openSheet({ title: "Canopy beam", job: "77", preparedBy: "QV", basis: "trial", units: "kN, m", status: "preliminary" });';
const GIVEN = 'const L = sheet.given("L", "6 m", "span"); const q = sheet.given("q", "4 kN/m", "load");';
const CALC = '// Largest moment\nsheet.calc("M = q*L^2/8", "kN m", "at midspan")';
const sound: TestCell[] = [{ markdown: "# Canopy" }, OPEN, { markdown: "## Givens" }, GIVEN, CALC];

describe("runNotebooks", () => {
  test("a sound notebook leaves NAME.html and a line for every cell", async () => {
    expect(await run([save("canopy.ipynb", sound)])).toEqual(["complete"]);
    expect(written()).toEqual(["canopy.html"]);
    expect(content("canopy.html")).toContain("Canopy beam");
    expect(printed).toMatch(
      /canopy\.ipynb\n {2}cell 2 {2}Canopy\n {2}cell 4 {2}Givens\n {2}cell 5 {2}Largest moment\n/,
    );
    expect(printed).toMatch(/Canopy beam: preliminary/);
    expect(complained).toBe("");
  });

  test("the same notebook gives the same bytes", async () => {
    const file = save("canopy.ipynb", sound);
    await run([file]);
    const first = content("canopy.html");
    await run([file]);
    expect(content("canopy.html")).toBe(first);
  });

  test("a given set from outside reaches the package", async () => {
    const file = save("canopy.ipynb", sound);
    await run([file]);
    const before = content("canopy.html");
    expect(await run([file], { q: "5 kN/m" })).toEqual(["complete"]);
    expect(content("canopy.html")).not.toBe(before);
    expect(content("canopy.html")).toContain("22.5"); // 5 · 6² / 8
  });

  test("a cell that throws leaves INCOMPLETE and never touches the good package", async () => {
    const file = save("canopy.ipynb", sound);
    await run([file]);
    const good = content("canopy.html");
    save("canopy.ipynb", [...sound, "const a = 1;\n  JSON.parse('{');", "sheet.note('never')"]);
    expect(await run([file])).toEqual(["incomplete"]);
    expect(written()).toEqual(["canopy.INCOMPLETE.html", "canopy.html"]);
    expect(content("canopy.html")).toBe(good);
    expect(content("canopy.INCOMPLETE.html")).toContain("INCOMPLETE");
    expect(complained).toMatch(/canopy\.ipynb, cell 6 \(code cell 4\), line 2, column 8: SyntaxError/);
    expect(complained).toContain("> 2 |   JSON.parse('{');\n    |        ^");
    expect(printed).not.toContain("cell 7");
    save("canopy.ipynb", sound);
    expect(await run([file])).toEqual(["complete"]);
    expect(written()).toEqual(["canopy.html"]);
  });

  test("a type error stops before its cell, after the cells before it have run", async () => {
    const file = save("canopy.ipynb", [...sound, 'console.log("never"); span({ length: "6 kN" })']);
    expect(await run([file])).toEqual(["incomplete"]);
    expect(complained).toContain('length: "6 kN" is not a length; write for example "6 m"');
    expect(printed).not.toContain("| never");
    expect(written()).toEqual(["canopy.INCOMPLETE.html"]);
    expect(content("canopy.INCOMPLETE.html")).toContain("at midspan");
  });

  test("a failure before the sheet is open leaves a package marked INCOMPLETE that says so", async () => {
    expect(await run([save("a.ipynb", ["throw new Error('early')", ...sound])])).toEqual(["incomplete"]);
    expect(complained).toMatch(/early[\s\S]*INCOMPLETE/);
    expect(written()).toEqual(["a.INCOMPLETE.html"]);
    expect(content("a.INCOMPLETE.html")).toContain("The run stopped in cell 1");
  });

  test("a notebook without a sheet is told so", async () => {
    expect(await run([save("a.ipynb", ["1 + 1"])])).toEqual(["failed"]);
    expect(complained).toMatch(/opens no sheet/);
  });

  test("an override no given takes up is refused, naming the givens", async () => {
    const file = save("canopy.ipynb", [
      ...sound,
      'sheet.assume("r_I", 2.5, "like canopies"); sheet.assume("dry site", { because: "seen" })',
    ]);
    await run([file]);
    const good = content("canopy.html");
    expect(await run([file], { q: "5 kN/m", w: "1 kN/m" })).toEqual(["failed"]);
    expect(complained).toMatch(
      /--set "w" was not used; the givens are L, q; assumptions with a value can be set too: r_I\. No package was written/,
    );
    expect(content("canopy.html")).toBe(good);
    expect(written()).toEqual(["canopy.html"]);
  });

  test("several notebooks: each afresh, with a summary", async () => {
    const files = [save("a.ipynb", sound), save("b.ipynb", ["q"]), save("c.ipynb", sound)];
    expect(await run(files)).toEqual(["complete", "incomplete", "complete"]);
    expect(complained).toMatch(/b\.ipynb, cell 1 .*\nCannot find name 'q'/);
    expect(printed).toMatch(/3 notebooks: 2 complete, 1 not\n {2}incomplete: b\.ipynb/);
  });

  test("two of one name, and a file that is not there, are refused before anything runs", async () => {
    const file = save("a.ipynb", sound);
    await expect(run([file, file])).rejects.toThrow(/would both be written to/);
    await expect(run([file, join(folder, "gone.ipynb")])).rejects.toThrow(/there is no such file/);
    expect(written()).toEqual([]);
  });

  test("an error thrown late, by a promise nobody awaits, makes the run incomplete", async () => {
    const late = "setTimeout(() => { throw new Error('late') }, 0); undefined";
    expect(
      await run([save("a.ipynb", [...sound, late, "await new Promise((done) => setTimeout(done, 20))"])]),
    ).toEqual(["incomplete"]);
    expect(complained).toContain("late");
  });

  test("what cells print is shown under the cell", async () => {
    await run([save("a.ipynb", [...sound, "console.log('one\\ntwo')"])]);
    expect(printed).toContain("      | one\n      | two\n");
  });
});
