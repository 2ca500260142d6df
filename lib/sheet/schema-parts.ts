// The parts every schema of a record is made of: each text, number and list with its bound.

import { z } from "zod";

/** Bounds of a record; far above any calculation a person can follow. */
export const LIMITS: Readonly<Record<"text" | "source" | "list" | "entries" | "number", number>> =
  Object.freeze({ text: 100_000, source: 8_000_000, list: 20_000, entries: 20_000, number: 1e30 });

type Text = z.ZodString;
type Listed<T extends z.ZodType> = z.ZodReadonly<z.ZodArray<T>>;

export const text: Text = z.string().max(LIMITS.text);
export const source: Text = z.string().max(LIMITS.source);
export const number: z.ZodNumber = z.number().min(-LIMITS.number).max(LIMITS.number);
export const count: z.ZodInt = z.int().min(0).max(1_000_000);
/** An entry's id. */
export const name: Text = z.string().min(1).max(10_000);
export const symbol: Text = z.string().min(1).max(100);
export const revision: Text = z
  .string()
  .regex(
    /^[A-Za-z0-9][A-Za-z0-9._-]{0,19}$/,
    'a revision such as "P2" is wanted: letters, digits, . _ -, at most 20',
  );
export const digest: Text = z.string().regex(/^[0-9a-f]{64}$/, "64 hexadecimal digits are wanted");

export const list = <T extends z.ZodType>(item: T): Listed<T> => z.array(item).max(LIMITS.list).readonly();

/** What an entry stands on. */
export const use: Text = z
  .string()
  .max(10_020)
  .regex(/^.+@\d{1,9}$/s, 'an entry and its version is wanted, such as "L@1"')
  .describe('an entry and its version, "id@version"');

// A plain name or path downwards, so that a file taken out of a package cannot land anywhere else.
export const fileName: Text = z
  .string()
  .max(255)
  .regex(/^(?!\.{1,2}$)[^/\\\p{Cc}]+$/u, "a file name without folders is wanted");
export const filePath: Text = z
  .string()
  .max(1000)
  .regex(
    /^(?!(?:.*\/)?\.{1,2}(?:\/|$))[^/\\\p{Cc}]+(?:\/[^/\\\p{Cc}]+)*$/u,
    "a path below the notebook's folder is wanted",
  );
