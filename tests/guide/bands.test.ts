// Bands of hand results: what the sheet shows is what accuracy answers for the same question.

import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { covers, sampled, statedUnknowns } from "../../lib/accuracy/index.ts";
import { hinge } from "../../lib/guide/index.ts";
import type { Quantity } from "../../lib/quantity/index.ts";
import { attachHost, bandText, forgetLedger, type ResultBand } from "../../lib/sheet/index.ts";
import { beam, uniform } from "../../lib/structure/index.ts";
import { ofKind, solved, started, twoHinges } from "./solved.ts";

beforeEach(() => forgetLedger());
afterEach(() => {
  attachHost();
  forgetLedger();
});

const ratio = { "I of beam / I of columns": "1 to 4" } as const;

function bandOf({ sheet }: ReturnType<typeof solved>, value: Quantity): ResultBand {
  sheet.result("X", value);
  const entry = sheet.entry("X");
  if (entry?.kind !== "result" || entry.band === undefined) throw new Error("a band is wanted");
  return entry.band;
}

describe("the band of a hand result", () => {
  test("is accuracy's own answer for the same frame, load and unknowns", () => {
    const one = solved(ratio);
    const asked = [
      [one.hand.moment("BC", { at: "B" }), { member: "BC", force: "M", at: 0, side: "right" }],
      [one.hand.moment("BC", { at: "0.5 L" as never }), { member: "BC", force: "M", at: 5 }],
      [one.hand.axial("BC", { at: "C" }), { member: "BC", force: "N", at: 10, side: "left" }],
      [one.hand.shear("CD", { at: "D" }), { member: "CD", force: "V", at: 5, side: "left" }],
      [one.hand.reaction("A", "x"), { joint: "A", reaction: "x" }],
      [one.hand.peakMoment("BC", "positive").moment, { member: "BC", force: "M", at: "greatest" }],
      [one.hand.peakMoment("BC", "negative").moment, { member: "BC", force: "M", at: "least" }],
    ] as const;
    const { structure, unknowns } = statedUnknowns(one.frame, ratio);
    const truth = sampled({ structure, cases: [[uniform("BC", "12 kN/m")]], unknowns });
    const found = truth.bandsOf(asked.map(([{ si }, wanted]) => ({ wanted, value: si })));
    expect(found.length).toBe(7);
    asked.forEach(([value], i) => {
      forgetLedger();
      const again = solved(ratio);
      const shown = bandOf(again, value);
      const due = found[i];
      expect([shown.low.si, shown.high.si, shown.least.si, shown.greatest.si]).toEqual([
        due?.truth.low,
        due?.truth.high,
        due?.truth.least,
        due?.truth.greatest,
      ]);
      expect(shown.measure).toBe(due?.measure);
      expect(shown.against.low).toBe(due?.spread.low);
      expect(shown.bias.si).toBe(due?.bias);
      expect(shown.words).toBe(covers);
    });
  });

  // Source: A. Kleinlogel, Rigid Frame Formulas, rectangular two-hinged frame under a uniform load on its beam (from memory):
  // M_B = -w L² / (4 (2k + 3)), k = (I_b / I_c)(h / L). Axially rigid members.
  test("least and greatest of the knee are the closed form at the ends of the ratio, when nothing else is unknown", () => {
    const sections = {
      columns: { E: 1, I: 1, A: "stiff" },
      beams: { E: 1, I: 2, A: "stiff" },
    } as const;
    const one = solved({ ...ratio, "A of beam": "known", "A of columns": "known" }, { sections });
    const { least, greatest, low, high } = bandOf(one, one.hand.moment("BC", { at: "B" }));
    const knee = (r: number): number => (-12e3 * 10 ** 2) / (4 * ((2 * r * 5) / 10 + 3));
    expect(least.si / knee(1)).toBeCloseTo(1, 6); // r = 1, k = 0.5: -75 kN·m
    expect(greatest.si / knee(4)).toBeCloseTo(1, 6); // r = 4, k = 2: -42.86 kN·m
    expect(least.text).toBe("−75.0 kN·m");
    expect(greatest.text).toBe("−42.9 kN·m");
    expect(low.si).toBeGreaterThanOrEqual(least.si);
    expect(high.si).toBeLessThanOrEqual(greatest.si);
  });

  test("is that of a multiple, turned round where it is negative, and kept when shown in another unit", () => {
    const one = solved(ratio);
    const value = one.hand.moment("BC", { at: "B" });
    const band = bandOf(one, value);
    forgetLedger();
    const turned = bandOf(solved(ratio), value.negated().times(1.5));
    expect(turned.low.si).toBeCloseTo(-1.5 * band.high.si, 6);
    expect(turned.greatest.si).toBeCloseTo(-1.5 * band.least.si, 6);
    expect(turned.against).toEqual(band.against);
    forgetLedger();
    const feet = bandOf(solved(ratio), value.to("kip ft"));
    expect(feet.low.unit).toBe("kip ft");
    expect(feet.low.si).toBe(band.low.si);
  });

  test("is absent for values that are no hand results", () => {
    const { sheet, hand } = solved(ratio);
    const M = sheet.result("M_B", hand.moment("BC", { at: "B" }));
    sheet.result("M_S", M.plus("3 kN m"));
    sheet.calc("M_2 = 2*M_B", "kN m");
    expect(ofKind(sheet, "result").map(({ id, band }) => [id, band !== undefined])).toEqual([
      ["M_B", true],
      ["M_S", false],
    ]);
  });

  test("the same in kN, m and in kip, ft", () => {
    const [metric, imperial] = (["kN, m", "kip, ft"] as const).map((units) => {
      forgetLedger();
      const one = solved(ratio, {}, units);
      one.sheet.reactions(one.hand);
      one.sheet.diagrams(one.hand);
      return ofKind(one.sheet, "table").flatMap(({ rows }) =>
        rows.flat().flatMap((cell) => (typeof cell === "string" || !cell.band ? [] : [cell.band])),
      );
    });
    expect(metric?.length).toBe(25); // 4 reactions, 7 places with three forces
    expect(imperial?.map(({ against }) => against)).toEqual(metric?.map(({ against }) => against));
    expect(imperial?.map(({ low }) => low.si)).toEqual(metric?.map(({ low }) => low.si));
    expect(imperial?.some(({ low }) => low.unit === "kip ft")).toBe(true);
  });

  test("of several hinge sets is that of the frame under all their loads together", () => {
    const begun = started();
    const { sheet, frame } = begun;
    sheet.unknowns(frame, ratio, { because: "open" });
    const gravity = twoHinges(begun);
    const S = sheet.loadCase(
      "S",
      "snow on the left half",
      uniform("BC", "4 kN/m", { from: "0 L", to: "0.5 L" }),
    );
    const snow = sheet.hinges(frame, [S], [hinge("BC", { from: "C", at: "0.1 L", because: "far knee" })]);
    const hand = sheet.freeBodies(gravity, snow);
    const value = hand.moment("BC", { at: "C" });
    const band = bandOf({ ...begun, hand }, value);
    const { structure, unknowns } = statedUnknowns(frame, ratio);
    const loads = [uniform("BC", "12 kN/m"), uniform("BC", "4 kN/m", { from: "0 L", to: "0.5 L" })];
    const [due] = sampled({ structure, cases: [loads], unknowns }).bandsOf([
      { wanted: { member: "BC", force: "M", at: 10, side: "left" }, value: value.si },
    ]);
    expect(band.low.si).toBeCloseTo(due?.truth.low ?? Number.NaN, 3);
    expect(band.greatest.si).toBeCloseTo(due?.truth.greatest ?? Number.NaN, 3);
  });
});

