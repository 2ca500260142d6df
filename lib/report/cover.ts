// The first page: what is calculated, by whom, how far it may be relied on, and what came out.

import type { CheckEntry, Head, QueryEntry } from "../sheet/index.ts";
import { isClosure } from "./arrange.ts";
import { bandLine, bandsOnCover } from "./bands.ts";
import { type Book, type Item, lineAnchor } from "./book.ts";
import { CAUTIONS, NOT_CONSIDERED, statusWords } from "./cautions.ts";
import { closuresOnCover } from "./closures.ts";
import { type Html, h, joined, type Part, raw } from "./html.ts";
import { setFromOutside, verdict } from "./lines.ts";
import { maths, wrapping } from "./maths.ts";
import { promptsLeft, promptWords } from "./prompts.ts";
import { numberLink } from "./references.ts";
import { unbroken } from "./words.ts";

type Of<E> = Item & { readonly entry: E };

const ofKind = <K extends Item["entry"]["kind"]>(
  book: Book,
  kind: K,
): Of<Extract<Item["entry"], { kind: K }>>[] =>
  book.items.filter((item): item is Of<Extract<Item["entry"], { kind: K }>> => item.entry.kind === kind);

const person = (by: string | undefined, on: string | undefined): Part =>
  by === undefined ? h`<span class="blank"></span>` : [by, on === undefined ? "" : h`<br>${on}`];

function titleBlock(head: Head): Html {
  const cells: readonly (readonly [string, Part])[] = [
    ["Job", head.job],
    ["Revision", head.revision ?? "none"],
    ["Units", head.units],
    ["Basis", head.basis],
    ["Prepared", person(head.preparedBy, head.date)],
    ["Checked", person(head.checkedBy, head.checkedOn)],
    ["Approved", person(head.approvedBy, head.approvedOn)],
  ];
  return h`<dl class="title-block">${cells.map(([name, value]) => h`<div><dt>${name}</dt><dd>${value}</dd></div>`)}</dl>`;
}

/** Why the run stopped, on the cover of an incomplete package. */
export function stopped(book: Book): Part {
  const { complete, failure } = book.record;
  if (complete) return "";
  const where = failure
    ? h`<p>The run stopped in cell ${failure.cell}${failure.line === undefined ? "" : `, line ${failure.line}`}.</p>
<p class="message">${failure.message}</p>
<pre tabindex="0">${failure.excerpt}</pre>`
    : h`<p>The run did not reach its end.</p>`;
  return h`<section class="stopped" aria-labelledby="stopped"><h2 id="stopped">INCOMPLETE</h2>
${where}<p>What follows was worked out before that. It is not a result and must not be used as one.</p></section>
`;
}

function governing(book: Book): Html {
  const rows = ofKind(book, "result").filter((i) => i.entry.governing);
  if (rows.length === 0) return h`<p class="none">No result is named as governing.</p>`;
  return h`<ul class="ledger">${rows.map(
    ({
      entry,
      label,
    }) => h`<li><a class="no" href="#${lineAnchor(entry.id)}" aria-label="line ${label}">${label}</a>
<p class="value">${maths(entry.tex)} = ${numberLink(entry.id, entry.value.text)}</p><p>${unbroken(entry.description)}</p>${entry.band === undefined ? "" : bandLine(entry.band)}</li>`,
  )}</ul>${bandsOnCover(
    book,
    rows.flatMap(({ entry }) => entry.band ?? []),
  )}`;
}

/** The engineer's own checks and every check that fails, each by itself; then one line on the equations that close. */
function checks(book: Book): Html {
  const items = ofKind(book, "check");
  if (items.length === 0) return h`<p class="none">No check is made in this calculation.</p>`;
  const listed = items.filter((item) => !isClosure(item) || !item.entry.passed);
  return h`<ul class="ledger">${listed.map(checkLine)}${closuresOnCover(book)}</ul>`;
}

