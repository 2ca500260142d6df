// Straight lines held along their axis at both ends, such as a beam fixed at both: by first-order theory the redundant
// axial reaction is zero, whatever the stiffness, as long as no load acts along the line.

import { deepFreeze, type Load, resists, type Structure, type Support } from "../structure/index.ts";
import { eliminate, rankOf } from "./elimination.ts";
import { type Equilibrium, equilibriumMatrix, loadVector } from "./equilibrium-matrix.ts";
import { StaticsError } from "./faults.ts";
import { areLines, selfStressVectors } from "./self-stress.ts";

export interface Settled {
  /** The structure with the redundant axial holds let go. */
  readonly structure: Structure;
  /** The reactions that are zero for it. */
  readonly zero: readonly { readonly joint: string; readonly component: "x" | "y" }[];
  readonly notes: readonly string[];
}

/** Lets go the axial holds that are redundant; the structure unchanged when its redundancy is not axial only.
 *  Throws when a load acts along such a line. */
export function settleAxial(structure: Structure, loads: readonly Load[]): Settled {
  const zero: { joint: string; component: "x" | "y" }[] = [];
  let current = structure;
  for (let redundant = axialStates(current); redundant > 0; redundant--) {
    const let_go = nextToRelease(current, redundant);
    if (let_go === undefined) return { structure, zero: [], notes: [] };
    current = let_go.structure;
    zero.push({ joint: let_go.joint, component: let_go.component });
  }
  if (zero.length > 0) checkUnloaded(structure, current, loads);
  return { structure: current, zero, notes: zero.map(({ joint, component }) => noteOf(joint, component)) };
}

/** Number of states of self-stress when all of them are axial force along straight lines, otherwise zero. */
function axialStates(structure: Structure): number {
  const equilibrium = equilibriumMatrix(structure);
  const { matrix, unknowns, equations } = equilibrium;
  // as many unknowns as independent equations: nothing is redundant, as nearly always here
  if (unknowns.length === equations && rankOf(matrix, unknowns.length) === equations) return 0;
  const states = selfStressVectors(equilibrium);
  return areLines(equilibrium, states) ? states.length : 0;
}

function nextToRelease(
  structure: Structure,
  redundant: number,
): { readonly structure: Structure; readonly joint: string; readonly component: "x" | "y" } | undefined {
  for (const support of [...structure.supports].reverse())
    for (const component of ["x", "y"] as const) {
      if (!resists(support, component)) continue;
      const supports = structure.supports.map((s) => (s === support ? letGo(s, component) : s));
      const released = deepFreeze({ ...structure, supports });
      if (isWeakerByOne(structure, released, redundant))
        return { structure: released, joint: support.joint, component };
    }
  return undefined;
}

function letGo(support: Support, component: "x" | "y"): Support {
  const { springs, ...rest } = support;
  const holds = { ...support.holds, [component]: false };
  return springs === undefined
    ? { ...rest, holds }
    : { ...rest, holds, springs: { ...springs, [component]: 0 } };
}

/** One state of self-stress less and no motion more. */
function isWeakerByOne(before: Structure, after: Structure, redundant: number): boolean {
  const [one, other] = [equilibriumMatrix(before), equilibriumMatrix(after)];
  const rank = eliminate(one.matrix, one.unknowns.length).rank;
  const left = eliminate(other.matrix, other.unknowns.length);
  return left.rank === rank && left.nullSpace.length === redundant - 1;
}

/** The members in the redundant lines must carry no axial force once the holds are let go. */
function checkUnloaded(before: Structure, after: Structure, loads: readonly Load[]): void {
  const stressed = segmentsStressed(equilibriumMatrix(before));
  const equilibrium = equilibriumMatrix(after);
  const b = loadVector(equilibrium, loads).map((v) => -v);
  const [t] = eliminate(equilibrium.matrix, equilibrium.unknowns.length, [b]).solutions;
  const scale = Math.max(...b.map(Math.abs));
  const force = (k: number): number => Math.abs(t?.[k] ?? 0);
  const loaded = equilibrium.unknowns.some(
    (u, k) => u.kind === "N" && stressed.has(u.segment) && force(k) > 1e-9 * scale,
  );
  if (!loaded && !loadedAlong(before, loads, equilibrium, stressed)) return;
  const joints = before.supports.filter((s, i) => s !== after.supports[i]);
  const others = before.supports.filter((s) => !joints.includes(s) && (resists(s, "x") || resists(s, "y")));
  throw new StaticsError({ kind: "axial", joints: [...others.slice(0, 1), ...joints].map((s) => s.joint) });
}

/** A load along a segment of the line that its own end happens to take, out of sight of N at the segment's end. */
function loadedAlong(
  structure: Structure,
  loads: readonly Load[],
  { skeleton }: Equilibrium,
  stressed: ReadonlySet<number>,
): boolean {
  const members = new Set(skeleton.segments.filter((_, i) => stressed.has(i)).map((s) => s.member));
  return loads.some((load) => {
    if (load.kind === "joint" || !members.has(load.member)) return false;
    const segment = skeleton.segments.find((s) => s.member === load.member);
    const [fx, fy] = load.kind === "distributed" ? load.direction : [load.fx, load.fy];
    const along = fx * (segment?.c ?? 0) + fy * (segment?.s ?? 0);
    return Math.abs(along) > 1e-9 * Math.hypot(fx, fy) && structure.members.length > 0;
  });
}

function segmentsStressed(equilibrium: Equilibrium): ReadonlySet<number> {
  const { nullSpace } = eliminate(equilibrium.matrix, equilibrium.unknowns.length);
  const found = nullSpace.flatMap((state) => {
    const size = Math.max(...state.map(Math.abs));
    return equilibrium.unknowns.flatMap((u, k) =>
      u.kind === "N" && Math.abs(state[k] ?? 0) > 1e-9 * size ? [u.segment] : [],
    );
  });
  return new Set(found);
}

function noteOf(joint: string, component: string): string {
  return `${joint}_${component} = 0: the line is held along its axis at another support and no load acts along it (first-order theory, whatever the stiffness)`;
}
