// Exact comparison with a kept file. A difference leaves a "-changed" file beside it for the eye; to accept it, put it
// in place of the kept one. A missing kept file is written once and fails the run that wrote it.

import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { expect } from "vitest";

/** Compares `text` with the file of that name in the folder `golden` beside the test at `test` (its import.meta.url). */
export function expectGolden(test: string, name: string, text: string): void {
  const kept = new URL(`./golden/${name}`, test);
  const changed = new URL(`./golden/${name.replace(/((?:\.golden)?\.[a-z]+)$/, "-changed$1")}`, test);
  const before = existsSync(kept) ? readFileSync(kept, "utf8") : undefined;
  if (before === text) {
    rmSync(changed, { force: true });
    return;
  }
  mkdirSync(new URL(".", kept), { recursive: true });
  writeFileSync(before === undefined ? kept : changed, text);
  expect.fail(
    before === undefined
      ? `no golden file ${name} was there; it is written now: look at it, then run again`
      : `${name} differs from its golden file; compare golden/${changed.pathname.split("/").at(-1)}`,
  );
}
