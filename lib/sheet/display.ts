// How entries show themselves in a notebook: MathML where there is a formula, plain text beside it.

import type { Display } from "../quantity/index.ts";
import { bandText } from "./band-words.ts";
import { toMathML } from "./mathml.ts";
import type { Entry, FormulaLines, ResultBand } from "./record.ts";
import { valueTex } from "./tex.ts";

/** A formula in its three lines, with its description. */
export function formulaDisplay(plain: string, lines: FormulaLines, description: string): Display {
  const rows = [lines.symbols, lines.numbers, lines.result].map(
    (tex) => `<p>${toMathML(`\\displaystyle ${tex}`)}</p>`,
  );
  return Object.freeze({
    "text/html": `<div>${title(description)}${rows.join("")}</div>`,
    "text/plain": plain,
  });
}

/** One line of TeX, with its description. */
export function lineDisplay(plain: string, tex: string, description: string): Display {
  return Object.freeze({
    "text/html": `<div>${toMathML(tex)} ${escaped(description)}</div>`,
    "text/plain": plain,
  });
}

/** An entry with a value, as a notebook shows it. */
export function displayOf(entry: Entry): Display {
  if (!("value" in entry) || entry.value === undefined || !("tex" in entry)) {
    throw new Error(`"${entry.id}" has no value to show`);
  }
  const plain = `${entry.id} = ${entry.value.text}`;
  if (entry.kind === "calc") return formulaDisplay(plain, entry.lines, entry.description);
  const words = entry.kind === "assumption" ? entry.because : entry.description;
  const shown = lineDisplay(plain, `${entry.tex} = ${valueTex(entry.value)}`, words);
  return entry.kind === "result" && entry.band !== undefined ? withBand(shown, entry.band) : shown;
}

/** A value's display with its band beneath. */
function withBand(shown: Display, band: ResultBand): Display {
  const words = `${bandText(band)}; ${band.words}`;
  return Object.freeze({
    "text/html": `${shown["text/html"]}<div><small>${escaped(words)}</small></div>`,
    "text/plain": `${shown["text/plain"]}\n${words}`,
  });
}

function title(description: string): string {
  return description === "" ? "" : `<div>${escaped(description)}</div>`;
}

/** A text that can stand in HTML, in an attribute too. */
export function escaped(text: string): string {
  const names: Readonly<Record<string, string>> = {
    "&": "&amp;",
    "<": "&lt;",
    ">": "&gt;",
    '"': "&quot;",
    "'": "&#39;",
  };
  return text.replace(/[&<>"']/g, (sign) => names[sign] ?? sign);
}
