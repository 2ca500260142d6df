// Templates made into notebooks and run in this process, the type checker kept from run to run.
import { mkdtempSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { createChecker } from "../../kernel/check/index.ts";
import { loadLibrary } from "../../kernel/library.ts";
import { libraryChecker } from "../../kernel/library-session.ts";
import { filled } from "../../kernel/new/fill.ts";
import { readTemplate, type Template, templateNames } from "../../kernel/new/template.ts";
import { runNotebooks } from "../../kernel/run.ts";
import type { CalculationRecord } from "../../lib/sheet/index.ts";

const top = resolve(import.meta.dirname, "../..");

export const names: readonly string[] = templateNames();
export const systems: readonly ("kN, m" | "kip, ft")[] = ["kN, m", "kip, ft"];

export const template: (name: string) => Template = readTemplate;

/** A template in one system of units, its prompts left. */
export const plainly = (name: string, units: (typeof systems)[number]): string =>
  filled(readTemplate(name), { units });

export interface Runs {
  /** The record of a notebook, run whole; throws with what the runner said of a failure. */
  readonly record: (name: string, source: string) => Promise<CalculationRecord>;
  readonly close: () => Promise<void>;
}

export function openRuns(): Runs {
  const folder = mkdtempSync(join(tmpdir(), "hingebook-templates-"));
  const types = join(top, "lib/index.ts");
  const overrides = new Map<string, string>();
  const checker = createChecker(
    libraryChecker({ folder, types, overrides, library: loadLibrary, onOutput: () => {} }),
  );
  async function record(name: string, source: string): Promise<CalculationRecord> {
    const file = join(folder, `${name}.ipynb`);
    writeFileSync(file, source);
    const delivered: CalculationRecord[] = [];
    let said = "";
    const states = await runNotebooks({
      files: [file],
      out: folder,
      overrides,
      checker,
      types,
      library: loadLibrary,
      versions: { hingebook: "test" },
      terminal: {
        out: () => {},
        err: (text) => {
          said += text;
        },
      },
      deliver: (one) => {
        delivered.push(one);
      },
    });
    const [found] = delivered;
    if (found === undefined || states[0] !== "complete") throw new Error(`${name}: ${said}`);
    return found;
  }
  return { record, close: () => checker.close() };
}
