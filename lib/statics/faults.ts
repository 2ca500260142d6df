// Why free bodies cannot be solved: the data, and the words for it in one place.

import type { Mechanism } from "../results/index.ts";
import { counted, ordinal } from "./words.ts";

export type StaticsFault =
  | { readonly kind: "indeterminate"; readonly degree: number; readonly hinges: number }
  | { readonly kind: "axial"; readonly joints: readonly string[] }
  | {
      readonly kind: "not balanced";
      readonly driven: readonly Mechanism[];
      readonly words: string;
      readonly hinges: number;
    }
  | { readonly kind: "self-stress in a mechanism"; readonly words: string }
  | { readonly kind: "too few equations"; readonly unknowns: readonly string[]; readonly equations: number }
  | { readonly kind: "differs"; readonly what: string; readonly sequence: number; readonly whole: number };

/** An error of the statics; `fault` holds the data the words were made from. */
export class StaticsError extends Error {
  readonly fault: StaticsFault;

  constructor(fault: StaticsFault) {
    super(wordsOf(fault));
    this.name = "StaticsError";
    this.fault = fault;
  }
}

function wordsOf(fault: StaticsFault): string {
  switch (fault.kind) {
    case "indeterminate":
      return `still indeterminate to the ${ordinal(fault.degree)} degree with ${hingesText(fault.hinges)}: statics alone cannot give the forces; add ${counted(fault.degree, "more hinge")} where the moment is probably zero`;
    case "axial":
      return `a load acts along a line held at both ends (${fault.joints.join(" and ")}): how they share it depends on stiffness; let one of the supports slide along the line`;
    case "not balanced":
      return `the structure with ${hingesText(fault.hinges)} does not balance this load: ${fault.words}; take a hinge out or treat the load by another method`;
    case "self-stress in a mechanism":
      return `the free bodies have no single answer: ${fault.words}`;
    case "too few equations":
      return `internal check failed: the bodies give ${counted(fault.equations, "independent equation")} for ${counted(fault.unknowns.length, "unknown")} (${fault.unknowns.join(", ")}); please report this structure`;
    case "differs":
      return `internal check failed: ${fault.what} is ${fault.sequence} by free bodies and ${fault.whole} by the whole structure; please report this structure`;
  }
}

function hingesText(n: number): string {
  return n === 0 ? "no hinges" : counted(n, "hinge");
}
