// The public names, nothing else.

export {
  type DiagramOptions,
  type Hand,
  type HingeChoice,
  type HingeSet,
  hinge,
  type LoadCase,
  openSheet,
  type Peak,
  type Sheet,
  type SolvedSet,
  type Spot,
  type SupportReaction,
} from "./guide/index.ts";
export * from "./inflection/index.ts";
export {
  type AnyMeasure,
  type AnyUnit,
  type Dimension,
  type DimensionOf,
  type DimensionOfUnit,
  footing,
  isQuantity,
  type Measure,
  type Quantity,
  quantity,
} from "./quantity/index.ts";
export { crossings, type Extreme, type Extremes, extremes, valueAt } from "./results/index.ts";
export type * from "./results/types.ts";
export type * from "./sheet/record.ts";
export {
  balance,
  determinacy,
  equilibrium,
  freeBodies,
  StaticsError,
  type WholeEquilibrium,
} from "./statics/index.ts";
export {
  atJoint,
  beam,
  coupleLoad,
  partial,
  pointLoad,
  portal,
  StructureError,
  structure,
  uniform,
  varying,
  withHinges,
} from "./structure/index.ts";
export type * from "./structure/types.ts";
