// How results move: hinges against the frame re-solved, unknowns against the exact solution at the ends of their ranges.

import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { statedUnknowns } from "../../lib/accuracy/index.ts";
import { drawSketch, type RangesFigure } from "../../lib/drawing/index.ts";
import { exact } from "../../lib/exact/index.ts";
import { hinge } from "../../lib/guide/index.ts";
import { valueAt } from "../../lib/results/index.ts";
import { forgetLedger } from "../../lib/sheet/index.ts";
import { beam, buildingFrame, uniform } from "../../lib/structure/index.ts";
import { ofKind, solved, started, twoHinges } from "./solved.ts";

beforeEach(() => forgetLedger());
afterEach(() => forgetLedger());

const stated = {
  "I of beam / I of columns": "1 to 4",
  "A of beam": "known",
  "A of columns": "known",
} as const;

describe("sheet.spread(pinned portal under gravity)", () => {
  const portalSpread = () => {
    const one = solved(stated);
    one.sheet.result("M_B", one.hand.moment("BC", { at: "B" }), "knee", { governing: true });
    one.sheet.result("M_m", one.hand.peakMoment("BC", "positive").moment, "midspan", { governing: true });
    one.sheet.result("V_B", one.hand.shear("BC", { at: "B" }), "shear");
    return { ...one, spread: one.sheet.spread(one.hand) };
  };

  test("moves the twin hinges together through their range, solved by statics", () => {
    const { spread } = portalSpread();
    const rows = spread.rows.filter(({ kind }) => kind === "hinge");
    // M at the knee is -w x (L - x)/2 with the hinge at x; the range of a beam free to fixed at both ends is 0 to L/4
    const knee = (x: number): number => (-12 * x * (10 - x)) / 2;
    expect(rows.map(({ result, cause }) => [result, cause])).toEqual([
      ["M_B", "hinges h1 and h2 together"],
      ["M_m", "hinges h1 and h2 together"],
    ]);
    const [M_B, M_m] = rows;
    expect(M_B?.range).toBe("0 to 0.250 L from B and C");
    expect(M_B?.least.in("kN m")).toBeCloseTo(0, 9);
    expect(M_B?.chosen.in("kN m")).toBeCloseTo(knee(1.2), 9);
    expect(M_B?.greatest.in("kN m")).toBeCloseTo(knee(2.5), 9);
    expect(M_m?.least.in("kN m")).toBeCloseTo(150, 9);
    expect(M_m?.greatest.in("kN m")).toBeCloseTo(150 + knee(2.5), 9);
  });

  test("moves each unknown from its least to its greatest, solved exactly", () => {
    const { spread, frame } = portalSpread();
    const [row] = spread.rows.filter(({ kind, result }) => kind === "unknown" && result === "M_B");
    expect(row?.cause).toBe("I of beam / I of columns");
    expect(row?.range).toBe("1 to 4");
    const { structure } = statedUnknowns(frame, stated);
    const knee = (ratio: number): number => {
      const members = structure.members.map((member) => {
        const { section, group } = member;
        if (section === undefined) throw new Error("a section is wanted");
        return group === "beams" ? { ...member, section: { ...section, I: ratio } } : member;
      });
      const sized = { ...structure, members };
      const found = exact(sized, [uniform("BC", "12 kN/m")]).members.find(({ member }) => member === "BC");
      return found === undefined ? Number.NaN : valueAt(found.M, 0);
    };
    // the columns are the measure, I = 1
    expect(structure.members[0]?.section?.I).toBe(1);
    expect((row?.least.si ?? 0) / knee(1)).toBeCloseTo(1, 9);
    expect((row?.chosen.si ?? 0) / knee(2)).toBeCloseTo(1, 9);
    expect((row?.greatest.si ?? 0) / knee(4)).toBeCloseTo(1, 9);
  });

  test("is recorded as a table with what each number stands on, and a figure with words", () => {
    const { sheet } = portalSpread();
    const table = ofKind(sheet, "table").find(({ id }) => id === "spread G");
    expect(table?.columns).toEqual([
      "result",
      "what moves",
      "through",
      "at lower end",
      "as chosen or nominal",
      "at upper end",
    ]);
    expect(table?.rows.map(([result]) => result)).toEqual(["M_B", "M_B", "M_m", "M_m"]);
    const known = new Set(sheet.entries().map(({ id, version }) => `${id}@${version}`));
    for (const cell of table?.rows.flat() ?? []) {
      if (typeof cell === "string") continue;
      expect(cell.uses.length).toBeGreaterThan(0);
      expect(cell.uses.filter((use) => !known.has(use))).toEqual([]);
    }
    const figure = ofKind(sheet, "figure").find(({ id }) => id === "figure spread G");
    const svg = drawSketch(figure?.spec as RangesFigure, "f");
    expect(svg).toContain("as chosen");
    expect(figure?.alternative).toContain("M_B as chosen −63.4 kN·m");
  });

  test("leaves out of table and figure what hardly moves a result, and says what that is", () => {
    const { sheet, hand } = solved({ "I of beam / I of columns": "1 to 4", "A of columns": "within 1.0001" });
    sheet.result("M_B", hand.moment("BC", { at: "B" }), "knee", { governing: true });
    sheet.result("N_A", hand.axial("AB", { at: "A" }), "column", { governing: true });
    const { rows } = sheet.spread(hand);
    const causes = (result: string) => rows.filter((row) => row.result === result).map(({ cause }) => cause);
    expect(causes("N_A")).toEqual(causes("M_B"));
    // N of a column of a symmetric frame is half the load whatever the stiffness: 60 kN
    for (const row of rows.filter(({ result }) => result === "N_A"))
      expect([row.least, row.chosen, row.greatest].map(({ si }) => si / -60e3)).toEqual([
        expect.closeTo(1, 9),
        expect.closeTo(1, 9),
        expect.closeTo(1, 9),
      ]);
    const words = "moved by less than 0.5 %: M_B by A of columns and A of beam; N_A by any";
    const table = ofKind(sheet, "table").find(({ id }) => id === "spread G");
    expect(table?.caption).toContain(words);
    expect(table?.rows.map(([result, cause]) => [result, cause])).toEqual([
      ["M_B", "hinges h1 and h2 together"],
      ["M_B", "I of beam / I of columns"],
    ]);
    const figure = ofKind(sheet, "figure").find(({ id }) => id === "figure spread G");
    expect(figure?.caption).toContain(words);
    const spec = figure?.spec as RangesFigure | undefined;
    expect(spec?.panels.map(({ heading, bars }) => [heading, bars.length])).toEqual([["M_B, knee", 2]]);
    expect(figure?.alternative).toContain("N_A as chosen −60.0 kN, hardly moved");
  });

  test("draws no figure where nothing moves anything", () => {
    const { sheet, hand } = solved(stated);
    sheet.spread(hand, { results: [hand.axial("AB", { at: "A" })] });
    const table = ofKind(sheet, "table").find(({ id }) => id === "spread G");
    expect(table?.rows).toEqual([]);
    expect(table?.caption).toContain("moved by less than 0.5 %: N of AB, 0 m from its start by any");
    expect(ofKind(sheet, "figure").some(({ id }) => id === "figure spread G")).toBe(false);
  });

  test("names hinges with their set as soon as the sheet has more than one", () => {
    const one = solved(stated);
    const other = one.sheet.freeBodies(twoHinges(one, "0.1 L", "S"));
    one.sheet.result("M_B", one.hand.moment("BC", { at: "B" }), "knee", { governing: true });
    one.sheet.result("M_S", other.moment("BC", { at: "B" }), "knee", { governing: true });
    const causes = [one.hand, other].map((hand) => one.sheet.spread(hand).rows[0]?.cause);
    expect(causes).toEqual(["hinges h1 and h2 together (G)", "hinges h1 and h2 together (S)"]);
  });

  test("takes the results asked for instead, by symbol or as the hand answered", () => {
    const { sheet, hand } = portalSpread();
    expect(new Set(sheet.spread(hand, { results: ["V_B"] }).rows.map(({ result }) => result))).toEqual(
      new Set(["V_B"]),
    );
    const other = sheet.spread(hand, { results: [hand.axial("AB", { at: "A" }).negated()] });
    const [row] = other.rows;
    expect(row?.result).toBe("N of AB, 0 m from its start");
    expect(row?.least.in("kN")).toBeCloseTo(60, 9);
  });

  test.each([
    [
      "nothing recorded",
      (one: ReturnType<typeof solved>) => one.sheet.spread(one.hand),
      /no governing result of G is on the sheet/,
    ],
    [
      "an unknown symbol",
      (one: ReturnType<typeof solved>) => one.sheet.spread(one.hand, { results: ["M_X"] }),
      /"M_X" is no result of G/,
    ],
    [
      "a value from elsewhere",
      (one: ReturnType<typeof solved>) =>
        one.sheet.spread(one.hand, { results: [one.sheet.given("P", "3 kN", "x")] }),
      /3\.00 kN is no result of G/,
    ],
  ])("refuses %s", (_, act, words) => {
    expect(() => act(solved(stated))).toThrow(words);
  });
});

