// What an issue says of itself: why it was issued, what changed since the one before, and what each assumption moves.

import {
  bandInShort,
  type Changes,
  condensed,
  type Movement,
  type ValueChange,
  wordDifference,
} from "../sheet/index.ts";
import { type Book, lineAnchor } from "./book.ts";
import { type Html, h, type Part } from "./html.ts";
import { itemLinks, nameOf } from "./references.ts";
import { unbroken } from "./words.ts";

/** A change in percent with its sign: "+4.3 %"; empty where there is none. */
export function percentText(percent: number | undefined): string {
  if (percent === undefined) return "";
  const size = Math.abs(percent).toFixed(Math.abs(percent) >= 100 ? 0 : 1);
  return `${percent > 0 ? "+" : "−"}${size}\u00a0%`;
}

interface Column {
  readonly heading: string;
  readonly figures?: boolean;
}

function table(caption: string, columns: readonly Column[], rows: readonly (readonly Part[])[]): Part {
  if (rows.length === 0) return "";
  const cell = (part: Part, i: number): Html =>
    columns[i]?.figures === true
      ? h`<td class="figures">${part}</td>`
      : i === 0 && part !== ""
        ? h`<th scope="row">${part}</th>`
        : h`<td>${part}</td>`;
  return h`<div class="scroll" tabindex="0" role="region" aria-label="${caption}"><table>
<caption>${caption}</caption>
<thead><tr>${columns.map(({ heading }) => h`<th scope="col">${heading}</th>`)}</tr></thead>
<tbody>
${rows.map((row) => h`<tr>${row.map(cell)}</tr>\n`)}</tbody>
</table></div>
`;
}

/** A line by its number and name, a link where it is still on the sheet. */
function lineName(book: Book, id: string, name: string): Part {
  const item = book.item(id);
  if (item === undefined || item.label === "") return unbroken(name);
  const named = "symbol" in item.entry && item.entry.symbol !== undefined ? nameOf(item) : unbroken(name);
  return h`<a class="no" href="#${lineAnchor(id)}" aria-label="line ${item.label}">${item.label}</a> ${named}`;
}

const valueCells = ({ before, after, percent }: ValueChange): readonly Part[] => [
  before,
  after,
  percentText(percent),
];
const either = (text: string): string => (text === "" ? "nothing stated" : unbroken(text));
const VALUES: readonly Column[] = [
  { heading: "before", figures: true },
  { heading: "now", figures: true },
  { heading: "change", figures: true },
];

function grounds(book: Book, changes: Changes): Part {
  const rows = changes.grounds.flatMap(({ id, name, value, source, words, standing }) => {
    const [first, on] = [lineName(book, id, name), itemLinks(book, standing)];
    return [
      ...(value ? [[first, ...valueCells(value), on]] : []),
      ...(source ? [[first, either(source.before), either(source.after), "", on]] : []),
      ...(words ? [[first, either(words.before), either(words.after), "", on]] : []),
    ];
  });
  const columns = [
    { heading: "given or assumption" },
    { heading: "before" },
    { heading: "now" },
    { heading: "change", figures: true },
    { heading: "lines that stand on it" },
  ];
  return table("Givens and assumptions changed", columns, rows);
}

