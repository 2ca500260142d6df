// What is not yet known about a frame: stiffnesses as multiples of their nominal values, and the restraint of its bases.

import type { Structure } from "../structure/index.ts";
import { AccuracyError } from "./faults.ts";
import { matters } from "./matters.ts";

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
  /** Members that have a stated ratio to these: their I, or A, goes along. */
  readonly along?: readonly string[];
  /** What was stated as a ratio, to another group or to the plain nominal value; for the words. */
  readonly ratio?: StatedRatio;
  /** Nobody stated it. */
  readonly byDefault?: true;
}

export interface StatedRatio {
  /** The other group. */
  readonly to?: string;
  /** The ratio at a multiple of 1. */
  readonly nominal: number;
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

/** The plain default. Forces depend on ratios only, so the I of the first group that bends (or of `reference`) is the measure of the
 *  others, of bars alone the A; the others' is within the factor of the nominal ratio to it, and the A of every group within the factor of
 *  its own. What cannot matter is left out (see `matters`). Bases are as given. */
export function defaultUnknowns(
  structure: Structure,
  { factor = 2, reference }: { readonly factor?: number; readonly reference?: string } = {},
): Unknowns {
  const range = within(factor);
  if (!(factor >= 1) || !Number.isFinite(factor))
    throw new AccuracyError({ kind: "bad range", what: "every I and A", ...range });
  const names = groupNames(structure);
  if (reference !== undefined && !names.includes(reference))
    throw new AccuracyError({ kind: "no such group", group: reference, known: names });
  const worth = names.map((group) => matters(structure, membersOf(structure, { group })));
  const measured = worth.some((w) => w.I) ? "I" : "A";
  const first = reference ?? names.find((_, i) => worth[i]?.[measured]);
  const groups = names.map((group, i): GroupUnknown => {
    const varies = (kind: "I" | "A"): boolean =>
      worth[i]?.[kind] === true && !(kind === measured && group === first);
    const ranges = { ...(varies("I") ? { I: range } : {}), ...(varies("A") ? { A: range } : {}) };
    return Object.freeze({ group, ...ranges });
  });
  return Object.freeze({
    groups: Object.freeze(groups.filter((g) => g.I !== undefined || g.A !== undefined)),
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
  readonly ratio?: StatedRatio;
  readonly byDefault?: true;
}

/** The unknowns one by one; those whose range is a single nominal value are left out. Throws on ranges that are none and on
 *  members varied twice. */
export function eachUnknown(structure: Structure, { groups, bases }: Unknowns): readonly Unknown[] {
  const stiff = groups.flatMap((group) => {
    const { ratio, byDefault, along = [] } = group;
    const members = membersOf(structure, group);
    const led = along.length === 0 ? [] : membersOf(structure, { group: group.group, members: along });
    return (["I", "A"] as const).flatMap((kind): (Unknown & { readonly led: readonly number[] })[] => {
      const range = group[kind];
      if (range === undefined) return [];
      const name = `${kind} of ${group.group}${ratio?.to === undefined ? "" : ` / ${kind} of ${ratio.to}`}`;
      checkMultiple(name, range);
      if (range.least === 1 && range.most === 1) return [];
      const said = {
        ...(ratio === undefined ? {} : { ratio }),
        ...(byDefault === undefined ? {} : { byDefault }),
      };
      return [{ name, kind, ...range, members, joints: [], led, ...said }];
    });
  });
  const restraint = bases.map(({ joints, fixity }): Unknown => {
    const { least, most } = fixity;
    if (!(least >= 0 && most <= 1 && least <= most))
      throw new AccuracyError({ kind: "bad fixity", joint: joints.join(", "), least, most });
    return { name: `fixity of ${joints.join(", ")}`, kind: "fixity", least, most, members: [], joints };
  });
  checkOnce(structure, stiff);
  const varied = stiff.map(({ led, ...u }): Unknown => ({ ...u, members: [...u.members, ...led] }));
  return Object.freeze([...varied, ...restraint]);
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

/** Places of the unknowns that have a range. */
export function freeOf(unknowns: readonly Unknown[]): readonly number[] {
  return unknowns.flatMap(({ least, most }, k) => (least < most ? [k] : []));
}

/** Values of the unknowns at a corner: a bit per place in `free`, 1 at its most. */
export function atCorner(
  unknowns: readonly Unknown[],
  free: readonly number[],
  corner: bigint,
): Float64Array {
  const values = Float64Array.from(unknowns, (u) => u.least);
  free.forEach((k, bit) => {
    if ((corner >> BigInt(bit)) & 1n) values[k] = unknowns[k]?.most ?? Number.NaN;
  });
  return values;
}
