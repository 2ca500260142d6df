// The verb `shape`: how the structure probably bends, before any number is known.

import type { ShapeFigure } from "../drawing/index.ts";
import { type ProbableMember, type ProbableShape, probableShape } from "../inflection/index.ts";
import { quantity } from "../quantity/index.ts";
import { type Ledger, shownValue, type TableCell } from "../sheet/index.ts";
import { axisOf, memberNamed, mergeSources } from "../structure/index.ts";
import type { Structure } from "../structure/types.ts";
import { checkCases } from "./case-loads.ts";
import { shownAs, sketchBundle } from "./shown.ts";
import { geometrySources, loadSources, memberSources } from "./sources.ts";
import type { LoadCase } from "./types.ts";
import { spanPart, structureName } from "./words.ts";

/** Records the qualitative deflected shape under these load cases with its probable points of inflection; answers with it. */
export function recordShape(ledger: Ledger, structure: Structure, cases: readonly LoadCase[]): ProbableShape {
  if (cases.length === 0)
    throw new Error("shape: no load case; the shape belongs to the loads that bend the structure");
  const loads = cases.flatMap((loadCase) => loadCase.loads);
  const name = cases.map(({ key }) => key).join(" + ");
  checkCases(structure, cases);
  const found = probableShape(structure, loads);
  const uses = mergeSources(geometrySources(structure), loadSources(loads));
  const spec: ShapeFigure = {
    kind: "shape",
    title: `Probable shape of ${structureName(structure)} under ${name}`,
    description: `Qualitative: ${found.members.map(spoken).join("; ")}.`,
    structure,
    members: found.members.map(({ member, pieces }) => ({
      member,
      bends: pieces.map(({ from, to, curvature }) => ({ begin: from, end: to, sense: curvature })),
    })),
    loads,
  };
  ledger.put({
    kind: "figure",
    id: `figure shape ${name}`,
    uses,
    caption: `How the ${structureName(structure)} probably bends under ${name}: qualitative, from the rule of the spans and the sense of the end moments`,
    alternative: spec.description,
    spec,
  });
  const rows = found.members.flatMap((one) =>
    inflectionRows(structure, one, mergeSources(memberSources(structure, one.member), loadSources(loads))),
  );
  if (rows.length > 0)
    ledger.put({
      kind: "table",
      id: `probable points of inflection ${name}`,
      uses: mergeSources(...rows.flat().flatMap((cell) => (typeof cell === "string" ? [] : [cell.uses]))),
      caption: `Probable points of inflection under ${name}: qualitative, places to start from`,
      columns: ["member", "about", "why"],
      rows,
    });
  return shownAs(found, () => sketchBundle(spec, spec.description));
}

function inflectionRows(
  structure: Structure,
  { member, inflections, unknown }: ProbableMember,
  uses: readonly string[],
): readonly (readonly TableCell[])[] {
  if (unknown !== undefined) return [[member, "not known", unknown]];
  const found = memberNamed(structure, member, "shape");
  const { length } = axisOf(structure, found);
  return inflections.map(({ at, why }) => {
    const shown = shownValue(quantity(at * length, "length"));
    const text = `${shown.text} from ${found.start} (${spanPart(at)})`;
    return [member, { value: { ...shown, text }, uses }, why];
  });
}

function spoken({ member, pieces, unknown }: ProbableMember): string {
  if (unknown !== undefined) return `${member}: not known, ${unknown}`;
  return `${member}: ${pieces.map(({ curvature }) => curvature).join(", then ")}`;
}
