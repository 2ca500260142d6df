// One load case in typed arrays: forces at nodes, forces in segments whose nodes stay, temperatures, settlements.

import {
  axisOf,
  type DistributedLoad,
  type Imposed,
  inGlobalAxes,
  type JointLoad,
  type Load,
  type MemberPointLoad,
  memberNamed,
  metresAlong,
  type Settlement,
  type Skeleton,
  type Structure,
  snapToEnds,
  type TemperatureLoad,
} from "../structure/index.ts";
import {
  addForce,
  addLine,
  type EndPattern,
  fixedForces,
  type LoadSums,
  nodeForces,
  noLoad,
} from "./basic-beam.ts";
import type { Numbering } from "./numbering.ts";
import type { Segments } from "./prepare.ts";
import { takeSegmentForces } from "./segment-forces.ts";

export interface LoadCase {
  /** Forces at the displacements. */
  readonly f: Float64Array;
  /** f less what the segments take from their nodes while these stay. */
  readonly unmoved: Float64Array;
  /** n, m1, m2 of each segment while its nodes stay: three per segment. */
  readonly fixed: Float64Array;
  /** EA-fold lengthening and EI-fold end rotations of each segment as a simple beam: three per segment. */
  readonly simple: Float64Array;
  /** N and V at the start and V at the end of each segment, beside those of n, m1, m2: three per segment. */
  readonly beside: Float64Array;
  /** Free strain and curvature of each segment from temperature, two per segment; absent when there is none. */
  readonly thermal?: Float64Array;
  /** Displacements of the ground at held places and springs; absent when there are none. */
  readonly ground?: Float64Array;
}

/** The arrays of one load case; loads are checked already. */
export function loadCase(
  structure: Structure,
  cut: Skeleton,
  numbers: Numbering,
  segments: Segments,
  patterns: readonly EndPattern[],
  loads: readonly (Load | Imposed)[],
): LoadCase {
  const f = new Float64Array(numbers.total + 1);
  const bySegment = segmentsByMember(cut);
  const sums: (LoadSums | undefined)[] = new Array(segments.count).fill(undefined);
  let thermal: Float64Array | undefined;
  let ground: Float64Array | undefined;
  for (const load of loads) {
    if (load.kind === "joint") addJointLoad(f, numbers, load);
    else if (load.kind === "temperature") {
      thermal ??= new Float64Array(2 * segments.count);
      for (const e of bySegment.get(load.member) ?? []) addTemperature(thermal, e, structure, load);
    } else if (load.kind === "settlement") {
      ground ??= new Float64Array(numbers.total + 1);
      addSettlement(ground, numbers, load);
    } else
      addMemberLoad(sums, structure, cut, bySegment.get(load.member) ?? [], inGlobalAxes(structure, load));
  }
  const fixed = new Float64Array(3 * segments.count);
  const simple = new Float64Array(3 * segments.count);
  const beside = new Float64Array(3 * segments.count);
  for (let e = 0; e < segments.count; e++) {
    const [sum, pattern] = [sums[e], patterns[e]];
    if (sum === undefined || pattern === undefined) continue;
    const L = segments.length[e] ?? 1;
    put(fixed, 3 * e, fixedForces(pattern, L, sum));
    put(simple, 3 * e, [sum.eF, sum.r1F, sum.r2F]);
    const forces = nodeForces(L, sum);
    put(beside, 3 * e, [forces[0], -forces[1], forces[2]]);
    addNodeForces(f, segments, e, forces);
  }
  const unmoved = f.slice();
  takeSegmentForces(segments, fixed, unmoved);
  unmoved[numbers.total] = 0;
  return {
    f,
    unmoved,
    fixed,
    simple,
    beside,
    ...(thermal === undefined ? {} : { thermal }),
    ...(ground === undefined ? {} : { ground }),
  };
}

function segmentsByMember({ segments }: Skeleton): ReadonlyMap<string, readonly number[]> {
  const lists = new Map<string, number[]>();
  segments.forEach(({ member }, e) => {
    const list = lists.get(member);
    if (list === undefined) lists.set(member, [e]);
    else list.push(e);
  });
  return lists;
}

