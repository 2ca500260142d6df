// What stands on an entry, however far up.

import type { Entry } from "./record.ts";
import { readUse } from "./store.ts";
import { bandUses, valueUses } from "./values.ts";

/** Ids of the entries whose values stand on each entry, directly. */
export function usersOf(entries: readonly Entry[]): ReadonlyMap<string, readonly string[]> {
  const users = new Map<string, string[]>();
  for (const entry of entries)
    for (const id of new Set(valueUses(entry).map((use) => readUse(use).id)))
      users.set(id, [...(users.get(id) ?? []), entry.id]);
  return users;
}

/** Ids of all entries that stand on one, in the order of the record; without the entry itself. What a band stands on is
 *  not handed on to what is worked out from the value beside it. */
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
  for (const entry of entries)
    if (bandUses(entry).some((use) => readUse(use).id === id || found.has(readUse(use).id)))
      found.add(entry.id);
  found.delete(id);
  return entries.flatMap((entry) => (found.has(entry.id) ? entry.id : []));
}
