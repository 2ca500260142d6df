import { afterEach, describe, expect, test } from "vitest";
import {
  type Dimension,
  displayUnits,
  printNumber,
  printUnit,
  printValue,
  printWritten,
  quantity,
  readMeasure,
  showIn,
} from "../../lib/quantity/index.ts";

afterEach(() => showIn("kN, m"));

const numbers: readonly (readonly [number, number, string])[] = [
  [0, 3, "0"],
  [-0, 3, "0"],
  [14, 3, "14.0"],
  [5.2, 3, "5.20"],
  [-5.2, 3, "−5.20"],
  [0.125, 3, "0.125"],
  [0.005, 3, "0.00500"],
  [127.4, 3, "127"],
  [1234.5, 3, "1235"],
  [12345.678, 3, "12\u202f346"],
  [987654, 3, "987\u202f654"],
  [1234567, 3, "1.23×10⁶"],
  [-28666667, 3, "−28.7×10⁶"],
  [482e6, 3, "482×10⁶"],
  [999.96e6, 3, "1.00×10⁹"],
  [9.996, 3, "10.0"],
  [0.9996, 3, "1.00"],
  [0.0001, 3, "0.000100"],
  [0.00001234, 3, "1.23×10⁻⁵"],
  [-2e12, 3, "−2.00×10¹²"],
  [0.1 + 0.2, 3, "0.300"],
  [1.005, 3, "1.01"],
  [2.345, 5, "2.3450"],
];

describe("printNumber", () => {
  test.each(numbers)("%d with %i figures is %s", (value, figures, text) => {
    expect(printNumber(value, figures)).toBe(text);
  });
  test.each([Number.NaN, Number.POSITIVE_INFINITY])("%d is refused", (value) => {
    expect(() => printNumber(value)).toThrow("is not a finite number");
  });
});

const unitTexts = [
  ["kN m", "kN·m"],
  ["kNm", "kN·m"],
  ["kip-ft", "kip·ft"],
  ["N/mm^2", "N/mm²"],
  ["cm^4", "cm⁴"],
  ["kip ft/rad", "kip·ft/rad"],
  ["ksi", "ksi"],
] as const;

describe("printUnit", () => {
  test.each(unitTexts)("%s is %s", (unit, text) => expect(printUnit(unit)).toBe(text));
});

const shown: readonly (readonly [string, Dimension, number, string])[] = [
  ["kN, m", "length", 14, "14.0 m"],
  ["kN, m", "force", 18000, "18.0 kN"],
  ["kN, m", "moment", 127400, "127 kN·m"],
  ["kN, m", "force per length", 5200, "5.20 kN/m"],
  ["kN, m", "force per area", 235e6, "235 MPa"],
  ["kN, m", "force per area", 800, "0.800 kN/m²"],
  ["kN, m", "second moment of area", 8.36e-5, "8360 cm⁴"],
  ["kN, m", "section modulus", 5.57e-4, "557 cm³"],
  ["kN, m", "area", 5.38e-3, "53.8 cm²"],
  ["kN, m", "area", 42, "42.0 m²"],
  ["kN, m", "moment per angle", 8e6, "8000 kN·m/rad"],
  ["kN, m", "flexural rigidity", 1.75e7, "17\u202f500 kN·m²"],
  ["kN, m", "force per volume", 25000, "25.0 kN/m³"],
  ["kN, m", "angle", 0.005, "0.00500 rad"],
  ["kN, m", "force^2", 4e6, "4.00 kN²"],
  ["kN, m", "force length^-4", 4e3, "4.00 kN/m⁴"],
  ["kN, m", "length^-1", 4, "4.00 1/m"],
  ["N, mm", "moment", 1, "1000 N·mm"],
  ["N, mm", "second moment of area", 1e-6, "1\u202f000\u202f000 mm⁴"],
  ["kN, m, mm", "section modulus", 1e-6, "1000 mm³"],
  ["kip, ft", "moment", 1355.8179483314, "1.00 kip·ft"],
  ["kip, ft", "force per length", 14593.9029372064, "1.00 kip/ft"],
  ["kip, ft", "force per area", 344.73786465e6, "50.0 ksi"],
  ["kip, ft", "force per area", 957.605, "20.0 psf"],
  ["kip, ft", "second moment of area", 4.162314256e-5, "100 in⁴"],
  ["kip, in", "moment", 112.984829, "1.00 kip·in"],
  ["kip, ft", "force per volume", 23563.1, "150 lb/ft³"],
];

describe("values without a unit of their own are shown in the sheet's units", () => {
  test.each(shown)("%s: %s %d is %s", (units, dimension, si, text) => {
    expect(printValue(quantity(si, dimension), { units: displayUnits(units) })).toBe(text);
  });
});

test("showIn sets units and figures for what has none of its own", () => {
  const moment = quantity(127400, "moment");
  const written = readMeasure("14 m", "length", "L");
  showIn("kip, ft", 4);
  expect(`${moment} ${written}`).toBe("93.97 kip·ft 14.00 m");
});

const wrongUnits = ["kN", "m, kN", "kN, kN", "kN; m", "kN, m, kN", "", "stone, m"];
describe("displayUnits refuses", () => {
  test.each(wrongUnits)("%j", (text) => {
    expect(() => displayUnits(text)).toThrow(`units: "${text}" is not a force and a length, such as "kN, m"`);
  });
  test.each([0, 1, 11, 2.5, Number.NaN])("%d figures", (figures) => {
    expect(() => showIn("kN, m", figures)).toThrow("is not a number of significant figures from 2 to 10");
  });
});

const asWritten = [
  ["14 m", "14.0 m"],
  ["14.25 m", "14.25 m"],
  ["38.95 mm", "38.95 mm"],
  ["210000 MPa", "210\u202f000 MPa"],
  ["3.14159 m", "3.14159 m"],
  ["0.0004567 m", "0.0004567 m"],
] as const;

describe("printWritten drops no figure", () => {
  test.each(asWritten)("%s is %s", (text, printed) => {
    expect(printWritten(readMeasure(text, undefined, "x"))).toBe(printed);
  });
});
