// The sheet an engineer works on: the ledger's verbs and those of the structure, each doing one step and recording it.

import type { DiagramsFigure } from "../drawing/index.ts";
import type { ProbableShape } from "../inflection/index.ts";
import type { Determinacy } from "../results/types.ts";
import { type Head, type Ledger, openLedger } from "../sheet/index.ts";
import type { Load, Structure } from "../structure/types.ts";
import { type DeterminacyOptions, recordDeterminacy } from "./determinacy.ts";
import { type DiagramOptions, recordDiagrams } from "./diagrams.ts";
import { shownByEntries, shownEntry } from "./entries-shown.ts";
import { recordFreeBodies } from "./free-bodies.ts";
import { recordHinges } from "./hinges.ts";
import { recordLoadCase } from "./load-case.ts";
import { recordReactions, type SupportReaction } from "./reactions.ts";
import { recordShape } from "./shape.ts";
import type { Hand, HingeChoice, HingeSet, LoadCase } from "./types.ts";

export interface Sheet extends Ledger {
  /** Degree of static indeterminacy by the trade's count and by the rank of the equilibrium matrix, with a figure. */
  determinacy(structure: Structure, options?: DeterminacyOptions): Determinacy;
  /** Loads that come and go together, under a short key: loadCase("G", "permanent", uniform("BC", g)). */
  loadCase(key: string, title: string, ...loads: readonly Load[]): LoadCase;
  /** How the structure probably bends under these load cases, and where its points of inflection probably are: qualitative. */
  shape(structure: Structure, cases: readonly LoadCase[]): ProbableShape;
  /** Hinges where the moment is probably zero under these load cases; each with its reason and its range. */
  hinges(structure: Structure, cases: readonly LoadCase[], hinges: readonly HingeChoice[]): HingeSet;
  /** The structure cut free at its hinges and solved step by step; the results of several hinge sets are added. */
  freeBodies(...sets: readonly HingeSet[]): Hand;
  /** Reactions as a table that foots, and the equilibrium of the whole. */
  reactions(hand: Hand): readonly SupportReaction[];
  /** N, V and M drawn on the members, with their values in a table. */
  diagrams(hand: Hand, options?: DiagramOptions): DiagramsFigure;
}

const ledgerVerbs = [
  "given",
  "assume",
  "calc",
  "check",
  "result",
  "note",
  "conclude",
  "query",
  "text",
  "put",
  "lookup",
  "entry",
  "entries",
  "endCell",
  "setFromOutside",
  "unusedOverrides",
  "record",
] as const satisfies readonly (keyof Ledger)[];

/** Opens the sheet of a calculation: title, job, who prepared it, the standards it rests on, the units results are shown
 *  in ("kN, m", "kip, ft"), its status. `figures` are the significant figures results are printed with, otherwise three.
 *  Opened again in the same run it keeps what was recorded. Throws on a head with a field missing or unknown. */
export function openSheet(head: Head, options: { readonly figures?: number } = {}): Sheet {
  const ledger = openLedger(head, options);
  const verbs: Partial<Sheet> = {
    determinacy: (structure, given = {}) => recordDeterminacy(ledger, structure, given),
    loadCase: (key, title, ...loads) => recordLoadCase(ledger, key, title, loads),
    shape: (structure, cases) => recordShape(ledger, structure, cases),
    hinges: (structure, cases, choices) => recordHinges(ledger, structure, cases, choices),
    freeBodies: (...sets) => shownByEntries(ledger, (listening) => recordFreeBodies(listening, sets)),
    reactions: (hand) => shownByEntries(ledger, (listening) => recordReactions(listening, hand)),
    note: (text) => shownEntry(ledger.note(text)),
    conclude: (text) => shownEntry(ledger.conclude(text)),
    diagrams: (hand, given = {}) => recordDiagrams(ledger, hand, given),
  };
  // The ledger keeps its state to itself, so its verbs must be called on it and not on the sheet.
  const own = Object.fromEntries(ledgerVerbs.map((verb) => [verb, ledger[verb].bind(ledger)]));
  const fields: PropertyDescriptorMap = {
    head: { get: () => ledger.head, enumerable: true },
    figures: { get: () => ledger.figures, enumerable: true },
  };
  return Object.freeze(Object.defineProperties({ ...own, ...verbs }, fields)) as Sheet;
}
