// The record: one run of a calculation as plain JSON. Numbers are SI; `unit` is the unit they are shown in.

import type { Changes } from "./change.ts";

export type * from "./change.ts";

export const RECORD_FORMAT = "hingebook record" as const;
export const RECORD_VERSION = 0 as const;

/** A number in SI with the dimension it has and the unit and text it is shown with, e.g. 5200, "force per length", "kN/m", "5.20 kN/m". */
export interface ShownValue {
  readonly si: number;
  readonly dimension: string;
  readonly unit: string;
  readonly text: string;
}

/** How the true value lies about a hand value: the same result of many frames, the stiffnesses and bases that are not known tried
 *  within their ranges, each frame solved exactly. */
export interface ResultBand {
  /** 90 % of the true values lie between these two. */
  readonly low: ShownValue;
  readonly high: ShownValue;
  /** Of all frames tried. */
  readonly least: ShownValue;
  readonly greatest: ShownValue;
  /** What `against` holds: true over hand, or true less hand where the hand value is near zero. */
  readonly measure: "ratio" | "difference";
  /** The same four in that measure, a pure number or SI. */
  readonly against: {
    readonly low: number;
    readonly high: number;
    readonly least: number;
    readonly greatest: number;
  };
  /** The middle of the true values over the hand value, less 1, shown in percent; or less the hand value. */
  readonly bias: ShownValue;
  /** Only one frame was tried, nothing that matters being unknown. */
  readonly single?: true;
  /** What was tried and what was not. */
  readonly words: string;
  /** What the band stands on: the entry that says what is not known, then what the frames tried were made of. The value beside it
   *  does not stand on these. */
  readonly uses: readonly string[];
}

export interface Head {
  readonly title: string;
  readonly job: string;
  readonly preparedBy: string;
  readonly checkedBy?: string;
  readonly approvedBy?: string;
  /** Dates of checking and approval; `date` is that of preparation. */
  readonly checkedOn?: string;
  readonly approvedOn?: string;
  readonly date?: string;
  readonly revision?: string;
  readonly basis: string;
  /** The units results are shown in, e.g. "kN, m". */
  readonly units: string;
  readonly status: string;
}

interface EntryBase {
  /** Stable name: the symbol of a given, assumption, calculation or result; otherwise a name made from what the entry is about. */
  readonly id: string;
  /** Grows when the entry's value changes: "g@2" is the second value of g. */
  readonly version: number;
  /** 1-based number of the notebook cell that made it; 0 without a notebook. */
  readonly cell: number;
  /** What it stands on, each "id@version". */
  readonly uses: readonly string[];
  /** True when something it stands on has changed since. */
  readonly outOfDate: boolean;
}

/** A formula in three lines, each TeX: symbols, numbers with units, result. */
export interface FormulaLines {
  readonly symbols: string;
  readonly numbers: string;
  readonly result: string;
}

export interface GivenEntry extends EntryBase {
  readonly kind: "given";
  readonly symbol: string;
  readonly tex: string;
  readonly value: ShownValue;
  readonly description: string;
  /** Where it was taken from: "drawing S-102 rev B". */
  readonly source?: string;
  /** The value written in the notebook when another was set from outside. */
  readonly overridden?: ShownValue;
}

export interface AssumptionEntry extends EntryBase {
  readonly kind: "assumption";
  readonly symbol?: string;
  readonly tex?: string;
  readonly value?: ShownValue;
  readonly text: string;
  readonly because: string;
  /** The value written in the notebook when another was set from outside. */
  readonly overridden?: ShownValue;
}

export interface CalcEntry extends EntryBase {
  readonly kind: "calc";
  readonly symbol: string;
  readonly tex: string;
  readonly formula: string;
  readonly lines: FormulaLines;
  /** Value of each symbol the formula names, SI. */
  readonly inputs: Readonly<Record<string, number>>;
  readonly value: ShownValue;
  readonly description: string;
}

export interface CheckEntry extends EntryBase {
  readonly kind: "check";
  readonly formula: string;
  readonly lines: FormulaLines;
  readonly inputs: Readonly<Record<string, number>>;
  readonly passed: boolean;
  /** Left side over right side of a "<=" (inverse for ">="), 1 at the limit; absent where the limit is zero. */
  readonly utilisation?: number;
  readonly description: string;
  /** True for an equation of equilibrium the tool itself wrote as a check: it must close. */
  readonly closure?: true;
  /** The terms a closure adds up, to be added again by others. */
  readonly terms?: readonly EquationTerm[];
}

