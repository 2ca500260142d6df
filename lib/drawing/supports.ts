// Supports: what holds the structure, told apart by outline alone.

import type { Structure, Support } from "../structure/index.ts";
import { along, type Pt, plus, type Segment, times } from "./geometry.ts";
import { jointOf, outwardAt } from "./members.ts";
import type { Scale } from "./scale.ts";
import { disc, line, merge, PENS, polygon, type Scene, scene, strokes } from "./scene.ts";

const HALF = 9;
const DEEP = 13;
const WIDE = 13;

/** A ground line across `out` at `centre`, with short ticks on its far side. */
function ground(centre: Pt, out: Pt): Scene {
  const across: Pt = [-out[1], out[0]];
  const a = along(centre, across, -WIDE);
  const b = along(centre, across, WIDE);
  const ticks = [-9, -3, 3, 9].map((s): Segment => {
    const foot = along(centre, across, s + 3);
    return [foot, plus(foot, plus(times(out, 5), times(across, -5)))];
  });
  return scene([line(a, b, PENS.ground), strokes(ticks, PENS.ground)]);
}

function pinned(point: Pt, out: Pt): Scene {
  const across: Pt = [-out[1], out[0]];
  const foot = along(point, out, DEEP);
  const triangle = [point, along(foot, across, HALF), along(foot, across, -HALF)];
  return merge(scene([polygon(triangle, PENS.ground, false)]), ground(foot, out));
}

function roller(point: Pt, out: Pt): Scene {
  const across: Pt = [-out[1], out[0]];
  const foot = along(point, out, DEEP - 2);
  const triangle = [point, along(foot, across, HALF), along(foot, across, -HALF)];
  const wheels = [-5, 5].map((s) => disc(along(along(foot, across, s), out, 3), 2.6, PENS.ground, false));
  return merge(scene([polygon(triangle, PENS.ground, false), ...wheels]), ground(along(foot, out, 6), out));
}

function fixed(point: Pt, out: Pt): Scene {
  const across: Pt = [-out[1], out[0]];
  const wall = line(along(point, across, -WIDE), along(point, across, WIDE), { ...PENS.member, width: 2.4 });
  return merge(scene([wall]), ground(point, out));
}

function one(structure: Structure, support: Support, scale: Scale): Scene {
  const joint = jointOf(structure, support.joint);
  const point = scale.page(joint.x, joint.y);
  const sideways: Pt = outwardAt(structure, support.joint, scale)[0] > 0 ? [1, 0] : [-1, 0];
  const down: Pt = [0, 1];
  switch (support.kind) {
    case "free":
      return scene([]);
    case "fixed":
      return fixed(point, outwardAt(structure, support.joint, scale));
    case "pinned":
      return pinned(point, down);
    case "roller":
      return roller(point, support.holds.x && !support.holds.y ? sideways : down);
  }
}

/** All supports of a structure. */
export function supports(structure: Structure, scale: Scale): Scene {
  return merge(...structure.supports.map((s) => one(structure, s, scale)));
}
