// What a statement about unknowns is about, read from its key: "I of beams / I of columns", "A of BC", "bases", "base A".

import { axisOf, calledBy, endsReleasedAt, type Structure } from "../structure/index.ts";
import { AccuracyError } from "./faults.ts";
import { knownNames } from "./parts.ts";
import type { Stated } from "./stated-range.ts";

/** Something stated of I or A of members, or of their ratio to those of others. */
export interface StiffnessKey {
  readonly key: string;
  readonly kind: "I" | "A";
  readonly of: string;
  readonly over?: string;
}

/** Something stated of bases. */
export interface BaseKey {
  readonly key: string;
  readonly joints: readonly string[];
}

export interface StatedKeys {
  readonly stiffness: readonly StiffnessKey[];
  readonly bases: readonly BaseKey[];
}

const pattern = /^([IA]) of (.+?)(?:\s*\/\s*([IA]) of (.+))?$/;

/** Reads the keys. "bases" are all supports under columns that are not named by themselves. Throws on a key that is none. */
export function statedKeys(structure: Structure, stated: Readonly<Record<string, Stated>>): StatedKeys {
  const stiffness: StiffnessKey[] = [];
  const single: BaseKey[] = [];
  let all: string | undefined;
  for (const key of Object.keys(stated)) {
    const text = key.trim().replace(/\s+/g, " ");
    const [, kind, of, same = kind, over] = pattern.exec(text) ?? [];
    if ((kind === "I" || kind === "A") && same === kind && of !== undefined)
      stiffness.push({ key, kind, of, ...(over === undefined ? {} : { over }) });
    else if (/^bases$/i.test(text)) all = key;
    else if (/^bases? /i.test(text)) single.push(namedBases(structure, key, text));
    else throw new AccuracyError({ kind: "not a key", key, known: knownNames(structure) });
  }
  refuseTwice(single);
  const taken = single.flatMap((b) => b.joints);
  if (all === undefined) return { stiffness, bases: single };
  const joints = underColumns(structure).filter((joint) => !taken.includes(joint));
  if (joints.length === 0) throw new AccuracyError({ kind: "no bases", key: all, known: turning(structure) });
  return { stiffness, bases: [{ key: all, joints }, ...single] };
}

function namedBases(structure: Structure, key: string, text: string): BaseKey {
  const joints = text
    .slice(text.indexOf(" "))
    .split(",")
    .map((joint) => joint.trim());
  const known = turning(structure);
  if (joints.some((joint) => !known.includes(joint)))
    throw new AccuracyError({ kind: "no bases", key, known });
  return { key, joints };
}

function refuseTwice(bases: readonly BaseKey[]): void {
  const keys = new Map<string, string>();
  for (const { key, joints } of bases)
    for (const joint of joints) {
      const other = keys.get(joint);
      if (other !== undefined)
        throw new AccuracyError({ kind: "stated twice", what: `the base ${joint}`, keys: [other, key] });
      keys.set(joint, key);
    }
}

/** Joints with a support at which some member end takes a moment. */
function turning(structure: Structure): readonly string[] {
  return structure.supports.map((s) => s.joint).filter((joint) => !endsReleasedAt(structure, joint));
}

function underColumns(structure: Structure): readonly string[] {
  const columns = structure.members.filter((m) => calledBy(axisOf(structure, m)) === "column");
  return turning(structure).filter((joint) => columns.some((m) => m.start === joint || m.end === joint));
}
