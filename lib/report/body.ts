// One body cut free: its figure beside the equations it gives.

import type { Block, FigureItem, StepItem } from "./arrange.ts";
import type { Book } from "./book.ts";
import { type Html, h, type Part } from "./html.ts";
import { type Figures, line } from "./lines.ts";

type Body = Extract<Block, { kind: "body" }>;

/** The part of a caption that the body's name above it does not say already. */
function captionBeside(name: string, caption: string): string {
  const at = caption.length - name.length;
  return name !== "" && at >= 0 && caption.endsWith(name)
    ? caption.slice(0, at).replace(/[:,\s]+$/, "")
    : caption;
}

/** The equation of a step in words, where its formula does not begin by naming the sum it writes. */
function equationName({ entry }: StepItem, name: string): string {
  if (/^\s*\\sum\b/.test(entry.lines.symbols)) return "";
  return entry.body.startsWith(`${name}, `) ? entry.body.slice(name.length + 2) : "";
}

function drawn(book: Book, figures: Figures, items: readonly FigureItem[], name: string): Part {
  if (items.length === 0) return "";
  const shown = items.map((item) =>
    line(book, item, figures, { caption: captionBeside(name, item.entry.caption) }),
  );
  return h`<div class="drawn">
${shown}</div>
`;
}

/** A body with its figures and steps. */
export function body(book: Book, { name, figures: items, steps }: Body, figures: Figures): Html {
  if (steps.length === 0) return h`${items.map((item) => line(book, item, figures))}`;
  const heading = name === "" ? "" : h`<h3 class="body-name">${name}</h3>\n`;
  const equations = steps.map((step) => line(book, step, figures, { heading: equationName(step, name) }));
  return h`<section class="body${items.length === 0 ? " undrawn" : ""}">
${heading}${drawn(book, figures, items, name)}<div class="steps">
${equations}</div>
</section>
`;
}
