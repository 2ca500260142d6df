// What the verbs refuse, and the words they do it in.

import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { hinge, openSheet, type Sheet } from "../../lib/guide/index.ts";
import { attachHost, forgetLedger } from "../../lib/sheet/index.ts";
import { atJoint, beam, pointLoad, portal, uniform } from "../../lib/structure/index.ts";
import type { Load, Structure } from "../../lib/structure/types.ts";

beforeEach(() => forgetLedger());
afterEach(() => {
  attachHost();
  forgetLedger();
});

const open = (): Sheet =>
  openSheet({
    title: "Boat store, portal on line 3",
    job: "S-12",
    preparedBy: "IK",
    basis: "EN 1990:2002",
    units: "kN, m",
    status: "preliminary",
  });
const pinned = (): Structure => portal({ span: "12 m", height: "5 m", bases: "pinned" });
const one = (at: `${number} L` = "0.1 L") => hinge("BC", { from: "B", at, because: "like halls" });

function started() {
  const sheet = open();
  const frame = pinned();
  const G = sheet.loadCase("G", "permanent", uniform("BC", "6 kN/m"));
  const S = sheet.loadCase("S", "snow", uniform("BC", "4 kN/m"));
  return { sheet, frame, G, S };
}

describe("sheet.freeBodies refuses a load case that would count twice", () => {
  test.each([
    ["the same set again", ["G", "G"], /load case G comes twice, in hinge set G;/],
    ["an alternative for the same case", ["G", "other"], /in hinge set G and again in G, nearer/],
    [
      "a set of both beside one of either",
      ["G + S", "S"],
      /load case S comes in hinge set G \+ S and again in S/,
    ],
  ] as const)("%s", (_, which, words) => {
    const { sheet, frame, G, S } = started();
    const sets = {
      G: sheet.hinges(frame, [G], [one()]),
      other: sheet.hinges(frame, [G], [one("0.2 L")], { name: "G, nearer" }),
      S: sheet.hinges(frame, [S], [one()]),
      "G + S": sheet.hinges(frame, [G, S], [one()]),
    };
    const before = sheet.entries();
    const [a, b] = which.map((name) => sets[name]);
    if (a === undefined || b === undefined) throw new Error("two sets are wanted");
    expect(() => sheet.freeBodies(a, b)).toThrow(words);
    expect(() => sheet.freeBodies(a, b)).toThrow(/would count twice.*sheet\.beside\(chosen, other\)/);
    expect(sheet.entries()).toEqual(before);
    expect(sheet.freeBodies(sets.G, sets.S).reaction("A", "y").in("kN")).toBeCloseTo(60, 9);
  });

  test("a case named twice in one set is refused where the set is made", () => {
    const { sheet, frame, G } = started();
    expect(() => sheet.hinges(frame, [G, G], [one()])).toThrow(
      "hinges: load case G is given twice; name it once",
    );
  });
});

describe("sheet.loadCase refuses a key that is taken", () => {
  const run = (sheet: Sheet, number: number, q: `${number} kN/m`): void => {
    attachHost({ overrides: new Map(), cell: { number, id: `c${number}` } });
    sheet.loadCase("G", "permanent", uniform("BC", q));
    sheet.endCell(`c${number}`);
  };

  test("by another cell, while the same cell may run again", () => {
    const sheet = open();
    run(sheet, 3, "6 kN/m");
    run(sheet, 3, "7 kN/m");
    expect(() => run(sheet, 5, "6 kN/m")).toThrow(
      "load case G is defined in cell 3 and again in cell 5; give one of them another key",
    );
    expect(sheet.entries().map(({ id, version }) => `${id}@${version}`)).toEqual(["load case G@2"]);
  });

  test("twice in one cell", () => {
    const sheet = open();
    attachHost({ overrides: new Map(), cell: { number: 2, id: "c2" } });
    sheet.loadCase("G", "permanent", uniform("BC", "6 kN/m"));
    expect(() => sheet.loadCase("G", "again", uniform("BC", "6 kN/m"))).toThrow(
      "load case G is defined twice in cell 2; give one of them another key",
    );
  });
});

