// What an engineer states of what is not known yet, made into nominal sections and ranges.

import type { Structure } from "../structure/index.ts";
import { AccuracyError } from "./faults.ts";
import { matters } from "./matters.ts";
import { hasSections, type NominalRatio, withNominalSections } from "./nominal-sections.ts";
import { allParts, type Part, partsNamed } from "./parts.ts";
import { type Claim, type Link, linksOf } from "./stated-chains.ts";
import { type StatedKeys, statedKeys } from "./stated-keys.ts";
import { readFixityRange, readRatioRange, type Stated } from "./stated-range.ts";
import { nominalLines, type UnknownRow, unknownRows } from "./unknown-rows.ts";
import {
  type BaseUnknown,
  type Between,
  eachUnknown,
  type GroupUnknown,
  type Unknowns,
  within,
} from "./unknowns.ts";

/** What is stated, by what it is about: "I of beams / I of columns": "1 to 4", "A of columns": "within 2", "I of BC": "within 1.5",
 *  bases: "pinned to half fixed", "base A": "0.2 to 0.6". */
export type StatedText = Readonly<Record<string, Stated>>;

export interface StatedUnknowns {
  /** The structure with its sections: those given, or nominal ones with the ratios stated. */
  readonly structure: Structure;
  readonly unknowns: Unknowns;
  /** Whether every member had a section given. */
  readonly sizesKnown: boolean;
  /** The nominal ratios, one line per group of members. */
  readonly nominal: readonly string[];
  /** The ranges, one per unknown. */
  readonly rows: readonly UnknownRow[];
}

/** Factor within which I and A are taken to be known when nothing is stated: before sizes are chosen, and after. */
export const usualFactor = { unsized: 2, sized: 1.1 } as const;

/** Reads what is stated of a structure. A ratio "a to b" has the nominal value √(ab) and varies between the two; "within f" varies by the
 *  factor f either way; a number or "known" does not vary. What nobody states is within a factor of 2 of its nominal value, of 1.1 where
 *  sections are given; the I of one group (of bars alone: the A) is the measure of the others, and bases are as given. Throws on keys and words that are none,
 *  on contradictions, and where only some members have a section. */
export function statedUnknowns(structure: Structure, stated: StatedText = {}): StatedUnknowns {
  const sizesKnown = structure.members.length > 0 && hasSections(structure);
  const usual = within(sizesKnown ? usualFactor.sized : usualFactor.unsized);
  const keys = statedKeys(structure, stated);
  const names = keys.stiffness.flatMap(({ of, over }) => (over === undefined ? [of] : [of, over]));
  const parts = allParts(structure, names);
  const [I, A] = (["I", "A"] as const).map((kind) =>
    linksOf(parts, claimsOf(structure, keys, stated, parts, kind, usual), kind),
  );
  const links = { I: I ?? [], A: A ?? [] };
  const sized = sizesKnown ? structure : nominallySized(structure, parts, links);
  const unknowns: Unknowns = Object.freeze({
    groups: Object.freeze(groupsOf(sized, parts, links, usual, sizesKnown)),
    bases: Object.freeze(basesOf(keys, stated)),
  });
  return Object.freeze({
    structure: sized,
    unknowns,
    sizesKnown,
    nominal: nominalLines(sized, parts),
    rows: unknownRows(eachUnknown(sized, unknowns)),
  });
}

type Links = Readonly<Record<"I" | "A", readonly Link[]>>;

function claimsOf(
  structure: Structure,
  { stiffness }: StatedKeys,
  stated: StatedText,
  parts: readonly Part[],
  kind: "I" | "A",
  usual: Between,
): readonly Claim[] {
  const names = stiffness.flatMap(({ of, over }) => (over === undefined ? [of] : [of, over]));
  const named = partsNamed(structure, names);
  const partOf = (name: string): number => {
    const first = named.find((p) => p.name === name)?.members[0];
    return parts.findIndex((p) => p.members[0] === first);
  };
  return stiffness
    .filter((s) => s.kind === kind)
    .map(({ key, of, over }): Claim => {
      const range = readRatioRange(key, stated[key] ?? "", usual);
      return { key, part: partOf(of), ...(over === undefined ? {} : { over: partOf(over) }), ...range };
    });
}

