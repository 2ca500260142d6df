// Deformations imposed from outside, and the weight of the members themselves.

import { type Measure, readMeasure } from "../quantity/index.ts";
import { StructureError } from "./faults.ts";
import { deepFreeze } from "./freeze.ts";
import { jointNamed, memberNamed } from "./geometry.ts";
import { mergeSources } from "./sources.ts";
import { resists } from "./support.ts";
import type { DistributedLoad, Imposed, Settlement, Structure, TemperatureLoad } from "./types.ts";

export interface TemperatureChange {
  /** Change of the member's axis. */
  readonly uniform?: Measure<"temperature change">;
  /** Reference fibre (lower side of a beam drawn left to right) less the opposite fibre. */
  readonly difference?: Measure<"temperature change">;
  readonly label?: string;
}

/** A change of temperature of a whole member; warmer is positive. */
export function temperature(
  member: string,
  { uniform, difference, label }: TemperatureChange,
): TemperatureLoad {
  const read = (
    measure: Measure<"temperature change"> | undefined,
    what: string,
  ): { si: number; from: readonly string[] } =>
    measure === undefined
      ? { si: 0, from: [] }
      : readMeasure(measure, "temperature change", `${what} of ${member}`);
  const [all, across] = [
    read(uniform, "uniform temperature change"),
    read(difference, "temperature difference"),
  ];
  if (uniform === undefined && difference === undefined)
    throw new StructureError({ kind: "no load", what: `the temperature change of ${member}` });
  const texts = [uniform, difference].flatMap((measure) => (measure === undefined ? [] : [String(measure)]));
  return deepFreeze({
    kind: "temperature",
    member,
    uniform: all.si,
    difference: across.si,
    label: label ?? texts.join(", "),
    from: mergeSources(all.from, across.from),
  });
}

export interface Movement {
  readonly right?: Measure<"length">;
  readonly left?: Measure<"length">;
  readonly down?: Measure<"length">;
  readonly up?: Measure<"length">;
  /** Counter-clockwise positive. */
  readonly rotation?: Measure<"angle">;
  readonly label?: string;
}

/** A movement of the ground under a support. At a support with an angle, right and up are its turned axes. */
export function settlement(joint: string, movement: Movement): Settlement {
  const given = (["right", "left", "up", "down"] as const).flatMap((direction) => {
    const measure = movement[direction];
    if (measure === undefined) return [];
    const read = readMeasure(measure, "length", `settlement of ${joint}`);
    return [{ direction, si: read.si, from: read.from, text: String(measure) }];
  });
  const turn =
    movement.rotation === undefined
      ? undefined
      : readMeasure(movement.rotation, "angle", `settlement of ${joint}`);
  if (given.length === 0 && turn === undefined)
    throw new StructureError({ kind: "no load", what: `the settlement of ${joint}` });
  const total = (positive: string, negative: string): number =>
    given.reduce(
      (sum, g) => sum + (g.direction === positive ? g.si : g.direction === negative ? -g.si : 0),
      0,
    );
  const texts = [...given.map((g) => g.text), ...(turn === undefined ? [] : [String(movement.rotation)])];
  return deepFreeze({
    kind: "settlement",
    joint,
    x: total("right", "left"),
    y: total("up", "down"),
    rotation: turn?.si ?? 0,
    label: movement.label ?? texts.join(", "),
    from: mergeSources(...given.map((g) => g.from), turn?.from ?? []),
  });
}

/** The weight of every member that has a section (or of the members and groups named): area times unit weight, down. */
export function selfWeight(
  structure: Structure,
  unitWeight: Measure<"force per volume">,
  of?: readonly string[],
): readonly DistributedLoad[] {
  const weight = readMeasure(unitWeight, "force per volume", "unit weight");
  if (!(weight.si > 0))
    throw new StructureError({ kind: "not positive", what: "unit weight", value: weight.si, unit: "N/m³" });
  const wanted = structure.members.filter(
    (m) => of === undefined || of.includes(m.name) || of.includes(m.group ?? ""),
  );
  const known = new Set(structure.members.flatMap((m) => [m.name, m.group ?? m.name]));
  for (const name of of ?? [])
    if (!known.has(name))
      throw new StructureError({ kind: "no such member", what: "self weight of", name, known: [...known] });
  return wanted.map((member) => {
    if (member.section === undefined)
      throw new StructureError({
        kind: "no section",
        member: member.name,
        missing: "section",
        why: "its weight needs its area; give it by withSections",
      });
    const q = member.section.A * weight.si;
    return deepFreeze({
      kind: "distributed",
      member: member.name,
      begin: { fraction: 0 },
      end: { fraction: 1 },
      q1: q,
      q2: q,
      direction: [0, -1],
      label: "self weight",
      from: mergeSources(member.from, weight.from),
    });
  });
}

/** Throws when a deformation is not finite, is of an unknown member or joint, of a member whose section lacks what is
 *  needed for it, or moves a joint that is not supported that way. `place` is its number among the loads, from 1. */
export function checkImposed(structure: Structure, imposed: Imposed, place: number): void {
  const what = `load ${place}${imposed.label === "" ? "" : ` (${imposed.label})`}`;
  const values =
    imposed.kind === "temperature"
      ? [imposed.uniform, imposed.difference]
      : [imposed.x, imposed.y, imposed.rotation];
  for (const value of values)
    if (!Number.isFinite(value)) throw new StructureError({ kind: "not finite", what, value });
  if (imposed.kind === "temperature") checkTemperature(structure, imposed, what);
  else checkSettlement(structure, imposed, what);
}

function checkSettlement(structure: Structure, imposed: Settlement, what: string): void {
  jointNamed(structure, imposed.joint, `${what} is at joint`);
  const support = structure.supports.find((s) => s.joint === imposed.joint);
  for (const axis of ["x", "y", "rotation"] as const)
    if (imposed[axis] !== 0 && (support === undefined || !resists(support, axis)))
      throw new StructureError({ kind: "not held", what, joint: imposed.joint, axis });
}

function checkTemperature(structure: Structure, { member, difference }: TemperatureLoad, what: string): void {
  const { section } = memberNamed(structure, member, what);
  const needs = difference === 0 ? (["alpha"] as const) : (["alpha", "depth"] as const);
  for (const missing of needs)
    if (section?.[missing] === undefined)
      throw new StructureError({ kind: "no section", member, missing, why: `${what} needs it` });
}
