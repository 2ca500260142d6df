// One body cut free, with every action on it.

import type { Action } from "../results/index.ts";
import type { Member, Structure } from "../structure/index.ts";
import { bands, senseOf } from "./body-loads.ts";
import { dimensioned } from "./dimensions.ts";
import { coupleArrow, forceArrow } from "./forces.ts";
import { along, type Pt, type Segment, times } from "./geometry.ts";
import { hingeDisc, isBar, jointOf, memberLine, outwardAt } from "./members.ts";
import { BODY_WIDTH, fitted, type Laid, type Scale } from "./scale.ts";
import {
  ACCENT,
  blocksOf,
  disc,
  type Label,
  line,
  merge,
  PENS,
  type Pen,
  type Scene,
  scene,
} from "./scene.ts";
import type { FreeBodyFigure } from "./spec.ts";

const TALLEST = 150;
const ARROW = 36;

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

/** Length of the stub of a member cut round a joint that stands alone. */
const STUB = 40;

/** Where an action is drawn: at the joint or place it acts on; the forces of a cut member ("BC_B_N") at the end of the
 *  stub that is left of it, so that those of different members stand apart. */
function placeOf(spec: FreeBodyFigure, action: Action, scale: Scale): Pt {
  const point = scale.page(action.at.x, action.at.y);
  const { structure, body } = spec;
  if (body.pieces.length > 0 || !("force" in action.source)) return point;
  const { force } = action.source;
  for (const joint of body.joints) {
    const cut = structure.members.find(
      (m) => (m.start === joint || m.end === joint) && force.startsWith(`${m.name}_${joint}_`),
    );
    if (cut) return along(point, stubDirection(structure, cut, joint), STUB);
  }
  return point;
}

/** Page direction of a member from its joint. */
function stubDirection(structure: Structure, member: Member, joint: string): Pt {
  const on = memberLine(structure, member.name, { k: 1, width: 0, page: (x, y) => [x, -y] });
  return times([on.axis[0], -on.axis[1]], member.start === joint ? 1 : -1);
}

const pointKey = (point: Pt): string => point.map((v) => v.toFixed(1)).join(" ");

/** Radii of the turning arrows at one point; forces there begin outside the last. */
const ringRadius = (spec: FreeBodyFigure, ring: number): number =>
  (spec.body.pieces.length === 0 ? 11 : 15) + ring * 10;

/** Couples first, then the forces around them: reactions, hinge forces, cuts, point loads. */
function actions(spec: FreeBodyFigure, scale: Scale, drawn: Scene): Scene {
  let scenes: Scene = scene([]);
  const taken = (): Segment[] => [...blocksOf(drawn), ...blocksOf(scenes)];
  const rings = new Map<string, number>();
  const shown = spec.body.actions
    .map((action, i) => ({ action, text: spec.texts[i] ?? "" }))
    .filter(
      ({ action }) => !("load" in action.source && spec.loads[action.source.load]?.kind === "distributed"),
    );
  for (const { action, text } of shown) {
    if (action.turn === 0) continue;
    const point = placeOf(spec, action, scale);
    const ring = rings.get(pointKey(point)) ?? 0;
    rings.set(pointKey(point), ring + 1);
    const turn = action.turn * senseOf(action) > 0 ? 1 : -1;
    const radius = ringRadius(spec, ring);
    scenes = merge(scenes, coupleArrow(point, turn, text, taken(), penOf(spec, action), radius));
  }
  for (const { action, text } of shown) {
    if (action.turn !== 0) continue;
    const force: Pt = [action.direction[0] * senseOf(action), action.direction[1] * senseOf(action)];
    const point = placeOf(spec, action, scale);
    const ring = rings.get(pointKey(point));
    const gap = ring === undefined ? 5 : ringRadius(spec, ring - 1) + 6;
    scenes = merge(
      scenes,
      forceArrow(
        point,
        force,
        spec.body.pieces.length === 0 ? 28 : ARROW,
        text,
        taken(),
        penOf(spec, action),
        gap,
      ),
    );
  }
  return scenes;
}

/** Short ends of the members cut round a joint that stands alone. */
function stubs(spec: FreeBodyFigure, scale: Scale): Scene {
  const { structure, body } = spec;
  if (body.pieces.length > 0) return scene([]);
  return scene(
    body.joints.flatMap((name) => {
      const joint = jointOf(structure, name);
      const here = scale.page(joint.x, joint.y);
      return structure.members
        .filter((m) => m.start === name || m.end === name)
        .map((m) =>
          line(here, along(here, stubDirection(structure, m, name), STUB), isBar(m) ? PENS.bar : PENS.member),
        );
    }),
  );
}

const penOf = (spec: FreeBodyFigure, action: Action): Pen =>
  isSought(spec, action) ? PENS.sought : PENS.load;

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
      const under = merge(pieces, stubs(spec, scale), bands(spec, scale));
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
    BODY_WIDTH,
  );
}
