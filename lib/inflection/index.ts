// Where the moment is zero: single spans under any load, end restraint, ranges, placement of hinges.

export { type EndPlace, type LineBeam, lineBeams } from "./beam-lines.ts";
export { columnSinking, withShortening } from "./column-shortening.ts";
export { momentDistribution } from "./distribution.ts";
export {
  type EndMoments,
  endFixity,
  endMoments,
  type Fixities,
  fixedEndMoments,
  momentsBetween,
} from "./end-moments.ts";
export { exteriorRestraint } from "./exterior-restraint.ts";
export { InflectionError, type InflectionFault } from "./faults.ts";
export { endMomentsFromHinges, hingesFromEndMoments, momentsWithEnds } from "./hinged-spans.ts";
export { hingesByStiffness, type MemberHinges } from "./hinges-by-stiffness.ts";
export {
  type End,
  inflectionPoints,
  inflectionRange,
  isolatedRange,
  type Range,
} from "./inflection-points.ts";
export { jointRotations } from "./joint-rotations.ts";
export {
  asBending,
  type EndMomentArray,
  type MemberEnds,
  type Net,
  type NetEnd,
  type NetJoint,
  type NetMember,
  netOf,
} from "./net.ts";
export { NetError, type NetFault } from "./net-faults.ts";
export { beyondEnds } from "./overhangs.ts";
export { type Placement, type PlacementChoice, placement } from "./placement.ts";
export {
  kneeHinge,
  kneeShare,
  type PortalBase,
  type PortalMoments,
  type PortalSide,
  portalMoments,
  swayShares,
} from "./portal-gravity.ts";
export { type ProbableMember, type ProbableShape, probableShape } from "./probable-shape.ts";
export {
  checkGravity,
  hingeByStiffness,
  momentsByStiffness,
  type StiffnessMoments,
} from "./relative-stiffness.ts";
export {
  coefficientMoments,
  coefficientSags,
  hingedBeams,
  momentCoefficients,
  type UsualPlace,
  usualPlaces,
} from "./rules.ts";
export { isLoaded, type Span, simpleMoments } from "./span.ts";
export { type TwoSpans, twoSpanHinge } from "./two-spans.ts";
