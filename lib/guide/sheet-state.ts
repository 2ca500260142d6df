// What a sheet remembers beside its entries: what was stated as unknown of each frame, and which results came from which hand.

import type { StatedText } from "../accuracy/index.ts";
import type { Quantity } from "../quantity/index.ts";
import type { Host, Ledger } from "../sheet/index.ts";
import type { Structure } from "../structure/types.ts";
import type { HingeSet } from "./types.ts";

/** What is taken as unknown of a frame, and the entry that says so. */
export interface Statement {
  /** The entry's id, and "id@version". */
  readonly id: string;
  readonly use: string;
  readonly stated: StatedText;
  /** Taken by default, by which run of which cell, and about the ratios of which hinge set. */
  readonly byDefault?: { readonly run: Host; readonly cell: number; readonly about?: string };
}

/** Why bands cannot be worked out for a frame: whatever is stated, or as long as nothing is. */
export interface Without {
  readonly always: boolean;
  readonly why: string;
}

export interface SheetState {
  /** By frame; undefined where bands can be worked out. */
  readonly without: Map<string, Without | undefined>;
  readonly statements: Map<string, Statement>;
  /** By frame, then by name: the hinge sets made. */
  readonly sets: Map<string, Map<string, HingeSet>>;
  /** By symbol: the value a result was recorded from. */
  readonly results: Map<string, Quantity>;
}

const states = new WeakMap<Ledger, SheetState>();

/** The state of a sheet, by its ledger: opened again the sheet has the same. */
export function stateOf(ledger: Ledger): SheetState {
  const found = states.get(ledger) ?? {
    statements: new Map(),
    sets: new Map(),
    results: new Map(),
    without: new Map(),
  };
  states.set(ledger, found);
  return found;
}

/** Names for a frame, the narrower first: with its dimensions, and without. A statement holds for the frame it was made for, and
 *  for the same frame with other dimensions while nothing else is said of that one. */
export function frameKeys(frame: Structure): readonly [string, string] {
  const { joints, members, supports, hinges } = frame;
  const parts = {
    members: members.map(({ name, start, end, group }) => [name, start, end, group]),
    supports: supports.map(({ joint, kind }) => [joint, kind]),
  };
  const sized = {
    ...parts,
    joints: joints.map(({ name, x, y }) => [name, x, y]),
    sections: members.map(({ section }) => section),
    hinges: hinges.map(({ member, at }) => [member, at]),
  };
  return [JSON.stringify(sized), JSON.stringify(parts)];
}
