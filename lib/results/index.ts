// What every method answers with, and the piecewise polynomials the answers are made of.

export { derivative, integral, integralOver, type Jump, jumps, magnitude, product } from "./calculus.ts";
export { type Extreme, type Extremes, extremes } from "./extremes.ts";
export { type MemberLoads, type MemberPoint, memberLoads } from "./member-loads.ts";
export {
  add,
  constant,
  domain,
  piecewise,
  ramp,
  restrict,
  type Side,
  scale,
  stepAt,
  sum,
  valueAt,
} from "./piecewise.ts";
export { rigidMotionWords, stillMotion } from "./rigid-motion.ts";
export { crossings, polynomialRoots, roots, turningPoints, type Zeros, zeros } from "./roots.ts";
export type {
  Action,
  Closure,
  Determinacy,
  ElasticMember,
  ElasticSolution,
  ForceDirection,
  ForceName,
  FreeBody,
  FreeBodySolution,
  JointDisplacement,
  LoadBalance,
  Mechanism,
  MemberForces,
  Piece,
  Piecewise,
  Point,
  Reaction,
  SelfStress,
  Step,
  Term,
} from "./types.ts";
