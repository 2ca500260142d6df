// Hinge sets that cannot be: too few hinges, and load cases they do not balance.

import type { Determinacy } from "../results/types.ts";
import { balance } from "../statics/index.ts";
import type { Structure } from "../structure/types.ts";
import type { HingeChoice, LoadCase } from "./types.ts";
import { and, counted } from "./words.ts";

/** Throws when statics is still not enough with the hinges, saying how many are missing and where they could go. */
export function refuseTooFew(
  set: string,
  frame: Structure,
  before: Determinacy,
  after: Determinacy,
  choices: readonly HingeChoice[],
): void {
  if (after.selfStress === 0) return;
  const missing = counted(after.selfStress, "more hinge");
  const taken = new Set(choices.map(({ member }) => member));
  const free = frame.members.map(({ name }) => name).filter((name) => !taken.has(name));
  const where = free.length > 0 ? `for example in ${and(free)}` : "a second one in a member that has one";
  const wasted = choices.length - (before.selfStress - after.selfStress);
  const idle =
    wasted > 0
      ? ` ${counted(wasted, "hinge")} of the set ${wasted === 1 ? "does" : "do"} not make it less indeterminate where ${wasted === 1 ? "it is" : "they are"}.`
      : "";
  throw new Error(
    `hinges for ${set}: the structure is indeterminate to degree ${before.selfStress} and with ${counted(choices.length, "hinge")} still to degree ${after.selfStress}: ` +
      `${missing} needed, ${where}, near where the moment is probably zero.${idle}`,
  );
}

/** Throws when a case is not balanced by the hinges, naming the motion and, by `why`, what it comes from; says which cases are, and
 *  how many hinges the others can have. */
export function refuseUnbalanced(
  hinged: Structure,
  cases: readonly LoadCase[],
  degree: number,
  why: (loadCase: LoadCase) => string,
): void {
  const found = cases.map((one) => ({ key: one.key, own: one, ...balance(hinged, one.loads) }));
  const bad = found.filter(({ balanced }) => !balanced);
  if (bad.length === 0) return;
  const good = found.filter(({ balanced }) => balanced).map(({ key }) => key);
  const names = and(hinged.hinges.map(({ name }) => name));
  const what = bad
    .map(({ key, words, own }) => `${key} with hinges ${names}: ${words}${why(own)}`)
    .join("; ");
  const keys = and(bad.map(({ key }) => key));
  const keep = good.length > 0 ? ` ${and(good)} can keep these hinges.` : "";
  throw new Error(
    `${what}. Give ${keys} a hinge set of ${bad.length === 1 ? "its" : "their"} own, with no more than ${counted(degree, "hinge")}, the degree of the structure: sheet.hinges(frame, [${bad.map(({ key }) => key).join(", ")}], […]).${keep}`,
  );
}
