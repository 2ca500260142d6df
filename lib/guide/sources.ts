// Where the parts of a model came from, gathered for the entries that use them.

import { axisOf, memberNamed, mergeSources } from "../structure/index.ts";
import type { Hinge, Load, Sources, Structure } from "../structure/types.ts";

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

/** What single coordinates stand on. */
export function coordinateSources(
  { joints }: Structure,
  coordinates: readonly { readonly joint: string; readonly axis: "x" | "y" }[],
): Sources {
  return mergeSources(
    ...coordinates.map(({ joint, axis }) => {
      const found = joints.find(({ name }) => name === joint);
      return (axis === "x" ? found?.fromX : found?.fromY) ?? found?.from ?? [];
    }),
  );
}

/** What a member's length and direction stand on: of a level member the span alone, of an upright one the height. */
export function memberSources(structure: Structure, member: string): Sources {
  const { start, end } = memberNamed(structure, member, "member");
  const { c, s } = axisOf(structure, memberNamed(structure, member, "member"));
  const axes = [
    ...(Math.abs(c) > 1e-12 ? ["x" as const] : []),
    ...(Math.abs(s) > 1e-12 ? ["y" as const] : []),
  ];
  return coordinateSources(
    structure,
    axes.flatMap((axis) => [start, end].map((joint) => ({ joint, axis }))),
  );
}

/** What the distance of a hinge stands on besides its own sources: the member's length, where it is a part of that. */
export function hingeSources(structure: Structure, { member, part }: Hinge): Sources {
  return part === undefined ? [] : memberSources(structure, member);
}

/** What loads stand on. */
export function loadSources(loads: readonly Load[]): Sources {
  return mergeSources(...loads.map(({ from }) => from));
}
