import { describe, expect, test } from "vitest";
import { checkedSymbol, symbolTex } from "../../lib/sheet/index.ts";

const set = [
  ["L", "L"],
  ["M_0", "M_{0}"],
  ["I_b", "I_{b}"],
  ["w_snow", "w_{\\mathrm{snow}}"],
  ["sigma_Ed", "\\sigma_{\\mathrm{Ed}}"],
  ["alpha", "\\alpha"],
  ["phi", "\\varphi"],
  ["Delta_max", "\\Delta_{\\mathrm{max}}"],
  ["M_B_max", "M_{B,\\mathrm{max}}"],
  ["L1", "\\mathit{L1}"],
  ["EI", "\\mathit{EI}"],
  ["M_phi", "M_{\\varphi}"],
  ["x_12", "x_{12}"],
] as const;

describe("symbolTex", () => {
  test.each(set)("%s is %s", (symbol, tex) => {
    expect(symbolTex(checkedSymbol(symbol))).toBe(tex);
  });
});

const refused = [
  ["", "the symbol is missing"],
  ["sqrt", '"sqrt" is a word of the formulas'],
  ["pi", '"pi" is a word of the formulas'],
  ["in", '"in" is a word of the formulas'],
  ["1a", '"1a" cannot be a symbol; write letters and digits'],
  ["_a", '"_a" cannot be a symbol'],
  ["a_", '"a_" cannot be a symbol'],
  ["a-b", '"a-b" cannot be a symbol'],
  ["M 0", '"M 0" cannot be a symbol'],
  ["σ_Ed", '"σ_Ed" cannot be a symbol; write "sigma_Ed"'],
  ["__proto__", '"__proto__" cannot be a symbol'],
] as const;

describe("checkedSymbol refuses", () => {
  test.each(refused)("%j", (symbol, message) => {
    expect(() => checkedSymbol(symbol)).toThrow(message);
  });
});
