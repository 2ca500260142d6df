// Motions that strain nothing: the left null space of the equilibrium matrix, as displacements.

import type { Mechanism } from "../results/index.ts";
import { deepFreeze } from "../structure/index.ts";
import { eliminate, separated, transposed } from "./elimination.ts";
import { type Equilibrium, isShearless } from "./equilibrium-matrix.ts";
import { motionWords } from "./motion-words.ts";

/** The vectors of displacement, one component per equation (rotations times Lc), each with a largest translation of 1. */
export function motionsOf(equilibrium: Equilibrium): readonly Float64Array[] {
  const { matrix, unknowns, equations } = equilibrium;
  const { nullSpace } = eliminate(transposed(matrix, unknowns.length), equations);
  return separated(nullSpace).map((motion) => oriented(equilibrium, motion));
}

/** One motion in plain data and words. `sense` -1 turns it round. */
export function mechanism(equilibrium: Equilibrium, motion: Float64Array, sense: 1 | -1 = 1): Mechanism {
  const { skeleton, rows, releases, size } = equilibrium;
  const component = (row: number | undefined): number => tidy(sense * (motion[row ?? -1] ?? 0));
  const points = skeleton.nodes.map((node, i) => ({
    name: node.name,
    ux: component(rows[i]?.x),
    uy: component(rows[i]?.y),
  }));
  const turns = skeleton.segments.map(({ member, begin, end, length, c, s, from, to }, i) => {
    const ends = releases[i];
    if (ends !== undefined && isShearless(ends)) {
      // Its ends slide past its nodes; it turns with the node it is rigidly connected to.
      const rotation = component(rows[ends.start.moment ? to : from]?.moment) / size;
      return { member, begin, end, rotation };
    }
    const [a, b] = [points[from], points[to]];
    const across = ((b?.uy ?? 0) - (a?.uy ?? 0)) * c - ((b?.ux ?? 0) - (a?.ux ?? 0)) * s;
    return { member, begin, end, rotation: tidy(across / length) };
  });
  return deepFreeze({ points, turns, words: motionWords(equilibrium.structure, skeleton, points, turns) });
}

/** Scaled to a largest translation of 1 (rotation, where nothing moves); towards the right at the first joint that moves sideways, else down where it moves most. */
function oriented({ rows }: Equilibrium, motion: Float64Array): Float64Array {
  const ux = rows.map((r) => motion[r.x] ?? 0);
  const uy = rows.map((r) => motion[r.y] ?? 0);
  const moved = Math.max(...ux.map(Math.abs), ...uy.map(Math.abs));
  const most = motion.reduce((m, u) => Math.max(m, Math.abs(u)), 0);
  const size = moved > 1e-9 * most ? moved : most; // a joint may turn while nothing moves
  const sideways = ux.find((u) => Math.abs(u) > 1e-6 * size);
  const vertical = uy.reduce((most, u) => (Math.abs(u) > Math.abs(most) + 1e-6 * size ? u : most), 0);
  const sense = (sideways ?? -vertical) < 0 ? -1 : 1;
  return motion.map((u) => (sense * u) / size);
}

/** Rounding noise to zero, so that a still joint reads as still. */
function tidy(value: number): number {
  return Math.abs(value) < 1e-12 ? 0 : value;
}
