import { afterEach, describe, expect, test } from "vitest";
import { attachHost, forgetLedger, type Ledger, readUse } from "../../lib/sheet/index.ts";
import { freshLedger, notebook } from "./notebook.ts";

afterEach(() => {
  forgetLedger();
  attachHost();
});

function states(sheet: Ledger): readonly string[] {
  return sheet.entries().map(({ id, version, outOfDate }) => `${id}@${version}${outOfDate ? " old" : ""}`);
}

describe("versions", () => {
  test("the same value keeps its version, another takes the next, the first again the one after", () => {
    const sheet = freshLedger();
    const versions = ["14 m", "14 m", "1400 cm", "15 m", "14 m"].map((text) => {
      sheet.given("L", text as "14 m");
      return sheet.entry("L")?.version;
    });
    expect(versions).toEqual([1, 1, 1, 2, 3]);
  });

  test("another description or source is no other value", () => {
    const sheet = freshLedger();
    sheet.given("L", "14 m", "span");
    sheet.given("L", "14 m", "span of the roof", { from: "drawing S-102" });
    expect(sheet.entry("L")).toMatchObject({ version: 1, description: "span of the roof" });
  });

  test("an entry without a value changes with what it says", () => {
    const { sheet, run } = notebook();
    const put = (verdict: string): void =>
      run(1, (s) => s.put({ kind: "finding", id: "f", uses: [], title: "t", verdict, lines: [] }));
    put("stable");
    put("stable");
    put("a mechanism");
    expect(states(sheet)).toEqual(["f@2"]);
  });

  test("a version is never given to two values, though the entry was dropped between", () => {
    const { sheet, run } = notebook();
    run(1, (s) => s.given("L", "14 m"));
    run(1, () => undefined);
    expect(states(sheet)).toEqual([]);
    run(1, (s) => s.given("L", "15 m"));
    expect(states(sheet)).toEqual(["L@2"]);
  });
});

describe("out of date", () => {
  /** Cells 1 to 4: a span, a load, a moment on both, and a section modulus on the moment. */
  function roof(): ReturnType<typeof notebook> & { cells: Record<number, (sheet: Ledger) => void> } {
    const made = notebook();
    const cells: Record<number, (sheet: Ledger) => void> = {
      1: (s) => void s.given("L", "14 m"),
      2: (s) => {
        s.given("w", "5.2 kN/m");
        s.given("f", "160 MPa");
      },
      3: (s) => void s.calc("M = w*L^2/8", "kN m"),
      4: (s) => void s.calc("W = M/f", "cm^3"),
    };
    for (const [number, cell] of Object.entries(cells)) made.run(Number(number), cell);
    return { ...made, cells };
  }

  test("nothing is, after all cells have run in order", () => {
    expect(states(roof().sheet)).toEqual(["L@1", "w@1", "f@1", "M@1", "W@1"]);
  });

  test("what stands on a changed given is, and what stands on that", () => {
    const { sheet, run } = roof();
    run(1, (s) => s.given("L", "15 m"));
    expect(states(sheet)).toEqual(["L@2", "w@1", "f@1", "M@1 old", "W@1 old"]);
  });

  test("running the cells in between brings them up to date one by one", () => {
    const { sheet, run, cells } = roof();
    run(1, (s) => s.given("L", "15 m"));
    run(3, cells[3] ?? (() => undefined));
    expect(states(sheet)).toEqual(["L@2", "w@1", "f@1", "M@2", "W@1 old"]);
    run(4, cells[4] ?? (() => undefined));
    expect(states(sheet)).toEqual(["L@2", "w@1", "f@1", "M@2", "W@2"]);
  });

  test("a new calculation on an old value is old itself, until that is run again", () => {
    const { sheet, run, cells } = roof();
    run(1, (s) => s.given("L", "15 m"));
    run(5, (s) => s.calc("n = M/M", ""));
    expect(states(sheet).at(-1)).toBe("n@1 old");
    run(1, (s) => s.given("L", "14 m"));
    expect(states(sheet).at(-1)).toBe("n@1 old");
    run(3, cells[3] ?? (() => undefined));
    expect(states(sheet)).toEqual(["L@3", "w@1", "f@1", "M@1", "W@1", "n@1"]);
  });

  test("so is what stands on an entry that is gone", () => {
    const { sheet, run } = roof();
    run(2, (s) => s.given("f", "160 MPa"));
    expect(states(sheet)).toEqual(["L@1", "f@1", "M@1 old", "W@1 old"]);
    expect(() => sheet.calc("a = w*L", "kN")).toThrow('no symbol "w" on this sheet');
  });

  test("a quantity kept from before its given changed makes old results", () => {
    const { sheet, run } = notebook();
    let L = sheet.lookup.bind(sheet, "L");
    run(1, (s) => {
      const kept = s.given("L", "14 m");
      L = () => kept;
    });
    run(1, (s) => s.given("L", "15 m"));
    run(2, (s) => s.result("half", L().over(2)));
    expect(states(sheet)).toEqual(["L@2", "half@1 old"]);
  });

  test("entries that stand on each other are out of date, and asking ends", () => {
    const { sheet, run } = notebook();
    const put = (id: string, use: string): void =>
      run(1, (s) => {
        s.put({ kind: "query", id: "a", uses: ["b@1"], text: "a" });
        s.put({ kind: "query", id, uses: [use], text: "b" });
      });
    put("b", "a@1");
    expect(states(sheet)).toEqual(["a@1 old", "b@1 old"]);
  });
});

