// The nominal ratios a band starts from, for the sheet to print.

import type { Structure } from "../structure/types.ts";
import { AccuracyError } from "./faults.ts";
import { type Between, groupNames } from "./unknowns.ts";

/** Rigidities of a group as multiples of those of the first member of the structure; a range where members differ. */
export interface NominalGroup {
  readonly group: string;
  readonly EI: Between;
  readonly EA: Between;
}

/** The nominal rigidities of all groups, relative to the first member. Throws on a member without section. */
export function nominalGroups(structure: Structure): readonly NominalGroup[] {
  const rigidity = (kind: "I" | "A"): readonly number[] =>
    structure.members.map(({ name, section }) => {
      if (section === undefined) throw new AccuracyError({ kind: "no section", member: name });
      return section.E * section[kind];
    });
  const [EI, EA] = [rigidity("I"), rigidity("A")];
  return Object.freeze(
    groupNames(structure).map((group) => {
      const indices = structure.members.flatMap((m, i) => ((m.group ?? m.name) === group ? [i] : []));
      return Object.freeze({ group, EI: range(EI, indices), EA: range(EA, indices) });
    }),
  );
}

function range(values: readonly number[], indices: readonly number[]): Between {
  const first = values[0] ?? 1;
  const own = indices.map((i) => (values[i] ?? 0) / first);
  return Object.freeze({ least: Math.min(...own), most: Math.max(...own) });
}
