// The sheet an engineer works on: the ledger's verbs and those of the structure, each doing one step and recording it.

import type { UnknownRow } from "../accuracy/index.ts";
import type { DiagramsFigure } from "../drawing/index.ts";
import type { ProbableShape } from "../inflection/index.ts";
import type { Determinacy } from "../results/types.ts";
import { type Head, type Ledger, openLedger } from "../sheet/index.ts";
import type { Load, Structure } from "../structure/types.ts";
import { type BesideRow, recordBeside } from "./beside.ts";
import { type DeterminacyOptions, recordDeterminacy } from "./determinacy.ts";
import { type DiagramOptions, recordDiagrams } from "./diagrams.ts";
import { shownByEntries, shownEntry } from "./entries-shown.ts";
import { type ExactRow, recordExact } from "./exact-beside.ts";
import { recordFreeBodies } from "./free-bodies.ts";
import { type GravityOptions, recordGravity } from "./gravity.ts";
import { guarded } from "./guard.ts";
import { recordHinges } from "./hinges.ts";
import { recordLoadCase } from "./load-case.ts";
import { recordReactions, type SupportReaction } from "./reactions.ts";
import { recordResult } from "./result.ts";
import { rememberSet } from "./set-ratios.ts";
import { recordShape } from "./shape.ts";
import { stateOf } from "./sheet-state.ts";
import { shownAs } from "./shown.ts";
import { recordSpread, type SpreadOptions, type SpreadTable } from "./spread.ts";
import { bandsOn } from "./statements.ts";
import { stiffnessOn } from "./stiffness.ts";
import type {
  GravitySet,
  Hand,
  HingeChoice,
  HingeSet,
  HingesOptions,
  LoadCase,
  StatedRanges,
} from "./types.ts";
import { recordUnknowns } from "./unknowns.ts";

export interface Sheet extends Ledger {
  /** Degree of static indeterminacy by the trade's count and by the rank of the equilibrium matrix, with a figure. */
  determinacy(structure: Structure, options?: DeterminacyOptions): Determinacy;
  /** Loads that come and go together, under a short key: loadCase("G", "permanent", uniform("BC", g)). */
  loadCase(key: string, title: string, ...loads: readonly Load[]): LoadCase;
  /** How the structure probably bends under these load cases, and where its points of inflection probably are: qualitative. */
  shape(structure: Structure, cases: readonly LoadCase[]): ProbableShape;
  /** Hinges where the moment is probably zero under these load cases; each with its reason and its range. `name` tells
   *  several sets for the same cases apart. */
  hinges(
    structure: Structure,
    cases: readonly LoadCase[],
    hinges: readonly HingeChoice[],
    options?: HingesOptions,
  ): HingeSet;
  /** A building frame under gravity: hinges in all beams by a part of the span, by the relative stiffness of what meets, or by
   *  restraint; columns accordingly; floors held against sway, and the holding forces let go as the load case `release`. */
  gravity(structure: Structure, cases: readonly LoadCase[], options: GravityOptions): GravitySet;
  /** A hinge set and its alternatives side by side, solved by statics: the first is the choice. */
  beside(...sets: readonly HingeSet[]): readonly BesideRow[];
  /** What is not known of a structure and how far, for the bands of its hand results; before its free bodies, else the plain
   *  default is taken: unknowns(frame, { "I of beam / I of columns": "1 to 4" }, { because: "…" }). */
  unknowns(
    structure: Structure,
    stated: StatedRanges,
    reason: { readonly because: string },
  ): readonly UnknownRow[];
  /** The structure cut free at its hinges and solved step by step; the results of several hinge sets are added. */
  freeBodies(...sets: readonly HingeSet[]): Hand;
  /** Reactions as a table that foots, and the equilibrium of the whole. */
  reactions(hand: Hand): readonly SupportReaction[];
  /** N, V and M drawn on the members, with their values in a table. */
  diagrams(hand: Hand, options?: DiagramOptions): DiagramsFigure;
  /** How results move as each hinge moves through its range, solved anew by statics, and through each unknown; otherwise the
   *  governing results recorded from this hand. */
  spread(hand: Hand, options?: SpreadOptions): SpreadTable;
  /** Hand and exact side by side, when every member has its section. The exact values are never used for anything else. */
  exact(hand: Hand): readonly ExactRow[];
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
  const state = stateOf(ledger);
  const bands = bandsOn(ledger, state);
  const stiffness = stiffnessOn(ledger, state);
  const verbs: Partial<Sheet> = {
    result: (symbol, value, description, given = {}) =>
      recordResult(ledger, { state, bands }, symbol, value, description, given),
    unknowns: (structure, stated, reason) =>
      shownByEntries(ledger, (listening) =>
        recordUnknowns(
          listening,
          state,
          structure,
          stated,
          (reason as Partial<typeof reason> | undefined)?.because,
        ),
      ),
    determinacy: (structure, given = {}) => recordDeterminacy(ledger, structure, given),
    loadCase: (key, title, ...loads) => recordLoadCase(ledger, key, title, loads),
    shape: (structure, cases) => recordShape(ledger, structure, cases),
    hinges: (structure, cases, choices, given = {}) =>
      rememberSet(state, recordHinges(ledger, stiffness, structure, cases, choices, given)),
    gravity: (structure, cases, given) =>
      shownByEntries(ledger, (listening) =>
        rememberSet(state, recordGravity(listening, stiffness, structure, cases, given)),
      ),
    beside: (...sets) =>
      shownByEntries(ledger, (listening) => recordBeside(listening, bandsOn(listening, state), sets)),
    freeBodies: (...sets) =>
      shownByEntries(ledger, (listening) => recordFreeBodies(listening, bandsOn(listening, state), sets)),
    reactions: (hand) => shownByEntries(ledger, (listening) => recordReactions(listening, bands, hand)),
    note: (text) => shownEntry(ledger.note(text)),
    notConsidered: (...sentences) => {
      const said = ledger.notConsidered(...sentences);
      return shownAs(said, () => ({
        "text/plain": ["not considered:", ...said.map((one) => `  ${one}`)].join("\n"),
      }));
    },
    conclude: (text) => shownEntry(ledger.conclude(text)),
    diagrams: (hand, given = {}) => recordDiagrams(ledger, bands, hand, given),
    spread: (hand, given = {}) => recordSpread(ledger, { state, bands }, hand, given),
    exact: (hand) => shownByEntries(ledger, (listening) => recordExact(listening, bands, hand)),
  };
  // The ledger keeps its state to itself, so its verbs must be called on it and not on the sheet.
  const own = Object.fromEntries(ledgerVerbs.map((verb) => [verb, ledger[verb].bind(ledger)]));
  const fields: PropertyDescriptorMap = {
    head: { get: () => ledger.head, enumerable: true },
    figures: { get: () => ledger.figures, enumerable: true },
  };
  return Object.freeze(Object.defineProperties({ ...own, ...guarded(verbs) }, fields)) as Sheet;
}
