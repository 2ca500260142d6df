// The whole chain on a pinned portal, in the library alone.

import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { drawSketch, type SelfStressFigure } from "../../lib/drawing/index.ts";
import { type Hand, type HingeSet, hinge, openSheet, type Sheet } from "../../lib/guide/index.ts";
import { attachHost, forgetLedger } from "../../lib/sheet/index.ts";
import type { Entry } from "../../lib/sheet/record.ts";
import { atJoint, portal, uniform } from "../../lib/structure/index.ts";
import type { Structure } from "../../lib/structure/types.ts";

const head = {
  title: "Pump house, cross frame",
  job: "P-77",
  preparedBy: "IK",
  basis: "EN 1990:2002",
  units: "kN, m",
  status: "preliminary",
};

beforeEach(() => forgetLedger());
afterEach(() => {
  attachHost();
  forgetLedger();
});

interface Started {
  readonly sheet: Sheet;
  readonly frame: Structure;
}

function started(units = "kN, m"): Started {
  const sheet = openSheet({ ...head, units });
  const L = sheet.given("L", "10 m", "span");
  const h = sheet.given("h", "5 m", "height");
  return { sheet, frame: portal({ span: L, height: h, bases: "pinned" }) };
}

function twoHinges(sheet: Sheet, frame: Structure, at: `${number} L`, key = "G"): HingeSet {
  const w = sheet.given("w", "12 kN/m", "load on the beam");
  const G = sheet.loadCase(key, "gravity", uniform("BC", w));
  return sheet.hinges(
    frame,
    [G],
    [
      hinge("BC", { from: "B", at, because: "beam about three times the columns" }),
      hinge("BC", { from: "C", at, symmetry: true, because: "symmetry of frame and load" }),
    ],
  );
}

function solved(at: `${number} L`): { readonly sheet: Sheet; readonly hand: Hand } {
  const { sheet, frame } = started();
  return { sheet, hand: sheet.freeBodies(twoHinges(sheet, frame, at)) };
}

const ofKind = <K extends Entry["kind"]>(sheet: Sheet, kind: K): readonly Extract<Entry, { kind: K }>[] =>
  sheet.entries().filter((entry): entry is Extract<Entry, { kind: K }> => entry.kind === kind);

describe("sheet.determinacy(pinned portal)", () => {
  test("is 1 by count and by rank, recorded with its count and a figure", () => {
    const { sheet, frame } = started();
    const found = sheet.determinacy(frame);
    expect(found.count).toEqual({ reactions: 4, members: 3, joints: 4, conditions: 0, degree: 1 });
    expect(found.selfStress).toBe(1);
    expect(ofKind(sheet, "finding").map(({ lines }) => lines[1])).toEqual([
      "3m + r − 3j − c = 9 + 4 − 12 − 0 = 1",
    ]);
    expect(ofKind(sheet, "figure").map(({ uses }) => uses)).toEqual([["h@1", "L@1"]]);
  });
});

describe("sheet.shape and states of self-stress", () => {
  test("the pinned portal under gravity: two points of inflection in the beam, none in the columns, labelled qualitative", () => {
    const { sheet, frame } = started();
    const G = sheet.loadCase("G", "gravity", uniform("BC", "12 kN/m"));
    const found = sheet.shape(frame, [G]);
    expect(found.label).toBe("qualitative");
    expect(found.members.map(({ member, inflections }) => [member, inflections.length])).toEqual([
      ["AB", 0],
      ["BC", 2],
      ["CD", 0],
    ]);
    const [figure] = ofKind(sheet, "figure");
    expect(figure?.caption).toContain("qualitative");
    const table = ofKind(sheet, "table").find(({ id }) => id === "probable points of inflection G");
    expect(table?.rows.map(([member]) => member)).toEqual(["BC", "BC"]);
    expect(() => sheet.shape(frame, [])).toThrow(/no load case/);
  });

  test("determinacy draws the state of self-stress when asked", () => {
    const { sheet, frame } = started();
    sheet.determinacy(frame, { selfStress: true });
    const drawn = ofKind(sheet, "figure").filter(({ spec }) => spec.kind === "self-stress");
    expect(drawn.map(({ id }) => id)).toEqual(["figure self-stress 1 of frame ABCD"]);
    expect(drawSketch(drawn[0]?.spec as SelfStressFigure, "f")).toContain("<svg");
  });
});

