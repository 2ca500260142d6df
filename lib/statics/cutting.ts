// What cutting needs to know of a structure under its loads.

import type { Point } from "../results/index.ts";
import { type Load, type Segment, type Skeleton, type Structure, skeleton } from "../structure/index.ts";
import { type Connection, connections } from "./connections.ts";

export interface Cutting {
  readonly structure: Structure;
  readonly loads: readonly Load[];
  readonly skeleton: Skeleton;
  readonly connections: readonly Connection[];
}

export function cutting(structure: Structure, loads: readonly Load[]): Cutting {
  return { structure, loads, skeleton: skeleton(structure), connections: connections(structure) };
}

/** A joint is cut free where two or more member ends meet. */
export function isCutFree(cut: Cutting, joint: string): boolean {
  return cut.connections.filter((c) => c.joint === joint).length > 1;
}

/** The member ends among the two ends of a segment (a hinge is none). */
export function endsOf(
  { skeleton: { nodes }, connections: all }: Cutting,
  s: Segment,
): readonly Connection[] {
  return all.filter((c) => {
    const node = nodes[c.end === "start" ? s.from : s.to];
    return c.member === s.member && node?.kind === "joint" && node.name === c.joint;
  });
}

/** Whether a segment goes with a joint at one of its ends. */
export function joinedAt(cut: Cutting, s: Segment, joint: string): boolean {
  return endsOf(cut, s).some((c) => c.joint === joint && c.joined);
}

/** A joint as a point to take moments about. */
export function jointPoint({ structure }: Cutting, joint: string): Point {
  const found = structure.joints.find((j) => j.name === joint);
  return { name: joint, x: found?.x ?? Number.NaN, y: found?.y ?? Number.NaN };
}
