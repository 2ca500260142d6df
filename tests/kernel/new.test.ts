import { mkdtempSync, readdirSync, readFileSync, rmSync, symlinkSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { readArguments } from "../../kernel/arguments.ts";
import { ownFolder } from "../../kernel/folders.ts";
import { main } from "../../kernel/main.ts";
import { readNewArguments } from "../../kernel/new/arguments.ts";
import { filled } from "../../kernel/new/fill.ts";
import { readTemplate, templateNames } from "../../kernel/new/template.ts";
import { parseNotebook, readNotebook } from "../../kernel/notebook.ts";
import { UsageError } from "../../kernel/usage.ts";

describe("readNewArguments", () => {
  test("template, file, head and units", () => {
    expect(readNewArguments(["portal-gravity", "a/frame.ipynb"])).toEqual({
      command: "new",
      template: "portal-gravity",
      file: "a/frame.ipynb",
      units: "kN, m",
    });
    const words = [
      "--units=kip,ft",
      "blank-sheet",
      "--title",
      " Frame\n 3 ",
      "--job=7",
      "x.ipynb",
      "--by",
      "QV",
    ];
    expect(readArguments(["new", ...words])).toEqual({
      command: "new",
      template: "blank-sheet",
      file: "x.ipynb",
      units: "kip, ft",
      title: "Frame 3",
      job: "7",
      by: "QV",
    });
    expect(readNewArguments(["--list"])).toEqual({ command: "templates" });
    expect(readNewArguments(["blank-sheet", "--help"])).toEqual({ command: "help" });
  });

  test.each([
    [[], /new needs a template and a file, for example: hingebook new/],
    [["blank-sheet"], /new blank-sheet needs the file the notebook is written to/],
    [["blank-sheet", "frame"], /"frame" is not the name of a notebook; write for example "frame\.ipynb"/],
    [["blank-sheet", "frame.md"], /write for example "frame\.ipynb"/],
    [["blank-sheet", "folder/"], /write for example "folder\.ipynb"/],
    [["blank-sheet", ".ipynb"], /"\.ipynb" is not the name of a notebook/],
    [["blank-sheet", "a.ipynb", "b.ipynb"], /new makes one notebook; "b\.ipynb" is too much/],
    [
      ["blank-sheet", "a.ipynb", "--units", "N, mm"],
      /--units "N, mm" is not a system .* "kN, m" or "kip, ft"/,
    ],
    [["blank-sheet", "a.ipynb", "--title", " "], /--title needs a title/],
    [["blank-sheet", "a.ipynb", "--tilte", "x"], /"--tilte" is not an option of new; did you mean "--title"/],
    [["blank-sheet", "a.ipynb", "--job", "1", "--job", "2"], /--job is given twice/],
    [["--list", "blank-sheet"], /new --list takes nothing else/],
    [["--list=all"], /--list takes no value/],
  ])("%j is refused", (words, message) => {
    expect(() => readNewArguments(words)).toThrow(UsageError);
    expect(() => readNewArguments(words)).toThrow(message);
  });
});

describe("filled", () => {
  const template = readTemplate("blank-sheet");
  const code = (text: string): string =>
    parseNotebook("a.ipynb", text)
      .cells.filter(({ kind }) => kind === "code")
      .map(({ source }) => source)
      .join("\n");

  test("names hingebook's kernel, has ids, and nothing of the template's own metadata", () => {
    const { metadata, cells } = JSON.parse(filled(template, { units: "kN, m" }));
    expect(metadata.kernelspec).toEqual({
      display_name: "hingebook",
      language: "typescript",
      name: "hingebook",
    });
    expect(Object.keys(metadata).sort()).toEqual(["kernelspec", "language_info"]);
    expect(new Set(cells.map(({ id }: { id: string }) => id)).size).toBe(cells.length);
  });

  test("writes the head, whatever is in it, as text and as Markdown", () => {
    const title = 'The "C:\\roof" of `hall` *7* ‹east› $1 $& </script>';
    const text = filled(template, { units: "kN, m", title, job: "26/14", by: "O’Neil" });
    expect(code(text)).toContain(`title: ${JSON.stringify(title)},`);
    expect(code(text)).toContain('job: "26/14",\n  preparedBy: "O’Neil",');
    const [first] = parseNotebook("a.ipynb", text).cells;
    expect(first?.source).toContain(
      '# The "C:\\\\roof" of \\`hall\\` \\*7\\* ‹east› \\$1 \\$& \\</script\\>\n',
    );
  });

  test("a title that is itself a text of the template is not replaced again", () => {
    expect(code(filled(template, { units: "kip, ft", title: "6.4 m" }))).toContain('title: "6.4 m",');
  });

  test("in US customary units", () => {
    const text = code(filled(template, { units: "kip, ft" }));
    expect(text).toContain('units: "kip, ft"');
    expect(text).toContain('sheet.given("L", "21 ft", "span"');
    expect(text).toContain('sheet.calc("M_0 = w*L^2/8", "kip ft"');
  });
});

describe("hingebook new", () => {
  let folder = "";
  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), "hingebook-new-"));
  });
  afterAll(() => rmSync(folder, { recursive: true }));

  async function run(...words: string[]): Promise<{ code: number; out: string; err: string }> {
    const said = { out: "", err: "" };
    const code = await main(["new", ...words], {
      out: (text) => {
        said.out += text;
      },
      err: (text) => {
        said.err += text;
      },
    });
    return { code, ...said };
  }

  test("--list: every template with one line", async () => {
    const { code, out } = await run("--list");
    expect(code).toBe(0);
    const listed = out.trimEnd().split("\n");
    expect(listed.map((line) => line.trim().split(/\s{2,}/)[0])).toEqual(templateNames());
    expect(listed.filter((line) => !/^ {2}\S+ {2,}\S.{20,110}$/.test(line))).toEqual([]);
  });

  test("README.md lists every template", () => {
    const readme = readFileSync(join(ownFolder(), "README.md"), "utf8");
    expect([...readme.matchAll(/^\| `([\w-]+)` \|/gm)].map(([, name]) => name).sort()).toEqual(
      templateNames(),
    );
  });

  test("writes the notebook whole, into a folder made if need be, and says what is to be done", async () => {
    const file = join(folder, "jobs", "7", "frame.ipynb");
    const { code, out, err } = await run("blank-sheet", file, "--job", "7");
    expect([code, err]).toEqual([0, ""]);
    expect(out).toContain("blank-sheet, kN, m");
    expect(out).toMatch(/‹…› to be written: cells 1, 2, 4/);
    expect(out).toMatch(/hingebook run .*frame\.ipynb/);
    expect(readdirSync(join(folder, "jobs", "7"))).toEqual(["frame.ipynb"]);
    expect(readFileSync(file, "utf8")).toBe(
      filled(readTemplate("blank-sheet"), { units: "kN, m", job: "7" }),
    );
    expect(readNotebook(file).cells.length).toBeGreaterThan(4);
  });

  test("never overwrites: a file, a link that leads nowhere", async () => {
    const file = join(folder, "mine.ipynb");
    writeFileSync(file, "mine");
    const link = join(folder, "link.ipynb");
    symlinkSync(join(folder, "nowhere.ipynb"), link);
    for (const path of [file, link]) {
      const { code, err } = await run("blank-sheet", path);
      expect(code).toBe(1);
      expect(err).toContain(`${path} could not be written: a file of that name is there already`);
    }
    expect(readFileSync(file, "utf8")).toBe("mine");
    expect(readdirSync(folder)).not.toContain("nowhere.ipynb");
  });

  test("an unknown template: the nearest one and all there are", async () => {
    const { code, err } = await run("portal-graivty", join(folder, "no.ipynb"));
    expect(code).toBe(2);
    expect(err).toMatch(/"portal-graivty" is not a template; did you mean "portal-gravity"\?/);
    for (const name of templateNames()) expect(err).toContain(name);
    expect(readdirSync(folder)).not.toContain("no.ipynb");
  });

  test("a path through a file is refused in words", async () => {
    const file = join(folder, "plain.txt");
    writeFileSync(file, "");
    const { code, err } = await run("blank-sheet", join(file, "a.ipynb"));
    expect(code).toBe(1);
    expect(err).toMatch(
      /plain\.txt could not be written: (a part of the path is a file|a file of that name is there)/,
    );
  });
});
