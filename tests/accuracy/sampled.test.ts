import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { bands, defaultUnknowns, type HandValue, sampled, within } from "../../lib/accuracy/index.ts";
import { statesOf } from "../../lib/accuracy/states.ts";
import { variedOf } from "../../lib/accuracy/varied.ts";
import { exact } from "../../lib/exact/index.ts";
import { extremes, valueAt } from "../../lib/results/index.ts";
import {
  atJoint,
  coupleLoad,
  type Load,
  partial,
  pointLoad,
  portal,
  uniform,
} from "../../lib/structure/index.ts";
import { benchFrame } from "../exact/bench-frames.ts";
import { seed } from "../exact/checks.ts";

const { structure, loads } = benchFrame(2, 3);
const beams = structure.members.filter((m) => m.group === "beams").map((m) => m.name);
const [first = "", second = ""] = beams;
const head = structure.joints[structure.joints.length - 1]?.name ?? "";
/** Gravity, wind, and things placed inside one beam. */
const cases: readonly (readonly Load[])[] = [
  loads,
  [atJoint(head, { right: "40 kN" })],
  [
    pointLoad(first, "70 kN", { at: "0.3 L" }),
    partial(first, "12 kN/m", { from: "0.5 L", to: "0.9 L" }),
    coupleLoad(second, "25 kNm", { at: "0.25 L" }),
  ],
];
const values: readonly HandValue[] = structure.members.flatMap((m) =>
  (["N", "V", "M"] as const).flatMap((force) => [
    { wanted: { member: m.name, force, at: 0 }, value: 25e3 },
    { wanted: { member: m.name, force, at: "greatest" }, value: 25e3 },
  ]),
);
const reactions: readonly HandValue[] = structure.supports.flatMap(({ joint }) =>
  (["x", "y"] as const).map((reaction): HandValue => ({ wanted: { joint, reaction }, value: 30e3 })),
);