describe("where bands are shown", () => {
  test("in the tables of reactions and of internal forces, none on a sum; rounding is nought", () => {
    const { sheet, hand } = solved(ratio);
    sheet.reactions(hand);
    sheet.diagrams(hand);
    const table = (id: string) => ofKind(sheet, "table").find((entry) => entry.id === id);
    const banded = (id: string, row: number) =>
      table(id)?.rows[row]?.flatMap((cell) => (typeof cell === "string" ? [] : [cell.band !== undefined]));
    expect(banded("reactions G", 0)).toEqual([true, true]);
    expect(banded("reactions G", 2)).toEqual([false, false]);
    expect(table("internal forces G")?.rows.length).toBe(7);
    for (const row of table("internal forces G")?.rows ?? [])
      for (const cell of row.slice(2)) expect(typeof cell === "string" ? undefined : cell.band).toBeDefined();
    const last = table("internal forces G")?.rows.at(-1)?.at(-1);
    expect(last).toMatchObject({ value: { si: 0, text: "0 kN·m" } });
  });

  test("beside the diagrams of a small frame, with words for them; not where the true value is always the same", () => {
    const { sheet, hand } = solved(ratio);
    const spec = sheet.diagrams(hand);
    expect(spec.bands?.map(({ quantity, member }) => `${quantity} ${member}`)).toEqual([
      "V AB",
      "M AB",
      "N BC",
      "M BC",
      "V CD",
      "M CD",
    ]);
    const knee = spec.bands?.find(({ quantity, member }) => quantity === "M" && member === "BC");
    const band = bandOf({ sheet, hand } as never, hand.moment("BC", { at: "B" }));
    expect([knee?.low[0], knee?.high[0]]).toEqual([band.low.si, band.high.si]);
    const figure = ofKind(sheet, "figure").find(({ spec: own }) => own.kind === "diagrams");
    expect(figure?.caption).toContain(
      "dotted, where drawn: between these two lines lie 90 % of the true values",
    );
    expect(figure?.alternative).toContain("90 %");
  });

  test("in the display of a value in a notebook", () => {
    const { hand } = solved(ratio);
    const value = hand.moment("BC", { at: "B" }) as unknown as Record<symbol, () => Record<string, string>>;
    const shown = value[Symbol.for("Jupyter.display")]?.() ?? {};
    expect(shown["text/plain"]).toMatch(
      /^−63\.4 kN·m\ntrue value 90 % between .*in the middle \d+ % (more|less) than this: hand too (small|large); of the stiffnesses tried;/,
    );
    expect(shown["text/html"]).toContain("true value 90 %");
  });
});

