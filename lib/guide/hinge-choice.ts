// A hinge as the engineer chooses it: by a distance, by common practice, by end restraint, by relative stiffness, or as the
// mirror image of another.

import {
  beyondEnds,
  hingeByStiffness,
  momentsByStiffness,
  placement,
  type StiffnessMoments,
  usualPlaces,
} from "../inflection/index.ts";
import { quantity } from "../quantity/index.ts";
import { type Along, memberNamed, mergeSources, type StiffnessRatios } from "../structure/index.ts";
import type { Load, Sources, Structure } from "../structure/types.ts";
import { geometrySources, loadSources } from "./sources.ts";
import { knownStiffness, type Stiffness, type StiffnessOf } from "./stiffness.ts";
import type { HingeChoice, PureNumber } from "./types.ts";

/** A choice with its place: where, what that stands on, and how it was found, in words ("" for a plain distance). */
export interface PlacedChoice {
  readonly choice: HingeChoice;
  readonly at: Along;
  readonly sources: Sources;
  readonly how: string;
}

/** A hinge where the moment is probably zero: on `member`, measured from its end joint `from`, and why there. One of:
 *  `at`, a length or a part of the member's length ("0.115 L"), or "common practice" for 0.1 L; `fixity` of both ends, 0 free
 *  to turn to 1 fixed; `by: "relative stiffness"` of the members that meet there, from their sections or from `ratios`
 *  ("I of beam / I of columns": 2.5). With `symmetry: true` it is the mirror image of another hinge and needs no place. */
export function hinge(member: string, choice: Omit<HingeChoice, "member">): HingeChoice {
  const { at, fixity, by, ratios, symmetry, because } = choice;
  const where = `hinge in ${member}`;
  if (typeof because !== "string" || because.trim() === "")
    throw new Error(`${where}: the reason is missing; say why the moment is zero there, because: "…"`);
  const ways = [at, fixity, by].filter((way) => way !== undefined).length;
  if (ways > 1 || (ways === 0 && symmetry !== true))
    throw new Error(
      `${where}: ${ways === 0 ? "no place is given" : "its place is given in more than one way"}; give one of at: "0.1 L" (or a length, or "common practice"), ` +
        'fixity: { near: 0.6, far: 0.6 }, by: "relative stiffness", or symmetry: true for the mirror image of another hinge',
    );
  if (by !== undefined && by !== "relative stiffness")
    throw new Error(`${where}: by "${String(by)}"; write by: "relative stiffness"`);
  if (ratios !== undefined && by === undefined)
    throw new Error(`${where}: ratios of stiffness matter only with by: "relative stiffness"`);
  if (symmetry !== undefined && symmetry !== true)
    throw new Error(`${where}: symmetry is ${String(symmetry)}; write symmetry: true, or leave it out`);
  return Object.freeze({ ...choice, member });
}

/** The places of all choices that have one of their own; mirror images without are left out. */
export function placedChoices(
  frame: Structure,
  loads: readonly Load[],
  choices: readonly HingeChoice[],
  find: StiffnessOf,
): readonly (PlacedChoice | undefined)[] {
  const known = new Map<string, ByStiffness>();
  const moments = (ratios: StiffnessRatios | undefined): ByStiffness => {
    const key = JSON.stringify(Object.entries(ratios ?? {}).map(([name, ratio]) => [name, numberOf(ratio)]));
    const before = known.get(key);
    if (before !== undefined) return before;
    const stiffness = knownStiffness(find, frame, ratios);
    const found = { stiffness, moments: momentsByStiffness(stiffness.structure, loads) };
    known.set(key, found);
    return found;
  };
  return choices.map((choice) => {
    if (choice.at === "common practice") {
      const { part, words } = usualPlaces.tenth;
      return { choice, at: `${part} L`, sources: [], how: words };
    }
    if (choice.at !== undefined) return { choice, at: choice.at, sources: [], how: "" };
    if (choice.fixity !== undefined) return byFixity(frame, loads, choice, choice.fixity);
    return choice.by === undefined ? undefined : byStiffness(frame, loads, choice, moments(choice.ratios));
  });
}

interface ByStiffness {
  readonly stiffness: Stiffness;
  readonly moments: StiffnessMoments;
}

function byStiffness(
  frame: Structure,
  loads: readonly Load[],
  choice: HingeChoice,
  { stiffness, moments }: ByStiffness,
): PlacedChoice {
  const { member, from } = choice;
  const { start, end } = memberNamed(frame, member, "hinge");
  if (from !== start && from !== end) notAnEnd(member, from, start, end);
  const distance = hingeByStiffness(moments, member, from === start ? "start" : "end");
  return {
    choice,
    at: quantity(distance, "length"),
    sources: mergeSources(stiffness.from, geometrySources(frame), loadSources(loads)),
    how: `by relative stiffness (${stiffness.words}), ${moments.words(member)}`,
  };
}

function byFixity(
  frame: Structure,
  loads: readonly Load[],
  choice: HingeChoice,
  fixity: NonNullable<HingeChoice["fixity"]>,
): PlacedChoice {
  const { member, from } = choice;
  const [near, far] = [numberOf(fixity.near), numberOf(fixity.far)];
  const { distance, known = [] } = placement(frame, loads, { member, from, fixity: { near, far } });
  const beyond =
    known.length === 0 ? [] : beyondEnds(frame, loads, memberNamed(frame, member, "hinge")).loads;
  const own = [...loads.filter((load) => load.kind !== "joint" && load.member === member), ...beyond];
  const sources = mergeSources(
    sourcesOf(fixity.near),
    sourcesOf(fixity.far),
    geometrySources(frame),
    loadSources(own),
  );
  return {
    choice,
    at: quantity(distance, "length"),
    sources,
    how: `the point of inflection of the isolated span for end fixities ${near} at ${from} and ${far} at the far end (0 free to turn, 1 fixed)${known.map((joint) => `, the moment at ${joint} known by statics`).join("")}`,
  };
}

export function notAnEnd(member: string, from: string, start: string, end: string): never {
  throw new Error(
    `hinge in ${member} is measured from "${from}", which is not an end of it; its ends are ${start} and ${end}`,
  );
}

const numberOf = (value: PureNumber): number => (typeof value === "number" ? value : value.si);
const sourcesOf = (value: PureNumber): Sources => (typeof value === "number" ? [] : value.from);
