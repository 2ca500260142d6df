// What an entry stands on, and what stands for it elsewhere.

import { type Dimension, isUnit, type Quantity, quantity } from "../quantity/index.ts";
import { symbolOf } from "./draft.ts";
import type { Entry, ShownValue } from "./record.ts";
import { type EntryStore, readUse } from "./store.ts";

/** How others refer to an entry as it is now: "id@version". */
export function useOf(entry: Entry): string {
  return `${entry.id}@${entry.version}`;
}

/** The quantity a shown value stands for, standing on `from`. */
export function quantityOf({ si, dimension, unit }: ShownValue, from: readonly string[]): Quantity {
  return quantity(si, dimension as Dimension, { unit: isUnit(unit) ? unit : "", from });
}

/** Symbols of the givens and assumptions that some uses rest on, through all that lies between. */
export function basisOf(uses: readonly string[], store: EntryStore): readonly string[] {
  const found = new Set<string>();
  const seen = new Set<string>();
  const visit = (use: string): void => {
    const { id } = readUse(use);
    if (seen.has(id)) return;
    seen.add(id);
    const entry = store.get(id);
    if (entry === undefined) return;
    const symbol = symbolOf(entry);
    if (symbol !== undefined && (entry.kind === "given" || entry.kind === "assumption")) found.add(symbol);
    entry.uses.forEach(visit);
  };
  uses.forEach(visit);
  return [...found];
}
