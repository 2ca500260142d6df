// Joints, members, supports, hinges and loads: frozen plain data, and the builders that make it.

export { endsReleasedAt } from "./assemble.ts";
export { type BeamOptions, beam } from "./beam.ts";
export { type BuildingFrameOptions, buildingFrame } from "./building-frame.ts";
export { checkLoads } from "./check-loads.ts";
export { StructureError, type StructureFault } from "./faults.ts";
export { deepFreeze } from "./freeze.ts";
export { type Axis, axisOf, byName, calledBy, jointNamed, memberNamed, pointOn } from "./geometry.ts";
export { inGlobalAxes } from "./global-loads.ts";
export { type HingeAt, withHinges } from "./hinges.ts";
export {
  type Movement,
  selfWeight,
  settlement,
  type TemperatureChange,
  temperature,
} from "./imposed.ts";
export {
  atJoint,
  coupleLoad,
  type Direction,
  type JointForces,
  type LineLoadOptions,
  type OwnDirection,
  type PointOptions,
  partial,
  pointLoad,
  uniform,
  varying,
} from "./loads.ts";
export { type Model, structureFromJson, structureToJson } from "./model-json.ts";
export { modelSchema, type Schema } from "./model-schema.ts";
export { type PanelGirderOptions, panelGirder } from "./panel-girder.ts";
export { type Along, metresAlong, readPlace, snapToEnds } from "./place.ts";
export { type Base, type PortalOptions, portal } from "./portal.ts";
export {
  membersCalled,
  ratioSources,
  type StiffnessRatios,
  withRelativeStiffness,
} from "./relative-stiffness.ts";
export { withNames } from "./rename.ts";
export { type SectionChoice, type Sections, withSections } from "./section.ts";
export { type Cut, type Node, releasesOf, type Segment, type Skeleton, skeleton } from "./skeleton.ts";
export { mergeSources } from "./sources.ts";
export { type MemberChoice, type StructureOptions, structure } from "./structure.ts";
export {
  heldCount,
  resists,
  type SupportChoice,
  type SupportKind,
  type SupportParts,
  support,
} from "./support.ts";
export { type Diagonals, type TrussOptions, truss } from "./truss.ts";
export { type TrussPortalOptions, trussPortal } from "./truss-portal.ts";
export type {
  DistributedLoad,
  Hinge,
  Imposed,
  Joint,
  JointLoad,
  Load,
  Member,
  MemberPointLoad,
  Place,
  Release,
  Section,
  Settlement,
  Sources,
  Structure,
  Support,
  TemperatureLoad,
} from "./types.ts";
