// The same calculation in kN, m and in kip, ft: every measure of a template put over exactly, so that nothing but the
// units may differ.
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { filled } from "../../kernel/new/fill.ts";
import type { Template } from "../../kernel/new/template.ts";
import { lookUpUnit, readMeasure } from "../../lib/quantity/index.ts";
import { renderPackage } from "../../lib/report/index.ts";
import type { CalculationRecord } from "../../lib/sheet/index.ts";
import { kindOf } from "./literals.ts";
import { names, openRuns, plainly, type Runs, template } from "./templates.ts";

/** A metric measure in the unit of its US twin, to the last digit. */
function exactly(metric: string, twin: string): string {
  const unit = twin.replace(/^[-−\d.]+\s*/, "");
  return `${readMeasure(metric, undefined, metric).si / lookUpUnit(unit).factor} ${unit}`;
}

/** The template in kip, ft with the very lengths and loads of the one in kN, m; other words as they are. */
function converted(one: Template): string {
  const { hingebook, ...metadata } = one.notebook.metadata;
  const us = Object.entries(hingebook.us).flatMap(([metric, twin]): [string, string][] => {
    const kind = kindOf(metric);
    if (kind === "other") return [];
    return [[metric, kind.startsWith("measure") ? exactly(metric, twin) : twin]];
  });
  const notebook = {
    ...one.notebook,
    metadata: { ...metadata, hingebook: { ...hingebook, us: Object.fromEntries(us) } },
  };
  return filled({ ...one, notebook }, { units: "kip, ft" });
}

const NUMBER =
  /[-−]?\d+(?:[\u202f\u2009\u00a0]|\\,(?=\d))?[\d.]*(?:\u202f\d+|\\,\d+)*(?: ?\\times ?10\^\{-?\d+\}|×10[⁻⁰-⁹¹²³]+)?/gu;
const UNIT =
  /(?:\\mathrm\{(?:kN|kip|m|ft|cm|in|MPa|ksi)\}|(?<![\p{L}\\])(?:kN|kip|m|ft|cm|in|MPa|ksi)(?![\p{L}(]))(?:\^\{?\d\}?|[²³⁴])?/gu;

/** A text with every number and unit made alike. Signs are kept by the SI values, not here. */
const withoutMeasures = (text: string): string => text.replace(UNIT, "u").replace(NUMBER, "n");

/** Numbers and texts of a piece of a record, apart; names of things are texts. Drawings are left to their own numbers. */
function parts(value: unknown, key = ""): readonly (number | string)[] {
  if (typeof value === "number") return [value];
  if (typeof value === "string") return [key === "unit" ? "u" : withoutMeasures(value)];
  if (typeof value !== "object" || value === null) return [String(value)];
  return Object.entries(value).flatMap(([name, part]) => [name, ...parts(part, name)]);
}

function expectAlike(metric: unknown, us: unknown, what: string): void {
  const [a, b] = [parts(metric), parts(us)];
  expect(b.length, what).toBe(a.length);
  a.forEach((one, i) => {
    const other = b[i];
    if (typeof one === "number" && typeof other === "number") {
      const size = Math.max(Math.abs(one), 1e-6);
      expect(Math.abs(one - other) / size, `${what}: ${one} and ${other}`).toBeLessThan(1e-9);
    } else expect(other, what).toBe(one);
  });
}

/** The elements of a page with their classes, drawings, formulas and the notebook's own source left out. Least and greatest
 *  have a line of their own in a table only where three figures set them apart, which hangs on the unit. */
const skeleton = (html: string): readonly string[] =>
  html
    .replace(
      /<script[\s\S]*?<\/script>|<svg[\s\S]*?<\/svg>|<math[\s\S]*?<\/math>|<style>[\s\S]*?<\/style>|<br><span class="band">/g,
      "",
    )
    .match(/<\w+(?: class="[^"]*")?/g) ?? [];

let runs: Runs;
beforeAll(() => {
  runs = openRuns();
});
afterAll(() => runs.close());

describe.each(names)("%s", (name) => {
  let metric: CalculationRecord;
  let us: CalculationRecord;
  beforeAll(async () => {
    metric = await runs.record(name, plainly(name, "kN, m"));
    us = await runs.record(name, converted(template(name)));
  });

  test("the same entries with the same values, and the same words but for measures", () => {
    expect(us.head.units).toBe("kip, ft");
    expect(us.entries.map(({ id, kind }) => [kind, withoutMeasures(id)])).toEqual(
      metric.entries.map(({ id, kind }) => [kind, withoutMeasures(id)]),
    );
    expect(metric.entries.length).toBeGreaterThan(9);
    metric.entries.forEach((entry, i) => {
      const { spec, ...own } = { spec: undefined, ...entry };
      const { spec: drawn, ...others } = { spec: undefined, ...us.entries[i] };
      expect((drawn as { kind?: string } | undefined)?.kind).toBe(
        (spec as { kind?: string } | undefined)?.kind,
      );
      expectAlike(own, others, entry.id);
    });
  });

  test("the same page but for numbers and units", async () => {
    const [a, b] = [skeleton(await renderPackage(metric)), skeleton(await renderPackage(us))];
    expect(a.length).toBeGreaterThan(100);
    expect(b).toEqual(a);
  });
});

test.each([
  ["a value", { si: 4000, text: "4 kN" }, { si: 4000.0001, text: "4 kip" }],
  ["a word", { text: "beam of 4 m" }, { text: "column of 13.1 ft" }],
  ["a field", { si: 1, uses: ["a"] }, { si: 1 }],
])("the comparison sees another %s", (_, one, other) => {
  expect(() => expectAlike(one, other, "pair")).toThrow();
});

test("the comparison sees no difference between units", () => {
  const one = {
    si: 4000,
    unit: "kN m",
    text: "−4.00 kN·m at 1 200 m",
    tex: "-4.00\\,\\mathrm{kN}{\\cdot}\\mathrm{m}",
  };
  const other = {
    si: 4000,
    unit: "kip ft",
    text: "−2.95 kip·ft at 3 937 ft",
    tex: "-2.95\\,\\mathrm{kip}{\\cdot}\\mathrm{ft}",
  };
  expectAlike(one, other, "pair");
});
