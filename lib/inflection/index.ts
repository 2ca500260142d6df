// Where the moment is zero: single spans under any load, end restraint, ranges, placement of hinges.

export {
  type EndMoments,
  endFixity,
  endMoments,
  type Fixities,
  fixedEndMoments,
  momentsBetween,
} from "./end-moments.ts";
export { InflectionError, type InflectionFault } from "./faults.ts";
export {
  type End,
  inflectionPoints,
  inflectionRange,
  isolatedRange,
  type Range,
} from "./inflection-points.ts";
export { type Placement, type PlacementChoice, placement } from "./placement.ts";
export { isLoaded, type Span, simpleMoments } from "./span.ts";
