// Members, joints and hinges of a structure on the page.

import {
  axisOf,
  type Joint,
  jointNamed,
  type Member,
  memberNamed,
  pointOn,
  type Structure,
} from "../structure/index.ts";
import { minus, type Pt, plus, times, unit } from "./geometry.ts";
import type { Scale } from "./scale.ts";
import { disc, type Label, line, merge, PENS, type Pen, type Scene, scene } from "./scene.ts";

export const jointOf = (structure: Structure, name: string): Joint =>
  jointNamed(structure, name, "the figure names joint");

/** A member as it lies on the page. */
export interface MemberLine {
  readonly name: string;
  readonly length: number;
  /** World unit vector from start to end, y up. */
  readonly axis: Pt;
  /** Page unit vector towards the reference fibre. */
  readonly fibre: Pt;
  /** Page point `x` metres from the start. */
  readonly page: (x: number) => Pt;
  /** World point `x` metres from the start. */
  readonly world: (x: number) => Pt;
}

export function memberLine(structure: Structure, name: string, scale: Scale): MemberLine {
  const on = axisOf(structure, memberNamed(structure, name, "what the figure shows"));
  if (!(on.length > 0)) {
    throw new Error(`figure: member "${name}" has length ${on.length} m; more than 0 is wanted`);
  }
  const world = (x: number): Pt => pointOn(on, x);
  // Right-hand side of the walk is (s, -c) with y up, hence (s, c) on the page.
  return {
    name,
    length: on.length,
    axis: [on.c, on.s],
    fibre: [on.s, on.c],
    world,
    page: (x) => scale.page(...world(x)),
  };
}

export const worldPoints = (structure: Structure): Pt[] => structure.joints.map((j): Pt => [j.x, j.y]);

/** A member pinned to its joints at both ends. */
export const isBar = ({ releases }: Member): boolean => releases.start.moment && releases.end.moment;

/** All members as lines of one pen; bars thinner, where the pen is the members' own. */
export function memberLines(structure: Structure, scale: Scale, pen: Pen): Scene {
  return scene(
    structure.members.map((m) => {
      const on = memberLine(structure, m.name, scale);
      const own =
        isBar(m) && pen.width > PENS.bar.width ? { ...PENS.bar, width: Math.min(pen.width, 1.9) } : pen;
      return line(on.page(0), on.page(on.length), own);
    }),
  );
}

/** Page direction away from the members that meet at a joint. */
export function outwardAt(structure: Structure, joint: string, scale: Scale): Pt {
  const own = jointOf(structure, joint);
  const here = scale.page(own.x, own.y);
  const towards = structure.members
    .filter((m) => m.start === joint || m.end === joint)
    .map((m): Pt => {
      const other = jointOf(structure, m.start === joint ? m.end : m.start);
      return unit(minus(scale.page(other.x, other.y), here));
    });
  const sum = towards.reduce((s, t) => plus(s, t), [0, 0] as Pt);
  return unit(times(sum, -1), [0, -1]);
}

const HINGE_RADIUS = 4.6;

export const hingeDisc = (centre: Pt): Scene =>
  scene([disc(centre, HINGE_RADIUS, { ...PENS.load, width: 1.5 }, false)]);

/** Hinges inside members with their names, and released member ends a little off the joint. */
export function hinges(structure: Structure, scale: Scale): Scene {
  const inside = structure.hinges.map((hinge) => {
    const on = memberLine(structure, hinge.member, scale);
    const label: Label = { text: hinge.name, at: on.page(hinge.at), prefer: on.fibre, gap: 8 };
    return merge(hingeDisc(on.page(hinge.at)), scene([], [label]));
  });
  return merge(...inside, releasedEnds(structure, scale), pins(structure, scale));
}

/** Joints at which every member is pinned, as in a truss. */
function pinJoints({ joints, members }: Structure): ReadonlySet<string> {
  const pinnedAt = (m: Member, joint: string): boolean =>
    m.start === joint ? m.releases.start.moment : m.releases.end.moment;
  const meeting = (joint: string): Member[] => members.filter((m) => m.start === joint || m.end === joint);
  const all = joints.filter(({ name }) => {
    const here = meeting(name);
    return here.length > 1 && here.every((m) => pinnedAt(m, name));
  });
  return new Set(all.map(({ name }) => name));
}

/** Joints of bars as small discs. */
function pins(structure: Structure, scale: Scale): Scene {
  const pinned = pinJoints(structure);
  const joints = structure.joints.filter(({ name }) => pinned.has(name));
  return scene(joints.map(({ x, y }) => disc(scale.page(x, y), 3.1, { ...PENS.load, width: 1.2 }, false)));
}

/** Where a member's end passes something less on than its joint would: a ring for the moment, two strokes across the
 *  member for shear, two along it for the axial force. */
function releasedEnds(structure: Structure, scale: Scale): Scene {
  const pinned = pinJoints(structure);
  const at = (member: Member, on: MemberLine, side: "start" | "end"): Scene => {
    const release = member.releases[side];
    const inset = Math.min(9 / scale.k, on.length / 4);
    const place = on.page(side === "start" ? inset : on.length - inset);
    const axis: Pt = [on.axis[0], -on.axis[1]];
    return merge(
      release.moment && !pinned.has(member[side]) ? hingeDisc(place) : scene([]),
      release.shear ? pair(place, axis, on.fibre) : scene([]),
      release.axial ? pair(place, on.fibre, axis) : scene([]),
    );
  };
  return merge(
    ...structure.members.map((member) => {
      const on = memberLine(structure, member.name, scale);
      return merge(at(member, on, "start"), at(member, on, "end"));
    }),
  );
}

/** Two short strokes along `stroke`, side by side along `apart`. */
const pair = (centre: Pt, apart: Pt, stroke: Pt): Scene =>
  scene(
    [-4, 4].map((s) => {
      const middle = plus(centre, times(apart, s));
      return line(plus(middle, times(stroke, -7)), plus(middle, times(stroke, 7)), {
        ...PENS.load,
        width: 1.7,
      });
    }),
  );

/** Names of joints, outside the corner they mark. */
export function jointNames(structure: Structure, scale: Scale, size?: number): Scene {
  const labels = structure.joints.map((joint): Label => {
    const isFixed = structure.supports.some((s) => s.joint === joint.name && s.kind === "fixed");
    return {
      text: joint.name,
      at: scale.page(joint.x, joint.y),
      prefer: outwardAt(structure, joint.name, scale),
      gap: isFixed ? 12 : 7,
      bold: true,
      ...(size === undefined ? {} : { size }),
    };
  });
  return scene([], labels);
}
