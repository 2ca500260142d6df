// What the verbs of a sheet take and answer with.

import type { Measure, Quantity } from "../quantity/index.ts";
import type { Determinacy, FreeBodySolution, MemberForces } from "../results/types.ts";
import type { Load, Structure } from "../structure/types.ts";

/** A load case: loads that come and go together, under a short key such as "G". */
export interface LoadCase {
  /** The ledger entry it was recorded as, "id@version". */
  readonly entry: string;
  readonly key: string;
  readonly title: string;
  readonly loads: readonly Load[];
}

/** Where the engineer takes the moment to be zero, and why. */
export interface HingeChoice {
  readonly member: string;
  /** The end joint of the member the distance is measured from. */
  readonly from: string;
  readonly at: Measure<"length"> | `${number} L`;
  readonly because: string;
}

/** Hinges and the load cases they were made for. */
export interface HingeSet {
  /** The keys of its load cases, "G + S". */
  readonly name: string;
  /** The structure as given, without the set's hinges. */
  readonly frame: Structure;
  /** The structure with the hinges. */
  readonly hinged: Structure;
  readonly cases: readonly LoadCase[];
  readonly determinacy: Determinacy;
  /** The ledger entries of its load cases. */
  readonly entries: readonly string[];
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
