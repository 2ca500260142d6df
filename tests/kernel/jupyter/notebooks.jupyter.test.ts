// Every notebook and template by nbclient and nbconvert, held against the headless run of the same cells.
import { spawnSync } from "node:child_process";
import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { loadLibrary } from "../../../kernel/library.ts";
import { librarySession } from "../../../kernel/library-session.ts";
import { readNotebook } from "../../../kernel/notebook.ts";
import { notebookText, type TestCell } from "../notebook-file.ts";
import { hasJupyter, installed, type Jupyter, python, top } from "./jupyter.ts";

interface Output {
  readonly output_type: string;
  readonly name?: string;
  readonly text?: string;
  readonly data?: Readonly<Record<string, unknown>>;
}

interface Answer {
  readonly error?: { readonly ename: string; readonly evalue: string; readonly text: string };
  readonly cells: readonly (readonly Output[])[];
  readonly counts: readonly (number | null)[];
}

const notebooks: readonly string[] = ["notebooks", "templates"]
  .map((folder) => join(top, folder))
  .filter((folder) => existsSync(folder))
  .flatMap((folder) => readdirSync(folder).map((name) => join(folder, name)))
  .filter((path) => path.endsWith(".ipynb"))
  .sort();

/** What each cell shows, as the session gives it to the headless runner, in the terms of a notebook file. */
async function headless(path: string): Promise<Output[][]> {
  const { cells, folder } = readNotebook(path);
  let outputs: Output[] = [];
  const { session, library } = librarySession({
    folder,
    overrides: new Map(),
    library: loadLibrary,
    types: join(top, "lib/index.ts"),
    onOutput: (event) => {
      const last = outputs.at(-1);
      if (event.kind === "display") outputs.push({ output_type: "display_data", data: event.data });
      if (event.kind !== "stream") return;
      const joins = last?.output_type === "stream" && last.name === event.name;
      const text = (joins ? (last.text ?? "") : "") + event.text;
      if (joins) outputs.pop();
      outputs.push({ output_type: "stream", name: event.name, text });
    },
  });
  const { forgetLedger, attachHost } = await library;
  forgetLedger();
  const all: Output[][] = [];
  for (const { kind, number, id, source } of cells) {
    if (kind !== "code") continue;
    outputs = [];
    const result = await session.execute(source, { cell: { number, id } });
    if (result.status === "error") throw new Error(`cell ${number}: ${result.error.message}`);
    if (result.display) outputs.push({ output_type: "execute_result", data: result.display });
    all.push(outputs);
  }
  await session.close();
  attachHost();
  forgetLedger();
  return all;
}

const bare = (cells: readonly (readonly Output[])[]): Output[][] =>
  cells.map((outputs) =>
    outputs.map(({ output_type, name, text, data }) => ({
      output_type,
      ...(name === undefined ? {} : { name }),
      ...(text === undefined ? {} : { text }),
      ...(data === undefined ? {} : { data }),
    })),
  );

