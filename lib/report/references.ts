// Links between lines: how an entry is named, what it stands on, what stands on it.

import type { Entry } from "../sheet/index.ts";
import { type Book, type Ground, type Item, lineAnchor, whyAnchor } from "./book.ts";
import { type Html, h, joined, type Part } from "./html.ts";
import { maths } from "./maths.ts";
import { runsOf } from "./runs.ts";

/** Where an entry is, in words: "line 12", "given G3", "assumption A2", "the text of cell 4". */
export function placeName(item: Item): string {
  if (item.entry.kind === "given") return `given ${item.label}`;
  if (item.entry.kind === "assumption") return `assumption ${item.label}`;
  return item.label === "" ? `the text of cell ${item.entry.cell}` : `line ${item.label}`;
}

const texOf = (entry: Entry): string | undefined => ("tex" in entry ? entry.tex : undefined);

/** An entry's name: its symbol where it has one, otherwise its place. */
export function nameOf(item: Item): Html {
  const tex = texOf(item.entry);
  return tex === undefined ? h`${placeName(item)}` : maths(tex);
}

interface Reference {
  readonly link: Html;
  readonly id: string;
  /** Number of a line that has no symbol: gathered with others behind the word "lines". */
  readonly line?: number;
}

/** References as they are made: an item is named in many places of its page. */
const made = new WeakMap<Item, Reference>();

function reference(item: Item): Reference {
  const found = made.get(item) ?? referenceTo(item);
  made.set(item, found);
  return found;
}

function referenceTo(item: Item): Reference {
  const { id } = item.entry;
  const tex = texOf(item.entry);
  const line = tex === undefined && /^\d+$/.test(item.label) ? { line: Number(item.label) } : {};
  const short = tex !== undefined ? maths(tex) : item.label === "" ? placeName(item) : item.label;
  return {
    id,
    ...line,
    link: h`<a class="ref" href="#${lineAnchor(id)}" title="${placeName(item)}">${short}</a>`,
  };
}

/** Lines by number, runs by their ends; a run carries the anchors of all its lines, for the page's script. */
function lineList(references: readonly Reference[]): readonly Html[] {
  const at = new Map(references.map((r) => [r.line ?? 0, r]));
  return runsOf([...at.keys()]).map((run) => {
    const [first, last] = [at.get(run[0] ?? 0), at.get(run.at(-1) ?? 0)];
    if (run.length === 1) return h`${first?.link}`;
    const anchors = run.map((n) => lineAnchor(at.get(n)?.id ?? "")).join(" ");
    return h`<span class="run" data-lines="${anchors}">${first?.link} to ${last?.link}</span>`;
  });
}

/** References with commas between, symbols first, then the lines that have none; `most` limits how many are named. */
function listed(references: readonly Reference[], most = Number.POSITIVE_INFINITY, more: Part = ""): Part {
  const named = references.filter((r) => r.line === undefined);
  const lines = references.filter((r) => r.line !== undefined);
  const shown = named.slice(0, most).map((r): Part => r.link);
  const runs = lineList(lines);
  const kept = runs.slice(0, Math.max(0, most - shown.length));
  const word = lines.length === 1 ? "line " : "lines ";
  const list = joined(kept.length === 0 ? shown : [...shown, [word, joined(kept, ", ")]], ", ");
  return shown.length + kept.length < named.length + runs.length ? [list, more] : list;
}

const CHANGED = h` <span class="stale">(changed since)</span>`;

const groundReference = (book: Book, ground: Ground): Reference => {
  const item = book.item(ground.id);
  if (item) {
    const found = reference(item);
    return ground.state === "changed" ? { ...found, link: h`${found.link}${CHANGED}` } : found;
  }
  return { id: ground.id, link: h`<span class="gone">${ground.id} (no longer on the sheet)</span>` };
};

/** Links to everything an entry stands on. What has changed since is always named by itself. */
export function groundLinks(book: Book, grounds: readonly Ground[]): Part {
  if (grounds.length === 0) return h`<span class="none">nothing else on this sheet</span>`;
  const references = grounds.map((g) => {
    const { line, ...alone } = groundReference(book, g);
    return g.state === "current" && line !== undefined ? { ...alone, line } : alone;
  });
  return listed(references);
}

const itemReferences = (book: Book, ids: readonly string[]): Reference[] =>
  ids.flatMap((id) => {
    const item = book.item(id);
    return item ? [reference(item)] : [];
  });

/** Links to entries by id. */
export const itemLinks = (book: Book, ids: readonly string[]): Part => listed(itemReferences(book, ids));

/** A number that leads to what it stands on: a link that works without a script. `spoken` is read out in place of
 *  what is set as maths. */
export function numberLink(id: string, shown: Part, spoken?: string): Html {
  const inside =
    spoken === undefined
      ? h`${shown}`
      : h`<span class="spoken">${spoken}</span><span aria-hidden="true">${shown}</span>`;
  return h`<a class="num" href="#${whyAnchor(id)}">${inside}</a>`;
}

/** A number of a table, leading to the row of its group of cells. */
export const cellLink = (id: string, group: number, shown: Part): Html =>
  h`<a class="num" href="#${whyAnchor(id, group)}">${shown}</a>`;

/** More than this many in the margin are named in the list of what stands on what. */
const MOST = 5;

function used(book: Book, item: Item): Part {
  const more = h` and <a class="ref" href="#${whyAnchor(item.entry.id)}">more</a>`;
  return h`<p><span class="tag">used by</span> ${listed(itemReferences(book, item.by), MOST, more)}</p>`;
}

/** The right-hand margin of a line. */
export function margin(book: Book, item: Item): Html {
  const stands =
    item.on.length > 0 ? h`<p><span class="tag">stands on</span> ${groundLinks(book, item.on)}</p>` : "";
  return h`<div class="margin">${stands}${item.by.length > 0 ? used(book, item) : ""}</div>`;
}
