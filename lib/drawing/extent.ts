// How much room a figure takes: a frame of many bays and storeys gets a wider page and lower loads than a beam.

import type { Structure } from "../structure/index.ts";
import { TEXT_SIZE } from "./labels.ts";
import type { Scale } from "./scale.ts";
import { PAGE_WIDTH } from "./scale.ts";

/** Widest page of any figure; figures wider than `PAGE_WIDTH` are not shrunk to a telephone but moved in a frame. */
const WIDEST = 760;
/** Page units that the values of one bay, one span of a beam, one panel of a truss take. */
const PER_BAY = 125;
const PER_SPAN = 100;
const PER_PANEL = 75;
const PER_STOREY = 74;
const AROUND = 160;

/** The different values among numbers, ascending, told apart at a thousandth of their range. */
function levels(values: readonly number[]): readonly number[] {
  const sorted = [...values].sort((a, b) => a - b);
  const fine = 1e-3 * ((sorted.at(-1) ?? 0) - (sorted[0] ?? 0));
  return sorted.filter((v, i) => i === 0 || v - (sorted[i - 1] ?? 0) > fine);
}

const isBarsOnly = ({ members }: Structure): boolean =>
  members.every(({ releases }) => releases.start.moment && releases.end.moment);

export interface Extent {
  /** Greatest width of the figure. */
  readonly page: number;
  /** Size of the texts there are many of: values and names. A wide figure is shown at full size, so smaller ones are read. */
  readonly size: number;
  /** Greatest height of the skeleton; `least` is what a figure with few storeys may take. */
  readonly tallest: (least: number) => number;
}

export function extentOf(structure: Structure): Extent {
  const bays = levels(structure.joints.map((j) => j.x)).length - 1;
  const storeys = levels(structure.joints.map((j) => j.y)).length - 1;
  const wanted =
    storeys === 0
      ? AROUND / 2 + bays * PER_SPAN
      : AROUND + bays * (isBarsOnly(structure) ? PER_PANEL : PER_BAY);
  const page = Math.min(WIDEST, Math.max(PAGE_WIDTH, wanted));
  return {
    page,
    size: page > PAGE_WIDTH ? 12 : TEXT_SIZE,
    tallest: (least) => Math.max(least, storeys > 2 ? storeys * PER_STOREY : 0),
  };
}

/** Page units between the two nearest levels that have others above them; endless for a single storey. */
export function leastStorey(structure: Structure, scale: Scale): number {
  const heights = levels(structure.joints.map((j) => j.y));
  if (heights.length < 3) return Number.POSITIVE_INFINITY;
  return scale.k * Math.min(...heights.slice(1).map((y, i) => y - (heights[i] ?? y)));
}
