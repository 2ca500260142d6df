// What a support holds.

import { type Measure, readMeasure } from "../quantity/index.ts";
import { StructureError } from "./faults.ts";
import { mergeSources } from "./sources.ts";
import type { Sources, Support } from "./types.ts";

export type SupportKind = Support["kind"];

/** A support in full: each displacement held (`true`) or resisted by a spring. With an `angle` x and y are axes turned
 *  counter-clockwise by it: `{ y: true, angle: "30 deg" }` is a roller on a slope of 30 degrees. */
export interface SupportParts {
  readonly x?: boolean | Measure<"force per length">;
  readonly y?: boolean | Measure<"force per length">;
  readonly rotation?: boolean | Measure<"moment per angle">;
  readonly angle?: Measure<"angle">;
}

/** A support by its trade name, or by what it holds (a roller on a wall: `{ x: true }`). A guided support holds rotation
 *  and x, and lets y go. */
export type SupportChoice = SupportKind | "guided" | SupportParts;

const held: Readonly<Record<SupportKind | "guided", Support["holds"]>> = {
  fixed: { x: true, y: true, rotation: true },
  pinned: { x: true, y: true, rotation: false },
  roller: { x: false, y: true, rotation: false },
  free: { x: false, y: false, rotation: false },
  guided: { x: true, y: false, rotation: true },
};

/** The support at a joint. A roller holds y only, free holds nothing. */
export function support(joint: string, choice: SupportChoice, from: Sources = []): Support {
  if (typeof choice === "object" && choice !== null) return supportOf(joint, choice, from);
  if (!Object.hasOwn(held, choice))
    throw new StructureError({
      kind: "unknown choice",
      what: `support at ${joint}`,
      value: String(choice),
      choices: Object.keys(held),
    });
  const holds = held[choice];
  return { joint, kind: choice === "guided" ? kindOf(holds) : choice, holds, from };
}

function supportOf(joint: string, parts: SupportParts, from: Sources): Support {
  const holds = { x: parts.x === true, y: parts.y === true, rotation: parts.rotation === true };
  const read = (axis: "x" | "y" | "rotation"): ReturnType<typeof readMeasure>[] => {
    const part = parts[axis];
    if (part === undefined || typeof part === "boolean") return [];
    const dimension = axis === "rotation" ? "moment per angle" : "force per length";
    const what = `${axis} spring of the support at ${joint}`;
    const stiffness = readMeasure(part, dimension, what);
    checkSpring(stiffness.si, axis, what);
    return [stiffness];
  };
  const springs = { x: read("x"), y: read("y"), rotation: read("rotation") };
  const angle =
    parts.angle === undefined
      ? undefined
      : readMeasure(parts.angle, "angle", `angle of the support at ${joint}`);
  const all = Object.values(springs).flat();
  return {
    joint,
    kind: kindOf(holds),
    holds,
    ...(all.length === 0 ? {} : { springs: springValues(springs) }),
    ...(angle === undefined || angle.si === 0 ? {} : { angle: angle.si }),
    from: mergeSources(from, ...all.map((s) => s.from), angle?.from ?? []),
  };
}

/** Throws on a stiffness below zero. */
export function checkSpring(value: number, axis: "x" | "y" | "rotation", what: string): void {
  const unit = axis === "rotation" ? "N·m/rad" : "N/m";
  if (value < 0) throw new StructureError({ kind: "not positive", what, value, unit });
}

function springValues(
  springs: Readonly<Record<"x" | "y" | "rotation", readonly { readonly si: number }[]>>,
): NonNullable<Support["springs"]> {
  const given = Object.entries(springs).flatMap(([axis, found]) => found.map((s) => [axis, s.si] as const));
  return Object.fromEntries(given);
}

/** How many displacements a support resists, rigidly or by a spring. */
export function heldCount(support: Support): number {
  return (["x", "y", "rotation"] as const).filter((axis) => resists(support, axis)).length;
}

/** Whether a support resists a displacement along one of its axes, rigidly or by a spring. */
export function resists({ holds, springs }: Support, axis: "x" | "y" | "rotation"): boolean {
  return holds[axis] || (springs?.[axis] ?? 0) > 0;
}

/** The nearest of the four trade names for what is held. */
export function kindOf({ x, y, rotation }: Support["holds"]): SupportKind {
  if (rotation) return "fixed";
  if (x && y) return "pinned";
  return x || y ? "roller" : "free";
}
