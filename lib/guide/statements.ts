// What is taken as unknown of a frame: what the engineer stated, or the default, recorded where it is first needed.

import { AccuracyError, type StatedText } from "../accuracy/index.ts";
import { host, type Ledger } from "../sheet/index.ts";
import { determinacy } from "../statics/index.ts";
import { ratioSources } from "../structure/index.ts";
import type { Sources, Structure } from "../structure/types.ts";
import { type BandBook, bandBook, type Taken } from "./band-book.ts";
import { aboutRatios, type SetRatios, startingRatios } from "./set-ratios.ts";
import { frameKeys, type SheetState, type Statement, type Without } from "./sheet-state.ts";
import { recordStatement } from "./statement.ts";
import type { HingeSet } from "./types.ts";
import { type UnknownFrame, unknownFrame } from "./unknown-frame.ts";

/** The bands of a sheet whose entries go to `ledger`. */
export function bandsOn(ledger: Ledger, state: SheetState): BandBook {
  return bandBook((frame, sets) => taken(ledger, state, frame, sets));
}

function taken(ledger: Ledger, state: SheetState, frame: Structure, sets: readonly HingeSet[]): Taken {
  const none = withoutBands(state, frame);
  const stated = statementFor(ledger, state, frame);
  if (none !== undefined && (none.always || stated === undefined)) return { none: none.why };
  if (stated !== undefined) {
    const unknown = unknownFrame(frame, stated.stated);
    return { use: stated.use, unknown, ...usualOf(stated.byDefault) };
  }
  const start = startingRatios(ledger, state, frame, sets);
  const { plain, unknown, because, from } = usual(frame, start);
  const { rows: _, ...entry } = recordStatement(ledger, frame, plain, because, { from, byDefault: true });
  const about = unknown.sizesKnown || start === undefined ? {} : { about: start.set };
  const byDefault = { run: host(), cell: host().cell?.number ?? 0, ...about };
  const kept = { ...entry, byDefault };
  for (const key of frameKeys(frame)) state.statements.set(key, kept);
  return { use: kept.use, unknown, ...usualOf(byDefault) };
}

const usualOf = (
  byDefault: Statement["byDefault"],
): { readonly byDefault?: true; readonly about?: string } =>
  byDefault === undefined
    ? {}
    : { byDefault: true, ...(byDefault.about === undefined ? {} : { about: byDefault.about }) };

interface Usual {
  readonly plain: StatedText;
  readonly unknown: UnknownFrame;
  readonly because: string;
  readonly from: Sources;
}

/** The plain default: about the sections given, otherwise about the ratios given with hinges, otherwise about 1. */
function usual(frame: Structure, start: SetRatios | undefined): Usual {
  const bare = unknownFrame(frame, {});
  const plain = { plain: {}, unknown: bare, from: [] };
  if (bare.sizesKnown)
    return { ...plain, because: "not stated otherwise; the plain default once sections are given" };
  const because = "not stated otherwise; the plain default while sizes are still to be chosen";
  if (start === undefined) return { ...plain, because };
  const about = aboutRatios(start.ratios);
  return {
    plain: about,
    unknown: unknownFrame(frame, about),
    because: `${because}, about the ratios the hinges under ${start.set} were placed by`,
    from: ratioSources(start.ratios),
  };
}

/** Why a frame has no bands: never, or not unless something is stated. */
function withoutBands(state: SheetState, frame: Structure): Without | undefined {
  const [key] = frameKeys(frame);
  if (!state.without.has(key)) state.without.set(key, reasonFor(frame));
  return state.without.get(key);
}

function reasonFor(frame: Structure): Without | undefined {
  const { selfStress, mechanisms } = determinacy(frame);
  const [motion] = mechanisms;
  if (motion !== undefined)
    return {
      always: true,
      why: `it can move by itself (${motion.words}), and no stiffness gives its forces`,
    };
  if (selfStress === 0)
    return { always: false, why: "it is statically determinate, and no stiffness enters its forces" };
  try {
    unknownFrame(frame, {});
    return undefined;
  } catch (error) {
    if (error instanceof AccuracyError) return { always: false, why: error.message };
    throw error;
  }
}

/** The statement that holds for a frame, if its entry is still on the sheet; a default made by this cell before is made anew. */
export function statementFor(
  ledger: Ledger,
  { statements }: SheetState,
  frame: Structure,
): Statement | undefined {
  return frameKeys(frame)
    .flatMap((key) => statements.get(key) ?? [])
    .find(({ id, byDefault }) => {
      const entry = ledger.entry(id);
      if (entry === undefined) return false;
      return byDefault === undefined || byDefault.run === host() || entry.cell !== (host().cell?.number ?? 0);
    });
}