describe("verbs say what was given and what is wanted", () => {
  test.each<[string, (on: ReturnType<typeof started>) => unknown, string]>([
    [
      "freeBodies(load case)",
      ({ sheet, G }) => sheet.freeBodies(G as never),
      "freeBodies: load case G is given; hinge sets are wanted, what sheet.hinges or sheet.gravity answered: sheet.freeBodies(set)",
    ],
    [
      "freeBodies([set])",
      ({ sheet, frame, G }) => sheet.freeBodies([sheet.hinges(frame, [G], [one()])] as never),
      "freeBodies: [hinge set G] is given; hinge sets are wanted",
    ],
    [
      "beside(structure)",
      ({ sheet, frame }) => sheet.beside(frame as never),
      "beside: frame ABCD is given; hinge sets are wanted",
    ],
    [
      "reactions(structure)",
      ({ sheet, frame }) => sheet.reactions(frame as never),
      "reactions: frame ABCD is given; hand results are wanted, what sheet.freeBodies answered: sheet.reactions(hand)",
    ],
    [
      "diagrams(hinge set)",
      ({ sheet, frame, G }) => sheet.diagrams(sheet.hinges(frame, [G], [one()]) as never),
      "diagrams: hinge set G is given; hand results are wanted",
    ],
    ["spread()", ({ sheet }) => sheet.spread(undefined as never), "spread: nothing is given; hand results"],
    ["exact(text)", ({ sheet }) => sheet.exact("G" as never), 'exact: "G" is given; hand results'],
    [
      "determinacy(load)",
      ({ sheet }) => sheet.determinacy(uniform("BC", "5 kN/m") as never),
      "determinacy: a load (5 kN/m) is given; a structure is wanted",
    ],
    [
      "hinges with the case not in a list",
      ({ sheet, frame, G }) => sheet.hinges(frame, G as never, [one()]),
      "hinges: load case G is given; a list of load cases is wanted",
    ],
    [
      "hinges with a load in the list",
      ({ sheet, frame }) => sheet.hinges(frame, [uniform("BC", "5 kN/m")] as never, [one()]),
      "hinges: a load (5 kN/m) is given; a list of load cases is wanted",
    ],
    [
      "hinges with one hinge not in a list",
      ({ sheet, frame, G }) => sheet.hinges(frame, [G], one() as never),
      "hinges: a hinge in BC is given; a list of hinges is wanted",
    ],
    [
      "gravity with the arguments turned round",
      ({ sheet, frame, G }) => sheet.gravity([G] as never, frame as never, {} as never),
      "gravity: [load case G] is given; a structure is wanted",
    ],
    [
      "loadCase with loads in a list",
      ({ sheet }) => sheet.loadCase("W", "wind", [atJoint("B", { right: "3 kN" })] as never),
      "load case W: [a load (3 kN)] is given; loads are wanted one after another",
    ],
  ])("%s", (_, call, words) => {
    const on = started();
    expect(() => call(on)).toThrow(words);
  });
});

describe("a load that does not fit is named with its load case, load and member", () => {
  test.each<[string, Load, string]>([
    [
      "beyond the member",
      pointLoad("BC", "9 kN", { at: "15 m" }),
      "load case W, load 2 (9 kN) is at 15 m on member BC, outside it; from 0 to 12 m is wanted",
    ],
    [
      "on no member",
      uniform("BX", "9 kN/m"),
      'load case W, load 2 (9 kN/m) is on member "BX", which is not defined; members are AB, BC, CD',
    ],
  ])("%s", (_, load, words) => {
    const { sheet, frame } = started();
    const W = sheet.loadCase("W", "wind", uniform("BC", "1 kN/m"), load);
    expect(() => sheet.hinges(frame, [W], [one()])).toThrow(words);
    expect(() => sheet.gravity(frame, [W], { place: "0.1 L", because: "x" })).toThrow(words);
    expect(() => sheet.shape(frame, [W])).toThrow(words);
  });
});

describe("sheet.hinges says why hinges beyond the degree do not hold", () => {
  const twins = (b: `${number} L`, c: `${number} L`) => [
    hinge("BC", { from: "B", at: b, because: "like halls" }),
    hinge("BC", { from: "C", at: c, symmetry: true, because: "its twin" }),
  ];
  const half = uniform("BC", "6 kN/m", { from: "0 L", to: "0.5 L" });

  test("a load on half the beam", () => {
    const { sheet, frame } = started();
    const H = sheet.loadCase("H", "half", half);
    expect(() => sheet.hinges(frame, [H], twins("0.1 L", "0.1 L"))).toThrow(
      /H with hinges h1 and h2: nothing resists sway.*; symmetry is given as a reason, but the load on BC is not alike from both its ends\. Give H a hinge set of its own, with no more than 1 hinge, the degree of the structure/,
    );
  });

  test("unequal columns", () => {
    const { sheet, G } = started();
    const uneven = portal({
      span: "12 m",
      height: { left: "5 m", right: "4 m" },
      rightBase: "1 m",
      bases: "pinned",
    });
    expect(() => sheet.hinges(uneven, [G], twins("0.1 L", "0.1 L"))).toThrow(
      /symmetry is given as a reason, but .* joint A has no mirror image; joint D has no mirror image/,
    );
  });

  test("unequal places", () => {
    const { sheet, frame, G } = started();
    expect(() => sheet.hinges(frame, [G], twins("0.1 L", "0.2 L"))).toThrow(
      /symmetry is given as a reason, but .* hinge h1 in BC has no mirror image in BC; hinge h2 in BC has no mirror image/,
    );
  });

  test("three hinges where the degree is one", () => {
    const { sheet, frame, G } = started();
    const middle = hinge("BC", { from: "B", at: "0.5 L", because: "a try" });
    expect(() => sheet.hinges(frame, [G], [...twins("0.1 L", "0.1 L"), middle])).toThrow(
      /3 hinges in a structure indeterminate to degree 1, 1 beyond the degree.*Drop 1 hinge/,
    );
    const none = [one(), hinge("BC", { from: "C", at: "0.1 L", because: "a try" }), middle];
    expect(() => sheet.hinges(frame, [G], none)).toThrow(/3 hinges .*, 2 beyond the degree.*Drop 2 hinges/);
  });
});

