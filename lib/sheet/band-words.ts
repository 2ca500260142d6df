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

/** A middle nearer to the hand value than this share says nothing. */
const NEAR = 0.005;

/** Where the middle of the true values lies, in size against the hand value: ", in the middle 9 % more than this: hand too small". */
function middleText({ bias, measure, least, greatest }: ResultBand): string {
  const size = measure === "ratio" ? 1 : Math.max(Math.abs(least.si), Math.abs(greatest.si));
  if (Math.abs(bias.si) < NEAR * size) return "";
  if (measure !== "ratio") return `, in the middle ${bias.text} from this`;
  if (bias.si <= -1) return `, in the middle of the other sign (${times(1 + bias.si)} of this)`;
  const share = bias.text.replace(/^[+−]/, "");
  return `, in the middle ${share} ${bias.si > 0 ? "more than this: hand too small" : "less than this: hand too large"}`;
}

const times = (share: number): string => share.toFixed(Math.abs(share) >= 100 ? 0 : 2).replace("-", "−");

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

/** One line: "true value 90 % between −132 and −104 kN·m (0.92 to 1.17 of this), least −140, greatest −98.1 kN·m, in the middle 4 % more than
 *  this: hand too small". */
export function bandText(band: ResultBand): string {
  const { low, high, least, greatest, measure, against } = band;
  const share = (from: number, to: number): string =>
    measure === "ratio" ? ` (${times(from)} to ${times(to)} of this)` : "";
  if (isSettled(band)) {
    const where = band.single === true ? "in the one frame tried" : "in every frame tried";
    if (isHandItself(band) || least.si === 0) return `true value the same ${where}`;
    const part = measure === "ratio" ? ` (${times(against.least)} of this)` : "";
    return `true value ${least.text}${part} ${where}`;
  }
  const interval = `true value 90 % between ${between(low, high, "and")}${share(against.low, against.high)}`;
  return `${interval}, least ${bare(least, greatest)}, greatest ${greatest.text}${middleText(band)}`;
}

/** Two short lines for the cell of a table: where 90 % lie, and in brackets least and greatest. */
export function bandCellTexts(band: ResultBand): readonly string[] {
  const { low, high, least, greatest } = band;
  if (isSettled(band)) {
    const where = band.single === true ? "in one frame" : "in all";
    return [isHandItself(band) || least.si === 0 ? `same ${where}` : `${least.text} ${where}`];
  }
  const [inner, outer] = [plainRange(low, high), plainRange(least, greatest)];
  return inner === outer ? [inner] : [inner, `(${outer})`];
}

/** "−132 to −104": beneath a value that says the unit, where it is the same. */
const plainRange = (from: ShownValue, to: ShownValue): string => `${bare(from, to)} to ${bare(to, from)}`;

/** How the cells of a table with bands are to be read. */
export function tableBandNote(words: string): string {
  return `Beneath each value: where 90 % of the true values lie, and in brackets least and greatest where these lie farther out; ${words}`;
}
