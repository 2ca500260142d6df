import { describe, expect, test } from "vitest";
import { positionAt } from "../../kernel/position.ts";
import { rewriteCell, rewriteModule, SyntaxRefusal } from "../../kernel/rewrite/index.ts";

describe("rewriteCell", () => {
  test("every top-level name becomes a let, functions first, imports awaited", () => {
    const { code } = rewriteCell(
      'const a = f();\nexport class C {}\nfunction f() { return 1 }\nimport { x as y } from "m";',
    );
    expect(code).toMatch(/^"use strict";/);
    expect(code).toContain("let a = f();");
    expect(code).toContain("let C = class C {};");
    expect(code).toContain('let { "x": y } = __hingebook.names((await __hingebook.load("m")), ["x"], "m");');
    expect(code.indexOf("let f = function ()")).toBeLessThan(code.indexOf("let a"));
  });

  test.each([
    ["an identifier", "const w = 1;\n\n   marked + w", "marked"],
    [
      "inside a function that is moved",
      "const w = 1;\n\nfunction f(a: number): number {\n  return marked + a;\n}",
      "marked",
    ],
    ["after an import", 'import { a } from "m";\nimport b from "n"; marked(a, b)', "marked"],
    ["after an interface", "interface I {\n  a: number;\n}\nconst i: I = marked;", "marked"],
    ["in an assignment from var", "var x = 1, y = marked;", "marked"],
    ["after characters of two units", "const s = '𝛼𝛽'; marked(s)", "marked"],
    ["an import itself", "const a = 1;\n  import marked from 'm';", "import"],
  ])("a place maps back: %s", (_what, source, word) => {
    const { code, locate } = rewriteCell(source);
    const generated = word === "import" ? code.indexOf("let {") : code.indexOf(word);
    expect(generated).toBeGreaterThan(0);
    expect(locate(positionAt(code, generated))).toEqual(positionAt(source, source.indexOf(word)));
  });

  test.each([
    ["unfinished", "const a = (", /Expected/],
    ["declared twice", "let a = 1; let a = 2", /already been declared/],
    ["import.meta", "import.meta.url", /import\.meta is not available here/],
    ["using", "using a = f()", /"using" is not available in this version/],
    ["return", "return 1", /return/],
  ])("refuses with a place: %s", (_what, source, words) => {
    try {
      rewriteCell(source);
      expect.unreachable();
    } catch (error) {
      expect(error).toBeInstanceOf(SyntaxRefusal);
      const { message, at } = error as SyntaxRefusal;
      expect(message).toMatch(words);
      expect(at.line).toBe(1);
    }
  });
});

describe("rewriteModule", () => {
  test("exports become getters handed over first; unused imports are dropped", () => {
    const { code } = rewriteModule(
      'import { A, b } from "m";\nexport const c = b;\nexport default function d() {}\nexport { c as e };\nexport * from "n";',
    );
    expect(code).toContain('get "c"() { return c; }, get "default"() { return d; }, get "e"() { return c; }');
    expect(code).not.toContain('"A"');
    expect(code).toContain('__hingebook.reexport((await __hingebook.load("n")));');
  });
});
