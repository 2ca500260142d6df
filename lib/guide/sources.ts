// Where the parts of a model came from, gathered for the entries that use them.

import { memberNamed, mergeSources } from "../structure/index.ts";
import type { Load, Sources, Structure } from "../structure/types.ts";

/** What the joints' positions stand on. */
export function jointSources(structure: Structure, names: readonly string[]): Sources {
  return mergeSources(...structure.joints.filter(({ name }) => names.includes(name)).map(({ from }) => from));
}

/** What the whole geometry stands on. */
export function geometrySources(structure: Structure): Sources {
  return jointSources(
    structure,
    structure.joints.map(({ name }) => name),
  );
}

/** What a member's length and direction stand on. */
export function memberSources(structure: Structure, member: string): Sources {
  const { start, end, from } = memberNamed(structure, member, "member");
  return mergeSources(from, jointSources(structure, [start, end]));
}

/** What loads stand on. */
export function loadSources(loads: readonly Load[]): Sources {
  return mergeSources(...loads.map(({ from }) => from));
}
