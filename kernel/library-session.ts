// A session whose cells get the library, with the ledger told which cell is running. The headless runner and the
// Jupyter kernel make theirs here, so that a notebook comes out the same.
import { setImmediate as nextTurn } from "node:timers/promises";
import type { Checker } from "./check/index.ts";
import type { Activity } from "./interruption.ts";
import { type Library, libraryTypes } from "./library.ts";
import { changedBelow } from "./out-of-date.ts";
import { type CellName, checkerOptions, type OutputEvent, Session, type SessionOptions } from "./session.ts";

export interface LibrarySessionOptions {
  /** Where the notebook lies. */
  readonly folder: string;
  /** File name of the notebook, where it is known. */
  readonly notebook?: string;
  /** Givens set from outside: symbol -> measure as text. */
  readonly overrides: ReadonlyMap<string, string>;
  /** Loads the library; called once the session has begun to start. */
  readonly library: () => Promise<Library>;
  /** Absolute declaration file of the library, when it is not where it is usually found. */
  readonly types?: string;
  readonly onOutput: (event: OutputEvent) => void;
  readonly activity?: Activity;
  readonly checker?: Checker;
  /** Nobody sees what cells show. */
  readonly unseen?: boolean;
}

export interface LibrarySession {
  readonly session: Session;
  readonly library: Promise<Library>;
  /** What a value stands on that has changed since, by the open sheet. */
  readonly changed: (value: unknown) => readonly string[];
}

function sessionOptions(options: LibrarySessionOptions, library: Promise<Library>): SessionOptions {
  const {
    folder,
    notebook,
    overrides,
    types = libraryTypes(),
    onOutput,
    activity,
    checker,
    unseen = false,
  } = options;
  let loaded: Library | undefined;
  const ready = library.then((it) => {
    loaded = it;
    return it;
  });
  const module = ready.then((it) => it.module);
  const unitsOf = ready.then((it) => it.unitsOf);
  for (const later of [module, unitsOf]) later.catch(() => undefined); // whoever awaits the library reports it
  return {
    folder,
    modules: { hingebook: module },
    libraryTypes: types,
    unitsOf,
    beforeCell: (cell: CellName) =>
      loaded?.attachHost({ cell, overrides, ...(notebook === undefined ? {} : { notebook }) }),
    afterCell: (cell: CellName) => loaded?.currentLedger()?.endCell(cell.id),
    changedBelow: (value: unknown) => changedBelow(value, loaded?.currentLedger()),
    onOutput,
    unseen,
    ...(activity ? { activity } : {}),
    ...(checker ? { checker } : {}),
  };
}

/** Open a session with the library. The checker's process is started before the library is loaded, so that they start
 *  side by side. */
export function librarySession(options: LibrarySessionOptions): LibrarySession {
  const library = nextTurn().then(options.library);
  const given = sessionOptions(options, library);
  return { session: new Session(given), library, changed: (value) => given.changedBelow?.(value) ?? [] };
}

/** What a checker that outlives its sessions is to know of such a session. */
export function libraryChecker(options: LibrarySessionOptions): ReturnType<typeof checkerOptions> {
  return checkerOptions(sessionOptions(options, nextTurn().then(options.library)));
}