/** A number taken from an analysis and given a symbol; the governing ones stand on the cover. */
export interface ResultEntry extends EntryBase {
  readonly kind: "result";
  readonly symbol: string;
  readonly tex: string;
  readonly value: ShownValue;
  readonly description: string;
  readonly governing: boolean;
  /** Where the value was worked out by hand. */
  readonly band?: ResultBand;
}

/** One known term of an equation, SI. `from` names the earlier step the value is taken from, "id@version"; its sign is
 *  in the coefficient. */
export interface EquationTerm {
  readonly coefficient: number;
  readonly value: number;
  readonly from?: string;
}

/** One free-body equation in three lines, with the data to re-add it. */
export interface StepEntry extends EntryBase {
  readonly kind: "step";
  readonly body: string;
  readonly lines: FormulaLines;
  readonly value: ShownValue;
  readonly terms: readonly EquationTerm[];
  readonly coefficient: number;
}

export interface NoteEntry extends EntryBase {
  readonly kind: "note";
  readonly text: string;
}

/** Markdown of a notebook's text cell. */
export interface TextEntry extends EntryBase {
  readonly kind: "text";
  readonly markdown: string;
}

/** Something the tool found and says: a verdict, with its working in lines. */
export interface FindingEntry extends EntryBase {
  readonly kind: "finding";
  readonly title: string;
  readonly verdict: string;
  readonly lines: readonly string[];
}

/** A question the tool raises and the engineer or checker must settle. */
export interface QueryEntry extends EntryBase {
  readonly kind: "query";
  readonly text: string;
}

export type TableCell =
  | string
  | { readonly value: ShownValue; readonly uses: readonly string[]; readonly band?: ResultBand };

export interface TableEntry extends EntryBase {
  readonly kind: "table";
  readonly caption: string;
  readonly columns: readonly string[];
  readonly rows: readonly (readonly TableCell[])[];
}

/** A figure as its drawing instructions (`lib/drawing`); drawn when shown. */
export interface FigureEntry extends EntryBase {
  readonly kind: "figure";
  readonly caption: string;
  /** What the figure shows, in words, for readers who cannot see it. */
  readonly alternative: string;
  readonly spec: { readonly kind: string };
}

export interface ConclusionEntry extends EntryBase {
  readonly kind: "conclusion";
  readonly text: string;
}

export type Entry =
  | GivenEntry
  | AssumptionEntry
  | CalcEntry
  | CheckEntry
  | ResultEntry
  | StepEntry
  | NoteEntry
  | TextEntry
  | FindingEntry
  | QueryEntry
  | TableEntry
  | FigureEntry
  | ConclusionEntry;

/** Why a run stopped before its end. */
export interface Failure {
  readonly cell: number;
  readonly line?: number;
  readonly message: string;
  readonly excerpt: string;
}

/** What makes a record an issue: its revision, why it was issued, and its place in the register of issues. */
export interface IssueMark {
  readonly revision: string;
  readonly why: string;
  /** 1 for the first row of the register. */
  readonly number: number;
  /** Digest of the register's row before, 64 noughts for the first. */
  readonly follows: string;
}

/** A file beside the notebook that its cells import: its path from the notebook's folder, with "/", and its text. */
export interface SourceFile {
  readonly path: string;
  readonly text: string;
}

/** How far one assumption moves one result: the calculation run again with that assumption changed alone. */
export interface Movement {
  /** Entry of the assumption. */
  readonly assumption: string;
  /** What it was changed by, in words: "+10 %". */
  readonly change: string;
  /** What it was set to. */
  readonly set: ShownValue;
  /** Results that moved; `share` is the change over the value before, absent where that is nought. */
  readonly results: readonly { readonly id: string; readonly value: ShownValue; readonly share?: number }[];
  /** Why there is no answer, where the changed calculation did not run to its end. */
  readonly failed?: string;
}

export interface CalculationRecord {
  readonly format: typeof RECORD_FORMAT;
  readonly version: typeof RECORD_VERSION;
  readonly complete: boolean;
  readonly failure?: Failure;
  readonly head: Head;
  /** What the engineer says was left out of consideration, a sentence each, in the order of the sheet. */
  readonly notConsidered?: readonly string[];
  readonly overrides: readonly { readonly symbol: string; readonly written: string; readonly set: string }[];
  readonly entries: readonly Entry[];
  readonly notebook: { readonly name: string; readonly source: string };
  /** Files beside the notebook that its cells import. */
  readonly files?: readonly SourceFile[];
  readonly versions: Readonly<Record<string, string>>;
  readonly issue?: IssueMark;
  /** What changed since the issue before. */
  readonly since?: { readonly revision: string; readonly changes: Changes };
  /** What each assumption moves, where that was asked for. */
  readonly moves?: readonly Movement[];
}