describe("sampled", () => {
  const found = sampled({ structure, cases, samples: 120 });

  test("answers what bands answers, asked at once, one by one or in another order", () => {
    const once = bands({ structure, cases, values, samples: 120 }).bands;
    expect(found.bandsOf(values)).toEqual(once);
    expect(
      [...values]
        .reverse()
        .map((v) => found.bandsOf([v])[0])
        .reverse(),
    ).toEqual(once);
  });

  test("so it does with more unknowns than all corners can be solved of", () => {
    const groups = structure.members.slice(0, 12).map((m) => ({ group: m.name, I: within(2) }));
    const question = { structure, cases, unknowns: { groups, bases: [] }, samples: 60 };
    const many = sampled(question);
    expect(many.allCorners).toBe(false);
    const some = values.slice(0, 18);
    const once = bands({ ...question, values: some }).bands;
    expect(some.map((v) => many.bandsOf([v])[0])).toEqual(once);
  });

  test("a sum of load cases is the case of all their loads", () => {
    const together = sampled({ structure, cases: [[...loads, ...(cases[2] ?? [])]], samples: 120 });
    const alone = together.bandsOf([...values, ...reactions]);
    const sums = found.bandsOf([...values, ...reactions].map((v) => ({ ...v, loadCases: [0, 2] })));
    expect(sums.length).toBe(alone.length);
    sums.forEach((band, i) => {
      for (const key of ["low", "high", "least", "greatest", "middle"] as const)
        expect(Math.abs(band.truth[key] - (alone[i]?.truth[key] ?? 0)), band.words).toBeLessThan(1e-3);
    });
  });

  test("factors: 1.35 of one case less 0.5 of another, forces, extremes and reactions as exact gives them", () => {
    const wanted = [...values, ...reactions].map(({ wanted }) => ({
      wanted,
      loadCases: [
        { loadCase: 0, factor: 1.35 },
        { loadCase: 2, factor: -0.5 },
      ],
    }));
    const truths = found.nominalOf(wanted);
    const scaled = (load: Load, f: number): Load =>
      load.kind === "distributed"
        ? { ...load, q1: load.q1 * f, q2: load.q2 * f }
        : { ...load, fx: load.fx * f, fy: load.fy * f, couple: load.couple * f };
    const combined = [...loads.map((l) => scaled(l, 1.35)), ...(cases[2] ?? []).map((l) => scaled(l, -0.5))];
    const solution = exact(structure, combined);
    wanted.forEach(({ wanted: w }, i) => {
      if ("member" in w) {
        const f = solution.members.find((m) => m.member === w.member)?.[w.force];
        if (f === undefined) throw new Error("no such member");
        const expected = w.at === "greatest" ? extremes(f).greatest.value : valueAt(f, 0);
        expect(Math.abs((truths[i] ?? 0) - expected), JSON.stringify(w)).toBeLessThan(1e-2);
      } else {
        const expected = solution.reactions.find((r) => r.joint === w.joint)?.[w.reaction] ?? Number.NaN;
        expect(Math.abs((truths[i] ?? 0) - expected), JSON.stringify(w)).toBeLessThan(1e-2);
      }
    });
  });

  test("the nominal truth stands in the band and between least and greatest", () => {
    found.bandsOf(values).forEach((band, i) => {
      expect(band.nominal).toBe(found.nominalOf(values)[i]);
      const near = 1e-9 * Math.abs(band.nominal) + 1e-6;
      expect(band.nominal).toBeGreaterThan(band.truth.least - near);
      expect(band.nominal).toBeLessThan(band.truth.greatest + near);
      expect(band.holds).toBeGreaterThanOrEqual(0.9);
    });
  });

  test("whether a value counts as near zero does not depend on what else is asked", () => {
    const small: HandValue = { wanted: { member: first, force: "N", at: 0 }, value: 1 };
    const [alone] = found.bandsOf([small]);
    const [beside] = found.bandsOf([small, { wanted: { member: first, force: "N", at: 0 }, value: 1e9 }]);
    expect(alone?.measure).toBe("difference");
    expect(beside).toEqual(alone);
  });

  test("frames too large to be kept are solved again and give the same", () => {
    const varied = variedOf(structure, cases, defaultUnknowns(structure));
    const rows = 5;
    const drawn = Float64Array.from({ length: rows * varied.unknowns.length }, (_, i) => 0.6 + 0.07 * i);
    const kept = statesOf(varied, drawn, rows);
    const again = statesOf(varied, drawn, rows, 10);
    const width = varied.size * cases.length;
    expect(kept.array.length).toBe(rows * width);
    expect(again.array.length).toBe(width);
    for (const row of [3, 0, 0, 4, 1, 2]) {
      const [a, b] = [kept.begin(row), again.begin(row)];
      expect([...again.array.subarray(b, b + width)]).toEqual([...kept.array.subarray(a, a + width)]);
    }
  });

  test("bands widen and shrink with the load: twice the load, twice the band", () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 5, noNaN: true }), (factor) => {
        const [one] = found.bandsOf(values.slice(4, 5));
        const [more] = found.bandsOf(
          values.slice(4, 5).map((v) => ({ ...v, loadCases: [{ loadCase: 0, factor }] })),
        );
        for (const key of ["low", "high", "least", "greatest"] as const)
          expect(more?.truth[key]).toBeCloseTo(factor * (one?.truth[key] ?? 0), 4);
      }),
      { seed, numRuns: 20 },
    );
  });

  test("one unknown changes the bands of a pinned portal's reactions as statics demands: verticals not at all", () => {
    const frame = portal({
      span: "10 m",
      height: "4 m",
      bases: "pinned",
      sections: { all: { E: 1, I: 1, A: 100 } },
    });
    const asked: HandValue[] = [
      { wanted: { joint: "A", reaction: "y" }, value: 50e3 },
      { wanted: { joint: "A", reaction: "x" }, value: 10e3 },
    ];
    const [V, H] = sampled({ structure: frame, cases: [[uniform("BC", "10 kN/m")]] }).bandsOf(asked);
    expect(V?.truth.least).toBeCloseTo(50e3, 4);
    expect(V?.truth.greatest).toBeCloseTo(50e3, 4);
    expect((H?.truth.greatest ?? 0) / (H?.truth.least ?? 1)).toBeGreaterThan(1.2);
  });
});

test("a 6-storey 4-bay frame: sampling, then ends, extremes and reactions of all members, in about a second", () => {
  const frame = benchFrame(4, 6);
  const hand: HandValue[] = frame.structure.members.flatMap((m) =>
    (["N", "V", "M"] as const).flatMap((force) => [
      { wanted: { member: m.name, force, at: 0 }, value: 1e4 },
      { wanted: { member: m.name, force, at: "greatest" as const }, value: 1e4 },
      { wanted: { member: m.name, force, at: "least" as const }, value: 1e4 },
    ]),
  );
  for (const { joint, holds } of frame.structure.supports)
    for (const reaction of ["x", "y"] as const)
      if (holds[reaction]) hand.push({ wanted: { joint, reaction }, value: 1e4 });
  const begun = performance.now();
  exact(frame.structure, frame.loads);
  const once = performance.now();
  const found = sampled({ structure: frame.structure, cases: [frame.loads] });
  const solved = performance.now();
  found.bandsOf(hand);
  const asked = performance.now();
  console.log(
    `54 members, 500 samples: ${(solved - once).toFixed(0)} ms, ${hand.length} results ${(asked - solved).toFixed(0)} ms; one exact ${(once - begun).toFixed(1)} ms`,
  );
  expect(asked - once).toBeLessThan(4000); // a loaded machine takes several times as long
});
