// The whole structure as one body: loads and reactions must close.

import type { Reaction } from "../results/index.ts";
import {
  axisOf,
  checkLoads,
  inGlobalAxes,
  jointNamed,
  type Load,
  memberNamed,
  metresAlong,
  pointOn,
  type Structure,
} from "../structure/index.ts";

/** The three sums over loads and reactions, N and N·m about the first joint, and the largest part of each to judge them by. */
export interface WholeEquilibrium {
  readonly sumFx: number;
  readonly sumFy: number;
  readonly sumM: number;
  readonly about: string;
  readonly scale: { readonly force: number; readonly moment: number };
  /** Whether every sum is below 1e-9 of its scale. */
  readonly closes: boolean;
}

interface PointForce {
  readonly x: number;
  readonly y: number;
  readonly fx: number;
  readonly fy: number;
  readonly couple: number;
}

/** Sums of all loads and reactions; written from the loads themselves, without the matrix or the free bodies. */
export function equilibrium(
  structure: Structure,
  loads: readonly Load[],
  reactions: readonly Reaction[],
): WholeEquilibrium {
  checkLoads(structure, loads);
  const about = structure.joints[0] ?? { name: "", x: 0, y: 0 };
  const forces = [
    ...loads.map((load) => resultantOf(structure, load)),
    ...reactions.map((r) => reactionForce(structure, r)),
  ];
  const moments = forces.map((f) => f.couple + (f.x - about.x) * f.fy - (f.y - about.y) * f.fx);
  const sumFx = forces.reduce((sum, f) => sum + f.fx, 0);
  const sumFy = forces.reduce((sum, f) => sum + f.fy, 0);
  const sumM = moments.reduce((sum, m) => sum + m, 0);
  const force = Math.max(0, ...forces.flatMap((f) => [Math.abs(f.fx), Math.abs(f.fy)]));
  const moment = Math.max(0, ...moments.map(Math.abs), ...forces.map((f) => Math.abs(f.couple)));
  const closes =
    Math.abs(sumFx) <= 1e-9 * force && Math.abs(sumFy) <= 1e-9 * force && Math.abs(sumM) <= 1e-9 * moment;
  return Object.freeze({
    sumFx,
    sumFy,
    sumM,
    about: about.name,
    scale: Object.freeze({ force, moment }),
    closes,
  });
}

function resultantOf(structure: Structure, given: Load): PointForce {
  const load = inGlobalAxes(structure, given);
  if (load.kind === "joint") {
    const { x, y } = jointNamed(structure, load.joint, "load at joint");
    return { x, y, fx: load.fx, fy: load.fy, couple: load.couple };
  }
  const axis = axisOf(structure, memberNamed(structure, load.member, "load"));
  if (load.kind === "member point") {
    const [x, y] = pointOn(axis, metresAlong(load.at, axis.length));
    return { x, y, fx: load.fx, fy: load.fy, couple: load.couple };
  }
  const [a, b] = [metresAlong(load.begin, axis.length), metresAlong(load.end, axis.length)];
  const [x, y] = pointOn(axis, (a + b) / 2);
  const R = ((load.q1 + load.q2) / 2) * (b - a);
  const shift = ((load.q2 - load.q1) * (b - a) ** 2) / 12; // moment of the linear part about the middle, per unit lever
  const [dx, dy] = load.direction;
  return { x, y, fx: R * dx, fy: R * dy, couple: shift * (axis.c * dy - axis.s * dx) };
}

function reactionForce(structure: Structure, r: Reaction): PointForce {
  const { x, y } = jointNamed(structure, r.joint, "reaction at joint");
  return { x, y, fx: r.x ?? 0, fy: r.y ?? 0, couple: r.moment ?? 0 };
}
