// N, V and M along each member, integrated from the forces at its start.  dN/dx = -p, dV/dx = -q, dM/dx = V,
// with p along the member, q across it towards the reference fibre, and a counter-clockwise couple C making M jump by -C.

import {
  constant,
  integral,
  type MemberForces,
  memberLoads,
  type Piecewise,
  scale,
  stepAt,
  sum,
} from "../results/index.ts";
import { axisOf, deepFreeze, type Member } from "../structure/index.ts";
import { type Cutting, isCutFree } from "./cutting.ts";
import type { Found } from "./equations.ts";
import { barForce, cutForce, pinForce, reactionForce } from "./force-names.ts";
import { restraintsOf } from "./restraints.ts";

/** The force functions of every member, in the structure's order. */
export function memberForces(cut: Cutting, known: ReadonlyMap<string, Found>): readonly MemberForces[] {
  return cut.structure.members.map((member) => deepFreeze(along(cut, known, member)));
}

interface Start {
  readonly N: number;
  readonly V: number;
  readonly M: number;
  readonly uses: readonly number[];
}

function along(cut: Cutting, known: ReadonlyMap<string, Found>, member: Member): MemberForces {
  const own = memberLoads(cut.structure, cut.loads, member.name);
  const L = own.length;
  const start = startForces(cut, known, member);
  const steps = (pick: (p: (typeof own.points)[number]) => number): Piecewise =>
    sum(constant(0, L, 0), ...own.points.filter((p) => pick(p) !== 0).map((p) => stepAt(0, L, p.x, pick(p))));
  const N = sum(
    scale(integral(own.along), -1),
    scale(
      steps((p) => p.along),
      -1,
    ),
    constant(0, L, start.N),
  );
  const V = sum(
    scale(integral(own.across), -1),
    scale(
      steps((p) => p.across),
      -1,
    ),
    constant(0, L, start.V),
  );
  const M = sum(
    integral(V, start.M),
    scale(
      steps((p) => p.couple),
      -1,
    ),
  );
  return { member: member.name, length: L, N, V, M, uses: start.uses, loads: own.loads };
}

/** N, V, M just inside the member's start. */
function startForces(cut: Cutting, known: ReadonlyMap<string, Found>, member: Member): Start {
  const uses = new Set<number>();
  const value = (force: { readonly name: string }): number => {
    const found = known.get(force.name);
    if (found !== undefined) uses.add(found.step);
    return found?.value ?? 0;
  };
  const start = unlisted(cut, member, value);
  return { ...start, uses: [...uses].sort((a, b) => a - b) };
}

function unlisted(
  cut: Cutting,
  member: Member,
  value: (force: { readonly name: string }) => number,
): Omit<Start, "uses"> {
  const joint = member.start;
  const connection = cut.connections.find((c) => c.member === member.name && c.end === "start");
  if (connection === undefined) throw new Error(`member ${member.name} has no start`);
  const { c, s } = axisOf(cut.structure, member);
  const turned = (fx: number, fy: number, couple: number): Omit<Start, "uses"> => ({
    N: -(fx * c + fy * s) + 0,
    V: -fx * s + fy * c,
    M: -couple + 0,
  });
  const { joined, bar, moment, shear, axial } = connection;
  if (bar) return { N: value(barForce(member.name)), V: 0, M: 0 };
  if (!joined && !moment && shear && axial)
    return turned(value(pinForce(member.name, joint, "x")), value(pinForce(member.name, joint, "y")), 0);
  if (!joined || isCutFree(cut, joint)) {
    const [N, V, M] = (["N", "V", "M"] as const).map((letter) => value(cutForce(member.name, joint, letter)));
    return { N: N ?? 0, V: V ?? 0, M: M ?? 0 };
  }
  let [x, y, couple] = [0, 0, 0];
  for (const load of cut.loads) {
    if (load.kind !== "joint" || load.joint !== joint) continue;
    [x, y, couple] = [x + load.fx, y + load.fy, couple + load.couple];
  }
  for (const { joint: at, component, direction } of restraintsOf(cut.structure)) {
    if (at !== joint) continue;
    const force = value(reactionForce(joint, component));
    if (direction === undefined) couple += force;
    else [x, y] = [x + force * direction[0], y + force * direction[1]];
  }
  return turned(x, y, couple);
}
