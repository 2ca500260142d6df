// Bands in the record: words, the reader of strangers' files, changes, and what is out of date.

import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { quantity } from "../../lib/quantity/index.ts";
import {
  allUses,
  bandCellTexts,
  bandsOf,
  bandText,
  bandValues,
  type CalculationRecord,
  canonicalJson,
  changesBetween,
  type Entry,
  forgetLedger,
  isUnchanged,
  type Ledger,
  openLedger,
  type ResultBand,
  shownValue,
  standingOn,
  valuesOf,
} from "../../lib/sheet/index.ts";
import { readRecord } from "../../lib/sheet/read-record.ts";

const head = {
  title: "Band",
  job: "1",
  preparedBy: "RT",
  basis: "trial",
  units: "kN, m",
  status: "preliminary",
};
beforeEach(() => forgetLedger());
afterEach(() => forgetLedger());

const kNm = (value: number) => shownValue(quantity(value * 1e3, "moment"));

/** About a hand value in kN·m: the true values as multiples of it. */
function ratios(
  hand: number,
  [least, low, high, greatest]: readonly number[],
  uses: readonly string[],
): ResultBand {
  const [a = 0, b = 0, c = 0, d = 0] = [least, low, high, greatest];
  const ends = hand < 0 ? [d, c, b, a] : [a, b, c, d];
  const [first = 0, second = 0, third = 0, fourth = 0] = ends.map((share) => share * hand);
  return {
    least: kNm(first),
    low: kNm(second),
    high: kNm(third),
    greatest: kNm(fourth),
    measure: "ratio",
    against: { least: a, low: b, high: c, greatest: d },
    bias: { si: 0.04, dimension: "pure number", unit: "", text: "+4 %" },
    words: "of the stiffnesses tried",
    uses,
  };
}

const spread = [0.88, 0.92, 1.17, 1.24] as const;

function recorded(
  sheet: Ledger,
  hand = -113,
  shares: readonly number[] = spread,
  because = "sizes are open",
): CalculationRecord {
  const unknown = sheet.assume("I of beam over I of columns from 1 to 4", { because });
  const uses = [`${unknown.id}@${unknown.version}`];
  const value = quantity(hand * 1e3, "moment");
  const band = ratios(hand, shares, uses);
  sheet.result("M_B", value, "knee", { governing: true, band });
  sheet.calc("M_2 = 2*M_B", "kN m", "twice");
  sheet.put({
    kind: "table",
    id: "moments",
    uses: [],
    caption: "Moments",
    columns: ["at", "M"],
    rows: [["B", { value: shownValue(value), uses: ["M_B@1"], band }]],
  });
  return sheet.record({
    complete: true,
    notebook: { name: "a.ipynb", source: "{}" },
    versions: { hingebook: "0" },
  });
}

const fresh = (...given: readonly [number?, (readonly number[])?]): CalculationRecord => {
  forgetLedger();
  return recorded(openLedger(head), ...given);
};

describe("bandText", () => {
  test("a ratio: interval, share of the value, least, greatest and middle, the unit once", () => {
    expect(bandText(ratios(-113, spread, []))).toBe(
      "true value 90 % between −132 and −104 kN·m (0.92 to 1.17 of this), least −140, greatest −99.4 kN·m, in the middle 4 % more than this: hand too small",
    );
    expect(bandCellTexts(ratios(-113, spread, []))).toEqual(["−132 to −104", "(−140 to −99.4)"]);
  });

  test("near zero the values themselves, without shares of it", () => {
    const band: ResultBand = {
      ...ratios(1, [-3, -2, 2, 3], []),
      measure: "difference",
      bias: { ...kNm(0.4), text: "+0.400 kN·m" },
    };
    expect(bandText(band)).toBe(
      "true value 90 % between −2.00 and 2.00 kN·m, least −3.00, greatest 3.00 kN·m, in the middle +0.400 kN·m from this",
    );
  });

  const middle = (si: number, text: string): string =>
    bandText({ ...ratios(-113, spread, []), bias: { si, dimension: "pure number", unit: "", text } })
      .split("greatest −99.4 kN·m")
      .at(-1) ?? "";
  test.each([
    [0.51, "+51 %", ", in the middle 51 % more than this: hand too small"],
    [0.006, "+0.6 %", ", in the middle 0.6 % more than this: hand too small"],
    [0.0049, "+0.5 %", ""],
    [0, "0 %", ""],
    [-0.0049, "−0.5 %", ""],
    [-0.02, "−2 %", ", in the middle 2 % less than this: hand too large"],
    [-1.3, "−130 %", ", in the middle of the other sign (−0.30 of this)"],
  ])(
    "the middle %f from the hand value says which of the two is too small, or nothing",
    (si, text, words) => {
      expect(middle(si, text)).toBe(words);
    },
  );
  test("a middle near the hand value beside zero is not said", () => {
    const band = { ...ratios(1, [-3, -2, 2, 3], []), measure: "difference" as const };
    expect(bandText({ ...band, bias: { ...kNm(0.01), text: "+0.0100 kN·m" } })).not.toContain("middle");
  });

  test("what every frame tried agrees on is said so, with its value where that is not the hand value", () => {
    expect(bandText(ratios(50, [1, 1, 1, 1], []))).toBe("true value the same in every frame tried");
    expect(bandText(ratios(50, [0.9, 0.9, 0.9, 0.9], []))).toBe(
      "true value 45.0 kN·m (0.90 of this) in every frame tried",
    );
    expect(bandCellTexts(ratios(50, [1, 1, 1, 1], []))).toEqual(["same in all"]);
    const single = { ...ratios(50, [0.9, 0.9, 0.9, 0.9], []), single: true } as const;
    expect(bandText(single)).toBe("true value 45.0 kN·m (0.90 of this) in the one frame tried");
    expect(bandCellTexts(single)).toEqual(["45.0 kN·m in one frame"]);
  });

  test("least and greatest that are the interval are not said twice in a cell", () => {
    expect(bandCellTexts(ratios(100, [0.9, 0.9, 1.2, 1.2], []))).toEqual(["90.0 to 120"]);
  });
});

