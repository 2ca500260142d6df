// The grammar of `hingebook new`.
import { type Flags, readWords, UsageError } from "../usage.ts";

/** The systems of units templates come in, as they are written in the head of a sheet. */
export type TemplateUnits = "kN, m" | "kip, ft";

export type AskedNew =
  | { readonly command: "help" }
  | { readonly command: "templates" }
  | {
      readonly command: "new";
      readonly template: string;
      readonly file: string;
      readonly units: TemplateUnits;
      readonly title?: string;
      readonly job?: string;
      readonly by?: string;
    };

export const NEW_HELP = `  hingebook new TEMPLATE FILE.ipynb [--title TEXT] [--job TEXT] [--by TEXT] [--units "kN, m" | "kip, ft"]
      begin a calculation: a notebook from a template; never overwrites. ‹…› marks what is still to be written
      --list                 the templates
`;

const SYSTEMS: readonly TemplateUnits[] = ["kN, m", "kip, ft"];
const EXAMPLE = 'for example: hingebook new portal-gravity frame.ipynb --title "Frame on line 3"';

const FLAGS: Flags = {
  "--list": undefined,
  "--title": 'a title, for example --title "Frame on line 3"',
  "--job": "a job number, for example --job 2614",
  "--by": 'who prepares it, for example --by "M. Orlo"',
  "--units": 'a system of units, --units "kN, m" or --units "kip, ft"',
};

function unitsOf(text: string | undefined): TemplateUnits {
  if (text === undefined) return "kN, m";
  const plain = text.replace(/[\s,]+/g, ", ").trim();
  const found = SYSTEMS.find((system) => system === plain);
  if (found !== undefined) return found;
  throw new UsageError(`--units "${text}" is not a system templates come in; write "kN, m" or "kip, ft"`);
}

/** A text of one line; absent where nothing was given. */
function oneLine(flag: string, given: ReadonlyMap<string, string>): string | undefined {
  const text = given.get(flag);
  if (text === undefined) return undefined;
  const plain = text.replace(/[\s\p{Cc}]+/gu, " ").trim();
  if (plain === "") throw new UsageError(`${flag} needs ${FLAGS[flag]}`);
  return plain;
}

function head(given: ReadonlyMap<string, string>): { title?: string; job?: string; by?: string } {
  const [title, job, by] = [oneLine("--title", given), oneLine("--job", given), oneLine("--by", given)];
  return {
    ...(title === undefined ? {} : { title }),
    ...(job === undefined ? {} : { job }),
    ...(by === undefined ? {} : { by }),
  };
}

/** Read the words after `hingebook new`. Throws `UsageError`. */
export function readNewArguments(words: readonly string[]): AskedNew {
  const { given, others, help } = readWords("new", words, FLAGS);
  if (help) return { command: "help" };
  if (given.has("--list")) {
    if (others.length > 0 || given.size > 1) throw new UsageError("new --list takes nothing else");
    return { command: "templates" };
  }
  const [template, file, ...more] = others;
  if (template === undefined) throw new UsageError(`new needs a template and a file, ${EXAMPLE}`);
  if (file === undefined)
    throw new UsageError(`new ${template} needs the file the notebook is written to, ${EXAMPLE}`);
  if (more.length > 0)
    throw new UsageError(`new makes one notebook; "${more.join(" ")}" is too much, ${EXAMPLE}`);
  if (!/[^/\\]\.ipynb$/.test(file))
    throw new UsageError(
      `"${file}" is not the name of a notebook; write for example "${withoutEnd(file)}.ipynb"`,
    );
  return { command: "new", template, file, units: unitsOf(given.get("--units")), ...head(given) };
}

const withoutEnd = (file: string): string => file.replace(/\.[^./\\]*$/, "").replace(/[/\\]$/, "") || "frame";
