// One line of the calculation per entry: number at the left, the matter in the middle, references in the margin.

import type {
  AssumptionEntry,
  CalcEntry,
  CheckEntry,
  ConclusionEntry,
  FigureEntry,
  FindingEntry,
  GivenEntry,
  NoteEntry,
  QueryEntry,
  ResultEntry,
  StepEntry,
  TextEntry,
} from "../sheet/index.ts";
import { bandWithGround } from "./bands.ts";
import { type Book, type Item, lineAnchor } from "./book.ts";
import { type Html, h, type Part, raw } from "./html.ts";
import { markdown } from "./markdown.ts";
import { maths, threeLines } from "./maths.ts";
import { margin, numberLink } from "./references.ts";
import { table } from "./tables.ts";
import { unbroken, withMinus } from "./words.ts";

/** SVG of a figure, in parts that a page may break between, with its number; a wide one is more than a telephone shows at a legible size. */
export interface DrawnFigure {
  readonly number: number;
  readonly parts: readonly string[];
  readonly wide: boolean;
}

/** The figures of a record, by entry id. */
export type Figures = ReadonlyMap<string, DrawnFigure>;

/** What is shown other than the entry says: the equation of a step by name, the caption of a figure. */
export interface Wording {
  readonly heading?: string;
  readonly caption?: string;
}

const says = (description: string): Part =>
  description === "" ? "" : h`<p class="says">${unbroken(description)}</p>`;

/** "Utilisation 0.83" to two places; three where two would round a failure to 1.00. */
export function utilisationText(value: number): string {
  const text = value.toFixed(2);
  return text === "1.00" && value > 1 ? value.toFixed(4) : text;
}

export function verdict(entry: CheckEntry): Html {
  const used = entry.utilisation === undefined ? "" : `, utilisation ${utilisationText(entry.utilisation)}`;
  return entry.passed
    ? h`<span class="holds">holds${used}</span>`
    : h`<strong class="fails">DOES NOT HOLD${used}</strong>`;
}

/** A given or assumption whose value is not the one written in the notebook. */
export function setFromOutside({ tex, value, overridden }: GivenEntry | AssumptionEntry): Part {
  if (!overridden || tex === undefined || value === undefined) return "";
  return h`<p class="outside">set from outside: ${maths(tex)} = ${value.text}, notebook says ${overridden.text}</p>`;
}

const value = (entry: GivenEntry | CalcEntry | ResultEntry): Html =>
  h`<p class="value">${maths(entry.tex)} = ${numberLink(entry.id, entry.value.text)}</p>`;

const given = (entry: GivenEntry): Part => [
  value(entry),
  says(entry.description),
  h`<p class="source">${entry.source === undefined ? "no source stated" : `from ${entry.source}`}</p>`,
  setFromOutside(entry),
];

function assumption(entry: AssumptionEntry): Part {
  const { symbol, tex, value: valued, text: words } = entry;
  const shown =
    valued && tex ? h`<p class="value">${maths(tex)} = ${numberLink(entry.id, valued.text)}</p>` : "";
  // The ledger writes "r = 2.50" where the engineer gave no words; the line above says that.
  const said =
    words === "" || (valued && words === `${symbol} = ${valued.text}`) ? "" : h`<p>${unbroken(words)}</p>`;
  return [shown, said, h`<p class="source">because ${unbroken(entry.because)}</p>`, setFromOutside(entry)];
}

const calc = (entry: CalcEntry): Part => [
  says(entry.description),
  threeLines(entry.lines, (result) => numberLink(entry.id, result, entry.value.text)),
];

const check = (entry: CheckEntry): Part => [
  says(entry.description),
  threeLines(entry.lines, (result) => numberLink(entry.id, result, entry.formula)),
  h`<p>${verdict(entry)}</p>`,
];

const result = (book: Book, entry: ResultEntry): Part => [
  value(entry),
  says(
    entry.governing ? [entry.description, "governs"].filter((t) => t !== "").join("; ") : entry.description,
  ),
  bandWithGround(book, entry.band),
];

const step = (entry: StepEntry, heading: string): Part => [
  says(heading),
  threeLines(entry.lines, (found) => numberLink(entry.id, found, entry.value.text)),
];

const plain = (text: string): string => text.replaceAll("−", "-").trim();

/** The verdict, then the working, without what the verdict says already. */
function finding(entry: FindingEntry): Part {
  const working = entry.lines.filter((l) => !plain(entry.verdict).includes(plain(l)));
  return [
    h`<p class="says"><strong>${entry.title}</strong></p>`,
    h`<p>${numberLink(entry.id, unbroken(withMinus(entry.verdict)))}</p>`,
    working.length > 0
      ? h`<ul class="working">${working.map((l) => h`<li>${unbroken(withMinus(l))}</li>`)}</ul>`
      : "",
  ];
}

function figure(entry: FigureEntry, figures: Figures, caption: string): Part {
  const drawn = figures.get(entry.id);
  const parts = (drawn?.parts ?? []).map(raw);
  // A drawing wider than a telephone moves in a frame of its own, so that its letters can still be read.
  const frame = drawn?.wide
    ? h`<div class="scroll" tabindex="0" role="group" aria-label="figure ${drawn.number}">${parts}</div>`
    : parts;
  const words = caption === "" ? "" : ` ${unbroken(caption)}`;
  return h`<figure class="${entry.spec.kind.replaceAll(" ", "-")}">${frame}<figcaption>Figure ${drawn?.number ?? ""}.${words}</figcaption></figure>`;
}

const note = (entry: NoteEntry): Part => h`<p class="note">${unbroken(entry.text)}</p>`;
const query = (entry: QueryEntry): Part => h`<p class="query"><strong>Open query.</strong> ${entry.text}</p>`;
const conclusion = (entry: ConclusionEntry): Part => h`<p class="conclusion">${entry.text}</p>`;
const text = (entry: TextEntry): Part => h`<div class="prose">${markdown(entry.markdown)}</div>`;

function matter(book: Book, item: Item, figures: Figures, { heading = "", caption }: Wording): Part {
  const { entry } = item;
  switch (entry.kind) {
    case "given":
      return given(entry);
    case "assumption":
      return assumption(entry);
    case "calc":
      return calc(entry);
    case "check":
      return check(entry);
    case "result":
      return result(book, entry);
    case "step":
      return step(entry, heading);
    case "finding":
      return finding(entry);
    case "table":
      return table(entry);
    case "figure":
      return figure(entry, figures, caption ?? entry.caption);
    case "note":
      return note(entry);
    case "query":
      return query(entry);
    case "conclusion":
      return conclusion(entry);
    case "text":
      return text(entry);
  }
}

const STALE = h`<p class="stale">OUT OF DATE: something this stands on has changed since it was worked out.</p>`;

/** One entry as a line of the page. */
export function line(book: Book, item: Item, figures: Figures, wording: Wording = {}): Html {
  const { entry, label } = item;
  const anchor = lineAnchor(entry.id);
  const number =
    label === "" ? "" : h`<a class="no" href="#${anchor}" aria-label="line ${label}">${label}</a>`;
  const stale = entry.outOfDate ? STALE : "";
  return h`<div class="line ${entry.kind}${entry.outOfDate ? " outdated" : ""}" id="${anchor}">
<div class="number">${number}</div>
<div class="matter">${stale}${matter(book, item, figures, wording)}</div>
${margin(book, item)}
</div>
`;
}
