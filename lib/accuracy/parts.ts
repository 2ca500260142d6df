// Members by the names an engineer gives them: "columns", "beam", "BC", "AB, CD".

import { axisOf, byName, calledBy, type Structure } from "../structure/index.ts";
import { AccuracyError } from "./faults.ts";
import { groupNames } from "./unknowns.ts";

/** Members that share one nominal section and one variation of it. */
export interface Part {
  readonly name: string;
  /** Indices, ascending. */
  readonly members: readonly number[];
}

/** The parts that names stand for, in their order. A name is a group or a member, or several with commas between; "beam" and "beams"
 *  both mean the group beams, or where there is none all members that lie like beams; columns likewise. Where one name is a part of
 *  another ("BC" of "beams") the wider one means the other members. Two names may mean the same members. Throws on a name nothing has, and where two names meet otherwise. */
export function partsNamed(structure: Structure, names: readonly string[]): readonly Part[] {
  const whole = names.map((name) => ({ name, members: new Set(membersNamed(structure, name)) }));
  return whole.map(({ name, members }) => {
    const own = new Set(members);
    for (const other of whole) {
      if (other.name === name) continue;
      const shared = [...other.members].filter((i) => members.has(i));
      if (shared.length === 0 || (shared.length === members.size && shared.length === other.members.size))
        continue;
      const narrower = shared.length === other.members.size && other.members.size < members.size;
      const wider = shared.length === members.size && members.size < other.members.size;
      if (!narrower && !wider)
        throw new AccuracyError({
          kind: "names meet",
          names: [name, other.name],
          members: shared.map((i) => structure.members[i]?.name ?? ""),
        });
      if (narrower) for (const i of shared) own.delete(i);
    }
    if (own.size === 0) throw new AccuracyError({ kind: "nothing left", name });
    return { name, members: [...own].sort((a, b) => a - b) };
  });
}

/** All parts of a structure: those named, then the others by group, "other beams" where members of a group are named by themselves. */
export function allParts(structure: Structure, names: readonly string[]): readonly Part[] {
  const named = partsNamed(structure, names).filter(
    ({ members }, i, all) => all.findIndex((p) => p.members[0] === members[0]) === i,
  );
  const taken = new Set(named.flatMap((p) => p.members));
  const rest = groupNames(structure).flatMap((group): Part[] => {
    const members = structure.members.flatMap((m, i) => ((m.group ?? m.name) === group ? [i] : []));
    const left = members.filter((i) => !taken.has(i));
    if (left.length === 0) return [];
    return [{ name: left.length < members.length ? `other ${group}` : group, members: left }];
  });
  return [...named, ...rest].sort((a, b) => (a.members[0] ?? 0) - (b.members[0] ?? 0));
}

function membersNamed(structure: Structure, name: string): readonly number[] {
  const found = name.split(",").flatMap((one) => membersOfOne(structure, one.trim()));
  return [...new Set(found)];
}

function membersOfOne(structure: Structure, name: string): readonly number[] {
  const { members } = structure;
  const indices = (test: (i: number) => boolean): readonly number[] =>
    members.flatMap((_, i) => (test(i) ? [i] : []));
  if (byName(members).has(name)) return indices((i) => members[i]?.name === name);
  const group = members.map((m) => m.group).find((g) => g !== undefined && alike(g, name));
  if (group !== undefined) return indices((i) => members[i]?.group === group);
  const lie = (["beam", "column"] as const).find((kind) => alike(kind, name));
  const lying = indices((i) => {
    const member = members[i];
    return member !== undefined && lie !== undefined && calledBy(axisOf(structure, member)) === lie;
  });
  if (lying.length === 0)
    throw new AccuracyError({ kind: "no such part", name, known: knownNames(structure) });
  return lying;
}

/** The same word, in capitals or not, in the singular or the plural. */
function alike(one: string, other: string): boolean {
  const stem = (word: string): string => word.toLowerCase().replace(/s$/, "");
  return stem(one) === stem(other);
}

/** All names that mean members. */
export function knownNames(structure: Structure): readonly string[] {
  const lies = structure.members.map((m) => calledBy(axisOf(structure, m)));
  const kinds = (["beam", "column"] as const).filter((kind) => lies.includes(kind)).map((kind) => `${kind}s`);
  return [...new Set([...groupNames(structure), ...kinds, ...structure.members.map((m) => m.name)])];
}