describe("a record with bands", () => {
  test("is read back as it was, and every band with its five numbers", () => {
    const record = fresh();
    const read = readRecord(canonicalJson(record));
    expect(read).toEqual(record);
    const bands = read.entries.flatMap(bandsOf);
    expect(bands.map(({ name }) => name)).toEqual(["M_B", "moments, row 1, M"]);
    expect(bands.flatMap(bandValues).map(({ name }) => name)).toContain("M_B, greatest of its band");
    expect(bands.flatMap(bandValues).length).toBe(10);
    expect(valuesOf(read.entries.find(({ id }) => id === "M_B") as Entry).length).toBe(1);
  });

  test.each([
    ["a number that is none", (band: ResultBand) => ({ ...band, low: "12" }), /band/],
    ["another measure", (band: ResultBand) => ({ ...band, measure: "guess" }), /measure/],
    ["a field too many", (band: ResultBand) => ({ ...band, sure: true }), /sure/],
    ["an entry that is not there", (band: ResultBand) => ({ ...band, uses: ["nothing@1"] }), /nothing@1/],
    [
      "another version",
      (band: ResultBand) => ({ ...band, uses: band.uses.map((u) => u.replace("@1", "@7")) }),
      /@7/,
    ],
  ])("is refused with %s", (_, change, words) => {
    const record = fresh();
    const entries = record.entries.map((entry) =>
      entry.kind === "result" && entry.band ? { ...entry, band: change(entry.band) } : entry,
    );
    expect(() => readRecord(JSON.stringify({ ...record, entries }))).toThrow(words);
  });

  test("what a band stands on is not what the value stands on", () => {
    const { entries } = fresh();
    const unknown = entries.find(({ kind }) => kind === "assumption")?.id ?? "";
    const result = entries.find(({ id }) => id === "M_B");
    expect(result?.uses).toEqual([]);
    expect(allUses(result as Entry)).toEqual([`${unknown}@1`]);
    expect(standingOn(entries, unknown)).toEqual(["M_B", "moments"]);
    expect(standingOn(entries, "M_B")).toEqual(["M_2", "moments"]);
  });
});

describe("what is out of date", () => {
  test("a changed unknown leaves the band behind, and not what was worked out from the value", () => {
    const sheet = openLedger(head);
    recorded(sheet);
    const unknown = sheet.entries().find(({ kind }) => kind === "assumption");
    if (unknown?.kind !== "assumption") throw new Error("an assumption is wanted");
    expect(sheet.entry("M_B")?.outOfDate).toBe(false);
    // the ledger gives an entry made again in one run another id: stored anew as a runner would, by its id
    const { version: _v, cell: _c, outOfDate: _o, ...draft } = unknown;
    sheet.endCell("none");
    sheet.put({ ...draft, because: "columns are chosen" });
    const now = sheet.entry(unknown.id);
    expect(now?.version).toBe(2);
    expect(sheet.entry("M_B")?.outOfDate).toBe(true);
    expect(sheet.entry("M_2")?.outOfDate).toBe(false);
  });
});

describe("changesBetween", () => {
  test("nothing changed: no list of bands", () => {
    const [a, b] = [fresh(), fresh()];
    expect(isUnchanged(changesBetween(a, b))).toBe(true);
    expect("bands" in changesBetween(a, b)).toBe(false);
  });

  test("a band alone is said in one line for the result and one for the table", () => {
    const changes = changesBetween(fresh(), fresh(-113, [0.8, 0.9, 1.3, 1.4]));
    expect(changes.results).toEqual([]);
    expect(changes.bands).toEqual([
      {
        id: "M_B",
        name: "M_B",
        before: bandText(ratios(-113, spread, [])),
        after: bandText(ratios(-113, [0.8, 0.9, 1.3, 1.4], [])),
        governing: true,
      },
      {
        id: "moments",
        name: "Moments",
        before: "1 band",
        after: "1 band, 1 of them otherwise",
        governing: false,
      },
    ]);
    expect(isUnchanged(changes)).toBe(false);
    const record = { ...fresh(), since: { revision: "P1", changes } };
    expect(readRecord(JSON.stringify(record)).since?.changes.bands?.length).toBe(2);
  });

  test("a band that only grew with its value is no change of its own", () => {
    const changes = changesBetween(fresh(-113), fresh(-125));
    expect(changes.results.map(({ id }) => id)).toEqual(["M_B", "M_2", "moments"]);
    expect(changes.bands).toBeUndefined();
  });

  test("a band that was not there before", () => {
    const before = fresh();
    const entries = before.entries.map((entry): Entry => {
      if (entry.kind !== "result") return entry;
      const { band: _, ...rest } = entry;
      return rest;
    });
    const [change] = changesBetween({ ...before, entries }, before).bands ?? [];
    expect(change).toMatchObject({ id: "M_B", before: "no band" });
    expect(changesBetween(before, { ...before, entries }).bands?.[0]?.after).toBe("no band");
  });
});
