// Placing a hinge in a member, and what to say about the place.

import { type MemberLoads, memberLoads } from "../results/index.ts";
import {
  type Along,
  axisOf,
  type HingeAt,
  type Load,
  memberNamed,
  metresAlong,
  readPlace,
  type Sources,
  type Structure,
  snapToEnds,
} from "../structure/index.ts";
import { endHolds } from "./end-holds.ts";
import type { KnownEnds } from "./end-moments.ts";
import { InflectionError } from "./faults.ts";
import { type End, inflectionPoints, inflectionPointsBeside, type Range } from "./inflection-points.ts";
import { type Judged, knownMoments, rangeOf } from "./member-range.ts";
import { isLoaded } from "./span.ts";

export interface PlacementChoice {
  readonly member: string;
  /** The end joint the hinge is measured from and belongs to. */
  readonly from: string;
  /** Distance from that end: a length, or a part of the member's length such as "0.125 L". */
  readonly at?: Along;
  /** Or the fixities of both ends, 0 free to turn to 1 fixed; the hinge goes to the point of inflection they give. An end whose
   *  moment statics tells, beside an overhang, has that moment whatever its fixity. */
  readonly fixity?: { readonly near: number; readonly far: number };
}

export interface Placement {
  readonly member: string;
  readonly from: string;
  /** m from the joint `from`. */
  readonly distance: number;
  /** m from the member's start. */
  readonly at: number;
  readonly length: number;
  /** Where the point of inflection of the isolated member can lie, m from `from`; absent where its own loads give none. */
  readonly range?: Range;
  /** Whether the hinge lies in the range. */
  readonly inside?: boolean;
  /** End joints whose moment was taken from statics instead of their fixity. */
  readonly known?: readonly string[];
  /** What the distance was made from. */
  readonly sources: Sources;
  /** One sentence: where it is, why there, and how it lies to the range. */
  readonly words: string;
  /** Ready for `withHinges`. */
  readonly hinge: HingeAt;
}

/** A hinge placed by a distance or by end fixity, judged by the range of the isolated span under these loads.
 *  The end at hand counts as anything from free to turn to fixed; so does the far end, unless a support alone decides how it turns.
 *  A member without load across it, under loads that do not push the structure sideways, is judged as turned at its far end
 *  where a support alone holds this one. */
export function placement(structure: Structure, loads: readonly Load[], choice: PlacementChoice): Placement {
  const member = memberNamed(structure, choice.member, "hinge");
  const { length } = axisOf(structure, member);
  const { from } = choice;
  if (from !== member.start && from !== member.end)
    throw new InflectionError({
      kind: "not an end",
      member: member.name,
      joint: from,
      ends: [member.start, member.end],
    });
  if ((choice.at === undefined) === (choice.fixity === undefined))
    throw new InflectionError({ kind: "both or neither", member: member.name });
  const near: End = from === member.start ? "left" : "right";
  const own = memberLoads(structure, loads, member.name);
  const told = choice.fixity === undefined ? undefined : knownMoments(endHolds(structure, loads, member));
  const { distance, sources } = distanceOf(own, choice, near, length, told);
  if (!(distance > 0 && distance < length))
    throw new InflectionError({ kind: "outside", member: member.name, distance, length });
  const judged = rangeOf(structure, loads, member, near, own);
  const inside = judged.range === undefined ? undefined : isInside(distance, judged.range, length);
  const at = near === "left" ? distance : length - distance;
  const known = [
    ...(told?.left === undefined ? [] : [member.start]),
    ...(told?.right === undefined ? [] : [member.end]),
  ];
  const words = wordsOf(choice, known, distance, length, judged, inside);
  const hinge: HingeAt = { member: member.name, from, at: choice.at ?? `${distance} m`, sources };
  const found = {
    member: member.name,
    from,
    distance,
    at,
    length,
    sources,
    ...(known.length === 0 ? {} : { known: Object.freeze(known) }),
    words,
    hinge: Object.freeze(hinge),
  };
  return Object.freeze(
    judged.range === undefined || inside === undefined ? found : { ...found, range: judged.range, inside },
  );
}

function distanceOf(
  own: MemberLoads,
  choice: PlacementChoice,
  near: End,
  length: number,
  told: KnownEnds | undefined,
): { readonly distance: number; readonly sources: Sources } {
  if (choice.at !== undefined) {
    const { place, from } = readPlace(choice.at, `hinge in ${choice.member}`);
    return { distance: snapToEnds(metresAlong(place, length), length), sources: from };
  }
  const { near: rNear = 1, far: rFar = 1 } = choice.fixity ?? {};
  if (told === undefined && !isLoaded(own)) throw new InflectionError({ kind: "unloaded" });
  const points =
    told === undefined
      ? inflectionPoints(own, near === "left" ? { left: rNear, right: rFar } : { left: rFar, right: rNear })
      : inflectionPointsBeside(own, told, told[near] === undefined ? rNear : rFar);
  const point = near === "left" ? points[0] : points[points.length - 1];
  if (point === undefined) throw new InflectionError({ kind: "no inflection", end: choice.from });
  return { distance: near === "left" ? point : length - point, sources: [] };
}

function isInside(distance: number, { least, most }: Range, length: number): boolean {
  return distance >= least - 1e-9 * length && distance <= most + 1e-9 * length;
}

function wordsOf(
  { member, from, fixity }: PlacementChoice,
  known: readonly string[],
  distance: number,
  length: number,
  { range, why }: Judged,
  inside: boolean | undefined,
): string {
  const part = (x: number): string => `${Number((x / length).toPrecision(4))} L`;
  const chosen =
    fixity === undefined
      ? ""
      : `, the point of inflection for end fixities ${fixity.near} at ${from} and ${fixity.far} at the far end${known.map((joint) => `, the moment at ${joint} known by statics`).join("")}`;
  const place = `hinge in ${member} ${Number(distance.toPrecision(4))} m (${part(distance)}) from ${from}${chosen}`;
  if (range === undefined) return `${place}; ${why}`;
  const span = `${range.least === 0 ? "0" : part(range.least)} to ${part(range.most)} (${why})`;
  if (inside) return `${place}; inside the range ${span}`;
  return `${place}; OUTSIDE the range ${span}: right only beside loaded or much longer spans, or where a joint moves`;
}
