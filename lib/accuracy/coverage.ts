// The test of the bands themselves: how often the truth lies in the interval that is to hold 90 %.

import { axisOf } from "../structure/index.ts";
import type { HandValue } from "./asked.ts";
import { bands } from "./bands.ts";
import { type CoverageCase, coverageFamilies } from "./coverage-cases.ts";
import { endShare } from "./draws.ts";
import { type Dice, diceOf } from "./study-random.ts";
import { trialOf, tryOut } from "./trial.ts";
import { type Unknown, valueAtPart } from "./unknowns.ts";
import type { Wanted } from "./wanted.ts";

/** How true sizes are drawn: as the bands print it (see draws.ts), even in the value, or each at one of its two ends. */
export type Law = "as printed" | "even in value" | "at the ends";

export const laws: readonly Law[] = Object.freeze(["as printed", "even in value", "at the ends"]);

/** Results of one kind under one law. */
export interface CoverageRow {
  readonly family: string;
  readonly law: Law;
  readonly kind: "beam M" | "column M" | "shear" | "axial";
  /** Share of the true values inside the interval, and between least and greatest. */
  readonly inside: number;
  readonly within: number;
  readonly count: number;
}

export interface CoverageOptions {
  /** Frames in all, shared over the families. */
  readonly frames?: number;
  /** True frames drawn of each, per law. */
  readonly truths?: number;
  readonly samples?: number;
  readonly seed?: number;
}

interface Tally {
  inside: number;
  within: number;
  count: number;
}

/** Coverage by family ("all" at the end), law and kind of result. */
export function coverage({
  frames = 1000,
  truths = 4,
  samples = 500,
  seed = 7,
}: CoverageOptions = {}): readonly CoverageRow[] {
  const tallies = new Map<string, Tally>();
  for (let n = 0; n < frames; n++) {
    const family = coverageFamilies[n % coverageFamilies.length];
    if (family === undefined) continue;
    const dice = diceOf(seed + n);
    const of = family.make(dice);
    const wanted = wantedOf(of);
    const found = bands({
      structure: of.structure,
      cases: [of.loads],
      values: wanted.map(({ wanted }): HandValue => ({ wanted, value: 1 })),
      unknowns: of.unknowns,
      samples,
      seed: n,
    });
    const trial = trialOf(of.structure, [of.loads], wanted, of.unknowns);
    const out = new Float64Array(wanted.length);
    for (const law of laws)
      for (let t = 0; t < truths; t++) {
        tryOut(trial, drawn(trial.unknowns, law, dice), out);
        wanted.forEach(({ kind }, i) => {
          const truth = found.bands[i]?.truth;
          if (truth === undefined || truth.greatest - truth.least <= still * Math.abs(truth.middle)) return;
          for (const name of [family.name, "all"]) {
            const tally = tallyOf(tallies, name, law, kind);
            // a true value may miss an end of the interval by as little as makes no difference in print
            const near = still * (truth.greatest - truth.least);
            const value = out[i] ?? Number.NaN;
            tally.count += 1;
            if (value >= truth.low - near && value <= truth.high + near) tally.inside += 1;
            if (value >= truth.least - near && value <= truth.greatest + near) tally.within += 1;
          }
        });
      }
  }
  return rowsOf(tallies);
}

/** Results that no unknown moves by more than this part (statics alone gives them) say nothing about bands. */
const still = 1e-6;

type Kind = CoverageRow["kind"];
const kinds: readonly Kind[] = ["beam M", "column M", "shear", "axial"];

/** End moments and greatest moments of beams, end moments of columns, end shears of all, axial forces of columns. */
function wantedOf({ structure }: CoverageCase): readonly { readonly wanted: Wanted; readonly kind: Kind }[] {
  return structure.members.flatMap((member) => {
    const L = axisOf(structure, member).length;
    const force = (
      name: "N" | "V" | "M",
      at: number | "greatest",
      kind: Kind,
    ): { wanted: Wanted; kind: Kind } => ({
      wanted: { member: member.name, force: name, at, ...(at === L ? { side: "left" as const } : {}) },
      kind,
    });
    const column = member.group === "columns";
    const moment = column ? "column M" : "beam M";
    return [
      force("M", 0, moment),
      force("M", L, moment),
      force("V", 0, "shear"),
      ...(column ? [force("N", 0, "axial")] : [force("M", "greatest", moment), force("V", L, "shear")]),
    ];
  });
}

function drawn(unknowns: readonly Unknown[], law: Law, dice: Dice): Float64Array {
  const corner = law === "at the ends" || (law === "as printed" && dice.even(0, 1) < endShare);
  return Float64Array.from(unknowns, (unknown) => {
    const { least, most } = unknown;
    if (corner) return dice.percent(50) ? least : most;
    return law === "as printed" ? valueAtPart(unknown, dice.even(0, 1)) : dice.even(least, most);
  });
}

const separator = "\n";

function tallyOf(tallies: Map<string, Tally>, family: string, law: Law, kind: Kind): Tally {
  const key = [family, law, kind].join(separator);
  const tally = tallies.get(key) ?? { inside: 0, within: 0, count: 0 };
  tallies.set(key, tally);
  return tally;
}

function rowsOf(tallies: ReadonlyMap<string, Tally>): readonly CoverageRow[] {
  return [...coverageFamilies.map((f) => f.name), "all"].flatMap((family) =>
    laws.flatMap((law) =>
      kinds.flatMap((kind): CoverageRow[] => {
        const tally = tallies.get([family, law, kind].join(separator));
        if (tally === undefined) return [];
        const { inside, within, count } = tally;
        return [{ family, law, kind, inside: inside / count, within: within / count, count }];
      }),
    ),
  );
}
