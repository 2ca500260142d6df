// A record from outside: a stranger's data until it has passed. Nothing of it is run or looked up before.

import type { z } from "zod";
import { type CalculationRecord, type Entry, RECORD_FORMAT, RECORD_VERSION } from "./record.ts";
import { recordSchema } from "./schema.ts";
import { LIMITS } from "./schema-parts.ts";
import { readUse } from "./store.ts";
import { allUses } from "./values.ts";

/** A text longer than this is no record of a calculation, in UTF-16 units. */
export const LONGEST = 64_000_000;
const DEEPEST = 64;
const FORBIDDEN: ReadonlySet<string> = new Set(["__proto__", "constructor", "prototype"]);
const MOST_FAULTS = 5;

/** A record from JSON text, checked and frozen. Throws naming the place, what stands there and what would be right;
 *  a newer version is refused naming both. `own` is the version of the library, for the message. */
export function readRecord(json: string, own = "this hingebook"): CalculationRecord {
  if (json.length > LONGEST)
    throw new Error(`the record is ${json.length} characters long; at most ${LONGEST} are read`);
  const data = parsed(json);
  checkTree(data, "record", 0);
  checkVersion(data, own);
  const found = recordSchema.safeParse(data);
  if (!found.success) throw new Error(`the record cannot be read: ${faultWords(found.error.issues, data)}`);
  const record = data as CalculationRecord; // as it was written: the validator would put its fields in another order
  checkEntries(record.entries);
  return deepFrozen(record);
}

function parsed(json: string): unknown {
  try {
    return JSON.parse(json);
  } catch (cause) {
    throw new Error(`the record is not JSON: ${(cause as Error).message}`, { cause });
  }
}

/** Refuses names that reach into the language, nesting no record has and numbers no structure has, before anything else
 *  looks at the data. */
function checkTree(value: unknown, place: string, depth: number): void {
  if (typeof value === "number" && !(Math.abs(value) <= LIMITS.number))
    throw new Error(`${short(place)} is ${value}; numbers up to ${LIMITS.number} are read`);
  if (typeof value !== "object" || value === null) return;
  if (depth > DEEPEST) throw new Error(`the record is nested more than ${DEEPEST} deep at ${short(place)}`);
  for (const key of Object.keys(value)) {
    const here = Array.isArray(value) ? `${place}[${key}]` : `${place}.${key}`;
    if (FORBIDDEN.has(key)) throw new Error(`${short(here)}: a field may not be named "${key}"`);
    checkTree((value as Record<string, unknown>)[key], here, depth + 1);
  }
}

const short = (text: string): string =>
  text.length > 120 ? `${text.slice(0, 60)} … ${text.slice(-55)}` : text;

function checkVersion(data: unknown, own: string): void {
  if (typeof data !== "object" || data === null || Array.isArray(data))
    throw new Error("the record is no JSON object");
  const { format, version } = data as { readonly format?: unknown; readonly version?: unknown };
  if (format !== RECORD_FORMAT)
    throw new Error(`format is ${printed(format)}; a record begins with format "${RECORD_FORMAT}"`);
  if (typeof version !== "number" || !Number.isInteger(version) || version < 0)
    throw new Error(`version is ${printed(version)}; a whole number is wanted`);
  if (version > RECORD_VERSION)
    throw new Error(
      `the record has version ${version}; ${own} reads versions up to ${RECORD_VERSION}. Use a newer hingebook`,
    );
}

function printed(value: unknown): string {
  return short(JSON.stringify(value) ?? "missing");
}

function faultWords(issues: readonly z.core.$ZodIssue[], data: unknown): string {
  const words = issues.slice(0, MOST_FAULTS).map((issue) => {
    const place = issue.path
      .map((part) => (typeof part === "number" ? `[${part}]` : `.${String(part)}`))
      .join("");
    return `record${place} is ${printed(at(data, issue.path))}: ${issue.message}`;
  });
  const more = issues.length > MOST_FAULTS ? `; and ${issues.length - MOST_FAULTS} more` : "";
  return words.join("; ") + more;
}

function at(data: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>(
    (value, key) =>
      typeof value === "object" && value !== null && Object.hasOwn(value, key)
        ? (value as Record<PropertyKey, unknown>)[key]
        : undefined,
    data,
  );
}

/** Ids differ; what an entry stands on is there in that version, unless it is marked out of date; nothing stands on
 *  itself. */
function checkEntries(entries: readonly Entry[]): void {
  const versions = new Map<string, number>();
  for (const { id, version } of entries) {
    if (versions.has(id)) throw new Error(`entry "${short(id)}" is there twice; ids must differ`);
    versions.set(id, version);
  }
  for (const entry of entries) {
    if (entry.outOfDate) continue;
    for (const use of allUses(entry)) {
      const { id, version } = readUse(use);
      const there = versions.get(id);
      if (there === undefined)
        throw new Error(
          `entry "${short(entry.id)}" stands on "${short(use)}", which the record does not hold`,
        );
      if (there !== version)
        throw new Error(
          `entry "${short(entry.id)}" stands on "${short(use)}", but the record holds version ${there} and the entry is not marked out of date`,
        );
    }
  }
  refuseCircles(entries, versions);
}

function refuseCircles(entries: readonly Entry[], versions: ReadonlyMap<string, number>): void {
  const grounds = new Map(
    entries.map((entry) => [
      entry.id,
      allUses(entry)
        .map(readUse)
        .filter(({ id, version }) => versions.get(id) === version)
        .map(({ id }) => id),
    ]),
  );
  const settled = new Set<string>();
  for (const { id } of entries) follow(id, grounds, settled);
}

/** Walks down from an entry without recursion: a stranger's chain may be longer than the stack is deep. */
function follow(start: string, grounds: ReadonlyMap<string, readonly string[]>, settled: Set<string>): void {
  const path: { readonly id: string; next: number }[] = [{ id: start, next: 0 }];
  const onPath = new Set([start]);
  for (let top = path.at(-1); top !== undefined; top = path.at(-1)) {
    const ground = grounds.get(top.id)?.[top.next++];
    if (ground === undefined) {
      settled.add(top.id);
      onPath.delete(top.id);
      path.pop();
    } else if (onPath.has(ground)) {
      const circle = [...path.slice(path.findIndex(({ id }) => id === ground)).map(({ id }) => id), ground];
      throw new Error(`entries stand on each other in a circle: ${short(circle.join(" on "))}`);
    } else if (!settled.has(ground)) {
      path.push({ id: ground, next: 0 });
      onPath.add(ground);
    }
  }
}

function deepFrozen<T>(value: T): T {
  if (typeof value !== "object" || value === null || Object.isFrozen(value)) return value;
  for (const part of Object.values(value)) deepFrozen(part);
  return Object.freeze(value);
}
