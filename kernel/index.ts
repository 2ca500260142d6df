export {
  type CellDiagnostic,
  type Checker,
  type CheckerOptions,
  createChecker,
  type UnitsOf,
} from "./check/index.ts";
export { display, type MimeBundle } from "./display.ts";
export type { CellFailure } from "./failure.ts";
export { ownFolder } from "./folders.ts";
export { type Library, libraryTypes, loadLibrary, type OpenLedger } from "./library.ts";
export { main } from "./main.ts";
export { type Notebook, type NotebookCell, parseNotebook, readNotebook } from "./notebook.ts";
export { type RunOptions, type RunState, runNotebooks, type Terminal } from "./run.ts";
export { type CellName, type CellResult, type OutputEvent, Session, type SessionOptions } from "./session.ts";
