// Members of a solved structure: forces, displacements and points of inflection.

import { crossings, type ElasticMember } from "../results/index.ts";
import {
  axisOf,
  type Imposed,
  inGlobalAxes,
  type Load,
  type Member,
  metresAlong,
  snapToEnds,
} from "../structure/index.ts";
import { fieldsOf, type OwnLine, type OwnPoint, type SegmentState } from "./fields.ts";
import type { LoadCase } from "./load-case.ts";
import type { Prepared } from "./prepare.ts";
import type { SolvedCase } from "./solve.ts";
import type { Stiffness } from "./stiffness.ts";

/** Every member of one load case, in the structure's order. */
export function memberResults(
  prepared: Prepared,
  stiffness: Stiffness,
  loads: readonly (Load | Imposed)[],
  loadCase: LoadCase,
  solved: SolvedCase,
): readonly ElasticMember[] {
  const { structure, segments } = prepared;
  const own = loadsByMember(loads);
  const states: SegmentState[][] = structure.members.map(() => []);
  for (let e = 0; e < segments.count; e++)
    states[segments.member[e] ?? -1]?.push(segmentState(prepared, stiffness, loadCase, solved, e));
  return structure.members.map((member, i) => {
    const indices = own.get(member.name) ?? [];
    const axis = axisOf(structure, member);
    const { lines, points } = ownLoads(prepared, member, loads, indices);
    const fields = fieldsOf(states[i] ?? [], lines, points);
    return Object.freeze({
      member: member.name,
      length: axis.length,
      ...fields,
      inflection: Object.freeze(crossings(fields.M)),
      uses: none,
      loads: Object.freeze(indices),
    });
  });
}

const none: readonly number[] = Object.freeze([]);

function loadsByMember(loads: readonly (Load | Imposed)[]): ReadonlyMap<string, readonly number[]> {
  const lists = new Map<string, number[]>();
  loads.forEach((load, i) => {
    if (load.kind === "joint" || load.kind === "settlement") return;
    const list = lists.get(load.member);
    if (list === undefined) lists.set(load.member, [i]);
    else list.push(i);
  });
  return lists;
}

function ownLoads(
  { structure }: Prepared,
  member: Member,
  loads: readonly (Load | Imposed)[],
  indices: readonly number[],
): { readonly lines: readonly OwnLine[]; readonly points: readonly OwnPoint[] } {
  const lines: OwnLine[] = [];
  const points: OwnPoint[] = [];
  if (indices.length === 0) return { lines, points };
  const { length, c, s } = axisOf(structure, member);
  for (const i of indices) {
    const given = loads[i];
    if (given === undefined || (given.kind !== "distributed" && given.kind !== "member point")) continue;
    const load = inGlobalAxes(structure, given);
    if (load.kind === "member point") {
      const x = snapToEnds(metresAlong(load.at, length), length);
      points.push({
        x,
        along: load.fx * c + load.fy * s,
        left: load.fy * c - load.fx * s,
        couple: load.couple,
      });
      continue;
    }
    const [dx, dy] = load.direction;
    const [along, left] = [dx * c + dy * s, dy * c - dx * s];
    lines.push({
      begin: snapToEnds(metresAlong(load.begin, length), length),
      end: snapToEnds(metresAlong(load.end, length), length),
      p1: load.q1 * along,
      p2: load.q2 * along,
      w1: load.q1 * left,
      w2: load.q2 * left,
    });
  }
  return { lines, points };
}

/** Forces and displacements of a segment at its start. Its own ends move with its nodes unless released:
 *  the end rotation of a pinned end follows from the chord, the chord of a shearless segment from its rigid end. */
function segmentState(
  prepared: Prepared,
  stiffness: Stiffness,
  { simple, thermal, beside }: LoadCase,
  { u, q }: SolvedCase,
  e: number,
): SegmentState {
  const { segments, patterns, skeleton } = prepared;
  const at = (column: { readonly [k: number]: number }, k = e): number => column[k] ?? 0;
  const [L, m] = [at(segments.length), at(segments.member)];
  const [EA, EI] = [at(stiffness.EA, m), at(stiffness.EI, m)];
  const node = (k: number): number => at(u, at(segments.places, 6 * e + k));
  const [c1, s1, c2, s2] = [at(segments.c1), at(segments.s1), at(segments.c2), at(segments.s2)];
  const [u1, v1, t1] = [node(0) * c1 + node(1) * s1, node(1) * c1 - node(0) * s1, node(2)];
  const [u2, v2, t2] = [node(3) * c2 + node(4) * s2, node(4) * c2 - node(3) * s2, node(5)];
  const [n, m1, m2] = [at(q, 3 * e), at(q, 3 * e + 1), at(q, 3 * e + 2)];
  const [epsilon, kappa] = [at(thermal ?? [], 2 * e), at(thermal ?? [], 2 * e + 1)];
  const lengthening = (n * L + at(simple, 3 * e)) / EA + epsilon * L;
  const r1 = (L * (2 * m1 - m2)) / (6 * EI) + at(simple, 3 * e + 1) / EI - (kappa * L) / 2;
  const r2 = (L * (2 * m2 - m1)) / (6 * EI) + at(simple, 3 * e + 2) / EI + (kappa * L) / 2;
  const pattern = patterns[e];
  if (pattern === undefined) throw new Error(`segment ${e} has no end pattern`);
  const { start, end } = pattern;
  const shearless = start.shear === true || end.shear === true;
  const chord = !shearless ? (v2 - v1) / L : start.moment ? t2 - r2 : t1 - r1;
  return {
    begin: skeleton.segments[e]?.begin ?? 0,
    length: L,
    EA,
    EI,
    epsilon,
    kappa,
    N: n + at(beside, 3 * e),
    V: (m1 + m2) / L + at(beside, 3 * e + 1),
    M: -m1 + 0,
    u: start.axial === true ? u2 - lengthening : u1,
    v: start.shear === true ? v2 - chord * L : v1,
    theta: chord + r1,
  };
}
