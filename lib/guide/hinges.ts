// The verb `hinges`: where the moment is taken to be zero, for which load cases, and what that leaves free to move.

import type { Placement } from "../inflection/index.ts";
import { quantity } from "../quantity/index.ts";
import { type Ledger, shownValue } from "../sheet/index.ts";
import { determinacy } from "../statics/index.ts";
import { mergeSources, withHinges } from "../structure/index.ts";
import type { Hinge, Structure } from "../structure/types.ts";
import { checkCases } from "./case-loads.ts";
import { type PlacedChoice, placedChoices } from "./hinge-choice.ts";
import { refuseTooFew, refuseUnbalanced } from "./hinge-faults.ts";
import { hingeId, setName } from "./hinge-names.ts";
import { endsOf, judge, outsideWords, recordRanges } from "./hinge-ranges.ts";
import { recordVerdict } from "./hinge-verdict.ts";
import { mirroredChoices } from "./mirrored-hinges.ts";
import { givenRatios } from "./set-ratios.ts";
import { hingeSources } from "./sources.ts";
import type { StiffnessOf } from "./stiffness.ts";
import { checkSymmetry, symmetryWords, unlikeWords } from "./symmetry.ts";
import type { HingeChoice, HingeSet, HingesOptions, LoadCase } from "./types.ts";
import { lengthText, spanPart } from "./words.ts";

/** Records the hinges as assumptions with their isolated-span ranges, and what the structure is with them; answers with the set.
 *  Throws when hinges are missing, when a load case is not balanced, naming the motion nothing resists, and when there are more
 *  hinges than degrees without a symmetry that holds. */
export function recordHinges(
  ledger: Ledger,
  find: StiffnessOf,
  frame: Structure,
  cases: readonly LoadCase[],
  choices: readonly HingeChoice[],
  options: HingesOptions = {},
): HingeSet {
  const name = setName("hinges", cases, options);
  checkCases(frame, cases);
  const loads = cases.flatMap((loadCase) => loadCase.loads);
  const before = determinacy(frame);
  const own = placedChoices(frame, loads, choices, find);
  const written = mirroredChoices(frame, choices, own);
  const chosen = placedBy(frame, written);
  const places = setPlaces(ledger, name, chosen, own, choices);
  const placed = places === own ? chosen : placedBy(frame, mirroredChoices(frame, choices, places));
  const after = determinacy(placed);
  refuseTooFew(name, frame, before, after, choices);
  const mirror = checkSymmetry(name, placed, before, after, choices);
  refuseUnbalanced(placed, cases, before.selfStress, (one) => unlikeWords(placed, one, mirror));
  const symmetry = mirror === undefined ? undefined : symmetryWords(name, placed, cases, mirror);
  const first = frame.hinges.length;
  const judged = placed.hinges.slice(first).map((one) => judge(frame, loads, one));
  const uses = placed.hinges.slice(first).map((one, i) => {
    const [choice, was] = [written[i], chosen.hinges[first + i]];
    if (choice === undefined || was === undefined) throw new Error(`hinge ${one.name} was not chosen`);
    return recordHinge(
      ledger,
      name,
      placed,
      one,
      { ...choice, follows: own[i] === undefined },
      was,
      judged[i],
    );
  });
  const hinged: Structure = Object.freeze({
    ...placed,
    hinges: placed.hinges.map((one, i) => {
      const use = uses[i - first];
      return use === undefined ? one : Object.freeze({ ...one, from: Object.freeze([use]) });
    }),
  });
  recordRanges(ledger, name, hinged, loads, hinged.hinges.slice(first), judged);
  const entries = Object.freeze(cases.map(({ entry }) => entry));
  const set = {
    name,
    frame,
    hinged,
    cases: Object.freeze([...cases]),
    determinacy: after,
    entries,
    ...givenRatios(choices.map(({ ratios }) => ratios)),
  };
  return recordVerdict(ledger, set, loads, before, symmetry === undefined ? [] : [symmetry]);
}

const placedBy = (frame: Structure, choices: readonly PlacedChoice[]): Structure =>
  withHinges(
    frame,
    choices.map(({ choice: { member, from }, at, sources }) => ({ member, from, at, sources })),
  );

/** The choices with the places set from outside; the same list where none is. A mirror image without a place of its own cannot
 *  be set: it follows the hinge it mirrors. */
function setPlaces(
  ledger: Ledger,
  set: string,
  placed: Structure,
  own: readonly (PlacedChoice | undefined)[],
  choices: readonly HingeChoice[],
): readonly (PlacedChoice | undefined)[] {
  const first = placed.hinges.length - choices.length;
  const places = own.map((place, i) => {
    const [one, choice] = [placed.hinges[first + i], choices[i]];
    if (place === undefined || one === undefined || choice === undefined) return place;
    const written = quantity(distanceFrom(placed, one, choice.from), "length");
    const span = quantity(endsOf(placed, one.member).length, "length");
    const at = ledger.setFromOutside(hingeId(one.name, set), written, String(choice.at ?? written), span);
    return at === written ? place : { choice, at, sources: [], how: "" };
  });
  return places.every((place, i) => place === own[i]) ? own : places;
}

/** Distance of a hinge from an end joint of its member, m. */
function distanceFrom(structure: Structure, { member, at }: Hinge, from: string): number {
  const { start, length } = endsOf(structure, member);
  return from === start ? at : length - at;
}

function recordHinge(
  ledger: Ledger,
  set: string,
  structure: Structure,
  one: Hinge,
  { choice, how, follows }: PlacedChoice & { readonly follows: boolean },
  before: Hinge,
  judged: Placement | undefined,
): string {
  const { name, member, from: sources } = one;
  const { from, because } = choice;
  const { length } = endsOf(structure, member);
  const distance = distanceFrom(structure, one, from);
  const written = distanceFrom(structure, before, from);
  const moved = written !== distance && !follows;
  const place = `${lengthText(distance)} from ${from} (${spanPart(distance / length)})`;
  const found = how === "" || moved ? "" : `, ${how}`;
  const entry = ledger.put({
    kind: "assumption",
    id: hingeId(name, set),
    uses: mergeSources(sources, hingeSources(structure, one)),
    ...(follows ? {} : { value: shownValue(quantity(distance, "length")) }),
    text: `Under ${set} the moment is zero at ${name}, in ${member}, ${place}${found}`,
    because,
    ...(moved ? { overridden: shownValue(quantity(written, "length")) } : {}),
  });
  const use = `${entry.id}@${entry.version}`;
  const outside = outsideWords(name, set, judged);
  if (outside !== undefined) ledger.query(outside, [use]);
  return use;
}
