// The files beside a notebook that its cells import, gathered so that the package can be run again without them.
import { existsSync, readFileSync } from "node:fs";
import { dirname, relative, sep } from "node:path";
import type { SourceFile } from "../../lib/sheet/index.ts";
import { resolveLocal } from "../local-modules.ts";
import type { Notebook } from "../notebook.ts";
import { namedModules, namesFile, parse } from "../syntax.ts";

/** Files a text imports by path. A text that cannot be parsed names none; its cell says why. */
function localImports(text: string): string[] {
  if (!/["'`]\.{1,2}\//.test(text)) return [];
  try {
    return namedModules(parse(text)).flatMap(({ specifier }) => (namesFile(specifier) ? specifier : []));
  } catch {
    return [];
  }
}

/** The imported files below the notebook's folder, in the order of their paths. A file above it is left out: the
 *  notebook cannot be run again without it, and that run will say so. */
export function localFiles({ cells, folder }: Notebook): readonly SourceFile[] {
  const texts = new Map<string, string>();
  const open = cells
    .filter(({ kind }) => kind === "code")
    .map(({ source }) => ({ text: source, from: folder }));
  for (let next = open.pop(); next; next = open.pop())
    for (const specifier of localImports(next.text)) {
      const path = found(specifier, next.from);
      if (path === undefined || texts.has(path)) continue;
      const text = readFileSync(path, "utf8");
      texts.set(path, text);
      if (!path.endsWith(".json")) open.push({ text, from: dirname(path) });
    }
  return [...texts]
    .map(([path, text]) => ({ path: relative(folder, path).split(sep).join("/"), text }))
    .filter(({ path }) => !path.startsWith("../"))
    .sort((a, b) => (a.path < b.path ? -1 : 1));
}

function found(specifier: string, folder: string): string | undefined {
  try {
    const path = resolveLocal(specifier, folder);
    return existsSync(path) ? path : undefined;
  } catch {
    return undefined; // the cell that imports it says what is missing
  }
}
