// A mechanism: the skeleton thin, the moved skeleton dashed, an arrow at each point that moves.

import type { Mechanism } from "../results/index.ts";
import type { Structure } from "../structure/index.ts";
import { arrow } from "./arrows.ts";
import { distance, type Pt } from "./geometry.ts";
import { hinges, jointNames, memberLine, memberLines, worldPoints } from "./members.ts";
import { fitted, type Laid, type Scale } from "./scale.ts";
import { merge, PENS, polyline, type Scene, scene } from "./scene.ts";
import type { MechanismFigure } from "./spec.ts";
import { supports } from "./supports.ts";

const TALLEST = 260;
/** Page length of the largest displacement component. */
const THROW = 40;

function movedPage(mechanism: Mechanism, name: string, from: Pt): Pt {
  const point = mechanism.points.find((p) => p.name === name);
  if (!point) {
    const known = mechanism.points.map((p) => p.name).join(", ");
    throw new Error(`figure: the mechanism says nothing of "${name}"; it names ${known}`);
  }
  return [from[0] + point.ux * THROW, from[1] - point.uy * THROW];
}

function moved(structure: Structure, mechanism: Mechanism, scale: Scale): Scene {
  const chains = structure.members.map((member) => {
    const on = memberLine(structure, member.name, scale);
    const inside = structure.hinges.filter((h) => h.member === member.name).sort((a, b) => a.at - b.at);
    const stops = [
      { name: member.start, at: 0 },
      ...inside.map((h) => ({ name: h.name, at: h.at })),
      { name: member.end, at: on.length },
    ];
    return polyline(
      stops.map((s) => movedPage(mechanism, s.name, on.page(s.at))),
      PENS.motion,
    );
  });
  return scene(chains);
}

function motions(structure: Structure, mechanism: Mechanism, scale: Scale): Scene {
  const places = [
    ...structure.joints.map((j) => ({ name: j.name, page: scale.page(j.x, j.y) })),
    ...structure.hinges.map((h) => ({
      name: h.name,
      page: memberLine(structure, h.member, scale).page(h.at),
    })),
  ];
  return scene(
    places.flatMap(({ name, page }) => {
      const to = movedPage(mechanism, name, page);
      return distance(page, to) > 6 ? arrow(page, to, { ...PENS.sought, width: 1.6 }, 7) : [];
    }),
  );
}

/** Layout of a mechanism figure. */
export function mechanismPanel(spec: MechanismFigure): Laid {
  const { structure, mechanism } = spec;
  return fitted(
    worldPoints(structure),
    (scale) =>
      merge(
        supports(structure, scale),
        memberLines(structure, scale, PENS.ghost),
        moved(structure, mechanism, scale),
        motions(structure, mechanism, scale),
        hinges(structure, scale),
        jointNames(structure, scale),
      ),
    TALLEST,
  );
}
