// The verb `freeBodies`: the structure cut free at its hinges and solved by one equation after another.

import type { Quantity } from "../quantity/index.ts";
import type { Closure, Step } from "../results/types.ts";
import { type EquationTerm, type Ledger, shownValue } from "../sheet/index.ts";
import { freeBodies } from "../statics/index.ts";
import type { Load, Sources, Structure } from "../structure/types.ts";
import { solvedLoads } from "./actual-loads.ts";
import type { BandBook } from "./band-book.ts";
import { bodyFigure } from "./body-figure.ts";
import { closureLines, equationText, forceQuantity, idleLines, type Named, stepLines } from "./equation.ts";
import { handOf } from "./hand.ts";
import { loadNames } from "./load-words.ts";
import { isNought } from "./nought.ts";
import { queryRatios } from "./set-ratios.ts";
import { withBandShown } from "./shown-result.ts";
import { coordinateSources, geometrySources, jointSources, loadSources } from "./sources.ts";
import type { Hand, HingeSet, SolvedSet } from "./types.ts";
import { queryUnreleased } from "./unreleased.ts";
import { and, structureName } from "./words.ts";

/** Solves each hinge set under its load cases and records every body and equation; answers with the results, added. What is not
 *  known of their frame is taken by default where nothing was stated, and that is recorded first. */
export function recordFreeBodies(ledger: Ledger, bands: BandBook, sets: readonly HingeSet[]): Hand {
  const [first] = sets;
  if (first === undefined) throw new Error("freeBodies: no hinge set; give what sheet.hinges answered");
  refuseTwice(sets);
  const taken = bands.taken(first.frame, sets);
  if ("none" in taken) recordWithout(ledger, first.frame, taken.none);
  const solved = sets.map((set) => recordSet(ledger, set));
  queryUnreleased(ledger, sets);
  queryRatios(ledger, bands, sets);
  return handOf(solved, (value) => withBandShown(value, bands));
}

/** Throws when a load case comes in more than one of the sets, whose results would count it more than once. */
function refuseTwice(sets: readonly HingeSet[]): void {
  const before = new Map<string, HingeSet>();
  for (const set of sets)
    for (const { key } of set.cases) {
      const other = before.get(key);
      if (other !== undefined)
        throw new Error(
          `freeBodies: load case ${key} comes ${other === set ? `twice, in hinge set ${set.name}` : `in hinge set ${other.name} and again in ${set.name}`}; results of the sets are added, so it would count twice. ` +
            "Give one set for each load case; alternatives are shown by sheet.beside(chosen, other)",
        );
      before.set(key, set);
    }
}

/** That hand results of a frame stand without bands, and why. */
function recordWithout(ledger: Ledger, frame: Structure, why: string): void {
  const name = structureName(frame);
  ledger.put({
    kind: "finding",
    id: `bands of ${name}`,
    uses: geometrySources(frame),
    title: `Bands of hand results, ${name}`,
    verdict: `none: ${why}`,
    lines: [],
  });
}

/** The set solved without printing a step: for sets that only try something out. */
export function solvedQuietly(set: HingeSet): SolvedSet {
  const loads = solvedLoads(set);
  return { set, loads, solution: freeBodies(set.hinged, loads), entries: [] };
}

function recordSet(ledger: Ledger, set: HingeSet): SolvedSet {
  const loads = solvedLoads(set);
  const solution = freeBodies(set.hinged, loads);
  const book: SetBook = { ledger, set, loads, named: { solution, loadNames: loadNames(loads) }, entries: [] };
  let current = -1;
  const drawn = new Set<number>();
  for (let i = 0; i < solution.steps.length; i++) {
    const idle = idleRun(solution.steps, i);
    if (idle !== undefined) {
      recordIdle(book, idle, i);
      i += idle.length - 1;
      current = -1;
      continue;
    }
    const step = solution.steps[i];
    if (step === undefined) continue;
    // one equation more of a body that stands drawn above needs no second figure
    const alone =
      drawnBody(solution.steps[i + 1] ?? step) !== drawnBody(step) || i + 1 === solution.steps.length;
    if (drawnBody(step) !== current && !(alone && drawn.has(drawnBody(step)))) recordBody(book, step, i);
    current = drawnBody(step);
    drawn.add(current);
    recordStep(book, step, i);
  }
  for (const closure of solution.closures) recordClosure(book, closure);
  return { set, loads, solution, entries: book.entries };
}

interface SetBook {
  readonly ledger: Ledger;
  readonly set: HingeSet;
  readonly loads: readonly Load[];
  readonly named: Named;
  /** By step, filled as steps are recorded. */
  readonly entries: string[];
}

/** The body a step is written for: where several were joined, what they are together. */
function drawnBody({ joined, bodies }: Step): number {
  return joined ?? bodies[0] ?? -1;
}

/** The steps from `first` on in which nothing acts and which sum the same way, where there are any. */
function idleRun(steps: readonly Step[], first: number): readonly [Step, ...Step[]] | undefined {
  const [begin, ...rest] = steps.slice(first);
  if (begin?.idle !== true) return undefined;
  if (begin.equation === "sum M") return [begin];
  const end = rest.findIndex((step) => step.idle !== true || step.equation !== begin.equation);
  return [begin, ...(end === -1 ? rest : rest.slice(0, end))];
}

