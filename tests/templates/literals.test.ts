// Every measure of a template has its twin in US customary units, and nothing metric is left when those are put in.
import { describe, expect, test } from "vitest";
import { HEAD_PROMPTS } from "../../kernel/new/fill.ts";
import { parseNotebook } from "../../kernel/notebook.ts";
import { codeOf, isMetric, kindOf, literals, METRIC_IN_WORDS, textOf } from "./literals.ts";
import { names, plainly, template } from "./templates.ts";

describe.each(names)("%s", (name) => {
  const own = template(name);
  const { us } = own.notebook.metadata.hingebook;
  const texts = codeOf(own).flatMap(literals);
  const measures = [...new Set(texts)].filter((text) => kindOf(text) !== "other");

  test("has measures, and each has a twin of the same kind in US customary units", () => {
    expect(measures.length).toBeGreaterThan(4);
    expect(measures.filter((text) => !isMetric(text))).toEqual([]);
    for (const text of measures) {
      expect(us, `${text} of ${name}`).toHaveProperty([text]);
      expect(kindOf(us[text] ?? ""), `${text} => ${us[text]}`).toBe(kindOf(text));
      expect(isMetric(us[text] ?? ""), us[text]).toBe(false);
    }
  });

  test("names no twin of what is not there", () => {
    expect(Object.keys(us).filter((text) => !texts.includes(text))).toEqual([]);
  });

  test("in kip, ft no metric measure is left, in code or in words", () => {
    const cells = parseNotebook(`${name}.ipynb`, plainly(name, "kip, ft")).cells;
    const code = cells.filter(({ kind }) => kind === "code").flatMap(({ source }) => literals(source));
    expect(code.filter((text) => kindOf(text) !== "other" && isMetric(text))).toEqual([]);
    const words = cells.filter(({ kind }) => kind !== "code").map(({ source }) => source);
    expect([...code, ...words].filter((text) => METRIC_IN_WORDS.test(text))).toEqual([]);
  });

  test("its texts and comments hold no measure at all: they stand in both systems", () => {
    expect(textOf(own).filter((text) => METRIC_IN_WORDS.test(text))).toEqual([]);
    expect(codeOf(own).filter((code) => /\/\/|\/\*/.test(code))).toEqual([]);
  });

  test("asks for title, job, name, basis and conclusion, and leaves no prompt open", () => {
    const all = [...texts, ...textOf(own)];
    for (const prompt of Object.values(HEAD_PROMPTS)) expect(texts).toContain(prompt);
    expect(texts.filter((text) => /^‹.*annexes›$/.test(text))).toHaveLength(1);
    const [last = ""] = codeOf(own).slice(-1);
    expect(last).toMatch(/sheet\.conclude\("‹/);
    for (const text of all) expect(text.replace(/‹[^‹›]+›/g, "")).not.toMatch(/[‹›]/);
  });
});

test.each([
  ["12 m", "measure of length", true],
  ["-3.5 kN/m", "measure of force per length", true],
  ["kN m", "unit of moment", true],
  ["kN, m", "units", true],
  ["kip ft", "unit of moment", false],
  ["1.2 kip/ft", "measure of force per length", false],
  ["6'-6\"", "measure of length", false],
  ["0.2 L", "other", false],
  ["BC", "other", false],
])("%s is %s", (text, kind, metric) => {
  expect([kindOf(text), isMetric(text)]).toEqual([kind, metric]);
});
