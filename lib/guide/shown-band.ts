// A band as the record keeps it: its numbers with the units and figures of the value beside it.

import type { Band } from "../accuracy/index.ts";
import { printValue, type Quantity, quantity } from "../quantity/index.ts";
import type { MemberForces } from "../results/types.ts";
import { type ResultBand, type ShownValue, shownValue } from "../sheet/index.ts";
import { largestOf } from "./largest.ts";
import type { Tried } from "./tried.ts";

const four = ["low", "high", "least", "greatest"] as const;
type Four = Readonly<Record<(typeof four)[number], number>>;

/** The band of a value that is `factor` times the hand result the band was made for. What is nought beside the largest force
 *  of its kind is shown as nought. */
export function shownBand(
  { measure, truth, spread, bias }: Band,
  value: Quantity,
  factor: number,
  {
    members,
    uses,
    tried,
  }: {
    readonly members: readonly MemberForces[];
    readonly uses: readonly string[];
    readonly tried: Tried;
  },
): ResultBand {
  const nought = 1e-9 * Math.abs(factor) * largestOf(members, value.dimension === "moment" ? "M" : "force");
  const clean = (si: number): number => (Math.abs(si) <= nought ? 0 : si);
  const shown = (si: number): ShownValue => shownValue(quantity(clean(si), value.dimension, value));
  const lies = turned(truth, factor);
  const ratio = measure === "ratio";
  const against = ratio ? plain(spread) : mapped(turned(spread, factor), clean);
  const bare = quantity(clean(bias * factor), value.dimension, value);
  return Object.freeze({
    low: shown(lies.low),
    high: shown(lies.high),
    least: shown(lies.least),
    greatest: shown(lies.greatest),
    measure,
    against: Object.freeze(against),
    bias: ratio
      ? percent(bias)
      : Object.freeze({ ...shownValue(bare), text: signed(printValue(bare), bare.si) }),
    ...(tried.single ? { single: true as const } : {}),
    words: tried.words,
    uses,
  });
}

const plain = ({ low, high, least, greatest }: Four): Four => ({ low, high, least, greatest });

function mapped(of: Four, by: (si: number) => number): Four {
  const { low, high, least, greatest } = of;
  return { low: by(low), high: by(high), least: by(least), greatest: by(greatest) };
}

/** Multiplied; a negative factor turns the order round. */
function turned({ low, high, least, greatest }: Four, factor: number): Four {
  const by = (si: number): number => si * factor;
  return factor < 0
    ? { low: by(high), high: by(low), least: by(greatest), greatest: by(least) }
    : { low: by(low), high: by(high), least: by(least), greatest: by(greatest) };
}

function percent(share: number): ShownValue {
  const size = Math.abs(share * 100);
  const rounded = size.toFixed(size < 0.95 ? 1 : 0);
  const text = Number(rounded) === 0 ? "0 %" : `${share < 0 ? "−" : "+"}${rounded} %`;
  return Object.freeze({ si: share, dimension: "pure number", unit: "", text });
}

const signed = (text: string, si: number): string => (si > 0 ? `+${text}` : text);
