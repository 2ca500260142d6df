// Whether a value still stands on what the sheet holds: a given may have been changed since it was worked out.
import type { MimeBundle } from "./display.ts";
import type { OpenLedger } from "./library.ts";

/** What a value stands on, "id@version" each; nothing for values that do not say. */
function usesOf(value: unknown): readonly string[] {
  if (typeof value !== "object" || value === null || !("from" in value) || !Array.isArray(value.from))
    return [];
  return value.from.filter((use): use is string => typeof use === "string" && /.@\d+$/.test(use));
}

/** The entries a value stands on that have changed since, by id. */
export function changedBelow(
  value: unknown,
  ledger: Pick<OpenLedger, "entry"> | undefined,
): readonly string[] {
  if (!ledger) return [];
  return usesOf(value).flatMap((use) => {
    const at = use.lastIndexOf("@");
    const id = use.slice(0, at);
    const entry = ledger.entry(id);
    const holds = entry && entry.version === Number(use.slice(at + 1)) && !entry.outOfDate;
    return holds ? [] : [id];
  });
}

const escaped = (text: string): string => text.replaceAll("&", "&amp;").replaceAll("<", "&lt;");

/** A bundle marked as out of date; the same bundle where nothing has changed. */
export function marked(bundle: MimeBundle, changed: readonly string[]): MimeBundle {
  if (changed.length === 0) return bundle;
  const words = `OUT OF DATE (${[...new Set(changed)].join(", ")} changed; run the cell again)`;
  const { "text/html": html, "text/plain": plain, ...rest } = bundle;
  return Object.freeze({
    ...rest,
    "text/plain": `${words}: ${String(plain)}`,
    ...(typeof html === "string"
      ? { "text/html": `<div style="opacity:0.55"><strong>${escaped(words)}</strong>${html}</div>` }
      : {}),
  });
}
