// The table of cell sequences through the live kernel: a process of its own for every row, over its sockets.
import { dirname } from "node:path";
import { beforeAll, describe, expect, test } from "vitest";
import { type Expected, table } from "../semantics-table.ts";
import { Client, printed, type Ran, textOf } from "./client.ts";

const FOLDER = dirname(import.meta.dirname);
const AT_ONCE = 2;

function hold(code: string, cell: number, ran: Ran, expected: Expected): void {
  const { reply } = ran;
  const about = `${JSON.stringify(code)}\n${JSON.stringify(reply)}`;
  if ("refused" in expected || "throws" in expected) {
    expect(reply.status, about).toBe("error");
    expect(reply.evalue, about).toMatch("refused" in expected ? expected.refused : expected.throws);
    const { line, column } = expected;
    const text = (reply.traceback as string[]).join("\n");
    const place = `cell ${cell}, line ${line}, column ${column ?? ""}`;
    if (line !== undefined) expect(text, about).toContain(place);
    if ("refused" in expected) expect(printed(ran), about).toBe("");
    expect(ran.outputs.at(-1)?.header.msg_type, about).toBe("error");
    return;
  }
  expect(reply.status, about).toBe("ok");
  expect(textOf(ran, "execute_result"), about).toBe("shows" in expected ? expected.shows : undefined);
  expect(printed(ran), about).toBe("prints" in expected ? expected.prints : "");
}

/** A row takes two seconds on a machine that is free. */
const LONGEST_ms = 60_000;

describe("cells that follow one another, run by the live kernel", () => {
  const ran = new Map<string, readonly Ran[]>();

  /** Rows whose kernel was not heard to the end at the first try. */
  const again: string[] = [];

  /** Runs a row in a kernel of its own, which is ended where it does not come to an end by itself. */
  async function runRow({ cells }: (typeof table)[number]): Promise<readonly Ran[]> {
    const client = await Client.start(FOLDER);
    const late = setTimeout(() => client.process.kill("SIGKILL"), LONGEST_ms);
    try {
      const found: Ran[] = [];
      for (const [code] of cells) found.push(await client.execute(code));
      return found;
    } finally {
      await client.close();
      clearTimeout(late);
    }
  }

  beforeAll(async () => {
    const rows = [...table];
    const work = async (): Promise<void> => {
      for (let row = rows.shift(); row; row = rows.shift()) {
        const { name } = row;
        const first = await runRow(row).catch((error: unknown) => {
          again.push(name);
          console.warn(`hingebook: "${name}" is run again: ${String(error)}`);
        });
        ran.set(name, first ?? (await runRow(row)));
      }
    };
    await Promise.all(Array.from({ length: AT_ONCE }, work));
  }, 400_000); // a hundred and more processes, on a machine that may be busy

  test("a kernel that is not heard to the end is a rare thing", () => {
    expect(again.length, again.join(", ")).toBeLessThanOrEqual(2);
  });

  test("every row has run", () => {
    expect(ran.size).toBe(table.length);
    expect(ran.size).toBeGreaterThanOrEqual(100);
  });

  test.each(table)("$name", ({ name, cells }) => {
    for (const [index, [code, expected]] of cells.entries()) {
      const cell = ran.get(name)?.[index];
      if (!cell) throw new Error(`cell ${index + 1} did not run`);
      hold(code, index + 1, cell, expected);
    }
  });
});
