import { beforeAll, describe, expect, test } from "vitest";
import { populationNames, populationStudy, type StudyRow } from "../../lib/accuracy/index.ts";

let rows: readonly StudyRow[] = [];
beforeAll(() => {
  rows = populationStudy({ share: 0.2 });
});

function cell(population: string, method: string, measure: string): StudyRow {
  const found = rows.find((r) => r.population === population && r.method === method && r.measure === measure);
  if (found === undefined) throw new Error(`no cell ${population}, ${method}, ${measure}`);
  return found;
}

describe("populationStudy: placements by relative stiffness, 90th percentile of the error of the governing moments", () => {
  test.each([
    ["two spans", "hinge by relative stiffness", "governing M", 0.0001],
    ["three spans", "2 cycles", "governing M", 0.04],
    ["portal, pinned, symmetric", "knee share by relative stiffness", "governing M", 0.01],
    ["portal, fixed, symmetric", "knee share by relative stiffness", "governing M", 0.01],
    ["portal, pinned, unequal columns", "no-sway and one sway correction", "governing M", 0.03],
    ["portal, fixed, unequal columns", "no-sway and one sway correction", "governing M", 0.03],
    ["building frames", "joint rotation, 1 pass", "max hogging", 0.05],
    ["building frames", "joint rotation, 1 pass", "max sag", 0.05],
    ["building frames", "joint rotation, 1 pass", "max column M", 0.1],
    ["building frames", "joint rotation, 1 pass, with column shortening", "beam end ext.", 0.05],
    ["building frames", "joint rotation, 1 pass, with column shortening", "max hogging", 0.02],
    ["building frames", "joint rotation, 1 pass, with column shortening", "max column M", 0.05],
    ["building frames", "exterior restraint", "max hogging", 0.06],
    ["building frames", "exterior restraint", "max sag", 0.05],
    ["building frames", "exterior restraint", "max column M", 0.13],
  ])("%s, %s, %s: at most %f", (population, method, measure, most) => {
    const { most: found, count } = cell(population, method, measure);
    expect(count).toBeGreaterThan(400);
    expect(found).toBeLessThan(most);
  });
});

const coefficients = "coefficients 1/16, 1/9 or 1/10, 1/11; 1/14, 1/16";

