// Which loads of several hinge sets really act on the frame.

import type { Load } from "../structure/types.ts";
import type { HingeSet, LoadCase } from "./types.ts";

/** The load cases of hinge sets without those that only let go the holding forces of another of them: what acts on the frame. */
export function actualCases(sets: readonly HingeSet[]): readonly LoadCase[] {
  const names = new Set(sets.map(({ name }) => name));
  return sets.flatMap(({ cases }) =>
    cases.filter(({ releases }) => releases === undefined || !names.has(releases)),
  );
}

/** Their loads. */
export function actualLoads(sets: readonly HingeSet[]): readonly Load[] {
  return actualCases(sets).flatMap(({ loads }) => loads);
}

/** The loads the free bodies of a set are solved under: those of its cases, and couples at ends whose moment is taken as known. */
export function solvedLoads({ cases, couples = [] }: HingeSet): readonly Load[] {
  return [...cases.flatMap(({ loads }) => loads), ...couples];
}
