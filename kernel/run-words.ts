// What the headless runner says about a notebook.
import { relative } from "node:path";
import { bandText } from "../lib/sheet/band-words.ts";
import type { CalculationRecord, Entry } from "../lib/sheet/index.ts";
import type { CellFailure } from "./failure.ts";
import type { Notebook } from "./notebook.ts";
import type { OutputEvent } from "./session.ts";

const line = (text: string): string => `${text}\n`;

/** What a cell prints or shows before it ends, as text. */
export function outputText(event: Exclude<OutputEvent, { readonly kind: "stray" }>): string {
  if (event.kind === "stream") return event.text;
  return event.kind === "display" ? line(String(event.data["text/plain"] ?? "")) : "";
}

/** A path as short as it can be said from the current folder. */
export function shownPath(path: string): string {
  const near = relative(process.cwd(), path);
  return near.startsWith("..") ? path : near;
}

/** What a failed cell says: notebook, cell, line, message, and the engineer's own code around it. */
export function failureText({ fileName, cells }: Notebook, failure: CellFailure): string {
  const { cell, line: row, column, name, message, excerpt, traceback } = failure;
  const code = cells.filter(({ kind, number }) => kind === "code" && number <= cell).length;
  const where = [`${fileName}, cell ${cell} (code cell ${code})`];
  if (row !== undefined) where.push(`line ${row}`, `column ${column}`);
  const further = traceback.slice(1).filter((text) => text.trim() !== "");
  return [`${where.join(", ")}: ${name}`, message, ...(excerpt === "" ? [] : ["", excerpt]), ...further, ""]
    .map(line)
    .join("");
}

/** The refusal of overrides nothing takes up. */
export function unusedText(fileName: string, unused: readonly string[], entries: readonly Entry[]): string {
  const givens = entries.flatMap((entry) => (entry.kind === "given" ? [entry.symbol] : []));
  const assumed = entries.flatMap((entry) =>
    entry.kind === "assumption" && entry.value !== undefined ? [entry.symbol ?? `"${entry.id}"`] : [],
  );
  const what = unused.map((symbol) => `"${symbol}"`).join(", ");
  const also = assumed.length === 0 ? "" : `; assumptions with a value can be set too: ${some(assumed)}`;
  return `${fileName}: --set ${what} was not used; the givens are ${givens.join(", ") || "none"}${also}. No package was written.`;
}

const most = 12;

/** Names in a row, the first dozen of many. */
function some(names: readonly string[]): string {
  const more = names.length - most;
  return `${names.slice(0, most).join(", ")}${more > 0 ? ` and ${more} more` : ""}`;
}

/** What the bands of governing results stand for. */
function bandNotes(entries: readonly Entry[]): readonly string[] {
  const words = entries.flatMap((entry) =>
    entry.kind === "result" && entry.governing && entry.band !== undefined ? [entry.band.words] : [],
  );
  return [...new Set(words)].map((text) => `    bands: ${text}`);
}

/** How a calculation came out: status, governing results, checks, what a template left to be written (in words, empty
 *  for nothing), and where its package lies. */
export function summaryText({ head, entries }: CalculationRecord, prompts: string, file: string): string {
  const checks = entries.filter((entry) => entry.kind === "check");
  const failed = checks.filter((entry) => !entry.passed);
  const lines = [`  ${head.title}: ${head.status}`];
  for (const entry of entries)
    if (entry.kind === "result" && entry.governing) {
      lines.push(`    ${entry.symbol} = ${entry.value.text}  ${entry.description}`);
      if (entry.band !== undefined) lines.push(`      ${bandText(entry.band)}`);
    }
  lines.push(...bandNotes(entries));
  if (checks.length > 0)
    lines.push(`    checks: ${checks.length - failed.length} of ${checks.length} satisfied`);
  for (const entry of entries) if (entry.kind === "query") lines.push(`    OPEN QUERY: ${entry.text}`);
  for (const { formula, description } of failed) lines.push(`    NOT SATISFIED: ${formula}  ${description}`);
  if (prompts !== "") lines.push(`    NOT FILLED IN: ${prompts}`);
  lines.push(`  package: ${shownPath(file)}`);
  return lines.map(line).join("");
}
