// Three ways to place a hinge, hinges beyond the degree, several sets for one case.

import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { type HingeSet, hinge, openSheet, type Sheet } from "../../lib/guide/index.ts";
import { kneeHinge } from "../../lib/inflection/index.ts";
import { quantity } from "../../lib/quantity/index.ts";
import { attachHost, forgetLedger } from "../../lib/sheet/index.ts";
import type { Entry } from "../../lib/sheet/record.ts";
import { atJoint, beam, buildingFrame, portal, uniform, withSections } from "../../lib/structure/index.ts";
import type { Load, Structure } from "../../lib/structure/types.ts";

const head = {
  title: "Seed store, frame on line 2",
  job: "S-9",
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

const ofKind = <K extends Entry["kind"]>(sheet: Sheet, kind: K): readonly Extract<Entry, { kind: K }>[] =>
  sheet.entries().filter((entry): entry is Extract<Entry, { kind: K }> => entry.kind === kind);

const open = (): Sheet => openSheet(head);
const pinned = (): Structure => portal({ span: "12 m", height: "5 m", bases: "pinned" });
const places = ({ hinged }: HingeSet): readonly (readonly [string, number])[] =>
  hinged.hinges.map(({ member, at }) => [member, at] as const);
const textOf = (sheet: Sheet, id: string): string => {
  const entry = sheet.entry(id);
  return entry?.kind === "assumption" ? entry.text : "";
};

describe("hinge", () => {
  test.each([
    ["no place", { from: "B", because: "x" }, /no place is given; give one of at: "0.1 L"/],
    [
      "two places",
      { from: "B", at: "0.1 L", by: "relative stiffness", because: "x" },
      /in more than one way/,
    ],
    ["another method", { from: "B", by: "eye", because: "x" }, /by "eye"; write by: "relative stiffness"/],
    [
      "ratios alone",
      { from: "B", at: "0.1 L", ratios: { "I of BC": 2 }, because: "x" },
      /matter only with by/,
    ],
    ["no reason", { from: "B", at: "0.1 L", because: "" }, /the reason is missing/],
  ] as const)("refuses %s", (_, choice, words) => {
    expect(() => hinge("BC", choice as never)).toThrow(words);
  });
});

describe("sheet.hinges, places", () => {
  test("common practice is 0.1 L and says so", () => {
    const sheet = open();
    const G = sheet.loadCase("G", "gravity", uniform("BC", "10 kN/m"));
    const set = sheet.hinges(
      pinned(),
      [G],
      [hinge("BC", { from: "C", at: "common practice", because: "habit" })],
    );
    expect(places(set)).toEqual([["BC", expect.closeTo(10.8, 9)]]);
    expect(textOf(sheet, "hinge h1 (G)")).toBe(
      "Under G the moment is zero at h1, in BC, 1.20 m from C (0.100 L), common practice: 0.1 L",
    );
  });

  test("end fixity puts it where the isolated span has it: fully held 0.211 L, and what the fixities came from is used", () => {
    const sheet = open();
    const G = sheet.loadCase("G", "gravity", uniform("BC", "10 kN/m"));
    const r = sheet.assume("r_B", 1, "a heavy column");
    const set = sheet.hinges(
      pinned(),
      [G],
      [
        hinge("BC", {
          from: "B",
          fixity: { near: r, far: 1 },
          because: "columns much stiffer than the beam",
        }),
      ],
    );
    expect(places(set)[0]?.[1]).toBeCloseTo(12 * 0.211325, 4); // 1/2 - √3/6, fixed ends under a uniform load
    expect(textOf(sheet, "hinge h1 (G)")).toContain("end fixities 1 at B and 1 at the far end");
    expect(sheet.entry("hinge h1 (G)")?.uses).toContain("r_B@1");
  });

  test("relative stiffness by a ratio of the sheet: formula, ratio and place stand in the assumption", () => {
    const sheet = open();
    const w = sheet.given("w", "10 kN/m", "roof");
    const G = sheet.loadCase("G", "gravity", uniform("BC", w));
    const r = sheet.assume("r_I", 2.4, "two similar frames");
    const ratios = { "I of beam / I of columns": r };
    const set = sheet.hinges(
      pinned(),
      [G],
      [hinge("BC", { from: "B", by: "relative stiffness", ratios, because: "ratio of like frames" })],
    );
    expect(places(set)[0]?.[1]).toBeCloseTo(12 * kneeHinge((2.4 * 5) / 12, "pinned"), 9); // k = 1
    expect(textOf(sheet, "hinge h1 (G)")).toMatch(
      /1\.35 m from B \(0\.113 L\), by relative stiffness \(I of beam \/ I of columns = 2\.4\), k = .* = 1: M = FEM m\/\(m \+ 2k\) = 0\.6 FEM/,
    );
    expect(sheet.entry("hinge h1 (G)")?.uses).toEqual(expect.arrayContaining(["r_I@1", "w@1"]));
  });

  test("relative stiffness by sections gives the same, and without either it says what to give", () => {
    const sheet = open();
    const G = sheet.loadCase("G", "gravity", uniform("BC", "10 kN/m"));
    const sized = withSections(pinned(), {
      columns: { E: "210 GPa", I: "5000 cm^4", A: "60 cm^2" },
      beams: { E: "210 GPa", I: "12000 cm^4", A: "80 cm^2" },
    });
    const choice = hinge("BC", { from: "B", by: "relative stiffness", because: "sizes known" });
    expect(places(sheet.hinges(sized, [G], [choice]))[0]?.[1]).toBeCloseTo(12 * kneeHinge(1, "pinned"), 9);
    expect(() => sheet.hinges(pinned(), [G], [choice])).toThrow(
      /no sections \(AB, BC, CD\); give ratios: \{ "I of beams \/ I of columns": 2\.5 \}/,
    );
  });

  test("a load changed leaves a hinge by distance where it is and asks, and moves one by relative stiffness", () => {
    const placedUnder = (load: Load): { readonly at: number; readonly asked: number } => {
      forgetLedger();
      const sheet = open();
      const G = sheet.loadCase("G", "gravity", uniform("AB", "10 kN/m"), load);
      const girder = beam({ spans: ["8 m", "8 m"] });
      const set = sheet.hinges(
        girder,
        [G],
        [hinge("AB", { from: "B", by: "relative stiffness", because: "one section" })],
      );
      return { at: 8 - (places(set)[0]?.[1] ?? 0), asked: ofKind(sheet, "query").length };
    };
    expect(placedUnder(uniform("BC", "10 kN/m"))).toEqual({ at: expect.closeTo(2, 9), asked: 0 });
    // the neighbour twice as heavy: (1 + 2)/2/4 = 0.375 L, beyond the 0.25 L of the isolated span
    const heavy = placedUnder(uniform("BC", "20 kN/m"));
    expect(heavy).toEqual({ at: expect.closeTo(3, 9), asked: 1 });
  });

  test("the query says that neighbours can push the point outside", () => {
    const sheet = open();
    const G = sheet.loadCase("G", "gravity", uniform("AB", "10 kN/m"), uniform("BC", "20 kN/m"));
    const choice = hinge("AB", { from: "B", by: "relative stiffness", because: "one section" });
    sheet.hinges(beam({ spans: ["8 m", "8 m"] }), [G], [choice]);
    expect(ofKind(sheet, "query")[0]?.text).toMatch(
      /0\.375 L from B, lies outside the isolated-span range 0\.000 L to 0\.250 L of AB under this load\. The true point can lie there beside loaded or much longer spans/,
    );
    expect(ofKind(sheet, "table").find(({ id }) => id === "hinge ranges G")?.caption).toContain(
      "beside loaded or much longer spans",
    );
  });
});

describe("sheet.hinges beyond the degree", () => {
  const twin = (more: object): readonly ReturnType<typeof hinge>[] => [
    hinge("BC", { from: "B", at: "0.12 L", because: "stiff beam" }),
    hinge("BC", { from: "C", because: "its twin", ...more } as never),
  ];
  const uneven = portal({ span: "12 m", height: "5 m", bases: { left: "pinned", right: "fixed" } });

  test("without a reason of symmetry: refused, saying how many are too many and the motion", () => {
    const sheet = open();
    const G = sheet.loadCase("G", "gravity", uniform("BC", "10 kN/m"));
    expect(() => sheet.hinges(pinned(), [G], twin({ at: "0.12 L" }))).toThrow(
      /2 hinges in a structure indeterminate to degree 1, 1 beyond the degree: a mechanism, nothing resists sway.*Drop 1 hinge, or.*symmetry: true/,
    );
  });

  test("with it the mirror image takes its place from its twin and follows it, and what was checked is said", () => {
    const sheet = open();
    const G = sheet.loadCase("G", "gravity", uniform("BC", "10 kN/m"));
    const set = sheet.hinges(pinned(), [G], twin({ symmetry: true }));
    expect(places(set)).toEqual([
      ["BC", expect.closeTo(1.44, 9)],
      ["BC", expect.closeTo(10.56, 9)],
    ]);
    const finding = ofKind(sheet, "finding").find(({ id }) => id === "hinges G");
    expect(finding?.lines.at(-1)).toMatch(/symmetry checked about x = 6\.00 m: .*sections are not given/);
    attachHost({ overrides: new Map([["hinge h1 (G)", "1.8 m"]]) });
    forgetLedger();
    const again = open();
    const load = again.loadCase("G", "gravity", uniform("BC", "10 kN/m"));
    expect(places(again.hinges(pinned(), [load], twin({ symmetry: true }))).map(([, at]) => at)).toEqual([
      expect.closeTo(1.8, 9),
      expect.closeTo(10.2, 9),
    ]);
    expect(again.unusedOverrides()).toEqual([]);
  });

  test.each<[string, () => Structure, readonly Load[], object, RegExp]>([
    [
      "sections that differ",
      () =>
        withSections(pinned(), {
          AB: { E: 1, I: 1, A: "stiff" },
          BC: { E: 1, I: 3, A: "stiff" },
          CD: { E: 1, I: 2, A: "stiff" },
        }),
      [uniform("BC", "10 kN/m")],
      { at: "0.12 L", symmetry: true },
      /the sections of AB and CD differ/,
    ],
    [
      "an uneven load that the mechanism happens to balance",
      pinned,
      [uniform("BC", "10 kN/m"), atJoint("B", { down: "20 kN" })],
      { at: "0.12 L", symmetry: true },
      /G: the load at joint B is not the mirror image of that at C/,
    ],
    [
      "a load on half the beam: the motion first",
      pinned,
      [uniform("BC", "10 kN/m", { from: "0 L", to: "0.5 L" })],
      { at: "0.12 L", symmetry: true },
      /G with hinges h1 and h2: nothing resists sway/,
    ],
  ])("refuses %s", (_, frame, loads, more, words) => {
    const sheet = open();
    const G = sheet.loadCase("G", "gravity", ...loads);
    expect(() => sheet.hinges(frame(), [G], twin(more))).toThrow(words);
    expect(ofKind(sheet, "assumption")).toEqual([]);
  });

  test("a mirror image of nothing is refused, and symmetry that is not needed is checked all the same", () => {
    const sheet = open();
    const G = sheet.loadCase("G", "gravity", uniform("BC", "10 kN/m"));
    expect(() =>
      sheet.hinges(pinned(), [G], [hinge("BC", { from: "C", symmetry: true, because: "x" })]),
    ).toThrow(
      /hinge in BC from C is to be a mirror image, but no hinge with a place of its own is given in BC from B/,
    );
    expect(() => sheet.hinges(uneven, [G], twin({ symmetry: true }))).toThrow(
      /the support at A \(pinned\) is not the mirror image of that at D \(fixed\)/,
    );
  });
});

describe("sheet.beside", () => {
  const girder = beam({ spans: ["6 m", "8 m"] });
  const sets = (sheet: Sheet): readonly [HingeSet, HingeSet] => {
    const G = sheet.loadCase("G", "gravity", uniform("AB", "10 kN/m"), uniform("BC", "10 kN/m"));
    const long = sheet.hinges(
      girder,
      [G],
      [hinge("BC", { from: "B", at: "0.2 L", because: "the longer span" })],
    );
    const short = sheet.hinges(
      girder,
      [G],
      [hinge("AB", { from: "B", at: "0.2 L", because: "to compare" })],
      {
        name: "G, hinge in the short span",
      },
    );
    return [long, short];
  };

  test("two sets for one case stand on one sheet and side by side, by hand formula", () => {
    const sheet = open();
    const [long, short] = sets(sheet);
    const rows = sheet.beside(long, short);
    const row = (what: string): readonly number[] =>
      rows.find((one) => one.what.startsWith(what))?.values.map(({ si }) => si / 1000) ?? [];
    // hinge a from B in a span L beyond which a simple beam goes on: M_B = -w a L/2
    const [M1, M2] = [(-10 * 1.6 * 8) / 2, (-10 * 1.2 * 6) / 2];
    expect(row("M at B")).toEqual([expect.closeTo(M1, 9), expect.closeTo(M2, 9)]);
    expect(row("reaction at A, up")).toEqual([
      expect.closeTo(30 + M1 / 6, 9),
      expect.closeTo(30 + M2 / 6, 9),
    ]);
    expect(row("greatest M of BC")).toEqual([
      expect.closeTo((40 + M1 / 8) ** 2 / 20, 9),
      expect.closeTo((40 + M2 / 8) ** 2 / 20, 9),
    ]);
    const table = ofKind(sheet, "table").find(({ id }) => id.startsWith("beside"));
    expect(table?.columns).toEqual(["result", "G, chosen", "G, hinge in the short span"]);
    expect(table?.uses).toEqual(
      expect.arrayContaining(["hinge h1 (G)@1", "hinge h1 (G, hinge in the short span)@1"]),
    );
    expect(ofKind(sheet, "step")).toEqual([]);
  });

  test("refuses one set, sets of one name, other frames and other loads", () => {
    const sheet = open();
    const [long, short] = sets(sheet);
    expect(() => sheet.beside(long)).toThrow(/one hinge set given/);
    expect(() => sheet.beside(long, long)).toThrow(/two sets are called "G"/);
    const S = sheet.loadCase("S", "snow", uniform("BC", "4 kN/m"));
    const snow = sheet.hinges(girder, [S], [hinge("BC", { from: "B", at: "0.2 L", because: "x" })]);
    expect(() => sheet.beside(short, snow)).toThrow(
      /is for G, S for S; alternatives are for the same load cases/,
    );
    const other = sheet.hinges(
      beam({ spans: ["6 m", "9 m"] }),
      short.cases,
      [hinge("BC", { from: "B", at: "0.2 L", because: "x" })],
      { name: "other" },
    );
    expect(() => sheet.beside(short, other)).toThrow(/of different structures/);
  });

  test("works for frames, and names that cannot be are refused", () => {
    const sheet = open();
    const frame = buildingFrame({ bays: ["6 m"], storeys: ["4 m"], bases: "pinned" });
    const W = sheet.loadCase("W", "wind", atJoint("A1", { right: quantity(12_000, "force") }));
    const set = (part: "0.5 L" | "0.45 L", name?: string): HingeSet =>
      sheet.hinges(
        frame,
        [W],
        [hinge("A1B1", { from: "A1", at: part, because: "equal columns" })],
        name === undefined ? {} : { name },
      );
    const rows = sheet.beside(set("0.5 L"), set("0.45 L", "W, hinge nearer A1"));
    expect(rows.find(({ what }) => what === "M at A1")?.values.map(({ si }) => Math.round(si))).toEqual([
      24_000, 21_600,
    ]); // H h times the hinge's part of the span
    expect(() => set("0.5 L", "a: b")).toThrow(/the name "a: b" of the hinge set is refused/);
  });
});
