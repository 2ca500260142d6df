import { describe, expect, it } from "vitest";
import { table } from "../../lib/report/tables.ts";
import type { TableEntry } from "../../lib/sheet/index.ts";

const entry = (columns: readonly string[], first: string): TableEntry => ({
  id: "t",
  version: 1,
  cell: 1,
  uses: [],
  outOfDate: false,
  kind: "table",
  caption: "Results",
  columns,
  rows: [[first, ...columns.slice(1)]],
});

describe("table", () => {
  it.each([
    ["M_B1", "<math><msub><mi>M</mi><mtext>B1</mtext></msub></math>"],
    ["N_A", "<math><msub><mi>N</mi><mi>A</mi></msub></math>"],
  ])("sets the symbol %s of a result as its own line does", (symbol, math) => {
    expect(table(entry(["result", "value"], symbol)).html).toContain(`<th scope="row">${math}</th>`);
  });
  it.each(["M of BC at B", "AB", "reaction A, x", "h1"])("leaves the words %s as they are", (words) => {
    expect(table(entry(["result", "value"], words)).html).toContain(`<th scope="row">${words}</th>`);
  });
  it("says on a telephone that it moves sideways where its columns are many", () => {
    expect(table(entry(["a", "b", "c", "d"], "x")).html).toContain('class="scroll broad"');
    expect(table(entry(["a", "b", "c"], "x")).html).toContain('class="scroll"');
  });
});
