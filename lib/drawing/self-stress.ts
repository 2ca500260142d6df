// A state of self-stress, drawn as internal forces are.

import { constant, type MemberForces } from "../results/index.ts";
import { axisOf, memberNamed } from "../structure/index.ts";
import { diagramPanels } from "./diagrams.ts";
import { diagramMarks } from "./marks.ts";
import type { DiagramsFigure, ForceQuantity, SelfStressFigure } from "./spec.ts";
import type { Panel } from "./svg.ts";
import { traced } from "./traced.ts";

const ALL = ["N", "V", "M"] as const;

const greatest = (forces: readonly MemberForces[], of: readonly ForceQuantity[]): number =>
  Math.max(0, ...forces.flatMap((f) => of.flatMap((q) => traced(f[q]).map(([, v]) => Math.abs(v)))));

/** Values as parts of the greatest force and of the greatest moment, "1.00" and "−0.50". */
function shares(forces: readonly MemberForces[]): (value: number, quantity: ForceQuantity) => string {
  const force = greatest(forces, ["N", "V"]);
  const moment = greatest(forces, ["M"]);
  return (value, quantity) => (value / (quantity === "M" ? moment : force)).toFixed(2).replace("-", "−");
}

/** Forces of every member, none in those the state does not reach. */
function everyMember({ structure, forces }: SelfStressFigure): readonly MemberForces[] {
  return structure.members.map((member) => {
    const found = forces.find((f) => f.member === member.name);
    if (found) return found;
    const { length } = axisOf(structure, member);
    const nothing = constant(0, length, 0);
    return { member: member.name, length, N: nothing, V: nothing, M: nothing, uses: [] };
  });
}

/** Layouts of a state of self-stress, one panel per quantity that is not nothing throughout. */
export function selfStressPanels(spec: SelfStressFigure): readonly Panel[] {
  const { title, description, structure, moments = "tension side" } = spec;
  for (const { member } of spec.forces) memberNamed(structure, member, "the state of self-stress");
  const forces = everyMember(spec);
  const all = greatest(forces, ALL);
  if (!(all > 0))
    throw new Error(`self-stress "${title}": every force is zero; a state of self-stress has some`);
  const quantities = ALL.filter((q) => greatest(forces, [q]) > 1e-9 * all);
  const marks = spec.marks ?? diagramMarks(forces, quantities, { value: shares(forces) });
  const headings = {
    N: "N  self-stress, part of the greatest force",
    V: "V  self-stress, part of the greatest force",
    M: `M  self-stress, part of the greatest moment, drawn on the ${moments}`,
  };
  const figure: DiagramsFigure = {
    kind: "diagrams",
    title,
    description,
    structure,
    forces,
    quantities,
    moments,
    marks,
    headings,
  };
  return diagramPanels(figure);
}
