import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import {
  asBending,
  jointRotations,
  momentDistribution,
  type Net,
  netOf,
} from "../../lib/inflection/index.ts";
import { valueAt } from "../../lib/results/index.ts";
import {
  beam,
  buildingFrame,
  coupleLoad,
  type Load,
  partial,
  pointLoad,
  portal,
  type Structure,
  structure,
  uniform,
  varying,
  withHinges,
} from "../../lib/structure/index.ts";
import { everyBeam, heldFrame, stiffSection } from "./restrained.ts";

const seed = 5211;
const log = (min: number, max: number) =>
  fc.double({ min: Math.log(min), max: Math.log(max), noNaN: true }).map(Math.exp);

/** Largest gap between end moments of a method and the exact ones, over the largest exact one. */
function gap(frame: Structure, loads: readonly Load[], method: (net: Net) => Float64Array): number {
  const net = netOf(frame, loads);
  const found = asBending(net, method(net));
  let [most, size] = [0, 0];
  exact(frame, loads).members.forEach(({ M, length }, i) => {
    const [a, b] = [valueAt(M, 0), valueAt(M, length, "left")];
    const own = found[i];
    most = Math.max(most, Math.abs(a - (own?.start ?? 0)), Math.abs(b - (own?.end ?? 0)));
    size = Math.max(size, Math.abs(a), Math.abs(b));
  });
  return most / size;
}

const frames = fc
  .record({
    bays: fc.array(log(4, 9), { minLength: 1, maxLength: 3 }),
    storeys: fc.array(log(3, 5), { minLength: 1, maxLength: 3 }),
    bases: fc.constantFrom("pinned" as const, "fixed" as const),
    ratio: fc.array(log(0.3, 3), { minLength: 30, maxLength: 30 }),
  })
  .map(({ bays, storeys, bases, ratio }) => {
    let i = 0;
    return heldFrame(bays, storeys, bases, () => ratio[i++] ?? 1);
  });

describe("moment distribution and joint rotations, carried on, come to the exact end moments", () => {
  const anyLoads = (frame: Structure): readonly Load[] => {
    const [first = "", second = first] = frame.members.filter((m) => m.group === "beams").map((m) => m.name);
    return [
      ...everyBeam(frame),
      pointLoad(first, "50 kN", { at: "0.3 L" }),
      coupleLoad(second, "40 kN m", { at: "0.6 L" }),
      varying(second, "5 kN/m", "30 kN/m", { from: "0.2 L" }),
    ];
  };
  test.each([
    ["momentDistribution, 40 cycles", (net: Net) => momentDistribution(net, 40)],
    ["jointRotations, 60 passes", (net: Net) => jointRotations(net, 60)],
  ])("%s, on frames held against sway", (_, method) => {
    fc.assert(
      fc.property(frames, (frame) => {
        expect(gap(frame, anyLoads(frame), method)).toBeLessThan(1e-4);
      }),
      { seed, numRuns: 60 },
    );
  });

  test("one cycle is exact where one joint turns", () => {
    const frame = beam({
      spans: ["5 m", "8 m"],
      sections: { AB: { E: 1, I: 1, A: 1 }, BC: { E: 1, I: 2, A: 1 } },
    });
    const loads = [uniform("AB", "10 kN/m"), pointLoad("BC", "30 kN", { at: "3 m" })];
    expect(gap(frame, loads, (net) => momentDistribution(net, 1))).toBeLessThan(1e-12);
  });

  test("released ends, fixed ends and cantilever columns", () => {
    const frame = structure({
      joints: { A: ["0 m", "0 m"], B: ["0 m", "4 m"], C: ["6 m", "4 m"], D: ["12 m", "4 m"] },
      members: { AB: ["A", "B"], BC: ["B", "C"], CD: { ends: ["C", "D"], released: ["D"] } },
      supports: { A: "fixed", C: { y: true }, D: { x: true, y: true, rotation: false } },
    });
    const sized = {
      ...frame,
      members: frame.members.map((m, i) => ({ ...m, section: stiffSection(i + 1) })),
    };
    const loads = [uniform("BC", "10 kN/m"), partial("CD", "20 kN/m", { from: "0 L", to: "0.5 L" })];
    expect(gap(sized, loads, (net) => momentDistribution(net, 40))).toBeLessThan(1e-5);
  });
});

describe("netOf refuses", () => {
  const plain = portal({ span: "9 m", height: "4 m", bases: "fixed" });
  test.each<[string, Structure, string]>([
    ["members without section", plain, 'member "AB" has no section'],
    [
      "inclined members",
      portal({
        span: "9 m",
        height: "4 m",
        rise: "4.5 m",
        bases: "fixed",
        sections: { all: { E: 1, I: 1, A: 1 } },
      }),
      'member "BC" is neither level nor upright',
    ],
    ["hinges", withHinges(plain, [{ member: "BC", from: "B", at: "1 m" }]), "(h1)"],
  ])("%s", (_, frame, words) => {
    expect(() => netOf(frame, [])).toThrow(words);
  });
});

test("netOf(building frame) tells beams from columns", () => {
  const net = netOf(
    buildingFrame({
      bays: ["6 m"],
      storeys: ["3 m"],
      bases: "pinned",
      sections: { all: { E: 2, I: 3, A: 1 } },
    }),
    [],
  );
  expect(net.members.map((m) => [m.name, m.column, m.k, m.freeStart])).toEqual([
    ["A0A1", true, 2, true],
    ["B0B1", true, 2, true],
    ["A1B1", false, 1, false],
  ]);
});
