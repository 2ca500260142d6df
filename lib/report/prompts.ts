// What a template left for the engineer to write: ‹…› in the notebook, or in what it put on the sheet.

import type { CalculationRecord, Entry } from "../sheet/index.ts";

export interface PromptsLeft {
  readonly count: number;
  /** Cells with a prompt, ascending, from 1. */
  readonly cells: readonly number[];
}

const PROMPT = /‹[^‹›]+›/gu;

const promptsIn = (text: string): readonly string[] => text.match(PROMPT) ?? [];

/** The texts of a notebook's cells; none where the source is not a notebook. */
function cellTexts(source: string): readonly string[] {
  try {
    const { cells } = JSON.parse(source) as { readonly cells?: unknown };
    return Array.isArray(cells) ? cells.map(sourceOf) : [];
  } catch {
    return [];
  }
}

function sourceOf(cell: unknown): string {
  const { source } = (cell ?? {}) as { readonly source?: unknown };
  return Array.isArray(source) ? source.join("") : typeof source === "string" ? source : "";
}

/** Every prompt in a piece of the record, wherever it stands, into `found`. Records are large and prompts few: nothing is made on
 *  the way. */
function gather(value: unknown, found: Set<string>): void {
  if (typeof value === "string") {
    if (value.includes("‹")) for (const prompt of promptsIn(value)) found.add(prompt);
  } else if (Array.isArray(value)) {
    for (const one of value) if (typeof one !== "number") gather(one, found);
  } else if (typeof value === "object" && value !== null)
    for (const key in value) gather((value as Readonly<Record<string, unknown>>)[key], found);
}

function promptsOf(value: Entry | CalculationRecord["head"]): ReadonlySet<string> {
  const found = new Set<string>();
  gather(value, found);
  return found;
}

/** The prompts still in a calculation. Those in the notebook count as often as they stand there; one that stands on the
 *  sheet alone (it came from a file beside the notebook, say) counts once, in the cell that put it there. */
export function promptsLeft({ head, entries, notebook }: CalculationRecord): PromptsLeft {
  const found: { readonly prompt: string; readonly cell: number }[] = cellTexts(notebook.source).flatMap(
    (text, i) => promptsIn(text).map((prompt) => ({ prompt, cell: i + 1 })),
  );
  const seen = new Set(found.map(({ prompt }) => prompt));
  const onSheet = [
    ...entries.map((entry) => ({ cell: entry.cell, prompts: promptsOf(entry) })),
    { cell: 0, prompts: promptsOf(head) },
  ];
  for (const { cell, prompts } of onSheet)
    for (const prompt of prompts) {
      if (seen.has(prompt)) continue;
      seen.add(prompt);
      found.push({ prompt, cell });
    }
  const cells = [...new Set(found.map(({ cell }) => cell))].filter((cell) => cell > 0).sort((a, b) => a - b);
  return Object.freeze({ count: found.length, cells: Object.freeze(cells) });
}

const counted = ({ count }: PromptsLeft): string =>
  count === 1 ? "1 prompt of the template is" : `${count} prompts of the template are`;

/** "7 prompts of the template are not yet replaced", without the cells. */
export const promptWords = (left: PromptsLeft): string => `${counted(left)} not yet replaced`;

/** "7 prompts of the template are not yet replaced: cells 2, 4, 9"; empty where none is left. */
export function promptsLeftWords(record: CalculationRecord): string {
  const left = promptsLeft(record);
  if (left.count === 0) return "";
  const { cells } = left;
  const where = cells.length === 0 ? "" : `: ${cells.length === 1 ? "cell" : "cells"} ${cells.join(", ")}`;
  return promptWords(left) + where;
}
