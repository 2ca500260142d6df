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
        return { label, at, box, tied: ring >= 2, price: p * (label.fixed ? 4 : 14) + i * 3 + ring * 9 };
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
    const covered = lengthInside(block, airy);
    if (covered > 0) price += 25 + covered * 3;
  }
  return price;
}

function best(label: Label, placed: readonly PlacedLabel[], blocks: readonly Segment[]): PlacedLabel {
  const priced = candidates(label).map((c) => ({ c, price: priceOf(c, placed, blocks) }));
  const { c } = priced.reduce((least, next) => (next.price < least.price ? next : least));
  return { label: c.label, at: c.at, box: c.box, tied: c.tied };
}

/** Places for all labels, in their order: fixed ones first, then each where it costs least, then twice again with
 *  all the others in place. */
export function placeLabels(labels: readonly Label[], blocks: readonly Segment[]): readonly PlacedLabel[] {
  const order = [...labels.filter((l) => l.fixed), ...labels.filter((l) => !l.fixed)].filter(
    (l) => l.text !== "",
  );
  const placed: PlacedLabel[] = [];
  for (const label of order) placed.push(best(label, placed, blocks));
  for (let round = 0; round < 2; round++) {
    for (let i = 0; i < placed.length; i++) {
      const { label } = placed[i] as PlacedLabel;
      placed[i] = best(
        label,
        placed.filter((_, j) => j !== i),
        blocks,
      );
    }
  }
  return placed;
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
