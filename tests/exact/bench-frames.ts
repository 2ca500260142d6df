// Building frames of any size with loads everywhere, for timing and for a second opinion.

import { quantity } from "../../lib/quantity/index.ts";
import { atJoint, buildingFrame, type Load, type Structure, uniform } from "../../lib/structure/index.ts";

/** Equal bays of 6 m and storeys of 3.5 m, fixed bases, columns and beams of one section each, uniform load on every
 *  beam and a force at every level on the left. */
export function benchFrame(
  bays: number,
  storeys: number,
): { readonly structure: Structure; readonly loads: readonly Load[] } {
  const structure = buildingFrame({
    bays: Array.from({ length: bays }, () => "6 m" as const),
    storeys: Array.from({ length: storeys }, () => "3.5 m" as const),
    bases: "fixed",
    sections: {
      columns: { E: "32 GPa", A: "0.25 m^2", I: "0.0052 m^4" },
      beams: { E: "32 GPa", A: "0.18 m^2", I: "0.0054 m^4" },
    },
  });
  const beams = structure.members.filter((m) => m.group === "beams");
  const down = quantity(25e3, "force per length");
  const loads = [
    ...beams.map((m) => uniform(m.name, down)),
    ...Array.from({ length: storeys }, (_, i) => atJoint(`A${i + 1}`, { right: "20 kN" })),
  ];
  return { structure, loads };
}

/** What the Python side assembles from: coordinates, members with EA and EI, fixed joints, loads. */
export interface PlainFrame {
  readonly joints: readonly (readonly [number, number])[];
  readonly members: readonly (readonly [start: number, end: number, EA: number, EI: number])[];
  readonly names: readonly string[];
  readonly fixed: readonly number[];
  readonly uniform: readonly (readonly [member: string, q: number])[];
  readonly forces: readonly (readonly [joint: number, fx: number, fy: number])[];
}

/** A frame of `benchFrame` in plain numbers. */
export function plainFrame(structure: Structure, loads: readonly Load[]): PlainFrame {
  const index = new Map(structure.joints.map((j, i) => [j.name, i]));
  const at = (joint: string): number => index.get(joint) ?? -1;
  return {
    joints: structure.joints.map((j) => [j.x, j.y]),
    members: structure.members.map(({ start, end, section = { E: 0, A: 0, I: 0 } }) => [
      at(start),
      at(end),
      section.E * section.A,
      section.E * section.I,
    ]),
    names: structure.members.map((m) => m.name),
    fixed: structure.supports.map((s) => at(s.joint)),
    uniform: loads.flatMap((l) => (l.kind === "distributed" ? [[l.member, l.q1] as const] : [])),
    forces: loads.flatMap((l) => (l.kind === "joint" ? [[at(l.joint), l.fx, l.fy] as const] : [])),
  };
}
