// Cross-sections of members: what the stiffness of a structure is made of.

import { type Measure, readMeasure } from "../quantity/index.ts";
import { StructureError } from "./faults.ts";
import { axisOf } from "./geometry.ts";
import { mergeSources } from "./sources.ts";
import type { Member, Section, Sources, Structure } from "./types.ts";

/** A section as the engineer gives it. A bare number is a ratio to a section of 1: forces then come out right,
 *  displacements only relative to each other. `A: "stiff"` is a member that hardly changes its length. */
export interface SectionChoice {
  readonly E: Measure<"force per area"> | number;
  readonly I: Measure<"second moment of area"> | number;
  readonly A: Measure<"area"> | number | "stiff";
  /** Thermal expansion. */
  readonly alpha?: Measure<"per temperature">;
  /** Depth a temperature difference acts over. */
  readonly depth?: Measure<"length">;
}

/** Sections by member, by group of members ("columns"), or for all others ("all"). */
export type Sections = Readonly<Record<string, SectionChoice>>;

/** EA L² / EI of a member called stiff: its shortening changes results by about one part in this. */
const stiffness = 1e8;

/** The same structure with sections: a member takes the section under its own name, else its group's, else that of "all".
 *  Throws on a key that is no member and no group, and on A, I or E that is not more than zero. */
export function withSections(structure: Structure, sections: Sections): Structure {
  checkKeys(structure, sections);
  const read = new Map(Object.keys(sections).map((key) => [key, readSection(sections[key], key)]));
  const members = structure.members.map((member): Member => {
    const found = read.get(member.name) ?? read.get(member.group ?? "") ?? read.get("all");
    if (found === undefined) return member;
    const section = found.stiff ? stiffened(found.section, axisOf(structure, member).length) : found.section;
    return Object.freeze({ ...member, section, from: mergeSources(member.from, found.from) });
  });
  return Object.freeze({ ...structure, members: Object.freeze(members) });
}

function stiffened(section: Section, length: number): Section {
  return Object.freeze({ ...section, A: (stiffness * section.I) / length ** 2 });
}

/** Throws unless A, I and E, and depth and alpha where given, are finite and A, I, E, depth more than zero. */
export function checkSection(section: Section, name: string): void {
  for (const [key, unit] of [
    ["A", "m²"],
    ["I", "m⁴"],
    ["E", "N/m²"],
    ["depth", "m"],
  ] as const) {
    const value = section[key];
    if (value === undefined && key === "depth") continue;
    checkPositive(value ?? Number.NaN, `${key} of ${name}`, unit);
  }
  const { alpha = 0 } = section;
  if (!Number.isFinite(alpha))
    throw new StructureError({ kind: "not finite", what: `alpha of ${name}`, value: alpha });
}

function checkKeys(structure: Structure, sections: Sections): void {
  const names = new Set(structure.members.map((m) => m.name));
  const groups = new Set(structure.members.flatMap((m) => m.group ?? []));
  for (const name of Object.keys(sections))
    if (name !== "all" && !names.has(name) && !groups.has(name))
      throw new StructureError({
        kind: "no such member",
        what: "the section of",
        name,
        known: [...groups, ...names],
      });
}

function readSection(
  choice: SectionChoice | undefined,
  name: string,
): { readonly section: Section; readonly stiff: boolean; readonly from: Sources } {
  const wanted = { E: "force per area", I: "second moment of area", A: "area" } as const;
  const from: Sources[] = [];
  const read = (key: "E" | "I" | "A"): number => {
    const given = choice?.[key];
    if (given === undefined) throw missing(name, key);
    if (typeof given === "number") return given;
    const measure = readMeasure(given as Measure<"area">, wanted[key] as "area", `${key} of ${name}`);
    from.push(measure.from);
    return measure.si;
  };
  const stiff = choice?.A === "stiff";
  const [E, I] = [read("E"), read("I")];
  const A = stiff ? I : read("A");
  const alpha =
    choice?.alpha === undefined
      ? undefined
      : readMeasure(choice.alpha, "per temperature", `alpha of ${name}`);
  const depth =
    choice?.depth === undefined ? undefined : readMeasure(choice.depth, "length", `depth of ${name}`);
  const section: Section = Object.freeze({
    A,
    I,
    E,
    ...(alpha === undefined ? {} : { alpha: alpha.si }),
    ...(depth === undefined ? {} : { depth: depth.si }),
  });
  checkSection(section, name);
  return { section, stiff, from: mergeSources(...from, alpha?.from ?? [], depth?.from ?? []) };
}

function missing(member: string, key: "E" | "I" | "A"): StructureError {
  const examples = {
    E: 'give E: "210 GPa", or E: 1 when ratios will do',
    I: 'give I: "8360 cm^4", or a ratio such as I: 2',
    A: 'give A: "53.8 cm^2", or A: "stiff" for a member that hardly changes its length',
  };
  return new StructureError({ kind: "no section", member, missing: key, why: examples[key] });
}

function checkPositive(value: number, what: string, unit: string): void {
  if (!Number.isFinite(value)) throw new StructureError({ kind: "not finite", what, value });
  if (!(value > 0)) throw new StructureError({ kind: "not positive", what, value, unit });
}
