import fc from "fast-check";
import { beforeEach, describe, expect, expectTypeOf, test } from "vitest";
import { displayUnits, type Quantity, quantity } from "../../lib/quantity/index.ts";
import type { CalcEntry, Ledger } from "../../lib/sheet/index.ts";
import { freshLedger } from "./notebook.ts";

let sheet: Ledger;
beforeEach(() => {
  sheet = freshLedger();
  sheet.given("L", "14 m");
  sheet.given("h", "5.5 m");
  sheet.given("w", "5.2 kN/m");
  sheet.given("H", "18 kN");
  sheet.given("E", "210 GPa");
  sheet.given("I", "8360 cm^4");
  sheet.given("r", 2.5);
  sheet.given("theta", "30 deg");
  sheet.given("d", "-0.2 m");
  sheet.given("alpha_T", "12e-6 1/K");
  sheet.given("DeltaT", "25 °C");
});

function lines(id: string): CalcEntry["lines"] {
  return (sheet.entry(id) as CalcEntry).lines;
}

// Expected values worked out by hand from the givens above.
const worked: readonly (readonly [
  string,
  "kN m" | "m" | "kN" | "kN m/rad" | "deg" | "" | "kN m^2" | "mm",
  number,
])[] = [
  ["a = w*L^2/8", "kN m", 127.4],
  ["a = w*L/2", "kN", 36.4],
  ["a = H*h + w*L^2/12", "kN m", 99 + 1019.2 / 12],
  ["a = -w*L^2/8 + H*h", "kN m", -28.4],
  ["a = 3*E*I/L", "kN m/rad", 3762],
  ["a = E*I", "kN m^2", 17556],
  ["a = 5*w*L^4/(384*E*I)", "mm", 148.155],
  ["a = sqrt(L^2 + h^2)", "m", Math.sqrt(196 + 30.25)],
  ["a = (L*h*L)^(1/3)", "m", Math.cbrt(14 * 5.5 * 14)],
  ["a = abs(d)", "m", 0.2],
  ["a = max(L, h, 2*h)", "m", 14],
  ["a = min(L, h, 0)", "m", 0],
  ["a = max(0, d)", "m", 0],
  ["a = L*sin(theta)", "m", 7],
  ["a = h*tan(pi/4)", "m", 5.5],
  ["a = L*cos(60*pi/180)", "m", 7],
  ["a = atan(h/L)", "deg", 21.4478],
  ["a = asin(0.5)", "deg", 30],
  ["a = acos(0.5)", "deg", 60],
  ["a = (L - h)/h", "", 8.5 / 5.5],
  ["a = 2^-1*r", "", 1.25],
  ["a = -2^2", "", -4],
  ["a = 2^3^2", "", 512],
  ["a = L/2/2", "m", 3.5],
  ["a = L - h - 1*h", "m", 3],
  ["a = w·L²/8", "kN m", 127.4],
  ["a = 1e3*L − 2×h", "m", 13989],
  ["a = θ*L", "m", (14 * Math.PI) / 6],
  ["a = alpha_T*DeltaT*L", "mm", 4.2],
];

describe("calc", () => {
  test.each(worked)("%s in %j is %d", (formula, unit, value) => {
    const result = sheet.calc(formula, unit) as Quantity;
    const shown = unit === "" ? result.si : result.in(unit);
    expect(shown).toBeCloseTo(value, 3 - Math.floor(Math.log10(Math.max(1, Math.abs(value)))) + 1);
    expect(result.from).toEqual(["a@1"]);
  });

  test("answers with the dimension of the unit asked", () => {
    const M = sheet.calc("M_0 = w*L^2/8", "kN m", "simple span");
    expectTypeOf(M).toEqualTypeOf<Quantity<"moment">>();
    expectTypeOf(sheet.calc("n = L/h", "")).toEqualTypeOf<Quantity<"pure number">>();
    expect(M).toMatchObject({ dimension: "moment", unit: "kN m" });
  });

  test("keeps the values and entries of exactly the symbols it names", () => {
    sheet.calc("M_0 = w*L^2/8", "kN m");
    sheet.calc("M_1 = M_0 + H*h - M_0/r*cos(pi)", "kN m");
    expect(sheet.entry("M_0")).toMatchObject({ uses: ["w@1", "L@1"], inputs: { w: 5200, L: 14 } });
    expect((sheet.entry("M_1") as CalcEntry).uses).toEqual(["M_0@1", "H@1", "h@1", "r@1"]);
  });
});

