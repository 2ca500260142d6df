// The exact elastic solution: the reference hand results are judged by, never the source of one.

export { endForces } from "./end-forces.ts";
export { ExactError, type ExactFault } from "./errors.ts";
export { exact } from "./exact.ts";
export { type Prepared, prepare, type SpringPlace } from "./prepare.ts";
export { roomFor, type Solved, type SolvedCase, solve } from "./solve.ts";
export { type Stiffness, stiffnessOf } from "./stiffness.ts";
