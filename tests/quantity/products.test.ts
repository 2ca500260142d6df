import { describe, expect, expectTypeOf, test } from "vitest";
import {
  type Dimension,
  dimensionOf,
  type Exponents,
  exponentsOf,
  type NamedDimension,
  type Product,
  type Products,
  productDimension,
  type Quotient,
  type Quotients,
  quotientDimension,
} from "../../lib/quantity/index.ts";

// The tables again, as values: the compiler holds each row to the type, the tests hold it to the exponents.
const products: { readonly [A in keyof Products]: Products[A] } = {
  length: {
    length: "area",
    area: "section modulus",
    "section modulus": "second moment of area",
    force: "moment",
    "force per length": "force",
    "force per area": "force per length",
    "force per volume": "force per area",
    moment: "flexural rigidity",
  },
  area: {
    length: "section modulus",
    area: "second moment of area",
    force: "flexural rigidity",
    "force per length": "moment",
    "force per area": "force",
    "force per volume": "force per length",
  },
  "section modulus": {
    length: "second moment of area",
    "force per length": "flexural rigidity",
    "force per area": "moment",
    "force per volume": "force",
  },
  "second moment of area": { "force per area": "flexural rigidity", "force per volume": "moment" },
  force: { length: "moment", area: "flexural rigidity" },
  "force per length": { length: "force", area: "moment", "section modulus": "flexural rigidity" },
  "force per area": {
    length: "force per length",
    area: "force",
    "section modulus": "moment",
    "second moment of area": "flexural rigidity",
  },
  "force per volume": {
    length: "force per area",
    area: "force per length",
    "section modulus": "force",
    "second moment of area": "moment",
  },
  moment: { length: "flexural rigidity" },
  "temperature change": { "per temperature": "pure number" },
  "per temperature": { "temperature change": "pure number" },
};

const quotients: { readonly [A in keyof Quotients]: Quotients[A] } = {
  area: { length: "length" },
  "section modulus": { length: "area", area: "length" },
  "second moment of area": { length: "section modulus", area: "area", "section modulus": "length" },
  force: {
    length: "force per length",
    area: "force per area",
    "force per length": "length",
    "force per area": "area",
  },
  "force per length": { length: "force per area", area: "force per volume", "force per area": "length" },
  "force per area": { length: "force per volume", "force per volume": "length" },
  moment: {
    "moment per angle": "angle",
    length: "force",
    area: "force per length",
    force: "length",
    "force per length": "area",
    "section modulus": "force per area",
    "force per area": "section modulus",
  },
  "flexural rigidity": {
    length: "moment",
    area: "force",
    moment: "length",
    force: "area",
    "force per area": "second moment of area",
    "second moment of area": "force per area",
  },
};

type Row = readonly [NamedDimension, NamedDimension, NamedDimension];
function rowsOf(table: object): Row[] {
  return Object.entries(table).flatMap(([a, row]) =>
    Object.entries(row as object).map(([b, result]) => [a, b, result] as Row),
  );
}

describe("products at run time are those of the types", () => {
  test.each(rowsOf(products))("%s x %s is %s", (a, b, result) => {
    expect(productDimension(a, b)).toBe(result);
    const right = exponentsOf(b);
    const sum = exponentsOf(a).map((value, index) => value + (right[index] ?? 0));
    expect(dimensionOf(sum as unknown as Exponents)).toBe(result);
  });
  test.each(rowsOf(quotients))("%s / %s is %s", (a, b, result) => {
    expect(quotientDimension(a, b)).toBe(result);
  });
});

const angles: readonly (readonly [Dimension, Dimension, Dimension])[] = [
  ["moment per angle", "angle", "moment"],
  ["angle", "moment per angle", "moment"],
  ["angle", "length", "length"],
  ["length", "pure number", "length"],
  ["pure number", "angle", "angle"],
  ["force", "force", "force^2"],
];
describe("angles and pure numbers", () => {
  test.each(angles)("%s x %s is %s", (a, b, result) => expect(productDimension(a, b)).toBe(result));
  test("moment / angle is a stiffness, length / length a pure number", () => {
    expect(quotientDimension("moment", "angle")).toBe("moment per angle");
    expect(quotientDimension("length", "length")).toBe("pure number");
    expect(quotientDimension("force", "pure number")).toBe("force");
    expect(quotientDimension("length", "area")).toBe("length^-1");
  });
});

test("types of products and quotients", () => {
  expectTypeOf<Product<"moment per angle", "angle">>().toEqualTypeOf<"moment">();
  expectTypeOf<Product<"length", "angle">>().toEqualTypeOf<"length">();
  expectTypeOf<Product<"force", "force">>().toEqualTypeOf<Dimension>();
  expectTypeOf<Product<Dimension, "length">>().toEqualTypeOf<Dimension>();
  expectTypeOf<Quotient<"moment", "angle">>().toEqualTypeOf<"moment per angle">();
  expectTypeOf<Quotient<"length", "length">>().toEqualTypeOf<"pure number">();
  expectTypeOf<Quotient<"force", "pure number">>().toEqualTypeOf<"force">();
});
