import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { excerpt, offsetAt, positionAt } from "../../kernel/position.ts";

describe("positions", () => {
  test("offsetAt undoes positionAt", () => {
    const text = fc.string({ unit: fc.constantFrom("a", "\n", " ", "é", "𝛼") });
    fc.assert(
      fc.property(text, fc.nat(60), (source, at) => {
        const offset = Math.min(at, source.length);
        return offsetAt(source, positionAt(source, offset)) === offset;
      }),
      { seed: 4 },
    );
  });

  test("excerpt shows the lines around with a caret of the right length", () => {
    expect(excerpt("a\nb\nconst x = yy;\nd\ne", { line: 3, column: 11 }, 2)).toBe(
      ["  1 | a", "  2 | b", "> 3 | const x = yy;", "    |           ^^", "  4 | d"].join("\n"),
    );
  });

  test("the caret keeps to its line and follows tabs", () => {
    expect(excerpt("\tab", { line: 1, column: 2 }, 50)).toBe("> 1 | \tab\n    | \t^^");
  });
});
