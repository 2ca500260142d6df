// The packages of all templates in a real browser, without a network, on a desk's screen and a telephone's.
import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { renderPackage } from "../../lib/report/index.ts";
import { hasBrowser, openBrowser } from "../drawing/browser.ts";
import { names, openRuns, plainly, type Runs, systems } from "./templates.ts";

const ADDRESS = "http://package.test/";

describe.skipIf(!hasBrowser)("packages of templates in Chromium", () => {
  let browser: Browser;
  let runs: Runs;
  beforeAll(async () => {
    runs = openRuns();
    browser = await openBrowser();
  });
  afterAll(async () => {
    await runs.close();
    await browser?.close();
  });

  describe.each(names.map((name, i) => [name, systems[i % 2] ?? "kN, m"] as const))(
    "%s, %s",
    (name, units) => {
      let html = "";
      beforeAll(async () => {
        html = await renderPackage(await runs.record(name, plainly(name, units)));
      });

      test.each([1280, 390])(
        "at %i px: nothing asked for, nothing said, nothing wider than the screen",
        async (width) => {
          const page = await browser.newPage({ viewport: { width, height: 900 } });
          const heard: string[] = [];
          page.on("console", (message) => heard.push(message.text()));
          page.on("pageerror", (error) => heard.push(error.message));
          await page.route("**/*", (route) => {
            const url = route.request().url();
            if (url === ADDRESS) return route.fulfill({ contentType: "text/html", body: html });
            if (!url.endsWith("/favicon.ico")) heard.push(`asked for ${url}`);
            return route.abort();
          });
          await page.goto(ADDRESS);
          expect(await page.evaluate("document.documentElement.scrollWidth")).toBeLessThanOrEqual(width);
          const figures = await page.locator("figure svg").count();
          expect(figures).toBeGreaterThanOrEqual(name === "blank-sheet" ? 0 : 8);
          expect(await page.getByText("NOT FILLED IN").isVisible()).toBe(true);
          await page.getByText(/all equations re-added here: (\d+) of \1;/).waitFor({ timeout: 10_000 });
          expect(
            heard.filter((line) => !line.includes("favicon") && !line.includes("net::ERR_FAILED")),
          ).toEqual([]);
          await page.close();
        },
      );
    },
  );
});
