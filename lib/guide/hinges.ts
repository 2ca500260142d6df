// The verb `hinges`: where the moment is taken to be zero, for which load cases, and what that leaves free to move.

import { type Placement, placement } from "../inflection/index.ts";
import { quantity } from "../quantity/index.ts";
import { memberLoads } from "../results/index.ts";
import type { Determinacy } from "../results/types.ts";
import { type Ledger, shownValue, type TableCell } from "../sheet/index.ts";
import { balance, determinacy } from "../statics/index.ts";
import { axisOf, checkLoads, memberNamed, mergeSources, withHinges } from "../structure/index.ts";
import type { Hinge, Load, Structure } from "../structure/types.ts";
import { structureFigure } from "./determinacy.ts";
import { refuseTooFew, refuseUnbalanced } from "./hinge-faults.ts";
import { shownAs, sketchBundle } from "./shown.ts";
import { geometrySources, hingeSources, loadSources, memberSources } from "./sources.ts";
import type { HingeChoice, HingeSet, LoadCase } from "./types.ts";
import { counted, lengthText, spanPart, structureName } from "./words.ts";

/** A hinge where the moment is probably zero: on `member`, `at` from its end joint `from`, and why there.
 *  `at` is a length or a part of the member's length ("0.115 L"). */
export function hinge(member: string, { from, at, because }: Omit<HingeChoice, "member">): HingeChoice {
  if (typeof because !== "string" || because.trim() === "")
    throw new Error(
      `hinge in ${member}: the reason is missing; say why the moment is zero there, because: "…"`,
    );
  return Object.freeze({ member, from, at, because });
}

/** Records the hinges as assumptions with their isolated-span ranges, and what the structure is with them; answers with the set.
 *  Throws when hinges are missing, and when a load case is not balanced, naming the motion nothing resists. */
export function recordHinges(
  ledger: Ledger,
  frame: Structure,
  cases: readonly LoadCase[],
  choices: readonly HingeChoice[],
): HingeSet {
  if (cases.length === 0)
    throw new Error("hinges: no load case; hinges belong to the loads they were chosen for");
  for (const { loads } of cases) checkLoads(frame, loads);
  const name = cases.map(({ key }) => key).join(" + ");
  const before = determinacy(frame);
  const chosen = placedBy(frame, choices);
  const places = setPlaces(ledger, name, chosen, choices, frame.hinges.length);
  const placed = places === choices ? chosen : placedBy(frame, places);
  const after = determinacy(placed);
  refuseTooFew(name, frame, before, after, choices);
  refuseUnbalanced(placed, cases);
  const loads = cases.flatMap((loadCase) => loadCase.loads);
  const own = placed.hinges.slice(frame.hinges.length);
  const judged = own.map((one) => judge(frame, loads, one));
  const uses = own.map((one, i) =>
    recordHinge(
      ledger,
      name,
      placed,
      one,
      { choice: choices[i], before: chosen.hinges[frame.hinges.length + i] },
      judged[i],
    ),
  );
  const hinged: Structure = Object.freeze({
    ...placed,
    hinges: placed.hinges.map((one, i) => {
      const use = uses[i - frame.hinges.length];
      return use === undefined ? one : Object.freeze({ ...one, from: Object.freeze([use]) });
    }),
  });
  recordRanges(ledger, name, hinged, loads, hinged.hinges.slice(frame.hinges.length), judged);
  const entries = Object.freeze(cases.map(({ entry }) => entry));
  const set = { name, frame, hinged, cases: Object.freeze([...cases]), determinacy: after, entries };
  return recordVerdict(ledger, set, loads, before);
}

const placedBy = (frame: Structure, choices: readonly HingeChoice[]): Structure =>
  withHinges(
    frame,
    choices.map(({ member, from, at }) => ({ member, from, at })),
  );

/** The id of a hinge's assumption; also the name its place is set by from outside. */
const hingeId = (name: string, set: string): string => `hinge ${name} (${set})`;

/** The choices with the places set from outside; the same choices where none is. */
function setPlaces(
  ledger: Ledger,
  set: string,
  placed: Structure,
  choices: readonly HingeChoice[],
  first: number,
): readonly HingeChoice[] {
  const places = choices.map((choice, i) => {
    const own = placed.hinges[first + i];
    if (own === undefined) return choice;
    const written = quantity(distanceFrom(placed, own, choice.from), "length");
    const at = ledger.setFromOutside(hingeId(own.name, set), written, String(choice.at));
    return at === written ? choice : { ...choice, at };
  });
  return places.every((place, i) => place === choices[i]) ? choices : places;
}

/** Distance of a hinge from an end joint of its member, m. */
function distanceFrom(structure: Structure, { member, at }: Hinge, from: string): number {
  const { start, length } = ends(structure, member);
  return from === start ? at : length - at;
}

/** A hinge judged from the nearer end of its member by the range of the isolated span. */
function judge(frame: Structure, loads: readonly Load[], { member, at }: Hinge): Placement {
  const { start, end, length } = ends(frame, member);
  const near = at <= length / 2;
  const distance = quantity(near ? at : length - at, "length");
  return placement(frame, loads, { member, from: near ? start : end, at: distance });
}

function ends(structure: Structure, member: string): { start: string; end: string; length: number } {
  const found = memberNamed(structure, member, "hinge");
  return { start: found.start, end: found.end, length: axisOf(structure, found).length };
}

