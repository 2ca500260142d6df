// The browser the browser tests run in. Without one they are skipped, and say so.

import { existsSync } from "node:fs";
import { type Browser, chromium } from "playwright-core";

const PLACE = "/usr/bin/chromium";

export const hasBrowser: boolean = existsSync(PLACE);
if (!hasBrowser) console.warn(`SKIPPED: browser tests, because ${PLACE} is missing`);

/** Starts the browser; close it when done. */
export function openBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: PLACE,
    args: [
      "--no-sandbox",
      "--disable-gpu",
      "--disable-quic",
      "--no-first-run",
      "--disable-background-networking",
      "--disable-component-update",
      "--disable-sync",
    ],
  });
}
