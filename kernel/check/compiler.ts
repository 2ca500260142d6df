// TypeScript 7 as a checker. The one file that imports the compiler's API, which its makers call unstable.
//
// The compiler is a process of its own, spoken to over its standard streams; nothing here blocks while it works.
// Behaviours leaned on (held by tests/kernel/compiler.test.ts):
//   - `new API({ cwd, fs })` starts the process at the first request; each `fs` function may answer undefined for
//     "as on disk"; `readFile` alone is enough to make a file exist;
//   - `updateSnapshot({ openProjects })` reads a configuration file, `fileChanges.changed` makes it read a file again;
//   - `getSyntacticDiagnostics` and `getSemanticDiagnostics` of one file give `pos` and `end` in UTF-16 units;
//   - `paths` needs no `baseUrl`, and a name it does not list is looked for in node_modules, upwards from the file;
//   - a namespace in a block is reported (1235) but typed all the same;
//   - `close` ends the process.
import { existsSync, readFileSync, realpathSync, statSync } from "node:fs";
import { join, parse } from "node:path";
import { API } from "typescript-native/unstable/async";
import { GLOBALS_DECLARATION, OWN_GLOBALS } from "./globals-declaration.ts";

/** What the compiler says of a place in a text; offsets in UTF-16 units. `file` is absent for the module asked about. */
export interface Finding {
  readonly code: number;
  readonly text: string;
  readonly start: number;
  readonly end: number;
  readonly file?: string;
}

export interface CompilerOptions {
  /** Relative imports and packages are looked for from here. */
  readonly folder: string;
  /** A folder whose node_modules holds what the notebook's folder does not. */
  readonly ownFolder: string;
  /** Absolute declaration (or source) file by module name. */
  readonly paths: Readonly<Record<string, string>>;
}

/** What one check needs besides the text. */
export interface Needs {
  /** Node's own declarations, because a cell imports a built-in module. */
  readonly node: boolean;
  /** Packages to take from `ownFolder`. */
  readonly borrowed: boolean;
}

const SETTINGS = {
  target: "es2023",
  lib: ["es2023"],
  module: "esnext",
  moduleResolution: "bundler",
  moduleDetection: "force",
  strict: true,
  noUncheckedIndexedAccess: true,
  experimentalDecorators: true,
  allowImportingTsExtensions: true,
  resolveJsonModule: true,
  skipLibCheck: true,
  noEmit: true,
};

const NAMESPACE_IN_BLOCK = 1235;

/** One compiler process for one notebook folder and one set of needs. */
export class Compiler {
  readonly #options: CompilerOptions;
  readonly #needs: Needs;
  readonly #module: string;
  readonly #globals: string;
  readonly #config: string;
  readonly #api: API;
  #text = "";
  #opened = false;

  constructor(options: CompilerOptions, needs: Needs) {
    this.#options = options;
    this.#needs = needs;
    const { folder } = options;
    this.#module = join(folder, "hingebook-cells.ts");
    this.#globals = join(folder, "hingebook-globals.d.ts");
    this.#config = join(folder, "hingebook-cells.json");
    this.#api = new API({ cwd: folder, fs: needs.borrowed ? this.#borrowing() : { readFile: this.#read } });
  }

  readonly #read = (file: string): string | undefined => {
    if (file === this.#module) return this.#text;
    if (file === this.#config) return this.#configuration();
    if (file === this.#globals) return this.#needs.node ? OWN_GLOBALS : GLOBALS_DECLARATION;
    return undefined;
  };

  #configuration(): string {
    const { paths } = this.#options;
    const { node } = this.#needs;
    return JSON.stringify({
      compilerOptions: {
        ...SETTINGS,
        types: node ? ["node"] : [],
        paths: Object.fromEntries(Object.entries(paths).map(([name, file]) => [name, [file]])),
      },
      files: [this.#globals, this.#module],
    });
  }

  /** The file system with the packages of `ownFolder` in a node_modules at the root, the last place looked in. */
  #borrowing(): object {
    const root = join(parse(this.#options.folder).root, "node_modules");
    const own = this.#packagesFolder();
    const real = (path: string): string | undefined =>
      (path === root || path.startsWith(`${root}/`)) && !existsSync(path)
        ? own + path.slice(root.length)
        : undefined;
    const answer =
      <T>(ask: (path: string) => T) =>
      (path: string): T | undefined => {
        const there = real(path);
        return there === undefined ? undefined : ask(there);
      };
    const kind = (path: string) => statSync(path, { throwIfNoEntry: false });
    return {
      readFile: (path: string) =>
        this.#read(path) ??
        answer((there) => (kind(there)?.isFile() ? readFileSync(there, "utf8") : undefined))(path),
      fileExists: (path: string) =>
        this.#read(path) === undefined ? answer((there) => kind(there)?.isFile() ?? false)(path) : true,
      directoryExists: answer((there) => kind(there)?.isDirectory() ?? false),
      realpath: answer((there) => (existsSync(there) ? realpathSync(there) : there)),
    };
  }

  #packagesFolder(): string {
    for (let folder = this.#options.ownFolder; ; folder = parse(folder).dir) {
      const packages = join(folder, "node_modules");
      if (existsSync(packages)) return packages;
      if (folder === parse(folder).dir) return join(this.#options.ownFolder, "node_modules");
    }
  }

  /** Check a module text, and the local files it imports, which are read again. */
  async check(text: string, files: readonly string[] = []): Promise<Finding[]> {
    this.#text = text;
    const snapshot = await this.#api.updateSnapshot(
      this.#opened
        ? { fileChanges: files.length > 0 ? { invalidateAll: true } : { changed: [this.#module] } }
        : { openProjects: [this.#config] },
    );
    this.#opened = true;
    const project = snapshot.getProject(this.#config);
    if (!project) throw new Error("the type checker did not open the notebook");
    const { program } = project;
    const findings: Finding[] = [];
    for (const file of [this.#module, ...files]) {
      const found = [
        ...(await program.getSyntacticDiagnostics(file)),
        ...(await program.getSemanticDiagnostics(file)),
      ];
      for (const { code, text: words, pos, end, messageChain } of found) {
        if (code === NAMESPACE_IN_BLOCK) continue;
        const chain = (messageChain ?? []).map((part) => part.text);
        findings.push({
          code,
          text: [words, ...chain].join("\n"),
          start: pos,
          end,
          ...(file === this.#module ? {} : { file }),
        });
      }
    }
    await snapshot.dispose();
    return findings;
  }

  async close(): Promise<void> {
    await this.#api.close();
  }
}
