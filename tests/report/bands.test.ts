// Bands on the page: cover, line and table.

import { describe, expect, test } from "vitest";
import { renderPackage } from "../../lib/report/index.ts";
import type { CalculationRecord, Entry } from "../../lib/sheet/index.ts";
import { record } from "./fixtures.ts";

const tried = "of the stiffnesses tried; loads, geometry, cracking and second order not varied";
const text = (html: string): string =>
  html
    .replace(/<style>[\s\S]*?<\/style>|<script[\s\S]*?<\/script>/g, "")
    .replace(/<[^>]+>/g, " ")
    .replace(/[\s\u00a0]+/g, " ");

const page = await renderPackage(record);
const part = (from: string, to: string): string => text(page.slice(page.indexOf(from), page.indexOf(to)));

const without = (entry: Entry): Entry => {
  if (entry.kind === "result") {
    const { band: _, ...rest } = entry;
    return rest;
  }
  if (entry.kind !== "table") return entry;
  const rows = entry.rows.map((row) =>
    row.map((cell) => (typeof cell === "string" ? cell : { value: cell.value, uses: cell.uses })),
  );
  return { ...entry, rows };
};

describe("a record with bands", () => {
  test("the cover has the band of a governing result, and once what it stands for", () => {
    const cover = part('id="outcome"', "<h3>Checks");
    expect(cover).toContain(
      "true value 90 % between 150 and 201 kN·m (0.85 to 1.14 of this), least 141, greatest 208 kN·m, in the middle 2 % less than this: hand too large",
    );
    expect(cover.split(tried).length - 1).toBe(1);
    expect(cover).toMatch(/Bands: of the stiffnesses tried; .* not varied; unknowns: A2 *\./);
    expect(text(page)).toContain("The method is approximate");
  });

  test("the line has it too, with the assumption that says what is not known", () => {
    const line = page.slice(page.indexOf('id="e-M_m"'));
    const own = line.slice(0, line.indexOf('<div class="line', 10));
    expect(text(own)).toContain("least 141, greatest 208 kN·m");
    expect(text(own)).toMatch(/not varied; unknowns: A2/);
    expect(own).toContain('href="#e-bases"');
  });

  test("a cell has it beneath its value, and the table says how to read it", () => {
    const table = page.slice(page.indexOf("<caption>Reactions under roof and snow"));
    const own = text(table.slice(0, table.indexOf('<div class="line')));
    expect(own).toContain("24.9 kN 20.0 to 31.0 (19.0 to 32.0)");
    expect(own).toContain(`Beneath each value: where 90 % of the true values lie`);
    expect(own.split(tried).length - 1).toBe(1);
  });

  test("the assumption is used by what has a band, and the value does not stand on it", () => {
    const bases = page.slice(page.indexOf('id="e-bases"'));
    expect(text(bases.slice(0, bases.indexOf('<div class="line', 10)))).toMatch(/used by/);
    expect(bases.slice(0, bases.indexOf('<div class="line', 10))).toContain('href="#e-M_m"');
    const line = page.slice(page.indexOf('id="e-M_m"'));
    const margin = line.slice(line.indexOf('<div class="margin">'), line.indexOf('<div class="line', 10));
    expect(margin).not.toContain('href="#e-bases"');
  });

  test("words of a band are escaped", async () => {
    const hostile = '</p><script>alert("x")</script>';
    const entries = record.entries.map((entry) =>
      entry.kind === "result" && entry.band
        ? { ...entry, band: { ...entry.band, words: hostile, bias: { ...entry.band.bias, text: hostile } } }
        : entry,
    );
    const html = await renderPackage({ ...record, entries });
    expect(html.replace(/<script type="application\/json"[\s\S]*?<\/script>/, "")).not.toContain(
      "<script>alert",
    );
    expect(html).toContain("&lt;script&gt;alert");
  });
});

test("a record without bands, as older ones are, shows none", async () => {
  const old: CalculationRecord = { ...record, entries: record.entries.map(without) };
  const html = text(await renderPackage(old));
  expect(html).not.toMatch(/true value|Beneath each value|Bands:/);
  expect(html).toContain("176 kN·m");
});
