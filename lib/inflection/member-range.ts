// The range of the point of inflection of a member taken by itself, judged by what holds its ends.

import type { MemberLoads } from "../results/index.ts";
import { inGlobalAxes, type Load, type Member, type Structure } from "../structure/index.ts";
import { type EndHold, type EndHolds, endHolds } from "./end-holds.ts";
import type { KnownEnds } from "./end-moments.ts";
import { InflectionError } from "./faults.ts";
import { type End, inflectionRange, isolatedRange, type Range, rangeBeside } from "./inflection-points.ts";
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
  const holds = endHolds(structure, loads, member);
  const ends =
    near === "left" ? ([member.start, member.end] as const) : ([member.end, member.start] as const);
  const [here, there] = ends;
  const [atHere, atThere] = near === "left" ? [holds.start, holds.end] : [holds.end, holds.start];
  const [known, far] = [fixityOf(atHere), fixityOf(atThere)];
  if (known === 0) throw new InflectionError({ kind: "pinned end", member: member.name, joint: here });
  if (holds.overhang)
    return {
      why: "an overhang: its moment is known by statics, and a hinge where that is not zero lets it fall",
    };
  const pushed = loads.map((load) => inGlobalAxes(structure, load)).some(pushesSideways);
  const moments = knownMoments(holds);
  const told = moments !== undefined && (isLoaded(own) || !pushed);
  if (!told && !isLoaded(own)) return unloadedRange(pushed, own.length, known, far);
  try {
    const range = told
      ? besideRange(own, near, moments, [atHere, atThere])
      : far === undefined
        ? isolatedRange(own, near)
        : inflectionRange(own, near, far);
    return {
      range,
      why: `isolated span, ${nearWords(here, told ? atHere : undefined)}, ${farWords(there, atThere, told && atHere !== undefined)}`,
    };
  } catch (error) {
    if (error instanceof InflectionError && error.fault.kind === "no inflection")
      return { why: error.message };
    throw error;
  }
}

/** The moments statics tells at the ends of a member, where it tells one that is not nought; an end free to turn has none. */
export function knownMoments({ start, end }: EndHolds): KnownEnds | undefined {
  const told = (hold: EndHold): number | undefined =>
    hold === undefined ? undefined : "moment" in hold ? hold.moment : hold.fixity === 0 ? 0 : undefined;
  const [left, right] = [told(start), told(end)];
  if (!left && !right) return undefined;
  return { ...(left === undefined ? {} : { left }), ...(right === undefined ? {} : { right }) };
}

/** Beside an end with a known moment. Without load M_B = -r M_C/2 at the other end, zero at L r / (2 + r) from it. */
function besideRange(
  own: MemberLoads,
  near: End,
  moments: KnownEnds,
  holds: readonly [here: EndHold, there: EndHold],
): Range {
  const least = holds.some((hold) => fixityOf(hold) === 1) ? 1 : 0;
  const both = moments.left !== undefined && moments.right !== undefined;
  if (both || isLoaded(own)) return rangeBeside(own, near, moments, least);
  const L = own.length;
  const [a, b] = [least === 1 ? L / 3 : 0, L / 3]; // from the end whose moment is not known
  return Object.freeze(moments[near] === undefined ? { least: a, most: b } : { least: L - b, most: L - a });
}

/** A member turned at its far end only: M_near = -r M_far/2, hence zero at L r / (2 + r) from the near end, L/3 at most.
 *  Where its loaded neighbours can turn both ends the moment can be zero anywhere. */
function unloadedRange(
  pushed: boolean,
  length: number,
  near: number | undefined,
  far: number | undefined,
): Judged {
  if (pushed)
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
function fixityOf(hold: EndHold): 0 | 1 | undefined {
  return hold !== undefined && "fixity" in hold ? hold.fixity : undefined;
}

function nearWords(joint: string, hold: EndHold): string {
  if (hold === undefined) return `${joint} from free to turn to fixed`;
  return "moment" in hold ? `the moment at ${joint} known by statics` : `${joint} fixed`;
}

function farWords(joint: string, hold: EndHold, alone: boolean): string {
  if (hold === undefined) return alone ? `${joint} from free to turn to fixed` : `${joint} likewise`;
  if ("moment" in hold) return `the moment at ${joint} known by statics`;
  return hold.fixity === 0 ? `${joint} free to turn` : `${joint} fixed`;
}
