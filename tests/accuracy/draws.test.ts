import { describe, expect, test } from "vitest";
import { drawsOf, endShare } from "../../lib/accuracy/draws.ts";
import type { Unknown } from "../../lib/accuracy/unknowns.ts";

const unknown = (i: number, kind: "I" | "fixity" = "I"): Unknown => ({
  name: `I of ${i}`,
  kind,
  least: kind === "I" ? 0.5 : 0.2,
  most: kind === "I" ? 2 : 0.6,
  members: [i],
  joints: [],
});
const several = (n: number): Unknown[] => Array.from({ length: n }, (_, i) => unknown(i));

/** Values of the unknowns, sample by sample. */
function samplesOf(unknowns: readonly Unknown[], count: number, seed = 1): number[][] {
  const { values, rowOf } = drawsOf(unknowns, count, seed);
  return [...rowOf].map((row) => [...values.subarray(row * unknowns.length, (row + 1) * unknowns.length)]);
}

describe("drawsOf", () => {
  test.each([1, 2, 3, 5, 8, 10, 13])("of %i unknowns seven samples in ten take all of them at ends", (n) => {
    const { atEnds } = drawsOf(several(n), 500, 1);
    expect([endShare, atEnds]).toEqual([0.7, 350]);
    const corners = samplesOf(several(n), 500).filter((v) => v.every((x) => x === 0.5 || x === 2));
    expect(corners.length).toBe(350);
  });

  test.each([1, 2, 3, 4, 8])("of %i unknowns every corner comes as often as another, or once more", (n) => {
    const counts = new Map<string, number>();
    for (const v of samplesOf(several(n), 500).slice(0, 350))
      counts.set(v.join(), (counts.get(v.join()) ?? 0) + 1);
    expect(counts.size).toBe(2 ** n);
    expect(Math.max(...counts.values()) - Math.min(...counts.values())).toBeLessThanOrEqual(1);
  });

  test.each([3, 8, 13])("of %i unknowns each is at either end equally often", (n) => {
    const corners = samplesOf(several(n), 500).slice(0, 350);
    for (let k = 0; k < n; k++) expect(corners.filter((v) => v[k] === 2).length).toBe(175);
  });

  test("inside its range an unknown takes one value in each equal part: even in ratio, fixities even", () => {
    const inside = samplesOf([unknown(0), unknown(1, "fixity")], 500).slice(350);
    expect(inside.length).toBe(150);
    const parts = (k: number, part: (x: number) => number): number[] =>
      inside.map((v) => Math.floor(150 * part(v[k] ?? 0))).sort((a, b) => a - b);
    const each = Array.from({ length: 150 }, (_, i) => i);
    expect(parts(0, (x) => Math.log(x / 0.5) / Math.log(4))).toEqual(each);
    expect(parts(1, (x) => (x - 0.2) / 0.4)).toEqual(each);
    // and the two are not drawn together
    expect(inside.filter(([a = 0, b = 0]) => a < 1 === b < 0.4).length).toBeLessThan(100);
  });

  test("the same seed draws the same, another seed something else", () => {
    expect(samplesOf(several(4), 100, 5)).toEqual(samplesOf(several(4), 100, 5));
    expect(samplesOf(several(4), 100, 5)).not.toEqual(samplesOf(several(4), 100, 6));
  });

  test("up to ten unknowns all corners are among the frames, of more those drawn", () => {
    expect([drawsOf(several(10), 500, 1).corners, drawsOf(several(10), 500, 1).allCorners]).toEqual([
      1024,
      true,
    ]);
    expect([drawsOf(several(11), 500, 1).corners, drawsOf(several(11), 500, 1).allCorners]).toEqual([
      350,
      false,
    ]);
  });

  test("an unknown of a single value has no corners; with nothing unknown one frame is solved", () => {
    const fixed = { ...unknown(0), least: 1.5, most: 1.5 };
    expect(drawsOf([fixed, unknown(1)], 100, 1).corners).toBe(2);
    expect(samplesOf([fixed], 100).every(([x]) => x === 1.5)).toBe(true);
    expect(drawsOf([], 100, 1).rows).toBe(1);
  });
});
