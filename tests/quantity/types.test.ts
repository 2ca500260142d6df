import { expect, expectTypeOf, test } from "vitest";
import {
  type AnyMeasure,
  type AnyUnit,
  type DimensionOf,
  type DimensionOfUnit,
  type Measure,
  type Quantity,
  readMeasure,
} from "../../lib/quantity/index.ts";

function given<const M extends AnyMeasure>(value: M): Quantity<DimensionOf<M>> {
  return readMeasure(value, undefined, "x") as Quantity<DimensionOf<M>>;
}
function span(value: Measure<"length">): number {
  return readMeasure(value, "length", "span").si;
}
function dimensionOfUnit<const U extends AnyUnit>(unit: U): DimensionOfUnit<U> {
  return readMeasure(`1 ${unit}`, undefined, "x").dimension as DimensionOfUnit<U>;
}

test("the dimension is read off the text, by the compiler and at run time alike", () => {
  const rows = [
    given("14 m"),
    given("14'-6\""),
    given("14'-6 1/2\""),
    given('6"'),
    given("5.2 kN/m"),
    given("2.5"),
    given(2.5),
    given("1/200"),
    given("50 %"),
    given("12 kip-ft"),
    given("12 kN m/rad"),
    given("8360 cm⁴"),
    given("24 kg/m^3"),
    given("0.5 deg"),
  ] as const;
  expectTypeOf(rows).toEqualTypeOf<
    readonly [
      Quantity<"length">,
      Quantity<"length">,
      Quantity<"length">,
      Quantity<"length">,
      Quantity<"force per length">,
      Quantity<"pure number">,
      Quantity<"pure number">,
      Quantity<"pure number">,
      Quantity<"pure number">,
      Quantity<"moment">,
      Quantity<"moment per angle">,
      Quantity<"second moment of area">,
      Quantity<"force per volume">,
      Quantity<"angle">,
    ]
  >();
  const l = "length";
  const p = "pure number";
  const rest = ["moment", "moment per angle", "second moment of area", "force per volume", "angle"];
  expect(rows.map((row) => row.dimension)).toEqual([l, l, l, l, "force per length", p, p, p, p, ...rest]);
});

test("a unit names its dimension", () => {
  expectTypeOf(dimensionOfUnit("kN m")).toEqualTypeOf<"moment">();
  expectTypeOf(dimensionOfUnit("kN/m^2")).toEqualTypeOf<"force per area">();
  expectTypeOf(dimensionOfUnit("klf")).toEqualTypeOf<"force per length">();
  expect([dimensionOfUnit("kN m"), dimensionOfUnit("klf")]).toEqual(["moment", "force per length"]);
});

test("products of quantities have the type of what they are", () => {
  const w = given("5.2 kN/m");
  const L = given("14 m");
  const M = w.times(L).times(L).over(8);
  expectTypeOf(M).toEqualTypeOf<Quantity<"moment">>();
  expectTypeOf(M.over(L)).toEqualTypeOf<Quantity<"force">>();
  expect(M.in("kN m")).toBeCloseTo(127.4, 10);
  expect(M.dimension).toBe("moment");
});

test("a wrong literal or quantity is refused by the compiler, and again at run time", () => {
  const w = given("5.2 kN/m");
  const L = given("14 m");
  expect(span(L) + span("14 m") + span("14'")).toBeCloseTo(28 + 14 * 0.3048, 12);
  // @ts-expect-error a force is no length
  expect(() => span("14 kN")).toThrow("is a force");
  // @ts-expect-error a length needs a unit
  expect(() => span(14)).toThrow("is a pure number");
  // @ts-expect-error a line load is no length
  expect(() => span(w)).toThrow("is a force per length");
  // @ts-expect-error lengths and line loads have no sum
  expect(() => L.plus(w)).toThrow("cannot add");
  // @ts-expect-error lengths and forces have no difference
  expect(() => L.minus("3 kN")).toThrow("cannot subtract");
  // @ts-expect-error a length is not given in kN
  expect(() => L.in("kN")).toThrow("cannot be given in kN");
  // @ts-expect-error there is no such unit
  expect(() => given("14 metres")).toThrow('"metres" is not a unit known here');
});
