// What the exact solution refuses: the data, and the words for it.

import type { Mechanism } from "../results/index.ts";

export type ExactFault =
  | { readonly kind: "no section"; readonly member: string }
  | { readonly kind: "free motion"; readonly motion: Mechanism }
  | { readonly kind: "too stiff and too soft"; readonly motion: Mechanism }
  | { readonly kind: "bad stiffness"; readonly what: string; readonly value: number }
  | { readonly kind: "wrong number"; readonly what: string; readonly wanted: number; readonly got: number }
  | {
      readonly kind: "too large";
      readonly unknowns: number;
      readonly entries: number;
      readonly limit: number;
    };

/** An error of the exact solution; `fault` holds the data the words were made from. */
export class ExactError extends Error {
  readonly fault: ExactFault;

  constructor(fault: ExactFault) {
    super(wordsOf(fault));
    this.name = "ExactError";
    this.fault = fault;
  }
}

function wordsOf(fault: ExactFault): string {
  switch (fault.kind) {
    case "no section":
      return `member "${fault.member}" has no section; give its E, I and A by withSections, by its own name, its group or "all"`;
    case "free motion":
      return `the structure is not stable: nothing resists this motion: ${fault.motion.words}; hold it by a support, a rigid connection or a diagonal`;
    case "too stiff and too soft":
      return `the stiffnesses differ too much to be told from a mechanism: hardly anything resists this motion: ${fault.motion.words}; bring E, I, A and springs nearer together`;
    case "bad stiffness":
      return `${fault.what} is ${fault.value}; a finite number ${fault.what.startsWith("spring") ? "not below zero" : "more than zero"} is wanted`;
    case "wrong number":
      return `${fault.what}: ${fault.got} given, ${fault.wanted} wanted`;
    case "too large":
      return `the structure is too large: its ${fault.unknowns} displacements need ${fault.entries} stored entries, the limit is ${fault.limit}; split it`;
  }
}
