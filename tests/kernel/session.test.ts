import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { type CellResult, type OutputEvent, Session, type SessionOptions } from "../../kernel/session.ts";

let folder = "";
let session: Session;
let output: OutputEvent[] = [];
let cells = 0;

const open = (options: Partial<SessionOptions> = {}): Session => {
  output = [];
  cells = 0;
  session = new Session({ folder, onOutput: (event) => output.push(event), ...options });
  return session;
};
const run = (code: string): Promise<CellResult> =>
  session.execute(code, { cell: { number: ++cells, id: `c${cells}` } });
const value = async (code: string): Promise<unknown> => {
  const result = await run(code);
  if (result.status === "error")
    throw new Error(`${result.error.message}\n${result.error.traceback.join("\n")}`);
  return result.value;
};
const failure = async (code: string) => {
  const result = await run(code);
  if (result.status !== "error") throw new Error(`the cell did not fail: ${code}`);
  return result.error;
};
const file = (name: string, text: string): void => writeFileSync(join(folder, name), text);

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "hingebook-"));
});
afterEach(async () => {
  await session.close();
  rmSync(folder, { recursive: true });
});

describe("a session's modules", () => {
  test("hingebook is the very object handed over, in cells and in local modules", async () => {
    const library = { mark: {} };
    open({ modules: { hingebook: library }, check: false });
    file("local.ts", 'export { mark } from "hingebook";');
    expect(await value('import { mark } from "hingebook"; mark')).toBe(library.mark);
    expect(await value('import { mark as again } from "./local.ts"; again')).toBe(library.mark);
    expect(await value('import * as all from "hingebook"; all')).toBe(library);
  });

  test("local TypeScript, with and without its ending, and what it imports; read again when either changes", async () => {
    open();
    file(
      "loads.ts",
      'import { factor } from "./factors";\nexport const roof: number = 2 * factor;\nexport default roof;',
    );
    file("factors.ts", "export const factor: number = 1.5;");
    expect(await value('import { roof } from "./loads.ts"; roof')).toBe(3);
    expect(await value('import r from "./loads"; r')).toBe(3);
    file("factors.ts", "export const factor: number = 2;");
    expect(await value('import { roof } from "./loads.ts"; roof')).toBe(4);
  });

  test("an unchanged local module runs once", async () => {
    open();
    file("once.ts", "console.log('ran'); export const a = 1;");
    await value('import { a } from "./once.ts"');
    await value('import { a as b } from "./once.ts"; b');
    expect(output.filter(({ kind }) => kind === "stream")).toHaveLength(1);
  });

  test("live exports of a local module", async () => {
    open();
    file("count.ts", "export let n = 0;\nexport function add(): void { n++ }");
    expect(await value('import * as count from "./count.ts"; count.add(); count.add(); count.n')).toBe(2);
  });

  test("JSON, JavaScript of both kinds", async () => {
    open({ check: false });
    file("data.json", '{ "span": 14, "list": [1] }');
    file("esm.mjs", "export const a = 1;");
    file("old.cjs", "module.exports = { b: 2 };");
    expect(
      await value('import data, { span } from "./data.json"; [data.span, span, data.list instanceof Array]'),
    ).toEqual([14, 14, true]);
    expect(await value('import { a } from "./esm.mjs"; a')).toBe(1);
    expect(await value('import old, { b } from "./old.cjs"; [old.b, b]')).toEqual([2, 2]);
    file("data.json", '{ "span": 15 }');
    expect(await value('import data from "./data.json"; data.span')).toBe(15);
  });

  test("a package beside the notebook comes before hingebook's own", async () => {
    const own = join(folder, "node_modules", "zod");
    mkdirSync(own, { recursive: true });
    writeFileSync(
      join(own, "package.json"),
      '{ "name": "zod", "type": "module", "exports": { "import": "./i.js" } }',
    );
    writeFileSync(join(own, "i.js"), "export const mine = true;");
    open({ check: false });
    expect(await value('import { mine } from "zod"; mine')).toBe(true);
  });

  test.each([
    ["a file that is not there", 'import "./gone.ts"', /"\.\/gone\.ts" is not there/],
    [
      "a package that is not installed",
      'import "no-such-package"',
      /package "no-such-package" is not installed/,
    ],
    ["a missing name", 'import { b } from "./a.ts"', /"b" is not exported by "\.\/a\.ts"; it exports a/],
    ["no default", 'import d from "./a.ts"', /"\.\/a\.ts" has no default export/],
    ["an ending cells do not import", 'import "./text.csv"', /"text\.csv" cannot be imported/],
    ["JSON that is none", 'import "./broken.json"', /broken\.json is not JSON/],
    ["modules that import each other", 'import "./left.ts"', /"left\.ts" and "right\.ts" import each other/],
    ["a module that is not TypeScript", 'import "./broken.ts"', /broken\.ts, line 2, column \d+: /],
  ])("refuses %s, at the import", async (_what, code, words) => {
    file("a.ts", "export const a = 1;");
    file("text.csv", "1,2");
    file("broken.json", "{");
    file("left.ts", 'import { r } from "./right.ts"; export const l: number = r;');
    file("right.ts", 'import { l } from "./left.ts"; export const r: number = l;');
    file("broken.ts", "export const a = 1;\nlet b = (");
    open({ check: false });
    const { message, line } = await failure(`const before = 1;\n${code}`);
    expect(message).toMatch(words);
    expect(line).toBe(2);
  });

  test("an error inside a local module is traced through it", async () => {
    file(
      "deep.ts",
      "export function f(x: number): number {\n  if (x > 0) throw new Error('deep');\n  return x;\n}",
    );
    open();
    const { line, column, traceback } = await failure('import { f } from "./deep.ts";\n\nf(1)');
    expect([line, column]).toEqual([3, 1]);
    expect(traceback).toEqual([
      "Error: deep",
      "    at f (deep.ts, line 2, column 20)",
      "    at cell 1, line 3, column 1",
    ]);
  });
});

