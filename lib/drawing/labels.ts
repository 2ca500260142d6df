// Placing texts so that they cover neither each other nor the lines of the figure.

import {
  along,
  type Box,
  boxOf,
  distance,
  lengthInside,
  overlap,
  type Pt,
  type Segment,
  turned,
  union,
  unit,
} from "./geometry.ts";
import type { Label } from "./scene.ts";
import { textWidth } from "./text.ts";

export const TEXT_SIZE = 14;
const STEPS = [0, 1, -1, 2, -2, 3, -3, 4] as const;
const FARTHER = [0, 9, 20, 34, 52] as const;

export interface PlacedLabel {
  readonly label: Label;
  /** The place it was put to: the label's own or one of the others that would do. */
  readonly at: Pt;
  readonly box: Box;
  /** Farther from its place than a reader would connect by eye: to be tied to it by a thin line. */
  readonly tied: boolean;
}

interface Candidate extends PlacedLabel {
  readonly price: number;
}

function boxAt(label: Label, direction: Pt, gap: number): Box {
  const size = label.size ?? TEXT_SIZE;
  const width = textWidth(label.text, size);
  const height = size * 1.15;
  // The box is pushed out along the direction until it clears the point by the gap.
  const centre: Pt = [
    label.at[0] + direction[0] * (gap + width / 2),
    label.at[1] + direction[1] * (gap + height / 2),
  ];
  return boxOf([
    [centre[0] - width / 2, centre[1] - height / 2],
    [centre[0] + width / 2, centre[1] + height / 2],
  ]);
}

function candidates(label: Label): readonly Candidate[] {
  const places = [label, ...(label.instead ?? [])];
  return places.flatMap(({ at, prefer }, p) =>
    (label.fixed ? FARTHER.slice(0, 1) : FARTHER).flatMap((extra, ring) =>
      (label.fixed ? STEPS.slice(0, 1) : STEPS).map((step, i) => {
        const here = { ...label, at };
        const direction = turned(unit(prefer), (step * Math.PI) / 4);
        const box = boxAt(here, direction, label.gap + extra);
        return { label, at, box, tied: ring >= 2, price: p * (label.reluctance ?? 2.5) + i * 3 + ring * 9 };
      }),
    ),
  );
}

const grown = (box: Box, pad: number): Box => ({
  left: box.left - pad,
  top: box.top - pad,
  right: box.right + pad,
  bottom: box.bottom + pad,
});

function priceOf(candidate: Candidate, placed: readonly PlacedLabel[], blocks: readonly Segment[]): number {
  const airy = grown(candidate.box, 1.5);
  let price = candidate.price;
  for (const other of placed) {
    const shared = overlap(airy, other.box);
    if (shared > 0) price += 2000 + shared * 10;
  }
  for (const block of blocks) {
    const covered = touches(block, airy) ? lengthInside(block, airy) : 0;
    if (covered > 0) price += 25 + covered * 3;
  }
  return price;
}

const touches = ([a, b]: Segment, box: Box): boolean =>
  Math.max(a[0], b[0]) >= box.left &&
  Math.min(a[0], b[0]) <= box.right &&
  Math.max(a[1], b[1]) >= box.top &&
  Math.min(a[1], b[1]) <= box.bottom;

/** A label with its candidates, cheapest first, and the lines that any of them could touch. */
interface Task {
  readonly candidates: readonly Candidate[];
  readonly blocks: readonly Segment[];
}

function taskOf(label: Label, blocks: readonly Segment[]): Task {
  const all = [...candidates(label)].sort((p, q) => p.price - q.price);
  const reach = grown(union(all.map((c) => c.box)), 2);
  return { candidates: all, blocks: blocks.filter((block) => touches(block, reach)) };
}

