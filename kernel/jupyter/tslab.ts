// tslab's converter, which answers completion, inspection and is-complete. The one file that imports tslab; loaded in
// a thread of its own, since its start takes a second and more.
//
// Behaviours leaned on (held by tests/kernel/jupyter/tslab.test.ts):
//   - `createConverter` works in the process's current folder, on `declarations` (seen as if they stood around the
//     text) and a text; both are given with every question;
//   - it reads files through `ts.sys` of its own compiler, so that what `ts.sys` finds can be added to;
//   - it takes the settings from the second argument of `ts.createWatchCompilerHost`, looked up in the compiler's exports
//     when the converter is made;
//   - `complete` answers names that begin with or hold the word before the place, in either case, and where that word
//     begins and ends; in a text literal it answers all, at the place;
//   - `inspect` answers `any` for names it does not know, and documentation without its tags' names;
//   - `isCompleteCode` knows only whether more is expected at the end, and answers complete for anything else.
import { existsSync, readFileSync, realpathSync, statSync } from "node:fs";
import { createRequire } from "node:module";
import { join, parse } from "node:path";

export interface Suggestions {
  readonly start: number;
  readonly end: number;
  readonly names: readonly string[];
}

interface Converter {
  complete(
    declarations: string,
    text: string,
    offset: number,
  ): { readonly start: number; readonly end: number; readonly candidates: readonly string[] };
  inspect(declarations: string, text: string, offset: number): object | undefined;
}

interface System {
  readFile(path: string, encoding?: string): string | undefined;
  fileExists(path: string): boolean;
  directoryExists(path: string): boolean;
  realpath(path: string): string;
}

interface Compiler {
  readonly sys: System;
  readonly ModuleResolutionKind: { readonly Bundler: number };
  createWatchCompilerHost(files: unknown, settings: object, ...more: unknown[]): unknown;
}

export interface TslabOptions {
  /** A folder whose node_modules serves where the current folder has no such package. */
  readonly ownFolder: string;
  /** Absolute declaration file of "hingebook". */
  readonly libraryTypes: string;
}

export interface Tslab {
  complete(declarations: string, text: string, offset: number): Suggestions;
  /** What a name is, in words; nothing where there is no name. */
  inspect(declarations: string, text: string, offset: number): string | undefined;
  /** Indent of the next line when more is expected at the end of the text; nothing when it is not. */
  unfinished(text: string): string | undefined;
}

/** What stands in node_modules at the root of the file system, though it does not: the library, borrowed packages. */
function lend(sys: System, { ownFolder, libraryTypes }: TslabOptions): void {
  const root = join(parse(ownFolder).root, "node_modules");
  const own = join(ownFolder, "node_modules");
  const manifest = JSON.stringify({ name: "hingebook", version: "0.0.0", types: "index.d.ts" });
  const made = new Map([
    [join(root, "hingebook", "package.json"), manifest],
    [join(root, "hingebook", "index.d.ts"), readFileSync(libraryTypes, "utf8")],
  ]);
  const borrowed = (path: string): string | undefined =>
    (path === root || path.startsWith(`${root}/`)) && !existsSync(path)
      ? own + path.slice(root.length)
      : undefined;
  const { readFile, fileExists, directoryExists, realpath } = sys;
  const kind = (path: string) => statSync(path, { throwIfNoEntry: false });
  sys.readFile = (path, encoding) => made.get(path) ?? readFile(borrowed(path) ?? path, encoding);
  sys.fileExists = (path) => made.has(path) || fileExists(borrowed(path) ?? path);
  sys.directoryExists = (path) => {
    if (path.endsWith("/@types")) return false; // cells see no more than they import
    if (path === join(root, "hingebook")) return true;
    const there = borrowed(path);
    return there === undefined ? directoryExists(path) : (kind(there)?.isDirectory() ?? false);
  };
  sys.realpath = (path) => {
    if (made.has(path)) return path;
    const there = borrowed(path);
    return there !== undefined && existsSync(there) ? realpathSync(there) : realpath(path);
  };
}

/** Load tslab's compiler with the settings cells are checked with. */
function loadCompiler(require: NodeJS.Require, fromTslab: NodeJS.Require): Compiler {
  const path = fromTslab.resolve("@tslab/typescript-for-tslab");
  const loaded = require(path) as Compiler;
  const copy = { ...loaded, __esModule: true };
  const { createWatchCompilerHost } = loaded;
  copy.createWatchCompilerHost = (files, settings, ...more) =>
    createWatchCompilerHost(
      files,
      {
        ...settings,
        lib: ["lib.es2023.d.ts"],
        strict: true,
        noUncheckedIndexedAccess: true,
        moduleResolution: loaded.ModuleResolutionKind.Bundler,
        allowImportingTsExtensions: true,
        noEmit: true,
        checkJs: false,
        types: [],
      },
      ...more,
    );
  const cached = require.cache[path];
  if (cached) cached.exports = copy;
  return copy;
}

/** Start tslab. Takes a second and more; to be called once, in a thread of its own. */
export function startTslab(options: TslabOptions): Tslab {
  const require = createRequire(import.meta.url);
  const at = require.resolve("tslab/dist/converter.js");
  const compiler = loadCompiler(require, createRequire(at));
  lend(compiler.sys, options);
  const { createConverter, isCompleteCode } = require(at) as {
    createConverter(): Converter;
    isCompleteCode(text: string): { readonly completed: boolean; readonly indent?: string };
  };
  const { printQuickInfo } = require("tslab/dist/inspect.js") as { printQuickInfo(info: object): string };
  const converter = createConverter();
  return {
    complete: (declarations, text, offset) => {
      const { start, end, candidates } = converter.complete(declarations, text, offset);
      return { start, end, names: candidates };
    },
    inspect: (declarations, text, offset) => {
      const info = converter.inspect(declarations, text, offset);
      return info ? printQuickInfo(info) : undefined;
    },
    unfinished: (text) => {
      const { completed, indent = "" } = isCompleteCode(text);
      return completed ? undefined : indent;
    },
  };
}
