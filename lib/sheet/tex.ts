// Values as TeX, from the very texts they are printed with.

import { plainSpelling, printUnit } from "../quantity/index.ts";
import type { ShownValue } from "./record.ts";

const raised = "⁰¹²³⁴⁵⁶⁷⁸⁹";

/** A printed number as TeX: "−12 346" is -12\,346, "1.00×10⁻⁶" is 1.00 \times 10^{-6}. */
export function numberTex(printed: string): string {
  return printed
    .replace("−", "-")
    .replace(/[\u202f\u2009\u00a0]/g, "\\,")
    .replace(/×10([⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+)/, (_, power: string) => ` \\times 10^{${lowered(power)}}`);
}

function lowered(power: string): string {
  return [...power].map((figure) => (figure === "⁻" ? "-" : String(raised.indexOf(figure)))).join("");
}

/** A unit as TeX, upright: "kN m" is \mathrm{kN}{\cdot}\mathrm{m}. Shorthands such as ksi stay as they are. */
export function unitTex(unit: string): string {
  if (unit === "%") return "\\%";
  if (unit === "deg" || unit === "°") return "^{\\circ}";
  const spelled = /^[a-z]+$|°C/.test(unit) ? unit : plainSpelling(unit);
  return spelled
    .split(/([ /])/)
    .map((part) => (part === " " ? "{\\cdot}" : part === "/" ? "/" : baseTex(part)))
    .join("");
}

function baseTex(unit: string): string {
  const [base, exponent] = unit.split("^");
  const upright = /^\d+$/.test(base ?? "") ? (base ?? "") : `\\mathrm{${base}}`;
  return exponent === undefined ? upright : `${upright}^{${exponent}}`;
}

/** The number of a shown value, without its unit, as printed. */
export function printedNumber(shown: ShownValue): string {
  const tail = shown.unit === "deg" ? "°" : printUnit(shown.unit);
  return tail !== "" && shown.text.endsWith(tail) ? shown.text.slice(0, -tail.length).trimEnd() : shown.text;
}

/** A shown value as TeX: 5.20\,\mathrm{kN}/\mathrm{m}. */
export function valueTex(shown: ShownValue): string {
  const number = numberTex(printedNumber(shown));
  if (shown.unit === "") return number;
  const unit = unitTex(shown.unit);
  return unit.startsWith("^") ? `${number}${unit}` : `${number}\\,${unit}`;
}
