// Free bodies as plain text, step by step, for golden files read by eye. Forces in kN, lever arms in m.

import type { Closure, FreeBodySolution, Step, Term } from "../../lib/results/index.ts";

/** One line per step: body, equation, numbers, result. */
export function printed(title: string, solution: FreeBodySolution): string {
  const lines: string[] = [title, ""];
  let body = "";
  solution.steps.forEach((step, i) => {
    const name =
      step.joined === undefined
        ? step.bodies.map((b) => solution.bodies[b]?.name).join(" and ")
        : solution.bodies[step.joined]?.name;
    if (name !== body) lines.push(`${name}`);
    body = name ?? "";
    lines.push(`  ${String(i + 1).padStart(2)}  ${written(step)}`);
  });
  lines.push("", "left over, must close");
  for (const closure of solution.closures) lines.push(`      ${leftOver(closure)}`);
  for (const note of solution.notes ?? []) lines.push(`      ${note}`);
  return `${lines.join("\n")}\n`;
}

function written(step: Step): string {
  const together =
    step.together.length === 0 ? "" : `   [together with ${step.together.map((i) => i + 1).join(", ")}]`;
  const result = `${step.unknown} = ${number(step.result / 1000)}`;
  if (step.idle === true) return `${equation(step)}: nothing acts, ${result}`;
  const terms = [...step.terms.map(term), `${coefficient(step.coefficient)}${step.unknown}`];
  return `${equation(step)}: ${sum(terms)} = 0, ${result}${together}`;
}

function leftOver(closure: Closure): string {
  return `${(closure.id ?? "").split(":")[0]}, ${equation(closure)}: ${sum(closure.terms.map(term))} = ${number(closure.sum / 1000)}`;
}

function equation({ equation: kind, about, along }: Pick<Step, "equation" | "about" | "along">): string {
  const plain = { "sum Fx": "ΣFx", "sum Fy": "ΣFy", "sum M": "ΣM", "sum F": "ΣF" }[kind];
  return `${plain}${about === undefined ? "" : ` about ${about.name}`}${along === undefined ? "" : ` ${along.name}`}`;
}

function term({ coefficient: c, value, source }: Term): string {
  const name = "load" in source ? `load ${source.load + 1} ` : "";
  return `${coefficient(c)}(${name}${number(value / 1000)})`;
}

function coefficient(c: number): string {
  if (Math.abs(Math.abs(c) - 1) < 1e-12) return c < 0 ? "-" : "+";
  return `${c < 0 ? "-" : "+"}${number(Math.abs(c))}·`;
}

function sum(terms: readonly string[]): string {
  return terms.length === 0 ? "0" : terms.join(" ").replace(/^\+/, "");
}

/** Four significant decimals, no minus before zero. */
function number(value: number): string {
  const rounded = Number(value.toFixed(4));
  return String(rounded === 0 ? 0 : rounded);
}
