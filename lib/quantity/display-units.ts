// In which units a calculation shows its results, written "kN, m", "kip, ft", "N, mm" or, with a unit for sections,
// "kN, m, mm". Stresses come in MPa or ksi, section properties in the section unit (cm, or in).

import { type Dimension, exponentsOf, isNamedDimension, type NamedDimension } from "./dimension.ts";
import { isUnit, lookUpUnit, plainSpelling } from "./unit-table.ts";

/** The units results are shown in. */
export interface DisplayUnits {
  readonly text: string;
  readonly force: string;
  readonly length: string;
  readonly section: string;
}

/** Reads "force, length" or "force, length, section length". Throws on anything else, saying what would be right. */
export function displayUnits(text: string): DisplayUnits {
  const parts = String(text).split(/\s*,\s*/);
  const [force = "", length = "", section] = parts.map((part) => (isUnit(part) ? plainSpelling(part) : ""));
  const right =
    (parts.length === 2 || parts.length === 3) &&
    is(force, "force") &&
    is(length, "length") &&
    (section === undefined || is(section, "length"));
  if (!right) {
    throw new Error(`units: "${text}" is not a force and a length, such as "kN, m", "N, mm" or "kip, ft"`);
  }
  return Object.freeze({ text, force, length, section: section ?? sectionUnit(length) });
}

function is(unit: string, dimension: NamedDimension): boolean {
  return unit !== "" && lookUpUnit(unit).dimension === dimension;
}

function sectionUnit(length: string): string {
  if (length === "ft" || length === "in") return "in";
  return length === "mm" ? "mm" : "cm";
}

/** The unit, plainly spelled, and its size in SI units, for a value of a dimension; "" and 1 for a pure number. */
export function unitFor(
  dimension: Dimension,
  si: number,
  units: DisplayUnits,
): { readonly unit: string; readonly factor: number } {
  if (!isNamedDimension(dimension)) return composedUnit(dimension, units);
  const unit = namedUnit(dimension, si, units);
  return { unit, factor: unit === "" ? 1 : lookUpUnit(unit).factor };
}

function namedUnit(dimension: NamedDimension, si: number, { force, length, section }: DisplayUnits): string {
  const us = section === "in" || section === "ft";
  switch (dimension) {
    case "pure number":
      return "";
    case "angle":
      return "rad";
    case "length":
      return length;
    case "area":
      // Floor and roof areas in the length unit, member sections in the section unit.
      return `${Math.abs(si) >= 0.5 ? length : section}^2`;
    case "section modulus":
      return `${section}^3`;
    case "second moment of area":
      return `${section}^4`;
    case "force":
      return force;
    case "force per length":
      return known(`${force}/${length}`, us ? "kip/ft" : "kN/m");
    case "force per area":
      // Member stresses in MPa or ksi, pressures on surfaces in kN/m² or psf.
      if (Math.abs(si) < 1e5 && si !== 0) return us ? "psf" : "kN/m^2";
      return us ? "ksi" : "MPa";
    case "force per volume":
      return us ? "lb/ft^3" : "kN/m^3";
    case "moment":
      return known(`${force} ${length}`, us ? "kip ft" : "kN m");
    case "moment per angle":
      return known(`${force} ${length}/rad`, us ? "kip ft/rad" : "kN m/rad");
    case "flexural rigidity":
      return known(`${force} ${length}^2`, us ? "kip ft^2" : "kN m^2");
    case "temperature change":
      return "K";
    case "per temperature":
      return "1/K";
  }
}

function known(unit: string, otherwise: string): string {
  return isUnit(unit) ? unit : otherwise;
}

function composedUnit(dimension: Dimension, units: DisplayUnits): { unit: string; factor: number } {
  const [f, l, t] = exponentsOf(dimension);
  const written = (sign: 1 | -1): string[] =>
    [raise(units.force, sign * f), raise(units.length, sign * l), raise("K", sign * t)].filter(
      (part) => part !== "",
    );
  const unit = [written(1).join(" ") || "1", ...written(-1)].join("/");
  return { unit, factor: lookUpUnit(units.force).factor ** f * lookUpUnit(units.length).factor ** l };
}

function raise(base: string, exponent: number): string {
  if (exponent <= 0) return "";
  return exponent === 1 ? base : `${base}^${exponent}`;
}

let shown: DisplayUnits = displayUnits("kN, m");
let shownFigures = 3;

/** The units and significant figures in which values without a unit of their own are printed now. */
export function shownIn(): { readonly units: DisplayUnits; readonly figures: number } {
  return { units: shown, figures: shownFigures };
}

/** Sets the units ("kip, ft") and significant figures values are printed in; a sheet does this when it is opened. */
export function showIn(units: string, figures = 3): void {
  if (!Number.isInteger(figures) || figures < 2 || figures > 10) {
    throw new Error(`figures: ${figures} is not a number of significant figures from 2 to 10`);
  }
  shown = displayUnits(units);
  shownFigures = figures;
}
