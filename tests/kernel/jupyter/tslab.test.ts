// Contract: what kernel/jupyter/tslab.ts leans on in tslab's converter.
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, describe, expect, test } from "vitest";
import { joinDraft } from "../../../kernel/check/joined.ts";
import { ownFolder } from "../../../kernel/folders.ts";
import { startTslab } from "../../../kernel/jupyter/tslab.ts";
import { parse } from "../../../kernel/syntax.ts";

const folder = mkdtempSync(join(tmpdir(), "hingebook-"));
const types = join(folder, "library.d.ts");
writeFileSync(
  types,
  '/** A frame of two columns. */\nexport declare function portal(about: { span: string; bases: "pinned" | "fixed" }): { readonly members: number };\n',
);
const tslab = startTslab({ ownFolder: ownFolder(), libraryTypes: types });
afterAll(() => rmSync(folder, { recursive: true }));

const complete = (text: string) => tslab.complete("declare var around: number;", text, text.length);

describe("tslab", () => {
  test("completes the word before the place, and says where it begins", () => {
    const found = complete("const width = 1; wid");
    expect(found).toMatchObject({ start: 17, end: 20 });
    expect(found.names).toContain("width");
  });
  test("declarations stand around the text", () => expect(complete("aroun").names).toContain("around"));
  test("the library is there wherever the notebook is, with its documentation", () => {
    const text = 'import { portal } from "hingebook"; portal';
    expect(complete(`${text}({ span: "1", bases: "pinned" }).mem`).names).toEqual(["members"]);
    // (in hingebook's own checkout the package's own declarations are found first)
    expect(tslab.inspect("", text, text.length - 2)).toMatch(/portal\([\s\S]*A frame of two columns/);
  });
  test("a text literal completes to what fits", () => {
    const { names } = complete('import { portal } from "hingebook"; portal({ bases: "');
    expect(names).toEqual(expect.arrayContaining(["pinned", "fixed"]));
  });
  test("types are strict: what may be missing is said", () => {
    expect(tslab.inspect("", "const first = [1][0]; first", 24)).toBe("const first: number | undefined");
  });
  test("an unknown name is any", () => expect(tslab.inspect("", "nobody", 2)).toBe("any"));
  test("nothing of the browser's or of Node's own is offered", () => {
    expect(complete("docum").names).not.toContain("document");
    expect(complete("proces").names).not.toContain("process");
  });
  test.each([
    ["function f() {", "  "],
    ["f(1,", ""],
    ["1 + 1", undefined],
    ["const = 3", undefined],
  ])("whether more is expected after %j", (text, indent) => {
    const found = tslab.unfinished(text);
    if (indent === undefined) expect(found).toBeUndefined();
    else expect(found).toBeTypeOf("string");
  });
});

describe("joinDraft(cells, draft)", () => {
  const before = [
    "const a = 1",
    "/** Documented. */\nfunction twice(w: number) { return 2 * w }",
    "const a = 'text'",
  ].map((cell) => parse(cell));
  test("a place in the draft is that place in the text, in its imports too", () => {
    const draft = 'import { por } from "hingebook";\nconst b = a.toUp';
    const { text, place } = joinDraft(before, draft);
    for (const word of ["por", "toUp"]) {
      const offset = draft.indexOf(word) + word.length;
      expect(text.slice(0, place(offset)).endsWith(word)).toBe(true);
    }
    expect(complete(text.slice(0, place(draft.length))).names).toEqual(["toUpperCase"]);
  });
  test("a name declared again in the draft is the new one", () => {
    const { text, place } = joinDraft(before, "const a = [1];\na.findLastI");
    expect(tslab.complete("", text, place(26)).names).toEqual(["findLastIndex"]);
  });
  test("documentation of earlier cells is found", () => {
    const { text, place } = joinDraft(before, "twice(1)");
    expect(tslab.inspect("", text, place(1))).toContain("Documented.");
  });
});
