// The equilibrium equations of a whole structure, cut into segments at joints and hinges:  A t = -b.
//
// t  per segment N at its end, and M / Lc at each end that transmits moment (one M / Lc throughout where an end transmits
//    no shear); then the reactions (moments over Lc), those of a support at an angle along its own axes. A spring of a
//    support counts as held: it resists.
// b  the loads at the nodes, those between nodes replaced by the end forces of simple beams
// Rows: forces x and y at every node, and moment / Lc where something at the node takes a moment.
// Lc is the size of the structure, so that units of length do not spoil a tolerance.
// The left null space of A are the motions that strain nothing; its right null space the states of self-stress.
// Source: S. Pellegrino & C. R. Calladine, Matrix analysis of statically and kinematically indeterminate frameworks,
// Int. J. Solids Structures 22 (1986) 409-428.

import { domain, type MemberLoads, memberLoads } from "../results/index.ts";
import {
  byName,
  type Load,
  type Release,
  releasesOf,
  resists,
  type Segment,
  type Skeleton,
  type Structure,
  skeleton,
} from "../structure/index.ts";
import { resultantsOn } from "./resultants.ts";
import { sizeOf } from "./size.ts";

export interface Equilibrium {
  readonly structure: Structure;
  readonly skeleton: Skeleton;
  /** What the ends of each segment do not transmit. */
  readonly releases: readonly Ends[];
  readonly unknowns: readonly Unknown[];
  /** Row of each node's x, y and moment equation; the moment row is absent where nothing takes a moment. */
  readonly rows: readonly NodeRows[];
  readonly equations: number;
  readonly matrix: readonly Float64Array[];
  /** Lc, m. */
  readonly size: number;
}

export interface Ends {
  readonly start: Release;
  readonly end: Release;
}

export interface NodeRows {
  readonly x: number;
  readonly y: number;
  readonly moment?: number;
}

export type Unknown =
  | { readonly kind: SegmentForce; readonly segment: number }
  | { readonly kind: "reaction"; readonly joint: string; readonly component: "x" | "y" | "moment" };

type SegmentForce = "N" | "M start" | "M end" | "M throughout";

/** The equations of a structure; hinges as they are. */
export function equilibriumMatrix(structure: Structure): Equilibrium {
  const cut = skeleton(structure);
  const releases = segmentReleases(structure, cut);
  const rows = rowsOf(structure, cut);
  const equations = rows.reduce((n, row) => n + (row.moment === undefined ? 2 : 3), 0);
  const unknowns = unknownsOf(structure, cut, releases);
  const matrix = Array.from({ length: equations }, () => new Float64Array(unknowns.length));
  const size = sizeOf(structure);
  unknowns.forEach((unknown, k) => {
    const put = (row: number | undefined, value: number): void => {
      const target = row === undefined ? undefined : matrix[row];
      if (target !== undefined) target[k] = (target[k] ?? 0) + value;
    };
    if (unknown.kind === "reaction") {
      const at = cut.nodes.findIndex((n) => n.kind === "joint" && n.name === unknown.joint);
      putReaction(structure, unknown, rows[at], put);
    } else putSegment(cut.segments[unknown.segment], unknown.kind, rows, size, put);
  });
  return { structure, skeleton: cut, releases, unknowns, rows, equations, matrix, size };
}

/** The load vector b, one entry per row of the matrix. */
export function loadVector(equilibrium: Equilibrium, loads: readonly Load[]): Float64Array {
  const b = new Float64Array(equilibrium.equations);
  const put = (row: number | undefined, value: number): void => {
    if (row !== undefined) b[row] = (b[row] ?? 0) + value;
  };
  const { nodes } = equilibrium.skeleton;
  for (const load of loads) {
    if (load.kind !== "joint") continue;
    const rows = equilibrium.rows[nodes.findIndex((n) => n.kind === "joint" && n.name === load.joint)];
    put(rows?.x, load.fx);
    put(rows?.y, load.fy);
    put(rows?.moment, load.couple / equilibrium.size);
  }
  const perMember = new Map<string, MemberLoads>();
  const loaded = new Set(loads.flatMap((load) => (load.kind === "joint" ? [] : [load.member])));
  equilibrium.skeleton.segments.forEach((segment, e) => {
    if (!loaded.has(segment.member)) return;
    const own = perMember.get(segment.member) ?? memberLoads(equilibrium.structure, loads, segment.member);
    perMember.set(segment.member, own);
    const ends = equilibrium.releases[e];
    if (ends === undefined) throw new Error(`segment ${e} has no ends`);
    const force = carried(segmentResultant(own, segment), segment.length, ends);
    const [from, to] = [equilibrium.rows[segment.from], equilibrium.rows[segment.to]];
    put(from?.x, force.startAlong * segment.c - force.start * segment.s);
    put(from?.y, force.startAlong * segment.s + force.start * segment.c);
    put(from?.moment, force.startMoment / equilibrium.size);
    put(to?.x, force.endAlong * segment.c - force.end * segment.s);
    put(to?.y, force.endAlong * segment.s + force.end * segment.c);
    put(to?.moment, force.endMoment / equilibrium.size);
  });
  return b;
}

/** The loads of a segment shared between its nodes as a simple beam shares them, all of the axial load at the start; an end
 *  that transmits no shear or no axial force leaves it to the other, and the moment that goes with it to an end that takes one.
 *  Along, across (local y) and moments counter-clockwise. */
