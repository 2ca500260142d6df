// Which cell a text is, for front ends that do not say. A cell that is run again after a change must take the place of
// its earlier run, or the sheet would hold both. A text is taken for an earlier cell's when it is the same, or when it
// makes something of the same name and most of it is the same: two cells that look alike but make other names are two.
import { createHash } from "node:crypto";
import { distance } from "fastest-levenshtein";
import { declaredNames, parse, walk } from "../syntax.ts";

interface Known {
  readonly text: string;
  readonly names: ReadonlySet<string>;
}

/** Share of a text that may have been changed. */
const MOST_CHANGED = 0.5;

/** The names a cell makes: those it declares, and the symbols it gives the sheet, as in sheet.given("L", …) and
 *  sheet.calc("M = …"). */
export function namesMade(code: string): Set<string> {
  const { program } = parse(code);
  const names = declaredNames(program);
  walk(program, (node) => {
    if (node.type !== "CallExpression" || node.callee.type !== "MemberExpression") return true;
    const [first] = node.arguments;
    if (first?.type !== "Literal" || typeof first.value !== "string") return true;
    const symbol = /^\s*([^\s=<>]+)\s*(?:=|$)/.exec(first.value)?.[1];
    if (symbol !== undefined) names.add(`symbol ${symbol}`);
    return true;
  });
  return names;
}

function isEdited(before: Known, after: Known): boolean {
  if (![...after.names].some((name) => before.names.has(name))) return false;
  const longest = Math.max(before.text.length, after.text.length);
  return distance(before.text, after.text) <= MOST_CHANGED * longest;
}

export class CellIdentities {
  readonly #known = new Map<string, Known>();

  /** The id of a cell about to run. `given` is the front end's own id, which is always believed. */
  identify(text: string, given?: string): string {
    if (given !== undefined) return given;
    for (const [id, known] of this.#known) if (known.text === text) return id;
    const now: Known = { text, names: namesMade(text) };
    const before = [...this.#known]
      .filter(([, known]) => isEdited(known, now))
      .sort(([, a], [, b]) => distance(a.text, text) - distance(b.text, text))[0];
    const id = before?.[0] ?? `text-${createHash("sha256").update(text).digest("hex").slice(0, 16)}`;
    this.#known.set(id, now);
    return id;
  }
}