describe("cells", () => {
  test("a symbol of another cell is refused, naming both", () => {
    const { sheet, run } = notebook();
    run(1, (s) => s.given("L", "14 m"));
    expect(() => run(4, (s) => s.given("L", "15 m"))).toThrow("L is defined in cell 1 and again in cell 4");
    expect(states(sheet)).toEqual(["L@1"]);
  });

  test("a symbol is not defined twice in one cell", () => {
    const { run } = notebook();
    const twice = (s: Ledger): void => {
      s.given("L", "14 m");
      s.given("L", "15 m");
    };
    expect(() => run(1, twice)).toThrow("L is defined twice in cell 1");
    expect(() => run(1, (s) => s.given("L", "15 m"))).not.toThrow();
  });

  test("a symbol can move to another cell when its own is run without it", () => {
    const { sheet, run } = notebook();
    run(1, (s) => s.given("L", "14 m"));
    run(1, () => undefined);
    run(2, (s) => s.given("L", "14 m"));
    expect(sheet.entry("L")).toMatchObject({ cell: 2, version: 1 });
  });

  test("a cell that moved keeps its entries under its new number", () => {
    const { sheet, run } = notebook();
    run(1, (s) => s.given("L", "14 m"), "a");
    run(2, (s) => s.given("w", "5 kN/m"), "b");
    run(1, (s) => s.given("w", "5 kN/m"), "b");
    run(2, (s) => s.note("moved"), "a");
    expect(sheet.entries().map(({ id, cell }) => [id, cell])).toEqual([
      ["w", 1],
      ["note moved", 2],
    ]);
  });

  test("what a cell that failed half-way had recorded before and not now is dropped", () => {
    const { sheet, run } = notebook();
    run(1, (s) => {
      s.given("L", "14 m");
      s.given("w", "5 kN/m");
    });
    const half = (s: Ledger): void => {
      s.given("L", "14 m");
      throw new Error("stop");
    };
    expect(() => run(1, half)).toThrow("stop");
    sheet.endCell("c1");
    expect(states(sheet)).toEqual(["L@1"]);
  });

  test("a text cell has one entry, however often it is given", () => {
    const sheet = freshLedger();
    sheet.text({ number: 1, id: "t" }, "# A");
    sheet.text({ number: 2, id: "t" }, "# B");
    expect(sheet.entries()).toMatchObject([{ id: "text t", markdown: "# B", cell: 2, version: 2 }]);
  });
});

test("readUse takes the last @", () => {
  expect(readUse("check a@b <= c@12")).toEqual({ id: "check a@b <= c", version: 12 });
  for (const bad of ["L", "@1", "L@", "L@x", ""])
    expect(() => readUse(bad)).toThrow("is not an entry and its version");
});
