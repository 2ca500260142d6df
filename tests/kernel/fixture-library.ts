// A small library for the runner's tests: the real ledger, quantities and report under the name cells import.

import type { Library } from "../../kernel/library.ts";
import type { Measure } from "../../lib/quantity/index.ts";
import { isNamedDimension, someUnits } from "../../lib/quantity/index.ts";
import { promptsLeftWords, renderPackage } from "../../lib/report/index.ts";
import { attachHost, currentLedger, forgetLedger, type Ledger, openLedger } from "../../lib/sheet/index.ts";

export const openSheet: typeof openLedger = openLedger;

/** A verb with measures in an object and in an argument, as the real ones have them. */
export function span(about: {
  readonly length: Measure<"length">;
  readonly load?: Measure<"force per length">;
}): object {
  return about;
}

export function point(name: string, force: Measure<"force">): string {
  return `${name} ${String(force)}`;
}

export type { Ledger };

/** The same things as the runner asks for them. */
export async function fixtureLibrary(): Promise<Library> {
  return {
    module: { openSheet, span, point },
    unitsOf: (dimension) => (isNamedDimension(dimension) ? someUnits(dimension) : []),
    attachHost,
    currentLedger,
    openLedger,
    forgetLedger,
    renderPackage,
    promptsLeft: promptsLeftWords,
  };
}
