// The verb `determinacy`: how many moments must be guessed before statics is enough.

import type { MechanismFigure, SelfStressFigure, StructureFigure } from "../drawing/index.ts";
import type { Determinacy } from "../results/types.ts";
import type { Ledger } from "../sheet/index.ts";
import { determinacy } from "../statics/index.ts";
import type { Load, Structure } from "../structure/types.ts";
import { dimensionLines } from "./dimension-lines.ts";
import { loadTexts } from "./load-words.ts";
import { shownAs, sketchBundle } from "./shown.ts";
import { geometrySources } from "./sources.ts";
import { capital, counted, structureName } from "./words.ts";

export interface DeterminacyOptions {
  /** Draw the states of self-stress as well, three of them at most; otherwise they are only counted. */
  readonly selfStress?: boolean;
}

/** Records the structure's figure and its determinacy by count and by rank; answers with the determinacy. */
export function recordDeterminacy(
  ledger: Ledger,
  structure: Structure,
  options: DeterminacyOptions = {},
): Determinacy {
  const name = structureName(structure);
  const found = determinacy(structure);
  const uses = geometrySources(structure);
  const spec = structureFigure(structure, [], name);
  ledger.put({
    kind: "figure",
    id: `figure ${name}`,
    uses,
    caption: `${capital(name)} with its supports`,
    alternative: spec.description,
    spec,
  });
  ledger.put({
    kind: "finding",
    id: `determinacy of ${name}`,
    uses,
    title: `Degree of static indeterminacy, ${name}`,
    verdict: found.words,
    lines: determinacyLines(found),
  });
  recordMotions(ledger, structure, name, found);
  if (options.selfStress === true) recordSelfStresses(ledger, structure, name, found);
  const text = [found.words, ...determinacyLines(found)].join("\n");
  return shownAs(found, () => sketchBundle(spec, text));
}

/** More motions than this are told in words only. */
const mostDrawn = 3;

/** A figure for each of the first motions a mechanism can make. */
function recordMotions(
  ledger: Ledger,
  structure: Structure,
  name: string,
  { mechanisms }: Determinacy,
): void {
  mechanisms.slice(0, mostDrawn).forEach((mechanism, i) => {
    const which = mechanisms.length === 1 ? "The motion" : `Motion ${i + 1} of ${mechanisms.length}`;
    const spec: MechanismFigure = {
      kind: "mechanism",
      title: `${which} nothing resists, ${name}`,
      description: `${mechanism.words}.`,
      structure,
      mechanism,
    };
    ledger.put({
      kind: "figure",
      id: `figure motion ${i + 1} of ${name}`,
      uses: geometrySources(structure),
      caption: `${which} nothing resists: ${mechanism.words}`,
      alternative: spec.description,
      spec,
    });
  });
}

/** A figure for each of the first states of self-stress: forces in equilibrium without any load. */
function recordSelfStresses(
  ledger: Ledger,
  structure: Structure,
  name: string,
  { selfStresses }: Determinacy,
): void {
  selfStresses.slice(0, mostDrawn).forEach(({ members, words }, i) => {
    const spec: SelfStressFigure = {
      kind: "self-stress",
      title: `State of self-stress ${i + 1} of ${selfStresses.length}, ${name}`,
      description: `${words}.`,
      structure,
      forces: members,
    };
    ledger.put({
      kind: "figure",
      id: `figure self-stress ${i + 1} of ${name}`,
      uses: geometrySources(structure),
      caption: `State of self-stress ${i + 1} of ${selfStresses.length}, to no scale: ${words}`,
      alternative: spec.description,
      spec,
    });
  });
}

/** The count as the trade writes it, and the rank, one line each. */
export function determinacyLines({ count, ...found }: Determinacy): readonly string[] {
  const { reactions: r, members: m, joints: j, conditions: c, degree } = count;
  return [
    `r = ${r}, m = ${m}, j = ${j}, c = ${c} (reactions, members, joints, conditions)`,
    `3m + r − 3j − c = ${3 * m} + ${r} − ${3 * j} − ${c} = ${String(degree).replace("-", "−")}`,
    `rank of the equilibrium matrix ${found.rank}, of ${counted(found.unknowns, "unknown")} and ${counted(found.equations, "equation")}: ` +
      `${counted(found.selfStress, "state")} of self-stress, ${counted(found.mechanisms.length, "mechanism")}`,
  ];
}

/** A structure with loads and main dimensions as a figure. */
export function structureFigure(
  structure: Structure,
  loads: readonly Load[],
  title: string,
): StructureFigure {
  const parts = [
    `${structureName(structure)} with ${counted(structure.members.length, "member")}`,
    `supports: ${structure.supports.map(({ joint, kind }) => `${joint} ${kind}`).join(", ")}`,
    ...(structure.hinges.length > 0
      ? [`hinges: ${structure.hinges.map(({ name, member }) => `${name} in ${member}`).join(", ")}`]
      : []),
    ...(loads.length > 0 ? [`loads: ${loadTexts(loads).join(", ")}`] : []),
  ];
  return {
    kind: "structure",
    title: capital(title),
    description: `${parts.join("; ")}.`,
    structure,
    loads,
    loadTexts: loadTexts(loads),
    dimensions: dimensionLines(structure),
  };
}
