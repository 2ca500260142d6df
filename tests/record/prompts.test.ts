// A calculation with prompts of a template left is not issued; the runner says what is left.
import { existsSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { beforeAll, describe, expect, test } from "vitest";
import { loadLibrary } from "../../kernel/library.ts";
import { issue } from "../../kernel/record/issue.ts";
import { runNotebooks } from "../../kernel/run.ts";
import { notebookText } from "../kernel/notebook-file.ts";
import { newFolder } from "./command.ts";

const head =
  '{ title: "Loft beam", job: "‹job›", preparedBy: "QV", basis: "trial", units: "kN, m", status: "preliminary" }';
const cells = [
  { markdown: "# Loft beam" },
  `import { openSheet } from "hingebook";\nconst sheet = openSheet(${head});`,
  'sheet.given("L", "4 m", "span", { from: "‹drawing›" });',
];

describe("a calculation with ‹…› left", () => {
  const folder = newFolder();
  const file = join(folder, "loft.ipynb");
  const write = (change: (text: string) => string): void => writeFileSync(file, change(notebookText(cells)));
  const heard = { out: "", err: "" };
  const terminal = {
    out: (text: string) => {
      heard.out += text;
    },
    err: (text: string) => {
      heard.err += text;
    },
  };
  const runner = { library: loadLibrary, versions: { hingebook: "test" } };
  const asked = { command: "issue", file, rev: "P1", why: "first", sensitivity: false } as const;
  const issued = (): Promise<number> => issue(asked, "2031-04-30", runner, terminal);

  beforeAll(() => write((text) => text));

  test("run: complete, and says how many are left and in which cells", async () => {
    const out = join(folder, "out");
    const options = { files: [file], out, overrides: new Map<string, string>(), terminal, ...runner };
    expect(await runNotebooks(options)).toEqual(["complete"]);
    expect(heard.out).toContain("NOT FILLED IN: 2 prompts of the template are not yet replaced: cells 2, 3");
    expect(readFileSync(join(out, "loft.html"), "utf8")).toContain("NOT FILLED IN: 2 prompts");
  });

  test("issue: refused, naming the cells; nothing is written", async () => {
    heard.err = "";
    expect(await issued()).toBe(1);
    expect(heard.err).toContain(
      "NOT ISSUED: loft.ipynb: 2 prompts of the template are not yet replaced: cells 2, 3; write what stands in ‹…› first",
    );
    expect(existsSync(join(folder, "issued"))).toBe(false);
  });

  test("issued once they are replaced", async () => {
    write((text) => text.replace("‹job›", "2614").replace("‹drawing›", "LB-01"));
    heard.out = "";
    expect(await issued()).toBe(0);
    expect(heard.out).not.toContain("NOT FILLED IN");
    expect(readdirSync(join(folder, "issued")).sort()).toEqual(["loft-P1.html", "register.json"]);
  });
});