describe("sheet.spread(other structures)", () => {
  test("a two-span beam: one hinge moves alone, onto the support and to its greatest", () => {
    const { sheet } = started();
    const two = beam({ spans: ["6 m", "6 m"] });
    const [left, right] = two.members.map(({ name }) => name);
    const middle = two.members[0]?.end ?? "";
    const G = sheet.loadCase("G", "gravity", uniform(left ?? "", "10 kN/m"), uniform(right ?? "", "10 kN/m"));
    const hand = sheet.freeBodies(
      sheet.hinges(two, [G], [hinge(left ?? "", { from: middle, at: "0.2 L", because: "first guess" })]),
    );
    sheet.result("M_1", hand.moment(left ?? "", { at: middle }), "support", { governing: true });
    const [row] = sheet.spread(hand).rows.filter(({ kind }) => kind === "hinge");
    expect(row?.cause).toBe("hinge h1");
    // hinge at x from the support of a span free to turn at its far end: M = -w L x / 2, x = 0 to L/4
    expect(row?.least.si).toBe(0);
    expect(row?.chosen.in("kN m")).toBeCloseTo(-36, 9);
    expect(row?.greatest.in("kN m")).toBeCloseTo(-45, 9);
  });

  test("a frame with many hinges: those in beams move together, and those in columns; a base hinge may reach its base", () => {
    const { sheet } = started();
    const frame = buildingFrame({ bays: ["6 m", "6 m"], storeys: ["4 m", "3.5 m"], bases: "fixed" });
    const beams = frame.members.filter(({ group }) => group === "beams").map(({ name }) => name);
    const G = sheet.loadCase("G", "gravity", ...beams.map((name) => uniform(name, "20 kN/m")));
    const set = sheet.gravity(frame, [G], { place: "0.1 L", because: "common practice" });
    const hand = sheet.freeBodies(set);
    const [base = ""] = frame.supports.map(({ joint }) => joint);
    sheet.result("M_b", hand.reaction(base, "moment"), "base", { governing: true });
    const spread = sheet.spread(hand);
    const causes = spread.rows.filter(({ kind }) => kind === "hinge").map(({ cause }) => cause);
    expect(causes.length).toBeGreaterThan(0);
    for (const cause of causes)
      expect(cause).toMatch(/^the \d+ hinges? in (beams|columns) that (has|have) a range, together$/);
    const columns = spread.rows.find(({ cause }) => cause.includes("columns"));
    expect(columns?.least.si).toBeCloseTo(0, 6);
    expect(spread.left).toEqual([]);
  });
});
