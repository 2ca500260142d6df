import { afterEach, describe, expect, expectTypeOf, test } from "vitest";
import { type Quantity, quantity } from "../../lib/quantity/index.ts";
import {
  attachHost,
  currentLedger,
  type Draft,
  forgetLedger,
  type Head,
  openLedger,
} from "../../lib/sheet/index.ts";
import { freshLedger, head, notebook } from "./notebook.ts";

afterEach(() => {
  forgetLedger();
  attachHost();
});

describe("openLedger", () => {
  test("opens one ledger, which is then the current one", () => {
    forgetLedger();
    expect(currentLedger()).toBeUndefined();
    const sheet = openLedger(head);
    expect(currentLedger()).toBe(sheet);
    expect(sheet.head).toEqual(head);
  });

  test("opened again it keeps the entries and takes the new head", () => {
    const sheet = freshLedger();
    sheet.given("L", "14 m");
    const again = openLedger({ ...head, title: "Canopy" }, { figures: 4 });
    expect(again).toBe(sheet);
    expect(again.head.title).toBe("Canopy");
    expect(again.entries().map((entry) => entry.id)).toEqual(["L"]);
    expect(`${quantity(1234.567, "force")}`).toBe("1.235 kN");
  });

  const wrong: readonly (readonly [object, string])[] = [
    [{ ...head, title: "" }, "head: title is missing; give what is calculated"],
    [{ ...head, units: "kN" }, 'units: "kN" is not a force and a length'],
    [{ ...head, job: 2031 }, "head: job is 2031; a text is wanted"],
    [{ ...head, tittle: "x" }, 'head: "tittle" is not a field; did you mean "title"?'],
    [{ ...head, basis: undefined }, "head: basis is missing; give the standards it rests on"],
  ];
  test.each(wrong)("refuses %j", (bad, message) => {
    forgetLedger();
    expect(() => openLedger(bad as Head)).toThrow(message);
    expect(currentLedger()).toBeUndefined();
  });
  test.each([0, 1.5, 99])("refuses %d figures", (figures) => {
    forgetLedger();
    expect(() => openLedger(head, { figures })).toThrow("is not a number of significant figures");
  });
});

describe("given", () => {
  test("records value, source and description, and answers with the quantity standing on it", () => {
    const sheet = freshLedger();
    const L = sheet.given("L", "14.25 m", "span", { from: "drawing S-102 rev B" });
    expectTypeOf(L).toEqualTypeOf<Quantity<"length">>();
    expect(L).toMatchObject({ dimension: "length", si: 14.25, unit: "m", from: ["L@1"] });
    expect(sheet.entry("L")).toEqual({
      kind: "given",
      id: "L",
      symbol: "L",
      tex: "L",
      value: { si: 14.25, dimension: "length", unit: "m", text: "14.25 m" },
      uses: [],
      description: "span",
      source: "drawing S-102 rev B",
      version: 1,
      cell: 0,
      outOfDate: false,
    });
  });

  test("is frozen all the way down", () => {
    const sheet = freshLedger();
    sheet.given("L", "14 m");
    const entry = sheet.entry("L") as { value: object; uses: object };
    expect([entry, entry.value, entry.uses].every(Object.isFrozen)).toBe(true);
  });

  test("shows itself", () => {
    const L = freshLedger().given("sigma_Ed", "120 MPa", "stress & <more>") as unknown as Record<
      symbol,
      () => object
    >;
    const display = L[Symbol.for("Jupyter.display")]?.() as Record<string, string>;
    expect(display["text/plain"]).toBe("sigma_Ed = 120 MPa");
    expect(display["text/html"]).toMatch(
      /^<div><math>.*<mi>σ<\/mi>.*<\/math> stress &amp; &lt;more&gt;<\/div>$/,
    );
  });

  test("names its symbol in every refusal", () => {
    const sheet = freshLedger();
    expect(() => sheet.given("L", "14 kNn" as never)).toThrow('L: "14 kNn": "kNn" is not a unit known here');
    expect(() => sheet.given("L", Number.NaN)).toThrow("L: NaN is not a finite number");
    expect(() => sheet.given("2L", "14 m")).toThrow('"2L" cannot be a symbol');
    expect(() => sheet.given("L", "14 m", "", { from: " " })).toThrow("from is missing");
    expect(sheet.entries()).toEqual([]);
  });

  test("a quantity with many figures is shown with the sheet's figures", () => {
    const sheet = freshLedger();
    sheet.given("a", quantity(10 / 3, "length"));
    sheet.given("b", quantity(3.125, "length"));
    expect([sheet.entry("a"), sheet.entry("b")]).toMatchObject([
      { value: { text: "3.33 m" } },
      { value: { text: "3.125 m" } },
    ]);
  });
});

