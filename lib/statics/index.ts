// Statics of a structure with its hinges: determinacy, balance, free bodies.

export { balance } from "./balance.ts";
export { determinacy } from "./determinacy.ts";
export { equilibrium, type WholeEquilibrium } from "./equilibrium.ts";
export { StaticsError, type StaticsFault } from "./faults.ts";
export { freeBodies } from "./free-bodies.ts";
export { and, counted } from "./words.ts";
