import { afterAll, describe, expect, test } from "vitest";
import { type OutputEvent, Session } from "../../kernel/session.ts";
import { type Expected, table } from "./semantics-table.ts";

interface Ran {
  readonly printed: string;
  readonly shown: unknown;
  readonly error?: { kind: string; message: string; line?: number; column?: number };
}

function hold(code: string, ran: Ran, expected: Expected): void {
  const { error, shown, printed } = ran;
  const about = `${JSON.stringify(code)}\n${JSON.stringify(ran)}`;
  if ("refused" in expected || "throws" in expected) {
    expect(error?.kind, about).toBe("refused" in expected ? "refused" : "thrown");
    expect(error?.message, about).toMatch("refused" in expected ? expected.refused : expected.throws);
    if (expected.line !== undefined) expect(error?.line, about).toBe(expected.line);
    if (expected.column !== undefined) expect(error?.column, about).toBe(expected.column);
    return;
  }
  expect(error, about).toBeUndefined();
  expect(shown, about).toBe("shows" in expected ? expected.shows : undefined);
  expect(printed, about).toBe("prints" in expected ? expected.prints : "");
}

describe("cells that follow one another, run by the session", () => {
  const open: Session[] = [];
  afterAll(() => Promise.all(open.map((session) => session.close())));

  test("the table is large enough to be worth its name", () => {
    expect(table.length).toBeGreaterThanOrEqual(100);
    expect(new Set(table.map(({ name }) => name)).size).toBe(table.length);
  });

  test.each(table)("$name", async ({ cells }) => {
    let printed = "";
    const onOutput = (event: OutputEvent): void => {
      if (event.kind === "stream") printed += event.text;
    };
    const session = new Session({ folder: import.meta.dirname, onOutput });
    open.push(session);
    for (const [index, [code, expected]] of cells.entries()) {
      printed = "";
      const result = await session.execute(code, { cell: { number: index + 1, id: `c${index}` } });
      const error = result.status === "error" ? { error: result.error } : {};
      const shown = result.status === "ok" ? result.display?.["text/plain"] : undefined;
      hold(code, { printed, shown, ...error }, expected);
    }
    await session.close();
    open.pop();
  });
});
