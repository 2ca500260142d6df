// Where hingebook itself lies.
import { existsSync } from "node:fs";
import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";

/** The folder of hingebook's package.json, whether it runs from its sources or from dist/. */
export function ownFolder(): string {
  for (let folder = dirname(fileURLToPath(import.meta.url)); ; folder = dirname(folder)) {
    if (existsSync(join(folder, "package.json"))) return folder;
    if (folder === dirname(folder))
      throw new Error("hingebook's package.json is not there; reinstall hingebook");
  }
}