function best(task: Task, placed: readonly PlacedLabel[]): PlacedLabel {
  let least: Candidate | undefined;
  let leastPrice = Number.POSITIVE_INFINITY;
  for (const candidate of task.candidates) {
    // From here on every candidate costs more by its place alone.
    if (candidate.price >= leastPrice) break;
    const price = priceOf(candidate, placed, task.blocks);
    if (price < leastPrice) [least, leastPrice] = [candidate, price];
  }
  if (least === undefined) throw new Error("figure: a label has no finite place");
  return { label: least.label, at: least.at, box: least.box, tied: least.tied };
}

/** Places for all labels, in their order: fixed ones first, then each where it costs least, then twice again with
 *  all the others in place. */
export function placeLabels(labels: readonly Label[], blocks: readonly Segment[]): readonly PlacedLabel[] {
  const order = [...labels.filter((l) => l.fixed), ...labels.filter((l) => !l.fixed)].filter(
    (l) => l.text !== "",
  );
  const tasks = order.map((label) => taskOf(label, blocks));
  const placed: PlacedLabel[] = [];
  for (const task of tasks) placed.push(best(task, placed));
  for (let round = 0; round < 2; round++) {
    tasks.forEach((task, i) => {
      placed[i] = best(
        task,
        placed.filter((_, j) => j !== i),
      );
    });
  }
  return placed;
}

/** More labels than this make a figure crowded. */
const MANY = 36;
/** A label of this rank and more is printed farther from its place, tied to it, rather than not at all. */
const GOVERNS = 3;

const collides = (placed: PlacedLabel, others: readonly PlacedLabel[]): boolean =>
  others.some((other) => overlap(placed.box, other.box) > 0);

/** Whether a label lies over so much of the lines that it is hard to read. */
function isCovering({ box }: PlacedLabel, blocks: readonly Segment[]): boolean {
  const height = box.bottom - box.top;
  const covered = blocks.reduce((sum, b) => sum + (touches(b, box) ? lengthInside(b, box) : 0), 0);
  return covered > height * 1.2;
}

/** Labels that have no rank, then the others by rank, each where there is still room. */
function placeByRank(labels: readonly Label[], blocks: readonly Segment[]): readonly PlacedLabel[] {
  const placed = [
    ...placeLabels(
      labels.filter(({ rank }) => rank === undefined),
      blocks,
    ),
  ];
  const ranked = labels.filter(({ rank, text }) => rank !== undefined && text !== "");
  for (const label of ranked.sort((a, b) => (b.rank ?? 0) - (a.rank ?? 0))) {
    const one = best(taskOf(label, blocks), placed);
    const isClear = (label.rank ?? 0) >= GOVERNS || !(one.tied || isCovering(one, blocks));
    if (isClear && !collides(one, placed)) placed.push(one);
  }
  return placed;
}

/** Places for all labels that must be printed and for as many of the others as find room, those of high rank first. */
export function placeWithin(labels: readonly Label[], blocks: readonly Segment[]): readonly PlacedLabel[] {
  if (labels.filter(({ text }) => text !== "").length > MANY) return placeByRank(labels, blocks);
  let kept = labels;
  for (;;) {
    const placed = placeLabels(kept, blocks);
    const hit = placed.filter((one) =>
      collides(
        one,
        placed.filter((other) => other !== one),
      ),
    );
    const ranked = hit.filter(({ label }) => label.rank !== undefined);
    if (ranked.length === 0) return placed;
    const lowest = ranked.reduce((a, b) => ((b.label.rank ?? 0) < (a.label.rank ?? 0) ? b : a));
    kept = kept.filter((label) => label !== lowest.label);
  }
}

/** Where the tie of a far label meets its box: the nearest point of the box to the label's place. */
export function tieOf({ at, box }: PlacedLabel): Segment {
  const near: Pt = [
    Math.min(Math.max(at[0], box.left), box.right),
    Math.min(Math.max(at[1], box.top), box.bottom),
  ];
  const direction = unit([near[0] - at[0], near[1] - at[1]]);
  const reach = distance(at, near);
  return [along(at, direction, Math.min(3, reach)), along(at, direction, Math.max(reach - 2, 0))];
}
