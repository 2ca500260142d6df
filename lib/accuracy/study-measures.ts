// The measures of the study: from the ends of members to the values an engineer designs for, per family. Each measure is a list, so
// that hand and exact values are compared place by place; `small` is what values of the measure are small against.

import type { StudyCase } from "./study-cases.ts";
import { type Ends, sagging, shears } from "./study-ends.ts";

export interface Measure {
  readonly name: string;
  readonly values: readonly number[];
  readonly small: number;
}

/** Two spans, the short one first. */
export function twoSpanMeasures({ w }: StudyCase, ends: Ends): readonly Measure[] {
  const small = smallMoment(w, ends);
  const sags = [sagging(ends, w[0] ?? 0, 0), sagging(ends, w[1] ?? 0, 1)];
  const support = ends.end[0] ?? 0;
  const [left, right] = [shears(ends, w[0] ?? 0, 0), shears(ends, w[1] ?? 0, 1)];
  return [
    { name: "M support", values: [support], small },
    { name: "M sag long", values: sags.slice(1), small },
    { name: "M sag short", values: sags.slice(0, 1), small },
    { name: "governing M", values: [Math.max(-support, ...sags)], small },
    { name: "R interior", values: [right[0] - left[1]], small: 0 },
    { name: "V max", values: [largest([...left, ...right])], small: 0 },
  ];
}

export function threeSpanMeasures({ w }: StudyCase, ends: Ends): readonly Measure[] {
  const small = smallMoment(w, ends);
  const sags = w.map((q, i) => sagging(ends, q, i));
  const supports = ends.end.slice(0, 2);
  const V = w.map((q, i) => shears(ends, q, i));
  const reaction = (i: number): number => (V[i + 1]?.[0] ?? 0) - (V[i]?.[1] ?? 0);
  return [
    { name: "M supports", values: supports, small },
    { name: "M sag end", values: [sags[0] ?? 0, sags[2] ?? 0], small },
    { name: "M sag middle", values: sags.slice(1, 2), small },
    { name: "governing M", values: [Math.max(...supports.map((M) => -M), ...sags)], small },
    { name: "R interior", values: [reaction(0), reaction(1)], small: 0 },
  ];
}

/** Column, beam, column, as `portal` makes them. */
export function portalMeasures({ w, structure }: StudyCase, ends: Ends): readonly Measure[] {
  const [L, q] = [ends.length[1] ?? 0, w[1] ?? 0];
  const knees = [ends.start[1] ?? 0, ends.end[1] ?? 0];
  const bases = [ends.start[0] ?? 0, ends.end[2] ?? 0];
  const middle = (q * L ** 2) / 8 + ((knees[0] ?? 0) + (knees[1] ?? 0)) / 2;
  const heads = [ends.end[0] ?? 0, ends.start[2] ?? 0];
  // where a rule leaves the two different, their mean
  const thrust = [0, 2].reduce(
    (sum, i, k) => sum + ((bases[k] ?? 0) - (heads[k] ?? 0)) / (ends.length[i] ?? 1) / 2,
    0,
  );
  const fixed = structure.supports.every((s) => s.holds.rotation);
  return [
    { name: "M beam ends", values: knees, small: 0 },
    { name: "M midspan", values: [middle], small: 0 },
    {
      name: "governing M",
      values: [Math.max(...[...knees, ...bases, ...heads].map(Math.abs), middle)],
      small: 0,
    },
    { name: "H base", values: [thrust], small: 0 },
    ...(fixed ? [{ name: "M base", values: bases, small: 0 }] : []),
  ];
}

/** Columns of a storey, then its beams, from the ground up, as `buildingFrame` makes them. */
export function frameMeasures({ w, structure }: StudyCase, ends: Ends): readonly Measure[] {
  const small = smallMoment(w, ends);
  const bays = structure.supports.length - 1;
  const per = 2 * bays + 1;
  const storeys = structure.members.length / per;
  const at = (list: readonly number[], i: number): number => list[i] ?? Number.NaN;
  const [outer, inner, sags, columns, all]: number[][] = [[], [], [], [], []];
  for (let s = 0; s < storeys; s++) {
    for (let line = 0; line <= bays; line++) {
      const i = s * per + line;
      all?.push(at(ends.start, i), at(ends.end, i));
      if (line === 0 || line === bays) columns?.push(at(ends.start, i), at(ends.end, i));
    }
    for (let bay = 0; bay < bays; bay++) {
      const i = s * per + bays + 1 + bay;
      (bay === 0 ? outer : inner)?.push(at(ends.start, i));
      (bay === bays - 1 ? outer : inner)?.push(at(ends.end, i));
      sags?.push(sagging(ends, w[i] ?? 0, i));
    }
  }
  const beams = [...(outer ?? []), ...(inner ?? [])];
  return [
    { name: "beam end ext.", values: outer ?? [], small },
    { name: "beam end int.", values: inner ?? [], small },
    { name: "span sag", values: sags ?? [], small },
    { name: "ext. column ends", values: columns ?? [], small },
    {
      name: "N ext. base",
      values: [columnForce(w, ends, bays, storeys, 0), columnForce(w, ends, bays, storeys, bays)],
      small: 0,
    },
    { name: "max hogging", values: [Math.min(...beams)], small },
    { name: "max sag", values: [Math.max(...(sags ?? []))], small },
    { name: "max column M", values: [largest((all ?? []).map(Math.abs))], small },
  ];
}

/** Axial force of an outer lowest column: as solved, or the sum of the beam shears above. */
function columnForce(w: readonly number[], ends: Ends, bays: number, storeys: number, line: number): number {
  if (ends.N !== undefined) return ends.N[line] ?? Number.NaN;
  let sum = 0;
  for (let s = 0; s < storeys; s++) {
    const i = s * (2 * bays + 1) + bays + 1 + (line === 0 ? 0 : bays - 1);
    const [left, right] = shears(ends, w[i] ?? 0, i);
    sum += line === 0 ? -left : right;
  }
  return sum;
}

/** Two hundredths of the largest wL². */
function smallMoment(w: readonly number[], { length }: Ends): number {
  return 0.02 * Math.max(...w.map((q, i) => q * (length[i] ?? 0) ** 2));
}

function largest(values: readonly number[]): number {
  return values.reduce((a, b) => (Math.abs(b) > Math.abs(a) ? b : a), 0);
}
