// Where pushes act, and how their lever arms change with the coordinates of joints and the places of hinges.
//
// A gradient holds the change of a number per metre of each coordinate, by key: "x A", "y A" for joints, "at h1" for the
// place of a hinge along its member, "on 2" for the places of load 2. What a lever arm stands on are the keys left when everything that cancels has cancelled:
// the arm between two points of one column does not stand on the span.

import { axisOf, byName, type Hinge, memberNamed, type Structure } from "../structure/index.ts";

export type Gradient = ReadonlyMap<string, number>;

/** A place along a member: a part of its length, metres measured from its start or from its end (`metres` from the start
 *  in both cases; `load` names the place of a load: "2 begin"), or a hinge. */
export type Stop =
  | { readonly part: number }
  | { readonly from: "start" | "end"; readonly metres: number; readonly load?: string }
  | { readonly hinge: string };

/** What the point where something acts stands on. */
export type Place =
  | { readonly joint: string }
  | {
      readonly member: string;
      readonly at: readonly { readonly stop: Stop; readonly weight: number }[];
    }
  | { readonly lines: readonly [Line, Line] };

/** A line of action: a point, its direction, and the member the direction goes with. */
export interface Line {
  readonly x: number;
  readonly y: number;
  readonly direction: readonly [number, number];
  readonly place: Place;
  readonly member?: string;
}

const still: Gradient = new Map();

/** Sum of gradients times factors. */
export function weighted(...parts: readonly (readonly [factor: number, of: Gradient])[]): Gradient {
  const total = new Map<string, number>();
  for (const [factor, of] of parts)
    if (factor !== 0) for (const [key, value] of of) total.set(key, (total.get(key) ?? 0) + factor * value);
  return total;
}

/** Change of both coordinates of a place. */
export function ofPlace(structure: Structure, place: Place): readonly [x: Gradient, y: Gradient] {
  if ("joint" in place) return [new Map([[`x ${place.joint}`, 1]]), new Map([[`y ${place.joint}`, 1]])];
  if ("lines" in place) return ofMeeting(structure, place.lines);
  const axis = axisOf(structure, memberNamed(structure, place.member, "place"));
  const [x, y] = ofPlace(structure, { joint: axis.start.name });
  const along = weighted(
    ...place.at.map(({ stop, weight }) => [weight, ofStop(structure, place.member, stop)] as const),
  );
  const a = place.at.reduce(
    (sum, { stop, weight }) => sum + weight * metresTo(structure, place.member, stop),
    0,
  );
  const turn = ofTurn(structure, place.member);
  return [
    weighted([1, x], [axis.c, along], [-axis.s * a, turn]),
    weighted([1, y], [axis.s, along], [axis.c * a, turn]),
  ];
}

/** Change of a place's distance from its member's start. */
export function ofStop(structure: Structure, member: string, stop: Stop): Gradient {
  if ("part" in stop) return weighted([stop.part, ofLength(structure, member)]);
  if ("from" in stop) {
    const own = stop.load === undefined ? still : new Map([[`on ${stop.load}`, 1]]);
    return stop.from === "start" ? own : weighted([1, own], [1, ofLength(structure, member)]);
  }
  return weighted(
    [1, ofStop(structure, member, hingeStop(hingeOf(structure, stop.hinge)))],
    [1, new Map([[`at ${stop.hinge}`, 1]])],
  );
}

/** Change of the angle of a member, rad per metre. */
export function ofTurn(structure: Structure, member: string): Gradient {
  const { start, end, length, c, s } = axisOf(structure, memberNamed(structure, member, "direction"));
  return new Map([
    [`x ${start.name}`, s / length],
    [`y ${start.name}`, -c / length],
    [`x ${end.name}`, -s / length],
    [`y ${end.name}`, c / length],
  ]);
}

/** Change of a member's length, or of its projection on the horizontal or the vertical. */
export function ofLength(structure: Structure, member: string, per?: "horizontal" | "vertical"): Gradient {
  const { start, end, c, s } = axisOf(structure, memberNamed(structure, member, "length"));
  const [kx, ky] = per === undefined ? [c, s] : per === "horizontal" ? [Math.sign(c), 0] : [0, Math.sign(s)];
  return new Map([
    [`x ${start.name}`, -kx],
    [`y ${start.name}`, -ky],
    [`x ${end.name}`, kx],
    [`y ${end.name}`, ky],
  ]);
}

/** How a hinge was placed. */
function hingeStop({ part, fromEnd, at }: Hinge): Stop {
  if (part !== undefined) return { part };
  return { from: fromEnd === true ? "end" : "start", metres: at };
}

function hingeOf({ hinges }: Structure, name: string): Hinge {
  const found = byName(hinges).get(name);
  if (found === undefined) throw new Error(`no hinge ${name}`);
  return found;
}

/** Metres from the member's start. */
function metresTo(structure: Structure, member: string, stop: Stop): number {
  if ("hinge" in stop) return hingeOf(structure, stop.hinge).at;
  if ("from" in stop) return stop.metres;
  return stop.part * axisOf(structure, memberNamed(structure, member, "place")).length;
}

/** p = p1 + t d1 with t = (p2 - p1) x d2 / d1 x d2. */
function ofMeeting(structure: Structure, [one, other]: readonly [Line, Line]): readonly [Gradient, Gradient] {
  const cross = one.direction[0] * other.direction[1] - one.direction[1] * other.direction[0];
  const [rx, ry] = [other.x - one.x, other.y - one.y];
  const t = (rx * other.direction[1] - ry * other.direction[0]) / cross;
  const [x1, y1] = ofPlace(structure, one.place);
  const [x2, y2] = ofPlace(structure, other.place);
  const turn1 = one.member === undefined ? still : ofTurn(structure, one.member);
  const turn2 = other.member === undefined ? still : ofTurn(structure, other.member);
  const dot = one.direction[0] * other.direction[0] + one.direction[1] * other.direction[1];
  // d2 turns: r x d2 changes by r . d2 and d1 x d2 by d1 . d2; d1 turns: d1 x d2 changes by -d1 . d2
  const along = rx * other.direction[0] + ry * other.direction[1];
  const change = weighted(
    [other.direction[1] / cross, x2],
    [-other.direction[1] / cross, x1],
    [-other.direction[0] / cross, y2],
    [other.direction[0] / cross, y1],
    [(along - t * dot) / cross, turn2],
    [(t * dot) / cross, turn1],
  );
  return [
    weighted([1, x1], [one.direction[0], change], [-t * one.direction[1], turn1]),
    weighted([1, y1], [one.direction[1], change], [t * one.direction[0], turn1]),
  ];
}
