// What every command's grammar is made of.
import { closest } from "fastest-levenshtein";

/** A fault in how the command was written; the words say what would be right. */
export class UsageError extends Error {}

/** A hint at what was probably meant. */
export const nearest = (word: string, known: readonly string[]): string =>
  `did you mean "${known.find((whole) => whole.startsWith(word)) ?? closest(word, [...known])}"?`;

/** The value of a flag: after "=", or the next word. */
export function flagValue(flag: string, inline: string | undefined, rest: string[], what: string): string {
  const value = inline ?? rest.shift();
  if (value === undefined || value === "") throw new UsageError(`${flag} needs ${what}`);
  return value;
}

/** A flag and what stands behind its "=". */
export function splitFlag(word: string): { readonly flag: string; readonly inline: string | undefined } {
  const [, flag = word, inline] = /^(--[^=]+)(?:=(.*))?$/s.exec(word) ?? [];
  return { flag, inline };
}