describe("sheet.hinges(pinned portal, gravity, two hinges in the beam)", () => {
  test("is a mechanism that balances the symmetric load only, never called stable", () => {
    const { sheet, frame } = started();
    const set = twoHinges(sheet, frame, "0.1 L");
    expect(set.determinacy.verdict).toBe("mechanism");
    const finding = ofKind(sheet, "finding").find(({ id }) => id === "hinges G");
    expect(finding?.verdict).toContain("balances the load G only");
    expect(finding?.verdict).toContain("sway: B and C move sideways together");
    expect(JSON.stringify(finding)).not.toMatch(/\bstable\b/);
  });

  test.each([
    ["snow on half the span", () => uniform("BC", "4 kN/m", { from: "0 L", to: "0.5 L" })],
    ["a force at the eave", () => atJoint("B", { right: "18 kN" })],
  ])(
    "refuses %s on the same hinges, names the sway, asks for a set of its own, and keeps the gravity set",
    (_, load) => {
      const { sheet, frame } = started();
      const set = twoHinges(sheet, frame, "0.1 L");
      const X = sheet.loadCase("X", "another case", load());
      const before = sheet.entries();
      const same = [
        hinge("BC", { from: "B", at: "0.1 L", because: "as for gravity" }),
        hinge("BC", { from: "C", at: "0.1 L", symmetry: true, because: "as for gravity" }),
      ];
      expect(() => sheet.hinges(frame, [X], same)).toThrow(
        /X with hinges h1 and h2: nothing resists sway: B and C move sideways together.* Give X a hinge set of its own/,
      );
      expect(() => sheet.hinges(frame, [...set.cases, X], same)).toThrow(/G can keep these hinges/);
      expect(sheet.entries()).toEqual(before);
      expect(sheet.freeBodies(set).reaction("A", "y").in("kN")).toBeCloseTo(60, 9);
    },
  );

  test("refuses fewer hinges than degrees, saying how many are missing and where they could go", () => {
    const { sheet } = started();
    const fixed = portal({ span: "10 m", height: "5 m", bases: "fixed" });
    const G = sheet.loadCase("G", "gravity", uniform("BC", "12 kN/m"));
    const one = [hinge("BC", { from: "B", at: "0.1 L", because: "fixed columns" })];
    expect(() => sheet.hinges(fixed, [G], one)).toThrow(
      /degree 3 and with 1 hinge still to degree 2: 2 more hinges needed, for example in AB and CD/,
    );
  });

  test("raises a query for a hinge outside the isolated-span range", () => {
    const { sheet, frame } = started();
    twoHinges(sheet, frame, "0.3 L");
    const [query] = ofKind(sheet, "query");
    expect(query?.text).toContain(
      "Hinge h1 under G, 0.300 L from B, lies outside the isolated-span range 0.000 L to 0.250 L",
    );
    expect(query?.uses).toEqual(["hinge h1 (G)@1"]);
  });

  test("asks for the reason of a hinge and for a load case", () => {
    const { sheet, frame } = started();
    expect(() => hinge("BC", { from: "B", at: "0.1 L", because: " " })).toThrow(
      /hinge in BC: the reason is missing/,
    );
    expect(() => sheet.hinges(frame, [], [])).toThrow(/hinges belong to the loads/);
    expect(() => sheet.loadCase("G 1", "x", uniform("BC", "1 kN/m"))).toThrow(/load case "G 1"/);
    expect(() => sheet.loadCase("G", "x")).toThrow(/load case G has no loads/);
  });
});

