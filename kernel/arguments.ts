// The command line's grammar: words in, what is asked for out.
import { closest } from "fastest-levenshtein";

export type Asked =
  | { readonly command: "help" }
  | { readonly command: "version" }
  | {
      readonly command: "run";
      readonly files: readonly string[];
      readonly out: string;
      readonly overrides: ReadonlyMap<string, string>;
    };

/** A fault in how the command was written; the words say what would be right. */
export class UsageError extends Error {}

export const HELP = `hingebook: approximate analysis of beams and frames as a traceable calculation

  hingebook run FILE… [--out DIR] [--set SYMBOL="MEASURE"]…
      run notebooks from start to end and leave a calculation package, NAME.html, for each
      --out DIR              folder for the packages (default: out)
      --set g="6 kN/m"       give a given another value for this run; may be repeated

  hingebook --help           this text
  hingebook --version        the version

A cell that fails stops the run: what was calculated before is left as NAME.INCOMPLETE.html, the exit code is 1.
`;

const COMMANDS = ["run"];
const RUN_FLAGS = ["--out", "--set", "--help"];

const nearest = (word: string, known: readonly string[]): string =>
  `did you mean "${known.find((whole) => whole.startsWith(word)) ?? closest(word, [...known])}"?`;

function addOverride(overrides: Map<string, string>, text: string): void {
  const at = text.indexOf("=");
  const symbol = text.slice(0, at).trim();
  const measure = text.slice(at + 1).trim();
  if (at < 0 || symbol === "" || measure === "") {
    throw new UsageError(`--set "${text}" is not SYMBOL="MEASURE"; write for example --set g="6 kN/m"`);
  }
  if (overrides.has(symbol)) throw new UsageError(`--set ${symbol} is given twice`);
  overrides.set(symbol, measure);
}

/** The value of a flag: after "=", or the next word. */
function flagValue(flag: string, inline: string | undefined, rest: string[], what: string): string {
  const value = inline ?? rest.shift();
  if (value === undefined || value === "") throw new UsageError(`${flag} needs ${what}`);
  return value;
}

function readRun(words: readonly string[]): Asked {
  const rest = [...words];
  const files: string[] = [];
  const overrides = new Map<string, string>();
  let out = "out";
  for (let word = rest.shift(); word !== undefined; word = rest.shift()) {
    if (word === "--") {
      files.push(...rest);
      break;
    }
    if (!word.startsWith("-")) {
      files.push(word);
      continue;
    }
    const [, flag = word, inline] = /^(--[^=]+)(?:=(.*))?$/s.exec(word) ?? [];
    if (flag === "--help" || flag === "-h") return { command: "help" };
    if (flag === "--out") out = flagValue(flag, inline, rest, "a folder, for example --out packages");
    else if (flag === "--set")
      addOverride(
        overrides,
        flagValue(flag, inline, rest, 'a symbol and a measure, for example --set g="6 kN/m"'),
      );
    else throw new UsageError(`"${flag}" is not an option of run; ${nearest(flag, RUN_FLAGS)}`);
  }
  if (files.length === 0) throw new UsageError("run needs a notebook, for example: hingebook run roof.ipynb");
  return { command: "run", files, out, overrides };
}

/** Read the words after "hingebook". Throws `UsageError`. */
export function readArguments(words: readonly string[]): Asked {
  const [command, ...rest] = words;
  if (command === undefined) throw new UsageError("say what to do, for example: hingebook run roof.ipynb");
  if (command === "--help" || command === "-h" || command === "help") return { command: "help" };
  if (command === "--version" || command === "-v") return { command: "version" };
  if (command === "run") return readRun(rest);
  const known = command.startsWith("-") ? ["--help", "--version"] : COMMANDS;
  const kind = command.startsWith("-") ? "an option" : "a command";
  throw new UsageError(`"${command}" is not ${kind} of hingebook; ${nearest(command, known)}`);
}
