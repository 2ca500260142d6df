// What stands on an entry, however far up.

import type { Entry } from "./record.ts";
import { readUse } from "./store.ts";
import { allUses } from "./values.ts";

/** Ids of the entries that stand on each entry, directly. */
export function usersOf(entries: readonly Entry[]): ReadonlyMap<string, readonly string[]> {
  const users = new Map<string, string[]>();
  for (const entry of entries)
    for (const id of new Set(allUses(entry).map((use) => readUse(use).id)))
      users.set(id, [...(users.get(id) ?? []), entry.id]);
  return users;
}

/** Ids of all entries that stand on one, in the order of the record; without the entry itself. */
export function standingOn(
  entries: readonly Entry[],
  id: string,
  users: ReadonlyMap<string, readonly string[]> = usersOf(entries),
): readonly string[] {
  const found = new Set<string>();
  const open = [id];
  for (let next = open.pop(); next !== undefined; next = open.pop())
    for (const user of users.get(next) ?? []) {
      if (found.has(user)) continue;
      found.add(user);
      open.push(user);
    }
  found.delete(id);
  return entries.flatMap((entry) => (found.has(entry.id) ? entry.id : []));
}
