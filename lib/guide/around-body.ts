// What of a structure and its loads shows in the drawing of one body. A figure for every body of a large frame that held the
// whole frame each would make a record that grows with its square.

import type { Action, FreeBody } from "../results/types.ts";
import { inGlobalAxes } from "../structure/index.ts";
import type { Load, Structure } from "../structure/types.ts";

/** The members of a body and those cut beside its joints, with their joints, supports and hinges. */
export function structureAround(
  { joints, members, supports, hinges, ...rest }: Structure,
  body: FreeBody,
): Structure {
  const own = members.filter(
    ({ name, start, end }) =>
      body.pieces.some(({ member }) => member === name) ||
      body.joints.includes(start) ||
      body.joints.includes(end),
  );
  const ends = new Set([...body.joints, ...own.flatMap(({ start, end }) => [start, end])]);
  const names = new Set(own.map(({ name }) => name));
  return Object.freeze({
    ...rest,
    joints: Object.freeze(joints.filter(({ name }) => ends.has(name))),
    members: Object.freeze(own),
    supports: Object.freeze(supports.filter(({ joint }) => ends.has(joint))),
    hinges: Object.freeze(hinges.filter(({ member }) => names.has(member))),
  });
}

/** The loads that act on a body, and the deepest of all, by which all are drawn to one scale; the actions with the numbers the
 *  loads have among these. */
export function loadsOn(
  structure: Structure,
  loads: readonly Load[],
  actions: readonly Action[],
): { readonly loads: readonly Load[]; readonly actions: readonly Action[] } {
  const acting = [...new Set(actions.flatMap(({ source }) => ("load" in source ? [source.load] : [])))];
  const shown = acting.flatMap((i) => loads[i] ?? []);
  const deepest = deepestOf(loads.map((load) => inGlobalAxes(structure, load)));
  return {
    loads: Object.freeze(deepest === undefined ? shown : [...shown, deepest]),
    actions: actions.map((action) =>
      "load" in action.source ? { ...action, source: { load: acting.indexOf(action.source.load) } } : action,
    ),
  };
}

const depthOf = (load: Load): number =>
  load.kind === "distributed" ? Math.max(Math.abs(load.q1), Math.abs(load.q2)) : 0;

function deepestOf(loads: readonly Load[]): Load | undefined {
  const [first, ...others] = loads.filter(({ kind }) => kind === "distributed");
  return first === undefined
    ? undefined
    : others.reduce((most, load) => (depthOf(load) > depthOf(most) ? load : most), first);
}
