// A pivot that nearly vanishes: is it a motion nothing resists? Told by the strain energy of that motion, which comes out
// as the square of a rounding error when the motion is free, and far larger when the structure is only soft.

import type { Mechanism } from "../results/index.ts";
import { deepFreeze } from "../structure/index.ts";
import { nullVector } from "./envelope.ts";
import { ExactError } from "./errors.ts";
import { motionWords } from "./motion-words.ts";
import type { Prepared } from "./prepare.ts";
import { segmentForces } from "./segment-forces.ts";
import type { Stiffness } from "./stiffness.ts";

/** Energy of a motion, over that of its displacements one by one, below which nothing resists it. */
const free = 1e-18;

/** Throws when the motion that pivot `row` stands for is free, or too near to it to be told apart. */
export function refuseIfFree(
  prepared: Prepared,
  stiffness: Stiffness,
  factors: Float64Array,
  row: number,
): void {
  const { envelope, numbering } = prepared;
  const u = new Float64Array(numbering.total + 1);
  u.set(nullVector(envelope, factors, row));
  const diagonal = diagonalOf(prepared, stiffness);
  let apart = 0;
  for (let i = 0; i < numbering.free; i++) apart += (diagonal[i] ?? 0) * (u[i] ?? 0) ** 2;
  const share = energy(prepared, stiffness, u) / apart;
  const pivot = factors[(envelope.shift[row] ?? 0) + row] ?? 0;
  if (share > free && pivot > 0) return;
  const motion = mechanismOf(prepared, u);
  throw new ExactError({ kind: share > free ? "too stiff and too soft" : "free motion", motion });
}

function diagonalOf(
  { coefficients, segments, envelope, springs, numbering }: Prepared,
  stiffness: Stiffness,
): Float64Array {
  const at = new Map<number, number>();
  for (let i = 0; i < envelope.n; i++) at.set((envelope.shift[i] ?? 0) + i, i);
  const diagonal = new Float64Array(envelope.n);
  for (let e = 0; e < segments.count; e++) {
    const m = segments.member[e] ?? 0;
    for (let p = coefficients.begin[e] ?? 0; p < (coefficients.begin[e + 1] ?? 0); p++) {
      const i = at.get(coefficients.place[p] ?? -1);
      if (i === undefined) continue;
      const term =
        (stiffness.EA[m] ?? 0) * (coefficients.alpha[p] ?? 0) +
        (stiffness.EI[m] ?? 0) * (coefficients.beta[p] ?? 0);
      diagonal[i] = (diagonal[i] ?? 0) + term;
    }
  }
  springs.forEach(({ place }, k) => {
    if (place < numbering.free) diagonal[place] = (diagonal[place] ?? 0) + (stiffness.springs[k] ?? 0);
  });
  return diagonal;
}

/** Twice the strain energy of displacements u. */
function energy({ segments, springs }: Prepared, stiffness: Stiffness, u: Float64Array): number {
  const { count } = segments;
  const none = { fixed: new Float64Array(3 * count) };
  const q = new Float64Array(3 * count);
  segmentForces(segments, stiffness, none, u, q);
  let sum = 0;
  for (let e = 0; e < count; e++) {
    const m = segments.member[e] ?? 0;
    const L = segments.length[e] ?? 1;
    const [n, m1, m2] = [q[3 * e] ?? 0, q[3 * e + 1] ?? 0, q[3 * e + 2] ?? 0];
    const EI = (stiffness.EI[m] ?? 1) * 3;
    sum += (n * n * L) / (stiffness.EA[m] ?? 1) + ((m1 * m1 - m1 * m2 + m2 * m2) * L) / EI;
  }
  springs.forEach(({ place }, k) => {
    sum += (stiffness.springs[k] ?? 0) * (u[place] ?? 0) ** 2;
  });
  return sum;
}

/** A motion as plain data: global displacements, the largest component 1. */
function mechanismOf({ structure, skeleton, numbering }: Prepared, u: Float64Array): Mechanism {
  const { places, axes } = numbering;
  const raw = skeleton.nodes.map((node, i) => {
    const [x, y, rotation] = [0, 1, 2].map((k) => u[places[3 * i + k] ?? -1] ?? 0) as [
      number,
      number,
      number,
    ];
    const [c, s] = [axes[2 * i] ?? 1, axes[2 * i + 1] ?? 0];
    return { name: node.name, ux: x * c - y * s, uy: x * s + y * c, rotation };
  });
  const size = Math.max(...raw.map((p) => Math.max(Math.abs(p.ux), Math.abs(p.uy))));
  const lead = raw.find((p) => Math.abs(p.ux) > 1e-6 * size)?.ux ?? 1;
  const by = size > 0 ? Math.sign(lead) / size : 1;
  const tidy = (value: number): number => (Math.abs(value * by) < 1e-9 ? 0 : value * by);
  const points = raw.map((p) => ({ name: p.name, ux: tidy(p.ux), uy: tidy(p.uy) }));
  const turns = skeleton.segments.map(({ member, begin, end, length, c, s, from, to }) => {
    const [a, b] = [points[from], points[to]];
    const rotation = (((b?.uy ?? 0) - (a?.uy ?? 0)) * c - ((b?.ux ?? 0) - (a?.ux ?? 0)) * s) / length;
    return { member, begin, end, rotation };
  });
  const spins = raw.filter((p) => Math.abs(p.rotation) > 0).map((p) => p.name);
  return deepFreeze({ points, turns, words: motionWords(structure, skeleton, points, turns, spins) });
}
