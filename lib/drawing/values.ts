// The values printed on diagrams, ranked by how much they matter.

import { type DrawnForce, isTruss } from "./drawn-force.ts";
import { extentOf } from "./extent.ts";
import { along, distance, type Pt, times } from "./geometry.ts";
import { type MemberLine, memberLine } from "./members.ts";
import { disc, type Label, merge, PENS, type Scene, scene } from "./scene.ts";
import type { DiagramMark } from "./spec.ts";

/** How much a mark matters, for figures that have no room for all: first the frame's greatest and least value, then each
 *  member's own greatest, then by size; what a value is compared with is the frame's greatest. */
function rankOf(mark: DiagramMark, all: readonly DiagramMark[]): number {
  const greatest = Math.max(...all.map((m) => Math.abs(m.value)), Number.MIN_VALUE);
  const share = Math.abs(mark.value) / greatest;
  const governs = (list: readonly DiagramMark[]): boolean =>
    list.every((m) => m.value <= mark.value) || list.every((m) => m.value >= mark.value);
  if (mark.kind !== "zero" && governs(all)) return 3 + share;
  const own = all.filter((m) => m.member === mark.member);
  if (own.every((m) => Math.abs(m.value) <= Math.abs(mark.value))) return 2 + share;
  return (mark.kind === "zero" ? 0 : 1) + share;
}

/** The marks of a diagram as labels and, for zeros, dots. */
export function values(drawing: DrawnForce): Scene {
  const { spec, quantity, scale, gain } = drawing;
  const own = spec.marks.filter((mark) => mark.quantity === quantity);
  const { size } = extentOf(spec.structure);
  const shown: { readonly base: Pt; readonly text: string }[] = [];
  return merge(
    ...own.map((mark) => {
      const on = memberLine(spec.structure, mark.member, scale);
      const base = on.page(mark.at);
      // Two members give the same moment at the corner they share: printed once.
      if (shown.some((s) => s.text === mark.text && distance(s.base, base) < 3)) return scene([]);
      shown.push({ base, text: mark.text });
      const theirs = spec.forces.find((f) => f.member === mark.member);
      const { shapes, labels } =
        theirs && isTruss(drawing, theirs) ? barMark(mark, on) : markScene(mark, on, gain);
      return scene(
        shapes,
        labels.map((label) => ({ size, ...label, rank: rankOf(mark, own) })),
      );
    }),
  );
}

/** The force of a bar beside the middle of its line. */
function barMark(mark: DiagramMark, on: MemberLine): Scene {
  const away = times(on.fibre, -1);
  const middle = on.page(on.length / 2);
  const thirds = [1 / 3, 2 / 3].map((t) => on.page(on.length * t));
  const instead = [middle, ...thirds].flatMap((at) => [
    { at, prefer: away },
    { at, prefer: on.fibre },
  ]);
  return scene([], [{ text: mark.text, at: middle, prefer: on.fibre, gap: 4, instead }]);
}

function markScene(mark: DiagramMark, on: MemberLine, gain: number): Scene {
  const base = on.page(mark.at);
  if (mark.kind === "zero") {
    const label: Label = { text: mark.text, at: base, prefer: times(on.fibre, -1), gap: 5, size: 13 };
    return scene([disc(base, 2.6, PENS.load, true)], [label]);
  }
  const offset = mark.value * gain;
  const label: Label = {
    text: mark.text,
    at: along(base, on.fibre, offset),
    prefer: times(on.fibre, offset < 0 ? -1 : 1),
    gap: 5,
  };
  return scene([], [label]);
}
