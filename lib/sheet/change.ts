// What differs between two records of one calculation, as plain data.

/** A value before and after; `percent` is the change in percent of the value before,
 *  positive where it grew in its own sense (-80 to -88 is +10), absent where it was nought. */
export interface ValueChange {
  readonly before: string;
  readonly after: string;
  readonly percent?: number;
}

interface LineChange {
  /** Entry id, and the symbol or words a reader knows it by. */
  readonly id: string;
  readonly name: string;
}

/** A given or assumption that changed: its value, where it was taken from, its reason or its wording. */
export interface GroundChange extends LineChange {
  readonly kind: "given" | "assumption";
  readonly value?: ValueChange;
  /** Source of a given, or reason of an assumption; empty where there was none. */
  readonly source?: { readonly before: string; readonly after: string };
  readonly words?: { readonly before: string; readonly after: string };
  /** Ids of all lines that stand on it, however far up, in the later record. */
  readonly standing: readonly string[];
}

/** A line with a value that changed: a result, a calculation, a step, one number of a table. */
export interface ResultChange extends LineChange {
  readonly kind: "result" | "calc" | "step" | "table";
  readonly value: ValueChange;
  readonly governing: boolean;
}

/** A band that lies otherwise about its value: of a result by itself, of a table how many. A band that only grew with its
 *  value, in the same ratios to it, has not changed. */
export interface BandChange extends LineChange {
  readonly before: string;
  readonly after: string;
  readonly governing: boolean;
}

/** A check whose verdict, utilisation or formula is another. */
export interface CheckChange extends LineChange {
  readonly before: string;
  readonly after: string;
  /** Passed before and does not now, or the other way round. */
  readonly turned: boolean;
}

/** A line whose words are other: a formula, a finding, a note, a figure's caption, a text. */
export interface WordChange extends LineChange {
  readonly kind: string;
  readonly before: string;
  readonly after: string;
}

export interface LineNamed extends LineChange {
  readonly kind: string;
}

/** Everything that differs between two records; lines that are the same are not listed. */
export interface Changes {
  readonly head: readonly { readonly field: string; readonly before: string; readonly after: string }[];
  readonly grounds: readonly GroundChange[];
  readonly results: readonly ResultChange[];
  /** Absent where no band changed. */
  readonly bands?: readonly BandChange[];
  readonly checks: readonly CheckChange[];
  /** Questions raised now that were not before: a hinge out of its range among them. */
  readonly raised: readonly LineNamed[];
  readonly settled: readonly LineNamed[];
  readonly words: readonly WordChange[];
  readonly added: readonly LineNamed[];
  readonly removed: readonly LineNamed[];
}