function changed(book: Book, changes: Changes): readonly Part[] {
  const { single, groups } = condensed(changes, book.record.entries, percentText);
  const plain = (list: Changes["added"]): readonly (readonly Part[])[] =>
    list.map(({ id, name, kind }) => [lineName(book, id, name), kind]);
  return [
    table(
      "Head changed",
      [{ heading: "field" }, { heading: "before" }, { heading: "now" }],
      changes.head.map(({ field, before, after }) => [field, before, after]),
    ),
    grounds(book, changes),
    table(
      "Checks changed",
      [{ heading: "check" }, { heading: "before" }, { heading: "now" }],
      changes.checks.map(({ id, name, before, after, turned }) => [
        lineName(book, id, name),
        before,
        turned ? h`<strong>${after}</strong>` : after,
      ]),
    ),
    table("Queries raised", [{ heading: "query" }, { heading: "" }], plain(changes.raised)),
    table("Queries settled", [{ heading: "query" }, { heading: "" }], plain(changes.settled)),
    table(
      "Results changed",
      [{ heading: "line" }, ...VALUES],
      single.map(({ id, name, value }) => [lineName(book, id, name), ...valueCells(value)]),
    ),
    table(
      "Numbers of tables and equations changed",
      [{ heading: "line" }, { heading: "how many" }, { heading: "by how much" }],
      groups.map(({ id, name, changed: many, of, most }) => [
        id === undefined ? name : lineName(book, id, name),
        `${many} of ${of}`,
        unbroken(most),
      ]),
    ),
    table(
      "Bands changed: where 90 % lie (least to greatest)",
      [{ heading: "line" }, { heading: "before" }, { heading: "now" }],
      (changes.bands ?? []).map(({ id, name, before, after }) => [
        lineName(book, id, name),
        unbroken(bandInShort(before)),
        unbroken(bandInShort(after)),
      ]),
    ),
    table(
      "Words changed",
      [{ heading: "line" }, { heading: "before" }, { heading: "now" }],
      changes.words.flatMap((one) => {
        const found = wordDifference(one);
        const more = found === undefined || found.more === 0 ? "" : ` and ${found.more} more`;
        return found === undefined
          ? []
          : [[lineName(book, one.id, one.name), found.before, `${found.after}${more}`]];
      }),
    ),
    table("Lines added", [{ heading: "line" }, { heading: "kind" }], plain(changes.added)),
    table("Lines removed", [{ heading: "line" }, { heading: "kind" }], plain(changes.removed)),
  ];
}

const isEmpty = (changes: Changes): boolean =>
  Object.values(changes).every((list: readonly unknown[]) => list.length === 0);

function failedChecks({ record }: Book): Part {
  const failed = record.entries.filter((entry) => entry.kind === "check" && !entry.passed).length;
  if (failed === 0) return "";
  const many = failed === 1 ? "one check that does" : `${failed} checks that do`;
  return h`<p><strong class="fails">ISSUED WITH ${many} NOT HOLD</strong></p>\n`;
}

/** Why it was issued and what changed since; empty for a record that is no issue. */
export function issueSection(book: Book): Part {
  const { issue, since } = book.record;
  if (issue === undefined) return "";
  const compared =
    since === undefined
      ? h`<p>First issue: there is none before it to compare with.</p>\n`
      : isEmpty(since.changes)
        ? h`<p>Nothing changed since revision ${since.revision}.</p>\n`
        : [
            h`<p>What changed since revision ${since.revision}; what is not listed is the same.</p>\n`,
            changed(book, since.changes),
          ];
  return h`<section class="part issue" aria-labelledby="issue"><h2 id="issue">Revision ${issue.revision}</h2>
<p class="says">${unbroken(issue.why)}</p>
${failedChecks(book)}${compared}</section>
`;
}

function movementRows(
  book: Book,
  { assumption, change, set, results, failed }: Movement,
): readonly (readonly Part[])[] {
  const name = [lineName(book, assumption, wordsOf(book, assumption)), h`<br>${change}, to ${set.text}`];
  if (failed !== undefined) return [[name, h`no answer: ${failed}`, "", ""]];
  if (results.length === 0) return [[name, "moves no result", "", ""]];
  return results.map(({ id, value, share }, i) => [
    i === 0 ? name : "",
    lineName(book, id, id),
    value.text,
    percentText(share === undefined ? undefined : share * 100),
  ]);
}

function wordsOf(book: Book, id: string): string {
  const entry = book.item(id)?.entry;
  return entry?.kind === "assumption" ? entry.text : id;
}

/** What each assumption moves and by how much; empty where that was not asked for. */
export function movesSection(book: Book): Part {
  const { moves } = book.record;
  if (moves === undefined) return "";
  const columns = [
    { heading: "assumption and change" },
    { heading: "result" },
    { heading: "becomes", figures: true },
    { heading: "change", figures: true },
  ];
  const rows = moves.flatMap((one) => movementRows(book, one));
  const matter =
    rows.length === 0
      ? h`<p class="none">No assumption has a value to change.</p>`
      : table("One assumption changed at a time, the whole calculation run again", columns, rows);
  return h`<section class="part moves" aria-labelledby="moves"><h2 id="moves">What each assumption moves</h2>
<p>Assumptions only; those without a value are not varied.</p>
${matter}</section>
`;
}
