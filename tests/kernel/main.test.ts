import { readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { ownFolder } from "../../kernel/folders.ts";
import { main } from "../../kernel/main.ts";

async function run(...words: string[]): Promise<{ code: number; out: string; err: string }> {
  const said = { out: "", err: "" };
  const code = await main(words, {
    out: (text) => {
      said.out += text;
    },
    err: (text) => {
      said.err += text;
    },
  });
  return { code, ...said };
}

describe("main", () => {
  test("--help and --version go to standard output", async () => {
    expect(await run("--help")).toMatchObject({
      code: 0,
      err: "",
      out: expect.stringContaining("hingebook run FILE…"),
    });
    const { version } = JSON.parse(readFileSync(join(ownFolder(), "package.json"), "utf8")) as {
      version: string;
    };
    expect(await run("--version")).toEqual({ code: 0, err: "", out: `${version}\n` });
  });

  test("what is not understood is 2, what fails is 1, both with words", async () => {
    expect(await run("rnu")).toMatchObject({
      code: 2,
      err: expect.stringMatching(/"rnu" is not a command.*\n.*--help/),
    });
    expect(await run("run", "a.ipynb", "--set", "g")).toMatchObject({ code: 2 });
    expect(await run("run", "no-such.ipynb")).toMatchObject({
      code: 1,
      err: expect.stringContaining("there is no such file"),
    });
  });
});
