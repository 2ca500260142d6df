// Ranges as an engineer writes them: "1 to 4", "within 2", "2 within 1.5", "known", "pinned to half fixed".

import { AccuracyError } from "./faults.ts";
import { type Between, within } from "./unknowns.ts";

/** What is stated of one thing: words, a number that is known, or a range in numbers. */
export type Stated = string | number | Between;

/** A ratio or a multiple: its middle in the sense of ratios, absent where only a factor around it is stated; and the range as multiples
 *  of the middle. */
export interface RatioRange {
  readonly nominal?: number;
  readonly range: Between;
}

const number = String.raw`(\d+(?:\.\d+)?(?:\s*/\s*\d+(?:\.\d+)?)?)`;
const span = new RegExp(`^${number}\\s+to\\s+${number}$`);
const factor = new RegExp(`^(?:${number}\\s+)?within\\s+(?:a factor of\\s+)?${number}$`);
const alone = new RegExp(`^${number}$`);
const about = new RegExp(`^about\\s+${number}$`);

/** Reads the range of a ratio. "a to b": nominal √(ab); "r within f": from r/f to r f; a number alone or "known": no range; "about r":
 *  within `usual` of it. Throws on anything else, naming `key`. */
export function readRatioRange(key: string, stated: Stated, usual: Between): RatioRange {
  const found = parsed(key, stated, usual);
  const { nominal = 1, range } = found;
  const [least, most] = [nominal * range.least, nominal * range.most];
  if (!(least > 0 && least <= most && most < Number.POSITIVE_INFINITY))
    throw new AccuracyError({
      kind: "bad words",
      key,
      written: writtenText(stated),
      wanted: "numbers more than zero, of two the smaller first, a factor of 1 or more",
    });
  return found;
}

function parsed(key: string, stated: Stated, usual: Between): RatioRange {
  if (typeof stated === "number") return { nominal: stated, range: within(1) };
  if (typeof stated !== "string") return between(stated);
  const text = stated.trim().toLowerCase();
  if (text === "known") return { range: within(1) };
  const spanned = span.exec(text);
  if (spanned !== null) return between({ least: read(spanned[1]), most: read(spanned[2]) });
  const around = factor.exec(text);
  if (around !== null) {
    const f = read(around[2]);
    return around[1] === undefined ? { range: within(f) } : { nominal: read(around[1]), range: within(f) };
  }
  const known = alone.exec(text);
  if (known !== null) return { nominal: read(known[1]), range: within(1) };
  const near = about.exec(text);
  if (near !== null) return { nominal: read(near[1]), range: usual };
  throw new AccuracyError({ kind: "not a range", key, value: stated });
}

function between({ least, most }: Between): RatioRange {
  const nominal = Math.sqrt(least * most);
  return { nominal, range: { least: least / nominal, most: most / nominal } };
}

function read(text: string | undefined): number {
  const [over = Number.NaN, under = 1] = (text ?? "").split("/").map(Number);
  return over / under;
}

const named: Readonly<Record<string, number>> = { pinned: 0, "half fixed": 0.5, "half-fixed": 0.5, fixed: 1 };

/** Reads a range of fixities, 0 free to turn to 1 fixed: "pinned to half fixed", "0.2 to 0.6", "half fixed"; nothing when it is "as given". */
export function readFixityRange(key: string, stated: Stated): Between | undefined {
  if (typeof stated === "string" && ["as given", "known"].includes(stated.trim().toLowerCase()))
    return undefined;
  const range = fixities(stated);
  if (range === undefined) throw new AccuracyError({ kind: "not a fixity", key, value: String(stated) });
  const { least, most } = range;
  if (!(least >= 0 && most <= 1 && least <= most))
    throw new AccuracyError({
      kind: "bad words",
      key,
      written: writtenText(stated),
      wanted: "numbers from 0 (pinned, free to turn) to 1 (fixed), of two the smaller first",
    });
  return range;
}

/** What was stated, as it was written. */
function writtenText(stated: Stated): string {
  if (typeof stated === "string") return `"${stated}"`;
  const short = (x: number): string => String(Number(x.toPrecision(6)));
  return typeof stated === "number" ? short(stated) : `${short(stated.least)} to ${short(stated.most)}`;
}

function fixities(stated: Stated): Between | undefined {
  if (typeof stated === "number") return { least: stated, most: stated };
  if (typeof stated !== "string") return stated;
  const ends = stated
    .trim()
    .toLowerCase()
    .split(/\s+to\s+/)
    .map((word) => named[word] ?? (alone.test(word) ? read(word) : Number.NaN));
  const [least = Number.NaN, most = least] = ends;
  return ends.length > 2 || Number.isNaN(least) || Number.isNaN(most) ? undefined : { least, most };
}
