// A mechanism: the skeleton thin, the moved skeleton dashed, an arrow at each point that moves.

import type { Mechanism } from "../results/index.ts";
import type { Structure } from "../structure/index.ts";
import { arrow, turningArrow } from "./arrows.ts";
import { extentOf } from "./extent.ts";
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

type Turn = Mechanism["turns"][number];

/** The turns of a mechanism gathered into rigid bodies: stretches that touch and turn alike. */
function turningBodies(
  structure: Structure,
  turns: readonly Turn[],
  scale: Scale,
): readonly (readonly Turn[])[] {
  const ends = (t: Turn): readonly Pt[] => {
    const on = memberLine(structure, t.member, scale);
    return [on.page(t.begin), on.page(t.end)];
  };
  const near = (s: Turn, t: Turn): boolean => ends(s).some((p) => ends(t).some((q) => distance(p, q) < 0.5));
  const alike = (s: Turn, t: Turn): boolean =>
    Math.abs(s.rotation - t.rotation) < 1e-6 * Math.abs(t.rotation);
  const bodies: Turn[][] = [];
  for (const turn of turns.filter((t) => Math.abs(t.rotation) > 1e-9)) {
    const touching = bodies.filter((b) => b.some((other) => alike(other, turn) && near(other, turn)));
    const merged = [turn, ...touching.flat()];
    for (const b of touching) bodies.splice(bodies.indexOf(b), 1);
    bodies.push(merged);
  }
  return bodies;
}

/** A turning arrow for every body that turns, on the middle of its longest stretch. */
function turnings(structure: Structure, mechanism: Mechanism, scale: Scale): Scene {
  return merge(
    ...turningBodies(structure, mechanism.turns, scale).map((body) => {
      const longest = body.reduce((a, b) => (b.end - b.begin > a.end - a.begin ? b : a));
      const on = memberLine(structure, longest.member, scale);
      const middle = on.page((longest.begin + longest.end) / 2);
      return scene(
        turningArrow(middle, 9, longest.rotation > 0 ? 1 : -1, on.fibre, { ...PENS.sought, width: 1.3 }),
      );
    }),
  );
}

/** Layout of a mechanism figure. */
export function mechanismPanel(spec: MechanismFigure): Laid {
  const { structure, mechanism } = spec;
  const extent = extentOf(structure);
  return fitted(
    worldPoints(structure),
    (scale) =>
      merge(
        supports(structure, scale),
        memberLines(structure, scale, PENS.ghost),
        moved(structure, mechanism, scale),
        turnings(structure, mechanism, scale),
        motions(structure, mechanism, scale),
        hinges(structure, scale),
        jointNames(structure, scale),
      ),
    extent.tallest(TALLEST),
    extent.page,
  );
}
