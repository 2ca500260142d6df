// Hand results as plain data with named questions: moment here, shear there, reaction at A.

import { type Dimension, type Measure, type Quantity, quantity } from "../quantity/index.ts";
import { extremes, memberLoads, type Side, sum, valueAt } from "../results/index.ts";
import type { MemberForces, Piecewise, Reaction } from "../results/types.ts";
import { axisOf, memberNamed, mergeSources, metresAlong, readPlace, snapToEnds } from "../structure/index.ts";
import type { Sources, Structure } from "../structure/types.ts";
import { asResultOf } from "./origin.ts";
import { loadSources, memberSources } from "./sources.ts";
import type { Hand, Peak, SolvedSet, Spot } from "./types.ts";
import { and } from "./words.ts";

/** The results of solved hinge sets, added. All sets must be of one structure. */
export function handOf(solved: readonly SolvedSet[], shows: ShowResult = (value) => value): Hand {
  const first = solved[0];
  if (first === undefined) throw new Error("freeBodies: no hinge set");
  const frame = first.set.frame;
  const key = JSON.stringify(frame);
  for (const { set } of solved)
    if (JSON.stringify(set.frame) !== key)
      throw new Error(
        `freeBodies: hinge sets ${first.set.name} and ${set.name} are of different structures; solve them apart`,
      );
  const members = addedMembers(solved);
  const hand: Hand = {
    frame,
    name: solved.map(({ set }) => set.name).join(" + "),
    solved,
    members,
    axial: (member, { at }) => known(forceAt(solved, members, "N", member, at), "N", member, at),
    shear: (member, { at }) => known(forceAt(solved, members, "V", member, at), "V", member, at),
    moment: (member, { at }) => known(momentAt(solved, members, member, at), "M", member, at),
    peakMoment: (member, sign) => {
      const { moment, at } = peakMoment(solved, members, member, sign);
      const wanted = { member, force: "M", at: sign === "positive" ? "greatest" : "least" } as const;
      const ask = (other: Hand): Quantity => other.peakMoment(member, sign).moment;
      return Object.freeze({ moment: shows(asResultOf(moment, { hand, wanted, ask })), at });
    },
    reaction: ((joint: string, component: Component) => {
      const ask = (other: Hand): Quantity => (other.reaction as AnyReaction)(joint, component);
      const wanted = { joint, reaction: component };
      return shows(asResultOf(reactionAt(solved, joint, component), { hand, wanted, ask }));
    }) as Hand["reaction"],
  };
  const known = <D extends "force" | "moment">(
    value: Quantity<D>,
    force: "N" | "V" | "M",
    member: string,
    at: Spot,
  ): Quantity<D> => {
    const { x, side } = station(frame, member, at);
    const question = { N: "axial", V: "shear", M: "moment" } as const;
    const ask = (other: Hand): Quantity => other[question[force]](member, { at });
    return shows(asResultOf(value, { hand, wanted: { member, force, at: x, side }, ask }));
  };
  return Object.freeze(hand);
}

type AnyReaction = (joint: string, component: Component) => Quantity;

/** How a hand result shows itself in a notebook; as a plain value where nobody says. */
export type ShowResult = <D extends Dimension>(value: Quantity<D>) => Quantity<D>;

type Component = "x" | "y" | "moment";

function addedMembers(solved: readonly SolvedSet[]): readonly MemberForces[] {
  const [first, ...others] = solved;
  if (first === undefined || others.length === 0) return first?.solution.members ?? [];
  return first.solution.members.map((forces) => {
    const rest = others.flatMap(({ solution }) =>
      solution.members.filter(({ member }) => member === forces.member),
    );
    const added = (pick: (one: MemberForces) => Piecewise): Piecewise => sum(pick(forces), ...rest.map(pick));
    return {
      ...forces,
      N: added((one) => one.N),
      V: added((one) => one.V),
      M: added((one) => one.M),
      uses: [],
    };
  });
}

function forcesOf(members: readonly MemberForces[], name: string): MemberForces {
  const found = members.find(({ member }) => member === name);
  if (found === undefined)
    throw new Error(`no member "${name}"; members are ${members.map(({ member }) => member).join(", ")}`);
  return found;
}

/** Distance from the member's start, and from which side the value is read there. */
interface Station {
  readonly x: number;
  readonly side: Side;
  readonly from: Sources;
  /** The end joint, where the station is one. */
  readonly joint?: string;
}

function station(structure: Structure, member: string, at: Spot): Station {
  const found = memberNamed(structure, member, "result");
  const { length } = axisOf(structure, found);
  if (at === found.start) return { x: 0, side: "right", from: [], joint: found.start };
  if (at === found.end) return { x: length, side: "left", from: [], joint: found.end };
  if (structure.joints.some(({ name }) => name === at))
    throw new Error(
      `joint ${String(at)} is not an end of ${member}; its ends are ${found.start} and ${found.end}`,
    );
  const { place, from } = readPlace(at as Measure<"length">, `place on ${member}`);
  const x = snapToEnds(metresAlong(place, length), length);
  if (!(x >= 0 && x <= length))
    throw new Error(
      `place ${String(at)} is outside ${member}, which is ${length} m long from ${found.start} to ${found.end}`,
    );
  const inside = x > 0 && x < length;
  return {
    x,
    side: x === length ? "left" : "right",
    from: inside ? from.concat(memberSources(structure, member)) : from,
  };
}

/** What a value at a station stands on: at an end that was cut free the step that found it; at an end on a support alone
 *  the reactions and loads there; elsewhere the steps the functions follow from and the member's loads. */
