// A template made into the notebook of one calculation: its head written in, its measures in the units wanted.
import type { AskedNew } from "./arguments.ts";
import type { Template, TemplateCell } from "./template.ts";

export type Filling = Pick<Extract<AskedNew, { command: "new" }>, "units" | "title" | "job" | "by">;

/** What stands in a template for the head's texts. */
export const HEAD_PROMPTS: Readonly<Record<"title" | "job" | "by", string>> = {
  title: "‹title›",
  job: "‹job›",
  by: "‹prepared by›",
};

/** A text literal of the code, on one line. */
const LITERAL = /"(?:[^"\\\n]|\\.)*"/g;

type Replacements = ReadonlyMap<string, string>;

const headOf = (filling: Filling): Replacements =>
  new Map(
    (["title", "job", "by"] as const).flatMap((field) => {
      const text = filling[field];
      return text === undefined ? [] : [[HEAD_PROMPTS[field], text] as const];
    }),
  );

const inCode = (source: string, replacements: Replacements): string =>
  source.replace(LITERAL, (literal) => {
    const text = replacements.get(JSON.parse(literal) as string);
    return text === undefined ? literal : JSON.stringify(text);
  });

/** Text cells have the head's texts alone; what Markdown would read as its own marks is escaped. */
function inText(source: string, head: Replacements): string {
  let text = source;
  for (const [prompt, put] of head)
    text = text.replaceAll(prompt, () => put.replace(/[\\`*_{}[\]<>#$|~]/g, "\\$&"));
  return text;
}

const lines = (text: string): string[] => text.split(/(?<=\n)/);

function cellOf(cell: TemplateCell, head: Replacements, code: Replacements): TemplateCell {
  const source = cell.source.join("");
  return { ...cell, source: lines(cell.cell_type === "code" ? inCode(source, code) : inText(source, head)) };
}

/** The notebook as text. What the template says of itself stays behind. */
export function filled({ notebook }: Template, filling: Filling): string {
  const { hingebook, ...metadata } = notebook.metadata;
  const head = headOf(filling);
  const us = filling.units === "kip, ft" ? Object.entries(hingebook.us) : [];
  const code = new Map([...us, ...head]);
  const cells = notebook.cells.map((cell) => cellOf(cell, head, code));
  return `${JSON.stringify({ ...notebook, cells, metadata }, undefined, 1)}\n`;
}
