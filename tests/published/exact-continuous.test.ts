// Continuous beams of equal spans under a uniform load on all or some spans. All spans loaded: T. G. Hicks, Civil Engineering
// Formulas, Table 2.1, as exact fractions of the three-moment equation. Patterns: exact fractions found by trying every
// pattern; three spans with 1 + 2 loaded, four spans with 1 + 2 + 4 and 1 + 3 loaded agree with a published beam table;
// the largest moments with Reynolds & Steedman, Reinforced Concrete Designer's Handbook (from memory).
import { describe, expect, test } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { quantity } from "../../lib/quantity/index.ts";
import { type ElasticSolution, extremes, restrict, valueAt } from "../../lib/results/index.ts";
import { beam, uniform } from "../../lib/structure/index.ts";

const L = 4.5;
const w = 7;
const near = 1e-9;

function solved(pattern: string): ElasticSolution {
  const spans = [...pattern].map(() => quantity(L, "length"));
  const continuous = beam({ spans, sections: { all: { E: 3, I: 2, A: 1 } } });
  const loads = continuous.members.flatMap((m, i) =>
    pattern[i] === "1" ? [uniform(m.name, quantity(w, "force per length"))] : [],
  );
  return exact(continuous, loads);
}

const member = (solution: ElasticSolution, span: number): ElasticSolution["members"][number] => {
  const found = solution.members[span - 1];
  if (found === undefined) throw new Error(`there is no span ${span}`);
  return found;
};
/** Moment over an inner support (2 is the second), hogging positive, in wL². */
const hogging = (solution: ElasticSolution, support: number): number =>
  -valueAt(member(solution, support).M, 0) / (w * L * L);
const reaction = (solution: ElasticSolution, support: number): number =>
  (solution.reactions[support - 1]?.y ?? Number.NaN) / (w * L);
const close = (got: number, wanted: number, by = near): void =>
  expect(Math.abs(got - wanted), `${got} against ${wanted}`).toBeLessThanOrEqual(by);

const inAll: readonly (readonly [
  pattern: string,
  moments: readonly number[],
  reactions: readonly number[],
])[] = [
  ["11", [1 / 8], [3 / 8, 5 / 4]],
  ["111", [1 / 10, 1 / 10], [2 / 5, 11 / 10]],
  ["1111", [3 / 28, 1 / 14, 3 / 28], [11 / 28, 8 / 7, 13 / 14]],
  ["11111", [2 / 19, 3 / 38, 3 / 38], [15 / 38, 43 / 38, 37 / 38]],
];

type SpanRow = readonly [
  pattern: string,
  span: number,
  Vleft: number,
  Vright: number,
  most: readonly [number, number],
  inflection: readonly number[],
];
// Moments, shears and places are exact fractions; points of inflection are printed to six places.
const spans: readonly SpanRow[] = [
  ["11", 1, 3 / 8, 5 / 8, [3 / 8, 9 / 128], [0.75]],
  ["111", 1, 2 / 5, 3 / 5, [2 / 5, 2 / 25], [0.8]],
  ["111", 2, 1 / 2, 1 / 2, [1 / 2, 1 / 40], [0.276393, 0.723607]],
  ["1111", 1, 11 / 28, 17 / 28, [11 / 28, 121 / 1568], [0.785714]],
  ["1111", 2, 15 / 28, 13 / 28, [15 / 28, 57 / 1568], [0.266077, 0.805351]],
  ["11111", 1, 15 / 38, 23 / 38, [15 / 38, 225 / 2888], [0.789474]],
  ["11111", 2, 10 / 19, 9 / 19, [10 / 19, 12 / 361], [0.268475, 0.784157]],
  ["11111", 3, 1 / 2, 1 / 2, [1 / 2, 7 / 152], [0.196512, 0.803488]],
];