function addJointLoad(f: Float64Array, { node, places, axes }: Numbering, load: JointLoad): void {
  const i = node.get(load.joint) ?? -1;
  const [c, s] = [axes[2 * i] ?? 1, axes[2 * i + 1] ?? 0];
  add(f, places[3 * i], load.fx * c + load.fy * s);
  add(f, places[3 * i + 1], load.fy * c - load.fx * s);
  add(f, places[3 * i + 2], load.couple);
}

function addMemberLoad(
  sums: (LoadSums | undefined)[],
  structure: Structure,
  { segments }: Skeleton,
  own: readonly number[],
  load: DistributedLoad | MemberPointLoad,
): void {
  const { length, c, s } = axisOf(structure, memberNamed(structure, load.member, "load"));
  const at = (place: MemberPointLoad["at"]): number => snapToEnds(metresAlong(place, length), length);
  const parts = (x: number, y: number): readonly [number, number] => [x * c + y * s, y * c - x * s];
  const sumOf = (e: number): LoadSums => {
    const found = sums[e] ?? noLoad();
    sums[e] = found;
    return found;
  };
  if (load.kind === "member point") {
    const x = at(load.at);
    const e = own.find((k) => x <= (segments[k]?.end ?? 0) + 1e-9 * length);
    const segment = segments[e ?? -1];
    if (e === undefined || segment === undefined) return;
    const inside = Math.min(Math.max(x - segment.begin, 0), segment.length);
    const [along, across] = parts(load.fx, load.fy);
    addForce(sumOf(e), segment.length, inside, along, across, load.couple);
    return;
  }
  const [begin, end] = [at(load.begin), at(load.end)];
  const q = (x: number): number => load.q1 + ((load.q2 - load.q1) * (x - begin)) / (end - begin);
  const [along, across] = parts(load.direction[0], load.direction[1]);
  for (const e of own) {
    const segment = segments[e];
    if (segment === undefined) continue;
    const [a, b] = [Math.max(begin, segment.begin), Math.min(end, segment.end)];
    if (b - a <= 1e-9 * length) continue;
    const from = segment.begin;
    addLine(sumOf(e), segment.length, a - from, b - from, q(a), q(b), along, across);
  }
}

/** Forces in a segment's own axes, put on the displacements of its nodes. */
function addNodeForces(
  f: Float64Array,
  { places, c1, s1, c2, s2 }: Segments,
  e: number,
  [along, start, end]: readonly [number, number, number],
): void {
  const [p, q, r, t] = [c1[e] ?? 0, s1[e] ?? 0, c2[e] ?? 0, s2[e] ?? 0];
  add(f, places[6 * e], along * p - start * q);
  add(f, places[6 * e + 1], along * q + start * p);
  add(f, places[6 * e + 3], -end * t);
  add(f, places[6 * e + 4], end * r);
}

function addTemperature(thermal: Float64Array, e: number, structure: Structure, load: TemperatureLoad): void {
  const { alpha = 0, depth = 1 } = memberNamed(structure, load.member, "load").section ?? {};
  add(thermal, 2 * e, alpha * load.uniform);
  add(thermal, 2 * e + 1, (alpha * load.difference) / depth);
}

function addSettlement(ground: Float64Array, { node, places }: Numbering, load: Settlement): void {
  const i = node.get(load.joint) ?? -1;
  add(ground, places[3 * i], load.x);
  add(ground, places[3 * i + 1], load.y);
  add(ground, places[3 * i + 2], load.rotation);
}

/** Three values from a place on; several times faster than `set`. */
function put(array: Float64Array, place: number, values: readonly [number, number, number]): void {
  array[place] = values[0];
  array[place + 1] = values[1];
  array[place + 2] = values[2];
}

function add(array: Float64Array, place: number | undefined, value: number): void {
  if (place !== undefined) array[place] = (array[place] ?? 0) + value;
}
