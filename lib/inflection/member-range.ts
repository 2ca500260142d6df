// The range of the point of inflection of a member taken by itself, judged by what holds its ends.

import type { MemberLoads } from "../results/index.ts";
import { inGlobalAxes, type Load, type Member, type Structure } from "../structure/index.ts";
import { InflectionError } from "./faults.ts";
import { type End, inflectionRange, isolatedRange, type Range } from "./inflection-points.ts";
import { isLoaded } from "./span.ts";

/** A range, when there is one, and why it is that. */
export interface Judged {
  readonly range?: Range;
  readonly why: string;
}

/** Where the point of inflection of the isolated member can lie near one end. */
export function rangeOf(
  structure: Structure,
  loads: readonly Load[],
  member: Member,
  near: End,
  own: MemberLoads,
): Judged {
  const [here, there] = near === "left" ? [member.start, member.end] : [member.end, member.start];
  const [known, far] = [knownFixity(structure, member, here), knownFixity(structure, member, there)];
  if (known === 0) throw new InflectionError({ kind: "pinned end", member: member.name, joint: here });
  if (!isLoaded(own))
    return unloadedRange(
      loads.map((load) => inGlobalAxes(structure, load)),
      own.length,
      known,
      far,
    );
  try {
    const range = far === undefined ? isolatedRange(own, near) : inflectionRange(own, near, far);
    return { range, why: `isolated span, ${here} from free to turn to fixed, ${farWords(there, far)}` };
  } catch (error) {
    if (error instanceof InflectionError && error.fault.kind === "no inflection")
      return { why: error.message };
    throw error;
  }
}

/** A member turned at its far end only: M_near = -r M_far/2, hence zero at L r / (2 + r) from the near end, L/3 at most.
 *  Where its loaded neighbours can turn both ends the moment can be zero anywhere. */
function unloadedRange(
  loads: readonly Load[],
  length: number,
  near: number | undefined,
  far: number | undefined,
): Judged {
  if (loads.some(pushesSideways))
    return {
      why: "no load across the member and loads that may move the structure sideways: its own loads give no range",
    };
  if (far !== undefined)
    return {
      why: "no load across the member, and its far end cannot be turned by others: its own loads give no range",
    };
  if (near === undefined)
    return {
      why: "no load across the member, and the frame can turn both its ends: its own loads give no range",
    };
  return {
    range: Object.freeze({ least: 0, most: length / 3 }),
    why: "no load across the member, far end turned by the frame, this end fixed",
  };
}

function pushesSideways(load: Load): boolean {
  return load.kind === "distributed" ? load.direction[0] !== 0 : load.fx !== 0;
}

/** 0 or 1 where nothing but a support decides how the end can turn. */
function knownFixity(structure: Structure, member: Member, joint: string): 0 | 1 | undefined {
  const released = joint === member.start ? member.releases.start.moment : member.releases.end.moment;
  if (released) return 0;
  if (structure.supports.some((s) => s.joint === joint && s.holds.rotation)) return 1;
  const others = structure.members.some((m) => m !== member && (m.start === joint || m.end === joint));
  return others ? undefined : 0;
}

function farWords(joint: string, far: number | undefined): string {
  if (far === undefined) return `${joint} likewise`;
  return far === 0 ? `${joint} free to turn` : `${joint} fixed`;
}
