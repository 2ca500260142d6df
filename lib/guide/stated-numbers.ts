// Ranges stated in numbers the sheet knows, made into bare numbers and what they came from.

import type { StatedText } from "../accuracy/index.ts";
import { isQuantity } from "../quantity/index.ts";
import { mergeSources } from "../structure/index.ts";
import type { Sources } from "../structure/types.ts";
import type { PureNumber, StatedRange, StatedRanges } from "./types.ts";

/** A statement in words and bare numbers, and what its numbers came from. */
export function plainStatement(stated: StatedRanges): { readonly plain: StatedText; readonly from: Sources } {
  if (typeof stated !== "object" || stated === null)
    throw new Error(
      `unknowns: ${String(stated)} states nothing; write for example { "I of beam / I of columns": "1 to 4" }`,
    );
  const from: Sources[] = [];
  const bare = (key: string, number: PureNumber): number => {
    if (isQuantity(number)) from.push(number.from);
    return plainNumber(key, number);
  };
  const plain = Object.entries(stated).map(([key, range]): [string, StatedText[string]] => {
    if (typeof range === "string" || typeof range === "number") return [key, range];
    if (isPair(range)) return [key, { least: bare(key, range[0]), most: bare(key, range[1]) }];
    if (isQuantity(range)) return [key, bare(key, range)];
    const [about, factor] = [bare(key, range.about), bare(key, range.within)];
    return [key, { least: about / factor, most: about * factor }];
  });
  return { plain: Object.fromEntries(plain), from: mergeSources(...from) };
}

const isPair = (range: StatedRange): range is readonly [PureNumber, PureNumber] => Array.isArray(range);

function plainNumber(key: string, number: PureNumber): number {
  const value = isQuantity(number) ? (number.dimension === "pure number" ? number.si : Number.NaN) : number;
  if (typeof value !== "number" || !Number.isFinite(value))
    throw new Error(
      `unknowns: "${key}" is ${String(number)}; a pure number, two of them or a range such as "1 to 4" is wanted`,
    );
  const base = /^bases?\b/.test(key);
  if (base ? value < 0 || value > 1 : value <= 0)
    throw new Error(
      `unknowns: "${key}" is stated by ${String(number)}${sourceText(number)}; ${base ? "a number from 0 (free to turn) to 1 (fixed)" : "a number more than zero"} is wanted`,
    );
  return value;
}

/** " (r_I)": the entry a number came from. */
function sourceText(number: PureNumber): string {
  const names = isQuantity(number) ? number.from.map((use) => use.replace(/@\d+$/, "")) : [];
  return names.length === 0 ? "" : ` (${names.join(", ")})`;
}
