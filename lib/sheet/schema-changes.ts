// The schema of what differs between two records.

import { z } from "zod";
import type { Changes } from "./change.ts";
import { list, name, number, source, text } from "./schema-parts.ts";

const valueChange = z
  .strictObject({ before: text, after: text, percent: z.exactOptional(number) })
  .readonly();
const textChange = z.strictObject({ before: source, after: source }).readonly();
const named = { id: name, name: text };
const lineNamed = z.strictObject({ ...named, kind: text }).readonly();

/** What differs between two records. */
export const changes: z.ZodType<Changes> = z
  .strictObject({
    head: list(z.strictObject({ field: text, before: text, after: text }).readonly()),
    grounds: list(
      z
        .strictObject({
          ...named,
          kind: z.enum(["given", "assumption"]),
          value: z.exactOptional(valueChange),
          source: z.exactOptional(textChange),
          words: z.exactOptional(textChange),
          standing: list(name),
        })
        .readonly(),
    ),
    results: list(
      z
        .strictObject({
          ...named,
          kind: z.enum(["result", "calc", "step", "table"]),
          value: valueChange,
          governing: z.boolean(),
        })
        .readonly(),
    ),
    bands: z.exactOptional(
      list(z.strictObject({ ...named, before: text, after: text, governing: z.boolean() }).readonly()),
    ),
    checks: list(z.strictObject({ ...named, before: text, after: text, turned: z.boolean() }).readonly()),
    raised: list(lineNamed),
    settled: list(lineNamed),
    words: list(z.strictObject({ ...named, kind: text, before: source, after: source }).readonly()),
    added: list(lineNamed),
    removed: list(lineNamed),
  })
  .readonly();