describe("sheet.freeBodies(pinned portal with two hinges)", () => {
  test("is statics: beam between the hinges, then its ends on the columns", () => {
    // w = 12 kN/m, L = 10 m, hinge at 1 m: M_B = -(w·8/2·1 + w·1²/2) = -54 kN·m; H = 54/5; A_y = wL/2.
    const { hand } = solved("0.1 L");
    expect(hand.moment("BC", { at: "B" }).in("kN m")).toBeCloseTo(-54, 9);
    expect(hand.moment("AB", { at: "B" }).in("kN m")).toBeCloseTo(-54, 9);
    expect(hand.moment("BC", { at: "0.5 L" }).in("kN m")).toBeCloseTo(150 - 54, 9);
    expect(hand.moment("BC", { at: "1 m" }).in("kN m")).toBeCloseTo(0, 9);
    expect(hand.reaction("A", "x").in("kN")).toBeCloseTo(10.8, 9);
    expect(hand.reaction("D", "x").in("kN")).toBeCloseTo(-10.8, 9);
    expect(hand.axial("AB", { at: "A" }).in("kN")).toBeCloseTo(-60, 9);
    expect(hand.shear("BC", { at: "B" }).in("kN")).toBeCloseTo(60, 9);
    const peak = hand.peakMoment("BC", "positive");
    expect([peak.moment.in("kN m"), peak.at.in("m")]).toEqual([expect.closeTo(96, 9), expect.closeTo(5, 9)]);
  });

  test.each([
    [0.5, "A. Kleinlogel, Rigid Frame Formulas, two-hinged frame: from memory"],
    [1.5, "A. Kleinlogel, Rigid Frame Formulas, two-hinged frame: from memory"],
  ])("with hinges at the true points of inflection gives -wL²/(4(2k + 3)) at the knee, k = %f (%s)", (k) => {
    const knee = (12 * 10 ** 2) / (4 * (2 * k + 3));
    const x = (10 - Math.sqrt(10 ** 2 - (8 * knee) / 12)) / 2;
    const { hand } = solved(`${x / 10} L`);
    expect(hand.moment("BC", { at: "B" }).in("kN m")).toBeCloseTo(-knee, 9);
    expect(hand.reaction("A", "x").in("kN")).toBeCloseTo(knee / 5, 9);
  });

  test("lists for every step what its equation used, and nothing the sheet does not have", () => {
    const { sheet } = solved("0.1 L");
    const known = new Set(sheet.entries().map(({ id, version }) => `${id}@${version}`));
    const steps = ofKind(sheet, "step");
    expect(steps.length).toBeGreaterThanOrEqual(8);
    for (const { id, uses } of steps) {
      expect(uses.length, id).toBeGreaterThan(0);
      expect(
        uses.filter((use) => !known.has(use)),
        id,
      ).toEqual([]);
    }
  });

  test("every recorded equation adds up from its own terms", () => {
    const { sheet } = solved("0.1 L");
    for (const { id, terms, coefficient, value } of ofKind(sheet, "step")) {
      const sum = terms.reduce(
        (total, term) => total + term.coefficient * term.value,
        coefficient * value.si,
      );
      expect(Math.abs(sum), id).toBeLessThan(1e-6);
    }
  });

  test("adds the results of several hinge sets", () => {
    const { sheet, frame } = started();
    const G = sheet.loadCase("G", "permanent", uniform("BC", "7 kN/m"));
    const S = sheet.loadCase("S", "snow", uniform("BC", "5 kN/m"));
    const pair = (at: `${number} L`) => [
      hinge("BC", { from: "B", at, because: "stiff beam" }),
      hinge("BC", { from: "C", at, symmetry: true, because: "symmetry" }),
    ];
    const apart = sheet.freeBodies(
      sheet.hinges(frame, [G], pair("0.1 L")),
      sheet.hinges(frame, [S], pair("0.1 L")),
    );
    expect(apart.moment("BC", { at: "B" }).in("kN m")).toBeCloseTo(-54, 9);
    expect(apart.reaction("A", "x").in("kN")).toBeCloseTo(10.8, 9);
    expect(apart.moment("BC", { at: "0.5 L" }).in("kN m")).toBeCloseTo(96, 9);
    expect(apart.moment("BC", { at: "B" }).from.length).toBe(2);
  });

  test("names members, joints and components there are when asked for others", () => {
    const { hand } = solved("0.1 L");
    expect(() => hand.moment("BX", { at: "B" })).toThrow(/no member "BX"; members are AB, BC, CD/);
    expect(() => hand.moment("BC", { at: "A" })).toThrow(/joint A is not an end of BC; its ends are B and C/);
    expect(() => hand.moment("BC", { at: "11 m" })).toThrow(/outside BC/);
    expect(() => hand.reaction("B", "x")).toThrow(/no support at "B"; supports are at A and D/);
    expect(() => hand.reaction("A", "moment")).toThrow(/pinned support at A has no reaction "moment"/);
  });
});

describe("sheet.reactions and sheet.diagrams", () => {
  test("reactions foot and the whole closes", () => {
    const { sheet, hand } = solved("0.1 L");
    sheet.reactions(hand);
    const table = ofKind(sheet, "table").find(({ id }) => id === "reactions G");
    const printed = table?.rows.map((row) =>
      row.map((cell) => (typeof cell === "string" ? cell : cell.value.text)),
    );
    expect(printed).toEqual([
      ["A", "10.8 kN", "60.0 kN"],
      ["D", "−10.8 kN", "60.0 kN"],
      ["sum of forces", "0.0 kN", "120.0 kN"],
    ]);
    expect(
      ofKind(sheet, "check")
        .filter(({ closure }) => closure)
        .map(({ passed }) => passed),
    ).not.toContain(false);
  });

  test("the table of internal forces has a source for every number", () => {
    const { sheet, hand } = solved("0.1 L");
    sheet.diagrams(hand, { moments: "compression side" });
    const table = ofKind(sheet, "table").find(({ id }) => id === "internal forces G");
    const cells = table?.rows.flat().filter((cell) => typeof cell !== "string") ?? [];
    expect(cells.length).toBe(21);
    expect(cells.filter(({ uses }) => uses.length === 0)).toEqual([]);
  });

  test("a word that is no side is refused", () => {
    const { sheet, hand } = solved("0.1 L");
    // @ts-expect-error the type refuses it too
    expect(() => sheet.diagrams(hand, { moments: "left" })).toThrow(/moments "left"; write "tension side"/);
  });
});

test("openSheet in kip, ft prints moments as kip·ft", () => {
  const { sheet, frame } = started("kip, ft");
  const set = twoHinges(sheet, frame, "0.1 L");
  const hand = sheet.freeBodies(set);
  // 54 kN·m / (4.4482216152605 kN · 0.3048 m) = 39.83 kip·ft; NIST SP 811, exact factors.
  expect(String(hand.moment("BC", { at: "B" }))).toBe("−39.8 kip·ft");
});
