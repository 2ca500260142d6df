// The equilibrium equations of a whole structure, cut into segments at joints and hinges:  A t = -b.
//
// t  per segment N at its end, and M / Lc at each end that transmits moment; then the reactions (moments over Lc)
// b  the loads at the nodes, those between nodes replaced by the end forces of simple beams
// Rows: forces x and y at every node, and moment / Lc where something at the node takes a moment.
// Lc is the size of the structure, so that units of length do not spoil a tolerance.
// The left null space of A are the motions that strain nothing; its right null space the states of self-stress.
// Source: S. Pellegrino & C. R. Calladine, Matrix analysis of statically and kinematically indeterminate frameworks,
// Int. J. Solids Structures 22 (1986) 409-428.

import { domain, type MemberLoads, memberLoads } from "../results/index.ts";
import { type Load, type Segment, type Skeleton, type Structure, skeleton } from "../structure/index.ts";
import { resultantsOn } from "./resultants.ts";
import { checkWithinReach } from "./within-reach.ts";

export interface Equilibrium {
  readonly structure: Structure;
  readonly skeleton: Skeleton;
  readonly unknowns: readonly Unknown[];
  /** Row of each node's x, y and moment equation; the moment row is absent where nothing takes a moment. */
  readonly rows: readonly NodeRows[];
  readonly equations: number;
  readonly matrix: readonly Float64Array[];
  /** Lc, m. */
  readonly size: number;
}

export interface NodeRows {
  readonly x: number;
  readonly y: number;
  readonly moment?: number;
}

export type Unknown =
  | { readonly kind: "N" | "M start" | "M end"; readonly segment: number }
  | { readonly kind: "reaction"; readonly joint: string; readonly component: "x" | "y" | "moment" };

/** The equations of a structure; hinges as they are. */
export function equilibriumMatrix(structure: Structure): Equilibrium {
  checkWithinReach(structure);
  const cut = skeleton(structure);
  const rows = rowsOf(structure, cut);
  const equations = rows.reduce((n, row) => n + (row.moment === undefined ? 2 : 3), 0);
  const unknowns = unknownsOf(structure, cut);
  const matrix = Array.from({ length: equations }, () => new Float64Array(unknowns.length));
  const size = sizeOf(cut);
  unknowns.forEach((unknown, k) => {
    const put = (row: number | undefined, value: number): void => {
      const target = row === undefined ? undefined : matrix[row];
      if (target !== undefined) target[k] = (target[k] ?? 0) + value;
    };
    if (unknown.kind === "reaction") {
      const at = cut.nodes.findIndex((n) => n.kind === "joint" && n.name === unknown.joint);
      put(rows[at]?.[unknown.component], 1);
    } else putSegment(cut.segments[unknown.segment], unknown.kind, rows, size, put);
  });
  return { structure, skeleton: cut, unknowns, rows, equations, matrix, size };
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
  for (const segment of equilibrium.skeleton.segments) {
    const own = perMember.get(segment.member) ?? memberLoads(equilibrium.structure, loads, segment.member);
    perMember.set(segment.member, own);
    const { along, across, moment } = segmentResultant(own, segment);
    const right = -moment / segment.length; // local y at the end
    const left = -across - right; // local y at the start
    const [from, to] = [equilibrium.rows[segment.from], equilibrium.rows[segment.to]];
    put(from?.x, along * segment.c - left * segment.s);
    put(from?.y, along * segment.s + left * segment.c);
    put(to?.x, -right * segment.s);
    put(to?.y, right * segment.c);
  }
  return b;
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
      structure.supports.some((s) => node.kind === "joint" && s.joint === node.name && s.holds.rotation);
    const [x, y] = [next, next + 1];
    next += takesMoment ? 3 : 2;
    return takesMoment ? { x, y, moment: y + 1 } : { x, y };
  });
}

function unknownsOf(structure: Structure, { segments }: Skeleton): readonly Unknown[] {
  const inside = segments.flatMap((s, segment): Unknown[] => [
    { kind: "N", segment },
    ...(s.releasedStart ? [] : [{ kind: "M start", segment } as const]),
    ...(s.releasedEnd ? [] : [{ kind: "M end", segment } as const]),
  ]);
  const reactions = structure.supports.flatMap(({ joint, holds }): Unknown[] => [
    ...(holds.x ? [{ kind: "reaction", joint, component: "x" } as const] : []),
    ...(holds.y ? [{ kind: "reaction", joint, component: "y" } as const] : []),
    ...(holds.rotation ? [{ kind: "reaction", joint, component: "moment" } as const] : []),
  ]);
  return [...inside, ...reactions];
}

/** What one unit of a segment's force does to its nodes. V = (M end - M start) / length. */
function putSegment(
  segment: Segment | undefined,
  kind: "N" | "M start" | "M end",
  rows: readonly NodeRows[],
  size: number,
  put: (row: number | undefined, value: number) => void,
): void {
  if (segment === undefined) return;
  const { c, s } = segment;
  const [from, to] = [rows[segment.from], rows[segment.to]];
  const V = kind === "N" ? 0 : ((kind === "M end" ? 1 : -1) * size) / segment.length;
  const N = kind === "N" ? 1 : 0;
  put(from?.x, N * c + V * s);
  put(from?.y, N * s - V * c);
  put(to?.x, -N * c - V * s);
  put(to?.y, -N * s + V * c);
  if (kind === "M start") put(from?.moment, 1);
  if (kind === "M end") put(to?.moment, -1);
}

function sizeOf({ nodes }: Skeleton): number {
  const [xs, ys] = [nodes.map((n) => n.x), nodes.map((n) => n.y)];
  return Math.hypot(Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys));
}
