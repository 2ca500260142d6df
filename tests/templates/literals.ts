// The texts in the code of a template, and which of them are measures or units.
import { parseSync, Visitor } from "oxc-parser";
import type { Template } from "../../kernel/new/template.ts";
import { isUnit, lookUpUnit, plainSpelling, readMeasure } from "../../lib/quantity/index.ts";

/** Every text literal of a piece of code. */
export function literals(code: string): readonly string[] {
  const found: string[] = [];
  const { program, errors } = parseSync("cell.ts", code);
  if (errors.length > 0) throw new Error(`${errors[0]?.message}: ${code}`);
  new Visitor({
    Literal(node) {
      if (typeof node.value === "string") found.push(node.value);
    },
    TemplateLiteral() {
      throw new Error(`a template literal cannot be put into other units: ${code}`);
    },
  }).visit(program);
  return found;
}

export const codeOf = ({ notebook }: Template): readonly string[] =>
  notebook.cells.filter(({ cell_type }) => cell_type === "code").map(({ source }) => source.join(""));

export const textOf = ({ notebook }: Template): readonly string[] =>
  notebook.cells.filter(({ cell_type }) => cell_type !== "code").map(({ source }) => source.join(""));

/** What a text is: a unit, two units for a head, a measure with its dimension, or something else. */
export function kindOf(text: string): string {
  if (text.trim() === "") return "other";
  if (isUnit(text) && text !== "%") return `unit of ${lookUpUnit(text).dimension}`;
  const parts = text.split(/\s*,\s*/);
  if (parts.length > 1 && parts.every(isUnit)) return "units";
  try {
    const { dimension } = readMeasure(text, undefined, "text");
    return dimension === "pure number" ? "other" : `measure of ${String(dimension)}`;
  } catch {
    return "other";
  }
}

const METRIC = /(?<![\p{L}'’])(?:[kM]?N|[kcm]?m|[kMG]?Pa)(?![\p{L}'’])/u;

/** Whether a unit, or a text ending in one, is metric. */
export const isMetric = (text: string): boolean =>
  METRIC.test(plainSpelling(text.replace(/^[-−\d.,\s]+/, "")));

/** A number with a metric unit anywhere in a text. */
export const METRIC_IN_WORDS: RegExp = /\d\s?(?:[kM]?N|[kcm]?m|[kMG]?Pa)(?![\p{L}'’])/u;
