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
import { type Book, type Item, lineAnchor } from "./book.ts";
import { type Html, h, type Part, raw } from "./html.ts";
import { markdown } from "./markdown.ts";
import { maths, threeLines } from "./maths.ts";
import { margin, numberLink } from "./references.ts";
import { table } from "./tables.ts";

/** SVG of the figures of a record, by entry id. */
export type Figures = ReadonlyMap<string, { readonly number: number; readonly svg: string }>;

const says = (description: string): Part => (description === "" ? "" : h`<p class="says">${description}</p>`);

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

export function setFromOutside(entry: GivenEntry): Part {
  if (!entry.overridden) return "";
  return h`<p class="outside">set from outside: ${maths(entry.tex)} = ${entry.value.text}, notebook says ${entry.overridden.text}</p>`;
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
  const shown =
    entry.value && entry.tex
      ? h`<p class="value">${maths(entry.tex)} = ${numberLink(entry.id, entry.value.text)}</p>`
      : "";
  return [shown, h`<p>${entry.text}</p>`, h`<p class="source">because ${entry.because}</p>`];
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

const result = (entry: ResultEntry): Part => [
  value(entry),
  says(entry.description),
  entry.governing ? h`<p class="source">governs</p>` : "",
];

const step = (entry: StepEntry, heading: string): Part => [
  says(heading),
  threeLines(entry.lines, (found) => numberLink(entry.id, found, entry.value.text)),
];

const finding = (entry: FindingEntry): Part => [
  h`<p class="says"><strong>${entry.title}</strong></p>`,
  entry.lines.length > 0 ? h`<ul class="working">${entry.lines.map((l) => h`<li>${l}</li>`)}</ul>` : "",
  h`<p>${numberLink(entry.id, entry.verdict)}</p>`,
];

function figure(entry: FigureEntry, figures: Figures): Part {
  const drawn = figures.get(entry.id);
  return h`<figure class="${entry.spec.kind.replaceAll(" ", "-")}">${raw(drawn?.svg ?? "")}<figcaption>Figure ${drawn?.number ?? ""}. ${entry.caption}</figcaption></figure>`;
}

const note = (entry: NoteEntry): Part => h`<p class="note">${entry.text}</p>`;
const query = (entry: QueryEntry): Part => h`<p class="query"><strong>Open query.</strong> ${entry.text}</p>`;
const conclusion = (entry: ConclusionEntry): Part => h`<p class="conclusion">${entry.text}</p>`;
const text = (entry: TextEntry): Part => h`<div class="prose">${markdown(entry.markdown)}</div>`;

function matter(item: Item, figures: Figures, heading: string): Part {
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
      return result(entry);
    case "step":
      return step(entry, heading);
    case "finding":
      return finding(entry);
    case "table":
      return table(entry);
    case "figure":
      return figure(entry, figures);
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

/** One entry as a line of the page; `heading` says which equation a step is. */
export function line(book: Book, item: Item, figures: Figures, heading = ""): Html {
  const { entry, label } = item;
  const anchor = lineAnchor(entry.id);
  const number =
    label === "" ? "" : h`<a class="no" href="#${anchor}" aria-label="line ${label}">${label}</a>`;
  const stale = entry.outOfDate ? STALE : "";
  return h`<div class="line ${entry.kind}${entry.outOfDate ? " outdated" : ""}" id="${anchor}">
<div class="number">${number}</div>
<div class="matter">${stale}${matter(item, figures, heading)}</div>
${margin(book, item)}
</div>
`;
}
