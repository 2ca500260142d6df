// Names of the forces set free by cutting.
//
//   A_x, A_y, A_M        reactions on the structure: right, up, counter-clockwise
//   B_n, B_t             reaction of a support on a slope: across the slope (away from it), along it
//   h1_x, h1_y           through a hinge, right and up on the part towards the member's start, opposite on the other
//   BC_B_x, BC_B_y       through the pin of a released member end, right and up on the member, opposite on the joint
//   BC_N                 in a bar pinned at both ends and loaded at its joints only, tension positive
//   BC_B_N, _V, _M       at a cut beside a joint, signs as in results/types.ts

import type { ForceName } from "../results/index.ts";
import type { Restraint } from "./restraints.ts";

const letters = { x: "x", y: "y", moment: "M", normal: "n", tangent: "t" } as const;

export function reactionForce(joint: string, component: Restraint["component"]): ForceName {
  const dimension = component === "moment" ? "moment" : "force";
  const letter = letters[component];
  return { name: `${joint}_${letter}`, kind: "reaction", tex: `${upright(joint)}_${letter}`, dimension };
}

export function hingeForce(hinge: string, component: "x" | "y"): ForceName {
  const tex = `${component.toUpperCase()}_{${upright(hinge)}}`;
  return { name: `${hinge}_${component}`, kind: "hinge", tex, dimension: "force" };
}

export function pinForce(member: string, joint: string, component: "x" | "y"): ForceName {
  const tex = `${component.toUpperCase()}_{${upright(member)},${upright(joint)}}`;
  return { name: `${member}_${joint}_${component}`, kind: "hinge", tex, dimension: "force" };
}

export function barForce(member: string): ForceName {
  return { name: `${member}_N`, kind: "cut", tex: `N_{${upright(member)}}`, dimension: "force" };
}

export function cutForce(member: string, joint: string, letter: "N" | "V" | "M"): ForceName {
  const dimension = letter === "M" ? "moment" : "force";
  const tex = `${letter}_{${upright(member)},${upright(joint)}}`;
  return { name: `${member}_${joint}_${letter}`, kind: "cut", tex, dimension };
}

/** Single letters stay italic, longer names stand upright. */
function upright(name: string): string {
  return name.length === 1 ? name : `\\mathrm{${name}}`;
}
