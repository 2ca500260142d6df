// The figure of a body cut free, as it stands when its equations begin.

import type { FreeBodyFigure } from "../drawing/index.ts";
import { printValue, quantity } from "../quantity/index.ts";
import type { Action, FreeBody, Point } from "../results/types.ts";
import type { Load, Structure } from "../structure/types.ts";
import { loadsOn, structureAround } from "./around-body.ts";
import { forceQuantity, forceText, type Named } from "./equation.ts";
import { loadTexts, plainLoadName } from "./load-words.ts";
import { and } from "./words.ts";

/** A body with the forces found before `firstStep` in figures and the others by name. */
export function bodyFigure(
  structure: Structure,
  loads: readonly Load[],
  body: FreeBody,
  named: Named,
  { firstStep, sought, about }: { firstStep: number; sought: readonly string[]; about?: Point },
): FreeBodyFigure {
  const known = new Map(named.solution.steps.slice(0, firstStep).map((step) => [step.unknown, step.result]));
  const actions = body.actions.map((action) => asKnown(action, known));
  const on = loadsOn(structure, loads, actions);
  const texts = actions.map((action) => actionText(action, named, loads));
  return {
    kind: "free body",
    title: `Free body: ${body.name}`,
    description: description(
      body,
      actions,
      texts,
      sought.map((force) => forceText(force, named)),
    ),
    structure: structureAround(structure, body),
    loads: on.loads,
    body: { ...body, actions: on.actions },
    texts,
    resultants: actions.map((action) => resultantText(action, named, loads)),
    sought,
    ...(about === undefined ? {} : { about }),
  };
}

function asKnown(action: Action, known: ReadonlyMap<string, number>): Action {
  if (!("force" in action.source)) return action;
  const { value: _, ...bare } = action;
  const value = known.get(action.source.force);
  return value === undefined ? bare : { ...bare, value };
}

function actionText(action: Action, named: Named, loads: readonly Load[]): string {
  const { source, value } = action;
  if ("load" in source) {
    const load = loads[source.load];
    return load?.kind === "distributed" ? (loadTexts(loads)[source.load] ?? "") : resultant(action, named);
  }
  if (value === undefined) return forceText(source.force, named);
  return printValue(forceQuantity(source.force, Math.abs(value), named));
}

function resultantText(action: Action, named: Named, loads: readonly Load[]): string {
  const { source } = action;
  return "load" in source && loads[source.load]?.kind === "distributed" ? resultant(action, named) : "";
}

function resultant(action: Action, { loadNames }: Named): string {
  const name = "load" in action.source ? (loadNames[action.source.load] ?? "") : "";
  const dimension = action.turn === 0 ? "force" : "moment";
  return `${plainLoadName(name)} = ${printValue(quantity(Math.abs(action.value ?? 0), dimension))}`;
}

function description(
  body: FreeBody,
  actions: readonly Action[],
  texts: readonly string[],
  sought: readonly string[],
): string {
  const list = actions.map((action, i) => `${texts[i] ?? ""} at ${action.at.name}`);
  return `${body.name} with ${and(list)}; sought: ${and(sought)}.`;
}
