// Placing texts so that they cover neither each other nor the lines of the figure.

import {
  along,
  type Box,
  distance,
  lengthInside,
  overlap,
  type Pt,
  type Segment,
  touches,
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

/** One way to put a label: at which of its places, how far out, on which side, and what that costs by itself. */
interface Choice {
  readonly place: number;
  readonly ring: number;
  readonly step: number;
  readonly price: number;
}

const orders = new Map<string, readonly Choice[]>();

/** All choices for a label, the cheapest first. */
function choicesOf(label: Label): readonly Choice[] {
  const places = 1 + (label.instead?.length ?? 0);
  const { reluctance = 2.5, fixed = false } = label;
  const key = `${places} ${reluctance} ${fixed}`;
  const known = orders.get(key);
  if (known !== undefined) return known;
  const [rings, steps] = fixed ? [1, 1] : [FARTHER.length, STEPS.length];
  const found = Array.from({ length: places }, (_, place) =>
    Array.from({ length: rings }, (_, ring) =>
      Array.from({ length: steps }, (_, step) => {
        return { place, ring, step, price: place * reluctance + step * 3 + ring * 9 };
      }),
    ),
  );
  const sorted = found.flat(2).sort((p, q) => p.price - q.price);
  orders.set(key, sorted);
  return sorted;
}

/** A label that is being placed: where it could go, and the lines that it could touch there. */
interface Task {
  readonly label: Label;
  readonly width: number;
  readonly height: number;
  readonly choices: readonly Choice[];
  /** Of each choice, as far as it was looked at: most labels take one of the first. */
  readonly candidates: (PlacedLabel | undefined)[];
  readonly blocks: readonly Segment[];
}

function taskOf(label: Label, blocks: readonly Segment[]): Task {
  const size = label.size ?? TEXT_SIZE;
  const [width, height] = [textWidth(label.text, size), size * 1.15];
  const farthest = label.gap + (label.fixed ? 0 : Math.max(...FARTHER));
  const [x, y] = [farthest + width + 2, farthest + height + 2];
  const reach = union(
    [label, ...(label.instead ?? [])].map(({ at: [left, top] }) => {
      return { left: left - x, top: top - y, right: left + x, bottom: top + y };
    }),
  );
  const near = blocks.filter((block) => touches(block, reach));
  return { label, width, height, choices: choicesOf(label), candidates: [], blocks: near };
}

function put({ label, width, height }: Task, { place, ring, step }: Choice): PlacedLabel {
  const { at, prefer } = place === 0 ? label : (label.instead?.[place - 1] ?? label);
  const direction = turned(unit(prefer), ((STEPS[step] ?? 0) * Math.PI) / 4);
  const gap = label.gap + (FARTHER[ring] ?? 0);
  // The box is pushed out along the direction until it clears the point by the gap.
  const x = at[0] + direction[0] * (gap + width / 2);
  const y = at[1] + direction[1] * (gap + height / 2);
  const box = { left: x - width / 2, top: y - height / 2, right: x + width / 2, bottom: y + height / 2 };
  return { label, at, box, tied: ring >= 2 };
}

const grown = (box: Box, pad: number): Box => ({
  left: box.left - pad,
  top: box.top - pad,
  right: box.right + pad,
  bottom: box.bottom + pad,
});

/** What a label costs where it is put: the place's own price, and more for each label and line it covers. */
function priceOf(
  own: number,
  { box }: PlacedLabel,
  placed: readonly PlacedLabel[],
  blocks: readonly Segment[],
): number {
  const airy = grown(box, 1.5);
  let price = own;
  for (const other of placed) {
    const shared = overlap(airy, other.box);
    if (shared > 0) price += 2000 + shared * 10;
  }
  for (const block of blocks) {
    const covered = lengthInside(block, airy);
    if (covered > 0) price += 25 + covered * 3;
  }
  return price;
}

function best(task: Task, placed: readonly PlacedLabel[]): PlacedLabel {
  let least: PlacedLabel | undefined;
  let leastPrice = Number.POSITIVE_INFINITY;
  for (const [i, choice] of task.choices.entries()) {
    // From here on every choice costs more by its place alone.
    if (choice.price >= leastPrice) break;
    task.candidates[i] ??= put(task, choice);
    const candidate = task.candidates[i];
    const price = priceOf(choice.price, candidate, placed, task.blocks);
    if (price < leastPrice) [least, leastPrice] = [candidate, price];
  }
  if (least === undefined) throw new Error("figure: a label has no finite place");
  return least;
}

const isPrinted = ({ text }: Label): boolean => text !== "";

/** In their order: fixed ones first, then each where it costs least, then twice again with all the others in place. */
function placeTasks(tasks: readonly Task[]): readonly PlacedLabel[] {
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

function tasksOf(labels: readonly Label[], blocks: readonly Segment[]): readonly Task[] {
  const order = [...labels.filter((l) => l.fixed), ...labels.filter((l) => !l.fixed)];
  return order.filter(isPrinted).map((label) => taskOf(label, blocks));
}

/** Places for all labels. */
export const placeLabels = (labels: readonly Label[], blocks: readonly Segment[]): readonly PlacedLabel[] =>
  placeTasks(tasksOf(labels, blocks));

/** More labels than this make a figure crowded. */
const MANY = 36;
/** A label of this rank and more is printed farther from its place, tied to it, rather than not at all. */
const GOVERNS = 3;

const collides = (placed: PlacedLabel, others: readonly PlacedLabel[]): boolean =>
  others.some((other) => overlap(placed.box, other.box) > 0);

/** Whether a label lies over so much of the lines that it is hard to read. */
function isCovering({ box }: PlacedLabel, blocks: readonly Segment[]): boolean {
  const height = box.bottom - box.top;
  const covered = blocks.reduce((sum, b) => sum + lengthInside(b, box), 0);
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
  if (labels.filter(isPrinted).length > MANY) return placeByRank(labels, blocks);
  let kept = tasksOf(labels, blocks);
  for (;;) {
    const placed = placeTasks(kept);
    const hit = placed.filter((one) =>
      collides(
        one,
        placed.filter((other) => other !== one),
      ),
    );
    const ranked = hit.filter(({ label }) => label.rank !== undefined);
    if (ranked.length === 0) return placed;
    const lowest = ranked.reduce((a, b) => ((b.label.rank ?? 0) < (a.label.rank ?? 0) ? b : a));
    kept = kept.filter(({ label }) => label !== lowest.label);
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
