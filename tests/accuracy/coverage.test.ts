// A short run of the test of the bands themselves; the full one is `npm run study`.

import { beforeAll, describe, expect, test } from "vitest";
import { type CoverageRow, coverage } from "../../lib/accuracy/index.ts";

let rows: readonly CoverageRow[] = [];
beforeAll(() => {
  rows = coverage({ frames: 48, truths: 6 });
});

const all = (law: string): readonly CoverageRow[] => rows.filter((r) => r.family === "all" && r.law === law);

describe("coverage of the bands on random frames of six families", () => {
  test("sizes and bases drawn as printed: the 90 % interval holds 90 ± 3 %, beam, column, shear and axial each", () => {
    const found = all("as printed");
    expect(found.map((r) => r.kind)).toEqual(["beam M", "column M", "shear", "axial"]);
    for (const { inside, count } of found) {
      expect(count).toBeGreaterThan(5_000);
      expect(Math.abs(inside - 0.9)).toBeLessThan(0.03);
    }
  });

  test("drawn even in value: at least 80 %", () => {
    const found = all("even in value");
    expect(found.length).toBe(4);
    for (const { inside } of found) expect(inside).toBeGreaterThan(0.8);
  });

  // at most a tenth of all frames lie outside, and seven in ten frames are such corners: at most one corner in seven
  test("drawn at the ends: at least 80 %, in every family too", () => {
    const found = rows.filter((r) => r.law === "at the ends");
    expect(found.length).toBeGreaterThan(20);
    for (const { inside, kind, family } of found) expect(inside, `${family}, ${kind}`).toBeGreaterThan(0.8);
  });

  test("the corners lie between least and greatest, always", () => {
    for (const { within, kind, family } of rows.filter((r) => r.law === "at the ends"))
      expect(within, `${family}, ${kind}`).toBe(1);
  });

  // a frame of two or three spans has one or two unknowns: two or four corners, none of which can be left out, so that the interval is the
  // whole range; portals and low frames have three or four
  test("the families on which bands of other populations broke hold as well", () => {
    for (const family of ["9 to 14 storeys", "a column line up to ten times stiffer", "spans 1 : 2"]) {
      const found = rows.filter((r) => r.family === family && r.law === "as printed");
      expect(found.length).toBe(4);
      for (const { inside, kind } of found)
        expect(Math.abs(inside - 0.9), `${family}, ${kind}`).toBeLessThan(0.05);
    }
  });
});
