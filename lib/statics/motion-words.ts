// The motion of a mechanism in the trade's words.

import { type Mechanism, rigidMotionWords, stillMotion as still } from "../results/index.ts";
import { axisOf, calledBy, memberNamed, type Skeleton, type Structure } from "../structure/index.ts";
import { and } from "./words.ts";

type Moved = Mechanism["points"][number];
type Turn = Mechanism["turns"][number];

/** One line without a full stop: "sway: B and C move sideways together, columns AB and CD turn about A and D". */
export function motionWords(
  structure: Structure,
  skeleton: Skeleton,
  points: readonly Moved[],
  turns: readonly Turn[],
): string {
  return rigidMotionWords(skeleton, points, turns) ?? partWords(structure, skeleton, points, turns);
}

function partWords(
  structure: Structure,
  skeleton: Skeleton,
  points: readonly Moved[],
  turns: readonly Turn[],
): string {
  const isJoint = (p: Moved): boolean => structure.joints.some((j) => j.name === p.name);
  const sideways = points.filter((p) => isJoint(p) && Math.abs(p.ux) > still);
  const columns = turningColumns(structure, skeleton, points, turns);
  const sways = columns.some((column) => sideways.some((p) => column.ends.includes(p.name)));
  const words = [
    sideWords(sideways),
    sways ? columnWords(columns) : "",
    uprightWords(
      points.filter((p) => Math.abs(p.uy) > still && Math.abs(p.uy) > still + Math.abs(p.ux) * 1e-3),
    ),
    hingeSideWords(
      points.filter((p) => !isJoint(p) && Math.abs(p.ux) > still && isInColumn(structure, p.name)),
    ),
    sways ? "" : foldWords(structure, points, turns),
  ].filter((w) => w !== "");
  if (words.length === 0) return turningWords(turns);
  return (sways ? "sway: " : "") + words.join(", ");
}

/** Last resort where no joint is seen to move: the members that turn. */
function turningWords(turns: readonly Turn[]): string {
  const names = [
    ...new Set(turns.filter((t) => Math.abs(t.rotation) * (t.end - t.begin) > still).map((t) => t.member)),
  ];
  return names.length === 1 ? `member ${and(names)} turns` : `members ${and(names)} turn`;
}

function sideWords(points: readonly Moved[]): string {
  if (points.length === 0) return "";
  const names = and(points.map((p) => p.name));
  if (points.length === 1) return `${names} moves sideways`;
  const [first = 0] = points.map((p) => p.ux);
  if (points.every((p) => Math.abs(p.ux - first) <= still)) return `${names} move sideways together`;
  const opposite = points.some((p) => p.ux * first < 0);
  return `${names} move sideways${opposite ? " in opposite directions" : ""}`;
}

interface Column {
  readonly name: string;
  readonly ends: readonly string[];
  readonly about: string | undefined;
}

function turningColumns(
  structure: Structure,
  { nodes, segments }: Skeleton,
  points: readonly Moved[],
  turns: readonly Turn[],
): readonly Column[] {
  return segments.flatMap((segment, i) => {
    const turn = turns[i];
    if (turn === undefined || Math.abs(turn.rotation) * segment.length <= still) return [];
    if (nounOf(structure, segment.member) !== "column") return [];
    const ends = [segment.from, segment.to];
    const about = ends.find((n) => Math.hypot(points[n]?.ux ?? 0, points[n]?.uy ?? 0) <= still);
    return [
      { name: segment.member, ends: ends.map((n) => nodes[n]?.name ?? ""), about: nodes[about ?? -1]?.name },
    ];
  });
}

function columnWords(columns: readonly Column[]): string {
  const names = [...new Set(columns.map((c) => c.name))];
  const noun = names.length === 1 ? "column" : "columns";
  const about = [...new Set(columns.flatMap((c) => c.about ?? []))];
  const where = about.length === 0 ? "" : ` about ${and(about)}`;
  return `${noun} ${and(names)} ${names.length === 1 ? "turns" : "turn"}${where}`;
}

function uprightWords(points: readonly Moved[]): string {
  const said = (names: readonly string[], one: string, many: string): string =>
    names.length === 0 ? "" : `${and(names)} ${names.length === 1 ? one : many}`;
  const drop = points.filter((p) => p.uy < 0).map((p) => p.name);
  const rise = points.filter((p) => p.uy > 0).map((p) => p.name);
  return and([said(drop, "drops", "drop"), said(rise, "rises", "rise")].filter((w) => w !== ""));
}

function hingeSideWords(points: readonly Moved[]): string {
  if (points.length === 0) return "";
  return `${and(points.map((p) => p.name))} ${points.length === 1 ? "moves" : "move"} sideways`;
}

function foldWords(structure: Structure, points: readonly Moved[], turns: readonly Turn[]): string {
  const folds = structure.hinges.filter((hinge) => {
    const before = turns.find((t) => t.member === hinge.member && t.end === hinge.at);
    const after = turns.find((t) => t.member === hinge.member && t.begin === hinge.at);
    if (before === undefined || after === undefined) return false;
    return Math.abs(before.rotation - after.rotation) * Math.max(hinge.at, after.end - hinge.at) > still;
  });
  if (folds.length === 0) return "";
  const nouns = [...new Set(folds.map((h) => nounOf(structure, h.member)))];
  const moves = (name: string): boolean =>
    points.some((p) => p.name === name && Math.hypot(p.ux, p.uy) > still);
  const where = folds.every((h) => moves(h.name)) ? "there" : `at ${and(folds.map((h) => h.name))}`;
  return nouns.length === 1 ? `the ${nouns[0]} folds ${where}` : `the members fold ${where}`;
}

function isInColumn(structure: Structure, hinge: string): boolean {
  const found = structure.hinges.find((h) => h.name === hinge);
  return found !== undefined && nounOf(structure, found.member) === "column";
}

function nounOf(structure: Structure, member: string): string {
  return calledBy(axisOf(structure, memberNamed(structure, member, "motion")));
}
