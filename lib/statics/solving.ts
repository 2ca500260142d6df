// The order in which a person solves free bodies: one body, one equation, one unknown at a time.
//
// The next body is one that is loaded (by loads or by forces already found), with the fewest unknowns, next to the one
// just left; it is kept until it gives no more. Equations in which nothing acts (no load along a beam) come last. On a body: moments about a point where other unknowns pass, then ΣFy, then ΣFx.
// Members and joints are simply walked along, once the forces between the parts are known.
// Bodies are joined only where no single body offers an equation with one unknown, equations taken together only after that.

import type { Step, Term } from "../results/index.ts";
import type { Body } from "./bodies.ts";
import {
  coefficientIn,
  type Equation,
  equationId,
  equationsOf,
  type Found,
  forcesOn,
  termsOf,
  unknownsIn,
  usesOf,
} from "./equations.ts";
import { simultaneous } from "./simultaneous.ts";
import { unionsOf } from "./unions.ts";

/** The state of a solution as it grows; bodies are those of one cutting, their indices begin at `offset`. */
export interface Solving {
  readonly bodies: readonly Body[];
  readonly names: readonly string[];
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
  while (which.some((i) => openForces(state, [i]).length > 0)) {
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
  const offers = [...perBody].flatMap(([body, equations]) => {
    const equation = bestOf(state, equations, usedMoments.has(body));
    if (equation === undefined) return [];
    const idle = isIdle(termsOf(equation, state.known));
    return [
      {
        body,
        equation,
        idle,
        rank: [idle ? 1 : 0, ...(manner === "walk" ? [body] : rankOf(state, body, here))],
      },
    ];
  });
  const kept = offers.find((offer) => offer.body === here && !offer.idle);
  return (kept ?? offers.sort((a, b) => compared(a.rank, b.rank))[0])?.equation;
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

/** Among the equations of one body with a single unknown, the one a person would take; those in which nothing acts last. */
function bestOf(state: Solving, equations: readonly Equation[], momentsUsed: boolean): Equation | undefined {
  const offered = equations.filter((e) => unknownsIn(e, state.known).length === 1);
  const acting = offered.filter((e) => !isIdle(termsOf(e, state.known)));
  const single = acting.length > 0 ? acting : offered;
  const passing = (e: Equation): number => openForces(state, e.bodies).length - 1;
  const moments = single.filter((e) => e.kind === "sum M");
  const first = moments.find((e) => passing(e) > 0);
  if (first !== undefined && !momentsUsed) return first;
  return single.find((e) => e.kind === "sum Fy") ?? single.find((e) => e.kind === "sum Fx") ?? moments[0];
}

/** Whether nothing with a value enters, so that the unknown is zero. */
function isIdle(terms: readonly Term[]): boolean {
  return terms.every((t) => t.value === 0);
}

function nextOnJoined(state: Solving, which: readonly number[]): Equation | undefined {
  for (const joined of unionsOf(state.bodies, which)) {
    const best = bestOf(state, equationsOf(state.bodies, joined, state.size), false);
    if (best !== undefined) return best;
  }
  return undefined;
}

function takeStep(state: Solving, equation: Equation): void {
  const [unknown = ""] = unknownsIn(equation, state.known);
  const terms = termsOf(equation, state.known);
  const coefficient = coefficientIn(equation, unknown);
  const result = -sumOf(terms) / coefficient + 0;
  push(state, equation, { terms, unknown, coefficient, result, together: [], uses: usesOf(equation, terms) });
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
  const uses = found.map(({ equation }) => usesOf(equation, termsOf(equation, state.known)));
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
    id: equationId(equation, state.names),
    bodies: equation.bodies,
    equation: equation.kind,
    ...(equation.about === undefined ? {} : { about: equation.about.point }),
    ...rest,
    ...(rest.together.length === 0 && isIdle(rest.terms) ? { idle: true } : {}),
  });
}

function mergedUses(uses: readonly Step["uses"][]): Step["uses"] {
  const merged = <T>(pick: (u: Step["uses"]) => readonly T[]): readonly T[] => [
    ...new Set(uses.flatMap(pick)),
  ];
  return {
    loads: merged((u) => u.loads),
    joints: merged((u) => u.joints),
    steps: merged((u) => u.steps),
    hinges: merged((u) => u.hinges),
  };
}

function compared(a: readonly number[], b: readonly number[]): number {
  for (let i = 0; i < a.length; i++) if (a[i] !== b[i]) return (a[i] ?? 0) - (b[i] ?? 0);
  return 0;
}
