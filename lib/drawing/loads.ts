// Loads of a structure on the page: distributed ones stacked off their members, forces and couples where there is room.

import {
  type DistributedLoad,
  inGlobalAxes,
  type Load,
  metresAlong,
  type Structure,
} from "../structure/index.ts";
import { band, bandHeight, depthOf, stretchOn } from "./bands.ts";
import { leastStorey } from "./extent.ts";
import { coupleArrow, forceArrow } from "./forces.ts";
import { dot, type Pt, type Segment, times } from "./geometry.ts";
import { jointOf, memberLine } from "./members.ts";
import type { Scale } from "./scale.ts";
import { blocksOf, merge, type Scene, scene } from "./scene.ts";

const LONGEST = 46;
const SHORTEST = 20;

/** Largest force among point and joint loads, N, the one drawn longest. */
const largest = (loads: readonly Load[]): number =>
  Math.max(0, ...loads.map((l) => (l.kind === "distributed" ? 0 : Math.hypot(l.fx, l.fy))));

/** Length of a force arrow drawn to scale, with a least length that can still be seen. */
const arrowLength = (force: number, greatest: number): number =>
  Math.max(SHORTEST, greatest > 0 ? (LONGEST * force) / greatest : LONGEST);

/** Loads of a structure; `taken` are the lines already drawn. */
export function loads(
  structure: Structure,
  list: readonly Load[],
  texts: readonly string[],
  scale: Scale,
  drawn: Scene,
): Scene {
  const P = largest(list);
  const global = list.map((load) => inGlobalAxes(structure, load));
  const depth = depthOf(global, leastStorey(structure, scale));
  const said = new Map<string, number>();
  // The same text on every beam of a frame may be printed on some of them only.
  const rankOf = (text: string): number | undefined => {
    const before = said.get(text) ?? 0;
    said.set(text, before + 1);
    return before === 0 ? undefined : 1 / (1 + before);
  };
  const offsets = new Map<string, number>();
  let scenes: Scene = scene([]);
  const taken = (): Segment[] => [...blocksOf(drawn), ...blocksOf(scenes)];
  const add = (part: Scene): void => {
    scenes = merge(scenes, part);
  };
  const inOrder = global.map((load, i) => ({ load, text: texts[i] ?? load.label }));
  for (const { load, text } of inOrder) {
    if (load.kind !== "distributed") continue;
    const on = memberLine(structure, load.member, scale);
    const s = stretchOn(load, on.length);
    if (!s) continue;
    // Loads pushing from one side of a member stand over one another.
    const push = times([load.direction[0], -load.direction[1]], s.q1 + s.q2 >= 0 ? 1 : -1);
    const side = `${load.member} ${dot(push, on.fibre) > 0.01} ${dot(push, on.fibre) < -0.01}`;
    const offset = offsets.get(side) ?? 5;
    add(band(on, s, offset, depth, text, rankOf(text)));
    offsets.set(side, offset + bandHeight(s, depth));
  }
  for (const { load, text } of inOrder) {
    if (load.kind === "distributed") continue;
    const point = pointOf(structure, load, scale);
    const force = Math.hypot(load.fx, load.fy);
    if (force > 0) add(forceArrow(point, [load.fx, load.fy], arrowLength(force, P), text, taken()));
    if (load.couple !== 0) add(coupleArrow(point, load.couple > 0 ? 1 : -1, force > 0 ? "" : text, taken()));
  }
  return scenes;
}

function pointOf(structure: Structure, load: Exclude<Load, DistributedLoad>, scale: Scale): Pt {
  if (load.kind === "joint") {
    const joint = jointOf(structure, load.joint);
    return scale.page(joint.x, joint.y);
  }
  const on = memberLine(structure, load.member, scale);
  return on.page(metresAlong(load.at, on.length));
}
