// The verbs an engineer calls in a notebook.

export type { BesideRow } from "./beside.ts";
export type { DeterminacyOptions } from "./determinacy.ts";
export type { DiagramOptions } from "./diagrams.ts";
export type { ExactRow } from "./exact-beside.ts";
export type { GravityOptions } from "./gravity.ts";
export type { GravityPlace, SpanPart } from "./gravity-moments.ts";
export { hinge } from "./hinge-choice.ts";
export type { SupportReaction } from "./reactions.ts";
export { openSheet, type Sheet } from "./sheet.ts";
export type { SpreadOptions, SpreadRow, SpreadTable } from "./spread.ts";
export type {
  GravitySet,
  Hand,
  HingeChoice,
  HingeSet,
  HingesOptions,
  Holding,
  LoadCase,
  Peak,
  PureNumber,
  SolvedSet,
  Spot,
  StatedRange,
  StatedRanges,
} from "./types.ts";
