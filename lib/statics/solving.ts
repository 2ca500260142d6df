// The order in which a person solves free bodies: one body, one equation, one unknown at a time.
//
// The next body is one that is loaded (by loads or by forces already found), with the fewest unknowns, next to the one
// just left; it is kept until it gives no more. Equations in which nothing acts (no load along a beam) come last.
// On a body: moments about a point where other unknowns pass, then ΣFy, then ΣFx; where none of these gives a single unknown,
// forces along and across an inclined member, then moments about the point where two unknown forces meet.
// Members and joints are simply walked along, once the forces between the parts are known.
// Bodies are joined only where no single body offers an equation with one unknown, the whole structure before smaller sets;
// equations are taken together only after that.

import type { Step, Term } from "../results/index.ts";
import type { Structure } from "../structure/index.ts";
import type { Body } from "./bodies.ts";
import {
  actingOn,
  coefficientIn,
  type Equation,
  equationId,
  equationsOf,
  type Found,
  forcesOn,
  type NameOf,
  termsOf,
  unknownsIn,
  writtenFor,
} from "./equations.ts";
import { furtherEquations } from "./further.ts";
import { simultaneous } from "./simultaneous.ts";
import { unionsOf } from "./unions.ts";
import { mergedUses, usesOf } from "./uses.ts";

/** The state of a solution as it grows; bodies are those of one cutting. */
export interface Solving {
  readonly structure: Structure;
  readonly bodies: readonly Body[];
  readonly nameOf: NameOf;
  readonly size: number;
  readonly known: Map<string, Found>;
  readonly steps: Step[];
  /** The equations used, in the order of their steps. */
  readonly used: Equation[];
}

/** How the next body is chosen: by its load and unknowns, or by walking along the structure. */
export type Manner = "pick" | "walk";

/** Finds every force on the bodies of `which`; those of earlier cuttings may be known already. */
export function solveBodies(state: Solving, which: readonly number[], manner: Manner): void {
  const perBody = new Map(which.map((i) => [i, equationsOf(state.bodies, [i], state.size)]));
  const usedMoments = new Set<number>();
  let here: number | undefined;
  while (which.some((i) => isOpen(state, i))) {
    const next = nextOnOne(state, perBody, usedMoments, here, manner);
    if (next !== undefined) {
      here = next.bodies[0];
      if (next.kind === "sum M" && here !== undefined) usedMoments.add(here);
      takeStep(state, next);
      continue;
    }
    const joined = nextOnJoined(state, which);
    if (joined !== undefined) takeStep(state, joined);
    else takeTogether(state, [...perBody.values()].flat());
  }
}

function isOpen({ bodies, known }: Solving, body: number): boolean {
  return (bodies[body]?.pushes ?? []).some(({ force }) => force !== undefined && !known.has(force.name));
}

function openForces({ bodies, known }: Solving, joined: readonly number[]): readonly string[] {
  return forcesOn(bodies, joined).filter((name) => !known.has(name));
}

/** The best equation on the body at hand, or on the best other body that offers one. */
function nextOnOne(
  state: Solving,
  perBody: ReadonlyMap<number, readonly Equation[]>,
  usedMoments: ReadonlySet<number>,
  here: number | undefined,
  manner: Manner,
): Equation | undefined {
  const offer = (body: number, equation: Equation, plain: boolean): Offer => {
    // a moment that is zero because nothing acts is said where it stands: the next ones follow from it
    const waits = manner === "pick" || equation.kind !== "sum M";
    const idle = waits && isIdle(termsOf(equation, state.known));
    const order = manner === "walk" ? [body] : rankOf(state, body, here);
    return { body, equation, idle, rank: [idle ? 1 : 0, plain ? 0 : 1, ...order] };
  };
  const open = [...perBody].filter(([body]) => isOpen(state, body));
  const offers = open.flatMap(([body, equations]) => {
    const best = bestOf(state, equations, usedMoments.has(body));
    return best === undefined ? [] : [offer(body, best, true)];
  });
  const furtherOf = (body: number): readonly Offer[] =>
    further(state, [body])
      .slice(0, 1)
      .map((equation) => offer(body, equation, false));
  const kept = [
    ...offers.filter((o) => o.body === here),
    ...(here !== undefined && open.some(([body]) => body === here) ? furtherOf(here) : []),
  ].find((o) => !o.idle);
  if (kept !== undefined) return kept.equation;
  const acting = offers.some((o) => !o.idle);
  const all = acting ? offers : [...offers, ...open.flatMap(([body]) => furtherOf(body))];
  return all.sort((a, b) => compared(a.rank, b.rank))[0]?.equation;
}

