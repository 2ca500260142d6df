// Every template, as `hingebook new` makes it in both systems of units, run from start to end.
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { promptsLeft } from "../../lib/report/index.ts";
import type { CalculationRecord, Entry } from "../../lib/sheet/index.ts";
import { names, openRuns, plainly, type Runs, systems } from "./templates.ts";

type Of<K extends Entry["kind"]> = Extract<Entry, { kind: K }>;
const ofKind = <K extends Entry["kind"]>({ entries }: CalculationRecord, kind: K): readonly Of<K>[] =>
  entries.filter((entry): entry is Of<K> => entry.kind === kind);

let runs: Runs;
beforeAll(() => {
  runs = openRuns();
});
afterAll(() => runs.close());

describe.each(names.flatMap((name) => systems.map((units) => [name, units] as const)))(
  "%s, %s",
  (name, units) => {
    let record: CalculationRecord;
    let source = "";
    beforeAll(async () => {
      source = plainly(name, units);
      record = await runs.record(name, source);
    });

    test("runs to its end in its own units; every check holds, by more than one route", () => {
      expect(record.complete).toBe(true);
      expect(record.head.units).toBe(units);
      const checks = ofKind(record, "check");
      expect(checks.filter(({ passed }) => !passed).map(({ id }) => id)).toEqual([]);
      expect(checks.some(({ closure }) => closure !== true)).toBe(true);
      expect(record.entries.filter(({ outOfDate }) => outOfDate)).toEqual([]);
      const open = ofKind(record, "query").map(({ text }) => text);
      // Unequal bays lean under gravity: what holds the floors is the engineer's to settle.
      if (name === "building-frame-gravity")
        expect(open).toEqual([expect.stringMatching(/holds 2 floors against sway/)]);
      else expect(open).toEqual([]);
    });

    test("no symbol prints as a hinge does: h with a number", () => {
      const symbols = record.entries.flatMap((entry) => ("symbol" in entry ? (entry.symbol ?? []) : []));
      expect(symbols.filter((symbol) => /^h_?\d+$/.test(symbol))).toEqual([]);
    });

    test("prompts: as many as stand in the notebook", () => {
      const { count, cells } = promptsLeft(record);
      expect(count).toBe(source.match(/‹/g)?.length);
      expect(cells.length).toBeGreaterThan(3);
    });

    if (name === "blank-sheet") return;
    test("leads through the whole, and every hand result carries its band", () => {
      const kinds = new Set(record.entries.map(({ kind }) => kind));
      for (const kind of ["given", "assumption", "finding", "figure", "step", "result", "check"] as const)
        expect(kinds, kind).toContain(kind);
      expect(ofKind(record, "conclusion")).toHaveLength(1);
      const governing = ofKind(record, "result").filter((result) => result.governing);
      expect(governing.length).toBeGreaterThan(3);
      for (const { symbol, value, band } of governing) {
        expect(band, symbol).toBeDefined();
        expect(band?.least.si).toBeLessThan(band?.greatest.si ?? Number.NaN);
        // A hand value of use lies among the values tried, or near them.
        const [a = 0, b = 0] = [band?.least.si, band?.greatest.si];
        expect(value.si, symbol).toBeGreaterThan(a - 0.3 * Math.abs(a));
        expect(value.si, symbol).toBeLessThan(b + 0.3 * Math.abs(b));
      }
    });
  },
);
