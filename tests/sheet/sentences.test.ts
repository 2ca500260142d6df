// What the engineer says was not considered: kept by cell, outside the lines of the calculation.

import { afterEach, describe, expect, test } from "vitest";
import { renderPackage } from "../../lib/report/index.ts";
import { attachHost, forgetLedger, type Ledger } from "../../lib/sheet/index.ts";
import { recordSchema } from "../../lib/sheet/schema.ts";
import { freshLedger, notebook } from "./notebook.ts";

afterEach(() => {
  forgetLedger();
  attachHost();
});

const recordOf = (sheet: Ledger) =>
  sheet.record({ complete: true, notebook: { name: "roof.ipynb", source: "{}" }, versions: {} });
const said = (sheet: Ledger): readonly string[] | undefined => recordOf(sheet).notConsidered;

describe("sheet.notConsidered", () => {
  test("fills the record's list, once each, in the order of the sheet, and makes no entry", () => {
    const { sheet, run } = notebook();
    run(3, (one) => one.notConsidered("fire", "  wind on the gable "));
    run(1, (one) => {
      expect(one.notConsidered("snow drift")).toEqual(["snow drift"]);
      one.notConsidered("fire");
    });
    expect(said(sheet)).toEqual(["snow drift", "fire", "wind on the gable"]);
    expect(sheet.entries()).toEqual([]);
    expect(recordSchema.parse(JSON.parse(JSON.stringify(recordOf(sheet))))).toEqual(recordOf(sheet));
  });

  test("nothing said: the record has no list", () => {
    expect("notConsidered" in recordOf(freshLedger())).toBe(false);
  });

  test("a cell run again replaces its own sentences, or takes them back", () => {
    const { sheet, run } = notebook();
    run(1, (one) => one.notConsidered("fire"));
    run(2, (one) => one.notConsidered("wind on the gable"));
    run(1, (one) => one.notConsidered("drift", "uplift"));
    expect(said(sheet)).toEqual(["drift", "uplift", "wind on the gable"]);
    run(1, () => undefined);
    expect(said(sheet)).toEqual(["wind on the gable"]);
    run(2, (one) => one.given("g", "3 kN/m"));
    expect(said(sheet)).toBeUndefined();
  });

  test.each<[string, readonly unknown[], RegExp]>([
    ["nothing at all", [], /notConsidered: nothing is named; write a sentence for each thing left out/],
    ["an empty text", ["fire", "  "], /notConsidered: a sentence is missing; write a few words/],
    ["a number", [3], /notConsidered: a sentence is missing/],
    ["a list", [["fire"]], /notConsidered: a sentence is missing/],
  ])("refuses %s, and keeps nothing of it", (_, given, words) => {
    const sheet = freshLedger();
    expect(() => sheet.notConsidered(...(given as string[]))).toThrow(words);
    expect(said(sheet)).toBeUndefined();
  });

  test("stands on the cover before the usual sentence, escaped", async () => {
    const sheet = freshLedger();
    sheet.given("g", "3 kN/m");
    sheet.notConsidered("gusts > 40 m/s & <ice>");
    const html = await renderPackage(recordOf(sheet));
    const part = html.slice(html.indexOf("<h3>Not considered</h3>")).split("</ul>")[0];
    expect(part).toMatch(
      /<li>gusts &gt; 40 m\/s &amp; &lt;ice&gt;<\/li><li>Unless a line of this calculation says/,
    );
  });
});
