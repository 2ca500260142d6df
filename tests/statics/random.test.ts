// Random determinate structures of every kind: the free-body sequence, the whole structure solved at once and the elastic
// solution must be one; every step must re-add from plain data; no step is taken on joined bodies, and no equations are taken
// together, where a single unknown could have been had.

import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { type FreeBodySolution, type MemberForces, valueAt } from "../../lib/results/index.ts";
import { type RecheckedLine, recheckEquations } from "../../lib/sheet/recheck-equations.ts";
import { partsBetweenHinges } from "../../lib/statics/bodies.ts";
import { cutting } from "../../lib/statics/cutting.ts";
import { freeBodies } from "../../lib/statics/index.ts";
import { sizeOf } from "../../lib/statics/size.ts";
import { inGlobalAxes, type Structure } from "../../lib/structure/index.ts";
import { seed } from "./frames.ts";
import { notSingle, setsOf, singleUnknown } from "./no-single-step.ts";
import { type Case, cases, heldAlone } from "./random-determinate.ts";
import { bySequence, solvedAtOnce } from "./solved-at-once.ts";

const section = { A: 1e-2, I: 1e-4, E: 2e11 };
const places = [0.0131, 0.3172, 0.6821, 0.9913];

/** A solution as a record would hold it: plain lines with terms, each term naming the step it came from. */
function asRecord({ steps, closures }: FreeBodySolution): readonly RecheckedLine[] {
  const term = (t: FreeBodySolution["steps"][number]["terms"][number]) => ({
    coefficient: t.coefficient,
    value: t.value,
    ...("step" in t.source ? { from: `${steps[t.source.step]?.id}@1` } : {}),
  });
  const lines = [
    ...steps.map((s) => ({
      kind: "step",
      id: s.id,
      version: 1,
      terms: s.terms.map(term),
      coefficient: s.coefficient,
      value: { si: s.result },
    })),
    ...closures.map((c) => ({
      kind: "check",
      id: c.id ?? "",
      version: 1,
      closure: true,
      passed: true,
      terms: c.terms.map(term),
    })),
  ];
  return JSON.parse(JSON.stringify(lines)) as readonly RecheckedLine[];
}

function largestOf(members: readonly MemberForces[]): number {
  const at = (m: MemberForces): readonly number[] =>
    [0, ...places, 1].flatMap((t) => [m.N, m.V, m.M].map((f) => Math.abs(valueAt(f, t * m.length))));
  return Math.max(1, ...members.flatMap(at));
}

function expectElastic({ structure, loads }: Case, solution: FreeBodySolution): void {
  const stiff: Structure = { ...structure, members: structure.members.map((m) => ({ ...m, section })) };
  const elastic = exact(stiff, loads);
  const tolerance = 1e-9 * largestOf(elastic.members);
  solution.members.forEach((m, i) => {
    const other = elastic.members[i];
    if (other === undefined) throw new Error(`no member ${m.member}`);
    for (const t of places)
      for (const f of ["N", "V", "M"] as const) {
        const gap = Math.abs(valueAt(m[f], t * m.length) - valueAt(other[f], t * m.length));
        if (!(gap <= tolerance)) expect.fail(`${f} of ${m.member} at ${t} L differs from exact by ${gap}`);
      }
  });
  for (const [i, { joint, x = 0, y = 0, moment = 0 }] of solution.reactions.entries()) {
    const other = elastic.reactions[i];
    const gap = Math.hypot(x - (other?.x ?? 0), y - (other?.y ?? 0), moment - (other?.moment ?? 0));
    if (!(gap <= tolerance)) expect.fail(`the reaction at ${joint} differs from exact by ${gap}`);
  }
}

interface Tally {
  joined: number;
  together: number;
  further: number;
  steps: number;
  heldAlone: number;
  kinds: Set<string>;
}

/** No single unknown was to be had on one body; nor, before equations were taken together, on any few bodies joined. */
function expectNoShorterWay({ structure, loads }: Case, solution: FreeBodySolution, tally: Tally): void {
  const taken = notSingle(solution.steps);
  if (taken.length === 0) return;
  const global = loads.map((load) => inGlobalAxes(structure, load));
  const parts = partsBetweenHinges(cutting(structure, global)).length;
  const drawn = new Set(solution.steps.flatMap((s) => s.joined ?? []));
  const cutFree = solution.bodies.length - drawn.size;
  for (const { index, kind } of taken) {
    const first = (solution.steps[index]?.bodies[0] ?? 0) < parts;
    const level = Array.from({ length: first ? parts : cutFree - parts }, (_, i) => (first ? i : i + parts));
    tally[kind] += 1;
    const sets = [
      ...level.map((i) => [i]),
      ...(kind === "together" && level.length <= 6 ? setsOf(level) : []),
    ];
    for (const set of sets) {
      const missed = singleUnknown(solution, index, set, sizeOf(structure));
      if (missed !== undefined)
        expect.fail(
          `"${solution.steps[index]?.id}" although ${set.map((i) => solution.bodies[i]?.name).join(" + ")} gives ${missed} alone`,
        );
    }
  }
}

