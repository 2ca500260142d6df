// Loads as the engineer gives them. Gravity acts down and is positive; a couple is positive counter-clockwise.
// Line loads are per metre of member unless said otherwise; directions are global (down, up, left, right) or the
// member's own: "across" towards its reference fibre, "along" towards its end.

import { type Measure, type Quantity, readMeasure } from "../quantity/index.ts";
import { StructureError } from "./faults.ts";
import { deepFreeze } from "./freeze.ts";
import { type Along, checkOnSome, checkStretch, readPlace } from "./place.ts";
import { mergeSources } from "./sources.ts";
import type { DistributedLoad, JointLoad, MemberPointLoad, Sources } from "./types.ts";

export type Direction = "down" | "up" | "left" | "right";

/** A direction in the member's own axes. */
export type OwnDirection = "across" | "along";

const unit: Readonly<Record<Direction, readonly [number, number]>> = {
  down: [0, -1],
  up: [0, 1],
  left: [-1, 0],
  right: [1, 0],
};

const ownUnit: Readonly<Record<OwnDirection, readonly [number, number]>> = {
  across: [0, -1],
  along: [1, 0],
};

export interface LineLoadOptions {
  /** Where the load begins, from the member's start; otherwise at the start. */
  readonly from?: Along;
  /** Where it ends, from the member's start; otherwise at the end. */
  readonly to?: Along;
  /** Otherwise down. */
  readonly direction?: Direction | OwnDirection;
  /** Per metre of the member's projection on the horizontal (snow) or the vertical (wind); otherwise of its length. */
  readonly per?: "horizontal" | "vertical";
  /** Text shown in figures; otherwise the intensity as written. */
  readonly label?: string;
}

/** A uniform line load on a member, or on the part of it between `from` and `to`. */
export function uniform(
  member: string,
  w: Measure<"force per length">,
  options: LineLoadOptions = {},
): DistributedLoad {
  const q = readMeasure(w, "force per length", `uniform load on ${member}`);
  return lineLoad(member, [q, q], { label: textOf(w), ...options });
}

/** A uniform line load on part of a member, between two places measured from its start. */
export function partial(
  member: string,
  w: Measure<"force per length">,
  stretch: LineLoadOptions & { readonly from: Along; readonly to: Along },
): DistributedLoad {
  return uniform(member, w, stretch);
}

/** A line load varying linearly from `w1` at its beginning to `w2` at its end. */
export function varying(
  member: string,
  w1: Measure<"force per length">,
  w2: Measure<"force per length">,
  options: LineLoadOptions = {},
): DistributedLoad {
  const q1 = readMeasure(w1, "force per length", `varying load on ${member}, first value`);
  const q2 = readMeasure(w2, "force per length", `varying load on ${member}, second value`);
  return lineLoad(member, [q1, q2], { label: `${textOf(w1)} to ${textOf(w2)}`, ...options });
}

function lineLoad(
  member: string,
  [q1, q2]: readonly [Quantity<"force per length">, Quantity<"force per length">],
  { from, to, direction = "down", per, label = "" }: LineLoadOptions,
): DistributedLoad {
  const begin = readPlace(from ?? "0 L", `beginning of the load on ${member}`);
  const end = readPlace(to ?? "1 L", `end of the load on ${member}`);
  checkStretch(begin.place, end.place, `the load on ${member}${label === "" ? "" : ` (${label})`}`);
  if (per !== undefined) checkProjection(per, member);
  return deepFreeze({
    kind: "distributed",
    member,
    begin: begin.place,
    end: end.place,
    q1: q1.si,
    q2: q2.si,
    ...directed(direction, member),
    ...(per === undefined ? {} : { per }),
    label,
    ...sourcesOf(mergeSources(q1.from, q2.from), mergeSources(begin.from, end.from)),
  });
}

export interface PointOptions {
  /** Where it acts, from the member's start. */
  readonly at: Along;
  readonly label?: string;
}

