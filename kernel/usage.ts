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

/** What a flag takes, and what to say when it is missing; a flag without words takes nothing. */
export type Flags = Readonly<Record<string, string | undefined>>;

/** Words sorted into flags with their values and the others; `help` when that was asked for. */
export interface ReadWords {
  readonly given: ReadonlyMap<string, string>;
  readonly others: readonly string[];
  readonly help: boolean;
}

/** The words after a command. Throws `UsageError` on a flag it does not take, without its value, or given twice. */
export function readWords(command: string, words: readonly string[], flags: Flags): ReadWords {
  const rest = [...words];
  const given = new Map<string, string>();
  const others: string[] = [];
  for (let word = rest.shift(); word !== undefined; word = rest.shift()) {
    if (word === "--") {
      others.push(...rest);
      break;
    }
    if (!word.startsWith("-")) {
      others.push(word);
      continue;
    }
    const { flag, inline } = splitFlag(word);
    if (flag === "--help" || flag === "-h") return { given, others, help: true };
    if (!Object.hasOwn(flags, flag))
      throw new UsageError(`"${flag}" is not an option of ${command}; ${nearest(flag, Object.keys(flags))}`);
    if (given.has(flag)) throw new UsageError(`${flag} is given twice`);
    const what = flags[flag];
    if (what === undefined && inline !== undefined) throw new UsageError(`${flag} takes no value`);
    given.set(flag, what === undefined ? "" : flagValue(flag, inline, rest, what));
  }
  return { given, others, help: false };
}