describe("what is not known", () => {
  test("taken by default is recorded once, before the first free body, and printed as an assumption", () => {
    const begun = started();
    const set = twoHinges(begun);
    const before = begun.sheet.entries().length;
    begun.sheet.freeBodies(set);
    begun.sheet.freeBodies(set);
    const added = begun.sheet.entries().slice(before);
    expect(added[0]).toMatchObject({ kind: "assumption", id: "unknowns of frame ABCD" });
    const assumptions = ofKind(begun.sheet, "assumption").filter(({ id }) => id.startsWith("unknowns"));
    expect(assumptions.length).toBe(1);
    expect(assumptions[0]?.text).toMatch(/^Not known of the frame ABCD: taken by default: /);
    expect(assumptions[0]?.because).toContain("default");
    expect(added[1]).toMatchObject({
      kind: "table",
      columns: ["unknown", "nominal", "least", "greatest", "taken"],
    });
  });

  test("stated: what was stated and what is default, the nominal ratios, and the ranges in a table", () => {
    const { sheet } = solved({ ...ratio, bases: "pinned to half fixed" });
    const [assumption] = ofKind(sheet, "assumption");
    expect(assumption?.text).toContain("I of beam / I of columns 1 to 4");
    expect(assumption?.text).toContain("fixity 0 to 0.5");
    expect(assumption?.text).toContain("taken by default: A of columns 0.5 to 2 times nominal");
    expect(assumption?.text).toContain("nominal: I of beam 2 times I of columns, A of beam ");
    expect(assumption?.because).toBe("sizes are still open");
    const table = ofKind(sheet, "table").find(({ id }) => id.startsWith("ranges of unknowns"));
    expect(table?.rows).toContainEqual([
      "I of beam / I of columns",
      "2",
      "1",
      "4",
      expect.stringContaining("range"),
    ]);
    expect(table?.caption).toContain("500 frames (seed 1)");
    expect(table?.uses).toEqual(["unknowns of frame ABCD@1"]);
  });

  test("numbers the sheet knows keep where they came from, and the bands stand on them", () => {
    const begun = started();
    const r = begun.sheet.assume("r_I", 2, "two similar halls");
    begun.sheet.unknowns(
      begun.frame,
      { "I of beam / I of columns": { about: r, within: 2 } },
      { because: "a factor of two either way" },
    );
    const [assumption] = ofKind(begun.sheet, "assumption").filter(({ id }) => id.startsWith("unknowns"));
    expect(assumption?.uses).toEqual(["r_I@1"]);
    expect(assumption?.text).toContain("I of beam / I of columns 1 to 4");
    const hand = begun.sheet.freeBodies(twoHinges(begun));
    const band = bandOf({ ...begun, hand }, hand.moment("BC", { at: "B" }));
    expect(band.uses[0]).toBe("unknowns of frame ABCD@1");
    forgetLedger();
    const words = solved(ratio);
    const same = bandOf(words, words.hand.moment("BC", { at: "B" }));
    expect(band.against).toEqual(same.against);
  });

  test.each([
    ["no reason", () => [ratio, undefined], /unknowns: the reason is missing/],
    ["an unknown key", () => [{ "I of roof": "1 to 2" }, { because: "x" }], /roof/],
    ["no range", () => [{ "I of beam": "quite" }, { because: "x" }], /quite/],
    [
      "a length",
      () => [{ "I of beam": started().sheet.given("d", "3 m", "x") }, { because: "x" }],
      /pure number/,
    ],
  ])("is refused with %s", (_, given, words) => {
    const [stated, reason] = given();
    const { sheet, frame } = started();
    expect(() => sheet.unknowns(frame, stated as never, reason as never)).toThrow(words);
  });

  test("stated after the free bodies is refused: two statements would contradict each other", () => {
    const { sheet, frame } = solved();
    expect(() => sheet.unknowns(frame, ratio, { because: "late" })).toThrow(
      /the frame ABCD was solved before, and its bands took the default; say what is unknown before its free bodies/,
    );
  });

  test("of a determinate beam is nothing, and its results have no band, which the sheet says", () => {
    const { sheet } = started();
    const span = beam({ spans: ["6 m"] });
    const [member] = span.members;
    const G = sheet.loadCase("G", "gravity", uniform(member?.name ?? "", "12 kN/m"));
    const hand = sheet.freeBodies(sheet.hinges(span, [G], []));
    sheet.reactions(hand);
    sheet.result("M_m", hand.peakMoment(member?.name ?? "", "positive").moment);
    expect(ofKind(sheet, "result")[0]?.band).toBeUndefined();
    expect(ofKind(sheet, "assumption")).toEqual([]);
    const finding = ofKind(sheet, "finding").find(({ id }) => id.startsWith("bands of"));
    expect(finding?.verdict).toBe("none: it is statically determinate, and no stiffness enters its forces");
  });

  test("sizes given: the default range is narrow, and the words say so", () => {
    const sections = { columns: { E: 1, I: 1, A: 40 }, beams: { E: 1, I: 2, A: 50 } } as const;
    const { sheet } = solved(undefined, { sections });
    const [assumption] = ofKind(sheet, "assumption").filter(({ id }) => id.startsWith("unknowns"));
    expect(assumption?.text).toContain("0.909 to 1.1 times nominal");
    expect(assumption?.text).toContain("sections as given");
  });
});

