// Whether the loads of load cases fit the structure they are put on.

import { checkLoads } from "../structure/index.ts";
import type { Structure } from "../structure/types.ts";
import type { LoadCase } from "./types.ts";

/** Throws on a load that does not fit the structure, naming the load case, the load and the member. */
export function checkCases(structure: Structure, cases: readonly LoadCase[]): void {
  for (const { key, loads } of cases)
    try {
      checkLoads(structure, loads);
    } catch (error) {
      if (!(error instanceof Error)) throw error;
      throw new Error(`load case ${key}, ${error.message}`, { cause: error });
    }
}
