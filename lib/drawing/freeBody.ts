// One body cut free, with every action on it.

import type { Action } from "../results/types.ts";
import { arrow } from "./arrows.ts";
import { dimensioned } from "./dimensions.ts";
import { along, type Pt, type Segment, unit } from "./geometry.ts";
import { arrowLength, band, bandHeight, coupleArrow, deepest, forceArrow, stretchOn } from "./loads.ts";
import { hingeDisc, jointOf, memberLine, outwardAt } from "./members.ts";
import { fitted, type Laid, type Scale } from "./scale.ts";
import { ACCENT, blocksOf, disc, type Label, line, merge, PENS, type Scene, scene } from "./scene.ts";
import type { FreeBodyFigure } from "./spec.ts";

const TALLEST = 190;

function cutPoints(spec: FreeBodyFigure, scale: Scale): Scene {
  const { structure, body } = spec;
  const on = (member: string, at: number): boolean =>
    body.pieces.some((p) => p.member === member && at >= p.begin - 1e-9 && at <= p.end + 1e-9);
  const names = structure.hinges
    .filter((h) => on(h.member, h.at))
    .map((h) => {
      const member = memberLine(structure, h.member, scale);
      const label: Label = { text: h.name, at: member.page(h.at), prefer: member.fibre, gap: 8 };
      return merge(hingeDisc(member.page(h.at)), scene([], [label]));
    });
  const joints = body.joints.map((name) => {
    const joint = jointOf(structure, name);
    const label: Label = {
      text: name,
      at: scale.page(joint.x, joint.y),
      prefer: outwardAt(structure, name, scale),
      gap: 8,
      bold: true,
    };
    const shapes = body.pieces.length === 0 ? [disc(label.at, 5, PENS.load, true)] : [];
    return scene(shapes, [label]);
  });
  return merge(...names, ...joints);
}

/** Distributed loads over the pieces of the body. */
function bands(spec: FreeBodyFigure, scale: Scale): Scene {
  const { structure, body, loads: all, texts, resultants } = spec;
  const greatest = deepest(all);
  const offsets = new Map<string, number>();
  return merge(
    ...body.actions.map((action, i) => {
      const load = "load" in action.source ? all[action.source.load] : undefined;
      if (load?.kind !== "distributed") return scene([]);
      const on = memberLine(structure, load.member, scale);
      const stretches = body.pieces
        .filter((p) => p.member === load.member)
        .flatMap((p) => stretchOn(load, on.length, p.begin, p.end) ?? []);
      const offset = offsets.get(load.member) ?? 5;
      const drawn = stretches.map((s, j) => band(on, s, offset, greatest, j === 0 ? (texts[i] ?? "") : ""));
      offsets.set(load.member, offset + Math.max(0, ...stretches.map((s) => bandHeight(s, greatest))));
      return merge(...drawn, resultant(action, resultants?.[i] ?? "", scale, offsets.get(load.member) ?? 0));
    }),
  );
}

function resultant(action: Action, text: string, scale: Scale, height: number): Scene {
  if (text === "" || action.value === undefined) return scene([]);
  const way = unit([
    action.direction[0] * Math.sign(action.value),
    -action.direction[1] * Math.sign(action.value),
  ]);
  const foot = scale.page(action.at.x, action.at.y);
  const tip = along(foot, way, -3);
  const tail = along(tip, way, -(height + 14));
  const label: Label = { text, at: tail, prefer: [-way[0], -way[1]], gap: 4 };
  return scene(arrow(tail, tip, PENS.resultant, 7), [label]);
}

/** Forces and couples: reactions, hinge forces, cuts, point loads. */
function actions(spec: FreeBodyFigure, scale: Scale, drawn: Scene): Scene {
  let scenes: Scene = scene([]);
  const rings = new Map<string, number>();
  spec.body.actions.forEach((action, i) => {
    const load = "load" in action.source ? spec.loads[action.source.load] : undefined;
    if (load?.kind === "distributed") return;
    const taken: Segment[] = [...blocksOf(drawn), ...blocksOf(scenes)];
    const pen = isSought(spec, action) ? PENS.sought : PENS.load;
    const sense = action.value !== undefined && action.value < 0 ? -1 : 1;
    const point = scale.page(action.at.x, action.at.y);
    const text = spec.texts[i] ?? "";
    if (action.turn !== 0) {
      const key = point.map((v) => v.toFixed(1)).join(" ");
      const ring = rings.get(key) ?? 0;
      rings.set(key, ring + 1);
      const turn = action.turn * sense > 0 ? 1 : -1;
      scenes = merge(scenes, coupleArrow(point, turn, text, taken, pen, 15 + ring * 9));
      return;
    }
    const force: Pt = [action.direction[0] * sense, action.direction[1] * sense];
    scenes = merge(scenes, forceArrow(point, force, arrowLength(1, 1) - 10, text, taken, pen));
  });
  return scenes;
}

const isSought = (spec: FreeBodyFigure, action: Action): boolean =>
  "force" in action.source && (spec.sought ?? []).includes(action.source.force);

/** The point moments are taken about, as a small cross in a ring. */
function pole(spec: FreeBodyFigure, scale: Scale): Scene {
  if (!spec.about) return scene([]);
  const [x, y] = scale.page(spec.about.x, spec.about.y);
  const pen = { ...PENS.dimension, width: 1.4, colour: ACCENT };
  return scene([line([x - 8, y - 8], [x + 8, y + 8], pen), line([x - 8, y + 8], [x + 8, y - 8], pen)]);
}

function worldOf(spec: FreeBodyFigure): readonly Pt[] {
  const flat: Scale = { k: 1, width: 0, page: (x, y) => [x, y] };
  const ends = spec.body.pieces.flatMap((p) => {
    const on = memberLine(spec.structure, p.member, flat);
    return [on.world(p.begin), on.world(p.end)];
  });
  const joints = spec.body.joints.map((name): Pt => {
    const joint = jointOf(spec.structure, name);
    return [joint.x, joint.y];
  });
  return [...ends, ...joints, ...spec.body.actions.map((a): Pt => [a.at.x, a.at.y])];
}

/** Layout of a free-body figure. */
export function freeBodyPanel(spec: FreeBodyFigure): Laid {
  const { structure, body } = spec;
  if (spec.texts.length !== body.actions.length) {
    throw new Error(
      `free body "${body.name}": ${spec.texts.length} texts for ${body.actions.length} actions; one text each is wanted`,
    );
  }
  return fitted(
    worldOf(spec),
    (scale) => {
      const pieces = scene(
        body.pieces.map((p) => {
          const on = memberLine(structure, p.member, scale);
          return line(on.page(p.begin), on.page(p.end), PENS.member);
        }),
      );
      const under = merge(pieces, bands(spec, scale));
      const cuts = cutPoints(spec, scale);
      const drawn = merge(
        under,
        actions(spec, scale, merge(under, { ...cuts, labels: [] })),
        pole(spec, scale),
        cuts,
      );
      return dimensioned(spec.dimensions ?? [], scale, drawn);
    },
    TALLEST,
  );
}
