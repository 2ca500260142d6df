// Sections of members before there are any: nominal ones, relative to each other. Our own choice, the same for every frame:
//   members that bend: I = 1 unless a ratio says otherwise, A = I/i² with the radius of gyration i a fiftieth of the mean length of the
//     group's members for beams, a thirty-fifth for columns, a fortieth for others; rolled and concrete sections of usual depth
//     (beams about L/20, columns about h/14) lie near these
//   bars, which take no moment at their ends: all one A, half the mean of the members that bend, unless a ratio says otherwise
// Forces follow from ratios only, so that E is 1 and neither displacements nor forces from settlement or temperature have a meaning.

import { axisOf, calledBy, type Member, type Section, type Structure } from "../structure/index.ts";
import { AccuracyError } from "./faults.ts";
import { ratioOnly } from "./imposed.ts";
import { isBar } from "./matters.ts";
import { partsNamed } from "./parts.ts";

/** I and A as multiples of the plain nominal values; a number alone is that of I (and with it of A, the radius of gyration staying).
 *  With I alone A goes with it; with A alone I stays. */
export type NominalRatio = number | { readonly I?: number; readonly A?: number };

/** Ratios by group or member; the other groups have 1. */
export type NominalRatios = Readonly<Record<string, NominalRatio>>;

/** Whether every member has a section. */
export function hasSections({ members }: Structure): boolean {
  return members.every((m) => m.section !== undefined);
}

/** The structure with nominal sections where none is given; one whose members all have a section is answered as it is, and then takes
 *  no ratios. Throws when some members have one and others not, on springs of supports (they stand against EI itself), on a ratio that
 *  is not more than zero and on a name that is no group and no member. */
export function withNominalSections(structure: Structure, ratios: NominalRatios = {}): Structure {
  const names = Object.keys(ratios);
  const given = structure.members.filter((m) => m.section !== undefined).map((m) => m.name);
  if (given.length > 0) {
    const without = structure.members.filter((m) => m.section === undefined).map((m) => m.name);
    if (without.length > 0) throw new AccuracyError({ kind: "mixed sections", without, given });
    if (names.length > 0) throw new AccuracyError({ kind: "sizes known", what: names });
    return structure;
  }
  refuseSprings(structure);
  const times = new Map(
    partsNamed(structure, names).flatMap(({ name, members }) =>
      members.map((i) => [i, readRatio(name, ratios[name])] as const),
    ),
  );
  const plain = plainSections(structure);
  const members = structure.members.map((member, i): Member => {
    const { I, A } = times.get(i) ?? { I: 1, A: 1 };
    const base = plain[i] ?? { I: 1, A: 1 };
    const section: Section = Object.freeze({ E: ratioOnly, I: base.I * I, A: base.A * A });
    return Object.freeze({ ...member, section });
  });
  return Object.freeze({ ...structure, members: Object.freeze(members) });
}

function readRatio(
  name: string,
  ratio: NominalRatio | undefined,
): { readonly I: number; readonly A: number } {
  const { I = 1, A = I } = typeof ratio === "number" ? { I: ratio } : (ratio ?? {});
  for (const [what, value] of [
    ["I", I],
    ["A", A],
  ] as const)
    if (!(value > 0 && value < Number.POSITIVE_INFINITY))
      throw new AccuracyError({ kind: "bad ratio", what: `${what} of ${name}`, value });
  return { I, A };
}

function refuseSprings({ supports }: Structure): void {
  const joints = supports
    .filter(({ springs }) => Object.values(springs ?? {}).some((k) => k !== undefined && k > 0))
    .map((s) => s.joint);
  if (joints.length > 0) throw new AccuracyError({ kind: "springs", joints });
}

const lengthOverRadius = { beam: 50, column: 35, member: 40 } as const;

function plainSections(structure: Structure): readonly { readonly I: number; readonly A: number }[] {
  const { members } = structure;
  const axes = members.map((m) => axisOf(structure, m));
  const groupOf = ({ group, name }: Member): string => group ?? name;
  const mean = (values: readonly number[]): number => values.reduce((a, b) => a + b, 0) / values.length;
  const bending = members.map((member, i): number | undefined => {
    const axis = axes[i];
    if (isBar(member) || axis === undefined) return undefined;
    const lengths = members.flatMap((m, k) =>
      groupOf(m) === groupOf(member) && !isBar(m) ? [axes[k]?.length ?? 0] : [],
    );
    return (lengthOverRadius[calledBy(axis)] / mean(lengths)) ** 2;
  });
  const areas = bending.filter((A) => A !== undefined);
  const bar = areas.length === 0 ? 1 : mean(areas) / 2;
  return bending.map((A) => ({ I: 1, A: A ?? bar }));
}
