// A frame and the results wanted of it, to be tried out with many stiffnesses.

import type { Imposed, Load, Structure } from "../structure/types.ts";
import type { WantedInCase } from "./asked.ts";
import { type Group, groupsOf, readGroups } from "./groups.ts";
import type { Unknown, Unknowns } from "./unknowns.ts";
import { solveVaried, type Varied, variedOf } from "./varied.ts";

export interface Trial {
  readonly varied: Varied;
  readonly unknowns: readonly Unknown[];
  readonly groups: readonly Group[];
  /** Rooms that are written over at every try. */
  readonly states: Float64Array;
  readonly room: Float64Array;
}

/** Makes a frame, its load cases and the results wanted ready. Every member needs a (nominal) section. */
export function trialOf(
  structure: Structure,
  cases: readonly (readonly (Load | Imposed)[])[],
  wanted: readonly WantedInCase[],
  unknowns: Unknowns,
): Trial {
  const varied = variedOf(structure, cases, unknowns);
  return {
    varied,
    unknowns: varied.unknowns,
    groups: groupsOf(varied, wanted),
    states: new Float64Array(varied.size * cases.length),
    room: new Float64Array(varied.size),
  };
}

/** Solves the frame with one value per unknown (multiples of nominal stiffness, fixities) and writes the results wanted into
 *  `out` from `begin` on, `stride` apart. */
export function tryOut(trial: Trial, values: Float64Array, out: Float64Array, begin = 0, stride = 1): void {
  const { varied, groups, states, room } = trial;
  solveVaried(varied, values, states);
  readGroups(groups, varied.size, states, 0, room, out, begin, stride);
}