function carried(
  { along, across, moment }: { readonly along: number; readonly across: number; readonly moment: number },
  length: number,
  { start, end }: Ends,
): Readonly<Record<"startAlong" | "endAlong" | "start" | "end" | "startMoment" | "endMoment", number>> {
  const toEnd = start.axial === true;
  const right = start.shear === true ? -across : end.shear === true ? 0 : -moment / length; // local y at the end
  const left = -across - right;
  const rest = -moment - right * length; // zero unless an end transmits no shear
  return {
    startAlong: toEnd ? 0 : along,
    endAlong: toEnd ? along : 0,
    start: left,
    end: right,
    startMoment: end.moment ? rest : 0,
    endMoment: end.moment ? 0 : rest,
  };
}

/** Resultant of the loads on a segment: along and across in N, and moment of `across` and couples about the segment's start,
 *  clockwise, N·m. A point load at a cut belongs to the segment that ends there. */
export function segmentResultant(
  own: MemberLoads,
  { begin, end }: { readonly begin: number; readonly end: number },
): { readonly along: number; readonly across: number; readonly moment: number } {
  const [, length] = domain(own.across);
  const last = Math.abs(end - length) < 1e-9 * length ? length : end;
  let { along, across, moment } = resultantsOn(own, begin, last);
  for (const point of own.points) {
    if (!isWithin(point.x, begin, last, length)) continue;
    along += point.along;
    across += point.across;
    moment += point.across * (point.x - begin) - point.couple;
  }
  return { along, across, moment };
}

/** Whether a place on a member belongs to the stretch from `begin` to `end`: its end does, its beginning only at the member's start. */
export function isWithin(x: number, begin: number, end: number, length: number): boolean {
  const near = 1e-9 * length;
  return (x > begin + near || (begin <= near && x <= near)) && x <= end + near;
}

function rowsOf(structure: Structure, { nodes, segments }: Skeleton): readonly NodeRows[] {
  let next = 0;
  return nodes.map((node, i) => {
    const takesMoment =
      segments.some((s) => (s.from === i && !s.releasedStart) || (s.to === i && !s.releasedEnd)) ||
      structure.supports.some(
        (s) => node.kind === "joint" && s.joint === node.name && resists(s, "rotation"),
      );
    const [x, y] = [next, next + 1];
    next += takesMoment ? 3 : 2;
    return takesMoment ? { x, y, moment: y + 1 } : { x, y };
  });
}

function segmentReleases(structure: Structure, { segments }: Skeleton): readonly Ends[] {
  const members = byName(structure.members);
  return segments.map((segment, i) => {
    const member = members.get(segment.member);
    if (member === undefined) throw new Error(`segment of unknown member "${segment.member}"`);
    return releasesOf(member, segment, segments[i + 1]?.member !== segment.member);
  });
}

/** Whether a segment transmits no shear. */
export function isShearless({ start, end }: Ends): boolean {
  return start.shear === true || end.shear === true;
}

function unknownsOf(structure: Structure, cut: Skeleton, releases: readonly Ends[]): readonly Unknown[] {
  const inside = cut.segments.flatMap((_, segment): Unknown[] => {
    const ends = releases[segment];
    return ends === undefined ? [] : segmentForces(ends).map((kind) => ({ kind, segment }));
  });
  const reactions = structure.supports.flatMap((support): Unknown[] =>
    (["x", "y", "rotation"] as const).flatMap((axis) =>
      resists(support, axis)
        ? [{ kind: "reaction", joint: support.joint, component: axis === "rotation" ? "moment" : axis }]
        : [],
    ),
  );
  return [...inside, ...reactions];
}

function segmentForces(ends: Ends): readonly SegmentForce[] {
  const { start, end } = ends;
  const axial = start.axial === true || end.axial === true ? [] : (["N"] as const);
  if (isShearless(ends)) return start.moment || end.moment ? axial : [...axial, "M throughout"];
  return [
    ...axial,
    ...(start.moment ? [] : (["M start"] as const)),
    ...(end.moment ? [] : (["M end"] as const)),
  ];
}

/** One unit of a reaction on its joint, along the support's own axes. */
function putReaction(
  structure: Structure,
  { joint, component }: Extract<Unknown, { readonly kind: "reaction" }>,
  rows: NodeRows | undefined,
  put: (row: number | undefined, value: number) => void,
): void {
  const angle = structure.supports.find((s) => s.joint === joint)?.angle ?? 0;
  if (component === "moment" || angle === 0) {
    put(rows?.[component], 1);
    return;
  }
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  put(rows?.x, component === "x" ? c : -s);
  put(rows?.y, component === "x" ? s : c);
}

/** What one unit of a segment's force does to its nodes. V = (M end - M start) / length. */
function putSegment(
  segment: Segment | undefined,
  kind: SegmentForce,
  rows: readonly NodeRows[],
  size: number,
  put: (row: number | undefined, value: number) => void,
): void {
  if (segment === undefined) return;
  const { c, s } = segment;
  const [from, to] = [rows[segment.from], rows[segment.to]];
  const lever = { N: 0, "M throughout": 0, "M start": -1, "M end": 1 }[kind];
  const V = (lever * size) / segment.length;
  const N = kind === "N" ? 1 : 0;
  put(from?.x, N * c + V * s);
  put(from?.y, N * s - V * c);
  put(to?.x, -N * c - V * s);
  put(to?.y, -N * s + V * c);
  if (kind === "M start" || kind === "M throughout") put(from?.moment, 1);
  if (kind === "M end" || kind === "M throughout") put(to?.moment, -1);
}
