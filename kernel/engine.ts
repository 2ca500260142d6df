// A context ready for cells: globals, built-ins that know those of the kernel, and the way to the modules.
import { runInContext } from "node:vm";
import { Evaluator } from "./evaluate.ts";
import { bridgeBuiltIns, decoratorHelpers, prologue } from "./globals.ts";
import { type ModuleSources, Modules } from "./modules.ts";
import { RUNNER } from "./rewrite/index.ts";

export interface EngineParts extends Omit<ModuleSources, "context"> {
  readonly globals: Record<string, unknown>;
  readonly show: (value: unknown) => void;
}

/** Frames kept in a stack: a cell's line must not be lost below those of the library it called. */
const STACK_DEPTH = 100;

/** Open a context. `globals` becomes its global object. */
export async function startEngine({ globals, show, ...sources }: EngineParts): Promise<Evaluator> {
  const evaluator = await Evaluator.open(globals);
  const { context } = evaluator;
  const modules = new Modules({ ...sources, context });
  bridgeBuiltIns(context);
  Error.stackTraceLimit = Math.max(Error.stackTraceLimit, STACK_DEPTH);
  runInContext(`Error.stackTraceLimit = ${STACK_DEPTH}`, context);
  globals[RUNNER] = Object.freeze(modules.cellRunner(show));
  globals.babelHelpers = decoratorHelpers;
  const ready = await evaluator.run(prologue(context), "hingebook:start");
  delete globals[RUNNER];
  delete globals.babelHelpers;
  if (!ready.ok) throw ready.thrown;
  return evaluator;
}
