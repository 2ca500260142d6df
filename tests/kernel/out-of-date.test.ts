import { describe, expect, test } from "vitest";
import { changedBelow, marked } from "../../kernel/out-of-date.ts";

interface Known {
  readonly version: number;
  readonly outOfDate: boolean;
  readonly cell?: number;
  readonly uses?: readonly string[];
}
const entries: Readonly<Record<string, Known>> = {
  L: { version: 2, outOfDate: false },
  M: { version: 1, outOfDate: true },
  // g was changed in cell 2; w of cell 3 and d of cell 4 stand on it and were not run again
  g: { version: 2, outOfDate: false, cell: 2, uses: [] },
  w: { version: 1, outOfDate: true, cell: 3, uses: ["g@1", "L@2"] },
  c: { version: 1, outOfDate: true, cell: 5, uses: ["w@1"] },
  d: { version: 1, outOfDate: true, cell: 4, uses: ["w@1", "g@1"] },
};
const ledger = { entry: (id: string): Known | undefined => entries[id] };

describe("changedBelow(value, ledger)", () => {
  test.each([
    ["what it stands on holds", { from: ["L@2"] }, []],
    ["an entry has another version", { from: ["L@1"] }, ["L changed; run the cell again"]],
    ["an entry is out of date itself", { from: ["M@1"] }, ["M changed; run the cell again"]],
    ["an entry is gone", { from: ["gone@1"] }, ["gone changed; run the cell again"]],
    [
      "the root of what is stale, and the first cell to run",
      { from: ["d@1"] },
      ["g changed; run cell 3 first"],
    ],
    ["two ways to one root", { from: ["w@1", "d@1"] }, ["g changed; run cell 3 first"]],
    ["two that stand on the same", { from: ["c@1", "d@1"] }, ["g changed; run cell 3 first"]],
    ["the root itself beside it", { from: ["g@1", "w@1"] }, ["g changed; run cell 3 first"]],
    ["two roots", { from: ["L@1", "d@1"] }, ["L, g changed; run cell 3 first"]],
    ["it does not say", { a: 1 }, []],
    ["it says something else", { from: "drawing" }, []],
    ["it is no object", 3, []],
  ])("%s", (_what, value, wanted) => expect(changedBelow(value, ledger)).toEqual(wanted));
  test("without a sheet nothing is", () => expect(changedBelow({ from: ["L@1"] }, undefined)).toEqual([]));
});

test("marked(bundle, changed) says so in every form of words, and escapes", () => {
  const bundle = { "text/plain": "3", "text/html": "<b>3</b>", "image/svg+xml": "<svg/>" };
  expect(marked(bundle, [])).toBe(bundle);
  expect(marked(bundle, ["a<b changed; run the cell again"])).toMatchObject({
    "text/plain": "OUT OF DATE (a<b changed; run the cell again): 3",
    "text/html": expect.stringContaining("OUT OF DATE (a&lt;b changed; run the cell again)</strong><b>3</b>"),
    "image/svg+xml": "<svg/>",
  });
});
