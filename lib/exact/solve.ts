// Assembling, factoring and solving for given stiffnesses. Forces always follow from deformations of the segments, never
// from products of the matrix, so the residual is as exact as the forces; each further step refines the solution.
// Entries of typed arrays within their length are numbers; `as number` says so to the compiler without a test at run time.

import { factorize, solveFactored } from "./envelope.ts";
import { refuseIfFree } from "./free-motion.ts";
import type { LoadCase } from "./load-case.ts";
import type { Prepared } from "./prepare.ts";
import { segmentForces, takeSegmentForces } from "./segment-forces.ts";
import { checkStiffness, type Stiffness } from "./stiffness.ts";

/** Solution of one load case, SI. */
export interface SolvedCase {
  /** Displacements in the numbering of the preparation. */
  readonly u: Float64Array;
  /** n, m1, m2 of each segment (see basic-beam.ts). */
  readonly q: Float64Array;
  /** Loads less internal forces at all displacements: near zero at free ones, minus the reaction at held ones. */
  readonly r: Float64Array;
}

export interface Solved {
  /** The factors of the stiffness matrix. */
  readonly factors: Float64Array;
  readonly cases: readonly SolvedCase[];
}

/** Empty room for a solution, to be used again and again. */
export function roomFor({ envelope, numbering, segments, loadCases }: Prepared): Solved {
  return {
    factors: new Float64Array(envelope.size),
    cases: loadCases.map(() => ({
      u: new Float64Array(numbering.total + 1),
      q: new Float64Array(3 * segments.count),
      r: new Float64Array(numbering.total + 1),
    })),
  };
}

/** Solves all load cases for stiffnesses per member (EA in N, EI in N·m²) and per spring. `refinements` further steps
 *  sharpen the solution; `room` is overwritten and returned. Throws when something can move freely, naming the motion. */
export function solve(
  prepared: Prepared,
  stiffness: Stiffness,
  {
    refinements = 1,
    room = roomFor(prepared),
  }: { readonly refinements?: number; readonly room?: Solved } = {},
): Solved {
  checkStiffness(prepared, stiffness);
  assemble(prepared, stiffness, room.factors);
  factorize(prepared.envelope, room.factors, (row) => refuseIfFree(prepared, stiffness, room.factors, row));
  prepared.loadCases.forEach((loads, i) => {
    const solved = room.cases[i];
    if (solved === undefined) return;
    start(prepared, stiffness, loads, solved);
    correct(prepared, room.factors, solved);
    for (let step = 0; step < refinements; step++) {
      balance(prepared, stiffness, loads, solved);
      correct(prepared, room.factors, solved);
    }
    balance(prepared, stiffness, loads, solved);
  });
  return room;
}

/** The stiffness matrix over the free displacements. */
export function assemble(
  { coefficients, segments, springs, envelope, numbering }: Prepared,
  stiffness: Stiffness,
  a: Float64Array,
): void {
  const { begin, place, alpha, beta } = coefficients;
  const { count, member } = segments;
  a.fill(0);
  for (let e = 0; e < count; e++) {
    const EA = stiffness.EA[member[e] as number] as number;
    const EI = stiffness.EI[member[e] as number] as number;
    const end = begin[e + 1] as number;
    for (let p = begin[e] as number; p < end; p++) {
      const at = place[p] as number;
      a[at] = (a[at] as number) + EA * (alpha[p] as number) + EI * (beta[p] as number);
    }
  }
  springs.forEach((spring, k) => {
    if (spring.place >= numbering.free) return;
    const at = (envelope.shift[spring.place] as number) + spring.place;
    a[at] = (a[at] as number) + (stiffness.springs[k] as number);
  });
}

/** Displacements before the first step, the ground's at held places, else zero; and what is left over then. */
function start(prepared: Prepared, stiffness: Stiffness, loads: LoadCase, solved: SolvedCase): void {
  const { free, total } = prepared.numbering;
  const { ground, thermal, unmoved } = loads;
  solved.u.fill(0);
  if (ground !== undefined) for (let i = free; i < total; i++) solved.u[i] = ground[i] as number;
  if (ground !== undefined || thermal !== undefined) balance(prepared, stiffness, loads, solved);
  else solved.r.set(unmoved);
}

/** Forces q from displacements u, and what is left over at each displacement: r = f - internal forces. */
function balance(
  { segments, springs }: Prepared,
  stiffness: Stiffness,
  loads: LoadCase,
  { u, q, r }: SolvedCase,
): void {
  segmentForces(segments, stiffness, loads, u, q);
  r.set(loads.f);
  takeSegmentForces(segments, q, r);
  springs.forEach(({ place }, k) => {
    const moved = (u[place] as number) - (loads.ground?.[place] ?? 0);
    r[place] = (r[place] as number) - (stiffness.springs[k] as number) * moved;
  });
  r[r.length - 1] = 0;
}

/** One step: K du = r over the free displacements. */
function correct({ envelope, numbering }: Prepared, factors: Float64Array, { u, r }: SolvedCase): void {
  solveFactored(envelope, factors, r);
  for (let i = 0; i < numbering.free; i++) u[i] = (u[i] as number) + (r[i] as number);
}
