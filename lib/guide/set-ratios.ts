// Ratios of stiffness hinge sets were placed by: what the bands of their frame start from where nobody states anything else.

import { type StatedText, usualFactor } from "../accuracy/index.ts";
import type { Ledger } from "../sheet/index.ts";
import { ratioSources, type StiffnessRatios, withRelativeStiffness } from "../structure/index.ts";
import type { Sources, Structure } from "../structure/types.ts";
import type { BandBook } from "./band-book.ts";
import { frameKeys, type SheetState } from "./sheet-state.ts";
import type { HingeSet } from "./types.ts";

/** Ratios, and the set they were given with. */
export interface SetRatios {
  readonly set: string;
  readonly ratios: StiffnessRatios;
}

/** What a set keeps of the ratios given with its hinges: those that say something. */
export function givenRatios(all: readonly (StiffnessRatios | undefined)[]): Pick<HingeSet, "ratios"> {
  const said = all.filter((ratios) => ratios !== undefined).filter((one) => Object.keys(one).length > 0);
  const ratios = [
    ...new Map(said.map((one) => [JSON.stringify(Object.entries(one).map(bare)), one])).values(),
  ];
  return ratios.length === 0 ? {} : { ratios: Object.freeze(ratios) };
}

/** Keeps in mind that a set was made; answers with it. */
export function rememberSet<S extends HingeSet>({ sets }: SheetState, set: S): S {
  const [, key] = frameKeys(set.frame);
  const known = sets.get(key) ?? new Map<string, HingeSet>();
  known.delete(set.name);
  sets.set(key, known.set(set.name, set));
  return set;
}

/** The ratios a frame starts from: the first given with the sets to be solved, otherwise with any other set of the frame that
 *  stands on the sheet. */
export function startingRatios(
  ledger: Ledger,
  { sets }: SheetState,
  frame: Structure,
  solved: readonly HingeSet[],
): SetRatios | undefined {
  const [, key] = frameKeys(frame);
  const others = [...(sets.get(key)?.values() ?? [])].filter((set) => stands(ledger, set));
  return [...solved, ...others].flatMap(ratiosOf)[0];
}

/** How many hinge sets stand on the sheet. */
export function standingSets(ledger: Ledger, { sets }: SheetState): number {
  const all = [...sets.values()].flatMap((own) => [...own.values()]);
  return new Set(all.filter((set) => stands(ledger, set)).map(({ name }) => name)).size;
}

const stands = (ledger: Ledger, { name }: HingeSet): boolean => ledger.entry(`hinges ${name}`) !== undefined;

const ratiosOf = ({ name, ratios = [] }: HingeSet): readonly SetRatios[] =>
  ratios.map((one) => ({ set: name, ratios: one }));

/** The plain default about ratios: each within the usual factor. */
export function aboutRatios(ratios: StiffnessRatios): StatedText {
  const f = usualFactor.unsized;
  return Object.fromEntries(
    Object.entries(ratios)
      .map(bare)
      .map(([key, r]) => [key, { least: r / f, most: r * f }]),
  );
}

/** Says on the sheet where hinges were placed by other ratios than the bands of their frame start from by default. */
export function queryRatios(ledger: Ledger, bands: BandBook, sets: readonly HingeSet[]): void {
  const [first] = sets;
  const taken = first === undefined ? undefined : bands.taken(first.frame, sets);
  if (first === undefined || taken === undefined || "none" in taken || taken.byDefault !== true) return;
  for (const { set, ratios } of sets.flatMap(ratiosOf)) {
    if (areAlike(relativeI(withRelativeStiffness(first.frame, ratios)), relativeI(taken.unknown.structure)))
      continue;
    const from: Sources = ratioSources(ratios);
    ledger.query(
      `Hinges under ${set} were placed by ${ratioWords(ratios)}, but the bands of this frame start from ${taken.unknown.sizesKnown ? "the sections given" : "other ratios"} (${taken.unknown.nominal.join("; ")}). ` +
        "One frame has one relative stiffness: place all hinges by the same, or state what is unknown of it.",
      [taken.use, ...from],
    );
  }
}

/** "I of beam / I of columns = 2.5". */
export function ratioWords(ratios: StiffnessRatios): string {
  return Object.entries(ratios)
    .map(bare)
    .map(([key, r]) => `${key} = ${String(Number(r.toPrecision(3)))}`)
    .join(", ");
}

const bare = ([key, ratio]: readonly [string, StiffnessRatios[string]]): readonly [string, number] => [
  key,
  typeof ratio === "number" ? ratio : ratio.si,
];

/** Bending stiffness of the members as multiples of that of the first. */
function relativeI({ members }: Structure): readonly number[] {
  const EI = members.map(({ section }) => (section === undefined ? Number.NaN : section.E * section.I));
  return EI.map((value) => value / (EI[0] ?? Number.NaN));
}

const areAlike = (one: readonly number[], other: readonly number[]): boolean =>
  one.every((value, i) => Math.abs(value / (other[i] ?? Number.NaN) - 1) <= 1e-3);