const threeLines = [
  [
    "M_0 = w*L^2/8",
    "kN m",
    "M_{0} = \\frac{w\\,L^{2}}{8}",
    "M_{0} = \\frac{5.20\\,\\mathrm{kN}/\\mathrm{m} \\times \\left(14.0\\,\\mathrm{m}\\right)^{2}}{8}",
    "M_{0} = 127\\,\\mathrm{kN}{\\cdot}\\mathrm{m}",
  ],
  [
    "x = sqrt(L^2 + (h/2)^2) + d",
    "m",
    "x = \\sqrt{L^{2} + \\left(\\frac{h}{2}\\right)^{2}} + d",
    "x = \\sqrt{\\left(14.0\\,\\mathrm{m}\\right)^{2} + \\left(\\frac{5.50\\,\\mathrm{m}}{2}\\right)^{2}} + \\left(-0.200\\,\\mathrm{m}\\right)",
    "x = 14.1\\,\\mathrm{m}",
  ],
  [
    "y = 2*3*L*2",
    "m",
    "y = 2 \\cdot 3\\,L \\cdot 2",
    "y = 2 \\times 3 \\times 14.0\\,\\mathrm{m} \\times 2",
    "y = 168\\,\\mathrm{m}",
  ],
  [
    "q = theta/pi",
    "deg",
    "q = \\frac{\\theta}{\\pi}",
    "q = \\frac{30.0^{\\circ}}{\\pi}",
    "q = 9.55^{\\circ}",
  ],
  [
    "s = abs(d)*max(1, r)^(r - 1)",
    "mm",
    "s = \\left|d\\right|\\,\\left(\\max\\left(1,\\; r\\right)\\right)^{r - 1}",
    "s = \\left|\\left(-0.200\\,\\mathrm{m}\\right)\\right| \\times \\left(\\max\\left(1,\\; 2.50\\right)\\right)^{2.50 - 1}",
    "s = 791\\,\\mathrm{mm}",
  ],
  [
    "k = 3*E*I/L",
    "kN m/rad",
    "k = \\frac{3\\,E\\,I}{L}",
    "k = \\frac{3 \\times 210\\,\\mathrm{GPa} \\times 8360\\,\\mathrm{cm}^{4}}{14.0\\,\\mathrm{m}}",
    "k = 3762\\,\\mathrm{kN}{\\cdot}\\mathrm{m}/\\mathrm{rad}",
  ],
] as const;

describe("three lines", () => {
  test.each(threeLines)("%s", (formula, unit, symbols, numbers, result) => {
    sheet.calc(formula, unit);
    expect(lines(formula.split(" ")[0] ?? "")).toEqual({ symbols, numbers, result });
  });
});

