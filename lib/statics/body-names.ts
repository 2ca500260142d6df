// What an engineer would call a body: "beam between h1 and h2", "column AB with beam to h1", "knee B from h1 to h2", "joint B".

import type { Piece } from "../results/index.ts";
import { axisOf, calledBy, memberNamed, pointOn, type Structure } from "../structure/index.ts";
import type { Body } from "./bodies.ts";
import { and } from "./words.ts";

/** Names for all bodies, each unique. */
export function bodyNames(structure: Structure, bodies: readonly Body[]): readonly string[] {
  const taken = new Set<string>();
  return bodies.map((body) => {
    const plain = nameOf(structure, body);
    let name = plain;
    if (taken.has(name)) name = `${plain}, cut at its joints`;
    for (let n = 2; taken.has(name); n++) name = `${plain} (${n})`;
    taken.add(name);
    return name;
  });
}

interface Stretch {
  readonly noun: "beam" | "column" | "member";
  readonly member: string;
  /** Names of the points it runs between, start first. */
  readonly ends: readonly [string, string];
  readonly whole: boolean;
  /** Middle of it, for the order of words. */
  readonly x: number;
}

function nameOf(structure: Structure, body: Body): string {
  const stretches = body.pieces.map((piece) => stretchOf(structure, piece));
  const [first] = stretches;
  if (first === undefined) return `joint ${body.joints.join(" ")}`;
  if (stretches.length === 1) return first.whole ? `${first.noun} ${first.member}` : single(structure, first);
  const line = straightLine(stretches);
  if (line !== undefined) return line;
  const whole = stretches.filter((s) => s.whole);
  const parts = stretches.filter((s) => !s.whole);
  if (whole.length === 0) return kneeName(structure, body, parts);
  const wholes = grouped(whole, (s) => s.member);
  if (parts.length === 0) return wholes;
  return `${wholes} with ${grouped(parts, (s) => `to ${freeEnds(structure, s).join(" and ")}`)}`;
}

function stretchOf(structure: Structure, { member, begin, end }: Piece): Stretch {
  const found = memberNamed(structure, member, "body");
  const axis = axisOf(structure, found);
  const hingeAt = (at: number): string | undefined =>
    structure.hinges.find((h) => h.member === member && h.at === at)?.name;
  const ends = [hingeAt(begin) ?? found.start, hingeAt(end) ?? found.end] as const;
  const whole = ends[0] === found.start && ends[1] === found.end;
  return { noun: calledBy(axis), member, ends, whole, x: pointOn(axis, (begin + end) / 2)[0] };
}

function single(structure: Structure, { noun, ends }: Stretch): string {
  const bothHinges = ends.every((name) => structure.hinges.some((h) => h.name === name));
  return bothHinges ? `${noun} between ${ends[0]} and ${ends[1]}` : `${noun} from ${ends[0]} to ${ends[1]}`;
}

/** Stretches that follow one another in one line of beams or columns. */
function straightLine(stretches: readonly Stretch[]): string | undefined {
  const noun = stretches[0]?.noun;
  const follows = stretches.every((s, i) => i === 0 || stretches[i - 1]?.ends[1] === s.ends[0]);
  if (!follows || stretches.some((s) => s.noun !== noun) || noun === "member") return undefined;
  return `${noun} from ${stretches[0]?.ends[0]} to ${stretches[stretches.length - 1]?.ends[1]}`;
}

function kneeName(structure: Structure, body: Body, parts: readonly Stretch[]): string {
  const ends = parts.flatMap((part) => freeEnds(structure, part));
  const to = ends.length === 2 ? `from ${ends[0]} to ${ends[1]}` : `with arms to ${and(ends)}`;
  return `${parts.length === 2 ? "knee" : "joint"} ${and(body.joints)} ${to}`;
}

/** The ends of a stretch that are hinges. */
function freeEnds(structure: Structure, { ends }: Stretch): readonly string[] {
  return ends.filter((name) => structure.hinges.some((h) => h.name === name));
}

/** "columns AB and CD", "column AB and beam BC", "beams to h1 and to h2". */
function grouped(stretches: readonly Stretch[], say: (s: Stretch) => string): string {
  const nouns = [...new Set(stretches.map((s) => s.noun))];
  return and(
    nouns.map((noun) => {
      const own = stretches.filter((s) => s.noun === noun);
      return `${noun}${own.length === 1 ? "" : "s"} ${and(own.map(say))}`;
    }),
  );
}
