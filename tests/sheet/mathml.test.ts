import { describe, expect, test } from "vitest";
import { quantity, readMeasure } from "../../lib/quantity/index.ts";
import { numberTex, shownValue, symbolTex, toMathML, unitTex, valueTex } from "../../lib/sheet/index.ts";
import { freshLedger } from "./notebook.ts";

describe("toMathML", () => {
  test("has no style attribute and keeps its structure", () => {
    const html = toMathML("M_{0} = \\frac{w\\,L^{2}}{8}", { display: true });
    expect(html).toMatch(/^<math display="block"/);
    expect(html).toContain("<mfrac>");
    expect(html).not.toMatch(/style=/);
  });
  test("what cannot be read is refused by name", () => {
    expect(() => toMathML("\\frac{1")).toThrow('the formula "\\frac{1" cannot be set');
  });
  test("markup in text is escaped", () => {
    expect(toMathML("\\text{<img src=x>}")).not.toContain("<img");
  });
});

/** What a reader sees of MathML. */
const seen = (html: string): string =>
  html
    .replace(/<[^>]*>/g, "")
    .replace(/[\u2062\u200b]/g, "")
    .normalize("NFKC");

const counted = (count: number, named: (i: number) => string): readonly string[] =>
  Array.from({ length: count }, (_, i) => named(i + 1));

describe("a name prints whole", () => {
  const subscripts = [
    ...counted(120, (i) => `h${i}`),
    ...counted(40, (i) => `A${i}`),
    ...counted(40, (i) => `AB${i}C${i + 8}`),
    ...["B1", "B12", "Z110", "12a", "1a", "h007", "x1y22z333", "snow", "Ed", "h", "12", "B1C10D100E1000"],
  ];
  test(`as the subscript of a symbol, ${subscripts.length} of them`, () => {
    const printed = subscripts.map((name) => seen(toMathML(symbolTex(`X_${name}`))));
    expect(printed).toEqual(subscripts.map((name) => `X${name}`));
  });
  test("as one of several subscripts", () => {
    const pairs = subscripts.map((name, i) => `${name}_${subscripts.at(-1 - i)}`);
    const printed = pairs.map((pair) => seen(toMathML(symbolTex(`M_${pair}`))));
    expect(printed).toEqual(pairs.map((pair) => `M${pair.replace("_", ",")}`));
  });
  test("as the symbol itself", () => {
    const names = [...counted(120, (i) => `h${i}`), "AB10", "EI", "L1b22"];
    expect(names.map((name) => seen(toMathML(symbolTex(name))))).toEqual(names);
  });
  test.each([
    ["M_{\\mathrm{B1,C10}}", "MB1,C10"],
    ["M_{\\mathrm{B11},C}", "MB11,C"],
    ["\\sum F_{\\mathrm{along\\ B10}}", "∑Falong\u00a0B10"],
  ])("as records of any age write it: %s", (tex, text) => {
    expect(seen(toMathML(tex))).toBe(text.normalize("NFKC"));
  });
  test("upright and in one piece", () => {
    expect(toMathML("X_{\\mathrm{h11}}")).toContain("<mtext>h11</mtext>");
  });
});

test("every line a calculation or check makes can be set, without styles", () => {
  const sheet = freshLedger();
  sheet.given("L", "14 m");
  sheet.given("w_snow", "5.2 kN/m");
  sheet.given("phi", "1/200");
  sheet.given("p", "1e-7 m");
  sheet.calc("M_0 = -w_snow*(L/2)^2*abs(-phi)/sqrt(2) + max(w_snow*L^2, 0)*sin(phi)^2", "kN m");
  sheet.calc("a = atan(phi)*asin(phi)/acos(phi)*tan(pi/8)", "deg");
  sheet.calc("k = 1e6*p", "mm");
  sheet.check("p <= L/360");
  sheet.check("1e-9*L <= p");
  const tex = sheet
    .entries()
    .flatMap((entry) => ("lines" in entry ? Object.values(entry.lines as object) : []));
  expect(tex).toHaveLength(15);
  for (const line of tex) expect(toMathML(line as string)).toMatch(/^<math(?!.*(style=|merror)).*<\/math>$/s);
});

const texts = [
  ["14 m", "14.0\\,\\mathrm{m}"],
  ["-12345.6 kN", "-12\\,345.6\\,\\mathrm{kN}"],
  ["0.000001 m", "1.00 \\times 10^{-6}\\,\\mathrm{m}"],
  ["5 kip-ft", "5.00\\,\\mathrm{kip}{\\cdot}\\mathrm{ft}"],
  ["50 ksi", "50.0\\,\\mathrm{ksi}"],
  ["8360 cm⁴", "8360\\,\\mathrm{cm}^{4}"],
  ["30 °", "30.0^{\\circ}"],
  ["30 deg", "30.0^{\\circ}"],
  ["25 °C", "25.0\\,\\mathrm{°C}"],
  ["12e-6 1/K", "1.20 \\times 10^{-5}\\,1/\\mathrm{K}"],
  ["5 %", "5.00\\,\\%"],
  ["5 kN m/rad", "5.00\\,\\mathrm{kN}{\\cdot}\\mathrm{m}/\\mathrm{rad}"],
] as const;

describe("valueTex", () => {
  test.each(texts)("%s", (text, tex) => {
    const sheet = freshLedger();
    sheet.given("x", readMeasure(text, undefined, "x"));
    const entry = sheet.entry("x");
    expect(entry?.kind === "given" && valueTex(entry.value)).toBe(tex);
    expect(toMathML(tex)).toMatch(/^<math/);
  });
  test("of a pure number and of a composed unit", () => {
    expect(valueTex(shownValue(quantity(2.5, "pure number")))).toBe("2.50");
    expect(valueTex(shownValue(quantity(4e6, "force^2")))).toBe("4.00\\,\\mathrm{kN}^{2}");
    expect(valueTex(shownValue(quantity(4, "length^-1")))).toBe("4.00\\,1/\\mathrm{m}");
    expect([numberTex("−1.50×10¹²"), unitTex("klf")]).toEqual(["-1.50 \\times 10^{12}", "\\mathrm{klf}"]);
  });
});
