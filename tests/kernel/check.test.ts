import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, describe, expect, test } from "vitest";
import { type CellDiagnostic, type Checker, createChecker } from "../../kernel/check/index.ts";
import { ownFolder } from "../../kernel/folders.ts";
import { fixtureLibrary } from "./fixture-library.ts";

const folder = mkdtempSync(join(tmpdir(), "hingebook-"));
const { unitsOf } = await fixtureLibrary();
const paths = { hingebook: join(import.meta.dirname, "fixture-library.ts") };
const checker: Checker = createChecker({ folder, ownFolder: ownFolder(), paths, unitsOf });
afterAll(async () => {
  await checker.close();
  rmSync(folder, { recursive: true });
});

const messages = (found: readonly CellDiagnostic[]): string[] =>
  found.map(({ index, line, column, message }) => `${index} ${line}:${column} ${message}`);

const check = async (...cells: string[]): Promise<string[]> => messages(await checker.check(cells));

describe("createChecker", () => {
  test("sound cells pass", async () => {
    expect(await check('import { span } from "hingebook";', 'span({ length: "14 m" })')).toEqual([]);
  });

  test("a finding names its cell, line and column, whatever stands before", async () => {
    const found = await check(
      'import { span } from "hingebook";\nconst a = 1;',
      "",
      "// text\n  const b: string = a;",
    );
    expect(found).toEqual(["2 2:9 Type 'number' is not assignable to type 'string'."]);
  });

  test("cells after one that is not TypeScript are not looked at", async () => {
    expect(await check("const a: string = 1", "let b = (", "const c: string = 1")).toEqual([
      "0 1:7 Type 'number' is not assignable to type 'string'.",
      expect.stringMatching(/^1 1:10 /),
    ]);
  });

  test("the same cells again answer the same", async () => {
    const cells = ["const a: string = 1"];
    expect(await checker.check(cells)).toEqual(await checker.check(cells));
  });

  describe("words for a measure that does not fit", () => {
    const head = 'import { point, span } from "hingebook";\n';
    const one = async (code: string): Promise<string> => {
      const found = await check(head + code);
      expect(found).toHaveLength(1);
      return found[0] ?? "";
    };

    test("a property", async () => {
      const text = await one('span({ length: "14 kN" })');
      expect(text).toBe(
        '0 2:8 length: "14 kN" is not a length; write for example "14 m" (m, mm, cm, ft, in)',
      );
    });

    test("an argument", async () => {
      expect(await one('point("B", "18 m")')).toMatch(
        /^0 2:12 argument 2 of point: "18 m" is not a force; write for example "18 N" \(N, kN, MN, lb, kip\)$/,
      );
    });

    test("a text without a number", async () => {
      expect(await one('span({ length: "long" })')).toMatch(
        /length: "long" is not a length; write for example "1 m"/,
      );
    });

    test("a bare number", async () => {
      expect(await one("span({ length: 14 })")).toMatch(
        /length: 14 is not a length; write for example "14 m"/,
      );
    });

    test("a quantity of another dimension", async () => {
      const sheet =
        'import { openSheet } from "hingebook";\nconst sheet = openSheet({ title: "t", job: "1", preparedBy: "A", basis: "b", units: "kN, m", status: "s" });\n';
      const found = await check(
        `${sheet}const H = sheet.given("H", "18 kN", "wind");\n${head}span({ length: H })`,
      );
      expect(found).toEqual(["0 5:8 length: H is a force, where a length is needed"]);
    });
  });

  test("a local module is checked too, and read again when changed", async () => {
    writeFileSync(join(folder, "loads.ts"), "export const roof: number = 'x';\n");
    const cell = 'const first = 1;\nimport { roof } from "./loads.ts";\nroof';
    const [found] = await checker.check(["1", cell]);
    expect(found).toMatchObject({ index: 1, file: "loads.ts", line: 1, column: 14 });
    writeFileSync(join(folder, "loads.ts"), "export const roof: number = 5;\n");
    expect(await checker.check(["1", cell])).toEqual([]);
  });

  test("packages come from hingebook's own when the notebook's folder has none; Node's types likewise", async () => {
    const found = await check(
      'import { z } from "zod";\nconst n: number = z.string().parse("a");',
      'import { basename } from "node:path";\nconst b: number = basename("a");',
    );
    expect(found).toEqual([
      "0 2:7 Type 'string' is not assignable to type 'number'.",
      "1 2:7 Type 'string' is not assignable to type 'number'.",
    ]);
  });

  test("a JSON file beside the notebook is typed by its content", async () => {
    writeFileSync(join(folder, "data.json"), '{ "span": 14 }');
    expect(await check('import data from "./data.json";\nconst s: string = data.span;')).toEqual([
      "0 2:7 Type 'number' is not assignable to type 'string'.",
    ]);
  });
});
