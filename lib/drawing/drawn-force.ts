// One quantity of internal forces as it is drawn: to which scale, and on which members by their line alone.

import type { MemberForces } from "../results/index.ts";
import { memberNamed } from "../structure/index.ts";
import { isBar } from "./members.ts";
import type { Scale } from "./scale.ts";
import type { DiagramsFigure, ForceQuantity } from "./spec.ts";
import { traced } from "./traced.ts";

export interface DrawnForce {
  readonly spec: DiagramsFigure;
  readonly quantity: ForceQuantity;
  readonly scale: Scale;
  /** Page units per N or N·m, signed towards the fibre; 0 where the quantity is nothing beside the others. */
  readonly gain: number;
}

/** Whether a member is a bar under a constant axial force, which is told by its line alone. */
export function isTruss({ spec, quantity }: DrawnForce, forces: MemberForces): boolean {
  const values = traced(forces.N).map(([, v]) => v);
  return (
    quantity === "N" &&
    isBar(memberNamed(spec.structure, forces.member, "what the figure shows")) &&
    Math.max(...values) - Math.min(...values) <= 1e-6 * Math.max(...values.map(Math.abs))
  );
}
