// Whether a value still stands on what the sheet holds: a given may have been changed since it was worked out.
import type { MimeBundle } from "./display.ts";
import type { OpenLedger } from "./library.ts";

/** What a value stands on, "id@version" each; nothing for values that do not say. */
function usesOf(value: unknown): readonly string[] {
  if (typeof value !== "object" || value === null || !("from" in value) || !Array.isArray(value.from))
    return [];
  return value.from.filter((use): use is string => typeof use === "string" && /.@\d+$/.test(use));
}

type Below = Pick<OpenLedger, "entry">;

interface Stale {
  /** What was changed itself, by id. */
  readonly roots: Set<string>;
  /** What was not worked out again since, by id, with its cell. */
  readonly waiting: Map<string, number>;
  readonly seen: Set<string>;
}

function look(use: string, ledger: Below, stale: Stale): void {
  if (stale.seen.has(use)) return;
  stale.seen.add(use);
  const at = use.lastIndexOf("@");
  const id = use.slice(0, at);
  const entry = ledger.entry(id);
  if (entry?.outOfDate === true) {
    stale.waiting.set(id, entry.cell ?? 0);
    for (const below of entry.uses ?? []) look(below, ledger, stale);
  } else if (entry?.version !== Number(use.slice(at + 1))) stale.roots.add(id);
}

/** What changed below a value and what to run, in words: "g changed; run cell 3 first"; nothing where it still holds. */
export function changedBelow(value: unknown, ledger: Below | undefined): readonly string[] {
  if (!ledger) return [];
  const stale: Stale = { roots: new Set(), waiting: new Map(), seen: new Set() };
  for (const use of usesOf(value)) look(use, ledger, stale);
  const changed = stale.roots.size > 0 ? [...stale.roots] : [...stale.waiting.keys()];
  if (changed.length === 0) return [];
  const first = Math.min(...[...stale.waiting.values()].filter((cell) => cell > 0));
  const run = Number.isFinite(first) ? `run cell ${first} first` : "run the cell again";
  return [`${changed.join(", ")} changed; ${run}`];
}

const escaped = (text: string): string => text.replaceAll("&", "&amp;").replaceAll("<", "&lt;");

/** A bundle marked as out of date with what changed, in words; the same bundle where nothing has. */
export function marked(bundle: MimeBundle, changed: readonly string[]): MimeBundle {
  if (changed.length === 0) return bundle;
  const words = `OUT OF DATE (${[...new Set(changed)].join("; ")})`;
  const { "text/html": html, "text/plain": plain, ...rest } = bundle;
  return Object.freeze({
    ...rest,
    "text/plain": `${words}: ${String(plain)}`,
    ...(typeof html === "string"
      ? { "text/html": `<div style="opacity:0.55"><strong>${escaped(words)}</strong>${html}</div>` }
      : {}),
  });
}
