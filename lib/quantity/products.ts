// Which dimension a product or a quotient has, for the type checker. At run time the exponents decide; a test holds
// the two together. What is not listed is a Quantity<Dimension>.

import { type Dimension, dimensionOf, type Exponents, exponentsOf } from "./dimension.ts";

export interface Products {
  length: {
    length: "area";
    area: "section modulus";
    "section modulus": "second moment of area";
    force: "moment";
    "force per length": "force";
    "force per area": "force per length";
    "force per volume": "force per area";
    moment: "flexural rigidity";
  };
  area: {
    length: "section modulus";
    area: "second moment of area";
    force: "flexural rigidity";
    "force per length": "moment";
    "force per area": "force";
    "force per volume": "force per length";
  };
  "section modulus": {
    length: "second moment of area";
    "force per length": "flexural rigidity";
    "force per area": "moment";
    "force per volume": "force";
  };
  "second moment of area": { "force per area": "flexural rigidity"; "force per volume": "moment" };
  force: { length: "moment"; area: "flexural rigidity" };
  "force per length": { length: "force"; area: "moment"; "section modulus": "flexural rigidity" };
  "force per area": {
    length: "force per length";
    area: "force";
    "section modulus": "moment";
    "second moment of area": "flexural rigidity";
  };
  "force per volume": {
    length: "force per area";
    area: "force per length";
    "section modulus": "force";
    "second moment of area": "moment";
  };
  moment: { length: "flexural rigidity" };
  "temperature change": { "per temperature": "pure number" };
  "per temperature": { "temperature change": "pure number" };
}

export interface Quotients {
  area: { length: "length" };
  "section modulus": { length: "area"; area: "length" };
  "second moment of area": { length: "section modulus"; area: "area"; "section modulus": "length" };
  force: {
    length: "force per length";
    area: "force per area";
    "force per length": "length";
    "force per area": "area";
  };
  "force per length": { length: "force per area"; area: "force per volume"; "force per area": "length" };
  "force per area": { length: "force per volume"; "force per volume": "length" };
  moment: {
    "moment per angle": "angle";
    length: "force";
    area: "force per length";
    force: "length";
    "force per length": "area";
    "section modulus": "force per area";
    "force per area": "section modulus";
  };
  "flexural rigidity": {
    length: "moment";
    area: "force";
    moment: "length";
    force: "area";
    "force per area": "second moment of area";
    "second moment of area": "force per area";
  };
}

type Plain = "pure number";
type Unknown<A, B> = [Dimension] extends [A] ? true : [Dimension] extends [B] ? true : false;

type AngleTimes<D> = D extends "moment per angle" ? "moment" : D extends "angle" ? Plain : D;
type OverAngle<D> = D extends "moment" ? "moment per angle" : D extends "angle" ? Plain : D;
type Listed<T, A, B> = A extends keyof T
  ? B extends keyof T[A]
    ? T[A][B] & Dimension
    : Dimension
  : Dimension;

/** Dimension of a product. */
export type Product<A extends Dimension, B extends Dimension> =
  Unknown<A, B> extends true
    ? Dimension
    : A extends Plain
      ? B
      : B extends Plain
        ? A
        : A extends "angle"
          ? AngleTimes<B>
          : B extends "angle"
            ? AngleTimes<A>
            : Listed<Products, A, B>;

/** Dimension of a quotient. */
export type Quotient<A extends Dimension, B extends Dimension> =
  Unknown<A, B> extends true
    ? Dimension
    : B extends Plain
      ? A
      : A extends B
        ? Plain
        : B extends "angle"
          ? OverAngle<A>
          : Listed<Quotients, A, B>;

/** Dimension of the product of two dimensions at run time. */
export function productDimension(a: Dimension, b: Dimension): Dimension {
  if (a === "pure number") return b;
  if (b === "pure number") return a;
  return dimensionOf(combine(a, b, 1));
}

/** Dimension of the quotient of two dimensions at run time. */
export function quotientDimension(a: Dimension, b: Dimension): Dimension {
  if (b === "pure number") return a;
  if (a === b) return "pure number";
  if (a === "moment" && b === "angle") return "moment per angle";
  if (a === "moment" && b === "moment per angle") return "angle";
  return dimensionOf(combine(a, b, -1));
}

function combine(a: Dimension, b: Dimension, sign: 1 | -1): Exponents {
  const [f, l, t] = exponentsOf(a);
  const [g, m, u] = exponentsOf(b);
  return [f + sign * g, l + sign * m, t + sign * u];
}
