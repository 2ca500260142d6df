import { describe, expect, test } from "vitest";
import { parseNotebook, readNotebook } from "../../kernel/notebook.ts";
import { notebookText } from "./notebook-file.ts";

const read = (notebook: unknown) => parseNotebook("folder/roof.ipynb", JSON.stringify(notebook));
const code = { cell_type: "code", source: "1", metadata: {}, outputs: [] };
const of = (...cells: unknown[]): object => ({ nbformat: 4, nbformat_minor: 5, metadata: {}, cells });

describe("parseNotebook", () => {
  test("counts text cells, joins lines, makes ids where there are none", () => {
    const notebook = parseNotebook("folder/roof.ipynb", notebookText([{ markdown: "# A" }, "1 +\n1"]));
    expect(notebook.name).toBe("roof");
    expect(notebook.fileName).toBe("roof.ipynb");
    expect(notebook.cells).toEqual([
      { number: 1, id: "cell-1", kind: "markdown", source: "# A" },
      { number: 2, id: "cell-2", kind: "code", source: "1 +\n1" },
    ]);
    expect(Object.isFrozen(notebook.cells[0])).toBe(true);
  });

  test("keeps the ids of format 4.5 and lists of lines", () => {
    const { cells } = read(of({ ...code, id: "a-b_1", source: ["const a = 1;\n", "a"] }));
    expect(cells[0]).toMatchObject({ id: "a-b_1", source: "const a = 1;\na" });
  });

  test.each([
    ["not JSON", "{", /^roof\.ipynb: not a notebook, it is not JSON/],
    ["a list", "[]", /^roof\.ipynb: not a notebook: a notebook is a JSON object/],
    ["an older format", '{"nbformat":3,"cells":[]}', /nbformat is 3; hingebook reads notebooks of format 4/],
    ["no format", "{}", /nbformat is missing/],
    ["no cells", '{"nbformat":4}', /cells is missing; it must be a list/],
    ["a cell that is no object", '{"nbformat":4,"cells":[5]}', /cell 1 is 5/],
    [
      "an unknown cell type",
      '{"nbformat":4,"cells":[{"cell_type":"x"}]}',
      /cell 1: cell_type is "x"; it must be/,
    ],
    [
      "a source of numbers",
      '{"nbformat":4,"cells":[{"cell_type":"code","source":[1]}]}',
      /cell 1: source is a list/,
    ],
    [
      "another language",
      '{"nbformat":4,"metadata":{"kernelspec":{"language":"python"}},"cells":[]}',
      /language is "python"; hingebook runs TypeScript/,
    ],
  ])("%s is refused, naming the file", (_what, text, words) => {
    expect(() => parseNotebook("folder/roof.ipynb", text)).toThrow(words);
  });

  test("refuses ids that are malformed or used twice", () => {
    expect(() => read(of({ ...code, id: "a b" }))).toThrow(/cell 1: id is "a b"/);
    expect(() => read(of({ ...code, id: "x" }, { ...code, id: "x" }))).toThrow(
      /cells 1 and 2 have the same id "x"/,
    );
  });

  test("a file that is not there is said not to be there", () => {
    expect(() => readNotebook("no/such.ipynb")).toThrow(
      /no\/such\.ipynb: cannot be read, there is no such file/,
    );
    expect(() => readNotebook(import.meta.dirname)).toThrow(/it is a folder/);
  });
});
