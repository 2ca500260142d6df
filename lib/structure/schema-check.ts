// Does a value from outside have the form a schema asks for? The first place where it has not is named.

import { StructureError } from "./faults.ts";
import type { Schema } from "./model-schema.ts";

/** Throws at the first part of the value that is not as the schema says; `where` names the value: "model". */
export function checkSchema(schema: Schema, value: unknown, where: string): void {
  if (schema.anyOf !== undefined) {
    checkAny(schema, schema.anyOf, value, where);
    return;
  }
  if (schema.const !== undefined && value !== schema.const)
    refuse(where, value, JSON.stringify(schema.const));
  if (schema.enum !== undefined && !schema.enum.some((choice) => choice === value))
    refuse(where, value, `one of ${schema.enum.map((choice) => JSON.stringify(choice)).join(", ")}`);
  if (schema.type !== undefined) checks[schema.type](schema, value, where);
}

const checks: Readonly<
  Record<NonNullable<Schema["type"]>, (schema: Schema, value: unknown, where: string) => void>
> = {
  string: (_, value, where) => {
    if (typeof value !== "string") refuse(where, value, "a text");
  },
  boolean: (_, value, where) => {
    if (typeof value !== "boolean") refuse(where, value, "true or false");
  },
  number: checkNumber,
  array: checkArray,
  object: checkObject,
};

function checkNumber({ exclusiveMinimum, minimum }: Schema, value: unknown, where: string): void {
  if (typeof value !== "number" || !Number.isFinite(value)) refuse(where, value, "a finite number");
  if (exclusiveMinimum !== undefined && !(value > exclusiveMinimum))
    refuse(where, value, `a number more than ${exclusiveMinimum}`);
  if (minimum !== undefined && !(value >= minimum)) refuse(where, value, `a number not below ${minimum}`);
}

function checkArray({ items, minItems = 0, maxItems }: Schema, value: unknown, where: string): void {
  if (!Array.isArray(value)) refuse(where, value, "a list");
  if (value.length < minItems || value.length > (maxItems ?? value.length))
    refuse(where, value, maxItems === undefined ? `a list of at least ${minItems}` : `a list of ${maxItems}`);
  if (items === undefined) return;
  value.forEach((item, i) => {
    checkSchema(items, item, `${where}[${i}]`);
  });
}

function checkObject({ properties = {}, required = [] }: Schema, value: unknown, where: string): void {
  if (typeof value !== "object" || value === null || Array.isArray(value)) refuse(where, value, "an object");
  for (const key of required) if (!Object.hasOwn(value, key)) refuse(`${where}.${key}`, undefined, "a value");
  for (const [key, inner] of Object.entries(value)) {
    const schema = Object.hasOwn(properties, key) ? properties[key] : undefined;
    if (schema === undefined)
      throw new StructureError({
        kind: "not a model",
        where: `${where}.${key}`,
        found: "unknown",
        wanted: `one of ${Object.keys(properties).join(", ")}`,
      });
    checkSchema(schema, inner, `${where}.${key}`);
  }
}

/** Of several forms the one with the value's `kind`, or with the keys it has; its faults are told. */
function checkAny(schema: Schema, forms: readonly Schema[], value: unknown, where: string): void {
  if (typeof value !== "object" || value === null || Array.isArray(value)) refuse(where, value, "an object");
  const kind = (value as { readonly kind?: unknown }).kind;
  const kinds = forms.flatMap((form) => form.properties?.kind?.const ?? []);
  const form =
    kinds.length > 0
      ? forms.find((f) => f.properties?.kind?.const === kind)
      : forms.find((f) => f.required?.some((key) => Object.hasOwn(value, key)));
  if (form !== undefined) checkSchema(form, value, where);
  else if (kinds.length > 0)
    refuse(`${where}.kind`, kind, `one of ${kinds.map((choice) => JSON.stringify(choice)).join(", ")}`);
  else refuse(where, value, schema.description ?? "one of the forms of the schema");
}

function refuse(where: string, value: unknown, wanted: string): never {
  throw new StructureError({ kind: "not a model", where, found: shown(value), wanted });
}

function shown(value: unknown): string {
  if (value === undefined) return "missing";
  if (typeof value === "number") return String(value);
  const written = JSON.stringify(value) ?? typeof value;
  return written.length > 60 ? `${written.slice(0, 57)}...` : written;
}
