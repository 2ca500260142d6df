// The second reader of formulas against plain arithmetic and against the library's own, and against planted faults.
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { evaluate } from "../../lib/sheet/evaluate.ts";
import { type CalculationRecord, type Entry, formulaValue, recheckFormulas } from "../../lib/sheet/index.ts";
import { parseDefinition } from "../../lib/sheet/parse.ts";
import { notebook } from "./record-fixture.ts";

const inputs = { a: 3, b: -2, c: 0.5, L: 12.6, w_Ed: 10.9 };

describe("formulaValue", () => {
  test.each([
    ["1 + 2*3", 7],
    ["(1 + 2)*3", 9],
    ["2 - 3 - 4", -5],
    ["16/4/2", 2],
    ["-2^2", -4],
    ["(-2)^2", 4],
    ["2^3^2", 512],
    ["2^-1", 0.5],
    ["-a*b", 6],
    ["--a", 3],
    ["a - -b", 1],
    ["1e3 + .5", 1000.5],
    ["1e-7*1e+7", 1],
    ["w_Ed*L^2/8", (10.9 * 12.6 ** 2) / 8],
    ["sqrt(a^2 + (2*b)^2)", 5],
    ["max(a, b, c) - min(a, b, c)", 5],
    ["abs(b)", 2],
    ["sin(pi/6)", 0.5],
    ["atan(1)*4", Math.PI],
  ])("%s is %d", (formula, value) => {
    expect(formulaValue(formula, inputs)).toBeCloseTo(value, 12);
  });

  test.each([
    ["a +", /"" stands where a value is wanted/],
    ["(a", /"\)" is wanted/],
    ["a b", /"b" is left over/],
    ["x", /x has no value/],
    ["toString", /toString has no value/],
    ["__proto__", /cannot stand in a formula|has no value/],
    ["exec(a)", /"exec" is no function/],
    ["a; b", /";" cannot stand in a formula/],
    ["", /"" stands where a value is wanted/],
  ])("%s is refused", (formula, words) => {
    expect(() => formulaValue(formula, inputs)).toThrow(words);
  });

  test("agrees with the library's own reader on 2,000 random formulas", () => {
    const leaf = fc.oneof(
      fc.constantFrom("a", "b", "c", "L", "w_Ed", "pi"),
      fc.integer({ min: 0, max: 99 }).map(String),
      fc.double({ min: 0.001, max: 1e4, noNaN: true }).map(String),
    );
    const { formula } = fc.letrec<{ formula: string }>((tie) => ({
      formula: fc.oneof(
        { maxDepth: 5 },
        leaf,
        fc
          .tuple(tie("formula"), fc.constantFrom(" + ", " - ", "*", "/", "^"), tie("formula"))
          .map((t) => t.join("")),
        tie("formula").map((f) => `(${f})`),
        tie("formula").map((f) => `-${f}`),
        tie("formula").map((f) => `abs(${f})`),
        fc.tuple(tie("formula"), tie("formula")).map(([f, g]) => `max(${f}, ${g})`),
      ),
    }));
    const scope = (name: string): { si: number; dimension: "pure number"; unit: string } => ({
      si: inputs[name as keyof typeof inputs],
      dimension: "pure number",
      unit: "",
    });
    let compared = 0;
    fc.assert(
      fc.property(formula, (text) => {
        let due: number;
        try {
          due = evaluate(parseDefinition(`y = ${text}`).expression, scope).si;
        } catch {
          return; // refused by the library: no finite value, and never in a record
        }
        compared++;
        const found = formulaValue(text, inputs);
        expect(Math.abs(found - due)).toBeLessThanOrEqual(1e-9 * Math.max(Math.abs(found), Math.abs(due)));
      }),
      { seed: 4, numRuns: 2000 },
    );
    expect(compared).toBeGreaterThan(500);
  });
});

describe("recheckFormulas", () => {
  const record: CalculationRecord = notebook();
  const faults = (entries: readonly Entry[]): readonly string[] =>
    recheckFormulas(entries).faults.map(({ id, words }) => `${id}: ${words}`);
  const changed = (id: string, change: (entry: Entry) => object): readonly Entry[] =>
    record.entries.map((entry) => (entry.id === id ? ({ ...entry, ...change(entry) } as Entry) : entry));

  test("works out every formula of a record", () => {
    const { count, faults: none } = recheckFormulas(record.entries);
    expect(none).toEqual([]);
    expect(count).toBe(record.entries.filter(({ kind }) => kind === "calc" || kind === "check").length);
  });

  test.each([
    [
      "a result",
      "M_0",
      { value: { si: 1, dimension: "moment", unit: "kN m", text: "" } },
      /M_0: .* gives .* the record says 1$/m,
    ],
    ["an input", "M_0", { inputs: { w: 1, L: 14 } }, /M_0: used w = 1, the record says 12800/],
    [
      "a given",
      "g",
      { value: { si: 1, dimension: "force per length", unit: "kN/m", text: "" } },
      /w: used g = 5200, the record says 1/,
    ],
    ["a verdict", "check M_0 <= M_R", { passed: false }, /holds, the record says otherwise/],
    ["a utilisation", "check M_0 <= M_R", { utilisation: 0.5 }, /utilisation 0\.\d+, the record says 0\.5/],
    ["a formula", "M_0", { formula: "M_0 = w*L^2/10" }, /"M_0 = w\*L\^2\/10" gives/],
    [
      "a formula that is none",
      "M_0",
      { formula: "M_0 = process.exit()" },
      /cannot stand in a formula|has no value|left over/,
    ],
    ["an input that is gone", "M_0", { inputs: { w: 12800, L: 14, Z: 1 } }, /Z is not in the record/],
  ])("finds %s that was changed", (_, id, change, words) => {
    expect(faults(changed(id, () => change)).join("\n")).toMatch(words);
  });
});
