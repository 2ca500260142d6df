// Loads in words: how each is called in equations, printed in tables and beside figures.

import { printValue, quantity } from "../quantity/index.ts";
import type { Load, Place } from "../structure/types.ts";
import { lengthText, spanPart } from "./words.ts";

/** The symbol a load's value was given under, when it came from one: "g" for from ["g@1", ...]. */
export function loadSymbol(load: Load): string | undefined {
  const id = load.from[0]?.replace(/@\d+$/, "");
  return id !== undefined && /^[A-Za-z][A-Za-z0-9]*(_[A-Za-z0-9]+)*$/.test(id) ? id : undefined;
}

/** The symbols by which equations call the resultants of loads: Q_g, P, C of couples; with the member or joint where two would be
 *  alike (Q_w_AB), and numbered where that does not tell them apart. */
export function loadNames(loads: readonly Load[]): readonly string[] {
  const bare = loads.map((load, i) => {
    const symbol = loadSymbol(load);
    if (load.kind === "distributed") return `Q_${symbol ?? i + 1}`;
    return symbol ?? `${load.fx === 0 && load.fy === 0 ? "C" : "P"}_${i + 1}`;
  });
  const placed = bare.map((name, i) => (isAlone(bare, name) ? name : `${name}_${placeName(loads[i])}`));
  return placed.map((name, i) => (isAlone(placed, name) ? name : `${name}_${i + 1}`));
}

function isAlone(names: readonly string[], name: string): boolean {
  return names.indexOf(name) === names.lastIndexOf(name);
}

function placeName(load: Load | undefined): string {
  const name = load?.kind === "joint" ? load.joint : (load?.member ?? "");
  return name.replace(/[^A-Za-z0-9]/g, "");
}

/** A load's name as plain text with one subscript, as figures print it: Q_w,AB. */
export function plainLoadName(name: string): string {
  const [base = "", ...subscripts] = name.split("_");
  return subscripts.length === 0 ? base : `${base}_${subscripts.join(",")}`;
}

/** Beside figures: "g = 4.60 kN/m". */
export function loadTexts(loads: readonly Load[]): readonly string[] {
  return loads.map((load) => {
    const symbol = loadSymbol(load);
    return symbol === undefined ? valueText(load) : `${symbol} = ${valueText(load)}`;
  });
}

/** The value of a load as printed. */
export function valueText(load: Load): string {
  if (load.kind === "distributed") {
    const [q1, q2] = [load.q1, load.q2].map((q) => printValue(quantity(q, "force per length")));
    return q1 === q2 ? `${q1}` : `${q1} to ${q2}`;
  }
  const parts = [load.fx, load.fy]
    .filter((f) => f !== 0)
    .map((f) => printValue(quantity(Math.abs(f), "force")));
  if (load.couple !== 0) parts.push(printValue(quantity(Math.abs(load.couple), "moment")));
  return parts.join(", ");
}

/** Which way a load acts: "down", "to the right", "counter-clockwise". */
export function senseText(load: Load): string {
  if (load.kind === "distributed") return directionText(...load.direction);
  const parts: string[] = [];
  if (load.fx !== 0) parts.push(load.fx > 0 ? "to the right" : "to the left");
  if (load.fy !== 0) parts.push(load.fy > 0 ? "up" : "down");
  if (load.couple !== 0) parts.push(load.couple > 0 ? "counter-clockwise" : "clockwise");
  return parts.join(", ");
}

function directionText(x: number, y: number): string {
  if (x === 0) return y < 0 ? "down" : "up";
  if (y === 0) return x > 0 ? "to the right" : "to the left";
  return "inclined";
}

/** Where a load acts: "BC, whole length", "BC, 0.500 L to its end", "BC, at 3.20 m", "joint B". */
export function whereText(load: Load): string {
  if (load.kind === "joint") return `joint ${load.joint}`;
  if (load.kind === "member point") return `${load.member}, at ${placeText(load.at)}`;
  const whole = isFraction(load.begin, 0) && isFraction(load.end, 1);
  return `${load.member}, ${whole ? "whole length" : `${placeText(load.begin)} to ${placeText(load.end)}`}`;
}

function isFraction(place: Place, value: number): boolean {
  return "fraction" in place && place.fraction === value;
}

function placeText(place: Place): string {
  if (!("fraction" in place)) return place.metres === 0 ? "its start" : lengthText(place.metres);
  if (place.fraction === 0 || place.fraction === 1) return place.fraction === 0 ? "its start" : "its end";
  return spanPart(place.fraction);
}

/** What kind of load it is: "uniform", "linearly varying", "force", "couple". */
export function kindText(load: Load): string {
  if (load.kind === "distributed") return load.q1 === load.q2 ? "uniform" : "linearly varying";
  if (load.fx === 0 && load.fy === 0) return "couple";
  return load.couple === 0 ? "force" : "force and couple";
}