const checkLine = ({ entry, label }: Of<CheckEntry>): Html => {
  // A formula may be long: it has the width to itself, and the verdict stands beneath.
  const formula = entry.description === "";
  const what = formula ? wrapping(entry.lines.symbols) : h`${unbroken(entry.description)}`;
  return h`<li${formula ? raw(' class="stacked"') : ""}><a class="no" href="#${lineAnchor(entry.id)}" aria-label="line ${label}">${label}</a>
<p>${what}</p><p>${verdict(entry)}</p></li>`;
};

function queries(items: readonly Of<QueryEntry>[]): Html {
  if (items.length === 0) return h`<p class="none">None.</p>`;
  return h`<ul class="ledger">${items.map(
    ({ entry, label }) =>
      h`<li><a class="no" href="#${lineAnchor(entry.id)}" aria-label="line ${label}">${label}</a><p class="wide">${entry.text}</p></li>`,
  )}</ul>`;
}

function outside(book: Book): Part {
  const entries = [...ofKind(book, "given"), ...ofKind(book, "assumption")].filter((g) => g.entry.overridden);
  const shown = new Set(entries.map((g) => g.entry.symbol));
  const others = book.record.overrides.filter((o) => !shown.has(o.symbol));
  if (entries.length === 0 && others.length === 0) return "";
  return h`<section><h3>Set from outside</h3>${entries.map((g) => setFromOutside(g.entry))}${others.map(
    (o) => h`<p class="outside">set from outside: ${o.symbol} = ${o.set}, notebook says ${o.written}</p>`,
  )}</section>`;
}

function outdated(book: Book): Part {
  const items = book.items.filter((i) => i.entry.outOfDate);
  if (items.length === 0) return "";
  const links = items.map(
    (i) => h` <a class="no" href="#${lineAnchor(i.entry.id)}">${i.label || "text"}</a>`,
  );
  return h`<p class="stale">OUT OF DATE: ${items.length} of ${book.items.length} entries were worked out before something they stand on was changed:${links}</p>`;
}

/** What a template asked for and nobody has written yet, each cell leading to its first line. */
function prompts(book: Book): Part {
  const left = promptsLeft(book.record);
  if (left.count === 0) return "";
  const first = (cell: number): string | undefined => book.items.find((i) => i.entry.cell === cell)?.entry.id;
  const links = left.cells.map((cell): Part => {
    const id = first(cell);
    return id === undefined ? `${cell}` : h`<a class="ref" href="#${lineAnchor(id)}">${cell}</a>`;
  });
  const where =
    links.length === 0 ? "" : [left.cells.length === 1 ? ": cell " : ": cells ", joined(links, ", ")];
  return h`<p class="stale">NOT FILLED IN: ${promptWords(left)}${where}</p>
`;
}

/** The cover. */
export function cover(book: Book): Html {
  const { head, notConsidered = [] } = book.record;
  const failing = ofKind(book, "check").filter((c) => !c.entry.passed).length;
  const count = failing === 0 ? "" : h` <strong class="fails">(${failing} DO NOT HOLD)</strong>`;
  return h`<header class="cover">
<p class="kind">Calculation</p>
<h1>${head.title}</h1>
<p class="status">${statusWords(head.status)}</p>
${titleBlock(head)}
</header>
${stopped(book)}<section class="summary" aria-labelledby="outcome"><h2 id="outcome">Outcome</h2>
${prompts(book)}${outdated(book)}
<section><h3>Governing results</h3>${governing(book)}</section>
<section><h3>Checks${count}</h3>${checks(book)}</section>
<section><h3>Open queries</h3>${queries(ofKind(book, "query"))}</section>
${outside(book)}
<section><h3>Not considered</h3><ul class="plain">${[...notConsidered, ...NOT_CONSIDERED].map((t) => h`<li>${t}</li>`)}</ul></section>
<section class="cautions"><h3>Read with care</h3><ul class="plain">${CAUTIONS.map((t) => h`<li>${t}</li>`)}</ul></section>
</section>
`;
}
