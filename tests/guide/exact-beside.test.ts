// Hand and exact side by side, once sizes are known.

import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { forgetLedger } from "../../lib/sheet/index.ts";
import { ofKind, solved } from "./solved.ts";

beforeEach(() => forgetLedger());
afterEach(() => forgetLedger());

const sections = { columns: { E: 1, I: 1, A: "stiff" }, beams: { E: 1, I: 2, A: "stiff" } } as const;

describe("sheet.exact(hand)", () => {
  // Source: A. Kleinlogel, Rigid Frame Formulas, two-hinged frame (from memory): M_B = -w L²/(4 (2k + 3)), here k = 1: -60 kN·m
  test("puts the exact value beside each hand value, with their ratio", () => {
    const { sheet, hand } = solved(undefined, { sections });
    const rows = sheet.exact(hand);
    const knee = rows.find(({ what }) => what === "M of BC at B");
    expect(knee?.hand.in("kN m")).toBeCloseTo((-12 * 1.2 * 8.8) / 2, 9);
    expect(knee?.exact.in("kN m")).toBeCloseTo(-60, 4);
    expect(knee?.ratio).toBeCloseTo(60 / 63.36, 6);
    expect(rows.find(({ what }) => what === "reaction at A, to the right")?.exact.in("kN")).toBeCloseTo(
      12,
      5,
    );
    expect(rows.find(({ what }) => what === "M of BC, 5.00 m from B")?.exact.in("kN m")).toBeCloseTo(90, 4);
    // near zero by hand: no ratio
    expect(rows.find(({ what }) => what === "M of AB at A")?.ratio).toBeUndefined();
    expect(rows.length).toBe(3 * 6 + 1 + 4);
  });

  test("says whether the exact value lies in the band, which is that of the sizes given", () => {
    const { sheet, hand } = solved(undefined, { sections });
    const rows = sheet.exact(hand);
    expect(rows.every(({ inside }) => inside === true)).toBe(true);
    const finding = ofKind(sheet, "finding").find(({ id }) => id === "exact beside hand G");
    expect(finding?.verdict).toMatch(
      /^exact \/ hand from 0\.947 to 1\.\d+ over \d+ values; 23 of 23 exact values lie in their bands$/,
    );
  });

  test("is recorded as a table; no hand value stands on it", () => {
    const { sheet, hand } = solved(undefined, { sections });
    const before = hand.moment("BC", { at: "B" }).from;
    sheet.exact(hand);
    const table = ofKind(sheet, "table").find(({ id }) => id === "exact G");
    expect(table?.columns).toEqual(["result", "by hand", "exact", "exact / hand", "in the band"]);
    const row = table?.rows.find(([what]) => what === "M of BC at B");
    expect(row?.[3]).toBe("0.947");
    expect(row?.[4]).toBe("inside");
    expect(typeof row?.[1] === "string" ? undefined : row?.[1]?.band).toBeDefined();
    expect(hand.moment("BC", { at: "B" }).from).toEqual(before);
    const steps = ofKind(sheet, "step");
    expect(steps.flatMap(({ uses }) => uses).filter((use) => use.startsWith("exact"))).toEqual([]);
  });

  test("needs a section of every member, and says which have none and what to give", () => {
    const { sheet, hand } = solved();
    expect(() => sheet.exact(hand)).toThrow(
      /exact: members AB, BC and CD have no section; give A, I and E of every member.*withSections/,
    );
  });
});
