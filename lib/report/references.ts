// Links between lines: how an entry is named, what it stands on, what stands on it.

import type { Entry } from "../sheet/index.ts";
import { type Book, type Ground, type Item, lineAnchor, whyAnchor } from "./book.ts";
import { type Html, h, joined, type Part } from "./html.ts";
import { maths } from "./maths.ts";

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
  /** Lines named by number only, gathered behind the word "lines". */
  readonly bare: boolean;
}

function reference(item: Item, after: Part = ""): Reference {
  const bare = texOf(item.entry) === undefined && /^\d+$/.test(item.label);
  const text = bare ? h`${item.label}` : nameOf(item);
  const place = placeName(item);
  return {
    bare,
    link: h`<a class="ref" href="#${lineAnchor(item.entry.id)}" title="${place}">${text}</a>${after}`,
  };
}

/** References with commas between; symbols first, then the lines that have none. */
function listed(references: readonly Reference[]): Part {
  const named = references.filter((r) => !r.bare).map((r): Part => r.link);
  const lines = references.filter((r) => r.bare).map((r): Part => r.link);
  const word = lines.length === 1 ? "line " : "lines ";
  return joined(lines.length === 0 ? named : [...named, [word, joined(lines, ", ")]], ", ");
}

const CHANGED = h` <span class="stale">(changed since)</span>`;

const groundReference = (book: Book, ground: Ground): Reference => {
  const item = book.item(ground.id);
  if (item) return reference(item, ground.state === "changed" ? CHANGED : "");
  return { bare: false, link: h`<span class="gone">${ground.id} (no longer on the sheet)</span>` };
};

/** Links to everything an entry stands on. */
export const groundLinks = (book: Book, grounds: readonly Ground[]): Part =>
  grounds.length === 0
    ? h`<span class="none">nothing else on this sheet</span>`
    : listed(grounds.map((g) => groundReference(book, g)));

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
const MOST = 9;

function used(book: Book, item: Item): Part {
  const shown = item.by.length > MOST ? item.by.slice(0, MOST - 2) : item.by;
  const rest = item.by.length - shown.length;
  const more = rest === 0 ? "" : h` and <a class="ref" href="#${whyAnchor(item.entry.id)}">${rest} more</a>`;
  return h`<p><span class="tag">used by</span> ${itemLinks(book, shown)}${more}</p>`;
}

/** The right-hand margin of a line. */
export function margin(book: Book, item: Item): Html {
  const stands =
    item.on.length > 0 ? h`<p><span class="tag">stands on</span> ${groundLinks(book, item.on)}</p>` : "";
  return h`<div class="margin">${stands}${item.by.length > 0 ? used(book, item) : ""}</div>`;
}
