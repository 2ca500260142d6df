// What the study compares: end moments and axial forces of all members, exact or by a hand method.

import { endForces, prepare, solve, stiffnessOf } from "../exact/index.ts";
import { asBending, type EndMomentArray, type Net } from "../inflection/index.ts";
import { axisOf } from "../structure/index.ts";
import type { StudyCase } from "./study-cases.ts";

/** Bending moments at the ends of members, tension on the reference fibre positive, and their lengths; per member. */
export interface Ends {
  readonly start: readonly number[];
  readonly end: readonly number[];
  readonly length: readonly number[];
  /** Axial force at the lower or left end where it is known. */
  readonly N?: readonly number[];
  /** Sagging moments where a rule states them itself. */
  readonly sag?: readonly number[];
}

/** The exact ones, with axial deformation and sway. */
export function exactEnds({ structure, loads }: StudyCase): Ends {
  const prepared = prepare(structure, loads);
  const F = endForces(prepared, solve(prepared, stiffnessOf(prepared), { refinements: 0 }));
  const pick = (k: number): readonly number[] => structure.members.map((_, i) => F[6 * i + k] ?? Number.NaN);
  return { start: pick(2), end: pick(5), N: pick(0), length: lengthsOf(structure) };
}

/** Those of a method on the net. */
export function handEnds({ structure }: StudyCase, net: Net, m: EndMomentArray): Ends {
  const ends = asBending(net, m);
  return { start: ends.map((e) => e.start), end: ends.map((e) => e.end), length: lengthsOf(structure) };
}

function lengthsOf(structure: StudyCase["structure"]): readonly number[] {
  return structure.members.map((member) => axisOf(structure, member).length);
}

/** Shear at both ends of a member under a uniform load, seen on the part towards its start. */
export function shears({ start, end, length }: Ends, w: number, i: number): readonly [number, number] {
  const L = length[i] ?? 1;
  const slope = ((end[i] ?? 0) - (start[i] ?? 0)) / L;
  return [slope + (w * L) / 2, slope - (w * L) / 2];
}

/** Greatest moment of a member under a uniform load: M_start + V²/(2w) where the shear is zero inside it. */
export function sagging(ends: Ends, w: number, i: number): number {
  if (ends.sag !== undefined) return ends.sag[i] ?? Number.NaN;
  const [V] = shears(ends, w, i);
  const at = V / w;
  const [a, b] = [ends.start[i] ?? 0, ends.end[i] ?? 0];
  return at > 0 && at < (ends.length[i] ?? 0) ? a + V ** 2 / (2 * w) : Math.max(a, b);
}
