// Deformations imposed from outside: the ground that moves, the members that warm or cool.

import type { Imposed, Settlement, Structure, TemperatureLoad } from "../structure/index.ts";
import { arrow, turningArrow } from "./arrows.ts";
import { along, between, distance, type Pt, times, turned, unit } from "./geometry.ts";
import { jointOf, memberLine } from "./members.ts";
import type { Scale } from "./scale.ts";
import { type Label, line, merge, PENS, type Scene, scene } from "./scene.ts";

/** How far below its joint a settled support is shown, clear of the support's own outline. */
const BELOW = 26;
const STEP = 16;
const DASHED = { ...PENS.resultant, width: 1.4 };

/** Dashed ground where the support went, with an arrow to it. */
function settled(
  structure: Structure,
  { joint, x, y, rotation }: Settlement,
  text: string,
  scale: Scale,
): Scene {
  const own = jointOf(structure, joint);
  const angle = structure.supports.find((s) => s.joint === joint)?.angle ?? 0;
  const [gx, gy] = turned([x, y], angle);
  const from = along(scale.page(own.x, own.y), [0, 1], BELOW);
  const way = unit([gx, -gy], [0, 1]);
  const moved = Math.hypot(gx, gy) > 0;
  const to = along(from, way, moved ? STEP : 0);
  const tilt: Pt = turned([1, 0], Math.sign(rotation) * -0.2);
  const foot = along(to, way, moved ? 3 : 0);
  const shapes = [
    line(along(foot, tilt, -15), along(foot, tilt, 15), DASHED),
    ...(moved ? arrow(from, to, PENS.sought, 6) : []),
    ...(rotation === 0 ? [] : turningArrow(foot, 9, rotation > 0 ? 1 : -1, [0, -1], PENS.sought)),
  ];
  const label: Label = {
    text,
    at: along(foot, tilt, 15),
    prefer: [1, 0],
    gap: 4,
    accent: true,
    instead: [{ at: along(foot, tilt, -15), prefer: [-1, 0] }],
  };
  return scene(shapes, [label]);
}

/** Plus and minus signs along the sides that warm and cool, and arrows at both ends of a member that lengthens. */
function warmed(structure: Structure, load: TemperatureLoad, text: string, scale: Scale): Scene {
  const on = memberLine(structure, load.member, scale);
  const [a, b] = [on.page(0), on.page(on.length)];
  const axis = unit([b[0] - a[0], b[1] - a[1]]);
  const length = distance(a, b);
  const signs = (side: Pt, warm: boolean): Scene =>
    scene(
      [0.2, 0.8].flatMap((t) => {
        const c = along(between(a, b, t), side, 9);
        const stroke = line(along(c, axis, -3.5), along(c, axis, 3.5), PENS.sought);
        const upright = line(along(c, side, -3.5), along(c, side, 3.5), PENS.sought);
        return warm ? [stroke, upright] : [stroke];
      }),
    );
  const away = times(on.fibre, -1);
  const sides =
    load.difference !== 0
      ? merge(signs(on.fibre, load.difference > 0), signs(away, load.difference < 0))
      : signs(on.fibre, load.uniform > 0);
  // On the side of the fibre, where loads seldom stand.
  const beside = (t: number): Pt => along(between(a, b, t), on.fibre, 9);
  const reach = Math.min(26, length / 6) / length;
  const ends: readonly (readonly [number, number])[] =
    load.uniform > 0
      ? [
          [0.5 - reach / 2, 0.5 - 1.5 * reach],
          [0.5 + reach / 2, 0.5 + 1.5 * reach],
        ]
      : [
          [0.5 - 1.5 * reach, 0.5 - reach / 2],
          [0.5 + 1.5 * reach, 0.5 + reach / 2],
        ];
  const stretch =
    load.uniform === 0 ? [] : ends.flatMap(([p, q]) => arrow(beside(p), beside(q), PENS.sought, 6));
  const label: Label = { text, at: beside(0.5), prefer: on.fibre, gap: 6, accent: true };
  return merge(sides, scene(stretch, [label]));
}

/** Imposed deformations with their texts. */
export function imposed(
  structure: Structure,
  list: readonly Imposed[],
  texts: readonly string[],
  scale: Scale,
): Scene {
  return merge(
    ...list.map((one, i) => {
      const text = texts[i] ?? one.label;
      return one.kind === "settlement"
        ? settled(structure, one, text, scale)
        : warmed(structure, one, text, scale);
    }),
  );
}
