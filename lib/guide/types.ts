// What the verbs of a sheet take and answer with.

import type { Measure, Quantity } from "../quantity/index.ts";
import type { Determinacy, FreeBodySolution, MemberForces } from "../results/types.ts";
import type { StiffnessRatios } from "../structure/index.ts";
import type { Load, Structure } from "../structure/types.ts";

/** A load case: loads that come and go together, under a short key such as "G". */
export interface LoadCase {
  /** The ledger entry it was recorded as, "id@version". */
  readonly entry: string;
  readonly key: string;
  readonly title: string;
  readonly loads: readonly Load[];
  /** The hinge set whose holding forces these loads let go: they are no loads on the frame, and add up to nothing with the
   *  results of that set. */
  readonly releases?: string;
}

/** Where the engineer takes the moment to be zero, and why. */
export interface HingeChoice {
  readonly member: string;
  /** The end joint of the member the distance is measured from. */
  readonly from: string;
  /** A length, a part of the member's length such as "0.115 L", or "common practice" for a tenth of it. */
  readonly at?: Measure<"length"> | `${number} L` | "common practice";
  /** Or how far the ends are held against turning, 0 free to turn to 1 fixed: this end, and the far one. */
  readonly fixity?: { readonly near: PureNumber; readonly far: PureNumber };
  /** Or by the relative stiffness of the members that meet there, from their sections or from ratios. */
  readonly by?: "relative stiffness";
  readonly ratios?: StiffnessRatios;
  /** The hinge is the mirror image of another, which frame and loads allow; without a place of its own it takes that image's. */
  readonly symmetry?: true;
  readonly because: string;
}

export interface HingesOptions {
  /** What the set is called, where several are made for the same load cases; otherwise the keys of those. */
  readonly name?: string;
}

/** A number as written, or one the sheet knows. */
export type PureNumber = number | Quantity<"pure number">;

/** A force taken to hold a floor against sway, which nothing in the frame gives. */
export interface Holding {
  /** The joint of the floor it acts on. */
  readonly joint: string;
  /** The joints of the floor, left to right. */
  readonly floor: readonly string[];
  /** To the right on the frame, N. */
  readonly force: number;
}

/** Hinges and the load cases they were made for. */
export interface HingeSet {
  /** The keys of its load cases, "G + S", or the name given. */
  readonly name: string;
  /** The structure as given, without the set's hinges. */
  readonly frame: Structure;
  /** The structure with the hinges. */
  readonly hinged: Structure;
  readonly cases: readonly LoadCase[];
  readonly determinacy: Determinacy;
  /** The ledger entries of its load cases. */
  readonly entries: readonly string[];
  /** Supports that only `hinged` has, and the forces they give: floors held against sway. */
  readonly holding?: readonly Holding[];
  /** Loads that only the free bodies have: pairs of couples at cut ends whose moment is taken as known; nothing on the frame. */
  readonly couples?: readonly Load[];
  /** The ratios of stiffness its hinges were placed by, where some were given; more than one where hinges differ. */
  readonly ratios?: readonly StiffnessRatios[];
}

/** A hinge set of a building frame under gravity, and the holding forces let go as a load case; none where they are nought. */
export interface GravitySet extends HingeSet {
  readonly holding: readonly Holding[];
  readonly release: LoadCase | undefined;
}

/** Where along a member: an end joint by name, a length from the member's start, or a part of its length. */
export type Spot = string | Measure<"length">;

/** The free bodies of one hinge set, with the ledger entry of each step. */
export interface SolvedSet {
  readonly set: HingeSet;
  readonly loads: readonly Load[];
  readonly solution: FreeBodySolution;
  /** By step: the entry it was recorded as, "id@version". */
  readonly entries: readonly string[];
}

/** Hand results: those of one hinge set, or of several added. Signs as in the conventions of the sheet:
 *  N tension positive, M positive with tension on the reference fibre, reactions x right and y up. */
export interface Hand {
  readonly frame: Structure;
  readonly name: string;
  readonly solved: readonly SolvedSet[];
  readonly members: readonly MemberForces[];
  axial(member: string, where: { readonly at: Spot }): Quantity<"force">;
  shear(member: string, where: { readonly at: Spot }): Quantity<"force">;
  moment(member: string, where: { readonly at: Spot }): Quantity<"moment">;
  /** The greatest moment in magnitude between two places of a member (otherwise its ends), and its distance from the start. */
  peakMoment(member: string, sign: "positive" | "negative"): Peak;
  reaction(joint: string, component: "x" | "y"): Quantity<"force">;
  reaction(joint: string, component: "moment"): Quantity<"moment">;
}

export interface Peak {
  readonly moment: Quantity<"moment">;
  readonly at: Quantity<"length">;
}

/** How far something is unknown, in words or in numbers: "1 to 4", "within 1.5", "2.5 within 1.5", "about 2.5" (within the usual
 *  factor), "known"; two numbers [1, 4]; a number alone, which is known; { about: r_I, within: 1.5 }. Numbers the sheet knows
 *  (sheet.assume) keep where they came from. Bases: "pinned to half fixed", "0.2 to 0.6". */
export type StatedRange =
  | string
  | PureNumber
  | readonly [PureNumber, PureNumber]
  | { readonly about: PureNumber; readonly within: PureNumber };

/** What is unknown, by what it is about: { "I of beam / I of columns": "1 to 4", "A of columns": "within 2",
 *  bases: "pinned to half fixed", "base A": "fixed" }. */
export type StatedRanges = Readonly<Record<string, StatedRange>>;