interface Offer {
  readonly body: number;
  readonly equation: Equation;
  /** Whether nothing acts in it and it can wait. */
  readonly idle: boolean;
  readonly rank: readonly number[];
}

/** Lower is sooner: loaded, few unknowns, next to the body at hand, in order. */
function rankOf(state: Solving, body: number, here: number | undefined): readonly number[] {
  const forces = forcesOn(state.bodies, [body]);
  const neighbour =
    here !== undefined && forcesOn(state.bodies, [here]).some((name) => forces.includes(name));
  return [isLoaded(state, body) ? 0 : 1, openForces(state, [body]).length, neighbour ? 0 : 1, body];
}

function isLoaded({ bodies, known }: Solving, body: number): boolean {
  return (bodies[body]?.pushes ?? []).some(({ force }) =>
    force === undefined ? true : (known.get(force.name)?.value ?? 0) !== 0,
  );
}

/** Among the equations of one body with a single unknown, the one a person would take; those in which nothing acts last.
 *  N and V of an inclined member are found along and across it. */
function bestOf(state: Solving, equations: readonly Equation[], momentsUsed: boolean): Equation | undefined {
  const offered = equations.filter((e) => unknownsIn(e, state.known).length === 1);
  if (offered.length === 0) return undefined;
  const acting = offered.filter((e) => !isIdle(termsOf(e, state.known)));
  const single = acting.length > 0 ? acting : offered;
  const passing = (e: Equation): number => openForces(state, e.bodies).length - 1;
  const moments = single.filter((e) => e.kind === "sum M");
  const first = moments.find((e) => passing(e) > 0);
  if (first !== undefined && !momentsUsed) return first;
  const upright = single.find((e) => e.kind === "sum Fy") ?? single.find((e) => e.kind === "sum Fx");
  const plain = upright ?? moments[0];
  if (plain === undefined || !findsInclinedCut(state, plain)) return plain;
  return alongSlope(state, plain) ?? plain;
}

/** Whether the single unknown is N or V beside a joint of an inclined member. */
function findsInclinedCut({ known }: Solving, equation: Equation): boolean {
  const [unknown] = unknownsIn(equation, known);
  const push = equation.entries.find((e) => e.push.force?.name === unknown)?.push;
  const [dx, dy] = push?.action.direction ?? [1, 0];
  const bar = `${push?.line !== undefined && "member" in push.line ? push.line.member : ""}_N`;
  return push?.force?.kind === "cut" && unknown !== bar && Math.abs(dx * dy) > 1e-12;
}

function alongSlope(state: Solving, equation: Equation): Equation | undefined {
  return further(state, equation.bodies).find((e) => e.kind === "sum F" && !isIdle(termsOf(e, state.known)));
}

function further(state: Solving, joined: readonly number[]): readonly Equation[] {
  const { structure, bodies, known, size } = state;
  const named = (x: number, y: number): string | undefined =>
    structure.joints.find((j) => Math.hypot(j.x - x, j.y - y) < 1e-9 * size)?.name;
  return furtherEquations(bodies, joined, known, size, named);
}

/** Whether nothing with a value enters, so that the unknown is zero. */
function isIdle(terms: readonly Term[]): boolean {
  return terms.every((t) => t.value === 0);
}

