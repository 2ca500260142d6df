// The one name a rewritten cell or module uses to reach its runner, and what it finds there.

/** Cells see the runner under this name; a cell must not declare it. */
export const RUNNER = "__hingebook";

/** What rewritten text calls. */
export interface Runner {
  /** The module a specifier names, as seen from the text that asks. */
  load(specifier: string): Promise<object>;
  /** The module with the names an import asks for; refuses a name it does not export. */
  names(module: object, wanted: readonly string[], specifier: string): object;
  /** The module as `import * as` gives it. */
  whole(module: object): object;
  /** The value of the cell's last expression. */
  show(value: unknown): void;
  /** What a `throw` throws, given back as it is, so that the place of a value without a stack is known. */
  thrown(value: unknown): unknown;
  /** Names a local module gives, as getters. */
  exports(getters: object): void;
  /** All names of another module, given on by a local module. */
  reexport(module: object): void;
}
