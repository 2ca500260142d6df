import { describe, expect, test } from "vitest";
import { changedBelow, marked } from "../../kernel/out-of-date.ts";

const ledger = {
  entry: (id: string) =>
    ({ L: { version: 2, outOfDate: false }, M: { version: 1, outOfDate: true } })[id] as
      | { version: number; outOfDate: boolean }
      | undefined,
};

describe("changedBelow(value, ledger)", () => {
  test.each([
    ["what it stands on holds", { from: ["L@2"] }, []],
    ["an entry has another version", { from: ["L@1"] }, ["L"]],
    ["an entry is out of date itself", { from: ["M@1"] }, ["M"]],
    ["an entry is gone", { from: ["gone@1"] }, ["gone"]],
    ["it does not say", { a: 1 }, []],
    ["it says something else", { from: "drawing" }, []],
    ["it is no object", 3, []],
  ])("%s", (_what, value, wanted) => expect(changedBelow(value, ledger)).toEqual(wanted));
  test("without a sheet nothing is", () => expect(changedBelow({ from: ["L@1"] }, undefined)).toEqual([]));
});

test("marked(bundle, changed) says so in every form of words, and escapes", () => {
  const bundle = { "text/plain": "3", "text/html": "<b>3</b>", "image/svg+xml": "<svg/>" };
  expect(marked(bundle, [])).toBe(bundle);
  expect(marked(bundle, ["a<b", "a<b"])).toMatchObject({
    "text/plain": "OUT OF DATE (a<b changed; run the cell again): 3",
    "text/html": expect.stringContaining("OUT OF DATE (a&lt;b changed; run the cell again)</strong><b>3</b>"),
    "image/svg+xml": "<svg/>",
  });
});
