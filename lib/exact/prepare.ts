// Everything about a structure and its loads that does not depend on stiffness, in typed arrays: done once, solved often.
//
// Displacements are numbered with the free ones first, in an order that keeps the matrix narrow, then the held ones,
// then one that is always zero, for rotations of joints at which nothing turns.

import {
  byName,
  checkLoads,
  type Imposed,
  type Load,
  type Release,
  releasesOf,
  type Skeleton,
  type Structure,
  skeleton,
} from "../structure/index.ts";
import { type EndPattern, endPattern } from "./basic-beam.ts";
import { type Coefficients, coefficientsOf } from "./coefficients.ts";
import { type Envelope, envelopeOf } from "./envelope.ts";
import { ExactError } from "./errors.ts";
import { type LoadCase, loadCase } from "./load-case.ts";
import { type Numbering, numbering } from "./numbering.ts";

/** Geometry of the segments, in step with `skeleton.segments`; c and s are direction cosines in the axes of each node. */
export interface Segments {
  readonly count: number;
  readonly length: Float64Array;
  readonly c1: Float64Array;
  readonly s1: Float64Array;
  readonly c2: Float64Array;
  readonly s2: Float64Array;
  /** x, y, rotation of the start, then of the end: six per segment. */
  readonly places: Int32Array;
  /** Index of the member. */
  readonly member: Int32Array;
  readonly ka: Float64Array;
  readonly k11: Float64Array;
  readonly k12: Float64Array;
  readonly k22: Float64Array;
}

/** A spring of a support. */
export interface SpringPlace {
  readonly joint: string;
  readonly axis: "x" | "y" | "rotation";
  readonly place: number;
}

/** A structure and load cases made ready for `solve`. */
export interface Prepared {
  readonly structure: Structure;
  readonly cases: readonly (readonly (Load | Imposed)[])[];
  readonly skeleton: Skeleton;
  readonly numbering: Numbering;
  readonly segments: Segments;
  readonly patterns: readonly EndPattern[];
  readonly springs: readonly SpringPlace[];
  readonly envelope: Envelope;
  readonly coefficients: Coefficients;
  readonly loadCases: readonly LoadCase[];
}

/** Stored entries allowed: 8 bytes each. */
const limit = 5e7;

/** Makes a structure ready to be solved for one or several load cases, for any stiffnesses. */
export function prepare(structure: Structure, ...cases: readonly (readonly (Load | Imposed)[])[]): Prepared {
  for (const loads of cases) checkLoads(structure, loads);
  const cut = skeleton(structure);
  const numbers = numbering(structure, cut);
  const patterns = patternsOf(structure, cut);
  const segments = segmentArrays(structure, cut, numbers, patterns);
  const envelope = envelopeOf(firstColumns(segments, numbers.free));
  if (envelope.size > limit)
    throw new ExactError({ kind: "too large", unknowns: numbers.free, entries: envelope.size, limit });
  return {
    structure,
    cases,
    skeleton: cut,
    numbering: numbers,
    segments,
    patterns,
    springs: springsOf(structure, numbers),
    envelope,
    coefficients: coefficientsOf(segments, envelope),
    loadCases: cases.map((loads) => loadCase(structure, cut, numbers, segments, patterns, loads)),
  };
}

/** End patterns of all segments; those of ends released alike are one object. */
function patternsOf(structure: Structure, { segments }: Skeleton): readonly EndPattern[] {
  const members = byName(structure.members);
  const kept: EndPattern[] = [];
  return segments.map((segment, i) => {
    const member = members.get(segment.member);
    if (member === undefined) throw new Error(`segment of unknown member "${segment.member}"`);
    const { start, end } = releasesOf(member, segment, segments[i + 1]?.member !== segment.member);
    const key = bits(start) + 8 * bits(end);
    kept[key] ??= endPattern(start, end);
    return kept[key];
  });
}

function bits({ moment, shear = false, axial = false }: Release): number {
  return Number(moment) + 2 * Number(shear) + 4 * Number(axial);
}

function segmentArrays(
  structure: Structure,
  { segments }: Skeleton,
  { places, axes }: Numbering,
  patterns: readonly EndPattern[],
): Segments {
  const members = new Map(structure.members.map((m, i) => [m.name, i]));
  const count = segments.length;
  const column = (): Float64Array => new Float64Array(count);
  const [length, c1, s1, c2, s2] = [column(), column(), column(), column(), column()];
  const [ka, k11, k12, k22] = [column(), column(), column(), column()];
  const six = new Int32Array(6 * count);
  const member = new Int32Array(count);
  segments.forEach((segment, e) => {
    const { from, to, c, s } = segment;
    member[e] = members.get(segment.member) ?? -1;
    length[e] = segment.length;
    c1[e] = c * (axes[2 * from] ?? 1) + s * (axes[2 * from + 1] ?? 0);
    s1[e] = s * (axes[2 * from] ?? 1) - c * (axes[2 * from + 1] ?? 0);
    c2[e] = c * (axes[2 * to] ?? 1) + s * (axes[2 * to + 1] ?? 0);
    s2[e] = s * (axes[2 * to] ?? 1) - c * (axes[2 * to + 1] ?? 0);
    for (let k = 0; k < 3; k++) {
      six[6 * e + k] = places[3 * from + k] ?? 0;
      six[6 * e + 3 + k] = places[3 * to + k] ?? 0;
    }
    const pattern = patterns[e];
    ka[e] = pattern?.ka ?? 0;
    k11[e] = pattern?.k11 ?? 0;
    k12[e] = pattern?.k12 ?? 0;
    k22[e] = pattern?.k22 ?? 0;
  });
  return { count, length, c1, s1, c2, s2, places: six, member, ka, k11, k12, k22 };
}

function firstColumns({ count, places }: Segments, free: number): Int32Array {
  const first = new Int32Array(free);
  for (let i = 0; i < free; i++) first[i] = i;
  for (let e = 0; e < count; e++) {
    let least = free;
    for (let k = 6 * e; k < 6 * e + 6; k++) least = Math.min(least, places[k] ?? free);
    for (let k = 6 * e; k < 6 * e + 6; k++) {
      const place = places[k] ?? free;
      if (place < free) first[place] = Math.min(first[place] ?? place, least);
    }
  }
  return first;
}

function springsOf(structure: Structure, { places, node }: Numbering): readonly SpringPlace[] {
  return structure.supports.flatMap(({ joint, springs }) =>
    (["x", "y", "rotation"] as const).flatMap((axis, k) => {
      if (springs?.[axis] === undefined) return [];
      return [{ joint, axis, place: places[3 * (node.get(joint) ?? -1) + k] ?? -1 }];
    }),
  );
}
