// What a recorded equation stands on is what moves it: each given changed in turn, and what moved compared with the traces.
import { afterEach, describe, expect, test } from "vitest";
import { hinge, openSheet, type Sheet } from "../../lib/guide/index.ts";
import { attachHost, forgetLedger } from "../../lib/sheet/index.ts";
import { recheckEquations } from "../../lib/sheet/recheck-equations.ts";
import type { Entry, StepEntry } from "../../lib/sheet/record.ts";
import { atJoint, beam, pointLoad, portal, uniform } from "../../lib/structure/index.ts";

const head = {
  title: "Traces",
  job: "T-1",
  preparedBy: "IK",
  basis: "EN 1990:2002",
  units: "kN, m",
  status: "preliminary",
};

afterEach(() => {
  attachHost();
  forgetLedger();
});

type Givens = Readonly<Record<string, number>>;

/** The entries of a calculation made from givens, by id; numbers in m, kN. */
function calculated(givens: Givens, write: (sheet: Sheet, of: Of) => void): ReadonlyMap<string, Entry> {
  forgetLedger();
  const sheet = openSheet(head);
  const length = (symbol: string) => sheet.given(symbol, `${givens[symbol] ?? 0} m`, "a length");
  const force = (symbol: string) => sheet.given(symbol, `${givens[symbol] ?? 0} kN`, "a force");
  const spread = (symbol: string) => sheet.given(symbol, `${givens[symbol] ?? 0} kN/m`, "a load");
  write(sheet, { length, force, spread });
  return new Map(sheet.entries().map((entry) => [entry.id, entry]));
}

interface Of {
  readonly length: (symbol: string) => ReturnType<typeof lengthOf>;
  readonly force: (symbol: string) => ReturnType<typeof forceOf>;
  readonly spread: (symbol: string) => ReturnType<typeof spreadOf>;
}
const lengthOf = (sheet: Sheet) => sheet.given("x", "1 m", "");
const forceOf = (sheet: Sheet) => sheet.given("x", "1 kN", "");
const spreadOf = (sheet: Sheet) => sheet.given("x", "1 kN/m", "");

const isStep = (entry: Entry): entry is StepEntry => entry.kind === "step";
/** Steps with something acting: a force that is nought because nothing acts moves with nothing. */
const acting = (entries: ReadonlyMap<string, Entry>): readonly StepEntry[] =>
  [...entries.values()].filter(isStep).filter((s) => s.terms.length > 0);

/** Symbols of the givens an entry stands on, through all entries between; `through` says which may be passed. */
function traced(
  entries: ReadonlyMap<string, Entry>,
  start: Entry,
  through: (entry: Entry) => boolean = () => true,
): ReadonlySet<string> {
  const found = new Set<string>();
  const seen = new Set<string>();
  const visit = (entry: Entry): void => {
    for (const use of entry.uses) {
      const next = entries.get(use.slice(0, use.lastIndexOf("@")));
      if (next === undefined || seen.has(next.id)) continue;
      seen.add(next.id);
      if (next.kind === "given") found.add(next.symbol);
      else if (through(next)) visit(next);
    }
  };
  visit(start);
  return found;
}

const changed = (givens: Givens, symbol: string): Givens => ({
  ...givens,
  [symbol]: (givens[symbol] ?? 0) * 1.0731,
});
const differ = (a: number, b: number): boolean =>
  Math.abs(a - b) > 1e-7 * Math.max(1, Math.abs(a), Math.abs(b));

/** The result of a step's own equation with changed coefficients and loads, all earlier forces held as they were. */
function heldBefore(before: StepEntry, after: StepEntry): number {
  const sum = after.terms.reduce(
    (total, term, i) =>
      total +
      term.coefficient * (term.from === undefined ? term.value : (before.terms[i]?.value ?? Number.NaN)),
    0,
  );
  return -sum / after.coefficient;
}

const gravity = (sheet: Sheet, { length, spread }: Of): void => {
  const frame = portal({ span: length("L"), height: length("h"), bases: "pinned" });
  const G = sheet.loadCase("G", "gravity", uniform("BC", spread("w")));
  sheet.freeBodies(
    sheet.hinges(
      frame,
      [G],
      [
        hinge("BC", { from: "B", at: "0.12 L", because: "stiff beam" }),
        hinge("BC", { from: "C", at: "0.12 L", symmetry: true, because: "symmetry" }),
      ],
    ),
  );
};
const wind = (sheet: Sheet, { length, force }: Of): void => {
  const frame = portal({ span: length("L"), height: length("h"), bases: "pinned" });
  const W = sheet.loadCase("W", "wind", atJoint("B", { right: force("H") }));
  sheet.freeBodies(
    sheet.hinges(frame, [W], [hinge("BC", { from: "B", at: "0.5 L", because: "equal columns" })]),
  );
};
/** Nothing in it is symmetric, level with something else by chance, or a part of something else. */
const uneven = (sheet: Sheet, { length, force, spread }: Of): void => {
  const frame = portal({
    span: length("L"),
    height: { left: length("a"), right: length("b") },
    rightBase: length("e"),
    bases: "pinned",
  });
  const Q = sheet.loadCase(
    "Q",
    "all at once",
    uniform("BC", spread("w")),
    atJoint("B", { right: force("H") }),
    pointLoad("CD", force("P"), { at: length("p"), direction: "left" }),
  );
  sheet.freeBodies(sheet.hinges(frame, [Q], [hinge("BC", { from: "B", at: length("d"), because: "a try" })]));
};

