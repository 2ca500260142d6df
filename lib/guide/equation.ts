// A free-body equation as it is written: terms by name, the numbers in their place, the result.

import { type Quantity, quantity } from "../quantity/index.ts";
import type { FreeBodySolution, Step, Term } from "../results/types.ts";
import { type FormulaLines, shownValue, symbolTex, valueTex } from "../sheet/index.ts";
import { closedSum } from "./nought.ts";

/** What an equation needs to know of the solution it belongs to: the unknowns, and what the loads are called. */
export interface Named {
  readonly solution: FreeBodySolution;
  /** By load: the symbol of its resultant. */
  readonly loadNames: readonly string[];
}

type Equation = Pick<Step, "equation" | "about" | "along" | "terms">;

/** The dimension of what an equation adds up. */
export function sumDimension(equation: Step["equation"]): "force" | "moment" {
  return equation === "sum M" ? "moment" : "force";
}

/** "ΣFx", "ΣM about A", "ΣF along BC"; a point that is no joint is O, where two forces meet. */
export function equationText({ equation, about, along }: Omit<Equation, "terms">): string {
  if (about?.meets !== undefined) return `ΣM about O, ${about.name}`;
  if (equation === "sum M") return `ΣM about ${about?.name ?? "a point"}`;
  if (equation === "sum F") return `ΣF ${along?.name ?? "along a member"}`;
  return equation === "sum Fx" ? "ΣFx" : "ΣFy";
}

/** A step in three lines of TeX. */
export function stepLines(step: Step, named: Named): FormulaLines {
  const last = unknownTerm(step, named);
  return {
    symbols: `${sumTex(step)} = 0:\\quad ${joinTerms([...termsBySymbol(step, named), last])} = 0`,
    numbers: `${joinTerms([...termsByNumber(step), last])} = 0`,
    result: `${forceTex(step.unknown, named)} = ${valueTex(shownValue(forceQuantity(step.unknown, step.result, named)))}`,
  };
}

/** Unknowns that are zero because nothing acts in their equations, in three lines of TeX. */
export function idleLines(steps: readonly [Step, ...Step[]], named: Named): FormulaLines {
  const [{ equation, unknown, result }] = steps;
  const names = steps.map((step) => forceTex(step.unknown, named)).join(" = ");
  const zero = valueTex(shownValue(forceQuantity(unknown, result, named)));
  const sum = equation === "sum M" ? "\\sum M" : sumTex(steps[0]);
  return { symbols: `${sum} = 0:\\quad ${names} = 0`, numbers: "0 = 0", result: `${names} = ${zero}` };
}

/** An equation without unknowns in three lines of TeX: it closes or it does not. */
export function closureLines(
  closure: Equation & { readonly sum: number; readonly scale: number },
  named: Named,
): FormulaLines {
  const sum = quantity(closedSum(closure.sum, closure.scale), sumDimension(closure.equation));
  return {
    symbols: `${sumTex(closure)} = ${joinTerms(termsBySymbol(closure, named))}`,
    numbers: joinTerms(termsByNumber(closure)),
    result: `${sumTex(closure)} = ${valueTex(shownValue(sum))}`,
  };
}

/** The value of an unknown with its dimension. */
export function forceQuantity(
  name: string,
  value: number,
  { solution }: Named,
  from: readonly string[] = [],
): Quantity<"force"> | Quantity<"moment"> {
  const dimension = solution.forces.find((force) => force.name === name)?.dimension ?? "force";
  return quantity<"force" | "moment">(value, dimension, { from }) as Quantity<"force"> | Quantity<"moment">;
}

/** An unknown by its symbol. */
export function forceTex(name: string, { solution }: Named): string {
  return solution.forces.find((force) => force.name === name)?.tex ?? symbolTex(name);
}

/** An unknown as plain text with one subscript, as figures print it: X_h1, M_BC,B. */
export function forceText(name: string, named: Named): string {
  return forceTex(name, named)
    .replace(/\\mathrm\{([^}]*)\}/g, "$1")
    .replace(/[{}]/g, "");
}

function sumTex({ equation, about, along }: Omit<Equation, "terms">): string {
  if (equation === "sum M")
    return `\\sum M_{${about?.meets === undefined ? pointTex(about?.name ?? "") : "O"}}`;
  if (equation === "sum F") return `\\sum F_{\\mathrm{${(along?.name ?? "").replaceAll(" ", "\\ ")}}}`;
  return equation === "sum Fx" ? "\\sum F_x" : "\\sum F_y";
}

function pointTex(name: string): string {
  return name.length === 1 ? name : `\\mathrm{${name}}`;
}

function unknownTerm(step: Step, named: Named): SignedTerm {
  const dimension = named.solution.forces.find((force) => force.name === step.unknown)?.dimension ?? "force";
  return termOf(step.coefficient, forceTex(step.unknown, named), isArm(step.equation, dimension));
}

function termsBySymbol({ equation, terms }: Equation, named: Named): readonly SignedTerm[] {
  return terms.map((term) =>
    termOf(term.coefficient, termTex(term, named), isArm(equation, termDimension(term))),
  );
}

function termsByNumber({ equation, terms }: Equation): readonly SignedTerm[] {
  return terms.map((term) => {
    const dimension = termDimension(term);
    const value = `(${valueTex(shownValue(quantity(term.value, dimension)))})`;
    return termOf(term.coefficient, value, isArm(equation, dimension));
  });
}

function termTex(term: Term, named: Named): string {
  if ("force" in term.source) return forceTex(term.source.force, named);
  return symbolTex(named.loadNames[term.source.load] ?? `P_${term.source.load + 1}`);
}

function termDimension({ couple }: Term): "force" | "moment" {
  return couple === true ? "moment" : "force";
}

/** Whether a coefficient is a lever arm (a length) and not a pure number. */
function isArm(equation: Step["equation"], dimension: "force" | "moment"): boolean {
  return equation === "sum M" && dimension === "force";
}

interface SignedTerm {
  readonly negative: boolean;
  readonly tex: string;
}

function termOf(coefficient: number, tex: string, arm: boolean): SignedTerm {
  const size = Math.abs(coefficient);
  const negative = coefficient < 0;
  if (arm) return { negative, tex: `(${valueTex(shownValue(quantity(size, "length")))})\\,${tex}` };
  if (Math.abs(size - 1) < 1e-12) return { negative, tex };
  return { negative, tex: `${valueTex(shownValue(quantity(size, "pure number")))}\\,${tex}` };
}

function joinTerms(terms: readonly SignedTerm[]): string {
  if (terms.length === 0) return "0";
  return terms
    .map(({ negative, tex }, i) =>
      i === 0 ? `${negative ? "-" : ""}${tex}` : `${negative ? "-" : "+"} ${tex}`,
    )
    .join(" ");
}
