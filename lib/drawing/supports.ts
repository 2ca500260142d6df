// Supports: what holds the structure, told apart by outline alone. Held turns are a thick plate, held displacements stand
// on hatched ground, free ones roll on wheels, springs are zigzags and spirals.

import type { Structure, Support } from "../structure/index.ts";
import { along, type Pt, plus, type Segment, times, turned } from "./geometry.ts";
import { jointOf, outwardAt } from "./members.ts";
import type { Scale } from "./scale.ts";
import { disc, line, merge, PENS, polygon, polyline, type Scene, scene, strokes } from "./scene.ts";

const HALF = 9;
const DEEP = 13;
const WIDE = 13;
const PLATE = { ...PENS.member, width: 2.4 };

const acrossOf = (out: Pt): Pt => [-out[1], out[0]];

/** A ground line across `out` at `centre`, with short ticks on its far side. */
function ground(centre: Pt, out: Pt, wide = WIDE): Scene {
  const across = acrossOf(out);
  const a = along(centre, across, -wide);
  const b = along(centre, across, wide);
  const marks = wide === WIDE ? [-9, -3, 3, 9] : [-3, 3];
  const ticks = marks.map((s): Segment => {
    const foot = along(centre, across, s + 3);
    return [foot, plus(foot, plus(times(out, 5), times(across, -5)))];
  });
  return scene([line(a, b, PENS.ground), strokes(ticks, PENS.ground)]);
}

const triangle = (point: Pt, out: Pt, deep: number): Scene => {
  const foot = along(point, out, deep);
  const across = acrossOf(out);
  return scene([polygon([point, along(foot, across, HALF), along(foot, across, -HALF)], PENS.ground, false)]);
};

const wheels = (centre: Pt, out: Pt): Scene =>
  scene([-5, 5].map((s) => disc(along(centre, acrossOf(out), s), 2.6, PENS.ground, false)));

const plate = (centre: Pt, out: Pt): Scene =>
  scene([line(along(centre, acrossOf(out), -WIDE), along(centre, acrossOf(out), WIDE), PLATE)]);

const pinned = (point: Pt, out: Pt): Scene =>
  merge(triangle(point, out, DEEP), ground(along(point, out, DEEP), out));

const roller = (point: Pt, out: Pt): Scene =>
  merge(
    triangle(point, out, DEEP - 2),
    wheels(along(point, out, DEEP + 1), out),
    ground(along(point, out, DEEP + 4), out),
  );

const fixed = (point: Pt, out: Pt): Scene => merge(plate(point, out), ground(point, out));

/** Held against turning and along `out`, free across it. */
const guided = (point: Pt, out: Pt): Scene =>
  merge(
    plate(along(point, out, 1), out),
    wheels(along(point, out, 5), out),
    ground(along(point, out, 8), out),
  );

/** Held against turning only: a plate that rolls both ways. */
const turnHeld = (point: Pt, out: Pt): Scene => {
  const sideways = acrossOf(out);
  const corner = along(along(point, out, 13), sideways, -WIDE - 1);
  return merge(
    plate(along(point, out, 1), out),
    wheels(along(point, out, 5), out),
    scene([line(along(corner, sideways, 0), along(corner, sideways, 2 * WIDE + 2), PENS.ground)]),
    wheels(along(point, out, 16), out),
    ground(along(point, out, 19), out),
  );
};

/** A zigzag along `out` with its foot on the ground. */
function spring(point: Pt, out: Pt): Scene {
  const across = acrossOf(out);
  const turns = [0, 1, 2, 3, 4, 5].map((i) =>
    along(along(point, out, 7 + i * 2.6), across, i % 2 === 0 ? -5 : 5),
  );
  const end = along(point, out, 24);
  const points = [point, along(point, out, 5), ...turns, along(point, out, 22), end];
  return merge(scene([polyline(points, PENS.ground)]), ground(end, out, 7));
}

/** A spiral about the joint, its outer end on the ground. */
function turningSpring(point: Pt, out: Pt): Scene {
  const start = Math.atan2(out[1], out[0]);
  const spiral = Array.from({ length: 29 }, (_, i): Pt => {
    const t = i / 28;
    return plus(point, turned([2 + 10 * t, 0], start + 2 * Math.PI * (1.75 * t + 0.25)));
  });
  const end = spiral.at(-1) ?? point;
  return merge(scene([polyline(spiral, PENS.ground)]), ground(end, out, 7));
}

/** The support's own x and y on the page; y downwards, where a reaction pushes from. */
function axes({ angle = 0 }: Support): { readonly x: Pt; readonly down: Pt } {
  return { x: turned([1, 0], -angle), down: turned([0, 1], -angle) };
}

function held(support: Support, point: Pt, outward: Pt): Scene {
  const { holds } = support;
  const { x, down } = axes(support);
  const sideways = outward[0] * x[0] + outward[1] * x[1] > 0 ? x : times(x, -1);
  const straight = outward[0] * down[0] + outward[1] * down[1] >= -0.5 ? down : times(down, -1);
  if (holds.rotation) {
    if (holds.x && holds.y) return fixed(point, support.angle === undefined ? outward : straight);
    if (holds.y) return guided(point, straight);
    return holds.x ? guided(point, sideways) : turnHeld(point, straight);
  }
  if (holds.x && holds.y) return pinned(point, down);
  if (holds.y) return roller(point, down);
  return holds.x ? roller(point, sideways) : scene([]);
}

function springs(support: Support, point: Pt, outward: Pt): Scene {
  const { x, down } = axes(support);
  const sideways = outward[0] * x[0] + outward[1] * x[1] > 0 ? x : times(x, -1);
  const { x: kx = 0, y: ky = 0, rotation: kr = 0 } = support.springs ?? {};
  return merge(
    kx > 0 && !support.holds.x ? spring(point, sideways) : scene([]),
    ky > 0 && !support.holds.y ? spring(point, down) : scene([]),
    kr > 0 && !support.holds.rotation
      ? turningSpring(point, support.holds.y ? times(down, -1) : down)
      : scene([]),
  );
}

/** All supports of a structure. */
export function supports(structure: Structure, scale: Scale): Scene {
  return merge(
    ...structure.supports.map((support) => {
      const joint = jointOf(structure, support.joint);
      const point = scale.page(joint.x, joint.y);
      const outward = outwardAt(structure, support.joint, scale);
      return merge(held(support, point, outward), springs(support, point, outward));
    }),
  );
}
