import { describe, expect, test } from "vitest";
import { display } from "../../kernel/display.ts";

const KEY = Symbol.for("Jupyter.display");

describe("display", () => {
  test("undefined shows nothing, everything else something", async () => {
    expect(await display(undefined)).toBeUndefined();
    for (const value of [null, 0, "", false, 5n, Symbol("s"), {}, [], () => 1, new Map([[1, 2]])]) {
      const text = (await display(value))?.["text/plain"];
      expect(text).toBeTypeOf("string");
      expect(text).not.toBe("");
      expect(text).not.toContain("[object ");
    }
  });

  test("Symbol.for('Jupyter.display') answers the bundle, now or later; plain text is added", async () => {
    const now = { [KEY]: () => ({ "text/html": "<b>5</b>" }), toString: () => "five" };
    expect(await display(now)).toEqual({ "text/html": "<b>5</b>", "text/plain": "five" });
    const later = { [KEY]: async () => ({ "text/markdown": "**5**" }) };
    expect(await display(later)).toEqual({ "text/markdown": "**5**", "text/plain": "**5**" });
  });

  test("toHtml comes second", async () => {
    expect(await display({ a: 1, toHtml: () => "<i>x</i>" })).toMatchObject({ "text/html": "<i>x</i>" });
  });

  test("a bundle that is none is refused", async () => {
    await expect(display({ [KEY]: () => "x" })).rejects.toThrow(/must answer an object of MIME types/);
    await expect(display({ [KEY]: () => ({ html: "x" }) })).rejects.toThrow(
      /answered "html", which is no MIME type/,
    );
  });
});
