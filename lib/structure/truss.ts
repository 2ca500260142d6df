// Parallel trusses: panels between two chords, single or crossed diagonals, all bars pinned at both ends.

import { type Measure, type Quantity, quantity } from "../quantity/index.ts";
import { assemble } from "./assemble.ts";
import { StructureError } from "./faults.ts";
import { positiveLength } from "./lengths.ts";
import { plainMember } from "./plain-member.ts";
import { type Sections, withSections } from "./section.ts";
import { mergeSources } from "./sources.ts";
import { heldCount, type SupportChoice, support } from "./support.ts";
import type { Joint, Member, Structure } from "./types.ts";

/** How the diagonals run, seen from the left: all rising, all falling, turned at midspan so that they fall or rise
 *  towards it, zigzag (rising first), or crossed in every panel. */
export type Diagonals =
  | "rising"
  | "falling"
  | "falling to midspan"
  | "rising to midspan"
  | "zigzag"
  | "crossed";

export interface TrussOptions {
  /** Panel lengths, left to right. */
  readonly panels: readonly Measure<"length">[];
  /** Between the chords. */
  readonly depth: Measure<"length">;
  readonly diagonals: Diagonals;
  /** Supports by joint; otherwise pinned at the left end of the bottom chord and a roller at its right end. */
  readonly supports?: Readonly<Record<string, SupportChoice>>;
  /** By member, for the groups "bottom chord", "top chord", "verticals", "diagonals", or for "all". */
  readonly sections?: Sections;
}

/** A truss with joints L0, L1 ... along the bottom chord and U0, U1 ... along the top, and bars named by them (L0L1, L0U1). */
export function truss(options: TrussOptions): Structure {
  const joints = chordJoints(options);
  const count = options.panels.length;
  const bars = [...chords(count), ...verticals(count), ...diagonalBars(count, options.diagonals)];
  const supports = options.supports ?? { L0: "pinned", [`L${count}`]: "roller" };
  const held = Object.entries(supports).map(([joint, choice]) => support(joint, choice));
  const plain = assemble({
    family: "general",
    form: "truss",
    joints,
    members: bars,
    supports: held.filter((s) => heldCount(s) > 0),
    hinges: [],
  });
  return withSections(plain, options.sections ?? {});
}

/** Joints of two parallel chords over the same panels, from (0, `base`); the lower ones first. */
export function chordJoints(
  { panels, depth }: Pick<TrussOptions, "panels" | "depth">,
  base: Quantity<"length"> = quantity(0, "length"),
): readonly Joint[] {
  if (panels.length === 0)
    throw new StructureError({ kind: "wrong number", what: "panels", wanted: 1, got: 0 });
  const lengths = panels.map((panel, i) => positiveLength(panel, `panel ${i + 1}`));
  const height = positiveLength(depth, "depth");
  const upper = base.plus(height);
  return (["L", "U"] as const).flatMap((letter) =>
    Array.from({ length: panels.length + 1 }, (_, i): Joint => {
      const before = lengths.slice(0, i);
      const y = letter === "L" ? base : upper;
      const fromX = mergeSources(...before.map((l) => l.from));
      return {
        name: `${letter}${i}`,
        x: before.reduce((x, l) => x + l.si, 0),
        y: y.si,
        fromX,
        fromY: y.from,
        from: mergeSources(fromX, y.from),
      };
    }),
  );
}

/** Chord bars, bottom then top, left to right. */
export function chords(count: number, pinned = true): readonly Member[] {
  return (["L", "U"] as const).flatMap((letter) =>
    Array.from({ length: count }, (_, i) =>
      plainMember(`${letter}${i}`, `${letter}${i + 1}`, {
        group: letter === "L" ? "bottom chord" : "top chord",
        pinned,
      }),
    ),
  );
}

/** Vertical bars from the bottom chord up. */
export function verticals(count: number, pinned = true): readonly Member[] {
  return Array.from({ length: count + 1 }, (_, i) =>
    plainMember(`L${i}`, `U${i}`, { group: "verticals", pinned }),
  );
}

/** Diagonal bars, left to right. */
export function diagonalBars(count: number, kind: Diagonals): readonly Member[] {
  const rules: Readonly<Record<Diagonals, (i: number) => readonly ("up" | "down")[]>> = {
    rising: () => ["up"],
    falling: () => ["down"],
    "falling to midspan": (i) => [i < count / 2 ? "down" : "up"],
    "rising to midspan": (i) => [i < count / 2 ? "up" : "down"],
    zigzag: (i) => [i % 2 === 0 ? "up" : "down"],
    crossed: () => ["up", "down"],
  };
  if (!Object.hasOwn(rules, kind))
    throw new StructureError({
      kind: "unknown choice",
      what: "diagonals",
      value: String(kind),
      choices: Object.keys(rules),
    });
  return Array.from({ length: count }, (_, i) => i).flatMap((i) =>
    rules[kind](i).map((way) => {
      const [start, end] = way === "up" ? [`L${i}`, `U${i + 1}`] : [`U${i}`, `L${i + 1}`];
      return plainMember(start, end, { group: "diagonals", pinned: true });
    }),
  );
}
