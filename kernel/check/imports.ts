// What the cells and the local files they import ask for, so that the compiler is given no more than is needed.
import { existsSync, readFileSync } from "node:fs";
import { isBuiltin } from "node:module";
import { dirname, join } from "node:path";
import { resolveLocal } from "../local-modules.ts";
import { namedModules, namesFile, packageOf, parse, type Tree } from "../syntax.ts";
import type { CompilerOptions, Needs } from "./compiler.ts";

export interface Asked {
  readonly needs: Needs;
  /** Local TypeScript files reached from the cells, each with the first cell that leads to it. */
  readonly files: ReadonlyMap<string, number>;
}

/** Whether node_modules of the folder or one above holds a package. */
function holds(folder: string, name: string): boolean {
  for (let at = folder; ; at = dirname(at)) {
    if (existsSync(join(at, "node_modules", name))) return true;
    if (at === dirname(at)) return false;
  }
}

class Search {
  readonly files = new Map<string, number>();
  readonly packages = new Set<string>();

  look(tree: Tree, folder: string, index: number): void {
    for (const { specifier } of namedModules(tree)) {
      if (namesFile(specifier)) this.#follow(specifier, folder, index);
      else this.packages.add(specifier);
    }
  }

  /** A file that is not there is left to the compiler to report. */
  #follow(specifier: string, folder: string, index: number): void {
    let path: string;
    try {
      path = resolveLocal(specifier, folder);
    } catch {
      return;
    }
    if (this.files.has(path) || !/\.m?ts$/.test(path)) return;
    this.files.set(path, index);
    this.look(parse(readFileSync(path, "utf8")), dirname(path), index);
  }
}

/** What the cells of a notebook ask for. */
export function askedFor(trees: readonly Tree[], { folder, paths }: CompilerOptions): Asked {
  const search = new Search();
  for (const [index, tree] of trees.entries()) search.look(tree, folder, index);
  const names = [...search.packages].filter((name) => !(name in paths));
  const node = names.some((name) => isBuiltin(name));
  const wanted = [
    ...names.filter((name) => !isBuiltin(name)).map(packageOf),
    ...(node ? ["@types/node"] : []),
  ];
  return { needs: { node, borrowed: wanted.some((name) => !holds(folder, name)) }, files: search.files };
}
