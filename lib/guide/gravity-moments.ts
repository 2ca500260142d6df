// End moments of a building frame under gravity by a hand method, joints held against sway.

import {
  checkGravity,
  type EndMomentArray,
  exteriorRestraint,
  hingedBeams,
  isLoaded,
  jointRotations,
  type Net,
  netOf,
  usualPlaces,
} from "../inflection/index.ts";
import { isQuantity, type Quantity } from "../quantity/index.ts";
import { axisOf, calledBy, type StiffnessRatios, withRelativeStiffness } from "../structure/index.ts";
import type { Load, Sources, Structure } from "../structure/types.ts";
import { knownStiffness, type StiffnessOf } from "./stiffness.ts";

/** A part of the span, such as "0.1 L", or one the sheet knows. */
export type SpanPart = `${number} L` | Quantity<"pure number">;

/** Where the hinges of the beams go: at a part of the span from all beam ends, or from outer and inner ends; by common practice
 *  (0.1 L); where the end moments by joint turns put them; or where one restraint formula per joint does. */
export type GravityPlace =
  | SpanPart
  | "common practice"
  | { readonly outer: SpanPart; readonly inner: SpanPart }
  | "relative stiffness"
  | "exterior restraint";

/** The moments of a method: on the net, and how they were come by. */
export interface GravityMoments {
  readonly net: Net;
  readonly ends: EndMomentArray;
  /** Parts of the span, where the hinges of the beams were placed by those. */
  readonly parts?: Parts;
  /** How what the beams leave is shared: "in equal parts", "in proportion to I/h". */
  readonly shared: string;
  /** The method in words. */
  readonly words: string;
  /** What its stiffness came from. */
  readonly from: Sources;
}

export interface Parts {
  readonly outer: number;
  readonly inner: number;
}

/** What was asked for, read: parts of the span with what they came from, or a method. */
export type ReadPlace =
  | { readonly parts: Parts; readonly from: Sources; readonly common: boolean }
  | { readonly method: "relative stiffness" | "exterior restraint" };

/** The place to use, and the one written, which differs where parts were set from outside. */
export interface SetPlace {
  readonly place: ReadPlace;
  /** The parts as written, where others were set from outside. */
  readonly written: ReadPlace;
}

/** Throws on a place that is none, naming what it may be. */
export function readGravityPlace(place: GravityPlace): ReadPlace {
  if (place === "relative stiffness" || place === "exterior restraint") return { method: place };
  if (place === "common practice") {
    const { part } = usualPlaces.tenth;
    return { parts: { outer: part, inner: part }, from: [], common: true };
  }
  const both = isPart(place) ? { outer: place, inner: place } : place;
  const { outer, inner } = (both ?? {}) as { readonly outer?: SpanPart; readonly inner?: SpanPart };
  const [a, b] = [readPart("outer", outer), readPart("inner", inner)];
  return {
    parts: { outer: a.part, inner: b.part },
    from: [...new Set([...a.from, ...b.from])],
    common: false,
  };
}

const isPart = (place: unknown): place is SpanPart => typeof place === "string" || isQuantity(place);

function readPart(
  which: string,
  given: SpanPart | undefined,
): { readonly part: number; readonly from: Sources } {
  const part =
    typeof given === "string" ? Number(/^\s*(\S+)\s+L\s*$/.exec(given)?.[1] ?? Number.NaN) : given?.si;
  if (part === undefined || !(part > 0 && part < 0.5))
    throw new Error(
      `gravity: the place of hinges from ${which} ends is ${JSON.stringify(given) ?? "missing"}; write a part of the span between 0 and 0.5 L such as "0.1 L", ` +
        '{ outer: "0.1 L", inner: "0.2 L" }, "common practice", "relative stiffness" or "exterior restraint"',
    );
  return { part, from: typeof given === "string" || given === undefined ? [] : given.from };
}

/** End moments of all members under gravity loads. Throws on loads that push sideways or act across columns, and on joints
 *  whose beams no column can balance. */
export function gravityMoments(
  frame: Structure,
  loads: readonly Load[],
  read: ReadPlace,
  ratios: StiffnessRatios | undefined,
  find: StiffnessOf,
): GravityMoments {
  if (frame.hinges.length > 0)
    throw new Error(
      `gravity: the frame has hinges of its own (${frame.hinges.map(({ name }) => name).join(", ")}); place the others by sheet.hinges`,
    );
  if ("method" in read) {
    const { structure, words: by, from } = knownStiffness(find, frame, ratios);
    const net = checkedNet(structure, loads);
    const ends = read.method === "relative stiffness" ? jointRotations(net, 1) : exteriorRestraint(net);
    const words =
      read.method === "relative stiffness"
        ? `turns of the joints by slope-deflection, guessed and once corrected, no sway (${by})`
        : `one restraint formula per joint: outer ends keep FEM S/(S + 0.9 k) of the columns' weighted S = Σ EI/h and the beam's k = EI/L (0.5 k in a single bay), no sway (our own constants; ${by})`;
    return balanced({ net, ends, shared: "in proportion to I/L", words, from });
  }
  const stiffness = find(frame, ratios);
  const net = checkedNet(stiffness?.structure ?? evenColumns(frame), loads);
  const ends = hingedBeams(net, read.parts);
  const shared = stiffness === undefined ? "in equal parts" : `in proportion to I/h (${stiffness.words})`;
  const from = stiffness?.from ?? [];
  return balanced({ net, ends, parts: read.parts, shared, words: "two hinges in every beam", from });
}

/** Columns alike in I/h, so that they share in equal parts. */
function evenColumns(frame: Structure): Structure {
  const ratios = frame.members.flatMap((member) => {
    const axis = axisOf(frame, member);
    return calledBy(axis) === "column" ? [[`I of ${member.name}`, axis.length] as const] : [];
  });
  return withRelativeStiffness(frame, Object.fromEntries(ratios));
}

function checkedNet(frame: Structure, loads: readonly Load[]): Net {
  const net = netOf(frame, loads);
  checkGravity(frame, net, loads);
  const loaded = net.members.find(({ column, span }) => column && isLoaded(span));
  if (loaded !== undefined)
    throw new Error(
      `gravity: a load acts across column ${loaded.name}; the method takes loads on beams and forces down, give the other a hinge set of its own`,
    );
  return net;
}

function balanced(found: GravityMoments): GravityMoments {
  const { net, ends } = found;
  const scale = Math.max(1e-3, ...ends.map(Math.abs));
  for (const { name, held, couple, ends: meeting } of net.joints) {
    const own = meeting.length === 0 ? 0 : -couple;
    const sum = meeting.reduce((total, { member, end }) => total + (ends[2 * member + end] ?? 0), own);
    if (!held && Math.abs(sum) > 1e-9 * scale)
      throw new Error(
        `gravity: at joint ${name} the end moments of ${meeting.map(({ member }) => net.members[member]?.name ?? "").join(", ")} do not balance and no column takes the rest; place the hinges of this frame by sheet.hinges`,
      );
  }
  return found;
}
