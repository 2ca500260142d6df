// Further equations where ΣFx, ΣFy and ΣM about the body's own points give no single unknown: forces summed along and across
// an inclined member, and moments about the point where the lines of two unknown forces meet.

import type { Body } from "./bodies.ts";
import {
  type Anchor,
  actingOn,
  type Equation,
  type Found,
  forceEquation,
  leverOf,
  momentEquation,
  type Slope,
} from "./equations.ts";
import type { Line } from "./place.ts";
import type { Push } from "./pushes.ts";

/** Those of the further equations of the joined bodies that hold a single unknown, in the order a person would try them.
 *  `named` finds the joint or hinge at a place, if there is one. */
export function furtherEquations(
  bodies: readonly Body[],
  joined: readonly number[],
  known: ReadonlyMap<string, Found>,
  size: number,
  named: (x: number, y: number) => string | undefined,
): readonly Equation[] {
  const pushes = actingOn(bodies, joined);
  const open = pushes.filter(({ force }) => force !== undefined && !known.has(force.name));
  const names = new Set(open.map((push) => push.force?.name));
  if (names.size === 0) return [];
  const along = slopesOf(open)
    .filter((slope) => withLever(open, (push) => partAlong(push, slope)).length === 1)
    .map((slope) => forceEquation(joined, pushes, "sum F", slope));
  const about = meetingsOf(open, size, named)
    .filter(
      ({ point }) =>
        withLever(open, (p) => leverOf(p, point) / (p.action.turn === 0 ? size : 1)).length === 1,
    )
    .map((anchor) => momentEquation(joined, pushes, anchor, size));
  return [...along, ...about];
}

function withLever(open: readonly Push[], lever: (push: Push) => number): readonly string[] {
  return [...new Set(open.flatMap((p) => (Math.abs(lever(p)) < 1e-12 ? [] : [p.force?.name ?? ""])))];
}

function partAlong({ action: { direction } }: Push, { direction: { x, y } }: Slope): number {
  return direction[0] * x + direction[1] * y;
}

/** Along and across each inclined line an unknown force has. */
function slopesOf(open: readonly Push[]): readonly Slope[] {
  const slopes = new Map<string, Slope>();
  for (const { action, line } of open) {
    const [x, y] = action.direction;
    if (line === undefined || Math.abs(x * y) < 1e-12) continue;
    const name = "member" in line ? line.member : `the reaction at ${line.support}`;
    const up = y > 0 ? 1 : -1;
    const own = { x: x * up, y: y * up };
    const other = { x: own.y, y: -own.x };
    const isShear =
      action.source !== undefined && "force" in action.source && /_V$/.test(action.source.force);
    const [along, across] = isShear ? [other, own] : [own, other];
    if (slopes.has(`along ${name}`)) continue;
    slopes.set(`along ${name}`, { direction: { name: `along ${name}`, ...along }, line });
    slopes.set(`across ${name}`, { direction: { name: `across ${name}`, ...across }, line });
  }
  return [...slopes.values()];
}

/** Points where the lines of two unknown forces meet, not farther off than the structure is large, nearest first. */
function meetingsOf(
  open: readonly Push[],
  size: number,
  named: (x: number, y: number) => string | undefined,
): readonly Anchor[] {
  const forces = open.filter((p) => p.action.turn === 0);
  const found: { readonly anchor: Anchor; readonly far: number }[] = [];
  forces.forEach((one, i) => {
    for (const other of forces.slice(i + 1)) {
      const meeting = meetingOf(one, other);
      if (meeting === undefined) continue;
      const far = Math.hypot(meeting.x - one.action.at.x, meeting.y - one.action.at.y);
      if (far > 3 * size) continue;
      const name = named(meeting.x, meeting.y);
      const meets = [one.force?.name ?? "", other.force?.name ?? ""] as const;
      const point =
        name === undefined ? { name: meetingName(meets), ...meeting, meets } : { name, ...meeting };
      found.push({ anchor: { point, place: { lines: [lineOf(one), lineOf(other)] } }, far });
    }
  });
  const order = (f: (typeof found)[number]): number => (f.anchor.point.meets === undefined ? 0 : 1);
  return found.sort((a, b) => order(a) - order(b) || a.far - b.far).map(({ anchor }) => anchor);
}

function meetingName([one, other]: readonly [string, string]): string {
  return `where ${one} and ${other} meet`;
}

function meetingOf(one: Push, other: Push): { readonly x: number; readonly y: number } | undefined {
  const [d, e] = [one.action.direction, other.action.direction];
  const cross = d[0] * e[1] - d[1] * e[0];
  if (Math.abs(cross) < 1e-9) return undefined;
  const [rx, ry] = [other.action.at.x - one.action.at.x, other.action.at.y - one.action.at.y];
  const t = (rx * e[1] - ry * e[0]) / cross;
  return { x: one.action.at.x + t * d[0], y: one.action.at.y + t * d[1] };
}

function lineOf({ action, place, line }: Push): Line {
  const { x, y } = action.at;
  const plain = { x, y, direction: action.direction, place };
  return line !== undefined && "member" in line ? { ...plain, member: line.member } : plain;
}
