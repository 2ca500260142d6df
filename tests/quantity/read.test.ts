import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type AnyUnit,
  type Dimension,
  lookUpUnit,
  printWritten,
  type Quantity,
  quantity,
  readMeasure,
} from "../../lib/quantity/index.ts";

const read: readonly (readonly [unknown, Dimension, number, string])[] = [
  ["14 m", "length", 14, "m"],
  ["14m", "length", 14, "m"],
  [" 14  m ", "length", 14, "m"],
  ["-5.2 kN/m", "force per length", -5200, "kN/m"],
  ["−5.2 kN/m", "force per length", -5200, "kN/m"],
  ["+3 kN", "force", 3000, "kN"],
  ["1.5e3 N", "force", 1500, "N"],
  [".5 m", "length", 0.5, "m"],
  ["12\u202f345.6 kN", "force", 12345600, "kN"],
  ["1.50×10⁻⁶ m", "length", 1.5e-6, "m"],
  ["14'-6\"", "length", 14.5 * 0.3048, "ft"],
  ["14'", "length", 14 * 0.3048, "ft"],
  ['6"', "length", 6 * 0.0254, "in"],
  ["14'-6 1/2\"", "length", (14 * 12 + 6.5) * 0.0254, "ft"],
  ["14' 6\"", "length", 14.5 * 0.3048, "ft"],
  ['6 1/2"', "length", 6.5 * 0.0254, "in"],
  ['3/4"', "length", 0.75 * 0.0254, "in"],
  ["14’-6″", "length", 14.5 * 0.3048, "ft"],
  ["1/200", "pure number", 0.005, ""],
  ["1/200", "angle", 0.005, ""],
  [0.005, "angle", 0.005, ""],
  [2.5, "pure number", 2.5, ""],
  ["2.5", "pure number", 2.5, ""],
  ["30 %", "pure number", 0.3, "%"],
  ["0 kN", "force", 0, "kN"],
  ["12e-6 1/K", "per temperature", 12e-6, "1/K"],
  ["12e-6 1/°C", "per temperature", 12e-6, "1/°C"],
  ["-25 °C", "temperature change", -25, "°C"],
];

describe("readMeasure", () => {
  test.each(read)("%s as a %s is %d", (measure, dimension, si, unit) => {
    const value = readMeasure(measure, dimension, "x");
    expect(value.si).toBeCloseTo(si, 12);
    expect(value).toMatchObject({ dimension, unit, from: [] });
  });

  test("a quantity is taken as it is, with what it came from", () => {
    const span = quantity(14, "length", { unit: "m", from: ["L@1"] });
    expect(readMeasure(span, "length", "span")).toBe(span);
  });

  test("a quantity of another context is known by its shape", () => {
    const foreign = { dimension: "length", si: 3, unit: "", from: ["L@2"] } as unknown as Quantity<"length">;
    expect(readMeasure(foreign, "length", "span").si).toBe(3);
  });
});

const refused: readonly (readonly [unknown, Dimension, string])[] = [
  ["14 kN", "length", 'span: "14 kN" is a force; a length is wanted, e.g. "14 m"'],
  ["14", "length", 'span: "14" is a pure number; a length is wanted, e.g. "14 m"'],
  [14, "length", 'span: 14 is a pure number; a length is wanted, e.g. "14 m"'],
  ["12 kN m", "moment per angle", 'span: "12 kN m" is a moment; a moment per angle is wanted'],
  ["12 kN m/rad", "moment", 'span: "12 kN m/rad" is a moment per angle; a moment is wanted, e.g. "120 kN m"'],
  ["5 cm^2", "force", 'span: "5 cm^2" is an area; a force is wanted, e.g. "18 kN"'],
  ["", "length", 'span is empty; a length is wanted, e.g. "14 m"'],
  ["  ", "length", "span is empty"],
  [undefined, "length", "span is missing; a length is wanted"],
  [null, "length", "span is missing"],
  [Number.NaN, "length", "span: NaN is not a finite number; a length is wanted"],
  [Number.POSITIVE_INFINITY, "pure number", "span: Infinity is not a finite number"],
  ["1e999 m", "length", 'span: "1e999 m" is not a finite number'],
  ["1e308 kN", "force", 'span: "1e308 kN" is not a finite number'],
  ["5,2 kN", "force", 'span: "5,2 kN" cannot be read; decimals take a point, thousands no mark'],
  ["5..2 kN", "force", 'span: "5..2 kN" cannot be read'],
  ["kN", "force", 'span: "kN" cannot be read'],
  ["1/0", "pure number", 'span: "1/0" cannot be read'],
  ['3 1/0"', "length", 'span: "3 1/0"" cannot be read'],
  ["'", "length", 'span: "\'" cannot be read'],
  [{}, "length", "span: an object cannot be read"],
  [[1], "length", "span: [1] cannot be read"],
  [() => 1, "length", "span: a function cannot be read"],
];

describe("readMeasure refuses", () => {
  test.each(refused)("%j as a %s", (measure, dimension, message) => {
    expect(() => readMeasure(measure, dimension, "span")).toThrow(message);
  });
});

test("readMeasure refuses a quantity that is not finite", () => {
  const broken = { dimension: "length", si: Number.NaN, unit: "m", from: [] };
  expect(() => readMeasure(broken, "length", "span")).toThrow("span: an object is not a finite number");
});

const units: readonly AnyUnit[] = [
  "m",
  "mm",
  "ft",
  "in",
  "kN",
  "kip",
  "kN/m",
  "klf",
  "MPa",
  "ksi",
  "kN·m",
  "kip-ft",
];
units satisfies readonly AnyUnit[];
const moreUnits: readonly AnyUnit[] = [
  "cm⁴",
  "in^4",
  "cm^3",
  "kN m/rad",
  "kip ft^2",
  "deg",
  "mrad",
  "%",
  "pcf",
  "K",
  "1/K",
];
const anyUnit = fc.constantFrom(...units, ...moreUnits);
const written = fc
  .tuple(fc.integer({ min: -999_999_999, max: 999_999_999 }), fc.integer({ min: -12, max: 6 }))
  .map(([digits, power]) => `${digits}e${power}`);

describe("reading and printing", () => {
  test("what is printed as written reads back as the same value", () => {
    fc.assert(
      fc.property(written, anyUnit, (number, unit) => {
        const value = readMeasure(`${number} ${unit}`, undefined, "x");
        const again = readMeasure(printWritten(value), undefined, "x");
        expect(again.dimension).toBe(value.dimension);
        expect(Math.abs(again.si - value.si)).toBeLessThanOrEqual(1e-12 * Math.abs(value.si));
      }),
      { seed: 811, numRuns: 1000 },
    );
  });

  test("a change of unit changes no value", () => {
    fc.assert(
      fc.property(written, anyUnit, anyUnit, (number, one, other) => {
        fc.pre(lookUpUnit(one).dimension === lookUpUnit(other).dimension);
        const value = readMeasure(`${number} ${one}`, undefined, "x");
        const moved = readMeasure(`${value.in(other)} ${other}`, undefined, "x");
        expect(Math.abs(moved.si - value.si)).toBeLessThanOrEqual(1e-14 * Math.abs(value.si));
        expect(value.to(other).si).toBe(value.si);
      }),
      { seed: 812, numRuns: 300 },
    );
  });
});
