// Loads of a structure on the page: distributed ones stacked off their members, forces and couples where there is room.

import { type DistributedLoad, type Load, metresAlong, type Structure } from "../structure/index.ts";
import { band, bandHeight, deepest, stretchOn } from "./bands.ts";
import { coupleArrow, forceArrow } from "./forces.ts";
import type { Pt, Segment } from "./geometry.ts";
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
  const [q, P] = [deepest(list), largest(list)];
  const offsets = new Map<string, number>();
  let scenes: Scene = scene([]);
  const taken = (): Segment[] => [...blocksOf(drawn), ...blocksOf(scenes)];
  const add = (part: Scene): void => {
    scenes = merge(scenes, part);
  };
  const inOrder = list.map((load, i) => ({ load, text: texts[i] ?? load.label }));
  for (const { load, text } of inOrder) {
    if (load.kind !== "distributed") continue;
    const on = memberLine(structure, load.member, scale);
    const s = stretchOn(load, on.length);
    if (!s) continue;
    const side = `${load.member} ${load.direction.map((d) => d.toFixed(3)).join(" ")} ${s.q1 + s.q2 >= 0}`;
    const offset = offsets.get(side) ?? 5;
    add(band(on, s, offset, q, text));
    offsets.set(side, offset + bandHeight(s, q));
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
