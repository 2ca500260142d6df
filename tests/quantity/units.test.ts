import { describe, expect, test } from "vitest";
import {
  type AnyUnit,
  lookUpUnit,
  type NamedDimension,
  plainSpelling,
  readMeasure,
} from "../../lib/quantity/index.ts";

// Conversion factors to SI: NIST Special Publication 811 (2008), appendix B.8, from memory; half the last printed digit.
// A "kip" there is 1000 pound-force. Each row: unit, the figure printed, the power of ten printed.
const published: readonly (readonly [AnyUnit, string, number])[] = [
  ["lbf", "4.448222", 0],
  ["kip", "4.448222", 3],
  ["lb/ft", "1.459390", 1],
  ["lb/in", "1.751268", 2],
  ["psi", "6.894757", 3],
  ["ksi", "6.894757", 6],
  ["psf", "4.788026", 1],
  ["lb ft", "1.355818", 0],
  ["lb in", "1.129848", -1],
  ["in^3", "1.638706", -5],
  ["in^4", "4.162314", -7],
  ["ft^3", "2.831685", -2],
  ["ft^4", "8.630975", -3],
  ["deg", "1.745329", -2],
];

describe("lookUpUnit agrees with the published factors", () => {
  test.each(published)("%s is %s E%i", (unit, figure, power) => {
    const half = 0.5 * 10 ** (power - (figure.split(".")[1]?.length ?? 0));
    expect(Math.abs(lookUpUnit(unit).factor - Number(figure) * 10 ** power)).toBeLessThanOrEqual(
      half * 1.000001,
    );
  });
  test("14 factors are compared", () => expect(published).toHaveLength(14));
});

// Exact by definition: the international foot and inch (1959), pound 0.453 592 37 kg, standard gravity 9.806 65 m/s²
// (CGPM 1901), hence the pound-force 4.448 221 615 260 5 N.
const exact: readonly (readonly [AnyUnit, number])[] = [
  ["in", 0.0254],
  ["ft", 0.3048],
  ["lbf", 4.4482216152605],
  ["lb", 0.45359237 * 9.80665],
  ["kip", 4448.2216152605],
  ["k", 4448.2216152605],
  ["kips", 4448.2216152605],
  ["klf", 4448.2216152605 / 0.3048],
  ["plf", 4.4482216152605 / 0.3048],
  ["ksf", 4448.2216152605 / 0.3048 ** 2],
  ["kip-ft", 4448.2216152605 * 0.3048],
  ["kip in^2", 4448.2216152605 * 0.0254 ** 2],
  ["ft^2", 0.09290304],
  ["kg/m^3", 9.80665],
  ["pcf", 4.4482216152605 / 0.3048 ** 3],
  ["N/mm^2", 1e6],
  ["kN/m²", 1e3],
  ["GPa", 1e9],
  ["cm⁴", 1e-8],
  ["N mm^2", 1e-6],
  ["kN m/rad", 1e3],
  ["mrad", 1e-3],
  ["°", Math.PI / 180],
  ["%", 0.01],
  ["K", 1],
  ["°C", 1],
  ["1/K", 1],
  ["1/°C", 1],
];

describe("lookUpUnit agrees with the definitions", () => {
  test.each(exact)("%s is %d", (unit, factor) => {
    expect(lookUpUnit(unit).factor / factor).toBeCloseTo(1, 14);
  });
});

test("a pound per cubic foot weighs what 16.01846 kg/m³ weigh", () => {
  // NIST SP 811 appendix B.8, from memory: 1 lb/ft³ is 1.601846 E+01 kg/m³.
  expect(lookUpUnit("pcf").factor / lookUpUnit("kg/m^3").factor).toBeCloseTo(16.01846, 5);
});

const spellings: readonly (readonly [AnyUnit, string, NamedDimension])[] = [
  ["kN m", "kN m", "moment"],
  ["kN·m", "kN m", "moment"],
  ["kNm", "kN m", "moment"],
  ["Nmm", "N mm", "moment"],
  ["MN m", "MN m", "moment"],
  ["kip ft", "kip ft", "moment"],
  ["kip-ft", "kip ft", "moment"],
  ["kip·ft", "kip ft", "moment"],
  ["k-ft", "kip ft", "moment"],
  ["k in", "kip in", "moment"],
  ["ft-kip", "kip ft", "moment"],
  ["ft-lb", "lb ft", "moment"],
  ["in-k", "kip in", "moment"],
  ["lbf ft", "lb ft", "moment"],
  ["k ft/rad", "kip ft/rad", "moment per angle"],
  ["kip-in/rad", "kip in/rad", "moment per angle"],
  ["kN·m/rad", "kN m/rad", "moment per angle"],
  ["k/ft", "kip/ft", "force per length"],
  ["klf", "kip/ft", "force per length"],
  ["MN/m", "MN/m", "force per length"],
  ["kN/mm²", "kN/mm^2", "force per area"],
  ["k/in²", "kip/in^2", "force per area"],
  ["N/m³", "N/m^3", "force per volume"],
  ["mm³", "mm^3", "section modulus"],
  ["in⁴", "in^4", "second moment of area"],
  ["cm²", "cm^2", "area"],
  ["kip ft²", "kip ft^2", "flexural rigidity"],
  ["MN·m²", "MN m^2", "flexural rigidity"],
  ["°", "deg", "angle"],
  ["°C", "K", "temperature change"],
  ["1/°C", "1/K", "per temperature"],
];

describe("plainSpelling", () => {
  test.each(spellings)("%s is %s, a %s", (unit, plain, dimension) => {
    expect(plainSpelling(unit)).toBe(plain);
    expect(lookUpUnit(unit).dimension).toBe(dimension);
  });
});

const unknown: readonly (readonly [string, string])[] = [
  ["kNn", "kN"],
  ["kn", "kN"],
  ["metre", "m"],
  ["kip/feet", "kip/ft"],
  ["KSI", "ksi"],
  ["kNm/m", "kN/m"],
];

describe("an unknown unit names the nearest known one", () => {
  test.each(unknown)("%s: %s", (unit, nearest) => {
    expect(() => readMeasure(`5 ${unit}`, "force", "H")).toThrow(
      `H: "5 ${unit}": "${unit}" is not a unit known here; did you mean "${nearest}"?`,
    );
  });
});
