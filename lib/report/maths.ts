// Formulas on the page: three lines set under one another at the equals sign.

import { type FormulaLines, toMathML } from "../sheet/index.ts";
import { type Html, h, raw } from "./html.ts";

const set = new Map<string, Html>();
const KEPT = 2000;

/** A formula as MathML, `display` with fractions in full size; the text itself where TeX cannot be read. */
export function maths(tex: string, display = false): Html {
  const key = `${display} ${tex}`;
  const known = set.get(key);
  if (known) return known;
  let made: Html;
  try {
    made = raw(toMathML(tex, { display }));
  } catch {
    made = h`<code>${tex}</code>`;
  }
  if (set.size >= KEPT) set.clear();
  set.set(key, made);
  return made;
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

/** The three lines of a formula; `link` wraps the last one, the number. */
export function threeLines(lines: FormulaLines, link: (result: Html) => Html): Html {
  const all = [lines.symbols, lines.numbers, lines.result].map(sides);
  const left = all[0]?.[0];
  if (left !== undefined && all.every((s) => s?.[0] === left)) {
    const [first, second, third] = all.map((s) => maths(s?.[1] ?? "", true));
    return h`<div class="formula"><span>${maths(left, true)}</span><span>${first}</span><span></span><span>${second}</span><span></span><span>${link(third ?? h``)}</span></div>`;
  }
  // With nothing to work out, numbers and result read the same: printed once.
  const numbers = lines.numbers === lines.result ? "" : h`<span>${maths(lines.numbers, true)}</span>`;
  return h`<div class="formula plain"><span>${maths(lines.symbols, true)}</span>${numbers}<span>${link(maths(lines.result, true))}</span></div>`;
}