function recordHinge(
  ledger: Ledger,
  set: string,
  structure: Structure,
  one: Hinge,
  { choice, before }: { readonly choice: HingeChoice | undefined; readonly before: Hinge | undefined },
  judged: Placement | undefined,
): string {
  const { name, member, from: sources } = one;
  const from = choice?.from ?? "";
  const { length } = ends(structure, member);
  const distance = distanceFrom(structure, one, from);
  const written = before === undefined ? distance : distanceFrom(structure, before, from);
  const place = `${lengthText(distance)} from ${from} (${spanPart(distance / length)})`;
  const entry = ledger.put({
    kind: "assumption",
    id: hingeId(name, set),
    uses: mergeSources(sources, hingeSources(structure, one)),
    value: shownValue(quantity(distance, "length")),
    text: `Under ${set} the moment is zero at ${name}, in ${member}, ${place}`,
    because: choice?.because ?? "",
    ...(written === distance ? {} : { overridden: shownValue(quantity(written, "length")) }),
  });
  const use = `${entry.id}@${entry.version}`;
  if (judged?.inside === false && judged.range !== undefined)
    ledger.query(
      `Hinge ${name} under ${set}, ${spanPart(judged.distance / length)} from ${judged.from}, lies outside the isolated-span range ` +
        `${spanPart(judged.range.least / length)} to ${spanPart(judged.range.most / length)} of ${member} under this load. ` +
        "The true point can lie there beside loaded or much longer spans, or where a joint moves; say why it does here.",
      [use],
    );
  return use;
}

/** What the range of an isolated span stands on: the member's length and the loads on it. */
function rangeSources(structure: Structure, loads: readonly Load[], { member }: Hinge): readonly string[] {
  const own = memberLoads(structure, loads, member).loads.flatMap((i) => loads[i] ?? []);
  return mergeSources(memberSources(structure, member), loadSources(own));
}

function recordRanges(
  ledger: Ledger,
  set: string,
  structure: Structure,
  loads: readonly Load[],
  hinges: readonly Hinge[],
  judged: readonly Placement[],
): void {
  const grounds = hinges.map((one) => rangeSources(structure, loads, one));
  const rows = hinges.map((one, i): readonly TableCell[] => {
    const uses = grounds[i] ?? [];
    const { from = "", distance = 0, length = 1, range, inside } = judged[i] ?? {};
    const cell = (metres: number, on: readonly string[]): TableCell => {
      const shown = shownValue(quantity(metres, "length"));
      return { value: { ...shown, text: `${shown.text} (${spanPart(metres / length)})` }, uses: on };
    };
    const own = [one.name, `${from} in ${one.member}`, cell(distance, one.from)];
    if (range === undefined)
      return [...own, "none", "none", "not judged: no range from the member's own loads"];
    const verdict = inside === true ? "inside" : "OUTSIDE";
    return [...own, cell(range.least, uses), cell(range.most, uses), verdict];
  });
  ledger.put({
    kind: "table",
    id: `hinge ranges ${set}`,
    uses: mergeSources(...grounds, ...hinges.map(({ from }) => from)),
    caption: `Where the moment can be zero under ${set}: isolated span, ends from free to turn to fully held (end fixity as a rotational spring)`,
    columns: ["hinge", "from", "chosen", "least", "greatest", "verdict"],
    rows,
  });
}

function recordVerdict(ledger: Ledger, set: HingeSet, loads: readonly Load[], before: Determinacy): HingeSet {
  const { name, hinged, determinacy: after } = set;
  const uses = mergeSources(geometrySources(hinged), ...hinged.hinges.map(({ from }) => from));
  const spec = structureFigure(hinged, loads, `${structureName(hinged)} under ${name}`);
  ledger.put({
    kind: "figure",
    id: `figure hinges ${name}`,
    uses: mergeSources(uses, loadSources(loads)),
    caption: `${structureName(hinged)} with the hinges taken under ${name}`,
    alternative: spec.description,
    spec,
  });
  const verdict = verdictWords(set, before);
  ledger.put({
    kind: "finding",
    id: `hinges ${name}`,
    uses: mergeSources(uses, loadSources(loads)),
    title: `With the hinges for ${name}`,
    verdict,
    lines: [
      `degree ${before.selfStress} before, ${counted(hinged.hinges.length - set.frame.hinges.length, "hinge")}: ${after.words}`,
      ...set.cases.map(({ key, loads: own }) => `${key}: ${balance(hinged, own).words}`),
    ],
  });
  const [motion] = after.mechanisms;
  if (motion !== undefined) {
    const free = {
      kind: "mechanism",
      title: `What ${name} leaves free to move`,
      description: `${motion.words}.`,
      structure: hinged,
      mechanism: motion,
    } as const;
    ledger.put({
      kind: "figure",
      id: `figure mechanism ${name}`,
      uses,
      caption: `The motion these hinges leave free: ${motion.words}`,
      alternative: free.description,
      spec: free,
    });
  }
  return shownAs(set, () => sketchBundle(spec, verdict));
}

function verdictWords({ name, determinacy: after, cases }: HingeSet, { selfStress }: Determinacy): string {
  const was = selfStress === 0 ? "determinate before" : `indeterminate to degree ${selfStress} before`;
  if (after.mechanisms.length === 0) return `${was}; determinate with these hinges`;
  const [motion] = after.mechanisms;
  const which = cases.length === 1 ? "the load" : "the loads";
  return `${was}; with these hinges a mechanism, which balances ${which} ${name} only and would move under any other: ${motion?.words ?? ""}`;
}
