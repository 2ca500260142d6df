// Templates: notebooks in templates/, in kN and m, with what `new` needs to know of them in their metadata.
import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { ownFolder } from "../folders.ts";

export interface TemplateCell {
  readonly cell_type: string;
  readonly source: readonly string[];
}

/** A notebook as it lies in templates/. */
export interface TemplateNotebook {
  readonly cells: readonly TemplateCell[];
  readonly metadata: {
    readonly hingebook: {
      /** What it is for, in one line. */
      readonly line: string;
      /** Texts of the code, each with what stands in its place in US customary units. */
      readonly us: Readonly<Record<string, string>>;
    };
  };
}

export interface Template {
  readonly name: string;
  readonly notebook: TemplateNotebook;
}

const folder = (): string => join(ownFolder(), "templates");

/** The names of the templates, in order. */
export const templateNames = (): readonly string[] =>
  readdirSync(folder())
    .filter((name) => name.endsWith(".ipynb"))
    .map((name) => name.slice(0, -".ipynb".length))
    .sort();

/** A template by its name, which must be one of `templateNames`. */
export function readTemplate(name: string): Template {
  const source = readFileSync(join(folder(), `${name}.ipynb`), "utf8");
  return { name, notebook: JSON.parse(source) as TemplateNotebook };
}