// Where, with all spans loaded, the worst pattern with its value.
const patterns: readonly (readonly [where: string, all: number, worst: number, pattern: string])[] = [
  ["support 2", 1 / 8, 1 / 8, "11"],
  ["span 1", 9 / 128, 49 / 512, "10"],
  ["support 2", 1 / 10, 7 / 60, "110"],
  ["span 1", 2 / 25, 81 / 800, "101"],
  ["span 2", 1 / 40, 3 / 40, "010"],
  ["support 2", 3 / 28, 27 / 224, "1101"],
  ["support 3", 1 / 14, 3 / 28, "0110"],
  ["span 1", 121 / 1568, 625 / 6272, "1010"],
  ["span 2", 57 / 1568, 505 / 6272, "0101"],
  ["support 2", 2 / 19, 25 / 209, "11010"],
  ["support 3", 3 / 38, 93 / 836, "01101"],
  ["span 1", 225 / 2888, 289 / 2888, "10101"],
  ["span 2", 12 / 361, 913 / 11552, "01010"],
  ["span 3", 7 / 152, 13 / 152, "10101"],
];

// Whole cases; moments over the inner supports hogging positive.
const cases: readonly (readonly [
  pattern: string,
  reactions: readonly number[],
  moments: readonly number[],
])[] = [
  ["110", [23 / 60, 6 / 5, 9 / 20, -1 / 30], [7 / 60, 1 / 30]],
  ["1101", [85 / 224, 137 / 112, 5 / 14, 67 / 112, 99 / 224], [27 / 224, 1 / 56, 13 / 224]],
  ["1010", [25 / 56, 4 / 7, 13 / 28, 4 / 7, -3 / 56], [3 / 56, 1 / 28, 3 / 56]],
  ["10", [7 / 16, 5 / 8, -1 / 16], [1 / 16]],
  ["101", [9 / 20, 11 / 20], [1 / 20, 1 / 20]],
];

function coefficient(pattern: string, where: string): number {
  const [kind = "", place = "1"] = where.split(" ");
  const solution = solved(pattern);
  if (kind === "support") return hogging(solution, Number(place));
  return extremes(member(solution, Number(place)).M).greatest.value / (w * L * L);
}

describe("exact(continuous beam)", () => {
  test.each(inAll)("%s: support moments and reactions", (pattern, moments, reactions) => {
    const solution = solved(pattern);
    moments.forEach((m, i) => {
      close(hogging(solution, i + 2), m);
    });
    reactions.forEach((r, i) => {
      close(reaction(solution, i + 1), r);
      close(reaction(solution, pattern.length + 1 - i), r);
    });
  });

  test.each(spans)(
    "%s span %i: shears, largest moment, inflection",
    (pattern, span, left, right, [x, M], places) => {
      const found = member(solved(pattern), span);
      close(valueAt(found.V, 0) / (w * L), left);
      close(-valueAt(found.V, L, "left") / (w * L), right);
      const { greatest } = extremes(found.M);
      close(greatest.x / L, x);
      close(greatest.value / (w * L * L), M);
      expect(found.inflection).toHaveLength(places.length);
      places.forEach((place, i) => {
        close((found.inflection[i] ?? 0) / L, place, 5e-7);
      });
    },
  );

  test.each(patterns)("%s: %f with all spans, %f with pattern %s", (where, all, worst, pattern) => {
    close(coefficient("1".repeat(pattern.length), where), all);
    close(coefficient(pattern, where), worst);
  });

  test.each(patterns)(
    "%s: no pattern gives more than it does (all %f, worst %f, %s)",
    (where, _, worst, pattern) => {
      const n = pattern.length;
      const values = Array.from({ length: 2 ** n - 1 }, (__, k) =>
        coefficient((k + 1).toString(2).padStart(n, "0"), where),
      );
      close(Math.max(...values), worst);
    },
  );

  test.each(cases)("case %s: reactions and moments over supports", (pattern, reactions, moments) => {
    const solution = solved(pattern);
    reactions.forEach((r, i) => {
      close(reaction(solution, i + 1), r);
    });
    moments.forEach((m, i) => {
      close(hogging(solution, i + 2), m);
    });
  });

  test("case 110: span moments 529/7200 and 77/1440 at 7/12 L of the second span", () => {
    const solution = solved("110");
    close(extremes(member(solution, 1).M).greatest.value / (w * L * L), 529 / 7200);
    const second = extremes(restrict(member(solution, 2).M, 0, L)).greatest;
    close(second.value / (w * L * L), 77 / 1440);
    close(second.x / L, 7 / 12);
  });

  test("the numbers of rows compared", () => {
    expect([inAll.length, spans.length, patterns.length, cases.length]).toEqual([4, 8, 14, 5]);
  });
});
