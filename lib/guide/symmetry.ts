// Hinges beyond the degree: only where frame, loads and hinges are mirror images, and only when the engineer says so.

import type { Determinacy } from "../results/types.ts";
import type { Structure } from "../structure/types.ts";
import { loadFaults, type Mirror, mirrorOf, structureFaults } from "./mirror.ts";
import type { HingeChoice, LoadCase } from "./types.ts";
import { and, counted, lengthText } from "./words.ts";

/** Throws on more hinges than degrees without a reason of symmetry, saying how many, and where symmetry is given as a reason but
 *  joints, members, supports or hinges are no mirror images, naming them; answers with the mirror where symmetry is called on. */
export function checkSymmetry(
  set: string,
  hinged: Structure,
  before: Determinacy,
  after: Determinacy,
  choices: readonly Pick<HingeChoice, "symmetry">[],
): Mirror | undefined {
  const beyond = after.mechanisms.length - before.mechanisms.length;
  const claimed = choices.filter(({ symmetry }) => symmetry === true).length;
  if (claimed < beyond) refuseBeyond(set, before, after, choices.length, beyond - claimed);
  if (claimed === 0) return undefined;
  const mirror = mirrorOf(hinged);
  const faults = structureFaults(hinged, mirror);
  if (faults.length > 0) refuseUnlike(set, mirror, faults);
  return mirror;
}

/** Throws where the loads are no mirror images; answers with what was found to be symmetric, in words. */
export function symmetryWords(
  set: string,
  hinged: Structure,
  cases: readonly LoadCase[],
  mirror: Mirror,
): string {
  const faults = cases.flatMap((one) =>
    loadFaults(hinged, one.loads, mirror).map((fault) => `${one.key}: ${fault}`),
  );
  if (faults.length > 0) refuseUnlike(set, mirror, faults);
  const sections = hinged.members.some(({ section }) => section !== undefined) ? "sections, " : "";
  const unknown = sections === "" ? "; sections are not given and must be mirror images too" : "";
  return `symmetry checked about x = ${lengthText(mirror.x)}: joints, members, ${sections}supports, hinges and loads are mirror images${unknown}`;
}

/** Why a load case is not balanced by hinges beyond the degree whose reason is symmetry; nothing where its loads are mirror images. */
export function unlikeWords(hinged: Structure, { loads }: LoadCase, mirror: Mirror | undefined): string {
  const faults = mirror === undefined ? [] : loadFaults(hinged, loads, mirror);
  return faults.length === 0 ? "" : `; symmetry is given as a reason, but ${listed(faults)}`;
}

function refuseUnlike(set: string, mirror: Mirror, faults: readonly string[]): never {
  throw new Error(
    `hinges for ${set}: symmetry is given as a reason, but about the upright line through the middle (x = ${lengthText(mirror.x)}) ${listed(faults)}. ` +
      "Take hinges no more than the degree, or mend what is not symmetric.",
  );
}

const mostListed = 4;

function listed(faults: readonly string[]): string {
  const more = faults.length - mostListed;
  return `${faults.slice(0, mostListed).join("; ")}${more > 0 ? `; and ${more} more` : ""}`;
}

function refuseBeyond(
  set: string,
  { selfStress }: Determinacy,
  { mechanisms }: Determinacy,
  hinges: number,
  beyond: number,
): never {
  const motions = and(mechanisms.map(({ words }) => words));
  throw new Error(
    `hinges for ${set}: ${counted(hinges, "hinge")} in a structure indeterminate to degree ${selfStress}, ${beyond} beyond the degree: a mechanism, nothing resists ${motions}. ` +
      `Drop ${counted(beyond, "hinge")}, or, where frame, loads and hinges are mirror images, say so on the hinge that is one: ` +
      'hinge("BC", { from: "C", symmetry: true, because: "…" }).',
  );
}
