// The demonstration's package in a real browser, opened from the disk with the network off.

import { spawnSync } from "node:child_process";
import { existsSync } from "node:fs";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { hasBrowser, openBrowser } from "../drawing/browser.ts";
import { demonstration, newFolder, run } from "./command.ts";

const widths = [1280, 390] as const;

describe.skipIf(!hasBrowser)("boat-shed-frame.html in Chromium without a network", () => {
  let browser: Browser;
  let address = "";
  beforeAll(async () => {
    browser = await openBrowser();
    address = pathToFileURL(join(run(demonstration).folder, "boat-shed-frame.html")).href;
  });
  afterAll(() => browser?.close());

  async function open(width: number): Promise<{ page: Page; heard: readonly string[] }> {
    const context = await browser.newContext({ viewport: { width, height: 900 }, offline: true });
    const page = await context.newPage();
    const heard: string[] = [];
    page.on("request", (request) => {
      if (request.url() !== address) heard.push(`asked for ${request.url()}`);
    });
    page.on("console", (message) => heard.push(`console: ${message.text()}`));
    page.on("pageerror", (error) => heard.push(`error: ${error.message}`));
    await page.goto(address, { waitUntil: "load" });
    return { page, heard };
  }

  test.each(widths)("at %i px: no request, no message, nothing wider than the screen", async (width) => {
    const { page, heard } = await open(width);
    const wide = await page.evaluate("document.documentElement.scrollWidth");
    expect(wide).toBeLessThanOrEqual(width);
    expect(await page.locator("figure svg").count()).toBeGreaterThan(8);
    expect(heard).toEqual([]);
    await page.context().close();
  });

  test("a governing number, reached by keyboard, shows what it stands on", async () => {
    const { page, heard } = await open(1280);
    await page.locator("#outcome a, section a").filter({ hasText: "−88.1" }).first().focus();
    await page.keyboard.press("Enter");
    const panel = page.locator("#trace");
    await panel.waitFor({ state: "visible" });
    const words = (await panel.textContent()) ?? "";
    expect(words).toContain("−88.1");
    expect(words.toLowerCase()).toContain("stands on");
    expect(heard).toEqual([]);
    await page.context().close();
  });

  test.skipIf(!existsSync("/usr/bin/pdftotext"))(
    "prints on A4 with job and page number on every page",
    async () => {
      const { page } = await open(1280);
      const file = join(newFolder(), "package.pdf");
      await page.pdf({ path: file, format: "A4", preferCSSPageSize: true });
      await page.context().close();
      const text = spawnSync("/usr/bin/pdftotext", ["-layout", file, "-"], { encoding: "utf8" }).stdout;
      const pages = text.split("\f").slice(0, -1);
      expect(pages.length).toBeGreaterThan(4);
      expect(pages.length).toBeLessThan(30);
      pages.forEach((printed, i) => {
        expect(printed).toContain("2614");
        expect(printed).toMatch(new RegExp(`page ${i + 1} of ${pages.length}`));
      });
    },
  );
});
