import { describe, expect, test } from "vitest";
import { lineAnchor } from "../../lib/report/book.ts";
import { promptsLeft, promptsLeftWords, renderPackage } from "../../lib/report/index.ts";
import type { CalculationRecord } from "../../lib/sheet/index.ts";
import { record } from "./fixtures.ts";

/** The fixture's record with a notebook of these cells. */
const withCells = (...sources: readonly (string | readonly string[])[]): CalculationRecord => ({
  ...record,
  notebook: { name: "frame.ipynb", source: JSON.stringify({ cells: sources.map((source) => ({ source })) }) },
});

describe("promptsLeft", () => {
  test.each([
    ["a notebook without any", withCells("const L = 3; // a < b > c"), 0, []],
    ["as often as they stand there", withCells("‹title›", "a ‹job› b ‹job›", "none"), 3, [1, 2]],
    ["over several lines of a cell", withCells(["# ‹what is\n", "calculated›\n"]), 1, [1]],
    ["not an empty pair, nor one left open", withCells("‹› ‹open"), 0, []],
    ["in the head alone", { ...withCells("none"), head: { ...record.head, job: "‹job›" } }, 1, []],
    [
      "in head and notebook, once",
      { ...withCells("", "‹job›"), head: { ...record.head, job: "‹job›" } },
      1,
      [2],
    ],
    ["where the source is no notebook", { ...record, notebook: { name: "a", source: "‹a›" } }, 0, []],
    [
      "where a cell has no source",
      { ...record, notebook: { name: "a", source: '{"cells":[null,{}]}' } },
      0,
      [],
    ],
  ] as const)("%s", (_, calculation, count, cells) => {
    expect(promptsLeft(calculation)).toEqual({ count, cells });
  });

  test("in an entry that came from elsewhere: in its cell, each once", () => {
    const entries = record.entries.map((entry) =>
      entry.id === "L" && entry.kind === "given"
        ? { ...entry, source: "‹drawing›", description: "‹drawing› and ‹span›" }
        : entry,
    );
    expect(promptsLeft({ ...withCells("none"), entries })).toEqual({ count: 2, cells: [2] });
  });

  test("in words", () => {
    expect(promptsLeftWords(withCells("none"))).toBe("");
    expect(promptsLeftWords(withCells("", "‹job›"))).toBe(
      "1 prompt of the template is not yet replaced: cell 2",
    );
    expect(promptsLeftWords(withCells("‹title›", "", "‹a› ‹b›"))).toBe(
      "3 prompts of the template are not yet replaced: cells 1, 3",
    );
    expect(promptsLeftWords({ ...withCells("none"), head: { ...record.head, job: "‹job›" } })).toBe(
      "1 prompt of the template is not yet replaced",
    );
  });
});

describe("renderPackage on prompts left", () => {
  test("the cover says how many and where, each cell leading to its first line", async () => {
    const html = await renderPackage(withCells("", "‹drawing›", "", "‹reason›"));
    const cover = html.slice(0, html.indexOf('id="givens"'));
    const said = /<p class="stale">NOT FILLED IN: (.*?)<\/p>/.exec(cover)?.[1] ?? "";
    expect(said.replace(/<[^>]*>/g, "")).toBe("2 prompts of the template are not yet replaced: cells 2, 4");
    const first = record.entries.find(({ cell }) => cell === 2);
    expect(said).toContain(`<a class="ref" href="#${lineAnchor(first?.id ?? "none")}">2</a>`);
  });

  test("nothing is said where none is left", async () => {
    expect(await renderPackage(withCells("none"))).not.toContain("NOT FILLED IN");
  });
});
