// Hinges put into members where the moment is taken to be zero.

import { StructureError } from "./faults.ts";
import { deepFreeze } from "./freeze.ts";
import { axisOf, memberNamed } from "./geometry.ts";
import { type Along, metresAlong, readPlace, snapToEnds } from "./place.ts";
import { mergeSources } from "./sources.ts";
import type { Hinge, Sources, Structure } from "./types.ts";

/** Where a hinge goes: on `member`, at a distance `at` from its end joint `from`. */
export interface HingeAt {
  readonly member: string;
  readonly from: string;
  readonly at: Along;
  /** Otherwise h1, h2 ... in the order given. */
  readonly name?: string;
  /** Further ledger entries the position stands on. */
  readonly sources?: Sources;
}

/** A new structure with hinges added. Refuses a hinge on an unknown member, outside the open length of its member,
 *  at a joint, twice at one place, and a name already taken. */
export function withHinges(structure: Structure, hinges: readonly HingeAt[]): Structure {
  const all: Hinge[] = [...structure.hinges];
  for (const at of hinges) {
    const hinge = hingeOf(structure, at, at.name ?? nextName(structure, all));
    checkName(structure, all, hinge);
    checkAlone(structure, all, hinge);
    all.push(hinge);
  }
  return deepFreeze({ ...structure, hinges: all });
}

function hingeOf(structure: Structure, { member, from, at, sources = [] }: HingeAt, name: string): Hinge {
  const what = `hinge ${name}`;
  const found = memberNamed(structure, member, what);
  const { length } = axisOf(structure, found);
  if (from !== found.start && from !== found.end)
    throw new StructureError({
      kind: "not on member",
      what,
      joint: from,
      member,
      ends: [found.start, found.end],
    });
  const read = readPlace(at, `${what} on ${member}`);
  const distance = snapToEnds(metresAlong(read.place, length), length);
  if (!(distance >= 0 && distance <= length))
    throw new StructureError({ kind: "outside", what, member, at: distance, length, open: true });
  if (distance === 0 || distance === length) {
    const other = from === found.start ? found.end : found.start;
    throw new StructureError({ kind: "hinge at end", what, member, joint: distance === 0 ? from : other });
  }
  const fromStart = from === found.start;
  return {
    name,
    member,
    at: fromStart ? distance : length - distance,
    ...("fraction" in read.place
      ? { part: fromStart ? read.place.fraction : 1 - read.place.fraction }
      : fromStart
        ? {}
        : { fromEnd: true as const }),
    from: mergeSources(read.from, sources),
  };
}

function nextName(structure: Structure, hinges: readonly Hinge[]): string {
  const taken = new Set([...structure.joints, ...hinges].map((p) => p.name));
  let n = hinges.length + 1;
  while (taken.has(`h${n}`)) n += 1;
  return `h${n}`;
}

function checkName(structure: Structure, hinges: readonly Hinge[], { name }: Hinge): void {
  if (!/^\p{L}[\p{L}\p{N}']*$/u.test(name))
    throw new StructureError({ kind: "bad name", what: "hinge", name });
  if ([...structure.joints, ...hinges].some((p) => p.name === name))
    throw new StructureError({ kind: "name used twice", what: "joint or hinge", name });
}

function checkAlone(structure: Structure, hinges: readonly Hinge[], hinge: Hinge): void {
  const { length } = axisOf(structure, memberNamed(structure, hinge.member, `hinge ${hinge.name}`));
  const twin = hinges.find((h) => h.member === hinge.member && Math.abs(h.at - hinge.at) <= 1e-9 * length);
  if (twin !== undefined)
    throw new StructureError({
      kind: "hinge twice",
      hinges: [twin.name, hinge.name],
      member: hinge.member,
      at: hinge.at,
    });
}
