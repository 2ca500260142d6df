// The public names, nothing else.

export type { UnknownRow } from "./accuracy/index.ts";
export { ExactError, exact } from "./exact/index.ts";
export {
  type BesideRow,
  type DeterminacyOptions,
  type DiagramOptions,
  type ExactRow,
  type GravityOptions,
  type GravityPlace,
  type GravitySet,
  type Hand,
  type HingeChoice,
  type HingeSet,
  type HingesOptions,
  type Holding,
  hinge,
  type LoadCase,
  openSheet,
  type Peak,
  type PureNumber,
  type Sheet,
  type SolvedSet,
  type SpanPart,
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
  type BeamOptions,
  type BuildingFrameOptions,
  beam,
  buildingFrame,
  coupleLoad,
  type PanelGirderOptions,
  type PortalOptions,
  panelGirder,
  partial,
  pointLoad,
  portal,
  type StiffnessRatios,
  StructureError,
  type StructureOptions,
  selfWeight,
  settlement,
  structure,
  structureFromJson,
  structureToJson,
  type TrussOptions,
  type TrussPortalOptions,
  temperature,
  truss,
  trussPortal,
  uniform,
  varying,
  withHinges,
  withNames,
  withSections,
} from "./structure/index.ts";
export type * from "./structure/types.ts";
