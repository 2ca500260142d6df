// What is asked of a frame: a result, and under which of its load cases.

import type { Wanted } from "./wanted.ts";

/** A load case counted from 0, times a factor. */
export interface CasePart {
  readonly loadCase: number;
  readonly factor: number;
}

/** Under which load: one case, the first when nothing is said; or a sum of cases, each as it is or times a factor. */
export interface InCase {
  readonly loadCase?: number;
  /** Goes before `loadCase`. */
  readonly loadCases?: readonly (number | CasePart)[];
}

/** A result of one load case or of a sum of them. */
export interface WantedInCase extends InCase {
  readonly wanted: Wanted;
}

/** A hand result: which, under which load, and its value in N or N·m. */
export interface HandValue extends WantedInCase {
  readonly value: number;
}
