// Joint names where the engineer gives none.

import { StructureError } from "./faults.ts";

/** A, B, C ... Z, A1, B1 ... or the names given, one per joint. */
export function jointNames(count: number, given: readonly string[] | undefined): readonly string[] {
  if (given !== undefined && given.length !== count)
    throw new StructureError({ kind: "wrong number", what: "names", wanted: count, got: given.length });
  return given ?? Array.from({ length: count }, (_, i) => letter(i));
}

function letter(i: number): string {
  const round = Math.floor(i / 26);
  return String.fromCharCode(65 + (i % 26)) + (round === 0 ? "" : String(round));
}
