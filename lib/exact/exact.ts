// The linear elastic solution of a plane skeleton, with axial deformation and without shear deformation.

import type { ElasticSolution, JointDisplacement, Reaction } from "../results/index.ts";
import { type Imposed, type Load, resists, type Structure, type Support } from "../structure/index.ts";
import { condition } from "./condition.ts";
import { memberResults } from "./member-results.ts";
import { type Prepared, prepare } from "./prepare.ts";
import { residual } from "./residual.ts";
import { assemble, type SolvedCase, solve } from "./solve.ts";
import { stiffnessOf } from "./stiffness.ts";

/** Displacements of joints, reactions, and N, V, M, rotation and deflection along every member as exact piecewise
 *  polynomials, SI. Every member needs a section. Throws on a structure that can move freely, naming the motion.
 *  Direct stiffness with a banded L D Lᵀ and steps of refinement; Bernoulli beams, small displacements. */
export function exact(structure: Structure, loads: readonly (Load | Imposed)[]): ElasticSolution {
  const prepared = prepare(structure, loads);
  const stiffness = stiffnessOf(prepared);
  const solved = solve(prepared, stiffness, { refinements: 2 });
  const [first] = solved.cases;
  const [loadCase] = prepared.loadCases;
  if (first === undefined || loadCase === undefined) throw new Error("the load case was not solved");
  const matrix = new Float64Array(prepared.envelope.size);
  assemble(prepared, stiffness, matrix);
  return Object.freeze({
    joints: Object.freeze(jointDisplacements(prepared, first)),
    reactions: Object.freeze(reactions(prepared, stiffness.springs, first, loadCase.ground)),
    members: Object.freeze(memberResults(prepared, stiffness, loads, loadCase, first)),
    residual: residual(prepared, stiffness, first, loadCase),
    condition: condition(prepared.envelope, matrix, solved.factors),
  });
}

function jointDisplacements({ structure, numbering }: Prepared, { u }: SolvedCase): JointDisplacement[] {
  const { places, axes, total } = numbering;
  return structure.joints.map(({ name }, i) => {
    const [x, y] = [u[places[3 * i] ?? total] ?? 0, u[places[3 * i + 1] ?? total] ?? 0];
    const [c, s] = [axes[2 * i] ?? 1, axes[2 * i + 1] ?? 0];
    const place = places[3 * i + 2] ?? total;
    const turned = { joint: name, x: x * c - y * s + 0, y: x * s + y * c + 0 };
    return Object.freeze(place === total ? turned : { ...turned, rotation: u[place] ?? 0 });
  });
}

const none = Object.freeze({});

/** Forces of held places and springs on the structure, in global axes; a component nothing resists is absent. */
function reactions(
  { structure, numbering, springs }: Prepared,
  stiffness: Float64Array,
  { u, r }: SolvedCase,
  ground: Float64Array | undefined,
): Reaction[] {
  const { places, axes, node, free } = numbering;
  const sprung = new Map(springs.map(({ place }, k) => [place, stiffness[k] ?? 0]));
  return structure.supports.map((support) => {
    const i = node.get(support.joint) ?? -1;
    const force = (k: number): number => {
      const place = places[3 * i + k] ?? -1;
      if (place >= free) return -(r[place] ?? 0);
      return -(sprung.get(place) ?? 0) * ((u[place] ?? 0) - (ground?.[place] ?? 0));
    };
    const [x, y, moment] = [force(0), force(1), force(2)];
    const [c, s] = [axes[2 * i] ?? 1, axes[2 * i + 1] ?? 0];
    return Object.freeze({
      joint: support.joint,
      ...(pushes(support, c, s) ? { x: x * c - y * s + 0 } : {}),
      ...(pushes(support, s, c) ? { y: x * s + y * c + 0 } : {}),
      ...(resists(support, "rotation") ? { moment: moment + 0 } : {}),
      steps: none,
    });
  });
}

/** Whether a support can push along a global axis that has these components on its own x and y. */
function pushes(support: Support, onX: number, onY: number): boolean {
  const near = 1e-12;
  return (resists(support, "x") && Math.abs(onX) > near) || (resists(support, "y") && Math.abs(onY) > near);
}