/** The whole structure first, then small sets; sets on which nothing acts after all others, further equations last. */
function nextOnJoined(state: Solving, which: readonly number[]): Equation | undefined {
  if (which.length < 2) return undefined;
  const idle: Equation[] = [];
  const sets: (readonly number[])[] = [];
  const take = (joined: readonly number[]): Equation | undefined => {
    const best = promises(state, joined)
      ? bestOf(state, equationsOf(state.bodies, joined, state.size), false)
      : undefined;
    if (best === undefined || !isIdle(termsOf(best, state.known))) return best;
    idle.push(best);
    return undefined;
  };
  const whole = take(which);
  if (whole !== undefined) return whole;
  for (const joined of unionsOf(state.bodies, which, (name) => !state.known.has(name))) {
    const best = take(joined);
    if (best !== undefined) return best;
    sets.push(joined);
  }
  if (idle[0] !== undefined) return idle[0];
  for (const joined of [which, ...sets]) {
    const [found] = further(state, joined);
    if (found !== undefined) return found;
  }
  return undefined;
}

/** Whether ΣFx, ΣFy or ΣM about a point of an unknown force can hold a single unknown: a quick look before writing them all. */
function promises({ bodies, known, size }: Solving, joined: readonly number[]): boolean {
  const open = actingOn(bodies, joined).flatMap(({ force, action }) =>
    force === undefined || known.has(force.name) ? [] : [action],
  );
  if (open.length === 0) return false;
  const single = (part: (action: (typeof open)[number]) => number): boolean =>
    open.filter((action) => Math.abs(part(action)) > 1e-12).length === 1;
  return (
    single((a) => a.direction[0]) ||
    single((a) => a.direction[1]) ||
    open.some(({ at: p }) =>
      single((a) => a.turn + ((a.at.x - p.x) * a.direction[1] - (a.at.y - p.y) * a.direction[0]) / size),
    )
  );
}

function takeStep(state: Solving, equation: Equation): void {
  const [unknown = ""] = unknownsIn(equation, state.known);
  const terms = termsOf(equation, state.known);
  const coefficient = coefficientIn(equation, unknown);
  const result = -sumOf(terms) / coefficient + 0;
  const uses = usesOf(state.structure, equation, terms, state.known);
  push(state, equation, { terms, unknown, coefficient, result, together: [], uses });
}

/** Sum of the terms; rounding left where they cancel is zero, else it would count as a load further on. */
function sumOf(terms: readonly Term[]): number {
  const parts = terms.map((t) => t.coefficient * t.value);
  const sum = parts.reduce((total, part) => total + part, 0);
  const size = parts.reduce((total, part) => total + Math.abs(part), 0);
  return Math.abs(sum) <= 1e-13 * size ? 0 : sum;
}

/** The smallest set of equations with as many unknowns; all of them stand on what any of them stands on. */
function takeTogether(state: Solving, equations: readonly Equation[]): void {
  const found = simultaneous(equations, state.known);
  const first = state.steps.length;
  const partners = found.map((_, i) => first + i);
  const uses = found.map(({ equation }) =>
    usesOf(state.structure, equation, termsOf(equation, state.known), state.known),
  );
  const all = mergedUses(uses);
  found.forEach(({ unknown, result }, i) => {
    state.known.set(unknown, { value: result, step: first + i });
  });
  found.forEach(({ equation, unknown, result }, i) => {
    const terms = termsOf(equation, state.known, unknown);
    const together = partners.filter((step) => step !== first + i);
    push(state, equation, {
      terms,
      unknown,
      coefficient: coefficientIn(equation, unknown),
      result,
      together,
      uses: all,
    });
  });
}

function push(
  state: Solving,
  equation: Equation,
  rest: Pick<Step, "terms" | "unknown" | "coefficient" | "result" | "together" | "uses">,
): void {
  state.known.set(rest.unknown, { value: rest.result, step: state.steps.length });
  state.used.push(equation);
  state.steps.push({
    id: equationId(equation, state.nameOf),
    bodies: equation.bodies,
    equation: equation.kind,
    ...writtenFor(equation),
    ...rest,
    ...(rest.together.length === 0 && isIdle(rest.terms) ? { idle: true } : {}),
  });
}

function compared(a: readonly number[], b: readonly number[]): number {
  for (let i = 0; i < a.length; i++) if (a[i] !== b[i]) return (a[i] ?? 0) - (b[i] ?? 0);
  return 0;
}
