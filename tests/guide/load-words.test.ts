import { describe, expect, test } from "vitest";
import { whereText } from "../../lib/guide/load-words.ts";
import { atJoint, pointLoad, uniform } from "../../lib/structure/index.ts";
import type { Load } from "../../lib/structure/types.ts";

const places: readonly (readonly [string, Load])[] = [
  ["BC, whole length", uniform("BC", "5 kN/m")],
  ["BC, its start to 0.500 L", uniform("BC", "5 kN/m", { from: "0 L", to: "0.5 L" })],
  ["BC, 0.500 L to its end", uniform("BC", "5 kN/m", { from: "0.5 L", to: "1 L" })],
  ["BC, 2.00 m to 4.00 m", uniform("BC", "5 kN/m", { from: "2 m", to: "4 m" })],
  ["CD, at its end", pointLoad("CD", "5 kN", { at: "1 L" })],
  ["CD, at its start", pointLoad("CD", "5 kN", { at: "0 m" })],
  ["CD, at 0.250 L", pointLoad("CD", "5 kN", { at: "0.25 L" })],
  ["joint B", atJoint("B", { right: "5 kN" })],
];

describe("whereText", () => {
  test.each(places)("%s", (words, load) => {
    expect(whereText(load)).toBe(words);
  });
});