const portals = [
  ["gravity, two hinges", { L: 12, h: 5, w: 9 }, gravity],
  ["wind, one hinge", { L: 12, h: 5, H: 18 }, wind],
  ["uneven frame", { L: 13, a: 4.7, b: 5.2, e: 0.6, w: 9, H: 11, P: 7, p: 2.3, d: 5.1 }, uneven],
] as const;

describe("what a step stands on", () => {
  test.each(portals)("%s: what moves with a given stands on it, through all steps", (_, givens, write) => {
    const before = calculated(givens, write);
    expect(acting(before).length).toBeGreaterThan(10);
    for (const symbol of Object.keys(givens)) {
      const after = calculated(changed(givens, symbol), write);
      for (const step of acting(before)) {
        const other = after.get(step.id);
        if (other?.kind !== "step") throw new Error(`${step.id} is gone`);
        if (differ(step.value.si, other.value.si))
          expect([...traced(before, step)], `${step.id} moved with ${symbol}`).toContain(symbol);
      }
    }
  });

  test.each(portals)(
    "%s: each equation by itself stands on a given exactly when it moves with it",
    (_, givens, write) => {
      const before = calculated(givens, write);
      // the first two of the uneven frame are taken together: each stands on what either stands on
      const together = acting(before).slice(0, write === uneven ? 2 : 0);
      expect(new Set(together.map((s) => s.uses.join())).size).toBe(write === uneven ? 1 : 0);
      let [moved, still] = [0, 0];
      for (const symbol of Object.keys(givens)) {
        const after = calculated(changed(givens, symbol), write);
        for (const step of acting(before).filter((one) => !together.includes(one))) {
          const other = after.get(step.id);
          if (other?.kind !== "step") throw new Error(`${step.id} is gone`);
          const moves = differ(step.value.si, heldBefore(step, other));
          const own = traced(before, step, (entry) => entry.kind !== "step");
          expect(own.has(symbol), `${step.id} by itself on ${symbol}: moves ${moves}`).toBe(moves);
          if (moves) moved += 1;
          else still += 1;
        }
      }
      expect(moved).toBeGreaterThan(5);
      expect(still).toBeGreaterThan(5);
    },
  );

  test("uneven frame: every value whose trace holds a given moves with it, through all steps", () => {
    const [, givens, write] = portals[2];
    const before = calculated(givens, write);
    for (const symbol of Object.keys(givens)) {
      const after = calculated(changed(givens, symbol), write);
      for (const step of acting(before)) {
        const other = after.get(step.id);
        if (other?.kind !== "step") throw new Error(`${step.id} is gone`);
        const moves = differ(step.value.si, other.value.si);
        expect(traced(before, step).has(symbol), `${step.id} on ${symbol}: moves ${moves}`).toBe(moves);
      }
    }
  });

  test("moments about a base with level arms only stand on the span and not on the height", () => {
    const entries = calculated({ L: 12, h: 5, w: 9 }, gravity);
    const A_y = acting(entries).find((s) => s.id.endsWith("sum Fy") && s.id.includes("column AB with"));
    expect(A_y === undefined ? [] : [...traced(entries, A_y)].sort()).toEqual(["L", "w"]);
  });

  test("a hinge placed by a part of a level beam stands on the span only, one in metres on nothing else", () => {
    const by = (at: "0.12 L" | "1.5 m"): readonly string[] => {
      const entries = calculated({ L: 12, h: 5, w: 9 }, (sheet, of) => {
        const frame = portal({ span: of.length("L"), height: of.length("h"), bases: "pinned" });
        const G = sheet.loadCase("G", "gravity", uniform("BC", of.spread("w")));
        sheet.hinges(
          frame,
          [G],
          (["B", "C"] as const).map((from) => hinge("BC", { from, at, symmetry: true, because: "symmetry" })),
        );
      });
      return entries.get("hinge h1 (G)")?.uses ?? ["none"];
    };
    expect([by("0.12 L"), by("1.5 m")]).toEqual([["L@1"], []]);
  });
});

describe("recorded free bodies", () => {
  test("forces that are nought because nothing acts stand in one line, and all equations re-add", () => {
    const entries = calculated({ a: 6, b: 8, w: 10 }, (sheet, { length, spread }) => {
      const girder = beam({ spans: [length("a"), length("b")] });
      const G = sheet.loadCase("G", "gravity", uniform("AB", spread("w")), uniform("BC", spread("w")));
      sheet.freeBodies(
        sheet.hinges(girder, [G], [hinge("AB", { from: "B", at: "0.2 L", because: "two spans" })]),
      );
    });
    const idle = [...entries.values()].filter(isStep).filter((s) => s.terms.length === 0);
    expect(idle.map((s) => s.id)).toEqual(["G: nothing acts: h1_x, A_x", "G: nothing acts: AB_B_N, BC_B_N"]);
    expect(idle[0]?.lines.symbols).toBe("\\sum F_x = 0:\\quad X_{\\mathrm{h1}} = A_x = 0");
    expect(idle.every((s) => s.uses.length > 0 && s.value.si === 0)).toBe(true);
    const recheck = recheckEquations([...entries.values()] as Parameters<typeof recheckEquations>[0]);
    expect(recheck.faults).toEqual([]);
    expect(recheck.count).toBeGreaterThan(10);
  });
});