function sourcesAt(
  solved: readonly SolvedSet[],
  member: string,
  { from, joint }: Station,
  inside: boolean,
  which: "N" | "V" | "M",
): Sources {
  const perSet = solved.flatMap((one) => {
    const { set, loads, solution, entries } = one;
    const found = solution.steps.findIndex(({ unknown }) => unknown === `${member}_${joint}_${which}`);
    const atSupport =
      joint === undefined || found !== -1 ? undefined : supportSources(one, member, joint, which);
    if (atSupport !== undefined) return atSupport;
    const follows = solution.members.find((forces) => forces.member === member)?.uses ?? [];
    const uses = found === -1 ? follows : [found];
    const own = inside ? memberLoads(set.hinged, loads, member).loads.flatMap((i) => loads[i] ?? []) : [];
    return [...uses.flatMap((i) => entries[i] ?? []), ...loadSources(own)];
  });
  return mergeSources(perSet, from);
}

/** At a joint with one member end: the reactions and joint loads with a part along (N) or across (V) the member.
 *  None where other members meet there or nothing acts. */
function supportSources(
  { set, loads, solution, entries }: SolvedSet,
  member: string,
  joint: string,
  which: "N" | "V" | "M",
): Sources | undefined {
  const meeting = set.hinged.members.filter(({ start, end }) => start === joint || end === joint);
  const reaction = solution.reactions.find((one) => one.joint === joint);
  if (meeting.length !== 1 || reaction === undefined) return undefined;
  const { c, s } = axisOf(set.hinged, memberNamed(set.hinged, member, "result"));
  const [partX, partY] = which === "N" ? [c, s] : [s, c];
  const enters = (part: number): boolean => which !== "M" && Math.abs(part) > 1e-12;
  const { x, y, moment } = reaction.steps;
  const steps = [
    ...(enters(partX) ? [x] : []),
    ...(enters(partY) ? [y] : []),
    ...(which === "M" ? [moment] : []),
  ];
  const own = loads.filter(
    (load) =>
      load.kind === "joint" &&
      load.joint === joint &&
      ((load.fx !== 0 && enters(partX)) ||
        (load.fy !== 0 && enters(partY)) ||
        (load.couple !== 0 && which === "M")),
  );
  const found = [
    ...steps.flatMap((step) => (step === undefined ? [] : (entries[step] ?? []))),
    ...loadSources(own),
  ];
  return found.length > 0 ? found : undefined;
}

function forceAt(
  solved: readonly SolvedSet[],
  members: readonly MemberForces[],
  which: "N" | "V",
  member: string,
  at: Spot,
): Quantity<"force"> {
  const forces = forcesOf(members, member);
  const where = station(frameOf(solved), member, at);
  const inside = where.x > 0 && where.x < forces.length;
  const value = valueAt(forces[which], where.x, where.side);
  return quantity(value, "force", { from: sourcesAt(solved, member, where, inside, which) });
}

function momentAt(
  solved: readonly SolvedSet[],
  members: readonly MemberForces[],
  member: string,
  at: Spot,
): Quantity<"moment"> {
  const forces = forcesOf(members, member);
  const where = station(frameOf(solved), member, at);
  const inside = where.x > 0 && where.x < forces.length;
  const value = valueAt(forces.M, where.x, where.side);
  return quantity(value, "moment", { from: sourcesAt(solved, member, where, inside, "M") });
}

function peakMoment(
  solved: readonly SolvedSet[],
  members: readonly MemberForces[],
  member: string,
  sign: "positive" | "negative",
): Peak {
  if (sign !== "positive" && sign !== "negative")
    throw new Error(`peakMoment: "${String(sign)}" is neither "positive" nor "negative"`);
  const forces = forcesOf(members, member);
  const { greatest, least } = extremes(forces.M);
  const { x, value } = sign === "positive" ? greatest : least;
  const inside = { x, side: "right" as const, from: memberSources(frameOf(solved), member) };
  const from = sourcesAt(solved, member, inside, true, "M");
  return Object.freeze({ moment: quantity(value, "moment", { from }), at: quantity(x, "length", { from }) });
}

function frameOf(solved: readonly SolvedSet[]): Structure {
  const first = solved[0];
  if (first === undefined) throw new Error("no hinge set");
  return first.set.frame;
}

function reactionAt(
  solved: readonly SolvedSet[],
  joint: string,
  component: Component,
): Quantity<"force" | "moment"> {
  const found = solved.map((one) => ({ one, reaction: reactionOf(one, joint) }));
  const dimension = component === "moment" ? "moment" : "force";
  let total = 0;
  const from: string[] = [];
  for (const { one, reaction } of found) {
    const value = reaction[component];
    if (value === undefined) throw new Error(notHeld(frameOf(solved), joint, component));
    total += value;
    const step = reaction.steps[component];
    from.push(...(step === undefined ? [] : [one.entries[step] ?? ""]));
  }
  return quantity<"force" | "moment">(total, dimension, {
    from: mergeSources(from.filter((use) => use !== "")),
  });
}

function reactionOf({ solution }: SolvedSet, joint: string): Reaction {
  const found = solution.reactions.find((one) => one.joint === joint);
  if (found === undefined)
    throw new Error(
      `no support at "${joint}"; supports are at ${and(solution.reactions.map((one) => one.joint))}`,
    );
  return found;
}

function notHeld({ supports }: Structure, joint: string, component: Component): string {
  const kind = supports.find((one) => one.joint === joint)?.kind ?? "support";
  return `the ${kind} support at ${joint} has no reaction "${component}"`;
}