describe.skipIf(!hasJupyter)("notebooks through Jupyter's own programs", () => {
  let jupyter: Jupyter;
  let folder = "";
  beforeAll(() => {
    jupyter = installed();
    folder = mkdtempSync(join(tmpdir(), "hingebook-notebooks-"));
  });
  afterAll(() => {
    jupyter?.remove();
    rmSync(folder, { recursive: true, force: true });
  });

  const call = (...words: string[]): { code: number | null; out: string; err: string } => {
    const done = spawnSync(python, words, { encoding: "utf8", env: jupyter.env, cwd: folder });
    return { code: done.status, out: done.stdout, err: done.stderr };
  };
  const nbclient = (path: string): Answer => {
    const { code, out, err } = call(join(import.meta.dirname, "notebooks.py"), path);
    if (code !== 0) throw new Error(err);
    return JSON.parse(out.trim().split("\n").at(-1) ?? "") as Answer;
  };
  const save = (name: string, cells: readonly TestCell[]): string => {
    const path = join(folder, name);
    writeFileSync(path, notebookText(cells));
    return path;
  };

  test("every notebook and every template", () =>
    expect(notebooks.filter((path) => path.includes("/templates/")).length).toBeGreaterThanOrEqual(4));

  test.each(notebooks.map((path) => [path.slice(top.length + 1), path]))(
    "%s by nbclient: no error, and cell for cell what the headless run shows",
    async (_name, path) => {
      const { error, cells, counts } = nbclient(path);
      expect(error).toBeUndefined();
      expect(counts).toEqual(cells.map((_, index) => index + 1));
      expect(bare(cells)).toEqual(await headless(path));
    },
  );

  test.each(notebooks.map((path) => [path.slice(top.length + 1), path]))(
    "%s by jupyter nbconvert --execute --to html",
    (_name, path) => {
      const { code, err } = call(
        "-m",
        "nbconvert",
        "--execute",
        "--to",
        "html",
        "--ExecutePreprocessor.kernel_name=hingebook",
        "--output-dir",
        folder,
        "--output",
        "converted",
        path,
      );
      expect(code, err).toBe(0);
      const html = readFileSync(join(folder, "converted.html"), "utf8");
      // An empty sheet has nothing to draw; its conclusion is shown.
      expect(html).toContain(path.endsWith("blank-sheet.ipynb") ? "<p>‹What governs" : "<svg");
      expect(html).not.toContain("[object Object]");
    },
  );

  test("a cell that fails stops there: CellExecutionError with the cell and the engineer's line", () => {
    const path = save("failing.ipynb", [
      "const q = 5;",
      { markdown: "The next one fails." },
      "const span = 6;\nfunction load(x: number): number {\n  if (x > 1) throw new RangeError('no load at ' + x);\n  return q;\n}\nload(span)",
      "console.log('never')",
    ]);
    const { error, cells } = nbclient(path);
    expect(error).toMatchObject({ ename: "RangeError", evalue: "no load at 6" });
    expect(error?.text).toContain("load(span)"); // the cell itself
    expect(error?.text).toContain("> 3 |   if (x > 1) throw new RangeError('no load at ' + x);");
    expect(error?.text).toContain("at cell 2, line 6, column 1");
    expect(error?.text).not.toMatch(/node_modules|node:|dist\//);
    expect(cells[2]).toEqual([]);
    const converted = call(
      "-m",
      "nbconvert",
      "--execute",
      "--to",
      "notebook",
      "--ExecutePreprocessor.kernel_name=hingebook",
      path,
    );
    expect(converted.code).toBe(1);
    expect(converted.err).toContain("CellExecutionError");
    expect(converted.err).toContain("no load at 6");
  });

  test("a wrong unit stops before the cell runs, in words", () => {
    const path = save("unit.ipynb", [
      'import { portal } from "hingebook";',
      'console.log("ran");\nportal({ span: "14 kN", height: "5 m", bases: "pinned" })',
    ]);
    const { error, cells } = nbclient(path);
    expect(error?.evalue).toMatch(/span.*"14 kN".*length/s);
    expect(error?.text).toContain("cell 2, line 2, column 10");
    expect(cells[1]?.map(({ output_type }) => output_type)).toEqual(["error"]);
  });

  test("far from any node_modules: the library, packages, and the engineer's own .ts and .json beside the notebook", () => {
    writeFileSync(
      join(folder, "loads.ts"),
      'import { factor } from "./factors.json";\nexport const roof: number = 2 * factor;\n',
    );
    writeFileSync(join(folder, "factors.json"), '{ "factor": 1.5 }');
    const path = save("far.ipynb", [
      'import { portal } from "hingebook";\nimport { roof } from "./loads.ts";\nimport { z } from "zod";',
      'const frame = portal({ span: "14 m", height: "5 m", bases: "pinned" });\n[roof, frame.members.length, z.number().parse(3)]',
    ]);
    const { error, cells } = nbclient(path);
    expect(error).toBeUndefined();
    expect(cells[1]?.[0]?.data?.["text/plain"]).toBe("[ 3, 3, 3 ]");
  });

  test("a chart: its specification with a drawing and words beside it", () => {
    const spec = {
      $schema: "https://vega.github.io/schema/vega-lite/v6.json",
      description: "drift by storey",
      data: {
        values: [
          { x: 1, y: 2 },
          { x: 2, y: 3 },
        ],
      },
      mark: "line",
      encoding: { x: { field: "x", type: "quantitative" }, y: { field: "y", type: "quantitative" } },
    };
    const { cells } = nbclient(save("chart.ipynb", [`const chart = ${JSON.stringify(spec)};\nchart`]));
    const data = cells[0]?.[0]?.data ?? {};
    expect(Object.keys(data).sort()).toEqual([
      "application/vnd.vegalite.v6+json",
      "image/svg+xml",
      "text/plain",
    ]);
    expect(data["application/vnd.vegalite.v6+json"]).toEqual(spec);
    expect(data["image/svg+xml"]).toMatch(/^<svg[\s\S]*<\/svg>$/);
    expect(data["text/plain"]).toBe("chart: drift by storey");
  });
});
