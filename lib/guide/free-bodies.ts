// The verb `freeBodies`: the structure cut free at its hinges and solved by one equation after another.

import type { Quantity } from "../quantity/index.ts";
import type { Closure, Step } from "../results/types.ts";
import { type EquationTerm, type Ledger, shownValue } from "../sheet/index.ts";
import { freeBodies } from "../statics/index.ts";
import type { Load } from "../structure/types.ts";
import { bodyFigure } from "./body-figure.ts";
import { closureLines, equationText, forceQuantity, type Named, stepLines } from "./equation.ts";
import { handOf } from "./hand.ts";
import { loadNames } from "./load-words.ts";
import { jointSources, loadSources } from "./sources.ts";
import type { Hand, HingeSet, SolvedSet } from "./types.ts";

/** Solves each hinge set under its load cases and records every body and equation; answers with the results, added. */
export function recordFreeBodies(ledger: Ledger, sets: readonly HingeSet[]): Hand {
  if (sets.length === 0) throw new Error("freeBodies: no hinge set; give what sheet.hinges answered");
  return handOf(sets.map((set) => recordSet(ledger, set)));
}

function recordSet(ledger: Ledger, set: HingeSet): SolvedSet {
  const loads = set.cases.flatMap((loadCase) => loadCase.loads);
  const solution = freeBodies(set.hinged, loads);
  const book: SetBook = { ledger, set, loads, named: { solution, loadNames: loadNames(loads) }, entries: [] };
  let current = "";
  solution.steps.forEach((step, i) => {
    const body = step.bodies.join("+");
    if (body !== current) recordBodies(book, step, i);
    current = body;
    recordStep(book, step, i);
  });
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

function recordBodies(book: SetBook, first: Step, firstStep: number): void {
  const { ledger, set, loads, named } = book;
  const run = named.solution.steps.slice(firstStep);
  const until = run.findIndex((step) => step.bodies.join("+") !== first.bodies.join("+"));
  const steps = until === -1 ? run : run.slice(0, until);
  const sought = steps.map((step) => step.unknown);
  for (const index of first.bodies) {
    const body = named.solution.bodies[index];
    if (body === undefined) continue;
    const { about } = first;
    const spec = bodyFigure(set.hinged, loads, body, named, {
      firstStep,
      sought,
      ...(about === undefined ? {} : { about }),
    });
    ledger.put({
      kind: "figure",
      id: `figure ${set.name}: ${body.name}, ${sought.join(" ")}`,
      uses: usesOf(book, steps[0] ?? first),
      caption: `${set.name}: ${body.name}`,
      alternative: spec.description,
      spec,
    });
  }
}

function recordStep(book: SetBook, step: Step, index: number): void {
  const { ledger, set, named } = book;
  const value: Quantity = forceQuantity(step.unknown, step.result, named);
  const entry = ledger.put({
    kind: "step",
    id: `${set.name}: ${step.id}`,
    uses: usesOf(book, step),
    body: `${bodyNames(book, step)}, ${equationText(step)}`,
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
    id: `${set.name}: closure ${bodyNames(book, closure)} ${text}`,
    uses: termUses(book, closure),
    formula: `${text} = 0`,
    lines: closureLines(closure, named),
    inputs: {},
    closure: true,
    terms: termsOf(book, closure),
    passed: Math.abs(closure.sum) <= Math.max(1e-9 * closure.scale, negligible),
    description: `${set.name}: ${bodyNames(book, closure)}: the equation left over closes by itself`,
  });
}

/** The terms to be added again, each that comes from an earlier step with that step's entry. */
function termsOf({ entries }: SetBook, { terms }: Pick<Closure, "terms">): readonly EquationTerm[] {
  return terms.map(({ coefficient, value, source }) => {
    const from = "step" in source ? entries[source.step] : undefined;
    return from === undefined ? { coefficient, value } : { coefficient, value, from };
  });
}

/** A sum below a thousandth of a newton (or N·m) is nought whatever the terms. */
const negligible = 1e-3;

function bodyNames({ named }: SetBook, { bodies }: Pick<Step, "bodies">): string {
  return bodies.map((index) => named.solution.bodies[index]?.name ?? "").join(" with ");
}

/** What a step stands on: the loads, joints, hinges and earlier steps its equation used; where nothing acts, the load
 *  cases, because it is they that put nothing there. */
function usesOf({ set, loads, entries }: SetBook, { uses }: Step): readonly string[] {
  const hinges = set.hinged.hinges.filter(({ name }) => uses.hinges.includes(name));
  const found = unique([
    ...uses.loads.flatMap((index) => loads[index]?.from ?? []),
    ...jointSources(set.hinged, uses.joints),
    ...hinges.flatMap(({ from }) => from),
    ...uses.steps.flatMap((index) => entries[index] ?? []),
  ]);
  return found.length > 0 ? found : set.entries;
}

function termUses(book: SetBook, closure: Closure): readonly string[] {
  const loads = closure.terms.flatMap(({ source }) => ("load" in source ? [source.load] : []));
  const steps = closure.terms.flatMap(({ source }) => ("step" in source ? [source.step] : []));
  return unique([
    ...loadSources(loads.flatMap((index) => book.loads[index] ?? [])),
    ...steps.flatMap((index) => book.entries[index] ?? []),
  ]);
}

function unique(uses: readonly string[]): readonly string[] {
  return [...new Set(uses)];
}
