import { describe, expect, test } from "vitest";
import { completedPart, History } from "../../kernel/history.ts";

describe("History", () => {
  test("an earlier run of a cell goes once its names are all declared again", () => {
    const history = new History();
    history.add("a", "const x = 1");
    history.add("b", "x + 1");
    history.add("a", "const x = 2, y = 3");
    expect(history.sources).toEqual(["x + 1", "const x = 2, y = 3"]);
  });

  test("it stays while one of its names can still be seen", () => {
    const history = new History();
    history.add("a", "const x = 1, z = 4");
    history.add("a", "const x = 2");
    expect(history.sources).toEqual(["const x = 1, z = 4", "const x = 2"]);
  });
});

test("completedPart is the statements before the one that failed", () => {
  const source = "const a = 1;\nconst b = 2;\nfail();\nconst c = 3;";
  expect(completedPart(source, { line: 3, column: 1 })).toBe("const a = 1;\nconst b = 2;");
  expect(completedPart(source, { line: 1, column: 5 })).toBe("");
  expect(completedPart(source, undefined)).toBe("");
});