/** A force on a member, down unless another direction is given. */
export function pointLoad(
  member: string,
  P: Measure<"force">,
  {
    at,
    direction = "down",
    label = textOf(P),
  }: PointOptions & { readonly direction?: Direction | OwnDirection },
): MemberPointLoad {
  const force = readMeasure(P, "force", `point load on ${member}`);
  const place = readPlace(at, `point load on ${member}`);
  checkOnSome(place.place, `the point load on ${member}${label === "" ? "" : ` (${label})`}`);
  const {
    direction: [x, y],
    ...axes
  } = directed(direction, member);
  return deepFreeze({
    kind: "member point",
    member,
    at: place.place,
    fx: x * force.si + 0,
    fy: y * force.si + 0,
    ...axes,
    couple: 0,
    label,
    ...sourcesOf(force.from, place.from),
  });
}

/** A couple on a member, counter-clockwise positive. */
export function coupleLoad(
  member: string,
  C: Measure<"moment">,
  { at, label = textOf(C) }: PointOptions,
): MemberPointLoad {
  const couple = readMeasure(C, "moment", `couple on ${member}`);
  const place = readPlace(at, `couple on ${member}`);
  checkOnSome(place.place, `the couple on ${member}${label === "" ? "" : ` (${label})`}`);
  return deepFreeze({
    kind: "member point",
    member,
    at: place.place,
    fx: 0,
    fy: 0,
    couple: couple.si,
    label,
    ...sourcesOf(couple.from, place.from),
  });
}

export interface JointForces {
  readonly right?: Measure<"force">;
  readonly left?: Measure<"force">;
  readonly down?: Measure<"force">;
  readonly up?: Measure<"force">;
  /** Counter-clockwise positive. */
  readonly couple?: Measure<"moment">;
  readonly label?: string;
}

/** Forces and a couple at a joint. */
export function atJoint(joint: string, forces: JointForces): JointLoad {
  const given = (["right", "left", "up", "down"] as const).flatMap((direction) => {
    const measure = forces[direction];
    return measure === undefined
      ? []
      : [
          {
            measure,
            unit: unit[direction],
            force: readMeasure(measure, "force", `load ${direction} at ${joint}`),
          },
        ];
  });
  const couple =
    forces.couple === undefined ? undefined : readMeasure(forces.couple, "moment", `couple at ${joint}`);
  if (given.length === 0 && couple === undefined)
    throw new StructureError({ kind: "no load", what: `the load at joint ${joint}` });
  const texts = [
    ...given.map((g) => textOf(g.measure)),
    ...(forces.couple === undefined ? [] : [textOf(forces.couple)]),
  ];
  return deepFreeze({
    kind: "joint",
    joint,
    fx: given.reduce((sum, g) => sum + g.unit[0] * g.force.si, 0),
    fy: given.reduce((sum, g) => sum + g.unit[1] * g.force.si, 0),
    couple: couple?.si ?? 0,
    label: forces.label ?? texts.join(", "),
    from: mergeSources(...given.map((g) => g.force.from), couple?.from ?? []),
  });
}

/** Sources of a load, with those of its size apart where its place has some of its own. */
function sourcesOf(size: Sources, place: Sources): { readonly fromSize?: Sources; readonly from: Sources } {
  return place.length === 0 ? { from: size } : { fromSize: size, from: mergeSources(size, place) };
}

function directed(
  direction: Direction | OwnDirection,
  member: string,
): { readonly direction: readonly [number, number]; readonly axes?: "member" } {
  if (Object.hasOwn(unit, direction)) return { direction: unit[direction as Direction] };
  const own = Object.hasOwn(ownUnit, direction) ? ownUnit[direction as OwnDirection] : undefined;
  if (own !== undefined) return { direction: own, axes: "member" };
  throw new StructureError({
    kind: "unknown choice",
    what: `direction of the load on ${member}`,
    value: String(direction),
    choices: [...Object.keys(unit), ...Object.keys(ownUnit)],
  });
}

function checkProjection(per: string, member: string): void {
  if (per !== "horizontal" && per !== "vertical")
    throw new StructureError({
      kind: "unknown choice",
      what: `projection of the load on ${member}`,
      value: per,
      choices: ["horizontal", "vertical"],
    });
}

function textOf(measure: Measure<"force"> | Measure<"force per length"> | Measure<"moment">): string {
  return String(measure);
}
