// A pinned portal, permanent load over the whole beam and snow on its left half: a hinge set for each, results added.

import { afterEach, beforeEach, expect, test } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { type Hand, hinge, openSheet, type Sheet } from "../../lib/guide/index.ts";
import { extremes } from "../../lib/results/index.ts";
import { attachHost, forgetLedger, recheckEquations } from "../../lib/sheet/index.ts";
import { portal, uniform, withRelativeStiffness } from "../../lib/structure/index.ts";

const head = {
  title: "Ropeworks shed, frame 4",
  job: "R-12",
  preparedBy: "TA",
  basis: "EN 1990:2002",
  units: "kN, m",
  status: "preliminary",
};
// N, m
const [L, h, g, s, ratio] = [13.2, 4.6, 5800, 7100, 2.2];

beforeEach(() => forgetLedger());
afterEach(() => {
  attachHost();
  forgetLedger();
});

function added(): { readonly sheet: Sheet; readonly hand: Hand; readonly a: number; readonly c: number } {
  const sheet = openSheet(head);
  const span = sheet.given("L", "13.2 m", "span");
  const height = sheet.given("h", "4.6 m", "height");
  const permanent = sheet.given("g", "5.8 kN/m", "roof");
  const snow = sheet.given("s", "7.1 kN/m", "snow");
  const frame = portal({ span, height, bases: "pinned" });
  const ratios = { "I of beam / I of columns": sheet.assume("r_I", 2.2, "like frames of this span") };
  const G = sheet.loadCase("G", "permanent", uniform("BC", permanent));
  const S = sheet.loadCase(
    "S",
    "snow drifted to the left half",
    uniform("BC", snow, { from: "0 L", to: "0.5 L" }),
  );
  const by = { by: "relative stiffness", ratios } as const;
  const whole = sheet.hinges(
    frame,
    [G],
    [
      hinge("BC", { from: "B", ...by, because: "ratio of like frames" }),
      hinge("BC", { from: "C", symmetry: true, because: "symmetry of frame and load" }),
    ],
  );
  const half = sheet.hinges(frame, [S], [hinge("BC", { from: "C", ...by, because: "the unloaded half" })]);
  const place = (set: typeof whole, i: number): number => set.hinged.hinges[i]?.at ?? Number.NaN;
  return { sheet, hand: sheet.freeBodies(whole, half), a: place(whole, 0), c: L - place(half, 0) };
}

test("thrust, knees and reactions by the statics of each hinge set, added", () => {
  const { hand, a, c } = added();
  // H h = M0 at the hinge of each case: w a (L - a)/2 for the whole load, s L/8 c beyond the loaded half.
  const [Hg, Hs] = [(g * a * (L - a)) / 2 / h, ((s * L) / 8) * (c / h)];
  expect(hand.reaction("A", "x").si).toBeCloseTo(Hg + Hs, 3);
  expect(hand.reaction("D", "x").si).toBeCloseTo(-Hg - Hs, 3);
  expect(hand.moment("BC", { at: "B" }).si).toBeCloseTo(-(Hg + Hs) * h, 2);
  expect(hand.moment("BC", { at: "C" }).si).toBeCloseTo(-(Hg + Hs) * h, 2);
  expect(hand.reaction("A", "y").si).toBeCloseTo((g * L) / 2 + (3 * s * L) / 8, 3);
  expect(hand.reaction("D", "y").si).toBeCloseTo((g * L) / 2 + (s * L) / 8, 3);
});

test("near the stiffness solution when the ratio is right: knees within 4 %, span within 3 %", () => {
  const { hand } = added();
  const frame = withRelativeStiffness(portal({ span: "13.2 m", height: "4.6 m", bases: "pinned" }), {
    "I of beam / I of columns": ratio,
  });
  const truth = exact(frame, [
    uniform("BC", "5.8 kN/m"),
    uniform("BC", "7.1 kN/m", { from: "0 L", to: "0.5 L" }),
  ]).members[1];
  const knee = truth?.M.pieces[0]?.[0] ?? Number.NaN;
  const span = truth === undefined ? Number.NaN : extremes(truth.M).greatest.value;
  expect(Math.abs(hand.moment("BC", { at: "B" }).si / knee - 1)).toBeLessThan(0.04);
  expect(Math.abs(hand.peakMoment("BC", "positive").moment.si / span - 1)).toBeLessThan(0.03);
});

test("the sheet adds up and holds an assumption for each hinge of each case", () => {
  const { sheet, hand } = added();
  sheet.reactions(hand);
  const entries = sheet.entries();
  expect(recheckEquations(entries as Parameters<typeof recheckEquations>[0]).faults).toEqual([]);
  expect(entries.filter(({ kind }) => kind === "assumption").map(({ id }) => id)).toEqual(
    expect.arrayContaining(["hinge h1 (G)", "hinge h2 (G)", "hinge h1 (S)"]),
  );
  const checks = entries.filter((entry) => entry.kind === "check");
  expect(checks.length).toBeGreaterThan(3);
  expect(checks.every(({ passed }) => passed)).toBe(true);
  expect(hand.name).toBe("G + S");
});