describe("a cell run again", () => {
  const at = (number: number) => attachHost({ cell: { number, id: `c${number}` }, overrides: new Map() });

  test("keeps one default, and a statement put in before it replaces it", () => {
    at(1);
    const begun = started();
    at(2);
    const set = twoHinges(begun);
    const solve = () => {
      at(4);
      const hand = begun.sheet.freeBodies(set);
      const band = bandOf({ ...begun, hand }, hand.moment("BC", { at: "B" }));
      begun.sheet.endCell("c4");
      return band;
    };
    const unknown = () => ofKind(begun.sheet, "assumption").filter(({ id }) => id.startsWith("unknowns"));
    const [first, second] = [solve(), solve()];
    expect(second).toEqual(first);
    expect(unknown().map(({ id }) => id)).toEqual(["unknowns of frame ABCD"]);
    at(3);
    begun.sheet.unknowns(begun.frame, ratio, { because: "now known better" });
    begun.sheet.endCell("c3");
    const third = solve();
    expect(third.against).not.toEqual(first.against);
    expect(unknown().map(({ because }) => because)).toEqual(["now known better"]);
  });
});

describe("bands say what they rest on when nobody stated what is not known", () => {
  const words = (one: ReturnType<typeof solved>): string =>
    bandOf(one, one.hand.moment("BC", { at: "B" })).words;

  test("nominal ratios all 1", () => {
    expect(words(solved())).toBe(
      "of the stiffnesses tried; what is not known was not stated: by default nominal ratios of I all 1, each within a factor of 2; loads, geometry, cracking and second order not varied",
    );
  });

  test("about the sections given", () => {
    const section = { E: 210e9, I: 1e-4, A: 0.01 };
    expect(words(solved(undefined, { sections: { all: section } }))).toMatch(
      /not stated: by default sections as given, each within a factor of 1\.1;/,
    );
  });

  test("about the ratios the hinges were placed by", () => {
    const begun = started();
    const by = {
      by: "relative stiffness",
      ratios: { "I of beam / I of columns": 3 },
      because: "like halls",
    } as const;
    const G = begun.sheet.loadCase("G", "gravity", uniform("BC", "12 kN/m"));
    const ends = [hinge("BC", { from: "B", ...by }), hinge("BC", { from: "C", ...by, symmetry: true })];
    const hand = begun.sheet.freeBodies(begun.sheet.hinges(begun.frame, [G], ends));
    expect(words({ ...begun, hand })).toMatch(
      /by default nominal ratios of I as the hinges under G were placed by, each within a factor of 2;/,
    );
  });

  test("stated: no word of a default", () => {
    expect(words(solved(ratio))).toBe(covers);
  });

  test("a beam of one section: one frame was tried, and what was not", () => {
    const { sheet } = started();
    const frame = beam({ spans: ["6 m", "8 m"] });
    const G = sheet.loadCase("G", "floor", uniform("AB", "12 kN/m"), uniform("BC", "12 kN/m"));
    const set = sheet.hinges(
      frame,
      [G],
      [hinge("BC", { from: "B", at: "0.2 L", because: "near a quarter" })],
    );
    const hand = sheet.freeBodies(set);
    const band = bandOf({ sheet, frame, hand }, hand.moment("BC", { at: "B" }));
    expect(band.single).toBe(true);
    expect(bandText(band)).toMatch(
      /^true value −\d+(\.\d+)? kN·m \(\d\.\d\d of this\) in the one frame tried$/,
    );
    expect(band.words).toBe(
      "not varied: one section throughout; settlements and sections that change along a member not tried; loads, geometry, cracking and second order not varied",
    );
  });
});
