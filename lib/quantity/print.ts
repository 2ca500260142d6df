// Numbers as they stand on paper. Significant figures count after the decimal point only: 3 figures print 1234.5 as
// "1235", not "1230", because a reader takes printed integer figures at their word. From five integer figures on they
// are grouped by narrow spaces; the minus is the real one (−). Powers of ten appear below 0.0001 and from 10^6 on,
// there in steps of three as the trade writes them: 28.7×10⁶ N·mm.

import type { Dimension } from "./dimension.ts";
import { type DisplayUnits, shownIn, unitFor } from "./display-units.ts";
import { lookUpUnit } from "./unit-table.ts";

export interface PrintOptions {
  readonly units?: DisplayUnits;
  readonly figures?: number;
}

/** A value with its dimension and the unit it was written in, "" for none. */
export interface Printable {
  readonly dimension: Dimension;
  readonly si: number;
  readonly unit: string;
}

const narrowSpace = "\u202f";
const raisedFigures = "⁰¹²³⁴⁵⁶⁷⁸⁹";

/** A number with so many significant figures, without a unit: 12345.678 is "12 346", -5.2 is "−5.20". */
export function printNumber(value: number, figures = 3): string {
  if (!Number.isFinite(value)) throw new Error(`${value} cannot be printed: it is not a finite number`);
  const size = Math.abs(value);
  if (size !== 0 && (size < 1e-4 || size >= 1e6)) return withPower(value, figures);
  return printFixed(value, decimals(size, figures));
}

/** How many decimals so many significant figures take: none for nought, and never more than 12. */
export function decimals(size: number, figures: number): number {
  if (size === 0) return 0;
  const [, exponent] = scientific(size);
  const places = figures - 1 - exponent;
  // 9.996 with three figures is 10.0: rounding up brings one more integer figure.
  const rounded = roundedAt(size, places) >= 10 ** figures ? places - 1 : places;
  return Math.min(12, Math.max(0, rounded));
}

/** A number with so many decimals, grouped, with a real minus sign and no minus before nought. Halves go up. */
export function printFixed(value: number, places: number): string {
  const digits = String(roundedAt(Math.abs(value), places)).padStart(places + 1, "0");
  const whole = digits.slice(0, digits.length - places);
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, narrowSpace) : whole;
  const text = places === 0 ? grouped : `${grouped}.${digits.slice(-places)}`;
  return value < 0 && /[1-9]/.test(text) ? `−${text}` : text;
}

/** A size in whole units of a decimal place, from its decimal figures, so that 1.005 rounds as it reads. */
function roundedAt(size: number, places: number): number {
  const [mantissa, exponent] = scientific(size);
  return Math.round(Number(`${mantissa}e${exponent + places}`));
}

/** Mantissa and power of ten, without the last binary digits: 0.1 + 0.2 is 3 and -1. */
function scientific(value: number): readonly [mantissa: number, exponent: number] {
  const [mantissa, exponent] = Number(value.toPrecision(14)).toExponential().split("e");
  return [Number(mantissa), Number(exponent)];
}

function withPower(value: number, figures: number): string {
  const [mantissa, exponent] = scientific(value);
  const carried = roundedAt(Math.abs(mantissa), figures - 1) >= 10 ** figures;
  const [first, power] = carried ? [mantissa / 10, exponent + 1] : [mantissa, exponent];
  const beyond = power > 0 ? power % 3 : 0;
  const shown = printFixed(first * 10 ** beyond, Math.max(0, figures - 1 - beyond));
  return `${shown}×10${raise(String(power - beyond))}`;
}

function raise(digits: string): string {
  return digits.replace("-", "⁻").replace(/\d/g, (digit) => raisedFigures[Number(digit)] ?? digit);
}

/** A unit as printed: "kN m" and "kN-m" are "kN·m", "cm^4" is "cm⁴". */
export function printUnit(unit: string): string {
  return unit
    .trim()
    .replace(/^(N|kN|MN)(mm?)(?=$|\/)/, "$1 $2")
    .replace(/\^(-?\d+)/g, (_, digits: string) => raise(digits))
    .replace(/[ \-*⋅]/g, "·");
}

/** The unit a value is shown in, and how many SI units it is. */
export function shownUnit(
  value: Printable,
  units: DisplayUnits = shownIn().units,
): { readonly unit: string; readonly factor: number } {
  if (value.unit !== "") return { unit: value.unit, factor: lookUpUnit(value.unit).factor };
  return unitFor(value.dimension, value.si, units);
}

/** A value in its own unit, or in the units shown now: "5.20 kN/m", "127 kN·m", "0.125". */
export function printValue(value: Printable, options: PrintOptions = {}): string {
  const { unit, factor } = shownUnit(value, options.units);
  return attach(printNumber(value.si / factor, options.figures ?? shownIn().figures), unit);
}

/** A value as it was written: no figure dropped, up to nine, and filled up to the usual number of them. */
export function printWritten(value: Printable, options: PrintOptions = {}): string {
  const { unit, factor } = shownUnit(value, options.units);
  const size = Number((value.si / factor).toPrecision(9));
  const figures = size.toExponential().replace(/^-|\.|e.*$/g, "").length;
  return attach(printNumber(size, Math.max(figures, options.figures ?? shownIn().figures)), unit);
}

/** A printed number and its unit put together. */
export function attach(number: string, unit: string): string {
  if (unit === "") return number;
  return unit === "°" || unit === "deg" ? `${number}°` : `${number} ${printUnit(unit)}`;
}
