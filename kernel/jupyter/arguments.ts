// The grammar of hingebook kernel ….
import { flagValue, nearest, splitFlag, UsageError } from "../usage.ts";
import type { Place } from "./installation.ts";

export type AskedKernel =
  | { readonly command: "kernel install" | "kernel remove"; readonly place: Place }
  | { readonly command: "kernel list" }
  | { readonly command: "kernel serve"; readonly connectionFile: string };

export const KERNEL_HELP: string = `  hingebook kernel install [--user | --prefix DIR]
  hingebook kernel remove [--user | --prefix DIR]
  hingebook kernel list
      make hingebook's kernel known to Jupyter (for this user, or below a prefix such as /usr/local), take it away,
      say where it is
`;

const KERNEL_VERBS = ["install", "remove", "list", "serve"];
const PLACE_FLAGS = ["--user", "--prefix", "--help"];

/** "--user" or "--prefix DIR"; for this user where nothing is said. */
function readPlace(words: readonly string[]): Place | "help" {
  const rest = [...words];
  let place: Place | undefined;
  for (let word = rest.shift(); word !== undefined; word = rest.shift()) {
    const { flag, inline } = splitFlag(word);
    if (flag === "--help" || flag === "-h") return "help";
    if (place) throw new UsageError("say --user or --prefix DIR once");
    if (flag === "--user" && inline === undefined) place = { kind: "user" };
    else if (flag === "--prefix")
      place = {
        kind: "prefix",
        folder: flagValue(flag, inline, rest, "a folder, for example --prefix /usr/local"),
      };
    else throw new UsageError(`"${word}" is not known here; ${nearest(flag, PLACE_FLAGS)}`);
  }
  return place ?? { kind: "user" };
}

/** Read the words after "kernel"; nothing where help is asked for. Throws `UsageError`. */
export function readKernelArguments([verb, ...rest]: readonly string[]): AskedKernel | undefined {
  if (verb === undefined) throw new UsageError("kernel needs a verb: install, remove or list");
  if (verb === "--help" || verb === "-h") return undefined;
  if (verb === "install" || verb === "remove") {
    const place = readPlace(rest);
    return place === "help" ? undefined : { command: `kernel ${verb}`, place };
  }
  if (verb === "list" && rest.length === 0) return { command: "kernel list" };
  if (verb === "serve" && rest.length === 1)
    return { command: "kernel serve", connectionFile: rest[0] ?? "" };
  if (verb === "serve") throw new UsageError("kernel serve is for Jupyter; it needs one connection file");
  if (verb === "list") throw new UsageError(`kernel list takes no more words; "${rest[0]}" is one`);
  throw new UsageError(`"${verb}" is not a verb of kernel; ${nearest(verb, KERNEL_VERBS)}`);
}
