// A place along a member, written as a length ("1.75 m") or as a part of the member's length ("0.125 L").

import { type Measure, readMeasure } from "../quantity/index.ts";
import { StructureError } from "./faults.ts";
import type { Place, Sources } from "./types.ts";

/** A length, or a part of the member's length L. */
export type Along = Measure<"length"> | `${number} L`;

/** The place a text or quantity stands for, with where it came from. `what` names it in messages. */
export function readPlace(along: Along, what: string): { readonly place: Place; readonly from: Sources } {
  if (typeof along === "string") {
    const match = /^\s*(\S+)\s+L\s*$/.exec(along);
    if (match !== null) return { place: { fraction: finiteNumber(match[1] ?? "", along, what) }, from: [] };
  }
  const length = readMeasure(along as Measure<"length">, "length", what);
  return { place: { metres: length.si }, from: length.from };
}

/** Throws on a place that is on no member however long. */
export function checkOnSome(place: Place, what: string): void {
  const off = "metres" in place ? place.metres < 0 : place.fraction < -1e-9 || place.fraction > 1 + 1e-9;
  if (off) throw new StructureError({ kind: "off member", what, place: placeText(place) });
}

/** Throws on a stretch that ends at its beginning or before it, as far as that shows without the member's length. */
export function checkStretch(begin: Place, end: Place, what: string): void {
  checkOnSome(begin, what);
  checkOnSome(end, what);
  const reversed =
    "metres" in begin && "metres" in end
      ? end.metres <= begin.metres
      : "fraction" in begin && "fraction" in end
        ? end.fraction <= begin.fraction
        : isAt(begin, 1) || isAt(end, 0);
  if (reversed)
    throw new StructureError({ kind: "reversed", what, begin: placeText(begin), end: placeText(end) });
}

const isAt = (place: Place, fraction: 0 | 1): boolean =>
  "fraction" in place ? place.fraction === fraction : fraction === 0 && place.metres === 0;

const placeText = (place: Place): string =>
  "metres" in place ? `${short(place.metres)} m` : `${short(place.fraction)} L`;

const short = (x: number): number => Number(x.toPrecision(6));

function finiteNumber(digits: string, text: string, what: string): number {
  const value = Number(digits);
  if (!Number.isFinite(value)) throw new StructureError({ kind: "place", what, text });
  return value;
}

/** Metres from the member's start. */
export function metresAlong(place: Place, length: number): number {
  return "metres" in place ? place.metres : place.fraction * length;
}

/** A place moved onto the member when it misses an end only by rounding (1e-9 of the length). */
export function snapToEnds(x: number, length: number): number {
  if (Math.abs(x) <= 1e-9 * length) return 0;
  return Math.abs(x - length) <= 1e-9 * length ? length : x;
}