describe("a session's cells", () => {
  test("the host is told before each cell that runs, and after it, well or not", async () => {
    const told: string[] = [];
    open({
      beforeCell: ({ id }) => told.push(`before ${id}`),
      afterCell: ({ id }) => told.push(`after ${id}`),
    });
    await run("1");
    await run("throw new Error('x')");
    await run("const a: string = 1");
    expect(told).toEqual(["before c1", "after c1", "before c2", "after c2"]);
  });

  test("the real value is given, and cells asked for at once run in turn", async () => {
    open();
    const results = await Promise.all([run("let a = 1; await 0; a = 2"), run("a + 1"), run("({ a })")]);
    expect(results.map((result) => result.status === "ok" && result.value)).toEqual([undefined, 3, { a: 2 }]);
  });

  test("cells foreseen are checked as what they are, cells changed since by themselves", async () => {
    open();
    session.foresee(["const a = 1", "const b: string = a", "a"]);
    expect(await value("const a = 1; a")).toBe(1);
    expect(await failure("const b: string = a")).toMatchObject({
      kind: "refused",
      cell: 2,
      line: 1,
      column: 7,
    });
    expect(await value("a + 1")).toBe(2);
  });

  test("a cell run again and again does not pile up", async () => {
    open();
    for (let n = 0; n < 40; n++) {
      const again = await session.execute(`const a = ${n}; function f() { return a }\nf()`, {
        cell: { number: 1, id: "same" },
      });
      expect(again).toMatchObject({ status: "ok", value: n });
    }
  });

  test("causes and several errors are told", async () => {
    open();
    const { traceback } = await failure(
      "try { throw new Error('inner') } catch (cause) { throw new Error('outer', { cause }) }",
    );
    expect(traceback.filter((text) => !text.startsWith("    at"))).toEqual([
      "Error: outer",
      "caused by Error: inner",
    ]);
    const several = await failure("throw new AggregateError([new Error('one'), new Error('two')], 'both')");
    expect(several.traceback.join("\n")).toMatch(/both[\s\S]*one[\s\S]*two/);
  });

  test("a promise nobody awaits fails the cell it was left by", async () => {
    open();
    expect((await failure("void Promise.reject(new Error('forgotten'))")).message).toBe("forgotten");
  });

  test("timers stop when the session closes", async () => {
    open();
    await run("setInterval(() => console.log('tick'), 5)");
    await session.close();
    const before = output.length;
    await new Promise((done) => setTimeout(done, 40));
    expect(output.length).toBe(before);
  });

  test("standard output and standard error are told apart", async () => {
    open();
    await run("console.log('a'); console.error('b'); console.table([{ x: 1 }])");
    expect(output.slice(0, 2)).toEqual([
      { kind: "stream", name: "stdout", text: "a\n" },
      { kind: "stream", name: "stderr", text: "b\n" },
    ]);
    expect(output.length).toBeGreaterThan(2);
  });
});
