// A band in words, for the page and for the notebook alike.

import type { ResultBand, ShownValue } from "./record.ts";

/** Values nearer than this share of the largest are the same: what rounding in the arithmetic can do. */
const SAME = 1e-9;

/** A value without its unit, where the one it is named with has the same. */
const bare = (value: ShownValue, beside: ShownValue): string =>
  value.unit !== "" && value.unit === beside.unit ? value.text.replace(/ [^ ]*$/, "") : value.text;

/** "−132 to −104 kN·m", or with another word between. */
const between = (from: ShownValue, to: ShownValue, word: string): string =>
  `${bare(from, to)} ${word} ${to.text}`;

const times = (share: number): string => (Math.abs(share) >= 100 ? share.toFixed(0) : share.toFixed(2));

/** Whether every frame tried gave the same: statics alone settles it, or nothing that matters was varied. */
export function isSettled({ least, greatest }: ResultBand): boolean {
  const size = Math.max(Math.abs(least.si), Math.abs(greatest.si));
  return greatest.si - least.si <= SAME * size;
}

/** Whether the hand value itself is what every frame tried gave. */
function isHandItself(band: ResultBand): boolean {
  const { measure, against, least } = band;
  return measure === "ratio"
    ? Math.abs(against.least - 1) <= 1e-6
    : Math.abs(against.least) <= 1e-6 * Math.abs(least.si);
}

/** One line: "true value 90 % between −132 and −104 kN·m (0.92 to 1.17 of this), least −140, greatest −98.1 kN·m, bias +4 %". */
export function bandText(band: ResultBand): string {
  const { low, high, least, greatest, measure, against, bias } = band;
  const share = (from: number, to: number): string =>
    measure === "ratio" ? ` (${times(from)} to ${times(to)} of this)` : "";
  if (isSettled(band)) {
    if (isHandItself(band) || least.si === 0) return "true value the same in every frame tried";
    const part = measure === "ratio" ? ` (${times(against.least)} of this)` : "";
    return `true value ${least.text}${part} in every frame tried`;
  }
  const interval = `true value 90 % between ${between(low, high, "and")}${share(against.low, against.high)}`;
  return `${interval}, least ${bare(least, greatest)}, greatest ${greatest.text}, bias ${bias.text}`;
}

/** Two short lines for the cell of a table: where 90 % lie, and in brackets least and greatest. */
export function bandCellTexts(band: ResultBand): readonly string[] {
  const { low, high, least, greatest } = band;
  if (isSettled(band)) return [isHandItself(band) || least.si === 0 ? "same in all" : `${least.text} in all`];
  const [inner, outer] = [plainRange(low, high), plainRange(least, greatest)];
  return inner === outer ? [inner] : [inner, `(${outer})`];
}

/** "−132 to −104": beneath a value that says the unit, where it is the same. */
const plainRange = (from: ShownValue, to: ShownValue): string => `${bare(from, to)} to ${bare(to, from)}`;

/** How the cells of a table with bands are to be read. */
export function tableBandNote(words: string): string {
  return `Beneath each value: where 90 % of the true values lie, and in brackets least and greatest where these lie farther out; ${words}`;
}
