// A second opinion that is not ours: beams solved symbolically by sympy's beam module, in rational numbers.
import { describe, expect, test } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { quantity } from "../../lib/quantity/index.ts";
import { type ElasticSolution, valueAt } from "../../lib/results/index.ts";
import {
  beam,
  coupleLoad,
  type Load,
  pointLoad,
  type Structure,
  uniform,
  varying,
} from "../../lib/structure/index.ts";
import { pythonHas, runPython } from "./python.ts";

type Kind = "pinned" | "fixed";
/** Supports and loads by place from the left end; line loads begin and end within one span. */
interface Case {
  readonly E: string;
  readonly I: string;
  readonly length: string;
  readonly supports: readonly (readonly [place: string, kind: Kind])[];
  readonly loads: readonly (
    | readonly ["force" | "couple", string, string]
    | readonly ["line", string, string, string, string]
  )[];
  readonly at: readonly string[];
}

/** A beam on the supports given, with every kind of load, its numbers varied by `seed`. */
function varied(seed: number, places: readonly number[], first: Kind, last: Kind, overhang: number): Case {
  const n = (k: number, step: number): number => 1 + ((seed * 7 + k * 5) % 9) * step;
  const text = (value: number): string => String(Math.round(value * 1000) / 1000);
  const end = places[places.length - 1] ?? 0;
  const length = end + overhang;
  const spanOf = (k: number): readonly [number, number] => {
    const i = k % (places.length - 1);
    return [places[i] ?? 0, places[i + 1] ?? 0];
  };
  const within = (k: number, share: number): number => {
    const [a, b] = spanOf(k);
    return a + (b - a) * share;
  };
  return {
    E: text(n(1, 0.5)),
    I: text(n(2, 0.25)),
    length: text(length),
    supports: places.map((p, i) => [text(p), i === 0 ? first : p === length ? last : "pinned"] as const),
    loads: [
      ["line", text(within(seed, 0.1)), text(within(seed, 0.8)), text(-n(3, 0.75)), text(-n(4, 0.5))],
      ["force", text(within(seed + 1, 0.35)), text(-n(5, 1))],
      ["couple", text(within(seed + 2, 0.6)), text(n(6, 0.7) - 4)],
      ...(overhang > 0 ? [["force", text(length), text(-n(7, 0.3))] as const] : []),
    ],
    at: [within(0, 0.25), within(1, 0.5), within(2, 0.85)].map(text),
  };
}

const shapes: readonly (readonly [places: readonly number[], first: Kind, last: Kind, overhang: number])[] = [
  [[0, 5], "fixed", "fixed", 0],
  [[0, 6], "fixed", "pinned", 0],
  [[0, 4], "pinned", "pinned", 1.5],
  [[0, 4, 9], "pinned", "pinned", 0],
  [[0, 4, 7], "fixed", "fixed", 0],
  [[0, 3, 8], "fixed", "pinned", 2],
  [[0, 4, 8, 13], "pinned", "pinned", 0],
  [[0, 3, 8, 12], "fixed", "pinned", 1],
];
const cases = [1, 2, 3].flatMap((round) =>
  shapes.map(([places, first, last, overhang], i) => varied(round * 8 + i, places, first, last, overhang)),
);

interface Answer {
  readonly reactions: readonly (readonly [place: string, kind: "force" | "moment", value: number])[];
  readonly moments: readonly number[];
  readonly deflections: readonly number[];
  readonly slopes: readonly number[];
}

interface Ours {
  readonly structure: Structure;
  readonly solution: ElasticSolution;
}

