import { appendFileSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { sourcesDigest } from "../../kernel/watch/sources.ts";
import { startViewer } from "../../kernel/watch/viewer.ts";
import { watchNotebook } from "../../kernel/watch/watch.ts";
import { fixtureLibrary } from "./fixture-library.ts";
import { notebookText } from "./notebook-file.ts";

let folder = "";
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "hingebook-"));
});
afterEach(() => rmSync(folder, { recursive: true }));

const OPEN =
  'import { openSheet } from "hingebook";\nimport { readFileSync } from "node:fs";\nconst sheet = openSheet({ title: "Canopy beam", job: "77", preparedBy: "QV", basis: "trial", units: "kN, m", status: "preliminary" });';
const cells = (load: string): string =>
  notebookText([
    OPEN,
    `const L = sheet.given("L", "6 m", "span"); const q = sheet.given("q", "${load}", "load");`,
    'sheet.calc("M = q*L^2/8", "kN m", "at midspan")',
  ]);

async function until(what: () => boolean): Promise<void> {
  for (let tries = 0; !what(); tries++) {
    if (tries > 6000) throw new Error("it did not come to that");
    await new Promise((done) => setTimeout(done, 10));
  }
}

describe("watchNotebook(options)", () => {
  test("runs at once, again on a save and on a change of a file beside it, and ends when told", async () => {
    const file = join(folder, "canopy.ipynb");
    writeFileSync(file, cells("4 kN/m"));
    writeFileSync(join(folder, "loads.csv"), "1,2\n");
    let said = "";
    const end = new AbortController();
    const add = (text: string): void => {
      said += text;
    };
    const runs = (): number => said.split("waiting for a change").length - 1;
    const watching = watchNotebook({
      file,
      out: join(folder, "out"),
      overrides: new Map(),
      terminal: { out: add, err: add },
      versions: { hingebook: "test" },
      library: fixtureLibrary,
      types: join(import.meta.dirname, "fixture-library.ts"),
      signal: end.signal,
    });
    const written = (): string => readFileSync(join(folder, "out", "canopy.html"), "utf8");
    await until(() => runs() === 1);
    expect(written()).toContain("18.0"); // 4 · 6² / 8
    const [address = ""] = /http:\S+/.exec(said) ?? [];
    const served = async (): Promise<string> => (await fetch(`${address}package`)).text();
    expect(await served()).toBe(written());
    writeFileSync(file, cells("5 kN/m"));
    await until(() => runs() === 2);
    expect(written()).toContain("22.5");
    expect(await served()).toBe(written());
    appendFileSync(join(folder, "loads.csv"), "3,4\n");
    await until(() => runs() === 3);
    writeFileSync(file, cells("5 kN"));
    await until(() => said.includes("INCOMPLETE"));
    expect(await served()).toContain("INCOMPLETE");
    writeFileSync(file, cells("6 kN/m"));
    await until(() => written().includes("27.0"));
    end.abort();
    expect(await watching).toBe(0);
    await expect(fetch(address)).rejects.toThrow();
  });

  test("a notebook that is not there is refused at once", async () => {
    const options = {
      out: folder,
      overrides: new Map(),
      terminal: { out: () => {}, err: () => {} },
      versions: {},
    };
    const file = join(folder, "none.ipynb");
    await expect(watchNotebook({ ...options, file, library: fixtureLibrary })).rejects.toThrow(
      /no such file/,
    );
  });
});

test("sourcesDigest(file) sees cells and files beside the notebook, and no outputs", () => {
  const file = join(folder, "a.ipynb");
  writeFileSync(file, cells("4 kN/m"));
  const first = sourcesDigest(file);
  writeFileSync(
    file,
    cells("4 kN/m").replace('"outputs":[]', '"outputs":[{"output_type":"stream","text":"x"}]'),
  );
  writeFileSync(join(folder, "a.html"), "<p>");
  expect(sourcesDigest(file)).toBe(first);
  writeFileSync(join(folder, "loads.csv"), "1");
  expect(sourcesDigest(file)).not.toBe(first);
});

describe("startViewer(title)", () => {
  test("tells open pages, and answers nobody who came by another name", async () => {
    const viewer = await startViewer("a <b>");
    const file = join(folder, "p.html");
    writeFileSync(file, "<p>package</p>");
    expect((await fetch(`${viewer.address}package`)).status).toBe(404);
    const { body } = await fetch(`${viewer.address}events`);
    viewer.tell("running");
    viewer.tell("written", file);
    let heard = "";
    const reader = body?.pipeThrough(new TextDecoderStream()).getReader();
    while (!heard.includes("written")) heard += (await reader?.read())?.value ?? "";
    expect(heard).toMatch(/event: running[\s\S]*event: written\ndata: 1/);
    await reader?.cancel();
    expect(await (await fetch(`${viewer.address}package?1`)).text()).toBe("<p>package</p>");
    expect(await (await fetch(viewer.address)).text()).toContain("a &lt;b>");
    const { request } = await import("node:http");
    const status = await new Promise((settle) => {
      request(viewer.address, { headers: { host: "elsewhere.example" } }, (response) => {
        response.resume();
        settle(response.statusCode);
      }).end();
    });
    expect(status).toBe(403);
    await viewer.close();
  });
});
