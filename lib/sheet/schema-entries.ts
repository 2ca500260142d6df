// The schema of one entry of a record, by kind.

import { z } from "zod";
import type { Entry, ResultBand, ShownValue } from "./record.ts";
import { count, list, name, number, source, symbol, text, use } from "./schema-parts.ts";

const shownForm = z
  .strictObject({ si: number, dimension: text, unit: z.string().max(40), text: z.string().max(200) })
  .readonly()
  .describe("a number in SI with the unit and text it is shown with");
const four = { low: number, high: number, least: number, greatest: number };
const band = z
  .strictObject({
    low: shownForm,
    high: shownForm,
    least: shownForm,
    greatest: shownForm,
    measure: z.enum(["ratio", "difference"]),
    against: z.strictObject(four).readonly(),
    bias: shownForm,
    single: z.exactOptional(z.literal(true)),
    words: text,
    uses: list(use),
  })
  .readonly()
  .describe("how the true value lies about a hand value") satisfies z.ZodType<ResultBand>;
const lines = z.strictObject({ symbols: text, numbers: text, result: text }).readonly();
const inputs = z.record(z.string().max(100), number).readonly();
const terms = list(
  z.strictObject({ coefficient: number, value: number, from: z.exactOptional(use) }).readonly(),
);

const base = {
  id: name.describe("stable name: the symbol, otherwise what the entry is about"),
  version: z.int().min(1).max(1_000_000).describe("grows when the entry's value changes"),
  cell: count.describe("number of the notebook cell that made it, from 1; 0 without a notebook"),
  uses: list(use).describe("what the entry stands on"),
  outOfDate: z.boolean().describe("true when something it stands on has changed since"),
};
const cell = z.union([
  text,
  z.strictObject({ value: shownForm, uses: list(use), band: z.exactOptional(band) }).readonly(),
]);

const form = z.discriminatedUnion("kind", [
  z.strictObject({
    ...base,
    kind: z.literal("given"),
    symbol,
    tex: text,
    value: shownForm,
    description: text,
    source: z.exactOptional(text),
    overridden: z.exactOptional(shownForm),
  }),
  z.strictObject({
    ...base,
    kind: z.literal("assumption"),
    symbol: z.exactOptional(symbol),
    tex: z.exactOptional(text),
    value: z.exactOptional(shownForm),
    text,
    because: text,
    overridden: z.exactOptional(shownForm),
  }),
  z.strictObject({
    ...base,
    kind: z.literal("calc"),
    symbol,
    tex: text,
    formula: text,
    lines,
    inputs,
    value: shownForm,
    description: text,
  }),
  z.strictObject({
    ...base,
    kind: z.literal("check"),
    formula: text,
    lines,
    inputs,
    passed: z.boolean(),
    utilisation: z.exactOptional(number),
    description: text,
    closure: z.exactOptional(z.literal(true)),
    terms: z.exactOptional(terms),
  }),
  z.strictObject({
    ...base,
    kind: z.literal("result"),
    symbol,
    tex: text,
    value: shownForm,
    description: text,
    governing: z.boolean(),
    band: z.exactOptional(band),
  }),
  z.strictObject({
    ...base,
    kind: z.literal("step"),
    body: text,
    lines,
    value: shownForm,
    terms,
    coefficient: number,
  }),
  z.strictObject({ ...base, kind: z.literal("note"), text }),
  z.strictObject({ ...base, kind: z.literal("text"), markdown: source }),
  z.strictObject({ ...base, kind: z.literal("finding"), title: text, verdict: text, lines: list(text) }),
  z.strictObject({ ...base, kind: z.literal("query"), text }),
  z.strictObject({
    ...base,
    kind: z.literal("table"),
    caption: text,
    columns: list(text),
    rows: list(list(cell)),
  }),
  z.strictObject({
    ...base,
    kind: z.literal("figure"),
    caption: text,
    alternative: text,
    spec: z
      .looseObject({ kind: z.string().max(100) })
      .readonly()
      .describe("drawing instructions"),
  }),
  z.strictObject({ ...base, kind: z.literal("conclusion"), text }),
]) satisfies z.ZodType<Entry>;

/** One entry of a record. */
export const entry: z.ZodType<Entry> = form;

/** A value with the text it is shown with. */
export const shown: z.ZodType<ShownValue> = shownForm;

// A field that is added to an entry and forgotten here would be refused in every file: these types find it.
type FieldsOf<T, K> = T extends { readonly kind: K } ? keyof T : never;
type Forgotten = {
  [K in Entry["kind"]]: Exclude<FieldsOf<Entry, K>, FieldsOf<z.output<typeof form>, K>>;
}[Entry["kind"]];
const nothingForgotten: [Forgotten] extends [never] ? true : Forgotten = true;
void nothingForgotten;