function ours({ E, I, length, supports, loads }: Case): Ours {
  const stops = [...new Set([...supports.map(([p]) => Number(p)), Number(length)])].sort((a, b) => a - b);
  const structure = beam({
    spans: stops.slice(1).map((x, i) => quantity(x - (stops[i] ?? 0), "length")),
    supports: stops.map((x) => {
      const kind = supports.find(([p]) => Number(p) === x)?.[1];
      return kind === undefined ? "free" : kind === "fixed" ? "fixed" : x === 0 ? "pinned" : "roller";
    }),
    sections: { all: { E: Number(E), I: Number(I), A: 1 } },
  });
  const on = (x: number): readonly [string, number] => {
    const i = Math.max(
      0,
      stops.findIndex((stop, k) => x >= stop && x <= (stops[k + 1] ?? x)),
    );
    return [structure.members[i]?.name ?? "", x - (stops[i] ?? 0)];
  };
  const acting = loads.map((load): Load => {
    const [member, from] = on(Number(load[1]));
    const at = quantity(from, "length");
    if (load[0] === "force")
      return pointLoad(member, quantity(Number(load[2]), "force"), { at, direction: "up" });
    if (load[0] === "couple") return coupleLoad(member, quantity(Number(load[2]), "moment"), { at });
    const to = quantity(from + Number(load[2]) - Number(load[1]), "length");
    const [q1, q2] = [Number(load[3]), Number(load[4])].map((q) => quantity(q, "force per length"));
    if (q1 === undefined || q2 === undefined) throw new Error("a line load has two ends");
    const where = { from: at, to, direction: "up" as const };
    return q1.si === q2.si ? uniform(member, q1, where) : varying(member, q1, q2, where);
  });
  return { structure, solution: exact(structure, acting) };
}

function at({ structure, solution }: Ours, x: number, key: "M" | "deflection" | "rotation"): number {
  const i = structure.joints.findLastIndex((j) => j.x <= x);
  const member = solution.members[Math.min(i, solution.members.length - 1)];
  if (member === undefined) throw new Error(`no member at ${x}`);
  return valueAt(member[key], x - (structure.joints[Math.min(i, solution.members.length - 1)]?.x ?? 0));
}

describe.skipIf(!pythonHas("sympy"))("exact(beam) against sympy's beam module", () => {
  const answers = (): readonly Answer[] => runPython("sympy_beams.py", cases) as readonly Answer[];
  test("24 beams: reactions, moments, slopes and deflections agree to 1e-8", { timeout: 300_000 }, () => {
    const found = answers();
    expect(found).toHaveLength(24);
    let compared = 0;
    const close = (got: number, wanted: number, size: number, what: string): void => {
      expect(Math.abs(got - wanted), `${what}: ${got} against ${wanted}`).toBeLessThanOrEqual(1e-8 * size);
      compared += 1;
    };
    cases.forEach((one, i) => {
      const answer = found[i];
      if (answer === undefined) throw new Error("an answer is missing");
      const own = ours(one);
      const size = (values: readonly number[]): number => Math.max(...values.map(Math.abs));
      for (const [place, kind, value] of answer.reactions) {
        const joint = own.structure.joints.find((j) => Math.abs(j.x - Number(place)) < 1e-9)?.name;
        const reaction = own.solution.reactions.find((r) => r.joint === joint);
        const got = kind === "force" ? reaction?.y : reaction?.moment;
        close(
          got ?? Number.NaN,
          value,
          size(answer.reactions.map((r) => r[2])),
          `beam ${i}, ${kind} at ${place}`,
        );
      }
      one.at.forEach((place, k) => {
        const x = Number(place);
        // sympy's moments are hogging positive under downward loads entered as negative.
        close(
          at(own, x, "M"),
          -(answer.moments[k] ?? Number.NaN),
          size(answer.moments),
          `beam ${i}, M at ${place}`,
        );
        const [v, t] = [answer.deflections[k] ?? Number.NaN, answer.slopes[k] ?? Number.NaN];
        close(at(own, x, "deflection"), v, size(answer.deflections), `beam ${i}, deflection at ${place}`);
        close(at(own, x, "rotation"), t, size(answer.slopes), `beam ${i}, slope at ${place}`);
      });
    });
    expect(compared).toBeGreaterThanOrEqual(24 * 11);
  });
});
