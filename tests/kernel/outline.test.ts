import { expect, test } from "vitest";
import { parseNotebook } from "../../kernel/notebook.ts";
import { headingOf, outline } from "../../kernel/outline.ts";
import { notebookText } from "./notebook-file.ts";

test("outline gives the heading above, else the first comment, else the calls", () => {
  const { cells } = parseNotebook(
    "a.ipynb",
    notebookText([
      { markdown: "# Title\n\n## Loads on the *roof*" },
      "const a = 1",
      "// Snow\nf()",
      'sheet.calc("M = 1"); g(h())',
      "const b = 2",
      "let x = (",
    ]),
  );
  expect([...outline(cells).values()]).toEqual([
    "Loads on the roof",
    "Snow",
    'sheet.calc "M = 1", g, h',
    "const b = 2",
    "let x = (",
  ]);
});

test("headingOf an escaped mark is the mark itself", () => {
  expect(headingOf("# Hall \\*7\\* of *the* \\_job\\_")).toBe("Hall *7* of the _job_");
});

test("headingOf a text without heading is nothing", () => {
  expect(headingOf("only words")).toBeUndefined();
});
