// The record's form, held against files that come from strangers. Strict: nothing that is not named here, and nothing
// without a bound. Apart from the room's index, so that a cell does not wait for the validator.

import { z } from "zod";
import {
  type CalculationRecord,
  type IssueMark,
  type Movement,
  RECORD_FORMAT,
  RECORD_VERSION,
} from "./record.ts";
import { changes } from "./schema-changes.ts";
import { entry, shown } from "./schema-entries.ts";
import {
  count,
  digest,
  fileName,
  filePath,
  LIMITS,
  list,
  name,
  number,
  revision,
  source,
  text,
} from "./schema-parts.ts";

const head = z
  .strictObject({
    title: text,
    job: text,
    preparedBy: text,
    checkedBy: z.exactOptional(text),
    approvedBy: z.exactOptional(text),
    checkedOn: z.exactOptional(text),
    approvedOn: z.exactOptional(text),
    date: z.exactOptional(text),
    revision: z.exactOptional(text),
    basis: text,
    units: text,
    status: text,
  })
  .readonly();

const issue = z
  .strictObject({
    revision: revision,
    why: text,
    number: z.int().min(1).max(100_000),
    follows: digest,
  })
  .readonly() satisfies z.ZodType<IssueMark>;

const movement = z
  .strictObject({
    assumption: name,
    change: text,
    set: shown,
    results: list(z.strictObject({ id: name, value: shown, share: z.exactOptional(number) }).readonly()),
    failed: z.exactOptional(text),
  })
  .readonly() satisfies z.ZodType<Movement>;

const form = z
  .strictObject({
    format: z.literal(RECORD_FORMAT),
    version: z.literal(RECORD_VERSION),
    complete: z.boolean(),
    failure: z.exactOptional(
      z.strictObject({ cell: count, line: z.exactOptional(count), message: text, excerpt: text }).readonly(),
    ),
    head,
    notConsidered: z.exactOptional(list(text)),
    overrides: list(z.strictObject({ symbol: name, written: text, set: text }).readonly()),
    entries: z.array(entry).max(LIMITS.entries).readonly(),
    notebook: z.strictObject({ name: fileName, source }).readonly(),
    files: z.exactOptional(list(z.strictObject({ path: filePath, text: source }).readonly())),
    versions: z.record(z.string().max(100), z.string().max(100)).readonly(),
    issue: z.exactOptional(issue),
    since: z.exactOptional(z.strictObject({ revision: revision, changes }).readonly()),
    moves: z.exactOptional(list(movement)),
  })
  .readonly()
  .describe(
    "One run of a calculation. Numbers are SI; every value carries the unit and text it is shown with, and what it stands on.",
  );

/** The record, version 0. */
export const recordSchema: z.ZodType<CalculationRecord> = form;

// A field that is added to the record and forgotten here would be refused in every file: these types find it.
type Forgotten =
  | Exclude<keyof CalculationRecord, keyof z.output<typeof form>>
  | Exclude<keyof CalculationRecord["head"], keyof z.output<typeof head>>;
const nothingForgotten: [Forgotten] extends [never] ? true : Forgotten = true;
void nothingForgotten;

/** The form of a record as JSON Schema, draft 2020-12. */
export function recordJsonSchema(): object {
  return {
    title: "Record of a calculation",
    ...z.toJSONSchema(recordSchema, { target: "draft-2020-12", io: "input" }),
  };
}