describe("assume", () => {
  test("with a value: a symbol with its reason", () => {
    const sheet = freshLedger();
    const r = sheet.assume("r_I", 2.5, "beam I over column I, from two similar roofs");
    expectTypeOf(r).toEqualTypeOf<Quantity<"pure number">>();
    expect(r.from).toEqual(["r_I@1"]);
    expect(sheet.entry("r_I")).toMatchObject({
      kind: "assumption",
      tex: "r_{I}",
      value: { si: 2.5, text: "2.50" },
      because: "beam I over column I, from two similar roofs",
    });
    sheet.calc("n = 2*r_I", "");
    expect(sheet.entry("n")?.uses).toEqual(["r_I@1"]);
  });

  test("without a value: words and their reason", () => {
    const sheet = freshLedger();
    const entry = sheet.assume("bases are pinned", { because: "two bolts on the column's axis" });
    expect(entry).toMatchObject({ kind: "assumption", id: "assumption bases are pinned", version: 1 });
    expect(entry).not.toHaveProperty("value");
  });

  test("the reason is required", () => {
    const sheet = freshLedger();
    expect(() => sheet.assume("r_I", 2.5, "")).toThrow("the reason for r_I is missing");
    expect(() => sheet.assume("bases are pinned", { because: "" })).toThrow(
      'the reason for "bases are pinned" is missing',
    );
    expect(() => sheet.assume("", { because: "x" })).toThrow("the assumption is missing");
    // @ts-expect-error a value needs a reason
    expect(() => sheet.assume("r_I", 2.5)).toThrow("the reason for r_I is missing");
  });
});

describe("result, note, conclude, query, put, lookup", () => {
  test("a result stands on what its number came from and can be used in formulas", () => {
    const sheet = freshLedger();
    const M = sheet.result("M_B", quantity(-88200, "moment", { from: ["step 3@1"] }), "at B", {
      governing: true,
    });
    expectTypeOf(M).toEqualTypeOf<Quantity<"moment">>();
    expect(sheet.entry("M_B")).toMatchObject({
      kind: "result",
      uses: ["step 3@1"],
      governing: true,
      value: { text: "−88.2 kN·m", unit: "kN m" },
    });
    expect(sheet.calc("a = abs(M_B)", "kN m").in("kN m")).toBeCloseTo(88.2, 12);
    expect(sheet.lookup("M_B").from).toEqual(["M_B@1"]);
    expect(() => sheet.lookup("M_C")).toThrow('no symbol "M_C" on this sheet; did you mean "M_B"?');
  });

  test("words need words, and get an id from how they begin", () => {
    const sheet = freshLedger();
    const long = `${"a very long remark about the roof ".repeat(4)}end`;
    expect(sheet.note("see drawing").id).toBe("note see drawing");
    expect(sheet.note(long).id).toBe("note a very long remark about the roof a very long remark about t");
    expect(sheet.conclude("The beam end at B governs.").id).toBe("conclusion The beam end at B governs.");
    expect(sheet.query("is the base pinned?", ["L@1"])).toMatchObject({ kind: "query", uses: ["L@1"] });
    for (const say of [sheet.note, sheet.conclude, sheet.query]) {
      expect(() => say.call(sheet, "  ")).toThrow("is missing; write a few words");
    }
  });

  const finding: Draft = {
    kind: "finding",
    id: "determinacy",
    uses: ["L@1"],
    title: "Determinacy",
    verdict: "indeterminate to degree 1",
    lines: ["3m + r - 3j - c = 9 + 4 - 12 - 0 = 1"],
  };

  test("another room's entry gets version and cell, and is frozen", () => {
    const { sheet, run } = notebook();
    run(3, () => sheet.put(finding));
    const entry = sheet.entry("determinacy");
    expect(entry).toEqual({ ...finding, version: 1, cell: 3, outOfDate: true });
    expect(Object.isFrozen((entry as { lines: object }).lines)).toBe(true);
  });

  test("the id of an entry that is taken gets a number; the same cell run again finds its own", () => {
    const { sheet, run } = notebook();
    const both = (): void => {
      sheet.put(finding);
      sheet.put({ ...finding, verdict: "determinate" });
    };
    run(1, both);
    run(2, () => sheet.put(finding));
    run(1, both);
    run(2, () => sheet.put(finding));
    expect(sheet.entries().map(({ id, version, cell }) => [id, version, cell])).toEqual([
      ["determinacy", 1, 1],
      ["determinacy (2)", 1, 1],
      ["determinacy (3)", 1, 2],
    ]);
  });

  test("a use must name an entry and its version", () => {
    expect(() => freshLedger().put({ ...finding, uses: ["L"] })).toThrow(
      '"L" is not an entry and its version, such as "L@1"',
    );
  });
});

test("the record holds everything in the order of the cells, then of making", () => {
  const { sheet, run } = notebook({ g: "6 kN/m" });
  run(2, (s) => s.given("L", "14 m"));
  run(4, (s) => {
    s.given("g", "5.2 kN/m", "roof");
    s.calc("R = g*L/2", "kN");
  });
  sheet.text({ number: 1, id: "c1" }, "# Roof");
  sheet.text({ number: 3, id: "c3" }, "Loads");
  run(2, (s) => s.given("L", "14 m"));
  const failure = { cell: 5, line: 2, message: "no", excerpt: "x" };
  const made = sheet.record({
    complete: false,
    failure,
    notebook: { name: "roof.ipynb", source: "{}" },
    versions: { hingebook: "0.1.0" },
  });
  expect(made).toMatchObject({
    format: "hingebook record",
    version: 0,
    complete: false,
    failure,
    head,
    overrides: [{ symbol: "g", written: "5.20 kN/m", set: "6 kN/m" }],
    notebook: { name: "roof.ipynb", source: "{}" },
    versions: { hingebook: "0.1.0" },
  });
  expect(made.entries.map((entry) => entry.id)).toEqual(["text c1", "L", "text c3", "g", "R"]);
  expect(JSON.parse(JSON.stringify(made))).toEqual(made);
});
