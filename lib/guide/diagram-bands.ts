// Where the true values lie along the members, for the diagrams.

import type { Wanted } from "../accuracy/index.ts";
import type { DiagramBand, ForceQuantity } from "../drawing/index.ts";
import { type Side, valueAt } from "../results/index.ts";
import type { MemberForces } from "../results/types.ts";
import type { BandBook } from "./band-book.ts";
import { triedOf } from "./tried.ts";
import type { Hand } from "./types.ts";

export interface DiagramBands {
  readonly bands: readonly DiagramBand[];
  /** For caption and description: what the lines are, or where the bands stand instead. */
  readonly words: string;
}

/** More members than this are drawn too small for lines beside the diagrams. */
const mostMembers = 7;
/** Parts of a member between places asked. */
const parts = 12;
const quantities: readonly ForceQuantity[] = ["N", "V", "M"];

/** Between what 90 % of the true values lie along every member of a small frame; where they all agree, no line is drawn. */
export function diagramBands(bands: BandBook, hand: Hand): DiagramBands {
  const none = { bands: [], words: "" };
  const sets = hand.solved.map(({ set }) => set);
  const taken = bands.taken(hand.frame, sets);
  if ("none" in taken) return none;
  if (hand.members.length > mostMembers)
    return { bands: [], words: "; the bands stand in the table of internal forces" };
  const lines = hand.members.flatMap((forces) => quantities.map((quantity) => placesOf(forces, quantity)));
  const asked = lines.flatMap(({ asked: own }) => own);
  const found = bands.raw(hand, asked);
  if (found === undefined) return none;
  let next = 0;
  const drawn = lines.flatMap(({ quantity, member, at }): DiagramBand[] => {
    const own = found.slice(next, next + at.length);
    next += at.length;
    const [low, high] = [own.map(({ truth }) => truth.low), own.map(({ truth }) => truth.high)];
    const size = Math.max(...[...low, ...high].map(Math.abs));
    const open = low.some((value, i) => (high[i] ?? value) - value > 1e-6 * size);
    return open ? [{ quantity, member, at, low, high }] : [];
  });
  if (drawn.length === 0) {
    const { single } = triedOf(taken);
    const words = single
      ? "; true values of the one frame tried stand in the tables"
      : "; the true values are the same in every frame tried";
    return { bands: [], words };
  }
  const words =
    "; dotted, where drawn: between these two lines lie 90 % of the true values, of the stiffnesses tried";
  return { bands: drawn, words };
}

interface Places {
  readonly quantity: ForceQuantity;
  readonly member: string;
  readonly at: readonly number[];
  readonly asked: readonly { readonly wanted: Wanted; readonly value: number }[];
}

/** Evenly along the member, and on both sides of every break of the function; at the ends alone where it is the same all along, as
 *  then it is in every frame under the same loads. */
function placesOf(forces: MemberForces, quantity: ForceQuantity): Places {
  const { member, length, [quantity]: f } = forces;
  const inside = f.breaks.filter((x) => x > 1e-9 * length && x < (1 - 1e-9) * length);
  const level = f.pieces.every(([, ...rest]) => rest.every((coefficient) => coefficient === 0));
  const steps = level ? 1 : parts;
  const even = Array.from({ length: steps + 1 }, (_, i) => (length * i) / steps);
  const plain = even.filter((x) => !inside.some((b) => Math.abs(b - x) <= 1e-9 * length));
  const places = [
    ...plain.map((x): readonly [number, Side] => [x, x === length ? "left" : "right"]),
    ...inside.flatMap((x): (readonly [number, Side])[] => [
      [x, "left"],
      [x, "right"],
    ]),
  ].sort(([a], [b]) => a - b);
  return {
    quantity,
    member,
    at: places.map(([x]) => x),
    asked: places.map(([x, side]) => ({
      wanted: { member, force: quantity, at: x, side },
      value: valueAt(f, x, side),
    })),
  };
}
