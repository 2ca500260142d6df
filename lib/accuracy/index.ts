// How far hand results can be from the truth: the band of each for the frame in hand, and the population study.

export type { CasePart, HandValue, InCase, WantedInCase } from "./asked.ts";
export type { Band, Spread } from "./band.ts";
export { type BandQuestion, type Bands, bands } from "./bands.ts";
export { type CoverageOptions, type CoverageRow, coverage, type Law } from "./coverage.ts";
export { endShare } from "./draws.ts";
export { AccuracyError, type AccuracyFault } from "./faults.ts";
export { type NominalGroup, nominalGroups } from "./nominal.ts";
export {
  hasSections,
  type NominalRatio,
  type NominalRatios,
  withNominalSections,
} from "./nominal-sections.ts";
export { type Sampled, type SampledQuestion, sampled } from "./sampled.ts";
export { type StatedText, type StatedUnknowns, statedUnknowns, usualFactor } from "./stated.ts";
export type { Stated } from "./stated-range.ts";
export { populationNames, populationStudy, type StudyOptions, type StudyRow } from "./study.ts";
export { type Sweep, sweeps } from "./sweep.ts";
export { type Trial, trialOf, tryOut } from "./trial.ts";
export { type UnknownRow, unknownRows } from "./unknown-rows.ts";
export {
  type BaseUnknown,
  type Between,
  defaultUnknowns,
  eachUnknown,
  type GroupUnknown,
  type StatedRatio,
  type Unknown,
  type Unknowns,
  within,
} from "./unknowns.ts";
export type { Wanted, WantedForce, WantedReaction } from "./wanted.ts";
export { covers, notVaried } from "./words.ts";
