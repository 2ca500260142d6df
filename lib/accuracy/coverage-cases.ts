// Random frames for the test of the bands themselves: mixed families, and the ones on which bands of other populations broke.

import { quantity } from "../quantity/index.ts";
import { atJoint, type Load, type Structure } from "../structure/index.ts";
import {
  frameShape,
  gravityFrame,
  type StudyCase,
  singlePortal,
  threeSpans,
  twoSpans,
} from "./study-cases.ts";
import type { Dice } from "./study-random.ts";
import { type BaseUnknown, defaultUnknowns, type GroupUnknown, type Unknowns, within } from "./unknowns.ts";

/** A frame with what is stated to be unknown about it. */
export interface CoverageCase {
  readonly structure: Structure;
  readonly loads: readonly Load[];
  readonly unknowns: Unknowns;
}

export const coverageFamilies: readonly {
  readonly name: string;
  readonly make: (dice: Dice) => CoverageCase;
}[] = [
  { name: "continuous beams", make: continuous },
  {
    name: "portals",
    make: (dice) => framed(dice, singlePortal(dice, dice.percent(50) ? "pinned" : "fixed", dice.percent(50))),
  },
  { name: "building frames", make: (dice) => framed(dice, gravityFrame(frameShape(dice))) },
  { name: "9 to 14 storeys", make: tall },
  { name: "a column line up to ten times stiffer", make: wallLike },
  { name: "spans 1 : 2", make: oneToTwo },
];

/** Every span a group of its own, EI within a factor. */
function continuous(dice: Dice): CoverageCase {
  const { structure, loads } = dice.percent(50) ? twoSpans(dice) : threeSpans(dice);
  const range = within(dice.even(1.3, 3));
  const groups = structure.members.slice(1).map((m): GroupUnknown => ({ group: m.name, I: range }));
  return { structure, loads, unknowns: { groups, bases: [] } };
}

/** Default unknowns of some factor; in half of the cases a side load at every floor, and in half bases of unknown restraint. */
function framed(dice: Dice, of: StudyCase, more: readonly GroupUnknown[] = []): CoverageCase {
  const { structure } = of;
  const loads = dice.percent(50) ? [...of.loads, ...sideLoads(structure)] : of.loads;
  const stated = defaultUnknowns(structure, { factor: dice.even(1.3, 3) });
  const bases = dice.percent(50) ? [basesOf(structure, dice)] : [];
  return { structure, loads, unknowns: { groups: [...stated.groups, ...more], bases } };
}

function basesOf({ supports }: Structure, dice: Dice): BaseUnknown {
  const least = dice.percent(50) ? 0 : dice.even(0, 0.6);
  return {
    joints: supports.map((s) => s.joint),
    fixity: { least, most: least + (1 - least) * dice.even(0.3, 1) },
  };
}

/** A force to the right at the first joint of every level above the bases. */
function sideLoads({ joints }: Structure): readonly Load[] {
  const levels = new Map(joints.map((j) => [j.y, j] as const).reverse());
  return [...levels.values()]
    .filter((j) => j.y > 0)
    .map((j) => atJoint(j.name, { right: quantity(2e4, "force") }));
}

function tall(dice: Dice): CoverageCase {
  const shape = frameShape(dice);
  const storeys = dice.whole(9, 14);
  const h = shape.storeys[shape.storeys.length - 1] ?? 3.5;
  const step = dice.even(0.75, 1);
  return framed(
    dice,
    gravityFrame({
      ...shape,
      storeys: Array.from({ length: storeys }, () => h),
      taper: Array.from({ length: storeys }, (_, i) => step ** Math.floor(i / 2)),
    }),
  );
}

/** The I of one column line is stated to be anything from its nominal value to ten times that. */
function wallLike(dice: Dice): CoverageCase {
  const { structure, loads, unknowns } = framed(dice, gravityFrame(frameShape(dice)));
  const lines = structure.supports.map((s) => s.joint.slice(0, -1));
  const line = lines[dice.whole(0, lines.length - 1)] ?? "";
  const own = (m: Structure["members"][number]): boolean => m.group === "columns" && m.start.startsWith(line);
  const columns = structure.members.filter((m) => m.group === "columns");
  const others = columns.filter((m) => !own(m)).map((m) => m.name);
  const range = unknowns.groups.find((g) => g.group === "beams")?.I ?? within(2);
  const groups: GroupUnknown[] = [
    {
      group: `column line ${line}`,
      members: columns.filter(own).map((m) => m.name),
      I: { least: 1, most: 10 },
      A: range,
    },
    { group: "other columns", members: others, A: range },
    { group: "beams", I: range, A: range },
  ];
  return { structure, loads, unknowns: { ...unknowns, groups } };
}

function oneToTwo(dice: Dice): CoverageCase {
  const shape = frameShape(dice);
  const L = shape.bays[0] ?? 6;
  const bays = Array.from({ length: Math.max(2, shape.bays.length) }, (_, i) => (i % 2 === 0 ? L : 2 * L));
  const inner = Math.max(...shape.lines);
  const lines = Array.from({ length: bays.length + 1 }, (_, i) => (i === 0 || i === bays.length ? 1 : inner));
  return framed(dice, gravityFrame({ ...shape, bays, lines }));
}
