// What a structure is with a set of hinges: figure, finding, and the motion they leave free.

import type { StructureFigure } from "../drawing/index.ts";
import type { Determinacy } from "../results/types.ts";
import type { Ledger } from "../sheet/index.ts";
import { balance } from "../statics/index.ts";
import { mergeSources } from "../structure/index.ts";
import type { Load, Structure } from "../structure/types.ts";
import { structureFigure } from "./determinacy.ts";
import { mostHinges } from "./dimension-lines.ts";
import { shownAs, sketchBundle } from "./shown.ts";
import { geometrySources, loadSources } from "./sources.ts";
import type { HingeSet } from "./types.ts";
import { capital, counted, structureName } from "./words.ts";

/** Records them; answers with the set, which shows itself by them. `further` are lines of the finding. */
export function recordVerdict<S extends HingeSet>(
  ledger: Ledger,
  set: S,
  loads: readonly Load[],
  before: Determinacy,
  further: readonly string[] = [],
): S {
  const { name, hinged, determinacy: after } = set;
  const uses = mergeSources(geometrySources(hinged), ...hinged.hinges.map(({ from }) => from));
  const spec = hingesFigure(hinged, loads, name);
  ledger.put({
    kind: "figure",
    id: `figure hinges ${name}`,
    uses: mergeSources(uses, loadSources(loads)),
    caption: `${capital(structureName(hinged))} with the hinges taken under ${name}`,
    alternative: spec.description,
    spec,
  });
  const verdict = verdictWords(set, before);
  ledger.put({
    kind: "finding",
    id: `hinges ${name}`,
    uses: mergeSources(uses, loadSources(loads)),
    title: `With the hinges for ${name}`,
    verdict,
    lines: [
      `degree ${before.selfStress} before, ${takenWords(set)}: ${after.words}`,
      ...balanceLines(set),
      ...further,
    ],
  });
  recordMotion(ledger, set, uses);
  return shownAs(set, () => sketchBundle(spec, [verdict, ...further].join("\n")));
}

/** Among many hinges the names of hinges and joints alone are read: sizes and loads stand in the figures and tables before. */
function hingesFigure(hinged: Structure, loads: readonly Load[], name: string): StructureFigure {
  const full = structureFigure(hinged, loads, `${structureName(hinged)} under ${name}`);
  return hinged.hinges.length > mostHinges
    ? { ...full, loadTexts: loads.map(() => ""), dimensions: [] }
    : full;
}

function takenWords({ hinged, frame, holding = [], couples = [] }: HingeSet): string {
  const parts = [
    ...(holding.length === 0 ? [] : [counted(holding.length, "holding support")]),
    counted(hinged.hinges.length - frame.hinges.length, "hinge"),
    ...(couples.length === 0 ? [] : [`${counted(couples.length / 2, "end")} whose moment is taken as known`]),
  ];
  return parts.join(", ");
}

function balanceLines({ cases, hinged }: HingeSet): readonly string[] {
  return cases.map(({ key, loads }) => `${key}: ${balance(hinged, loads).words}`);
}

/** The first motion the hinges leave free, drawn. */
function recordMotion(
  ledger: Ledger,
  { name, hinged, determinacy }: HingeSet,
  uses: readonly string[],
): void {
  const [motion] = determinacy.mechanisms;
  if (motion === undefined) return;
  const free = {
    kind: "mechanism",
    title: `What ${name} leaves free to move`,
    description: `${motion.words}.`,
    structure: hinged,
    mechanism: motion,
  } as const;
  ledger.put({
    kind: "figure",
    id: `figure mechanism ${name}`,
    uses,
    caption: `The motion these hinges leave free: ${motion.words}`,
    alternative: free.description,
    spec: free,
  });
}

function verdictWords({ name, determinacy: after, cases }: HingeSet, { selfStress }: Determinacy): string {
  const was = selfStress === 0 ? "determinate before" : `indeterminate to degree ${selfStress} before`;
  if (after.mechanisms.length === 0) return `${was}; determinate with these hinges`;
  const [motion] = after.mechanisms;
  const which = cases.length === 1 ? "the load" : "the loads";
  return `${was}; with these hinges a mechanism, which balances ${which} ${name} only and would move under any other: ${motion?.words ?? ""}`;
}
