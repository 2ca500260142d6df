// Whether loads fit the structure they are put on.

import { endsReleasedAt } from "./assemble.ts";
import { StructureError } from "./faults.ts";
import { axisOf, jointNamed, memberNamed } from "./geometry.ts";
import { inGlobalAxes } from "./global-loads.ts";
import { checkImposed } from "./imposed.ts";
import { metresAlong, snapToEnds } from "./place.ts";
import type { DistributedLoad, Imposed, JointLoad, Load, MemberPointLoad, Structure } from "./types.ts";

/** Throws when a load is on an unknown joint or member, outside its member, not finite, or a couple on a hinge;
 *  imposed deformations as `checkImposed` says. */
export function checkLoads(structure: Structure, loads: readonly (Load | Imposed)[]): void {
  loads.forEach((load, i) => {
    if (load.kind === "temperature" || load.kind === "settlement") {
      checkImposed(structure, load, i + 1);
      return;
    }
    const what = `load ${i + 1}${load.label === "" ? "" : ` (${load.label})`}`;
    checkFinite(load, what);
    if (load.kind === "joint") checkJointLoad(structure, load, what);
    else if (load.kind === "member point") checkPointLoad(structure, load, what);
    else checkLineLoad(structure, load, what);
    inGlobalAxes(structure, load);
  });
}

function checkFinite(load: Load, what: string): void {
  const values =
    load.kind === "distributed" ? [load.q1, load.q2, ...load.direction] : [load.fx, load.fy, load.couple];
  for (const value of values)
    if (!Number.isFinite(value)) throw new StructureError({ kind: "not finite", what, value });
}

function checkJointLoad(structure: Structure, load: JointLoad, what: string): void {
  jointNamed(structure, load.joint, `${what} is at joint`);
  if (load.couple !== 0 && endsReleasedAt(structure, load.joint))
    throw new StructureError({ kind: "couple on pin", what, joint: load.joint });
}

function checkPointLoad(structure: Structure, load: MemberPointLoad, what: string): void {
  const { length } = axisOf(structure, memberNamed(structure, load.member, what));
  const x = placeInside(load.member, length, load.at, what);
  const hinge = structure.hinges.find((h) => h.member === load.member && Math.abs(h.at - x) <= 1e-9 * length);
  if (load.couple !== 0 && hinge !== undefined)
    throw new StructureError({ kind: "couple at hinge", what, hinge: hinge.name });
}

function checkLineLoad(structure: Structure, load: DistributedLoad, what: string): void {
  const { length } = axisOf(structure, memberNamed(structure, load.member, what));
  const begin = placeInside(load.member, length, load.begin, what);
  const end = placeInside(load.member, length, load.end, what);
  if (!(end > begin))
    throw new StructureError({ kind: "empty stretch", what, member: load.member, begin, end });
}

/** Metres along the member, which must lie on it. */
function placeInside(member: string, length: number, place: MemberPointLoad["at"], what: string): number {
  const at = metresAlong(place, length);
  const x = snapToEnds(at, length);
  if (!(x >= 0 && x <= length))
    throw new StructureError({ kind: "outside", what, member, at, length, open: false });
  return x;
}
