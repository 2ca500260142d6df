import { beforeEach, describe, expect, test } from "vitest";
import type { CheckEntry, Ledger } from "../../lib/sheet/index.ts";
import { freshLedger } from "./notebook.ts";

let sheet: Ledger;
beforeEach(() => {
  sheet = freshLedger();
  sheet.given("L", "14 m");
  sheet.given("delta", "35 mm");
  sheet.given("N", "-20 kN");
  sheet.given("a", "0.1 m");
  sheet.given("b", "0.2 m");
  sheet.given("c", "0.3 m");
});

const rows: readonly (readonly [string, boolean, number | undefined])[] = [
  ["delta <= L/360", true, 0.9],
  ["delta <= L/500", false, 1.25],
  ["L/360 >= delta", true, 0.9],
  ["L >= 20*b", true, 4 / 14],
  ["L < 14*b/0.2", false, 1],
  ["a + b <= c", true, 1],
  ["a + b < c", false, 1],
  ["a + b >= c", true, 1],
  ["N <= 0", true, undefined],
  ["N >= 0", false, undefined],
  ["0 <= L", true, 0],
  ["-N <= 25*N/N*(-N)/20", true, 0.8],
];

describe("check", () => {
  test.each(rows)("%s: %s, utilisation %d", (formula, passed, utilisation) => {
    const outcome = sheet.check(formula);
    expect(outcome.passed).toBe(passed);
    if (utilisation === undefined) expect(outcome).not.toHaveProperty("utilisation");
    else expect(outcome.utilisation).toBeCloseTo(utilisation, 12);
  });

  test("is recorded with its lines, inputs and uses", () => {
    sheet.check("delta <= L/360", "deflection under snow");
    const [entry] = sheet.entries().filter((each): each is CheckEntry => each.kind === "check");
    expect(entry).toMatchObject({
      id: "check delta <= L/360",
      formula: "delta <= L/360",
      uses: ["delta@1", "L@1"],
      inputs: { delta: 0.035, L: 14 },
      passed: true,
      description: "deflection under snow",
      lines: {
        symbols: "\\delta \\le \\frac{L}{360}",
        numbers: "35.0\\,\\mathrm{mm} \\le \\frac{14.0\\,\\mathrm{m}}{360}",
        result: "35.0\\,\\mathrm{mm} \\le 38.9\\,\\mathrm{mm}",
      },
    });
  });

  test("a failed check says what holds instead, with figures enough to see it", () => {
    sheet.given("x", "38.89 mm");
    sheet.given("y", "38.9 mm");
    sheet.check("x + 0 >= y + 0");
    const [entry] = sheet.entries().filter((each): each is CheckEntry => each.kind === "check");
    expect(entry?.lines.result).toBe("38.89\\,\\mathrm{mm} < 38.90\\,\\mathrm{mm}");
  });

  test("shows itself as a formula with its outcome", () => {
    const outcome = sheet.check("delta <= L/500", "deflection <b>") as unknown as Record<
      symbol,
      () => object
    >;
    const display = outcome[Symbol.for("Jupyter.display")]?.() as Record<string, string>;
    expect(display["text/plain"]).toBe("delta <= L/500: DOES NOT HOLD (125 %)");
    expect(display["text/html"]).toContain("deflection &lt;b&gt; DOES NOT HOLD (125 %)");
    expect(display["text/html"]?.match(/<math/g)).toHaveLength(3);
    expect(Object.keys(outcome)).toEqual(["passed", "utilisation"]);
  });
});

const near = [
  ["delta <= 35.05*delta/35", "99.857 %"],
  ["delta <= 0.9999*delta", "100.010 %"],
  ["delta <= 0.999999*delta", "100.000100 %"],
  ["delta <= 1.000*delta", "100 %"],
  ["delta <= L/500", "125 %"],
] as const;

describe("a utilisation near 1 is shown on the side of the limit it lies on", () => {
  test.each(near)("%s: %s", (formula, percent) => {
    const outcome = sheet.check(formula) as unknown as Record<symbol, () => Record<string, string>>;
    expect(outcome[Symbol.for("Jupyter.display")]?.()["text/plain"]).toContain(`(${percent})`);
  });
});

const refused = [
  ["L <= N", "L <= N: cannot compare L = 14 m (length) and N = −20 kN (force)"],
  ["L <= 5", "cannot compare L = 14 m (length) and 5 (pure number)"],
  ["L = b", "is not a check; write two sides with <=, >=, < or >"],
  ["L == b", "is not a check"],
  ["L", "is not a check"],
  ["a <= b <= c", "compares more than two values; write a check for each"],
  ["Q <= L", 'Q <= L: no symbol "Q" on this sheet'],
  ["L/(a - a) <= 3", "cannot divide"],
  ["", "the formula is empty"],
] as const;

describe("check refuses", () => {
  test.each(refused)("%j", (formula, message) => expect(() => sheet.check(formula)).toThrow(message));
});
