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
