// Formulas on the page: three lines set under one another at the equals sign.

import { type FormulaLines, toMathML } from "../sheet/index.ts";
import { type Html, h, joined, raw } from "./html.ts";

/** TeX whose subscripts of several names are upright throughout: M_{\mathrm{BC},B} is M_{\mathrm{BC,B}}. */
export const uprightSubscripts = (tex: string): string =>
  tex.replace(/_\{((?:\\mathrm\{[^{}]*\}|\w+)(?:,(?:\\mathrm\{[^{}]*\}|\w+))+)\}/g, (_, inside: string) => {
    return `_{\\mathrm{${inside.replace(/\\mathrm\{([^{}]*)\}/g, "$1")}}}`;
  });

const set = new Map<string, Html>();
const KEPT = 4000;

function written(tex: string, display: boolean): Html {
  const key = `${display} ${tex}`;
  const known = set.get(key);
  if (known) return known;
  // Sums of forces are small signs in a line of text; only fractions need the height of a displayed formula.
  const made = raw(toMathML(uprightSubscripts(tex), { display: display && /\\frac\b/.test(tex) }));
  if (set.size >= KEPT) set.clear();
  set.set(key, made);
  return made;
}

/** A formula as MathML, `display` with fractions in full size; the text itself where TeX cannot be read. */
export function maths(tex: string, display = false): Html {
  try {
    return written(tex, display);
  } catch {
    return h`<code>${tex}</code>`;
  }
}

/** TeX shorter than this is set in one piece. */
const SHORT = 44;

/** A long formula cut where a line may break: before + and - and relations that stand outside all brackets. */
export function breakable(tex: string): readonly string[] {
  if (tex.replace(/\\[a-z]+/gi, "").replace(/[{}\s]/g, "").length < SHORT) return [tex];
  const pieces: string[] = [];
  let depth = 0;
  let start = 0;
  for (let i = 0; i < tex.length; i++) {
    const c = tex[i] ?? "";
    if ("{([".includes(c)) depth++;
    else if ("})]".includes(c)) depth--;
    const before = tex.slice(start, i).trim();
    // A sign after a relation or another operator belongs to its number.
    const binary =
      c === "=" || ((c === "+" || c === "-") && /[\w)}\]]$/.test(before) && !/\\[a-z]+$/i.test(before));
    if (depth !== 0 || before === "" || !binary) continue;
    pieces.push(before);
    start = i;
  }
  const last = tex.slice(start).trim();
  // "= 0" alone on a line says nothing.
  return last.length < 5 && last.startsWith("=") && pieces.length > 1
    ? [...pieces.slice(0, -1), `${pieces.at(-1)} ${last}`]
    : [...pieces, last];
}

/** A formula that may run over several lines. */
export function wrapping(tex: string): Html {
  const pieces = breakable(tex);
  if (pieces.length === 1) return maths(tex, true);
  try {
    // The empty group makes the sign at the start of a piece one between two terms.
    const laid = pieces.map((piece, i) => written(i === 0 ? piece : `{}${piece}`, true));
    return h`${joined(laid, " ")}`;
  } catch {
    return maths(tex, true);
  }
}

/** Left side and the rest of "left = right", split at the first equals sign outside braces. */
function sides(tex: string): readonly [string, string] | undefined {
  let depth = 0;
  for (let i = 0; i < tex.length; i++) {
    if (tex[i] === "{") depth++;
    else if (tex[i] === "}") depth--;
    else if (tex[i] === "=" && depth === 0) return [tex.slice(0, i).trim(), tex.slice(i).trim()];
  }
  return undefined;
}

/** What stands right of the first equals sign, with the sign; the whole where there is none. */
export const rightSide = (tex: string): string => sides(tex)?.[1] ?? tex;

/** The three lines of a formula; `link` wraps the last one, the number. */
export function threeLines(lines: FormulaLines, link: (result: Html) => Html): Html {
  const all = [lines.symbols, lines.numbers, lines.result].map(sides);
  const left = all[0]?.[0];
  if (left !== undefined && all.every((s) => s?.[0] === left)) {
    const [first, second, third] = all.map((s) => wrapping(s?.[1] ?? ""));
    return h`<div class="formula"><span>${maths(left, true)}</span><span>${first}</span><span></span><span>${second}</span><span></span><span>${link(third ?? h``)}</span></div>`;
  }
  // With nothing to work out, numbers and result read the same: printed once.
  const numbers = lines.numbers === lines.result ? "" : h`<span>${wrapping(lines.numbers)}</span>`;
  return h`<div class="formula plain"><span>${wrapping(lines.symbols)}</span>${numbers}<span>${link(wrapping(lines.result))}</span></div>`;
}