describe(`free bodies of random determinate structures (seed ${seed})`, () => {
  it("2,000 structures: sequence = whole structure = exact to 1e-9; every step re-adds; no shorter way was missed", () => {
    const tally: Tally = { joined: 0, together: 0, further: 0, steps: 0, heldAlone: 0, kinds: new Set() };
    fc.assert(
      fc.property(cases, (one) => {
        const solution = freeBodies(one.structure, one.loads);
        const whole = solvedAtOnce(one.structure, one.loads);
        const largest = Math.max(1, ...whole.map(Math.abs));
        for (const [i, value] of bySequence(one.structure, solution).entries())
          if (!(Math.abs(value - (whole[i] ?? Number.NaN)) <= 1e-9 * largest))
            expect.fail(`unknown ${i} is ${value}, and ${whole[i]} by the whole structure`);
        expectElastic(one, solution);
        const recheck = recheckEquations(asRecord(solution));
        expect(recheck.faults).toEqual([]);
        expect(recheck.count).toBe(solution.steps.length + solution.closures.length);
        expectNoShorterWay(one, solution, tally);
        tally.steps += solution.steps.length;
        tally.further += solution.steps.filter((s) => s.equation === "sum F" || s.about?.meets).length;
        tally.heldAlone += heldAlone(one.structure).length;
        tally.kinds.add(one.kind);
      }),
      { seed, numRuns: 2000 },
    );
    expect([...tally.kinds].sort()).toEqual([
      "arch",
      "beam",
      "frame",
      "frame held at its floors",
      "girder",
      "portal",
      "tree",
      "truss",
    ]);
    expect(tally.heldAlone).toBeGreaterThan(100);
    expect(tally.joined).toBeGreaterThan(200);
    expect(tally.together).toBeGreaterThan(100);
    expect(tally.further).toBeGreaterThan(500);
    expect(tally.steps).toBeGreaterThan(30_000);
  });

  it("the search for a shorter way finds one where there is one", () => {
    const [one] = fc.sample(
      cases.filter((c) => c.kind === "beam"),
      { seed, numRuns: 1 },
    );
    if (one === undefined) throw new Error("no case");
    const solution = freeBodies(one.structure, one.loads);
    const step = solution.steps[0];
    expect(singleUnknown(solution, 0, step?.bodies ?? [], sizeOf(one.structure))).toBeDefined();
  });

  it("1,000 planted wrong digits are found, each in the line it was planted in", () => {
    let planted = 0;
    fc.assert(
      fc.property(
        cases,
        fc.array(fc.nat(1e6), { minLength: 80, maxLength: 80 }),
        ({ structure, loads }, picks) => {
          const lines = asRecord(freeBodies(structure, loads));
          for (let k = 0; k + 3 < picks.length; k += 4) {
            const changed = planted < 1000 ? plant(lines, picks.slice(k, k + 4)) : undefined;
            if (changed === undefined) continue;
            planted += 1;
            const { faults } = recheckEquations(changed.lines);
            if (!faults.some((f) => f.id === changed.id))
              expect.fail(`not found: ${changed.what} in "${changed.id}"`);
          }
        },
      ),
      { seed, numRuns: 120 },
    );
    expect(planted).toBe(1000);
  });
});

/** A sum below this, N or N·m, closes an equation left over whatever its terms. */
const nought = 1e-3;

/** One wrong digit among the first six of a coefficient, a term or a result that has a part of at least a thousandth of the
 *  largest in its equation; nothing where the number picked has less, or moves its equation by a rounding only. */
function plant(
  lines: readonly RecheckedLine[],
  [which = 0, part = 0, place = 0, digit = 0]: readonly number[],
): { readonly lines: readonly RecheckedLine[]; readonly id: string; readonly what: string } | undefined {
  const copy = structuredClone(lines) as Mutable[];
  const line = copy[which % copy.length];
  if (line?.terms === undefined) return undefined;
  const result = { coefficient: line.coefficient ?? 0, value: line.value?.si ?? 0 };
  const parts = [...line.terms, ...(line.kind === "step" ? [result] : [])];
  const sizes = parts.map((p) => Math.abs(p.coefficient * p.value));
  const k = part % parts.length;
  if ((sizes[k] ?? 0) < 1e-3 * Math.max(1, ...sizes)) return undefined;
  const target = parts[k];
  if (target === undefined) return undefined;
  const key = part % 2 === 0 ? "value" : "coefficient";
  const wrong = withWrongDigit(target[key], place % 6, digit);
  const moved = Math.abs(wrong - target[key]) * Math.abs(target[key === "value" ? "coefficient" : "value"]);
  if (moved < 2 * nought) return undefined;
  const what = `${key} ${target[key]} written ${wrong}`;
  target[key] = wrong;
  if (k === line.terms.length) {
    line.coefficient = result.coefficient;
    if (line.value !== undefined) line.value.si = result.value;
  }
  return { lines: copy, id: line.id, what };
}

interface Mutable {
  kind: string;
  id: string;
  terms?: { coefficient: number; value: number }[];
  coefficient?: number;
  value?: { si: number };
}

function withWrongDigit(value: number, place: number, digit: number): number {
  const text = value.toExponential(15);
  const digits = [...text].flatMap((c, i) => (/\d/.test(c) && i < text.indexOf("e") ? [i] : []));
  const at = digits[place] ?? 0;
  const old = Number(text[at]);
  const other = (old + 1 + (digit % 9)) % 10;
  return Number(text.slice(0, at) + String(other) + text.slice(at + 1));
}
