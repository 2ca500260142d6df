// Stiffness by ratios, before sizes exist: "I of beam / I of columns" is 2.5, all else alike.

import { isQuantity, type Quantity } from "../quantity/index.ts";
import { StructureError } from "./faults.ts";
import { axisOf, calledBy } from "./geometry.ts";
import { withSections } from "./section.ts";
import { mergeSources } from "./sources.ts";
import type { Sources, Structure } from "./types.ts";

/** Ratios of second moments of area by what they are of: "I of beam / I of columns": 2.5, "I of BC / I of AB": 3, or
 *  "I of columns": 0.5 beside an I of 1 of all others. A ratio the sheet knows (sheet.assume) keeps where it came from. */
export type StiffnessRatios = Readonly<Record<string, number | Quantity<"pure number">>>;

/** The same structure with sections of relative stiffness in place of any it has: E = 1, I = 1 but for the ratios, hardly
 *  shortening. Forces by it are right when the ratios are; displacements mean nothing. Throws on a key it cannot read, on
 *  members it does not know or would set twice, and on a ratio that is not more than zero. */
export function withRelativeStiffness(structure: Structure, ratios: StiffnessRatios): Structure {
  const I = new Map(structure.members.map(({ name }) => [name, 1]));
  const from = new Map<string, Sources>();
  for (const { key, of, to, ratio } of inOrder(structure, ratios)) {
    const measure = to === undefined ? 1 : commonI(key, to, I);
    for (const member of of) {
      if (from.has(member)) throw new StructureError({ kind: "ratio twice", key, member });
      from.set(member, ratio.from);
      I.set(member, ratio.value * measure);
    }
  }
  const sections = Object.fromEntries(
    structure.members.map(({ name }) => [name, { E: 1, I: I.get(name) ?? 1, A: "stiff" as const }]),
  );
  const bare = { ...structure, members: structure.members.map(({ section: _, ...member }) => member) };
  const placed = withSections(bare, sections);
  const members = placed.members.map((member) =>
    Object.freeze({ ...member, from: mergeSources(member.from, from.get(member.name) ?? []) }),
  );
  return Object.freeze({ ...placed, members: Object.freeze(members) });
}

/** What the ratios came from. */
export function ratioSources(ratios: StiffnessRatios): Sources {
  return mergeSources(...Object.entries(ratios).map(([key, ratio]) => readRatio(key, ratio).from));
}

/** The members a word stands for: a member by its name, a group ("columns"), or the trade's "beam", "beams", "column",
 *  "columns" for all that lie so. Throws when there are none, naming what there is. */
export function membersCalled(structure: Structure, word: string): readonly string[] {
  const names = (test: (member: Structure["members"][number]) => boolean): readonly string[] =>
    structure.members.filter(test).map(({ name }) => name);
  const own = names(({ name }) => name === word);
  if (own.length > 0) return own;
  const group = names((member) => member.group === word);
  if (group.length > 0) return group;
  const trade = /^(beam|column)s?$/.exec(word)?.[1];
  const lying = names(
    (member) =>
      trade !== undefined &&
      (member.group === `${trade}s` ||
        member.group === trade ||
        calledBy(axisOf(structure, member)) === trade),
  );
  if (lying.length > 0) return lying;
  const groups = new Set(structure.members.flatMap((member) => member.group ?? []));
  const known = [...groups, ...structure.members.map(({ name }) => name)];
  throw new StructureError({ kind: "no such member", what: "the stiffness of", name: word, known });
}

interface ReadRatio {
  readonly key: string;
  readonly of: readonly string[];
  readonly to?: readonly string[];
  readonly ratio: { readonly value: number; readonly from: Sources };
}

/** The ratios so that what one is measured by is settled before it. */
function inOrder(structure: Structure, ratios: StiffnessRatios): readonly ReadRatio[] {
  let left = Object.entries(ratios).map(
    ([key, given]): ReadRatio => ({ key, ...readKey(structure, key), ratio: readRatio(key, given) }),
  );
  const ordered: ReadRatio[] = [];
  while (left.length > 0) {
    const waits = ({ key, to = [] }: ReadRatio): boolean =>
      left.some((other) => other.key !== key && other.of.some((name) => to.includes(name)));
    const ready = left.filter((one) => !waits(one));
    if (ready.length === 0)
      throw new StructureError({ kind: "ratio circle", keys: left.map(({ key }) => key) });
    ordered.push(...ready);
    left = left.filter((one) => !ready.includes(one));
  }
  return ordered;
}

function readKey(
  structure: Structure,
  key: string,
): { readonly of: readonly string[]; readonly to?: readonly string[] } {
  const match = /^\s*I of ([^/]+?)\s*(?:\/\s*I of ([^/]+?)\s*)?$/.exec(key);
  const [, of, to] = match ?? [];
  if (of === undefined) throw new StructureError({ kind: "ratio key", key });
  const members = membersCalled(structure, of);
  return to === undefined ? { of: members } : { of: members, to: membersCalled(structure, to) };
}

function readRatio(
  key: string,
  given: StiffnessRatios[string] | undefined,
): { readonly value: number; readonly from: Sources } {
  const quantity = isQuantity(given) ? given : undefined;
  if (quantity !== undefined && quantity.dimension !== "pure number")
    throw new StructureError({ kind: "ratio", key, value: String(quantity) });
  const value = quantity?.si ?? (given as number);
  if (typeof value !== "number" || !Number.isFinite(value) || value <= 0)
    throw new StructureError({ kind: "ratio", key, value: String(value) });
  return { value, from: quantity?.from ?? [] };
}

/** The I of the members a ratio is measured by, which must be alike. */
function commonI(key: string, members: readonly string[], I: ReadonlyMap<string, number>): number {
  const values = members.map((name) => I.get(name) ?? 1);
  const [first = 1] = values;
  if (values.some((value) => value !== first))
    throw new StructureError({ kind: "ratio of unlike", key, members });
  return first;
}
