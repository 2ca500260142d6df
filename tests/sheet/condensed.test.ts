import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { quantity } from "../../lib/quantity/index.ts";
import {
  bandInShort,
  type CalculationRecord,
  changesBetween,
  condensed,
  forgetLedger,
  openLedger,
  shownValue,
  wordDifference,
} from "../../lib/sheet/index.ts";

beforeEach(() => forgetLedger());
afterEach(() => forgetLedger());

type Row = readonly [words: readonly string[], kNm: readonly number[]];

/** A record with one table of moments; in every row the words and numbers take turns. */
function withTable(columns: readonly string[], rows: readonly Row[]): CalculationRecord {
  forgetLedger();
  const sheet = openLedger({
    title: "Changed tables",
    job: "1",
    preparedBy: "RT",
    basis: "trial",
    units: "kN, m",
    status: "preliminary",
  });
  sheet.given("w", "5 kN/m", "load");
  const cell = (kNm: number) => ({ value: shownValue(quantity(kNm * 1e3, "moment")), uses: ["w@1"] });
  sheet.put({
    kind: "table",
    id: "moments",
    uses: ["w@1"],
    caption: "Moments in the beam: M + with tension below (by statics)",
    columns,
    rows: rows.map(([words, numbers]) =>
      Array.from({ length: words.length + numbers.length }, (_, i) => {
        const at = Math.floor(i / 2);
        return i % 2 === 0 ? (words[at] ?? "") : cell(numbers[at] ?? 0);
      }),
    ),
  });
  return sheet.record({
    complete: true,
    notebook: { name: "a.ipynb", source: "{}" },
    versions: { hingebook: "0" },
  });
}

const percent = (by: number): string => `${by.toFixed(0)} %`;
const listed = (a: CalculationRecord, b: CalculationRecord): readonly (readonly [string, string, string])[] =>
  changesBetween(a, b).results.map(({ name, value }) => [name, value.before, value.after]);

describe("changesBetween tables", () => {
  const twice = ["start", "M", "end", "M"];
  test("two columns of one heading: each number with its own before, known by the word beside it", () => {
    const before = withTable(twice, [
      [
        ["A", "B"],
        [-10, -40],
      ],
    ]);
    const after = withTable(twice, [
      [
        ["A", "B"],
        [-12, -42],
      ],
    ]);
    expect(listed(before, after)).toEqual([
      ["A: M (Moments in the beam)", "−10.0 kN·m", "−12.0 kN·m"],
      ["A, B: M (Moments in the beam)", "−40.0 kN·m", "−42.0 kN·m"],
    ]);
  });

  const plain = ["at", "M"];
  test("a row put in between: the rows after it are compared with themselves", () => {
    const before = withTable(plain, [
      [["A"], [1]],
      [["B"], [2]],
      [["C"], [3]],
    ]);
    const after = withTable(plain, [
      [["A"], [1]],
      [["new"], [9]],
      [["B"], [2]],
      [["C"], [4]],
    ]);
    expect(listed(before, after)).toEqual([["C: M (Moments in the beam)", "3.00 kN·m", "4.00 kN·m"]]);
    expect(changesBetween(before, after).words.map(wordDifference)).toEqual([
      { before: "", after: "new", more: 0 },
    ]);
  });

  test("a row whose words changed is the same row: its place moved and its value with it", () => {
    const before = withTable(plain, [
      [["A"], [1]],
      [["3.41 m from A"], [2]],
      [["C"], [3]],
    ]);
    const after = withTable(plain, [
      [["A"], [1]],
      [["3.38 m from A"], [5]],
      [["C"], [3]],
    ]);
    expect(listed(before, after)).toEqual([
      ["3.38 m from A: M (Moments in the beam)", "2.00 kN·m", "5.00 kN·m"],
    ]);
    expect(changesBetween(before, after).words.map(wordDifference)).toEqual([
      { before: "3.41 m from A", after: "3.38 m from A", more: 0 },
    ]);
  });
});

describe("condensed", () => {
  const columns = ["at", "M"];
  const of = (a: readonly number[], b: readonly number[]) => {
    const [before, after] = [a, b].map((list) =>
      withTable(
        columns,
        list.map((kNm, i) => [[`P${i}`], [kNm]] as const),
      ),
    );
    if (before === undefined || after === undefined) throw new Error("two records are wanted");
    return condensed(changesBetween(before, after), after.entries, percent);
  };

  test("a table in one line: how many of how many, and the greatest change that is not of a small value", () => {
    // P3 trebles, and is a fiftieth of the largest
    expect(of([100, 50, 80, 0.5], [110, 60, 80, 1.5])).toEqual({
      single: [],
      groups: [{ id: "moments", name: "Moments in the beam", changed: 3, of: 4, most: "most 20 %, P1: M" }],
    });
  });
  test("all in proportion: said once", () => {
    expect(of([100, 50], [110, 55]).groups[0]).toMatchObject({ changed: 2, of: 2, most: "each 10 %" });
  });
  test("nothing before to compare with in percent", () => {
    expect(of([0, 50], [5, 50]).groups[0]).toMatchObject({ changed: 1, of: 2, most: "" });
  });
});

describe("wordDifference", () => {
  const words = (before: string, after: string) =>
    wordDifference({ id: "n", name: "n", kind: "note", before, after });
  const long = "The frame stands on the west side of the yard and is held by the ".repeat(3);
  test("shows where two long texts part, with a little around it", () => {
    const found = words(`${long}wall in the north.${long}`, `${long}tower in the north.${long}`);
    expect(found?.before).toMatch(/^….*held by the wall in the north\..*…$/);
    expect(found?.after).toMatch(/^….*held by the tower in the north\..*…$/);
    expect(found?.before.length).toBeLessThan(70);
  });
  test("of several lines the one that differs", () => {
    expect(words("one\ntwo\nthree", "one\ntwo and a half\nthree")).toEqual({
      before: "two",
      after: "two and a half",
      more: 0,
    });
  });
  test("nothing where only spaces differ", () => {
    expect(words("a  b\n c", "a b\nc")).toBeUndefined();
  });
});

test.each([
  [
    "true value 90 % between −132 and −104 kN·m (0.92 to 1.17 of this), least −140, greatest −99.4 kN·m, in the middle 4 % more than this: hand too small",
    "−132 to −104 kN·m (−140 to −99.4)",
  ],
  [
    "true value 90 % between −2.00 and 2.00 kN·m, least −3.00, greatest 3.00 kN·m",
    "−2.00 to 2.00 kN·m (−3.00 to 3.00)",
  ],
  ["true value the same in every frame tried", "true value the same in every frame tried"],
  ["no band", "no band"],
])("bandInShort(%s)", (text, short) => {
  expect(bandInShort(text)).toBe(short);
});