const refused: readonly (readonly [string, "m" | "kN" | "kN m" | "", string])[] = [
  [
    "a = Ln*2",
    "m",
    'a = Ln*2: no symbol "Ln" on this sheet; did you mean "L"? known: L, h, w, H, E, I, r, theta, d, alpha_T, DeltaT',
  ],
  ["a = L + w", "m", "a = L + w: cannot add L = 14 m (length) and w = 5.2 kN/m (force per length)"],
  ["a = L - H", "m", "cannot subtract H = 18 kN (force) from L = 14 m (length)"],
  ["a = L + 1", "m", "cannot add L = 14 m (length) and 1 (pure number)"],
  ["a = max(L, H)", "m", "cannot compare L = 14 m (length) and H = 18 kN (force)"],
  ["a = w*L^2/8", "kN", 'a = w*L^2/8: the result is a moment; "kN" is a force'],
  ["a = w*L", "", "a = w*L: the result is a force; a pure number is asked for"],
  ["a = L/(h - h)", "m", "cannot divide L = 14 m (length) by (h - h) = 0 m (length)"],
  ["a = L/0", "m", "cannot divide L = 14 m (length) by 0 (pure number)"],
  ["a = sqrt(d*L)", "m", "d*L = −2.8 m² (area) is negative: it has no square root"],
  ["a = d^0.5", "m", "d = −0.2 m (length) is negative: it has no power 0.5"],
  ["a = 0^-1", "", "0 (pure number) is zero: it has no power -1"],
  ["a = L^w", "m", "an exponent must be a pure number, not w = 5.2 kN/m (force per length)"],
  ["a = L^(1/3)", "m", "L = 14 m (length) has no power 0.333333"],
  ["a = acos(r)", "", "acos of r = 2.5 (pure number) does not exist; the value must lie between -1 and 1"],
  ["a = sin(L)", "", "sin takes a pure number or an angle, not L = 14 m (length)"],
  ["a = 10^400", "", "10^400 gives Infinity"],
  ["a = a + L", "m", "a = a + L: a would stand on itself"],
  ["a = 5 kN + H", "kN", '"5 kN" is a number with a unit; give it a symbol, sheet.given("a", "5 kN")'],
  ["a = 2 L", "m", 'a sign is missing in "2 L"; write 2*L for a product'],
  ["a = L(2 + 3)", "m", '"L" is not a function here; write L*(…) for a product'],
  ["a = log(r)", "", '"log" is not a function here'],
  ["a = min(L)", "m", "min takes two values or more, not 1"],
  ["a = sqrt(L, h)", "m", "sqrt takes one value, not 2"],
  ["a = L > 2", "m", '"L > 2" cannot stand in a formula'],
  ["a = [1, 2]", "m", "cannot stand in a formula"],
  ["a = 'text'", "m", "cannot stand in a formula"],
  ["a = r!", "", "cannot stand in a formula"],
  ["a = L'", "m", "cannot stand in a formula"],
  ["a = r % 2", "", "cannot stand in a formula"],
  ["a = r ? 1 : 2", "", "cannot stand in a formula"],
  ["a = r.constructor", "", "cannot stand in a formula"],
  ["a = b = L", "m", "cannot stand in a formula"],
  ["a = 3 to L", "m", "cannot stand in a formula"],
  ["a == L", "m", "is not a definition; write symbol = formula"],
  ["a; b = 2", "", "is not a definition"],
  ["f(x) = x", "", "is not a definition"],
  ["L", "m", "is not a definition"],
  ["min = L", "m", '"min" is a word of the formulas'],
  ["pi = 3", "", '"pi" is a word of the formulas'],
  ["a = L*", "m", "cannot be read as a formula"],
  ["", "m", "the formula is empty"],
];

describe("calc refuses", () => {
  test.each(refused)("%j in %j", (formula, unit, message) => {
    const before = sheet.entries().length;
    expect(() => sheet.calc(formula, unit)).toThrow(message);
    expect(sheet.entries()).toHaveLength(before);
  });
});

test("no symbol at all is said plainly", () => {
  expect(() => freshLedger().calc("a = L", "m")).toThrow('no symbol "L" on this sheet; there is none yet');
});

test("a formula gives the same in other units", () => {
  const size = fc.double({ min: 1e-3, max: 1e3, noNaN: true });
  fc.assert(
    fc.property(size, size, (load, span) => {
      const metric = freshLedger("kN, m");
      metric.given("w", quantity(load * 1000, "force per length"));
      metric.given("L", quantity(span, "length"));
      const one = metric.calc("M = w*L^2/8", "kN m");
      const us = freshLedger("kip, ft");
      us.given("w", quantity(load * 1000, "force per length").to("klf"));
      us.given("L", quantity(span, "length").to("in"));
      const other = us.calc("M = w*L^2/8", "kip ft");
      expect(other.si).toBe(one.si);
      expect(Math.abs(one.in("kip ft") - other.in("kip ft"))).toBeLessThanOrEqual(1e-12 * other.in("kip ft"));
    }),
    { seed: 817, numRuns: 50 },
  );
  expect(displayUnits("kip, ft").section).toBe("in");
});

test("US units are shown as the trade writes them", () => {
  sheet = freshLedger("kip, ft");
  sheet.given("w", "1.2 klf");
  sheet.given("L", "28'-6\"");
  sheet.calc("M_0 = w*L^2/8", "kip ft");
  expect(lines("M_0")).toEqual({
    symbols: "M_{0} = \\frac{w\\,L^{2}}{8}",
    numbers: "M_{0} = \\frac{1.20\\,\\mathrm{klf} \\times \\left(28.5\\,\\mathrm{ft}\\right)^{2}}{8}",
    result: "M_{0} = 122\\,\\mathrm{kip}{\\cdot}\\mathrm{ft}",
  });
});