describe("populationStudy: the trade's rules are off as an independent study found", () => {
  // 90th percentiles in %, found by another solver on its own draws of like populations; what its building frames have for radii of
  // gyration is not known, ours were chosen. Cells of the full study that are not within 15 % of it, ours for its:
  //   three spans, sagging moment of the middle span (small values): 121 for 146, 62 for 81, 78 for 103
  //   unequal portals, hinges at 0.15 L: beam ends 84 for 67 and 53 for 43, base thrust 82 for 64 and 57 for 46
  //   building frames: inner beam ends of the hinges at 0.2 and 0.211 L, 16 for 14 and 13 for 11; largest sagging moment of the latter,
  //   51 for 44; axial force of the hinges at a tenth, 11.5 for 9.8, and of the coefficients, 7 for 10
  const published: readonly (readonly [population: string, method: string, measure: string, most: number])[] =
    [
      ["two spans", "0.15 L", "M support", 37.1],
      ["two spans", "0.15 L", "M sag long", 24.6],
      ["two spans", "0.15 L", "governing M", 22.7],
      ["two spans", "0.2 L", "M support", 17.5],
      ["two spans", "0.2 L", "governing M", 16.0],
      ["two spans", "0.25 L", "M sag short", 31.5],
      ["two spans", "0.25 L", "governing M", 37.4],
      ["two spans", "0.25 L", "R interior", 8.7],
      ["three spans", "both in middle span 0.15", "M supports", 49.2],
      ["three spans", "both in middle span 0.15", "governing M", 25.5],
      ["three spans", "both in middle span 0.2", "M supports", 37.7],
      ["three spans", "both in middle span 0.2", "governing M", 18.4],
      ["three spans", "both in middle span 0.25", "governing M", 20.3],
      ["three spans", "one in each end span 0.2", "M supports", 39.9],
      ["three spans", "one in each end span 0.2", "governing M", 18.4],
      ["three spans", "one in each end span 0.25", "governing M", 37.9],
      ["three spans", "(wL2)mean/10", "governing M", 9.6],
      ["portal, pinned, symmetric", "hinges 0.1 L", "M beam ends", 38.0],
      ["portal, pinned, symmetric", "hinges 0.1 L", "M midspan", 47.9],
      ["portal, pinned, symmetric", "hinges 0.1 L", "governing M", 24.6],
      ["portal, pinned, symmetric", "hinges 0.15 L", "governing M", 27.2],
      ["portal, fixed, symmetric", "hinges 0.1 L", "M beam ends", 39.0],
      ["portal, fixed, symmetric", "hinges 0.1 L", "M base", 36.5],
      ["portal, fixed, symmetric", "hinges 0.1 L", "governing M", 24.9],
      ["portal, fixed, symmetric", "hinges 0.15 L", "governing M", 21.9],
      ["portal, pinned, unequal columns", "hinges 0.1 L", "M beam ends", 40.7],
      ["portal, pinned, unequal columns", "hinges 0.1 L", "governing M", 20.8],
      ["portal, pinned, unequal columns", "hinges 0.15 L", "governing M", 27.0],
      ["portal, fixed, unequal columns", "hinges 0.1 L", "M base", 45.7],
      ["portal, fixed, unequal columns", "hinges 0.1 L", "governing M", 22.0],
      ["portal, fixed, unequal columns", "hinges 0.15 L", "governing M", 21.9],
      ["building frames", "0.1 L both ends", "beam end ext.", 43.9],
      ["building frames", "0.1 L both ends", "beam end int.", 51.2],
      ["building frames", "0.1 L both ends", "span sag", 95.2],
      ["building frames", "0.1 L both ends", "ext. column ends", 45.7],
      ["building frames", "0.1 L both ends", "max hogging", 52.8],
      ["building frames", "0.1 L both ends", "max sag", 85.2],
      ["building frames", "0.1 L both ends", "max column M", 43.8],
      ["building frames", "0.1 L exterior, 0.2 L interior ends, each end as if alike", "max hogging", 39.5],
      ["building frames", "0.1 L exterior, 0.2 L interior ends, each end as if alike", "max sag", 47.2],
      ["building frames", "0.1 L exterior, 0.2 L interior ends, each end as if alike", "max column M", 44.0],
      ["building frames", "0.1 L exterior, 0.211 L interior, each end as if alike", "span sag", 43.2],
      ["building frames", "0.1 L exterior, 0.211 L interior, each end as if alike", "max hogging", 39.5],
      ["building frames", "0.1 L exterior, 0.211 L interior, each end as if alike", "max column M", 44.0],
      ["building frames", coefficients, "beam end int.", 23.3],
      ["building frames", coefficients, "max hogging", 25.1],
      ["building frames", coefficients, "max sag", 63.4],
      ["building frames", coefficients, "max column M", 41.9],
    ];
  test.each(published)("%s, %s, %s: about %f", (population, method, measure, wanted) => {
    const { most } = cell(population, method, measure);
    expect(Math.abs((100 * most) / wanted - 1)).toBeLessThan(0.15);
  });

  test("the tenth of the span: right about k = 1 to 2 only, so that its error has no single sign", () => {
    const { middle, most } = cell("portal, pinned, symmetric", "hinges 0.1 L", "M beam ends");
    expect(middle).toBeLessThan(-0.15);
    expect(most).toBeGreaterThan(0.35);
  });
});

test("populationStudy is the same on every run, and takes one population alone", () => {
  const options = { share: 0.01, only: ["two spans"] };
  expect(populationStudy(options)).toEqual(populationStudy(options));
  expect(new Set(populationStudy(options).map((r) => r.population))).toEqual(new Set(["two spans"]));
  expect(populationNames).toContain("building frames");
});
