// Records from strangers: broken, contradictory and hostile ones, each refused in words before anything is run.
import { existsSync, readdirSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { beforeAll, describe, expect, test } from "vitest";
import type { Runner } from "../../kernel/record/index.ts";
import type { CalculationRecord } from "../../lib/sheet/index.ts";
import { readRecord } from "../../lib/sheet/read-record.ts";
import { bare, hingebook, jobFolder, newFolder, recordOf, runnerFor, verified } from "./command.ts";

const marker = join(tmpdir(), `hingebook-was-run-${process.pid}`);
const notebook = JSON.stringify({
  nbformat: 4,
  nbformat_minor: 5,
  metadata: {},
  cells: [
    {
      cell_type: "code",
      id: "a",
      metadata: {},
      outputs: [],
      execution_count: null,
      source: `import { writeFileSync } from "node:fs";\nwriteFileSync(${JSON.stringify(marker)}, "run");`,
    },
  ],
});

type Fields = Record<string, unknown>;

let good: CalculationRecord;
let runner: Runner;

beforeAll(async () => {
  const job = jobFolder();
  expect(hingebook(job, "run", "frame.ipynb").code).toBe(0);
  good = recordOf(join(job, "out/frame.html"));
  runner = await runnerFor(good);
});

const base = (id: string, uses: readonly string[] = []): Fields => ({
  id,
  version: 1,
  cell: 1,
  uses,
  outOfDate: false,
});
const note = (id: string, uses: readonly string[] = []): Fields => ({
  ...base(id, uses),
  kind: "note",
  text: "n",
});
const given = (si: unknown): Fields => ({
  ...base("q"),
  kind: "given",
  symbol: "q",
  tex: "q",
  description: "",
  value: { si, dimension: "force", unit: "kN", text: "1 kN" },
});

/** The good record as JSON text with fields of the record changed. */
const changed = (fields: Fields): string =>
  JSON.stringify({ ...good, notebook: { name: "a.ipynb", source: notebook }, ...fields });
const withEntries = (...entries: readonly Fields[]): string =>
  changed({ entries: [...good.entries, ...entries] });
/** JSON text put in as it is, for what JSON.stringify cannot write. */
const raw = (fields: Fields, mark: string, text: string): string => changed(fields).replace(mark, text);

const rows: readonly (readonly [string, () => string, RegExp])[] = [
  ["no JSON", () => "{", /the record is not JSON/],
  ["an empty text", () => "", /the record is not JSON/],
  ["a list", () => "[]", /the record is no JSON object/],
  ["null", () => "null", /the record is no JSON object/],
  [
    "no format",
    () => changed({ format: undefined }),
    /format is missing; a record begins with format "hingebook record"/,
  ],
  ["another format", () => changed({ format: "recipe" }), /format is "recipe"/],
  [
    "a newer version",
    () => changed({ version: 7 }),
    /the record has version 7; hingebook .* reads versions up to 0/,
  ],
  ["a version in words", () => changed({ version: "0" }), /version is "0"; a whole number is wanted/],
  ["a negative version", () => changed({ version: -1 }), /version is -1/],
  ["no head", () => changed({ head: undefined }), /record\.head is missing/],
  [
    "a head without title",
    () => changed({ head: { ...good.head, title: undefined } }),
    /record\.head\.title is missing/,
  ],
  ["no entries", () => changed({ entries: undefined }), /record\.entries is missing/],
  ["an unknown field", () => changed({ run: "rm" }), /Unrecognized key: "run"/],
  [
    "an unknown kind of entry",
    () => withEntries({ ...base("x"), kind: "script", text: "alert(1)" }),
    /record\.entries\[\d+\]\.kind is "script"/,
  ],
  ["an entry without id", () => withEntries({ ...note("x"), id: undefined }), /\.id is missing/],
  ["an entry twice", () => withEntries(note("L")), /entry "L" is there twice/],
  [
    "a use of nothing",
    () => withEntries(note("x", ["gone@1"])),
    /entry "x" stands on "gone@1", which the record does not hold/,
  ],
  [
    "a use of another version",
    () => withEntries(note("x", ["L@9"])),
    /stands on "L@9", but the record holds version 1/,
  ],
  ["a use without version", () => withEntries(note("x", ["L"])), /an entry and its version is wanted/],
  ["an entry on itself", () => withEntries(note("x", ["x@1"])), /stand on each other in a circle: x on x/],
  [
    "a circle of three",
    () => withEntries(note("x", ["z@1"]), note("y", ["x@1"]), note("z", ["y@1"])),
    /in a circle: /,
  ],
  [
    "a number too large for a double",
    () => raw({ entries: [given(4711)] }, "4711", "1e999"),
    /si is Infinity; numbers up to 1e\+30/,
  ],
  ["a huge number", () => changed({ entries: [given(1e300)] }), /si is 1e\+300; numbers up to 1e\+30/],
  ["a number in words", () => changed({ entries: [given("5")] }), /\.value\.si is "5"/],
  ["a nought for a number", () => changed({ entries: [given(null)] }), /\.value\.si is null/],
  [
    "prototype pollution at the top",
    () => changed({}).replace("{", '{"__proto__":{"polluted":1},'),
    /a field may not be named "__proto__"/,
  ],
  [
    "prototype pollution deep in a figure",
    () =>
      changed({
        entries: [
          {
            ...base("f"),
            kind: "figure",
            caption: "",
            alternative: "",
            spec: { kind: "structure", constructor: { prototype: { polluted: 1 } } },
          },
        ],
      }),
    /a field may not be named "constructor"/,
  ],
  [
    "a path for the notebook's name",
    () => changed({ notebook: { name: "../../out.ipynb", source: notebook } }),
    /record\.notebook\.name is .*a file name without folders is wanted/,
  ],
  [
    "an absolute path",
    () => changed({ notebook: { name: "/tmp/out.ipynb", source: notebook } }),
    /a file name without folders is wanted/,
  ],
  [
    "a path of the other kind",
    () => changed({ notebook: { name: "..\\out.ipynb", source: notebook } }),
    /a file name without folders is wanted/,
  ],
  [
    "two dots as a name",
    () => changed({ notebook: { name: "..", source: notebook } }),
    /a file name without folders is wanted/,
  ],
  [
    "a file above the notebook",
    () => changed({ files: [{ path: "../x.ts", text: "" }] }),
    /a path below the notebook's folder is wanted/,
  ],
  [
    "a file above, further in",
    () => changed({ files: [{ path: "a/../../x.ts", text: "" }] }),
    /a path below the notebook's folder is wanted/,
  ],
  [
    "an absolute file",
    () => changed({ files: [{ path: "/tmp/x.ts", text: "" }] }),
    /a path below the notebook's folder is wanted/,
  ],
  [
    "nested without end",
    () => raw({ head: 4711 }, "4711", `${"[".repeat(5000)}${"]".repeat(5000)}`),
    /nested more than 64 deep/,
  ],
  [
    "half a character",
    () => withEntries({ ...note("x"), text: "\ud800" }),
    /the record cannot be read|half a character/,
  ],
  [
    "a table whose cell is a function in disguise",
    () =>
      changed({
        entries: [{ ...base("t"), kind: "table", caption: "", columns: ["a"], rows: [[{ toString: "x" }]] }],
      }),
    /record\.entries\[0\]\.rows/,
  ],
  [
    "a million uses",
    () =>
      changed({
        entries: [
          note(
            "x",
            Array.from({ length: 30_000 }, (_, i) => `a${i}@1`),
          ),
        ],
      }),
    /Too big: expected array to have <=20000 items/,
  ],
];

describe("hostile records", () => {
  test("there are at least 30, and the record they are made from is good", () => {
    expect(rows.length).toBeGreaterThanOrEqual(30);
    expect(readRecord(changed({})).complete).toBe(true);
  });

  test.each(rows)("%s: a clear error, nothing run, nothing left behind", async (_, json, words) => {
    const path = join(newFolder(), "stranger.html");
    writeFileSync(path, await bare(json()));
    const { code, out, err } = await verified(path, runner, { run: true });
    expect(err + out).toMatch(words);
    expect(err.length).toBeLessThan(1500);
    expect(code).toBe(3);
    expect(out).not.toMatch(/is run now/);
    expect(existsSync(marker)).toBe(false);
    expect(({} as { polluted?: unknown }).polluted).toBeUndefined();
    expect(readdirSync(join(path, ".."))).toEqual(["stranger.html"]);
  });

  test("through the command: words on standard error, exit code 3", async () => {
    const folder = newFolder();
    writeFileSync(join(folder, "stranger.html"), await bare(changed({ version: 7 })));
    const { code, out, err } = hingebook(folder, "verify", "stranger.html", "--run");
    expect(err).toMatch(
      /^hingebook: stranger\.html: the record has version 7; hingebook \d.* reads versions up to 0/,
    );
    expect(out).toBe("");
    expect(code).toBe(3);
    expect(hingebook(folder, "changes", "stranger.html", "stranger.html")).toMatchObject({
      code: 3,
      out: "",
    });
  });

  test("text that looks like markup stays text when the page is made again", async () => {
    const record = readRecord(withEntries({ ...note("x"), text: "</script><script>alert(1)</script>" }));
    const html = await (await runner.library()).renderPackage(record);
    expect(html).not.toContain("<script>alert(1)");
    expect(html.match(/<script/g)).toHaveLength(2);
  });

  test("a figure out of all proportion ends in words, not in an endless drawing", async () => {
    const figure = good.entries.find((entry) => entry.kind === "figure" && entry.spec.kind === "diagrams");
    const spec = JSON.parse(JSON.stringify(figure?.kind === "figure" ? figure.spec : {}));
    spec.forces[1].V.breaks[1] = 1e30;
    const entries = good.entries.map((entry) => (entry === figure ? { ...entry, spec } : entry));
    const path = join(newFolder(), "stranger.html");
    writeFileSync(path, await bare(JSON.stringify({ ...good, entries })));
    const { code, out } = await verified(path, runner);
    expect(out).toMatch(/page +WRONG: cannot be made from the record: figure .*out of all proportion/);
    expect(code).toBe(1);
  });
});
