// Symbols: a letter, then letters and digits; subscripts after underscores; Greek letters spelled.
// M_0, w_snow, sigma_Ed, alpha_cr.

import { nearest } from "../quantity/index.ts";

const greek: readonly string[] =
  `alpha beta gamma delta epsilon zeta eta theta iota kappa lambda mu nu xi rho sigma tau upsilon phi chi psi omega
   Gamma Delta Theta Lambda Xi Sigma Upsilon Phi Psi Omega`.split(/\s+/);

/** The functions a formula may call. */
export const functionNames = [
  "sqrt",
  "abs",
  "min",
  "max",
  "sin",
  "cos",
  "tan",
  "asin",
  "acos",
  "atan",
] as const;
export type FunctionName = (typeof functionNames)[number];

// pi is the number; the rest are words of the parser's own language.
const reserved: ReadonlySet<string> = new Set([
  ...functionNames,
  ..."pi mod to in and or xor not true false null undefined NaN Infinity end".split(" "),
]);

const greekLetters = "αβγδεζηθικλμνξρστυφχψωΓΔΘΛΞΣΥΦΨΩ";
const greekSpelled = greek.filter((name) => name !== "");

/** The symbol itself when it can be one. Throws naming the symbol and what would be right. */
export function checkedSymbol(symbol: string): string {
  if (typeof symbol !== "string" || symbol.trim() === "") {
    throw new Error(
      'the symbol is missing; write a letter and, if wanted, a subscript, such as "L" or "M_0"',
    );
  }
  if (reserved.has(symbol)) throw new Error(`"${symbol}" is a word of the formulas; choose another symbol`);
  if (!/^[A-Za-z][A-Za-z0-9]*(_[A-Za-z0-9]+)*$/.test(symbol)) throw new Error(notASymbol(symbol));
  return symbol;
}

function notASymbol(symbol: string): string {
  const spelled = spellGreek(symbol);
  const hint = spelled === symbol ? 'write letters and digits, subscripts after "_"' : `write "${spelled}"`;
  return `"${symbol}" cannot be a symbol; ${hint}, such as "M_0", "w_snow" or "sigma_Ed"`;
}

/** A text with its Greek letters spelled out. */
export function spellGreek(text: string): string {
  return [...text].map((letter) => greekSpelled[greekLetters.indexOf(letter)] ?? letter).join("");
}

/** The nearest of the known symbols and the list of them, for a message. */
export function unknownSymbol(symbol: string, known: readonly string[]): string {
  if (known.length === 0) return `no symbol "${symbol}" on this sheet; there is none yet`;
  return `no symbol "${symbol}" on this sheet; did you mean "${nearest(symbol, known)}"? known: ${known.join(", ")}`;
}

/** A symbol as TeX: M_{0}, w_{\mathrm{snow}}, \sigma_{\mathrm{Ed}}. */
export function symbolTex(symbol: string): string {
  const [base = "", ...subscripts] = symbol.split("_");
  if (subscripts.length === 0) return baseTex(base);
  return `${baseTex(base)}_{${subscripts.map(subscriptTex).join(",")}}`;
}

function baseTex(base: string): string {
  if (base === "pi" || greek.includes(base)) return greekTex(base);
  return base.length === 1 ? base : `\\mathit{${base}}`;
}

function subscriptTex(text: string): string {
  if (greek.includes(text)) return greekTex(text);
  return /^(\d+|[A-Za-z])$/.test(text) ? text : `\\mathrm{${text}}`;
}

function greekTex(name: string): string {
  return name === "phi" || name === "epsilon" ? `\\var${name}` : `\\${name}`;
}