/** Nominal sections with the ratios stated: I of a part, and A with it unless its A is stated. */
function nominallySized(structure: Structure, parts: readonly Part[], links: Links): Structure {
  const plain = withNominalSections(structure);
  const meanA = parts.map(({ members }) => {
    const areas = members.map((i) => plain.members[i]?.section?.A ?? 1);
    return areas.reduce((a, b) => a + b, 0) / areas.length;
  });
  const I = parts.map((_, i) => chained(links.I, i, () => 1));
  const A = parts.map((_, i) => chained(links.A, i, (k) => (meanA[k] ?? 1) * (I[k] ?? 1)));
  const ratios: Record<string, NominalRatio> = {};
  parts.forEach(({ members }, i) => {
    for (const member of members) {
      const name = structure.members[member]?.name;
      if (name !== undefined) ratios[name] = { I: I[i] ?? 1, A: (A[i] ?? 1) / (meanA[i] ?? 1) };
    }
  });
  return withNominalSections(structure, ratios);
}

/** The nominal value of a part: its own, or by the ratios that lead from it to a part that has one. */
function chained(links: readonly Link[], part: number, own: (part: number) => number): number {
  const claim = links[part]?.claim;
  const times = claim?.nominal ?? 1;
  return claim?.over === undefined ? times * own(part) : times * chained(links, claim.over, own);
}

function groupsOf(
  structure: Structure,
  parts: readonly Part[],
  links: Links,
  usual: Between,
  sizesKnown: boolean,
): readonly GroupUnknown[] {
  const worth = parts.map(({ members }) => matters(structure, members));
  const measured = worth.some((w) => w.I) ? "I" : "A";
  const measure = parts.findIndex(
    (_, i) => links[measured][i]?.claim === undefined && worth[i]?.[measured] === true,
  );
  return parts.flatMap((part, i) =>
    (["I", "A"] as const).flatMap((kind): GroupUnknown[] => {
      const link = links[kind][i];
      const claim = link?.claim;
      const left = (kind === measured && i === measure) || worth[i]?.[kind] !== true;
      if (claim === undefined && left) return [];
      const names = (k: number): readonly string[] =>
        (parts[k]?.members ?? []).map((m) => structure.members[m]?.name ?? "");
      const along = (link?.along ?? []).flatMap(names);
      const common = { group: part.name, members: names(i), ...(along.length === 0 ? {} : { along }) };
      if (claim === undefined) return [Object.freeze({ ...common, [kind]: usual, byDefault: true })];
      const over = claim.over === undefined ? undefined : parts[claim.over];
      if (over === undefined) return [Object.freeze({ ...common, ...byItself(kind, claim, sizesKnown) })];
      const nominal = givenRatio(structure, claim.key, kind, part, over);
      const range = sizesKnown && claim.nominal !== undefined ? aroundGiven(claim, nominal) : claim.range;
      return [Object.freeze({ ...common, [kind]: range, ratio: Object.freeze({ to: over.name, nominal }) })];
    }),
  );
}

/** What is stated of a part by itself: of sizes given as multiples of them, otherwise with its middle as the nominal value. */
function byItself(
  kind: "I" | "A",
  { nominal, range }: Claim,
  sizesKnown: boolean,
): Pick<GroupUnknown, "I" | "A" | "ratio"> {
  if (nominal === undefined) return { [kind]: range };
  return sizesKnown
    ? { [kind]: times(range, nominal) }
    : { [kind]: range, ratio: Object.freeze({ nominal }) };
}

/** The ratio of two parts by their sections; throws when it is not one number. */
function givenRatio({ members }: Structure, key: string, kind: "I" | "A", part: Part, over: Part): number {
  const rigidity = (of: Part): readonly number[] =>
    of.members.map((i) => {
      const section = members[i]?.section;
      return section === undefined ? Number.NaN : section.E * section[kind];
    });
  const [own, others] = [rigidity(part), rigidity(over)];
  const least = Math.min(...own) / Math.max(...others);
  const most = Math.max(...own) / Math.min(...others);
  if (!(most <= least * (1 + 1e-9))) throw new AccuracyError({ kind: "not one ratio", key, least, most });
  return least;
}

/** The range stated of a ratio, as multiples of the one the sections given have. */
function aroundGiven({ key, nominal = 1, range }: Claim, given: number): Between {
  const { least, most } = times(range, nominal / given);
  if (!(least <= 1 + 1e-9 && most >= 1 - 1e-9))
    throw new AccuracyError({ kind: "sizes differ", key, given, least: least * given, most: most * given });
  return { least, most };
}

function times({ least, most }: Between, factor: number): Between {
  return Object.freeze({ least: least * factor, most: most * factor });
}

function basesOf({ bases }: StatedKeys, stated: StatedText): readonly BaseUnknown[] {
  return bases.flatMap(({ key, joints }): BaseUnknown[] => {
    const fixity = readFixityRange(key, stated[key] ?? "");
    return fixity === undefined
      ? []
      : [Object.freeze({ joints: Object.freeze(joints), fixity: Object.freeze(fixity) })];
  });
}
