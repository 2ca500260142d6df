// Each unit by its plainest spelling, with what mathjs is to read for it. "lb" is a force here, as the trade means it.
// Densities in kg/m^3 become weights with the standard gravity 9.80665 m/s² (ISO 80000-3; NIST SP 811).

import { factor } from "./convert.ts";
import type { NamedDimension } from "./dimension.ts";
import { nearest } from "./nearest.ts";

/** A unit looked up: its dimension and how many SI units (N, m, rad) it is. */
export interface Unit {
  readonly dimension: NamedDimension;
  readonly factor: number;
}

const si: Readonly<Record<NamedDimension, string>> = {
  "pure number": "rad",
  angle: "rad",
  length: "m",
  area: "m^2",
  "section modulus": "m^3",
  "second moment of area": "m^4",
  force: "N",
  "force per length": "N / m",
  "force per area": "N / m^2",
  "force per volume": "N / m^3",
  moment: "N m",
  "moment per angle": "N m / rad",
  "flexural rigidity": "N m^2",
  "temperature change": "K",
  "per temperature": "K^-1",
};

const forces: Readonly<Record<string, string>> = {
  N: "1 N",
  kN: "1 kN",
  MN: "1 MN",
  lb: "1 lbf",
  kip: "1000 lbf",
};
const metricForces = ["N", "kN", "MN"] as const;
const usForces = ["lb", "kip"] as const;
const lengths = ["m", "mm", "cm", "ft", "in"] as const;

type Row = readonly [spelling: string, dimension: NamedDimension, expression: string];

/** Every combination of the forces with a unit pattern in which "F" stands for the force. */
function each(symbols: readonly string[], patterns: readonly string[], dimension: NamedDimension): Row[] {
  return symbols.flatMap((force) =>
    patterns.map(
      (pattern): Row => [
        pattern.replace("F", force),
        dimension,
        pattern.replace("F", forces[force] ?? force),
      ],
    ),
  );
}

const rows: readonly Row[] = [
  ...lengths.map((length): Row => [length, "length", `1 ${length}`]),
  ...lengths.map((length): Row => [`${length}^2`, "area", `1 ${length}^2`]),
  ...lengths.map((length): Row => [`${length}^3`, "section modulus", `1 ${length}^3`]),
  ...lengths.map((length): Row => [`${length}^4`, "second moment of area", `1 ${length}^4`]),
  ...each(Object.keys(forces), ["F"], "force"),
  ...each(metricForces, ["F/m", "F/mm"], "force per length"),
  ...each(usForces, ["F/ft", "F/in"], "force per length"),
  ["Pa", "force per area", "1 Pa"],
  ["kPa", "force per area", "1 kPa"],
  ["MPa", "force per area", "1 MPa"],
  ["GPa", "force per area", "1 GPa"],
  ...each(metricForces, ["F/m^2", "F/mm^2"], "force per area"),
  ...each(usForces, ["F/ft^2", "F/in^2"], "force per area"),
  ...each(metricForces, ["F/m^3"], "force per volume"),
  ...each(usForces, ["F/ft^3"], "force per volume"),
  ["kg/m^3", "force per volume", "9.80665 N / m^3"],
  ...each(metricForces, ["F m", "F mm"], "moment"),
  ...each(usForces, ["F ft", "F in"], "moment"),
  ...each(metricForces, ["F m/rad", "F mm/rad"], "moment per angle"),
  ...each(usForces, ["F ft/rad", "F in/rad"], "moment per angle"),
  ...each(metricForces, ["F m^2", "F mm^2"], "flexural rigidity"),
  ...each(usForces, ["F ft^2", "F in^2"], "flexural rigidity"),
  ["K", "temperature change", "1 K"],
  ["1/K", "per temperature", "1 K^-1"],
  ["rad", "angle", "1 rad"],
  ["mrad", "angle", "1 mrad"],
  ["deg", "angle", "1 deg"],
  ["%", "pure number", "0.01 rad"],
];

const table: ReadonlyMap<string, Row> = new Map(rows.map((row) => [row[0], row]));

const shorthands: Readonly<Record<string, string>> = {
  plf: "lb/ft",
  klf: "kip/ft",
  psi: "lb/in^2",
  ksi: "kip/in^2",
  psf: "lb/ft^2",
  ksf: "kip/ft^2",
  pcf: "lb/ft^3",
  "°": "deg",
  "°C": "K",
  "1/°C": "1/K",
};

const raised: Readonly<Record<string, string>> = { "²": "^2", "³": "^3", "⁴": "^4" };

/** The plainest spelling of a unit: "k-ft" and "kip·ft" are both "kip ft", "cm⁴" is "cm^4", "ksi" is "kip/in^2". */
export function plainSpelling(unit: string): string {
  const spelled = unit
    .trim()
    .replace(/[²³⁴]/g, (figure) => raised[figure] ?? figure)
    .replace(/[·*⋅-]/g, " ")
    .replace(/\s+/g, " ")
    .replace(/\s*([/^])\s*/g, "$1")
    .replace(/^(ft|in) (lbf?|kips?|k)(?=$|\/)/, "$2 $1")
    .replace(/^(N|kN|MN)(mm?)(?=$|\/)/, "$1 $2")
    .replace(/^lbf\b/, "lb")
    .replace(/^(?:kips|k)\b/, "kip");
  return shorthands[spelled] ?? spelled;
}

/** Units by the texts they were written with. */
const cache = new Map<string, Unit>();

/** Looks a written unit up. Throws on an unknown one, naming the nearest known unit. */
export function lookUpUnit(unit: string): Unit {
  const seen = cache.get(unit);
  if (seen !== undefined) return seen;
  const row = table.get(plainSpelling(unit));
  if (row === undefined) throw new Error(unknownUnit(unit));
  const found: Unit = Object.freeze({ dimension: row[1], factor: factor(row[2], si[row[1]]) });
  cache.set(unit, found);
  return found;
}

/** Whether a text is a unit of the table. */
export function isUnit(text: string): boolean {
  return table.has(plainSpelling(text));
}

function unknownUnit(unit: string): string {
  const known = [...table.keys(), ...Object.keys(shorthands)];
  return `"${unit}" is not a unit known here; did you mean "${nearest(unit, known)}"?`;
}

/** A few units of a dimension, for messages. */
export function someUnits(dimension: NamedDimension): readonly string[] {
  if (dimension === "pure number") return ["%"];
  return rows.filter((row) => row[1] === dimension).map((row) => row[0]);
}
