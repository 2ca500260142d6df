// States of self-stress: the right null space of the equilibrium matrix, as forces in members and at supports.

import type { MemberForces, Reaction, SelfStress } from "../results/index.ts";
import { axisOf, memberNamed, type Segment } from "../structure/index.ts";
import { eliminate, separated } from "./elimination.ts";
import type { Equilibrium } from "./equilibrium-matrix.ts";
import { grows } from "./simultaneous.ts";
import { and } from "./words.ts";

/** Forces below this part of the largest are none. */
const none = 1e-9;
/** Beyond so many states they are not brought to a form in which they come apart: it costs the cube of their number. */
const most = 120;

/** A basis of the right null space, those without moments first. */
export function selfStressVectors(equilibrium: Equilibrium): readonly Float64Array[] {
  const { matrix, unknowns } = equilibrium;
  const { nullSpace } = eliminate(matrix, unknowns.length);
  if (nullSpace.length === 0 || nullSpace.length > most) return nullSpace;
  const axial = axialVectors(equilibrium);
  const basis: Float64Array[] = [];
  for (const state of axial) grows(basis, state);
  const others = separated(nullSpace).filter((state) => grows(basis, state));
  return [...separated(axial), ...others];
}

/** States in which no member bends. */
function axialVectors({ matrix, unknowns }: Equilibrium): readonly Float64Array[] {
  const kept = unknowns.flatMap((u, k) => (u.kind.startsWith("M ") ? [] : [k]));
  const narrow = matrix.map((row) => Float64Array.from(kept, (k) => row[k] ?? 0));
  return eliminate(narrow, kept.length).nullSpace.map((state) => {
    const full = new Float64Array(unknowns.length);
    kept.forEach((k, i) => {
      full[k] = state[i] ?? 0;
    });
    return full;
  });
}

/** Whether all of a structure's states are axial force along straight lines. */
export function areLines(equilibrium: Equilibrium, states: readonly Float64Array[]): boolean {
  return states.every((state) => kindOf(equilibrium, state) === "line");
}

/** One state in plain data and words. */
export function selfStress(equilibrium: Equilibrium, vector: Float64Array): SelfStress {
  const size = vector.reduce((most, t) => Math.max(most, Math.abs(t)), 0);
  const lead = vector.find((t) => Math.abs(t) > none * size) ?? 1;
  const state = vector.map((t) => tidy((Math.sign(lead) * t) / size));
  const members = membersOf(equilibrium, state);
  const reactions = reactionsOf(equilibrium, state);
  const kind = kindOf(equilibrium, state);
  return { members, reactions, kind, words: wordsOf(kind, members, reactions) };
}

function membersOf(equilibrium: Equilibrium, state: Float64Array): readonly MemberForces[] {
  const { structure, skeleton, size } = equilibrium;
  const forces = segmentForces(equilibrium, state);
  return structure.members.flatMap(({ name }): MemberForces[] => {
    const own = skeleton.segments.flatMap((s, i) => (s.member === name ? [{ s, ...forces[i] }] : []));
    if (own.every(({ N = 0, start = 0, end = 0 }) => N === 0 && start === 0 && end === 0)) return [];
    const breaks = [0, ...own.map(({ s }) => s.end)];
    const slope = (s: Segment, start: number, end: number): number => ((end - start) * size) / s.length;
    return [
      {
        member: name,
        length: breaks[breaks.length - 1] ?? 0,
        N: { breaks, pieces: own.map(({ N = 0 }) => [N]) },
        V: { breaks, pieces: own.map(({ s, start = 0, end = 0 }) => [slope(s, start, end)]) },
        M: { breaks, pieces: own.map(({ s, start = 0, end = 0 }) => [start * size, slope(s, start, end)]) },
        uses: [],
      },
    ];
  });
}

interface Forces {
  N?: number;
  start?: number;
  end?: number;
}

function segmentForces({ unknowns, skeleton }: Equilibrium, state: Float64Array): readonly Forces[] {
  const forces: Forces[] = skeleton.segments.map(() => ({}));
  unknowns.forEach((unknown, k) => {
    if (unknown.kind === "reaction") return;
    const own = forces[unknown.segment];
    const value = state[k] ?? 0;
    if (own === undefined) return;
    if (unknown.kind === "N") own.N = value;
    if (unknown.kind === "M start" || unknown.kind === "M throughout") own.start = value;
    if (unknown.kind === "M end" || unknown.kind === "M throughout") own.end = value;
  });
  return forces;
}

function reactionsOf({ structure, unknowns, size }: Equilibrium, state: Float64Array): readonly Reaction[] {
  return structure.supports.flatMap(({ joint, angle = 0 }): Reaction[] => {
    const own = { x: 0, y: 0, moment: 0 };
    unknowns.forEach((u, k) => {
      if (u.kind === "reaction" && u.joint === joint) own[u.component] = state[k] ?? 0;
    });
    if (own.x === 0 && own.y === 0 && own.moment === 0) return [];
    const [c, s] = [Math.cos(angle), Math.sin(angle)];
    const [x, y, moment] = [tidy(own.x * c - own.y * s), tidy(own.x * s + own.y * c), own.moment * size];
    return [
      {
        joint,
        ...(x === 0 ? {} : { x }),
        ...(y === 0 ? {} : { y }),
        ...(moment === 0 ? {} : { moment }),
        steps: {},
      },
    ];
  });
}

function kindOf({ structure, skeleton, unknowns }: Equilibrium, state: Float64Array): SelfStress["kind"] {
  const size = state.reduce((most, t) => Math.max(most, Math.abs(t)), 0);
  const acting = unknowns.filter((_, k) => Math.abs(state[k] ?? 0) > none * size);
  if (acting.some((u) => u.kind.startsWith("M ") || (u.kind === "reaction" && u.component === "moment")))
    return "bending";
  const members = acting.flatMap((u) =>
    u.kind === "reaction" ? [] : (skeleton.segments[u.segment]?.member ?? []),
  );
  const axes = [...new Set(members)].map((m) => axisOf(structure, memberNamed(structure, m, "self-stress")));
  const [first] = axes;
  const near = 1e-9 * Math.max(0, ...axes.map((a) => a.length));
  const offLine = (x: number, y: number): boolean =>
    first === undefined || Math.abs((x - first.start.x) * first.s - (y - first.start.y) * first.c) > near;
  return axes.some(({ start, end }) => offLine(start.x, start.y) || offLine(end.x, end.y)) ? "bars" : "line";
}

function wordsOf(
  kind: SelfStress["kind"],
  members: readonly MemberForces[],
  reactions: readonly Reaction[],
): string {
  const names = and(members.map((m) => m.member));
  const held = reactions.length === 0 ? "" : `, held at ${and(reactions.map((r) => r.joint))}`;
  if (members.length === 0) return `reactions at ${and(reactions.map((r) => r.joint))} against one another`;
  if (kind === "line") return `axial force along ${names}${held}`;
  return kind === "bars" ? `axial forces in ${names}${held}` : `bending of ${names}${held}`;
}

function tidy(value: number): number {
  return Math.abs(value) < none ? 0 : value;
}
