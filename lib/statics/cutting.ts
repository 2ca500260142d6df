// What cutting needs to know of a structure under its loads.

import type { Point } from "../results/index.ts";
import {
  type Joint,
  jointNamed,
  type Load,
  type Segment,
  type Skeleton,
  type Structure,
  skeleton,
} from "../structure/index.ts";
import { type Connection, connections } from "./connections.ts";

export interface Cutting {
  readonly structure: Structure;
  readonly loads: readonly Load[];
  /** The same loads before they were brought to global axes. */
  readonly given: readonly Load[];
  readonly skeleton: Skeleton;
  readonly connections: readonly Connection[];
}

export function cutting(
  structure: Structure,
  loads: readonly Load[],
  given: readonly Load[] = loads,
): Cutting {
  return {
    structure,
    loads,
    given,
    skeleton: skeleton(structure),
    connections: connections(structure, loads),
  };
}

/** Whether a joint stands free by itself, no member end going with it. */
export function standsAlone(cut: Cutting, joint: string): boolean {
  return cut.connections.every((c) => c.joint !== joint || !c.joined);
}

/** A joint that goes with a member end is cut free from it where two or more ends meet. */
export function isCutFree(cut: Cutting, joint: string): boolean {
  return !standsAlone(cut, joint) && cut.connections.filter((c) => c.joint === joint).length > 1;
}

/** Whether a segment is a bar, and so no body. */
export function isBar(cut: Cutting, s: Segment): boolean {
  return cut.connections.some((c) => c.member === s.member && c.bar);
}

/** The member ends among the two ends of a segment (a hinge is none). */
export function endsOf(
  { skeleton: { nodes }, connections: all }: Cutting,
  s: Segment,
): readonly Connection[] {
  return all.filter((c) => {
    if (c.member !== s.member) return false;
    const node = nodes[c.end === "start" ? s.from : s.to];
    return node?.kind === "joint" && node.name === c.joint;
  });
}

/** Whether a segment goes with a joint at one of its ends. */
export function joinedAt(cut: Cutting, s: Segment, joint: string): boolean {
  return endsOf(cut, s).some((c) => c.joint === joint && c.joined);
}

/** A joint as a point to take moments about. */
export function jointPoint({ structure }: Cutting, joint: string): Point {
  const { name, x, y }: Joint = jointNamed(structure, joint, "cut at joint");
  return { name, x, y };
}
