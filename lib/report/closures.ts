// Equations of equilibrium the tool left over and added up: one line each, and one line on the cover for all.

import { type ClosureItem, isClosure } from "./arrange.ts";
import { type Book, lineAnchor } from "./book.ts";
import { type Html, h, type Part } from "./html.ts";
import { verdict } from "./lines.ts";
import { rightSide, wrapping } from "./maths.ts";
import { itemLinks, margin, numberLink } from "./references.ts";

/** What the descriptions of a group say in common, and what is each one's own: parts between colons and commas. */
export function commonWords(descriptions: readonly string[]): {
  readonly common: readonly string[];
  readonly own: readonly string[];
} {
  const parts = descriptions.map((text) => text.split(/: |, /));
  const first = parts[0] ?? [];
  if (parts.length < 2) return { common: [], own: descriptions };
  const common = first.filter((part) => parts.every((list) => list.includes(part)));
  return { common, own: parts.map((list) => list.filter((part) => !common.includes(part)).join(", ")) };
}

const held = (items: readonly ClosureItem[]): number => items.filter(({ entry }) => entry.passed).length;

function closure(book: Book, item: ClosureItem, own: string): Html {
  const { entry, label } = item;
  const anchor = lineAnchor(entry.id);
  const sum = numberLink(entry.id, wrapping(rightSide(entry.lines.result)), entry.formula);
  const failure = entry.passed ? "" : h` ${verdict(entry)}`;
  // "ΣFx" is what the formula begins with.
  const words = own === "" || own.startsWith("Σ") ? "" : h` <p class="own">${own}</p>`;
  const stale = entry.outOfDate ? h`<span class="stale">OUT OF DATE</span> ` : "";
  return h`<div class="line check closure${entry.outOfDate ? " outdated" : ""}" id="${anchor}">
<div class="number"><a class="no" href="#${anchor}" aria-label="line ${label}">${label}</a></div>
<div class="matter"><p class="sum">${stale}${wrapping(entry.lines.symbols)} ${sum}${failure}</p>${words}</div>
${margin(book, item)}
</div>
`;
}

/** A group of equations left over, each with its sum; those that fail say so. */
export function closures(book: Book, items: readonly ClosureItem[]): Html {
  const { common, own } = commonWords(items.map(({ entry }) => entry.description));
  const of = common.length === 0 ? "" : `, ${common.join(", ")}`;
  const all = items.length === held(items);
  const verdictOfAll = `${held(items)} of ${items.length} close`;
  return h`<section class="closures"><p class="heading">Equilibrium${of}: ${all ? verdictOfAll : h`<strong class="fails">${verdictOfAll}</strong>`}</p>
${items.map((item, i) => closure(book, item, own[i] ?? ""))}</section>
`;
}

/** The one line of the cover on all equations left over; empty where there are none. */
export function closuresOnCover(book: Book): Part {
  const items = book.items.filter(isClosure);
  if (items.length === 0) return "";
  const lines = itemLinks(
    book,
    items.map(({ entry }) => entry.id),
  );
  const words = h`equilibrium: ${held(items)} of ${items.length} equations left over close (${lines})`;
  return h`<li class="closing"><p class="wide">${held(items) === items.length ? words : h`<strong>${words}</strong>`}</p></li>`;
}
