import { describe, expect, it } from "vitest";
import { blocksOf } from "../../lib/report/arrange.ts";
import { bookOf } from "../../lib/report/book.ts";
import type { CalculationRecord, Entry } from "../../lib/sheet/index.ts";
import { record } from "./fixtures.ts";

const base = { version: 1, cell: 1, uses: [], outOfDate: false };
const text = (id: string, markdown: string) => ({ ...base, id, kind: "text", markdown }) as Entry;
const note = (id: string) => ({ ...base, id, kind: "note", text: id }) as Entry;
const given = record.entries.find((e) => e.kind === "given") as Entry;
const figure = (id: string, name: string) =>
  ({
    ...base,
    id,
    kind: "figure",
    caption: "",
    alternative: "",
    spec: { kind: "free body", body: { name } },
  }) as Entry;
const step = (id: string, body: string) =>
  ({ ...(record.entries.find((e) => e.kind === "step") as Entry), id, uses: [], body }) as Entry;

/** The blocks in short: ids of lines, "name[figures|steps]" of bodies. */
function shape(...entries: Entry[]): string[] {
  const of: CalculationRecord = { ...record, entries };
  return blocksOf(bookOf(of)).map((block) => {
    if (block.kind === "line") return block.item.entry.id;
    const ids = (items: readonly { entry: Entry }[]) => items.map((i) => i.entry.id).join(" ");
    return block.kind === "closures"
      ? `(${ids(block.items)})`
      : `${block.name}[${ids(block.figures)}|${ids(block.steps)}]`;
  });
}

describe("blocksOf", () => {
  it("blocksOf puts steps beside the figure of their body", () => {
    expect(
      shape(
        figure("f1", "beam"),
        step("1", "beam, ΣFy"),
        step("2", "beam, ΣFx"),
        note("n"),
        figure("f2", "joint B"),
        step("3", "joint B, ΣFx"),
      ),
    ).toEqual(["beam[f1|1 2]", "n", "joint B[f2|3]"]);
  });

  it("blocksOf names bodies taken together by their step, and parts bodies without figures", () => {
    expect(shape(figure("f1", "a"), figure("f2", "b"), step("1", "a with b, ΣFy"))).toEqual([
      "a with b[f1 f2|1]",
    ]);
    expect(shape(step("1", "a, ΣFy"), step("2", "a, ΣFx"), step("3", "b, ΣFy"))).toEqual([
      "a[|1 2]",
      "b[|3]",
    ]);
  });

  it.each([
    ["only givens beneath", [text("t", "## Given"), given, text("u", "## Loads"), note("n")], ["u", "n"]],
    [
      "givens, then a heading below it",
      [text("t", "## Given"), given, text("u", "### Loads"), note("n")],
      ["t", "u", "n"],
    ],
    ["givens, then a note", [text("t", "## Given"), given, note("n")], ["t", "n"]],
    ["givens to the end", [text("t", "## Given"), given], []],
    ["nothing beneath at all", [text("t", "## Later")], ["t"]],
    ["words beneath", [text("t", "## Given\n\nfrom drawings"), given], ["t"]],
  ])("blocksOf(heading with %s)", (_, entries, expected) => {
    expect(shape(...entries)).toEqual(expected);
  });
});
