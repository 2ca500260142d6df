// An entry before the ledger has it.

import type { Entry } from "./record.ts";

type Without<E, K extends PropertyKey> = E extends unknown ? Omit<E, K> : never;

/** An entry without what the ledger adds: version, cell, and whether it is out of date. */
export type Draft = Without<Entry, "version" | "cell" | "outOfDate">;

/** What an entry is called by its users, where its id must not be taken twice: "load case G", and what to change: "key". */
export interface Unique {
  readonly called: string;
  readonly change: string;
}

/** The entry and everything in it frozen. */
export function frozen<T>(value: T): T {
  if (typeof value !== "object" || value === null || Object.isFrozen(value)) return value;
  for (const part of Object.values(value)) frozen(part);
  return Object.freeze(value);
}

/** What must change for an entry to count as changed: its value if it has one, else all it says; never what it uses. */
export function substance(draft: Draft): string {
  if ("value" in draft && draft.value !== undefined)
    return JSON.stringify([draft.value.si, draft.value.dimension]);
  const { uses: _, ...rest } = draft;
  return JSON.stringify(rest);
}

/** The symbol an entry defines, if it defines one. */
export function symbolOf(draft: Draft): string | undefined {
  return "symbol" in draft ? draft.symbol : undefined;
}
