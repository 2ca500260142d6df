// The entries of a record as a reader meets them: each with its line label, its anchor, what it stands on and what
// stands on it.

import { allUses, type CalculationRecord, type Entry, readUse, valueUses } from "../sheet/index.ts";

/** A thing an entry stands on, as it is now. */
export interface Ground {
  readonly id: string;
  readonly state: "current" | "changed" | "missing";
}

export interface Item {
  readonly entry: Entry;
  /** "G3" a given, "A2" an assumption, "17" a line of the calculation; empty for text. */
  readonly label: string;
  readonly on: readonly Ground[];
  /** Ids of the entries that stand on it, by their values or by their bands. */
  readonly by: readonly string[];
  /** Ids of the givens and assumptions it rests on in the end. */
  readonly roots: readonly string[];
}

export interface Book {
  readonly record: CalculationRecord;
  readonly items: readonly Item[];
  readonly item: (id: string) => Item | undefined;
  readonly ground: (use: string) => Ground;
}

const escaped = (id: string): string =>
  id.replace(/[^A-Za-z0-9_-]/gu, (c) => `.${(c.codePointAt(0) ?? 0).toString(16)}.`);

/** Anchor of an entry's own line. */
export const lineAnchor = (id: string): string => `e-${escaped(id)}`;

/** Anchor of an entry in the list of what stands on what; with `part`, of a group of cells of a table. */
export const whyAnchor = (id: string, part?: number): string =>
  `why-${escaped(id)}${part === undefined ? "" : `.${part}`}`;

function labels(entries: readonly Entry[]): Map<string, string> {
  const counts = { given: 0, assumption: 0, line: 0 };
  const found = new Map<string, string>();
  for (const entry of entries) {
    if (found.has(entry.id)) throw new Error(`record: entry "${entry.id}" is there twice; ids must differ`);
    if (entry.kind === "text") found.set(entry.id, "");
    else if (entry.kind === "given") found.set(entry.id, `G${++counts.given}`);
    else if (entry.kind === "assumption") found.set(entry.id, `A${++counts.assumption}`);
    else found.set(entry.id, String(++counts.line));
  }
  return found;
}

function usersOf(entries: readonly Entry[]): ReadonlyMap<string, readonly string[]> {
  const users = new Map<string, string[]>();
  for (const entry of entries) {
    for (const id of new Set(allUses(entry).map((use) => readUse(use).id))) {
      users.set(id, [...(users.get(id) ?? []), entry.id]);
    }
  }
  return users;
}

function rootsOf(entry: Entry, byId: ReadonlyMap<string, Entry>): readonly string[] {
  const seen = new Set<string>([entry.id]);
  const open = [entry];
  for (let next = open.pop(); next; next = open.pop()) {
    for (const use of valueUses(next)) {
      const { id } = readUse(use);
      const ground = byId.get(id);
      if (seen.has(id) || !ground) continue;
      seen.add(id);
      open.push(ground);
    }
  }
  seen.delete(entry.id);
  return [...byId.values()]
    .filter((e) => seen.has(e.id) && (e.kind === "given" || e.kind === "assumption"))
    .map((e) => e.id);
}

/** The record ready to be written out. Throws on ids that repeat and references that cannot be read. */
export function bookOf(record: CalculationRecord): Book {
  const byId = new Map(record.entries.map((e) => [e.id, e]));
  const numbered = labels(record.entries);
  const users = usersOf(record.entries);
  const ground = (use: string): Ground => {
    const { id, version } = readUse(use);
    const now = byId.get(id);
    const state = now === undefined ? "missing" : now.version === version ? "current" : "changed";
    return { id, state };
  };
  const items = record.entries.map(
    (entry): Item => ({
      entry,
      label: numbered.get(entry.id) ?? "",
      on: valueUses(entry).map(ground),
      by: users.get(entry.id) ?? [],
      roots: rootsOf(entry, byId),
    }),
  );
  const index = new Map(items.map((item) => [item.entry.id, item]));
  return { record, items, ground, item: (id) => index.get(id) };
}
