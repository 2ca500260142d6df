// The package in a real browser, opened from the disk with the network off: it works its own equations out again.
import { readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { CHECKER } from "../../lib/report/checker-text.ts";
import { RECHECK_CLIENT } from "../../lib/report/recheck-client.ts";
import { hasBrowser, openBrowser } from "../drawing/browser.ts";
import { hingebook, jobFolder, recordOf } from "./command.ts";

test("checker-text.ts is what .ci/checker-text.mjs makes of the checker today", async () => {
  const maker = new URL("../../.ci/checker-text.mjs", import.meta.url).href;
  const { checkerText } = (await import(/* @vite-ignore */ maker)) as { checkerText: () => string };
  expect(CHECKER).toBe(checkerText());
  expect(RECHECK_CLIENT).toContain(CHECKER);
});

describe.skipIf(!hasBrowser)("package in Chromium without a network", () => {
  const job = jobFolder();
  const path = join(job, "out/frame.html");
  let browser: Browser;
  beforeAll(async () => {
    expect(hingebook(job, "run", "frame.ipynb").code).toBe(0);
    browser = await openBrowser();
  });
  afterAll(() => browser?.close());

  async function recheckLine(
    html: string,
  ): Promise<{ readonly text: string; readonly heard: readonly string[] }> {
    const file = join(job, "out/shown.html");
    writeFileSync(file, html);
    const page = await (await browser.newContext({ offline: true })).newPage();
    const heard: string[] = [];
    page.on("console", (message) => heard.push(message.text()));
    page.on("pageerror", (error) => heard.push(error.message));
    await page.goto(pathToFileURL(file).href, { waitUntil: "load" });
    const text = (await page.locator("#recheck").textContent()) ?? "";
    await page.context().close();
    return { text, heard };
  }

  test("says that all equations are re-added and all formulas worked out again, with their number", async () => {
    const { entries } = recordOf(path);
    const equations = entries.filter((entry) => "terms" in entry).length;
    const formulas = entries.filter(
      (e) => e.kind === "calc" || (e.kind === "check" && e.closure !== true),
    ).length;
    const { text, heard } = await recheckLine(readFileSync(path, "utf8"));
    expect(equations).toBeGreaterThan(20);
    expect(text).toBe(
      `all equations re-added here: ${equations} of ${equations}; all formulas worked out again: ${formulas} of ${formulas}.`,
    );
    expect(heard).toEqual([]);
  });

  test("names the line when a digit of the record is another", async () => {
    const html = readFileSync(path, "utf8");
    const altered = html.replace(
      /("terms":\[\{"coefficient":-?)(\d)/,
      (_, before: string, digit: string) => before + (Number(digit) + 1),
    );
    expect(altered).not.toBe(html);
    const { text } = await recheckLine(altered);
    expect(text).toMatch(/NOT ALL equations re-added here: \d+ of \d+/);
    expect(text).toMatch(/the equation adds up to/);
  });
});
