import { inspect } from "node:util";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type Dimension,
  dimensionNames,
  dimensionOf,
  displayedAs,
  exponentsOf,
  isQuantity,
  type Quantity,
  quantity,
  readMeasure,
  sameDimension,
  sameExponents,
} from "../../lib/quantity/index.ts";

const L = quantity(6, "length", { unit: "m", from: ["L@1"] });
const H = quantity(12000, "force", { unit: "kN", from: ["H@2"] });
const w = quantity(5200, "force per length", { unit: "kN/m", from: ["w@1", "L@1"] });

describe("a quantity", () => {
  test("is frozen, with what it came from", () => {
    expect(Object.isFrozen(L) && Object.isFrozen(L.from)).toBe(true);
  });

  test("carries what both operands came from, each once", () => {
    expect(w.times(L).from).toEqual(["w@1", "L@1"]);
    expect(L.plus(readMeasure("2 m", "length", "x")).from).toEqual(["L@1"]);
    expect(H.over(L).from).toEqual(["H@2", "L@1"]);
    expect(L.negated().from).toEqual(["L@1"]);
  });

  test("shows itself as text", () => {
    expect(`${L}`).toBe("6.00 m");
    expect(inspect(w)).toBe("5.20 kN/m");
    const display = (L as unknown as Record<symbol, () => unknown>)[Symbol.for("Jupyter.display")];
    expect(display?.call(L)).toEqual({ "text/plain": "6.00 m" });
  });

  test("can be given another display without being another value", () => {
    const shown = displayedAs(L, () => ({ "text/plain": "L = 6 m" }));
    const display = (shown as unknown as Record<symbol, () => unknown>)[Symbol.for("Jupyter.display")];
    expect(display?.call(shown)).toEqual({ "text/plain": "L = 6 m" });
    expect(JSON.stringify(shown)).toBe('{"dimension":"length","si":6,"unit":"m","from":["L@1"]}');
  });

  test("is known by its shape", () => {
    expect(isQuantity({ dimension: "length", si: 1, unit: "", from: [] })).toBe(true);
    expect([null, 3, "3 m", {}, { si: 1 }].some(isQuantity)).toBe(false);
  });

  test("has no negative nought", () => expect(Object.is(quantity(-0, "force").si, 0)).toBe(true));
});

const sums: readonly (readonly [string, () => unknown, string])[] = [
  ["6 m + 12 kN", () => L.plus(H as never), "cannot add 6 m (length) and 12 kN (force)"],
  ["6 m - 12 kN", () => L.minus(H as never), "cannot subtract 12 kN (force) from 6 m (length)"],
  ["6 m : 12 kN", () => L.compare("12 kN" as never), "cannot compare 6 m (length) and 12 kN (force)"],
  ["6 m / 0", () => L.over(0), "6 m (length) cannot be divided by 0"],
  ["6 m / 0 kN", () => L.over(H.minus(H)), "6 m (length) cannot be divided by 0 kN"],
  ["6 m * NaN", () => L.times(Number.NaN), "6 m (length) cannot be multiplied by NaN; a finite number"],
  ['6 m * "3"', () => L.times("3" as never), '6 m (length) cannot be multiplied by "3"'],
  ["6 m / undefined", () => L.over(undefined as never), "6 m (length) cannot be divided by undefined"],
  ["6 m in kN", () => L.in("kN" as never), "6 m (length) cannot be given in kN, which is a force"],
  ["6 m to kN", () => L.to("kN" as never), "6 m (length) cannot be given in kN, which is a force"],
  ["6 m in furlong", () => L.in("furlong" as never), '"furlong" is not a unit known here'],
  [
    "infinite",
    () => quantity(Number.POSITIVE_INFINITY, "force"),
    "Infinity is not a finite value for a force",
  ],
];

describe("refused in words", () => {
  test.each(sums)("%s", (_, work, message) => expect(work).toThrow(message));
});

const any = fc.double({ min: -1e9, max: 1e9, noNaN: true });
const some = any.filter((value) => Math.abs(value) > 1e-6);

describe("the algebra of quantities", () => {
  const near = (a: Quantity, b: Quantity, scale = 1): void => {
    expect(a.dimension).toBe(b.dimension);
    expect(Math.abs(a.si - b.si)).toBeLessThanOrEqual(1e-9 * Math.max(Math.abs(a.si), Math.abs(b.si), scale));
  };
  test("sums commute, and a - b + b is a", () => {
    fc.assert(
      fc.property(any, any, (a, b) => {
        const [x, y] = [quantity(a, "force"), quantity(b, "force")];
        near(x.plus(y), y.plus(x));
        near(x.minus(y).plus(y), x, Math.abs(a) + Math.abs(b));
        expect(x.compare(y)).toBe(Math.sign(a - b));
      }),
      { seed: 814 },
    );
  });
  test("a product is undone by its factor, and distributes over sums", () => {
    fc.assert(
      fc.property(some, some, some, (a, b, c) => {
        const [x, y, z] = [quantity(a, "force"), quantity(b, "length"), quantity(c, "length")];
        near(x.times(y).over(y), x);
        near(x.times(y), y.times(x));
        near(x.times(y.plus(z)), x.times(y).plus(x.times(z)), Math.abs(a) * (Math.abs(b) + Math.abs(c)));
        near(x.times(2).over(2), x);
      }),
      { seed: 815 },
    );
  });
});

const exponents: readonly (readonly [Dimension, number, number, number])[] = [
  ["pure number", 0, 0, 0],
  ["angle", 0, 0, 0],
  ["moment per angle", 1, 1, 0],
  ["force^2", 2, 0, 0],
  ["length^5", 0, 5, 0],
  ["force length^3", 1, 3, 0],
  ["force^-1 length^2", -1, 2, 0],
  ["force^0.5 length^-0.5", 0.5, -0.5, 0],
  ["temperature change", 0, 0, 1],
  ["per temperature", 0, 0, -1],
  ["temperature^2", 0, 0, 2],
  ["force length^2 temperature^-1", 1, 2, -1],
];

describe("dimensions", () => {
  test.each(exponents)(
    "%s has force^%d length^%d temperature^%d",
    (dimension, force, length, temperature) => {
      expect(exponentsOf(dimension)).toEqual([force, length, temperature]);
    },
  );
  test("exponents name the dimension and the dimension its exponents", () => {
    const power = fc.integer({ min: -8, max: 8 }).map((half) => half / 2);
    fc.assert(
      fc.property(power, power, power, (force, length, temperature) => {
        const exponents = [force, length, temperature] as const;
        expect(exponentsOf(dimensionOf(exponents))).toEqual(exponents);
      }),
      { seed: 816, numRuns: 300 },
    );
  });
  test("every named dimension is alike to itself, an angle to a pure number, a stiffness not to a moment", () => {
    for (const name of dimensionNames) expect(sameDimension(name, name)).toBe(true);
    expect(sameDimension("angle", "pure number")).toBe(true);
    expect(sameDimension("moment per angle", "moment")).toBe(false);
    expect(sameExponents("moment per angle", "moment")).toBe(true);
  });
  test.each(["", "mass", "force^", "forcelength"])("%j is no dimension", (text) => {
    expect(() => exponentsOf(text as Dimension)).toThrow(`"${text}" is not a dimension; the named ones are`);
  });
});
