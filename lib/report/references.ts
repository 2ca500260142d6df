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

/** A link to an entry's line, named by its symbol or place. */
export const lineLink = (item: Item): Html =>
  h`<a class="ref" href="#${lineAnchor(item.entry.id)}" title="${placeName(item)}">${nameOf(item)}</a>`;

function groundLink(book: Book, ground: Ground): Part {
  const item = book.item(ground.id);
  if (!item) return h`<span class="gone">${ground.id} (no longer on the sheet)</span>`;
  const changed = ground.state === "changed" ? h` <span class="stale">(changed since)</span>` : undefined;
  return h`${lineLink(item)}${changed}`;
}

/** Links to everything named, with commas between; a dash where there is nothing. */
export const groundLinks = (book: Book, grounds: readonly Ground[]): Part =>
  grounds.length === 0
    ? h`<span class="none">nothing else on this sheet</span>`
    : joined(
        grounds.map((g) => groundLink(book, g)),
        ", ",
      );

export const itemLinks = (book: Book, ids: readonly string[]): Part =>
  joined(
    ids.flatMap((id) => {
      const item = book.item(id);
      return item ? [lineLink(item)] : [];
    }),
    ", ",
  );

/** A number that leads to what it stands on: a link that works without a script. `spoken` reads it out where it is
 *  set as maths. */
export function numberLink(id: string, shown: Part, spoken?: string): Html {
  const label = spoken === undefined ? "" : h` aria-label="${spoken}, what it stands on"`;
  return h`<a class="num" href="#${whyAnchor(id)}"${label}>${shown}</a>`;
}

/** A number of a table, leading to the row of its group of cells. */
export const cellLink = (id: string, group: number, shown: Part): Html =>
  h`<a class="num" href="#${whyAnchor(id, group)}">${shown}</a>`;

/** The right-hand margin of a line. */
export function margin(book: Book, item: Item): Html {
  const stands =
    item.on.length > 0 ? h`<p><span class="tag">stands on</span> ${groundLinks(book, item.on)}</p>` : "";
  const bears =
    item.by.length > 0 ? h`<p><span class="tag">used by</span> ${itemLinks(book, item.by)}</p>` : "";
  return h`<div class="margin">${stands}${bears}</div>`;
}
