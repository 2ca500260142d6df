// Files beside the notebook: .ts and .js modules run in the cells' own context, .json as data, .cjs by require. Each is
// read again when it, or a file it imports, has changed.
import { readFileSync, statSync } from "node:fs";
import { createRequire } from "node:module";
import { basename, dirname, extname, resolve } from "node:path";
import { runInContext } from "node:vm";
import { type Runner, rewriteModule, SyntaxRefusal } from "./rewrite/index.ts";
import { nextFileScript, type Scripts } from "./scripts.ts";

interface Loaded {
  readonly content: string;
  readonly uses: Set<string>;
  /** Set as soon as the module has begun to run. */
  space?: Promise<object>;
}

const isFile = (path: string): boolean => statSync(path, { throwIfNoEntry: false })?.isFile() ?? false;

const ENDINGS = ["", ".ts", ".js", ".mjs", ".json", "/index.ts", "/index.js"];

function candidates(path: string): string[] {
  const asTypeScript = /\.m?js$/.test(path) ? [path.replace(/js$/, "ts")] : [];
  return [...asTypeScript, ...ENDINGS.map((ending) => path + ending)];
}

/** The file a relative specifier names, as the checker resolves it. */
export function resolveLocal(specifier: string, folder: string): string {
  const path = resolve(folder, specifier);
  const own = candidates(path);
  const found = isFile(path) ? path : own.find(isFile);
  if (found !== undefined) return found;
  throw new Error(`"${specifier}" is not there: looked for ${own.map((file) => basename(file)).join(", ")}`);
}

const isCommonJs = (path: string, content: string): boolean =>
  path.endsWith(".cjs") || (/\.js$/.test(path) && /\bmodule\.exports\b|^\s*exports\./m.test(content));

function readJson(context: object, path: string, content: string): object {
  const parse = runInContext("JSON.parse", context) as (text: string) => unknown;
  try {
    const data = parse(content);
    const names = typeof data === "object" && data !== null && !Array.isArray(data) ? data : {};
    return { ...names, default: data };
  } catch (cause) {
    throw new Error(`${basename(path)} is not JSON: ${(cause as Error).message}`, { cause });
  }
}

export class LocalModules {
  readonly #loaded = new Map<string, Loaded>();

  constructor(
    readonly context: object,
    readonly scripts: Scripts,
    readonly runnerIn: (folder: string, chain: readonly string[]) => Runner,
  ) {}

  /** The module at a path, relative to a folder. `chain` holds the files whose imports led here. */
  async load(specifier: string, folder: string, chain: readonly string[]): Promise<object> {
    const path = resolveLocal(specifier, folder);
    const importer = chain.at(-1);
    if (importer !== undefined) this.#loaded.get(importer)?.uses.add(path);
    if (chain.includes(path)) {
      const [first = "", last = ""] = [path, importer ?? path].map((file) => basename(file));
      throw new Error(`"${first}" and "${last}" import each other; move what both need into a third file`);
    }
    const known = this.#loaded.get(path);
    if (known?.space && this.#isFresh(path)) return await known.space;
    const content = readFileSync(path, "utf8");
    const loaded: Loaded = { content, uses: new Set() };
    this.#loaded.set(path, loaded);
    loaded.space = this.#run(path, content, chain);
    try {
      return await loaded.space; // awaited, not just returned: the stack of an error then leads back to the cell
    } catch (error) {
      this.#loaded.delete(path);
      throw error;
    }
  }

  #isFresh(path: string, seen = new Set<string>()): boolean {
    if (seen.has(path)) return true;
    seen.add(path);
    const loaded = this.#loaded.get(path);
    if (!loaded || !isFile(path) || readFileSync(path, "utf8") !== loaded.content) return false;
    return [...loaded.uses].every((used) => this.#isFresh(used, seen));
  }

  async #run(path: string, content: string, chain: readonly string[]): Promise<object> {
    const ending = extname(path);
    if (ending === ".json") return readJson(this.context, path, content);
    if (isCommonJs(path, content)) return this.#require(path);
    if (![".ts", ".mts", ".js", ".mjs"].includes(ending))
      throw new Error(`"${basename(path)}" cannot be imported; cells import .ts, .js and .json files`);
    return await this.#module(path, content, [...chain, path]);
  }

  #require(path: string): object {
    const require = createRequire(path);
    delete require.cache[require.resolve(path)];
    const exports = require(path) as unknown;
    const names = typeof exports === "object" && exports !== null ? exports : {};
    return { ...names, default: exports };
  }

  async #module(path: string, content: string, chain: readonly string[]): Promise<object> {
    const name = nextFileScript();
    const file = basename(path);
    const space: object = Object.create(null);
    try {
      const { code, locate } = rewriteModule(content);
      this.scripts.add(name, { source: content, file, locate });
      const run = runInContext(code, this.context, { filename: name }) as (runner: Runner) => Promise<void>;
      const give = (getters: object): void => {
        for (const [key, description] of Object.entries(Object.getOwnPropertyDescriptors(getters)))
          if (!(key in space)) Object.defineProperty(space, key, { ...description, enumerable: true });
      };
      const reexport = (module: object): void => {
        const { default: _own, ...named } = Object.getOwnPropertyDescriptors(module) as PropertyDescriptorMap;
        give(Object.defineProperties({}, named));
      };
      await run({ ...this.runnerIn(dirname(path), chain), exports: give, reexport });
    } catch (error) {
      if (!(error instanceof SyntaxRefusal)) throw error;
      const { line, column } = error.at;
      throw new SyntaxError(`${file}, line ${line}, column ${column}: ${error.message}`, { cause: error });
    }
    return space;
  }
}