function recordBody(book: SetBook, first: Step, firstStep: number): void {
  const { ledger, set, loads, named } = book;
  const run = named.solution.steps.slice(firstStep);
  const until = run.findIndex((step) => drawnBody(step) !== drawnBody(first) || step.idle === true);
  const steps = until === -1 ? run : run.slice(0, until);
  const sought = steps.map((step) => step.unknown);
  const body = named.solution.bodies[drawnBody(first)];
  if (body === undefined) return;
  const { about } = first;
  const spec = bodyFigure(set.hinged, loads, body, named, {
    firstStep,
    sought,
    ...(about === undefined ? {} : { about }),
  });
  ledger.put({
    kind: "figure",
    id: `figure ${set.name}: ${body.name}, ${sought.join(" ")}`,
    uses: usesOf(book, (steps[0] ?? first).uses),
    caption: `${set.name}: ${body.name}`,
    alternative: spec.description,
    spec,
  });
}

/** One line for the unknowns that are zero because nothing acts. */
function recordIdle(book: SetBook, steps: readonly [Step, ...Step[]], first: number): void {
  const { ledger, set, loads, named } = book;
  const names = steps.map((step) => step.unknown).join(", ");
  const bodies = and([...new Set(steps.map((step) => bodyName(book, step)))]);
  const uses = unique(steps.flatMap((step) => usesOf(book, step.uses)));
  const [one] = steps;
  const entry = ledger.put({
    kind: "step",
    id: `${set.name}: nothing acts: ${names}`,
    // that nothing acts is said of the loads
    uses: uses.length === 0 ? loadSources(loads) : uses,
    body: `${bodies}, ${one.equation === "sum M" ? "ΣM" : equationText(one)}, in which nothing acts`,
    lines: idleLines(steps, named),
    value: shownValue(forceQuantity(one.unknown, one.result, named)),
    terms: [],
    coefficient: 1,
  });
  steps.forEach((_, i) => {
    book.entries[first + i] = `${entry.id}@${entry.version}`;
  });
}

function recordStep(book: SetBook, step: Step, index: number): void {
  const { ledger, set, named } = book;
  const value: Quantity = forceQuantity(step.unknown, step.result, named);
  const entry = ledger.put({
    kind: "step",
    id: `${set.name}: ${step.id}`,
    uses: usesOf(book, step.uses),
    body: `${bodyName(book, step)}, ${equationText(step)}`,
    lines: stepLines(step, named),
    value: shownValue(value),
    terms: termsOf(book, step),
    coefficient: step.coefficient,
  });
  book.entries[index] = `${entry.id}@${entry.version}`;
}

function recordClosure(book: SetBook, closure: Closure): void {
  const { ledger, set, named } = book;
  const text = equationText(closure);
  ledger.put({
    kind: "check",
    id: `${set.name}: closure ${bodyName(book, closure)} ${text}`,
    uses: closure.uses === undefined ? [] : usesOf(book, closure.uses),
    formula: `${text} = 0`,
    lines: closureLines(closure, named),
    inputs: {},
    closure: true,
    terms: termsOf(book, closure),
    passed: isNought(closure.sum, closure.scale),
    description: `${set.name}: ${bodyName(book, closure)}: the equation left over closes by itself`,
  });
}

/** The terms to be added again, each that comes from an earlier step with that step's entry. */
function termsOf({ entries }: SetBook, { terms }: Pick<Closure, "terms">): readonly EquationTerm[] {
  return terms.map(({ coefficient, value, source }) => {
    const from = "step" in source ? entries[source.step] : undefined;
    return from === undefined ? { coefficient, value } : { coefficient, value, from };
  });
}

function bodyName({ named }: SetBook, { bodies, joined }: Pick<Step, "bodies" | "joined">): string {
  return named.solution.bodies[joined ?? bodies[0] ?? -1]?.name ?? "";
}

/** What an equation stands on: its loads, the coordinates and hinges in its lever arms, slopes of supports, earlier steps. */
function usesOf({ set, loads, entries }: SetBook, uses: Step["uses"]): readonly string[] {
  const { hinged } = set;
  const own = <T extends { readonly from: Sources }>(list: readonly T[]): readonly string[] =>
    list.flatMap(({ from }) => from);
  return unique([
    ...uses.loads.flatMap((index) => sourcesOfLoad(loads[index], uses.places?.includes(index) !== false)),
    ...(uses.coordinates === undefined
      ? jointSources(hinged, uses.joints)
      : coordinateSources(hinged, uses.coordinates)),
    ...own(hinged.hinges.filter(({ name }) => uses.hinges.includes(name))),
    ...own(hinged.supports.filter(({ joint }) => uses.supports?.includes(joint) === true)),
    ...uses.steps.flatMap((index) => entries[index] ?? []),
  ]);
}

/** What a load stands on, without what its place came from where that does not enter. */
function sourcesOfLoad(load: Load | undefined, withPlace: boolean): Sources {
  if (load === undefined || withPlace || load.kind === "joint") return load?.from ?? [];
  return load.fromSize ?? load.from;
}

function unique(uses: readonly string[]): readonly string[] {
  return [...new Set(uses)];
}
