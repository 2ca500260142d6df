// What is not yet known about a frame: stiffnesses as multiples of their nominal values, and the restraint of its bases.

import type { Structure } from "../structure/index.ts";
import { AccuracyError } from "./faults.ts";

/** From `least` to `most`. */
export interface Between {
  readonly least: number;
  readonly most: number;
}

/** A group of members whose I and A are known only as multiples of the nominal values: one multiple for all of them.
 *  What is absent is as given. */
export interface GroupUnknown {
  /** The group, or a member, by name. */
  readonly group: string;
  /** Which members it is, when the name stands for something else than a group or a member of the structure. */
  readonly members?: readonly string[];
  readonly I?: Between;
  readonly A?: Between;
}

/** Bases whose restraint is known only within a range of fixities, one fixity for all of them: 0 free to turn, 1 fixed.
 *  The base is then a rotational spring k with fixity k / (k + 3EI/L), EI and L those of the members that stand on it. */
export interface BaseUnknown {
  readonly joints: readonly string[];
  readonly fixity: Between;
}

export interface Unknowns {
  readonly groups: readonly GroupUnknown[];
  readonly bases: readonly BaseUnknown[];
}

/** Within a factor either way: 2 means a half to twice. */
export function within(factor: number): Between {
  return Object.freeze({ least: 1 / factor, most: factor });
}

/** The plain default. Forces depend on ratios only, so the I of the first group (or of `reference`) is the measure of the
 *  others; theirs are within the factor of the nominal ratio to it, and the A of every group within the factor of its own.
 *  Bases are as given. */
export function defaultUnknowns(
  structure: Structure,
  { factor = 2, reference }: { readonly factor?: number; readonly reference?: string } = {},
): Unknowns {
  const range = within(factor);
  if (!(factor >= 1) || !Number.isFinite(factor))
    throw new AccuracyError({ kind: "bad range", what: "every I and A", ...range });
  const names = groupNames(structure);
  const first = reference ?? names[0];
  if (reference !== undefined && !names.includes(reference))
    throw new AccuracyError({ kind: "no such group", group: reference, known: names });
  return Object.freeze({
    groups: Object.freeze(
      names.map((group) =>
        Object.freeze(group === first ? { group, A: range } : { group, I: range, A: range }),
      ),
    ),
    bases: Object.freeze([]),
  });
}

/** Groups of a structure in the order of its members; a member without group is one by itself. */
export function groupNames(structure: Structure): readonly string[] {
  return [...new Set(structure.members.map((m) => m.group ?? m.name))];
}

/** Indices of the members an unknown is about. */
export function membersOf(structure: Structure, { group, members }: GroupUnknown): readonly number[] {
  const indices = structure.members.flatMap((m, i) => {
    const meant = members === undefined ? m.group === group || m.name === group : members.includes(m.name);
    return meant ? [i] : [];
  });
  const missing = members?.find((name) => !structure.members.some((m) => m.name === name));
  if (missing !== undefined || indices.length === 0)
    throw new AccuracyError({
      kind: "no such group",
      group: missing ?? group,
      known: [...new Set([...groupNames(structure), ...structure.members.map((m) => m.name)])],
    });
  return indices;
}

/** One number that is not known. `I` and `A` are multiples of the nominal value of all `members` at once, drawn so that equal
 *  ratios are equally likely; a `fixity` is that of all `joints`, all values equally likely. */
export interface Unknown {
  readonly name: string;
  readonly kind: "I" | "A" | "fixity";
  readonly least: number;
  readonly most: number;
  readonly members: readonly number[];
  readonly joints: readonly string[];
}

/** The unknowns one by one; those whose range is a single nominal value are left out. Throws on ranges that are none and on
 *  members varied twice. */
export function eachUnknown(structure: Structure, { groups, bases }: Unknowns): readonly Unknown[] {
  const stiff = groups.flatMap((group) => {
    const members = membersOf(structure, group);
    return (["I", "A"] as const).flatMap((kind): Unknown[] => {
      const range = group[kind];
      if (range === undefined) return [];
      const name = `${kind} of ${group.group}`;
      checkMultiple(name, range);
      return range.least === 1 && range.most === 1 ? [] : [{ name, kind, ...range, members, joints: [] }];
    });
  });
  const restraint = bases.map(({ joints, fixity }): Unknown => {
    const { least, most } = fixity;
    if (!(least >= 0 && most <= 1 && least <= most))
      throw new AccuracyError({ kind: "bad fixity", joint: joints.join(", "), least, most });
    return { name: `fixity of ${joints.join(", ")}`, kind: "fixity", least, most, members: [], joints };
  });
  checkOnce(structure, stiff);
  return Object.freeze([...stiff, ...restraint]);
}

function checkMultiple(what: string, { least, most }: Between): void {
  if (!(least > 0 && least <= most && Number.isFinite(most)))
    throw new AccuracyError({ kind: "bad range", what, least, most });
}

function checkOnce(structure: Structure, unknowns: readonly Unknown[]): void {
  const seen = new Set<string>();
  for (const { kind, members } of unknowns)
    for (const i of members) {
      const key = `${kind} ${i}`;
      if (seen.has(key))
        throw new AccuracyError({
          kind: "varied twice",
          member: structure.members[i]?.name ?? "",
          what: kind,
        });
      seen.add(key);
    }
}

/** Value of an unknown at t in 0..1 of its law: even in the logarithm for multiples, even for fixities. */
export function valueAtPart({ kind, least, most }: Unknown, t: number): number {
  return kind === "fixity" ? least + (most - least) * t : least * (most / least) ** t;
}
