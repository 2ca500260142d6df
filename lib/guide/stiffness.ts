// What relative stiffness a hinge or a gravity set is placed by: ratios given with it, the frame's own sections, or the nominal
// ratios stated as unknown on the sheet.

import type { Ledger } from "../sheet/index.ts";
import {
  mergeSources,
  ratioSources,
  type StiffnessRatios,
  withRelativeStiffness,
} from "../structure/index.ts";
import type { Sources, Structure } from "../structure/types.ts";
import { ratioWords } from "./set-ratios.ts";
import type { SheetState } from "./sheet-state.ts";
import { statementFor } from "./statements.ts";
import { unknownFrame } from "./unknown-frame.ts";

/** A frame with a section for every member, how its stiffness was come by, in words, and what it came from. */
export interface Stiffness {
  readonly structure: Structure;
  readonly words: string;
  readonly from: Sources;
}

/** Finds the stiffness of a frame; none where nothing was said of it. */
export type StiffnessOf = (frame: Structure, ratios: StiffnessRatios | undefined) => Stiffness | undefined;

/** On a sheet: by ratios, by sections, by what was stated as unknown; a beam needs none of them, its I is then taken as alike. */
export function stiffnessOn(ledger: Ledger, state: SheetState): StiffnessOf {
  return (frame, ratios) =>
    byRatios(frame, ratios) ?? bySections(frame) ?? stated(ledger, state, frame) ?? alike(frame);
}

/** Throws where nothing is known of the stiffness, naming what is missing. */
export function knownStiffness(
  find: StiffnessOf,
  frame: Structure,
  ratios: StiffnessRatios | undefined,
): Stiffness {
  const found = find(frame, ratios);
  if (found !== undefined) return found;
  const without = frame.members.filter(({ section }) => section === undefined).map(({ name }) => name);
  const names = `${without.slice(0, 4).join(", ")}${without.length > 4 ? ", …" : ""}`;
  throw new Error(
    `relative stiffness: members have no sections (${names}); give ratios: { "I of beams / I of columns": 2.5 }, state them first by sheet.unknowns, or give sections by withSections`,
  );
}

function byRatios(frame: Structure, ratios: StiffnessRatios | undefined): Stiffness | undefined {
  if (ratios === undefined || Object.keys(ratios).length === 0) return undefined;
  return {
    structure: withRelativeStiffness(frame, ratios),
    words: ratioWords(ratios),
    from: ratioSources(ratios),
  };
}

function bySections(frame: Structure): Stiffness | undefined {
  if (frame.members.some(({ section }) => section === undefined)) return undefined;
  const from = mergeSources(...frame.members.map((member) => member.from));
  return { structure: frame, words: "sections as given", from };
}

function stated(ledger: Ledger, state: SheetState, frame: Structure): Stiffness | undefined {
  const statement = statementFor(ledger, state, frame);
  if (statement === undefined || statement.byDefault !== undefined) return undefined;
  const { structure, nominal } = unknownFrame(frame, statement.stated);
  return { structure, words: `nominal ratios stated, ${nominal.join("; ")}`, from: [statement.use] };
}

function alike(frame: Structure): Stiffness | undefined {
  const groups = new Set(frame.members.map(({ group, name }) => group ?? name));
  if (frame.family !== "beam" && groups.size > 1) return undefined;
  if (frame.members.some(({ section }) => section !== undefined)) return undefined;
  return { structure: withRelativeStiffness(frame, {}), words: "I alike in all members", from: [] };
}
