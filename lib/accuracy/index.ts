// How far hand results can be from the truth: the band of each for the frame in hand, and the population study.

export type { Band, Spread } from "./band.ts";
export { type BandQuestion, type Bands, bands, type HandValue } from "./bands.ts";
export { type CoverageOptions, type CoverageRow, coverage, type Law } from "./coverage.ts";
export { AccuracyError, type AccuracyFault } from "./faults.ts";
export { type NominalGroup, nominalGroups } from "./nominal.ts";
export { populationNames, populationStudy, type StudyOptions, type StudyRow } from "./study.ts";
export { type Sweep, sweeps } from "./sweep.ts";
export { type Trial, trialOf, tryOut, type WantedInCase } from "./trial.ts";
export {
  type BaseUnknown,
  type Between,
  defaultUnknowns,
  eachUnknown,
  type GroupUnknown,
  type Unknown,
  type Unknowns,
  within,
} from "./unknowns.ts";
export type { Wanted, WantedForce, WantedReaction } from "./wanted.ts";
export { covers } from "./words.ts";
