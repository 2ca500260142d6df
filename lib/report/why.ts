// What stands on what: one row for every value, the place a number leads to when it is clicked.

import type { Entry } from "../sheet/index.ts";
import { type Book, type Item, lineAnchor, whyAnchor } from "./book.ts";
import { type Html, h, joined, type Part } from "./html.ts";
import { maths } from "./maths.ts";
import { groundLinks, itemLinks, nameOf } from "./references.ts";
import { cellGroups } from "./tables.ts";

function shown(entry: Entry): Part {
  if (entry.kind === "step") return h`: ${maths(entry.lines.result)}`;
  if (entry.kind === "check")
    return entry.description === "" ? h`: ${entry.formula}` : h`: ${entry.description}`;
  if (entry.kind === "finding") return h`: ${entry.title}`;
  if (entry.kind === "table" || entry.kind === "figure") return h`: ${entry.caption}`;
  if ("value" in entry && entry.value !== undefined) return h` = ${entry.value.text}`;
  if ("text" in entry) return h`: ${entry.text}`;
  return "";
}

function row(book: Book, item: Item): Html {
  const { entry, label, by, roots } = item;
  const finally_ =
    roots.length > 0 && !item.on.every(({ id }) => roots.includes(id))
      ? h`<p class="roots"><span class="tag">rests in the end on</span> ${itemLinks(book, roots)}</p>`
      : "";
  const bears =
    by.length > 0
      ? h`<p class="by"><span class="tag">what stands on it</span> ${itemLinks(book, by)}</p>`
      : "";
  const origin =
    item.on.length === 0 && (entry.kind === "given" || entry.kind === "assumption")
      ? h`<span class="none">${originOf(entry)}</span>`
      : groundLinks(book, item.on);
  return h`<li id="${whyAnchor(entry.id)}">
<a class="no" href="#${lineAnchor(entry.id)}" aria-label="line ${label}">${label}</a>
<p class="what">${nameOf(item)}${shown(entry)}</p>
<p class="on"><span class="tag">stands on</span> ${origin}</p>
${finally_}${bears}
</li>
${entry.kind === "table" ? cellRows(book, entry, label) : ""}`;
}

const originOf = (entry: Extract<Entry, { kind: "given" | "assumption" }>): string =>
  entry.kind === "given" ? `given: ${entry.source ?? "no source stated"}` : `assumed: ${entry.because}`;

function cellRows(book: Book, entry: Extract<Entry, { kind: "table" }>, label: string): Part {
  return cellGroups(entry).map(
    (group, i) => h`<li id="${whyAnchor(entry.id, i)}">
<a class="no" href="#${lineAnchor(entry.id)}" aria-label="line ${label}">${label}</a>
<p class="what">${joined(group.texts, " · ")}</p>
<p class="on"><span class="tag">stands on</span> ${groundLinks(book, group.uses.map(book.ground))}</p>
</li>
`,
  );
}

/** The list of every entry but plain text, each with what it stands on and what stands on it. */
export const why = (book: Book): Html =>
  h`<ol class="why">
${book.items.filter((item) => item.label !== "").map((item) => row(book, item))}</ol>`;

/** More rows than this are folded on the screen and left out in print, where they would take more pages than the calculation. */
const MOST = 200;

/** The list as it stands on the page: whole, or folded where it is long. A number clicked shows its row all the same. */
export function whyFolded(book: Book): Html {
  const count = book.items.filter((item) => item.label !== "").length;
  if (count <= MOST) return why(book);
  return h`<details><summary>All ${count} lines, each with what it stands on and what stands on it</summary>
${why(book)}</details>
<p class="on-paper">The list of what stands on what has ${count} lines and is not printed: beside every line of the calculation stands what it stands on. In this file opened on a screen, any number shows it when clicked.</p>
`;
}
