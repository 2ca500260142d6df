// What a cell is about, in a few words, for the lines the runner prints.
import type { Node } from "oxc-parser";
import type { NotebookCell } from "./notebook.ts";
import { parse, walk } from "./syntax.ts";

const LONGEST = 70;

function shortened(text: string): string {
  const line = text.replace(/\s+/g, " ").trim();
  return line.length > LONGEST ? `${line.slice(0, LONGEST - 1)}…` : line;
}

/** The last heading of a text cell, without its marks. */
export function headingOf(markdown: string): string | undefined {
  const headings = [...markdown.matchAll(/^#{1,6}\s+(.+?)\s*#*$/gm)];
  const text = headings.at(-1)?.[1];
  return text === undefined ? undefined : shortened(text.replace(/\\([^A-Za-z0-9\s])|[*_`]/g, "$1"));
}

/** A call as it is named in a line: `sheet.calc "M = q*L^2/8"`, with its first text if that comes first. */
function callWords(node: Node): string | undefined {
  if (node.type !== "CallExpression") return undefined;
  const { callee } = node;
  const [first] = node.arguments;
  const text =
    first?.type === "Literal" && typeof first.value === "string" ? ` ${JSON.stringify(first.value)}` : "";
  if (callee.type === "Identifier") return callee.name + text;
  if (callee.type !== "MemberExpression" || callee.property.type !== "Identifier") return undefined;
  return callee.object.type === "Identifier"
    ? `${callee.object.name}.${callee.property.name}${text}`
    : undefined;
}

/** The calls of a cell, in order, each once. */
function calls(source: string): string[] {
  const names = new Set<string>();
  walk(parse(source).program, (node) => {
    const name = callWords(node);
    if (name !== undefined) names.add(name);
    return true;
  });
  return [...names];
}

function firstComment(source: string): string | undefined {
  const [comment] = parse(source).comments;
  const leads = comment && source.slice(0, comment.start).trim() === "";
  const text = comment?.value
    .replace(/^\s*\*+/gm, "")
    .trim()
    .split("\n")[0];
  return leads && text !== undefined && text !== "" ? shortened(text) : undefined;
}

/** A few words for each code cell: the heading right above it, else its first comment, else what it calls. */
export function outline(cells: readonly NotebookCell[]): Map<string, string> {
  const words = new Map<string, string>();
  let heading: string | undefined;
  for (const { id, kind, source } of cells) {
    if (kind === "markdown") heading = headingOf(source) ?? heading;
    if (kind !== "code") continue;
    const own = heading ?? firstComment(source) ?? shortened(calls(source).slice(0, 3).join(", "));
    words.set(id, own === "" ? shortened(source.trim().split("\n")[0] ?? "") : own);
    heading = undefined;
  }
  return words;
}