describe("by relative stiffness beside an overhang", () => {
  // Three-moment equation (B. P. E. Clapeyron 1857, from memory): 2 M_B (L1 + L2) + M_C L2 = -w (L1³ + L2³)/4, M_C = -2 P
  test.each([
    [1, "1 kN"],
    [60, "60 kN"],
  ] as const)("a tip load of %d kN moves the hinge of the first span, and M_B with it", (P, text) => {
    const sheet = open();
    const q = sheet.given("q", "10 kN/m", "floor");
    const tip = sheet.given("P", text, "at the tip");
    const frame = beam({ spans: ["8 m", "6 m", "2 m"], supports: ["pinned", "roller", "roller", "free"] });
    const at = { at: "1 L" } as const;
    const G = sheet.loadCase("G", "floor", uniform("AB", q), uniform("BC", q), pointLoad("CD", tip, at));
    const set = sheet.hinges(
      frame,
      [G],
      [hinge("AB", { from: "B", by: "relative stiffness", because: "one section" })],
    );
    const M_B = (-(10 * (8 ** 3 + 6 ** 3)) / 4 + 6 * 2 * P) / (2 * (8 + 6));
    expect(sheet.freeBodies(set).moment("AB", { at: "B" }).in("kN m")).toBeCloseTo(M_B, 6);
    const said = sheet.entry("hinge h1 (G)");
    expect(said?.kind === "assumption" ? said.text : "").toContain(
      "EI/L of AB, BC as 1 : 1.33; overhang CD: no stiffness, the moment known by statics",
    );
    expect(said?.uses).toContain("P@1");
    expect(sheet.freeBodies(set).moment("CD", { at: "C" }).in("kN m")).toBeCloseTo(-2 * P, 9);
  });

  test("the range of a hinge in the span beside it stands on what hangs there", () => {
    const sheet = open();
    const tip = sheet.given("P", "12 kN", "at the tip");
    const frame = beam({ spans: ["8 m", "6 m", "2 m"], supports: ["pinned", "roller", "roller", "free"] });
    const G = sheet.loadCase("G", "floor", uniform("BC", "10 kN/m"), atJoint("D", { down: tip }));
    sheet.hinges(frame, [G], [hinge("BC", { from: "B", at: "0.2 L", because: "a try" })]);
    expect(sheet.entry("hinge ranges G")?.uses).toContain("P@1");
    sheet.hinges(frame, [G], [hinge("BC", { from: "B", fixity: { near: 0.8, far: 1 }, because: "a try" })], {
      name: "G, by restraint",
    });
    const said = sheet.entry("hinge h1 (G, by restraint)");
    expect(said?.kind === "assumption" ? said.text : "").toContain("the moment at C known by statics");
    expect(said?.uses).toContain("P@1");
  });
});

describe("sheet.unknowns says which number will not do", () => {
  const stating = (stated: (r: ReturnType<Sheet["assume"]>) => object, r: number) => {
    const { sheet, frame } = started();
    const known = sheet.assume("r_I", r, "a first guess");
    return () => sheet.unknowns(frame, stated(known as never) as never, { because: "sizes are open" });
  };
  const key = "I of beam / I of columns";

  test.each<[string, () => unknown, string]>([
    [
      "a ratio below nought",
      stating((r) => ({ [key]: { about: r, within: 2 } }), -1),
      `unknowns: "${key}" is stated by −1.00 (r_I); a number more than zero is wanted`,
    ],
    [
      "a ratio of nought",
      stating((r) => ({ [key]: [r, 4] }), 0),
      `unknowns: "${key}" is stated by 0 (r_I); a number more than zero is wanted`,
    ],
    ["a fixity above 1", stating((r) => ({ bases: [0, r] }), 1.5), 'unknowns: "bases" is stated by 1.5'],
    [
      "two numbers upside down",
      stating((r) => ({ [key]: [r, 1] }), 4),
      `"${key}" is stated as 4 to 1; wanted: numbers more than zero, of two the smaller first`,
    ],
  ])("%s", (_, call, words) => {
    expect(call).toThrow(words);
  });

  test("a fixity of nought, pinned, is none of these", () => {
    expect(stating((r) => ({ bases: [r, 0.5] }), 0)()).toHaveLength(4);
  });
});
