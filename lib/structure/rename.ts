// Other names for the joints of a structure.

import { assemble } from "./assemble.ts";
import { jointNamed } from "./geometry.ts";
import type { Structure } from "./types.ts";

/** The same structure with joints renamed (old name -> new name). Members named after their two joints are renamed with
 *  them. Throws on an unknown joint, on a name that is refused, and on one used twice. */
export function withNames(structure: Structure, names: Readonly<Record<string, string>>): Structure {
  for (const old of Object.keys(names)) jointNamed(structure, old, "what is renamed is joint");
  const joint = (old: string): string => (Object.hasOwn(names, old) ? (names[old] ?? old) : old);
  const members = new Map(
    structure.members.map((m) => {
      const [start, end] = [joint(m.start), joint(m.end)];
      return [m.name, { ...m, name: m.name === m.start + m.end ? start + end : m.name, start, end }];
    }),
  );
  return assemble({
    ...structure,
    joints: structure.joints.map((j) => ({ ...j, name: joint(j.name) })),
    members: [...members.values()],
    supports: structure.supports.map((s) => ({ ...s, joint: joint(s.joint) })),
    hinges: structure.hinges.map((h) => ({ ...h, member: members.get(h.member)?.name ?? h.member })),
  });
}
