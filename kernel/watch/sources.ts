// What a notebook's run depends on: its cells, and the data and modules beside it.
import { createHash } from "node:crypto";
import { readdirSync, readFileSync, statSync, watch } from "node:fs";
import { basename, dirname, join, resolve } from "node:path";
import { parseNotebook } from "../notebook.ts";

const ENDINGS = /\.(?:csv|json|m?ts|m?js|cjs)$/;
const LARGEST_bytes = 20_000_000;

/** Saving is several events; what follows within this time is the same saving. */
const TOGETHER_ms = 4;

/** A digest of everything whose change asks for another run. Outputs saved with the notebook do not count. Throws where
 *  the notebook cannot be read. */
export function sourcesDigest(file: string): string {
  const folder = dirname(resolve(file));
  const { cells } = parseNotebook(file, readFileSync(file, "utf8"));
  const hash = createHash("sha256").update(JSON.stringify(cells));
  for (const name of readdirSync(folder).sort()) {
    const about = ENDINGS.test(name) ? statSync(join(folder, name), { throwIfNoEntry: false }) : undefined;
    if (!about?.isFile() || about.size > LARGEST_bytes) continue;
    hash.update(`\0${name}\0`).update(readFileSync(join(folder, name)));
  }
  return hash.digest("hex");
}

export interface Watching {
  close(): void;
}

/** Call `changed` when the notebook or a file beside it is written. */
export function watchSources(file: string, changed: () => void): Watching {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const watcher = watch(dirname(resolve(file)), (_event, name) => {
    if (name !== null && name !== basename(file) && !ENDINGS.test(name)) return;
    clearTimeout(timer);
    timer = setTimeout(changed, TOGETHER_ms);
  });
  return {
    close: () => {
      clearTimeout(timer);
      watcher.close();
    },
  };
}
