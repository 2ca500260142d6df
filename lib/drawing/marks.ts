// Which places of the force functions are worth a printed value: ends, turning points, jumps, zeros.

import { jumps, type MemberForces, type Piecewise, roots, turningPoints, valueAt } from "../results/index.ts";
import type { DiagramMark, ForceQuantity } from "./spec.ts";
import { traced } from "./traced.ts";

export interface MarkTexts {
  /** A value in N or N·m as printed. */
  readonly value: (si: number, quantity: ForceQuantity) => string;
  /** The place of a zero, metres from the member's start, as printed; without it zeros are only marked. */
  readonly place?: (metres: number, member: string) => string;
}

type Spot = Pick<DiagramMark, "at" | "value" | "kind">;

/** A force below this share of its greatest value on the frame is rounding, and not printed. */
const SMALL = 1e-9;

function spots(f: Piecewise, length: number, greatest: number): readonly Spot[] {
  const values = traced(f).map(([, v]) => v);
  const [low, high] = [Math.min(...values), Math.max(...values)];
  if (Math.max(Math.abs(low), Math.abs(high)) <= SMALL * greatest) return [];
  if (high - low <= SMALL * greatest) return [{ at: length / 2, value: valueAt(f, length / 2), kind: "end" }];
  const spot = (at: number, side: "left" | "right", kind: Spot["kind"]): Spot => ({
    at,
    value: valueAt(f, at, side),
    kind,
  });
  const ends = [spot(0, "right", "end"), spot(length, "left", "end")];
  const inside = (x: number): boolean => x > SMALL * length && x < length * (1 - SMALL);
  const steps = jumps(f).filter((j) => inside(j.x));
  const jumped = steps.flatMap((j) => [spot(j.x, "left", "jump"), spot(j.x, "right", "jump")]);
  const turning = turningPoints(f)
    .filter((x) => inside(x) && !steps.some((j) => Math.abs(j.x - x) <= SMALL * length))
    .map((x) => spot(x, "right", "extreme"));
  const zero = roots(f).filter(inside);
  return [
    ...[...ends, ...jumped, ...turning].filter((s) => Math.abs(s.value) > SMALL * greatest),
    ...zero.map((x): Spot => ({ at: x, value: 0, kind: "zero" })),
  ];
}

/** The marks of a diagrams figure: values at member ends, at turning points inside, on both sides of jumps, and the
 *  zeros. A function that is constant along its member is printed once, at the middle; what is nothing beside the
 *  frame's greatest value of the same quantity is left out. */
export function diagramMarks(
  forces: readonly MemberForces[],
  quantities: readonly ForceQuantity[],
  texts: MarkTexts,
): readonly DiagramMark[] {
  return quantities.flatMap((quantity) => {
    const greatest = Math.max(0, ...forces.flatMap((f) => traced(f[quantity]).map(([, v]) => Math.abs(v))));
    return forces.flatMap(({ member, length, [quantity]: f }) =>
      spots(f, length, greatest).map((spot): DiagramMark => {
        const text =
          spot.kind === "zero" ? (texts.place?.(spot.at, member) ?? "") : texts.value(spot.value, quantity);
        return { quantity, member, ...spot, text };
      }),
    );
  });
}
