// Distributed loads on a body cut free, and their resultants.

import type { Action } from "../results/index.ts";
import { type DistributedLoad, inGlobalAxes } from "../structure/index.ts";
import { arrow } from "./arrows.ts";
import { band, bandHeight, depthOf, stretchOn } from "./bands.ts";
import { along, type Pt, times, unit } from "./geometry.ts";
import { memberLine } from "./members.ts";
import type { Scale } from "./scale.ts";
import { merge, PENS, type Scene, scene } from "./scene.ts";
import type { FreeBodyFigure } from "./spec.ts";

/** Actions with the same key act at the same point. */
export const keyOf = (action: Action): string => `${action.at.x.toFixed(6)} ${action.at.y.toFixed(6)}`;

/** Whether an action acts along its positive sense; one without a value is drawn so. */
export const senseOf = (action: Action): 1 | -1 => (action.value !== undefined && action.value < 0 ? -1 : 1);

interface Carried {
  readonly action: Action;
  readonly load: DistributedLoad;
  readonly text: string;
  readonly resultant: string;
}

const carried = ({ structure, body, loads, texts, resultants }: FreeBodyFigure): readonly Carried[] =>
  body.actions.flatMap((action, i) => {
    const load = "load" in action.source ? loads[action.source.load] : undefined;
    if (load?.kind !== "distributed") return [];
    return [
      { action, load: inGlobalAxes(structure, load), text: texts[i] ?? "", resultant: resultants?.[i] ?? "" },
    ];
  });

/** Distributed loads over the pieces of the body, then their resultants from above all of them. */
export function bands(spec: FreeBodyFigure, scale: Scale): Scene {
  const depth = depthOf(spec.loads.map((load) => inGlobalAxes(spec.structure, load)));
  const offsets = new Map<string, number>();
  const offsetOf = (member: string): number => offsets.get(member) ?? 5;
  const drawn = carried(spec).map(({ load, text }) => {
    const on = memberLine(spec.structure, load.member, scale);
    const stretches = spec.body.pieces
      .filter((p) => p.member === load.member)
      .flatMap((p) => stretchOn(load, on.length, p.begin, p.end) ?? []);
    const offset = offsetOf(load.member);
    offsets.set(load.member, offset + Math.max(0, ...stretches.map((s) => bandHeight(s, depth))));
    return merge(...stretches.map((s, j) => band(on, s, offset, depth, j === 0 ? text : "")));
  });
  const inLine = new Map<string, number>();
  const resultants = carried(spec).map(({ action, load, resultant: text }) => {
    if (text === "") return scene([]);
    const before = inLine.get(keyOf(action)) ?? 0;
    inLine.set(keyOf(action), before + 1);
    return resultant(action, text, scale, offsetOf(load.member) + 22 * before);
  });
  return merge(...drawn, ...resultants);
}

function resultant(action: Action, text: string, scale: Scale, height: number): Scene {
  if (action.value === undefined) return scene([]);
  const sense = senseOf(action);
  const way = unit([action.direction[0] * sense, -action.direction[1] * sense]);
  const foot = scale.page(action.at.x, action.at.y);
  const tip = along(foot, way, -3);
  const tail = along(tip, way, -(height + 14));
  const aside: Pt = [-way[1], way[0]];
  const instead = [
    { at: tail, prefer: aside },
    { at: tail, prefer: times(aside, -1) },
  ];
  return scene(arrow(tail, tip, PENS.resultant, 7), [
    { text, at: tail, prefer: times(way, -1), gap: 4, instead },
  ]);
}
