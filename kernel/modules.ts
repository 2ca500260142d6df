// The modules cells import: the kernel's own library, Node's built-ins, files beside the notebook, and packages.
import { isBuiltin } from "node:module";
import { isAbsolute, join } from "node:path";
import { fileURLToPath } from "node:url";
import { types } from "node:util";
import { constants, runInThisContext } from "node:vm";
import { LocalModules } from "./local-modules.ts";
import type { Runner } from "./rewrite/index.ts";
import type { Scripts } from "./scripts.ts";
import { namesFile, packageOf } from "./syntax.ts";

export interface ModuleSources {
  /** Where the notebook lies. */
  readonly folder: string;
  /** Where hingebook's own packages are found when the notebook's folder has none. */
  readonly ownFolder: string;
  /** Modules handed over as they are, by name. */
  readonly given: Readonly<Record<string, object>>;
  readonly context: object;
  readonly scripts: Scripts;
  /** Told of everything a `throw` in a cell or local module throws. */
  readonly onThrow: (value: unknown) => void;
}

/** Run something without Node's notice that import from a chosen folder is an experimental feature. */
function quietly<T>(run: () => T): T {
  const { emitWarning } = process;
  process.emitWarning = ((warning: string | Error, ...more: never[]) => {
    if (!String(warning).includes("USE_MAIN_CONTEXT_DEFAULT_LOADER"))
      emitWarning.call(process, warning, ...more);
  }) as typeof emitWarning;
  try {
    return run();
  } finally {
    process.emitWarning = emitWarning;
  }
}

/** Import as a file in `folder` would. */
function importFrom(folder: string, specifier: string): Promise<object> {
  return quietly(() => {
    const asked = runInThisContext("(specifier) => import(specifier)", {
      filename: join(folder, "cell.js"),
      importModuleDynamically: constants.USE_MAIN_CONTEXT_DEFAULT_LOADER,
    }) as (specifier: string) => Promise<object>;
    return asked(specifier);
  });
}

function isMissing(error: unknown, specifier: string): boolean {
  const { code, message } = error as { code?: string; message?: string };
  return (
    code === "ERR_MODULE_NOT_FOUND" && (message ?? "").includes(`'${packageOf(specifier)}' imported from`)
  );
}

const list = (names: readonly string[]): string => (names.length > 0 ? names.join(", ") : "nothing");

/** An export by name, with a CommonJS package's exports as the compiler sees them. */
function exported(module: object, name: string): { readonly value: unknown } | undefined {
  const space = module as Record<string, unknown>;
  const inner = space.default;
  const fromPackage = types.isModuleNamespaceObject(module) && typeof inner === "object" && inner !== null;
  const common = fromPackage ? (inner as Record<string, unknown>) : undefined;
  if (name === "default" && common?.__esModule === true && "default" in common)
    return { value: common.default };
  if (name in space) return { value: space[name] };
  return common && name in common ? { value: common[name] } : undefined;
}

const looksLikeType = (name: string): boolean => /^\p{Lu}/u.test(name);

/** Pick names from a module. A missing name that begins with a capital may be a type and is left out; any other is refused. */
export function pickNames(module: object, wanted: readonly string[], specifier: string): object {
  const picked: Record<string, unknown> = {};
  for (const name of wanted) {
    const found = exported(module, name);
    if (found) picked[name] = found.value;
    else if (name === "default") {
      throw new SyntaxError(`"${specifier}" has no default export; write import { … } from "${specifier}"`);
    } else if (!looksLikeType(name)) {
      throw new SyntaxError(
        `"${name}" is not exported by "${specifier}"; it exports ${list(Object.keys(module).sort())}`,
      );
    }
  }
  return picked;
}

export class Modules {
  readonly #sources: ModuleSources;
  readonly #local: LocalModules;

  constructor(sources: ModuleSources) {
    this.#sources = sources;
    this.#local = new LocalModules(sources.context, sources.scripts, (folder, chain) =>
      this.#runner(folder, chain),
    );
  }

  /** What the notebook's cells call. */
  cellRunner(show: (value: unknown) => void): Runner {
    return { ...this.#runner(this.#sources.folder, []), show };
  }

  #runner(folder: string, chain: readonly string[]): Runner {
    const nothing = (): void => {};
    return {
      load: (specifier) => this.#load(String(specifier), folder, chain),
      names: pickNames,
      whole: (module) => module,
      show: nothing,
      exports: nothing,
      reexport: nothing,
      thrown: (value) => {
        this.#sources.onThrow(value);
        return value;
      },
    };
  }

  async #load(specifier: string, folder: string, chain: readonly string[]): Promise<object> {
    const given = Object.hasOwn(this.#sources.given, specifier) ? this.#sources.given[specifier] : undefined;
    if (given) return given;
    if (isBuiltin(specifier)) return import(specifier);
    if (!(namesFile(specifier) || isAbsolute(specifier))) return await this.#package(specifier, folder);
    const path = specifier.startsWith("file:") ? fileURLToPath(specifier) : specifier;
    return await this.#local.load(path, folder, chain);
  }

  async #package(specifier: string, folder: string): Promise<object> {
    const { folder: notebook, ownFolder } = this.#sources;
    for (const base of new Set([folder, notebook, ownFolder])) {
      try {
        return await importFrom(base, specifier);
      } catch (error) {
        if (!isMissing(error, specifier)) throw error;
      }
    }
    throw new Error(
      `package "${packageOf(specifier)}" is not installed: it is neither beside the notebook nor among hingebook's own packages`,
    );
  }
}
