import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { renderPackage } from "../../lib/report/index.ts";
import { type CalculationRecord, symbolTex } from "../../lib/sheet/index.ts";
import { hasBrowser, openBrowser } from "../drawing/browser.ts";
import { incomplete, record } from "./fixtures.ts";

const axe = readFileSync(createRequire(import.meta.url).resolve("axe-core/axe.min.js"), "utf8");

// Run in the page, hence as text: the tests' own program knows no DOM.
const AXE = `axe.run(document).then((r) => JSON.stringify({
  bad: r.violations.map((v) => [v.impact, v.id, ...v.nodes.map((n) => n.html).slice(0, 3)].join(" ")),
  passes: r.passes.length,
}))`;
const INTRUDE = `
  const script = document.createElement("script");
  script.textContent = "document.title = 'taken over'";
  document.body.append(script);
  const picture = document.createElement("img");
  picture.src = "http://elsewhere.test/a.png";
  document.body.append(picture);
  document.body.setAttribute("style", "display:none");
  const style = document.createElement("style");
  style.textContent = "body{color:red}";
  document.head.append(style);
`;

interface Opened {
  readonly page: Page;
  readonly said: string[];
  readonly asked: string[];
}

describe.skipIf(!hasBrowser)("package in a browser", () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser?.close());

  /** The package as a file would be opened, everything it says and asks for written down. */
  async function open(rec: CalculationRecord, width = 1280, script = true): Promise<Opened> {
    const context = await browser.newContext({ viewport: { width, height: 900 }, javaScriptEnabled: script });
    const page = await context.newPage();
    const said: string[] = [];
    const asked: string[] = [];
    page.on("console", (m) => said.push(m.text()));
    page.on("pageerror", (e) => said.push(String(e)));
    const html = await renderPackage(rec);
    await page.route("**/*", (route) => {
      const url = route.request().url();
      if (url === "http://package.test/") return route.fulfill({ contentType: "text/html", body: html });
      asked.push(url);
      return route.abort();
    });
    await page.goto("http://package.test/");
    return { page, said, asked };
  }

  it.each([1280, 390])(
    "package at %i px: no request, no word on the console, nothing wider than the page",
    async (width) => {
      const { page, said, asked } = await open(record, width);
      const size = await page.evaluate<[number, number]>(
        "[document.documentElement.scrollWidth, window.innerWidth]",
      );
      expect(size[0]).toBe(size[1]);
      // The browser asks for a site's icon by itself; a file has none.
      expect(asked.filter((url) => !url.endsWith("/favicon.ico"))).toEqual([]);
      expect(said.filter((s) => !s.includes("favicon"))).toEqual([]);
      await page.context().close();
    },
  );

  it.each([
    ["complete", 1280, record],
    ["complete", 390, record],
    ["incomplete", 1280, incomplete],
  ] as const)("package (%s, %i px): axe finds nothing serious", async (_, width, rec) => {
    const { page } = await open(rec, width);
    // The policy forbids foreign scripts in the page, so axe comes in by the debugger's door.
    const session = await page.context().newCDPSession(page);
    await session.send("Runtime.evaluate", { expression: axe });
    const answer = await session.send("Runtime.evaluate", {
      expression: AXE,
      awaitPromise: true,
      returnByValue: true,
    });
    const found = JSON.parse(String(answer.result.value)) as { bad: string[]; passes: number };
    expect(found.passes).toBeGreaterThan(20);
    expect(found.bad.filter((b) => /^(serious|critical)/.test(b))).toEqual([]);
    await page.context().close();
  });

  it("package: the policy stops foreign script, style and pictures", async () => {
    const { page, said, asked } = await open(record);
    await page.evaluate(INTRUDE);
    const refused = (): number => said.filter((s) => s.includes("Content Security Policy")).length;
    await expect.poll(refused, { timeout: 60_000 }).toBeGreaterThanOrEqual(3);
    expect(await page.title()).toContain("Store roof frame");
    expect(await page.evaluate("getComputedStyle(document.body).display")).toBe("block");
    expect(asked.filter((u) => u.includes("elsewhere"))).toEqual([]);
    await page.context().close();
  });

  it("number clicked: shows what it stands on and what stands on it, and lights those lines", async () => {
    const { page } = await open(record);
    await page.click("#e-w a.num");
    const panel = page.locator("#trace");
    expect(await panel.isVisible()).toBe(true);
    const words = await panel.textContent();
    expect(words).toContain("stands on");
    expect(words).toContain("what stands on it");
    const lit = (name: string): Promise<string[]> =>
      page.evaluate(`[...document.querySelectorAll(".line.${name}")].map((e) => e.id)`);
    expect(await lit("is-ground")).toEqual(["e-g", "e-s"]);
    expect(await lit("is-user")).toContain("e-A_x");
    expect(await lit("is-here")).toEqual(["e-w"]);
    await page.click("#e-M_Rd a.num");
    expect(await lit("is-ground")).toEqual(["e-W_pl", "e-f_y"]);
    await page.click("#trace button");
    expect(await panel.isVisible()).toBe(false);
    expect(await lit("is-ground")).toEqual([]);
    await page.context().close();
  });

  it("number reached by keyboard: Tab, Enter opens, Escape closes and returns", async () => {
    const { page } = await open(record, 390);
    const focused = () => page.evaluate<string>("document.activeElement.className");
    for (let i = 0; i < 40 && (await focused()) !== "num"; i++) await page.keyboard.press("Tab");
    const ring = await page.evaluate("getComputedStyle(document.activeElement).outlineStyle");
    expect(ring).toBe("solid");
    await page.keyboard.press("Enter");
    expect(await page.evaluate("document.activeElement.id")).toBe("trace");
    await page.keyboard.press("Escape");
    expect(await focused()).toContain("num");
    expect(await page.locator("#trace").isVisible()).toBe(false);
    await page.context().close();
  });

  it("a name prints whole in its line, whatever its letters and figures", async () => {
    const names = ["h1", "h9", "h10", "h11", "h12", "h110", "A10", "B12", "B1C10", "snow"];
    const [given] = record.entries.filter((e) => e.kind === "given");
    if (given === undefined) throw new Error("the fixture has no given");
    // as symbols are set now, and as a step of the statics writes two names
    const entries = names.flatMap((name): CalculationRecord["entries"] => [
      { ...given, id: `X_${name}`, symbol: `X_${name}`, tex: symbolTex(`X_${name}`) },
      { ...given, id: `M_${name}`, symbol: `M_${name}`, tex: `M_{\\mathrm{${name}},\\mathrm{A10}}` },
    ]);
    const { page } = await open({ ...record, entries: [...record.entries, ...entries] });
    for (const name of names) {
      const shown = (id: string) => page.locator(`#e-${id} .value math`).first().textContent();
      expect(await shown(`X_${name}`)).toBe(`X${name}`);
      expect(await shown(`M_${name}`)).toBe(`M${name},A10`);
    }
    await page.context().close();
  });

  it("a long list of what stands on what is folded: a number shows its row, a link unfolds it, print leaves it out", async () => {
    const [given] = record.entries.filter((e) => e.kind === "given");
    if (given === undefined) throw new Error("the fixture has no given");
    const more = Array.from({ length: 200 }, (_, i) => ({ ...given, id: `x_${i}`, symbol: `x_${i}` }));
    const long = { ...record, entries: [...record.entries, ...more] };
    const { page } = await open(long);
    const list = page.locator("ol.why");
    const note = page.locator(".on-paper");
    expect([await list.isVisible(), await note.isVisible()]).toEqual([false, false]);
    await page.click("#e-w a.num");
    expect(await page.locator("#trace").textContent()).toContain("what stands on it");
    await page.emulateMedia({ media: "print" });
    expect([await list.isVisible(), await note.isVisible()]).toEqual([false, true]);
    expect(await note.textContent()).toMatch(/has 2\d\d lines and is not printed/);
    await page.context().close();
    const bare = (await open(long, 1280, false)).page;
    await bare.click("#e-w a.num");
    expect(await bare.locator("#why-w").isVisible()).toBe(true);
    await bare.context().close();
    const short = (await open(record)).page;
    expect(await short.locator("ol.why").isVisible()).toBe(true);
    expect(await short.locator(".on-paper").count()).toBe(0);
    await short.context().close();
  });

  it("without script a number is a link to the list of what stands on what", async () => {
    const { page } = await open(record, 1280, false);
    await page.click("#e-w a.num");
    expect(page.url()).toContain("#why-w");
    await page.context().close();
  });

  it.each(["A4", "Letter"])(
    "incomplete package on %s: the stamp is on every page, pages are several",
    async (format) => {
      const { page } = await open(incomplete);
      const pdf = (await page.pdf({ format, preferCSSPageSize: false })).toString("latin1");
      expect(pdf.match(/\/Type\s*\/Page[^s]/g)?.length ?? 0).toBeGreaterThanOrEqual(3);
      await page.emulateMedia({ media: "print" });
      const stamp = await page.evaluate(
        `(({ display, position }) => [display, position])(getComputedStyle(document.querySelector(".stamp")))`,
      );
      expect(stamp).toEqual(["block", "fixed"]);
      await page.context().close();
    },
  );
});
