// The population study: how far each method is off, family by family, on random structures. It is the sanity check of the methods and
// the ground for advice; the band of a result is worked out for the frame in hand (`bands`), since bands of one population do not hold
// on another.

import { netOf } from "../inflection/index.ts";
import { ranked } from "./quantiles.ts";
import {
  frameShape,
  gravityFrame,
  type StudyCase,
  singlePortal,
  threeSpans,
  twoSpans,
} from "./study-cases.ts";
import { type Ends, exactEnds } from "./study-ends.ts";
import {
  frameMeasures,
  type Measure,
  portalMeasures,
  threeSpanMeasures,
  twoSpanMeasures,
} from "./study-measures.ts";
import {
  frameMethods,
  type Method,
  portalMethods,
  threeSpanMethods,
  twoSpanMethods,
} from "./study-methods.ts";
import { type Dice, diceOf } from "./study-random.ts";

/** One cell: error = hand / exact - 1. */
export interface StudyRow {
  readonly population: string;
  readonly method: string;
  readonly measure: string;
  /** 90th percentile of |error|. */
  readonly most: number;
  /** Median of the error with its sign; below zero is unsafe for that value. */
  readonly middle: number;
  /** Values compared; those below two hundredths of wL² are left out. */
  readonly count: number;
}

interface Population {
  readonly name: string;
  /** How many structures the full study takes. */
  readonly size: number;
  readonly make: (dice: Dice) => StudyCase;
  readonly measures: (of: StudyCase, ends: Ends) => readonly Measure[];
  readonly methods: readonly Method[];
}

const portals = (["pinned", "fixed"] as const).flatMap((bases) =>
  [false, true].map(
    (unequal): Population => ({
      name: `portal, ${bases}, ${unequal ? "unequal columns" : "symmetric"}`,
      size: 2500,
      make: (dice) => singlePortal(dice, bases, unequal),
      measures: portalMeasures,
      methods: portalMethods,
    }),
  ),
);

const populations: readonly Population[] = [
  { name: "two spans", size: 5000, make: twoSpans, measures: twoSpanMeasures, methods: twoSpanMethods },
  {
    name: "three spans",
    size: 4000,
    make: threeSpans,
    measures: threeSpanMeasures,
    methods: threeSpanMethods,
  },
  ...portals,
  {
    name: "building frames",
    size: 3000,
    make: (dice) => gravityFrame(frameShape(dice)),
    measures: frameMeasures,
    methods: frameMethods,
  },
];

/** Names of the populations, in the order of the study. */
export const populationNames: readonly string[] = Object.freeze(populations.map((p) => p.name));

export interface StudyOptions {
  /** Part of the full number of structures: 5000 two-span beams, 4000 three-span beams, 2500 portals of each of four kinds, 3000
   *  building frames. */
  readonly share?: number;
  readonly seed?: number;
  /** Only these populations. */
  readonly only?: readonly string[];
}

/** All cells of the study. */
export function populationStudy({
  share = 1,
  seed = 1,
  only = populationNames,
}: StudyOptions = {}): readonly StudyRow[] {
  return populations.flatMap((population, i) =>
    only.includes(population.name)
      ? studied(population, Math.ceil(population.size * share), seed + 1000 * i)
      : [],
  );
}

function studied(
  { name, make, measures, methods }: Population,
  size: number,
  seed: number,
): readonly StudyRow[] {
  const dice = diceOf(seed);
  const errors = methods.map(() => new Map<string, number[]>());
  for (let n = 0; n < size; n++) {
    const of = make(dice);
    const net = netOf(of.structure, of.loads);
    const truth = measures(of, exactEnds(of));
    methods.forEach((method, k) => {
      const hand = measures(of, method.ends(of, net));
      truth.forEach((measure, j) => {
        collect(errors[k], measure, hand[j]);
      });
    });
  }
  return methods.flatMap((method, k) =>
    [...(errors[k] ?? [])].map(([measure, list]): StudyRow => {
      const signed = Float64Array.from(list).sort();
      const size = signed.map(Math.abs).sort();
      return {
        population: name,
        method: method.name,
        measure,
        most: ranked(size, 0.9),
        middle: ranked(signed, 0.5),
        count: list.length,
      };
    }),
  );
}

function collect(into: Map<string, number[]> | undefined, truth: Measure, hand: Measure | undefined): void {
  const list = into?.get(truth.name) ?? [];
  into?.set(truth.name, list);
  truth.values.forEach((value, i) => {
    if (Math.abs(value) > truth.small) list.push((hand?.values[i] ?? Number.NaN) / value - 1);
  });
}
