// Bands on the page: how the true value lies about a hand value, beside the value wherever it is shown.

import { bandCellTexts, bandText, type ResultBand, tableBandNote } from "../sheet/index.ts";
import type { Book } from "./book.ts";
import { type Html, h, type Part } from "./html.ts";
import { groundLinks } from "./references.ts";
import { unbroken } from "./words.ts";

/** Ends of numbers that belong together stay on one line: "−132 and", "least −140". */
const bound = (text: string): string =>
  unbroken(text).replace(/(least|greatest|middle|between|and|to|of) (?=[−+\d])/g, "$1\u00a0");

/** A band beneath its value, in one sentence. */
export const bandLine = (band: ResultBand): Html => h`<p class="band">${bound(bandText(band))}</p>`;

/** A band in a line of its own: the sentence, what was tried, and the entry that says what is not known. */
export function bandWithGround(book: Book, band: ResultBand | undefined): Part {
  if (band === undefined) return "";
  const [first] = band.uses;
  const by = first === undefined ? "" : h`; unknowns: ${groundLinks(book, [book.ground(first)])}`;
  return h`<p class="band">${bound(bandText(band))}</p>
<p class="band tried">${band.words}${by}</p>`;
}

/** A band in the cell of a table. */
export const bandInCell = (band: ResultBand | undefined): Part =>
  band === undefined ? "" : bandCellTexts(band).map((text) => h`<br><span class="band">${text}</span>`);

/** How the bands of a table are read; empty where it has none. */
export const noteOnBands = (bands: readonly ResultBand[]): Part =>
  bands[0] === undefined ? "" : h`<p class="band">${tableBandNote(bands[0].words)}.</p>`;

/** What the bands on the cover stand for, once for all of them. */
export function bandsOnCover(book: Book, bands: readonly ResultBand[]): Part {
  const words = [...new Set(bands.map((band) => band.words))];
  if (words.length === 0) return "";
  const grounds = [...new Set(bands.flatMap(({ uses }) => uses.slice(0, 1)))].map((use) => book.ground(use));
  const by = grounds.length === 0 ? "" : h`; unknowns: ${groundLinks(book, grounds)}`;
  return h`<p class="band tried">Bands: ${words.join("; ")}${by}.</p>`;
}
