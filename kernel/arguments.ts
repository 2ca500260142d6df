// The command line's grammar: words in, what is asked for out.

import { type AskedKernel, KERNEL_HELP, readKernelArguments } from "./jupyter/arguments.ts";
import { type AskedNew, NEW_HELP, readNewArguments } from "./new/arguments.ts";
import { type AskedRecord, RECORD_COMMANDS, RECORD_HELP, readRecordArguments } from "./record/arguments.ts";
import { flagValue, nearest, splitFlag, UsageError } from "./usage.ts";

export type Asked =
  | { readonly command: "help" }
  | { readonly command: "version" }
  | {
      readonly command: "run";
      readonly files: readonly string[];
      readonly out: string;
      readonly overrides: ReadonlyMap<string, string>;
      /** Run again on every change, and serve the package. */
      readonly watch: boolean;
      /** Run again with each assumption changed, and list what it moves. */
      readonly sensitivity: boolean;
    }
  | AskedKernel
  | AskedNew
  | AskedRecord;

export { UsageError };

export const HELP: string = `hingebook: approximate analysis of beams and frames as a traceable calculation

${NEW_HELP}
  hingebook run FILE… [--out DIR] [--set SYMBOL="MEASURE"]…
      run notebooks from start to end and leave a calculation package, NAME.html, for each; a folder stands for
      the notebooks in it and leaves index.html, the register of the job
      --out DIR              folder for the packages (default: out)
      --set g="6 kN/m"       give a given another value for this run; may be repeated
      --watch                stay, run again when the notebook or a file beside it changes, show the package in a browser
      --sensitivity          run again with each assumption changed and list what it moves

${RECORD_HELP}
${KERNEL_HELP}
  hingebook --help           this text
  hingebook --version        the version

A cell that fails stops the run: what was calculated before is left as NAME.INCOMPLETE.html, the exit code is 1.
`;

const COMMANDS = ["new", "run", ...RECORD_COMMANDS, "kernel"];
const RUN_FLAGS = ["--out", "--set", "--watch", "--sensitivity", "--help"];

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

function readRun(words: readonly string[]): Asked {
  const rest = [...words];
  const files: string[] = [];
  const overrides = new Map<string, string>();
  let out = "out";
  let sensitivity = false;
  let watch = false;
  for (let word = rest.shift(); word !== undefined; word = rest.shift()) {
    if (word === "--") {
      files.push(...rest);
      break;
    }
    if (!word.startsWith("-")) {
      files.push(word);
      continue;
    }
    const { flag, inline } = splitFlag(word);
    if (flag === "--help" || flag === "-h") return { command: "help" };
    if (flag === "--watch" && inline === undefined) watch = true;
    else if (flag === "--out") out = flagValue(flag, inline, rest, "a folder, for example --out packages");
    else if (flag === "--set")
      addOverride(
        overrides,
        flagValue(flag, inline, rest, 'a symbol and a measure, for example --set g="6 kN/m"'),
      );
    else if (word === "--sensitivity") sensitivity = true;
    else throw new UsageError(`"${flag}" is not an option of run; ${nearest(flag, RUN_FLAGS)}`);
  }
  if (files.length === 0) throw new UsageError("run needs a notebook, for example: hingebook run roof.ipynb");
  if (watch && files.length > 1) throw new UsageError("--watch takes one notebook");
  return { command: "run", files, out, overrides, watch, sensitivity };
}

/** Read the words after "hingebook". Throws `UsageError`. */
export function readArguments(words: readonly string[]): Asked {
  const [command, ...rest] = words;
  if (command === undefined) throw new UsageError("say what to do, for example: hingebook run roof.ipynb");
  if (command === "--help" || command === "-h" || command === "help") return { command: "help" };
  if (command === "--version" || command === "-v") return { command: "version" };
  if (command === "new") return readNewArguments(rest);
  if (command === "run") return readRun(rest);
  if (RECORD_COMMANDS.includes(command)) return readRecordArguments(command, rest);
  if (command === "kernel") return readKernelArguments(rest) ?? { command: "help" };
  const known = command.startsWith("-") ? ["--help", "--version"] : COMMANDS;
  const kind = command.startsWith("-") ? "an option" : "a command";
  throw new UsageError(`"${command}" is not ${kind} of hingebook; ${nearest(command, known)}`);
}
