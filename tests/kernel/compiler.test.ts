// Contract: what kernel/check/compiler.ts leans on in the compiler's API.
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, describe, expect, test } from "vitest";
import { Compiler } from "../../kernel/check/compiler.ts";
import { ownFolder } from "../../kernel/folders.ts";

const folder = mkdtempSync(join(tmpdir(), "hingebook-"));
const compiler = new Compiler(
  { folder, ownFolder: ownFolder(), paths: {} },
  { node: false, borrowed: false },
);
afterAll(async () => {
  await compiler.close();
  rmSync(folder, { recursive: true });
});

const check = (text: string) => compiler.check(text);

describe("Compiler", () => {
  test("a file that is only in memory is checked, and again after a change", async () => {
    expect(await check("export const a: string = 1;")).toMatchObject([{ code: 2322, start: 13, end: 14 }]);
    expect(await check("export const a: number = 1;")).toEqual([]);
  });

  test("offsets count UTF-16 units", async () => {
    const text = "export const s = '𝛼'; export const n: number = 'x';";
    expect(await check(text)).toMatchObject([{ start: text.indexOf("n:") }]);
  });

  test("a namespace in a block is typed and its place not complained of", async () => {
    const found = await check(
      "{ namespace N { export const z = 1 }\nconst s: string = N.z; s; }\nexport {};",
    );
    expect(found.map(({ code }) => code)).toEqual([2322]);
  });

  test("syntax is reported too", async () => {
    expect((await check("export const a = (;"))[0]?.code).toBe(1109);
  });

  test("the library of the language is there, the browser's is not", async () => {
    expect(await check("export const a = [1].toSorted().at(-1);")).toEqual([]);
    expect(await check("export const a = document;")).toHaveLength(1);
  });

  test("close ends the process", async () => {
    const processes = () => process.getActiveResourcesInfo().filter((name) => name === "ProcessWrap").length;
    const before = processes();
    const other = new Compiler(
      { folder, ownFolder: ownFolder(), paths: {} },
      { node: false, borrowed: false },
    );
    await other.check("export {};");
    expect(processes()).toBe(before + 1);
    await other.close();
    for (let tries = 0; tries < 1000 && processes() > before; tries++)
      await new Promise((done) => setTimeout(done, 20));
    expect(processes()).toBe(before);
  });
});
