// The classic Notebook in a real browser, as an engineer uses it. Pictures are left in out/notebook for the eye.
import { type ChildProcess, spawn } from "node:child_process";
import { copyFileSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { hasBrowser, openBrowser } from "../../drawing/browser.ts";
import { notebookText } from "../notebook-file.ts";
import { hasJupyter, installed, type Jupyter, python, top } from "./jupyter.ts";

const pictures = join(top, "out/notebook");

const freePort = (): Promise<number> =>
  new Promise((settle) => {
    const server = createServer().listen(0, "127.0.0.1", () => {
      const address = server.address();
      server.close(() => settle(typeof address === "object" && address ? address.port : 0));
    });
  });

/** Cell outputs as the notebook holds them. */
interface Shown {
  readonly output_type: string;
  readonly ename?: string;
  readonly evalue?: string;
  readonly data?: Readonly<Record<string, string>>;
}

describe.skipIf(!(hasJupyter && hasBrowser))("hingebook in the classic Notebook", () => {
  let jupyter: Jupyter;
  let server: ChildProcess;
  let browser: Browser;
  let page: Page;
  let folder = "";
  let address = "";

  beforeAll(async () => {
    mkdirSync(pictures, { recursive: true });
    jupyter = installed();
    folder = mkdtempSync(join(tmpdir(), "hingebook-classic-"));
    copyFileSync(join(top, "notebooks/boat-shed-frame.ipynb"), join(folder, "frame.ipynb"));
    const bench = JSON.parse(notebookText(["const w = 5", "w * 2", "", "", ""]));
    bench.metadata.kernelspec = { name: "hingebook", display_name: "hingebook", language: "typescript" };
    writeFileSync(join(folder, "bench.ipynb"), JSON.stringify(bench));
    const port = await freePort();
    address = `http://127.0.0.1:${port}`;
    const words = ["--no-browser", "--allow-root", "--ip=127.0.0.1", `--port=${port}`, "--port-retries=0"];
    const open = ["--NotebookApp.token=", "--NotebookApp.password=", `--notebook-dir=${folder}`];
    server = spawn(python, ["-m", "notebook", ...words, ...open], { env: jupyter.env, stdio: "ignore" });
    browser = await openBrowser();
    page = await browser.newPage({ viewport: { width: 1200, height: 1000 } });
    page.setDefaultTimeout(60_000);
    for (let tries = 0; tries < 400; tries++) {
      const there = await fetch(`${address}/api`).then(
        (answer) => answer.ok,
        () => false,
      );
      if (there) break;
      await new Promise((done) => setTimeout(done, 200));
    }
  });
  afterAll(async () => {
    await page?.evaluate("Jupyter.notebook.session.delete()").catch(() => undefined);
    await browser?.close();
    const gone = new Promise((settle) => server?.once("exit", settle));
    server?.kill("SIGTERM");
    await gone;
    jupyter?.remove();
    rmSync(folder, { recursive: true, force: true });
  });

  const open = async (name: string): Promise<void> => {
    await page.goto(`${address}/notebooks/${name}`);
    await page.waitForFunction(
      'window.Jupyter?.notebook?._fully_loaded && Jupyter.notebook.kernel?.name === "hingebook" && Jupyter.notebook.kernel.is_connected() && Jupyter.notebook.kernel.info_reply?.status === "ok"',
    );
  };
  // A cell's prompt is set by the reply, which may overtake the cell's outputs: those are there once the kernel is idle.
  const settled = (): Promise<unknown> =>
    page.waitForFunction(`Jupyter.notebook.get_cells().every((c) =>
      c.cell_type !== "code" ||
      (c.input_prompt_number !== "*" && Jupyter.notebook.kernel._msg_callbacks[c.last_msg_id]?.iopub_done !== false))`);
  const outputs = (cell: number): Promise<Shown[]> =>
    page.evaluate(`Jupyter.notebook.get_cell(${cell}).output_area.outputs`);
  const write = (cell: number, code: string): Promise<unknown> =>
    page.evaluate(`Jupyter.notebook.get_cell(${cell}).set_text(${JSON.stringify(code)})`);
  const run = async (cell: number, code: string): Promise<Shown[]> => {
    await write(cell, code);
    await page.evaluate(`Jupyter.notebook.execute_cells([${cell}])`);
    await settled();
    return outputs(cell);
  };
  const picture = (name: string): Promise<unknown> =>
    page.screenshot({ path: join(pictures, `${name}.png`) });

  test("run all: sketches, diagrams, equations and tables are there, no error", async () => {
    await open("frame.ipynb");
    await page.evaluate("Jupyter.notebook.execute_all_cells()");
    await settled();
    const all = (await page.evaluate(
      'Jupyter.notebook.get_cells().flatMap((c) => c.cell_type === "code" ? c.output_area.outputs : [])',
    )) as Shown[];
    expect(all.filter(({ output_type }) => output_type === "error")).toEqual([]);
    expect(await page.locator(".output svg").count()).toBeGreaterThan(5);
    expect(await page.locator(".output math").count()).toBeGreaterThan(10);
    expect(await page.locator(".output table").count()).toBeGreaterThan(0);
    expect(await page.locator(".output", { hasText: "[object Object]" }).count()).toBe(0);
    const boxes = (await page.evaluate(
      'Array.from(document.querySelectorAll(".output svg"), (svg) => svg.getBoundingClientRect().width)',
    )) as number[];
    expect(Math.min(...boxes)).toBeGreaterThan(50);
    for (const [index, name] of ["top", "middle", "end"].entries()) {
      await page.evaluate(
        `document.querySelector("#site").scrollTop = ${index} / 2 * document.querySelector("#site").scrollHeight`,
      );
      await picture(`run-all-${name}`);
    }
  });

  test("an error is shown as one, with the engineer's line; fixed, the cell runs", async () => {
    await open("bench.ipynb");
    expect((await run(0, "const w = 5"))[0]).toBeUndefined();
    const [wrong] = await run(2, "const q: number = w;\nconst s: string = q;");
    expect(wrong).toMatchObject({ output_type: "error", ename: "TypeError" });
    expect(await page.locator(".output_error").first().textContent()).toContain("> 2 | const s: string = q;");
    await picture("error");
    const [right] = await run(2, "const q: number = w;\nconst s: string = String(q);\ns");
    expect(right?.data?.["text/plain"]).toBe("'5'");
  });

  test("an endless loop is interrupted by the button, and the names keep their values", async () => {
    await write(3, "let turns = 0;\nconsole.log('round and round');\nwhile (true) turns++;");
    await page.evaluate("Jupyter.notebook.execute_cells([3])");
    await page.waitForFunction("Jupyter.notebook.get_cell(3).output_area.outputs.length > 0");
    const begun = performance.now();
    await page.click('button[title="interrupt the kernel"]');
    await settled();
    // The browser's and the server's part of it included; the kernel's own is held by protocol_suite.py.
    expect(performance.now() - begun).toBeLessThan(5000);
    expect((await outputs(3)).at(-1)).toMatchObject({ output_type: "error", ename: "Interrupted" });
    const [kept] = await run(4, "[w, turns > 0]");
    expect(kept?.data?.["text/plain"]).toBe("[ 5, true ]");
    await picture("interrupted");
  });

  test("Tab completes a name; Shift-Tab tells what it is", async () => {
    await write(
      4,
      'import { portal } from "hingebook";\nportal({ span: "14 m", height: "5 m", bases: "pinned" }).memb',
    );
    await page.evaluate("Jupyter.notebook.select(4); Jupyter.notebook.edit_mode()");
    await page.evaluate("Jupyter.notebook.get_cell(4).code_mirror.execCommand('goDocEnd')");
    await page.keyboard.press("Tab");
    await page.waitForFunction('Jupyter.notebook.get_cell(4).get_text().endsWith(".members")');
    await write(4, "portal");
    await page.evaluate("Jupyter.notebook.get_cell(4).code_mirror.execCommand('goDocEnd')");
    await run(2, 'import { portal } from "hingebook";');
    await page.evaluate("Jupyter.notebook.select(4); Jupyter.notebook.edit_mode()");
    await page.evaluate("Jupyter.notebook.get_cell(4).code_mirror.execCommand('goDocEnd')");
    await page.keyboard.press("Shift+Tab");
    await page.waitForSelector("#tooltip .tooltiptext", { state: "visible" });
    await page.waitForFunction('document.querySelector("#tooltip").innerText.includes("portal(")');
    expect(await page.locator("#tooltip").textContent()).toContain("A frame of two columns and a beam");
    await picture("inspection");
    await page.keyboard.press("Escape");
  });

  test("a restart begins afresh", async () => {
    await page.evaluate("Jupyter.notebook.kernel.restart()");
    await page.waitForFunction("Jupyter.notebook.kernel.is_connected()");
    const [gone] = await run(4, "w");
    expect(gone).toMatchObject({ output_type: "error" });
    expect(gone?.evalue).toContain("'w'");
    const [again] = await run(0, "const w = 6;\nw");
    expect(again?.data?.["text/plain"]).toBe("6");
  });
});
