// A free motion in words.

import { type Mechanism, rigidMotionWords, stillMotion as still } from "../results/index.ts";
import type { Skeleton, Structure } from "../structure/index.ts";

type Moved = Mechanism["points"][number];

/** One line without a full stop: "B and C move sideways together", "D drops, member CD turns", "joint E turns alone". */
export function motionWords(
  structure: Structure,
  skeleton: Skeleton,
  points: readonly Moved[],
  turns: Mechanism["turns"],
  spins: readonly string[],
): string {
  const sideways = points.filter((p) => Math.abs(p.ux) > still);
  const upright = points.filter((p) => Math.abs(p.uy) > still);
  if (sideways.length === 0 && upright.length === 0) return spinWords(structure, spins);
  const whole = rigidMotionWords(skeleton, points, turns);
  if (whole !== undefined) return whole;
  const turning = [
    ...new Set(
      skeleton.segments.flatMap((s, i) =>
        Math.abs(turns[i]?.rotation ?? 0) * s.length > still ? [s.member] : [],
      ),
    ),
  ];
  return [
    sidewaysWords(sideways),
    uprightWords(upright),
    turning.length === 0
      ? ""
      : `${turning.length === 1 ? "member" : "members"} ${list(turning)} ${verb(turning, "turn")}`,
  ]
    .filter((words) => words !== "")
    .join(", ");
}

function spinWords(structure: Structure, spins: readonly string[]): string {
  const joints = structure.joints.filter((j) => spins.includes(j.name)).map((j) => j.name);
  const names = joints.length === 0 ? spins : joints;
  return `${names.length === 1 ? "joint" : "joints"} ${list(names)} ${verb(names, "turn")} without moving`;
}

function sidewaysWords(points: readonly Moved[]): string {
  if (points.length === 0) return "";
  const names = points.map((p) => p.name);
  const [first = 0] = points.map((p) => p.ux);
  const together = points.length > 1 && points.every((p) => Math.abs(p.ux - first) <= still);
  const opposite = points.some((p) => p.ux * first < 0);
  return `${list(names)} ${verb(names, "move")} sideways${together ? " together" : opposite ? " in opposite directions" : ""}`;
}

function uprightWords(points: readonly Moved[]): string {
  const said = (chosen: readonly Moved[], word: string): string => {
    const names = chosen.map((p) => p.name);
    return names.length === 0 ? "" : `${list(names)} ${verb(names, word)}`;
  };
  return [
    said(
      points.filter((p) => p.uy > 0),
      "rise",
    ),
    said(
      points.filter((p) => p.uy < 0),
      "drop",
    ),
  ]
    .filter((words) => words !== "")
    .join(" and ");
}

/** "A", "A and B", "A, B and C", "A, B, C and 7 more". */
function list(names: readonly string[]): string {
  if (names.length > 6) return `${names.slice(0, 5).join(", ")} and ${names.length - 5} more`;
  return names.length < 2
    ? names.join("")
    : `${names.slice(0, -1).join(", ")} and ${names[names.length - 1]}`;
}

const verb = (names: readonly string[], word: string): string => (names.length === 1 ? `${word}s` : word);
