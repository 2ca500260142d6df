// The table of rooms: which folder may import which. The hand side must never reach the computer side.
import { readdirSync, readFileSync, statSync } from "node:fs";
import { dirname, join, relative, resolve } from "node:path";
import { parseSync } from "oxc-parser";
import { describe, expect, test } from "vitest";

const top = resolve(import.meta.dirname, "..");

/** What each room may import, besides itself. Rooms not built yet have no folder; their row holds already. */
const mechanics = ["quantity", "structure", "results"];
const methods = [...mechanics, "statics", "inflection", "lateral", "exact", "loading"];
const judged = [...methods, "accuracy", "compare", "sizing", "drawing"];
const table: Readonly<Record<string, readonly string[]>> = {
  quantity: [],
  structure: ["quantity"],
  results: ["quantity", "structure"],
  statics: mechanics,
  inflection: mechanics,
  lateral: [...mechanics, "statics"],
  exact: mechanics,
  loading: mechanics,
  accuracy: methods,
  compare: methods,
  sizing: methods,
  drawing: methods,
  sheet: ["quantity"],
  report: ["sheet", "drawing", ...mechanics],
  guide: [...judged, "sheet"],
  index: [...judged, "sheet", "guide", "report"],
};
const handSide = ["statics", "inflection", "lateral"];

function sources(folder: string): string[] {
  return readdirSync(folder).flatMap((name) => {
    const path = join(folder, name);
    if (statSync(path).isDirectory()) return sources(path);
    return path.endsWith(".ts") ? [path] : [];
  });
}

function imports(file: string): string[] {
  const { module } = parseSync(file, readFileSync(file, "utf8"));
  const named = [...module.staticImports.map((item) => item.moduleRequest.value)];
  for (const item of module.staticExports)
    for (const entry of item.entries) if (entry.moduleRequest) named.push(entry.moduleRequest.value);
  const text = readFileSync(file, "utf8");
  for (const item of module.dynamicImports)
    named.push(text.slice(item.moduleRequest.start, item.moduleRequest.end).replace(/^["'`]|["'`]$/g, ""));
  return named;
}

const local = (file: string): string[] =>
  imports(file)
    .filter((path) => path.startsWith("."))
    .map((path) => resolve(dirname(file), path));

function room(file: string): string {
  const [first = "", second] = relative(join(top, "lib"), file).split("/");
  return second === undefined ? first.replace(/\.ts$/, "") : first;
}

const library = sources(join(top, "lib"));

describe("rooms of lib/", () => {
  test("every room has a row in the table", () => {
    expect([...new Set(library.map(room))].filter((name) => !(name in table))).toEqual([]);
  });

  test.each(library.map((file) => [relative(top, file), file]))(
    "%s imports only what its row allows",
    (_, file) => {
      const own = room(file);
      const wrong = local(file)
        .filter((target) => room(target) !== own && !(table[own] ?? []).includes(room(target)))
        .map((target) => relative(top, target));
      expect(wrong).toEqual([]);
    },
  );

  test.each(library.map((file) => [relative(top, file), file]))(
    "%s uses another room by its index or types",
    (_, file) => {
      const deep = local(file)
        .filter((target) => room(target) !== room(file) && !/\/(index|types|record|host)\.ts$/.test(target))
        .map((target) => relative(top, target));
      expect(deep).toEqual([]);
    },
  );

  test("lib/ knows nothing of files, processes or kernels", () => {
    const wrong = library.flatMap((file) =>
      imports(file)
        .filter((path) => path.startsWith("node:") || path.includes("kernel/"))
        .map((path) => `${relative(top, file)} imports ${path}`),
    );
    expect(wrong).toEqual([]);
  });
});

describe("the hand side is independent of the computer side", () => {
  function reached(start: readonly string[]): Set<string> {
    const seen = new Set(start);
    for (const file of seen) for (const target of local(file)) seen.add(target);
    return seen;
  }
  test.each(handSide)("%s never reaches exact", (name) => {
    const start = library.filter((file) => room(file) === name);
    expect(
      [...reached(start)].filter((file) => room(file) === "exact").map((file) => relative(top, file)),
    ).toEqual([]);
  });
  test("the reachability test itself finds a path that is there", () => {
    const start = library.filter((file) => room(file) === "statics");
    if (start.length === 0) return;
    expect([...reached(start)].some((file) => room(file) === "structure")).toBe(true);
  });
});
