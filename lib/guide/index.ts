// The verbs an engineer calls in a notebook.

export type { DeterminacyOptions } from "./determinacy.ts";
export type { DiagramOptions } from "./diagrams.ts";
export { hinge } from "./hinges.ts";
export type { SupportReaction } from "./reactions.ts";
export { openSheet, type Sheet } from "./sheet.ts";
export type { Hand, HingeChoice, HingeSet, LoadCase, Peak, SolvedSet, Spot } from "./types.ts";
