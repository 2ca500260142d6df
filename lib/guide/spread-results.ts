// Which results a spread is about.

import type { Wanted } from "../accuracy/index.ts";
import { isQuantity, type Quantity, quantity } from "../quantity/index.ts";
import type { Ledger } from "../sheet/index.ts";
import { mergeSources } from "../structure/index.ts";
import { largestOf } from "./largest.ts";
import { isSameHand, type Origin, originOf } from "./origin.ts";
import type { SheetState } from "./sheet-state.ts";
import type { Hand } from "./types.ts";
import { and, lengthText } from "./words.ts";

export interface SpreadResult {
  /** Its symbol, or words. */
  readonly name: string;
  readonly description: string;
  readonly value: Quantity;
  readonly wanted: Wanted;
  /** The value over the hand result it is a multiple of. */
  readonly factor: number;
  /** The same of another hand, standing on `from` too. */
  readonly asked: (hand: Hand, from: readonly string[]) => Quantity;
  /** A value of it without the last binary digits where they are all there is. */
  readonly nought: (value: Quantity) => Quantity;
}

/** The results meant, otherwise the governing ones recorded from this hand. Throws on one that is none of this hand, and when there
 *  are none. */
export function spreadResults(
  ledger: Ledger,
  state: SheetState,
  hand: Hand,
  asked: readonly (string | Quantity)[] | undefined,
): readonly SpreadResult[] {
  const recorded = recordedFrom(ledger, state, hand);
  if (asked !== undefined && asked.length > 0)
    return asked.map((one) => meant(ledger, state, hand, one, recorded));
  const governing = recorded.filter(({ name }) => {
    const entry = ledger.entry(name);
    return entry?.kind === "result" && entry.governing;
  });
  if (governing.length === 0)
    throw new Error(
      `spread: no governing result of ${hand.name} is on the sheet; record some with { governing: true }, or say which: sheet.spread(hand, { results: [${
        recorded[0] === undefined ? 'hand.moment("BC", { at: "B" })' : `"${recorded[0].name}"`
      }] })`,
    );
  return governing;
}

/** Results of this hand on the sheet, in the order recorded. */
function recordedFrom(ledger: Ledger, { results }: SheetState, hand: Hand): readonly SpreadResult[] {
  return [...results].flatMap(([symbol, value]) => {
    const entry = ledger.entry(symbol);
    const known = originOf(value);
    const own = entry?.kind === "result" && known !== undefined && isSameHand(known.origin.hand, hand);
    return own ? [resultOf(symbol, entry.description, value)] : [];
  });
}

function meant(
  ledger: Ledger,
  { results }: SheetState,
  hand: Hand,
  one: string | Quantity,
  recorded: readonly SpreadResult[],
): SpreadResult {
  if (!isQuantity(one)) {
    const found = recorded.find(({ name }) => name === one);
    if (found !== undefined) return found;
    const known =
      recorded.length === 0 ? "none is recorded" : `recorded are ${and(recorded.map(({ name }) => name))}`;
    throw new Error(`spread: "${String(one)}" is no result of ${hand.name}; ${known}`);
  }
  const origin = originOf(one);
  if (origin === undefined || !isSameHand(origin.origin.hand, hand))
    throw new Error(
      `spread: ${String(one)} is no result of ${hand.name}; give what this hand answered, such as hand.moment("BC", { at: "B" })`,
    );
  const symbol = [...results].find(
    ([name, value]) =>
      originOf(value)?.origin === origin.origin &&
      value.si === one.si &&
      ledger.entry(name)?.kind === "result",
  )?.[0];
  const found = recorded.find(({ name }) => name === symbol);
  return found ?? resultOf(wordsOf(origin.origin.wanted), "", one);
}

function resultOf(name: string, description: string, value: Quantity): SpreadResult {
  const known = originOf(value);
  if (known === undefined) throw new Error(`spread: ${name} is no hand result`);
  const { origin, factor } = known;
  return Object.freeze({
    name,
    description,
    value,
    wanted: origin.wanted,
    factor,
    asked: (hand: Hand, from: readonly string[]) => {
      const found = askedOf(origin, hand);
      const own = quantity(found.si * factor, found.dimension, {
        unit: value.unit,
        from: mergeSources(found.from, from),
      });
      return withoutRounding(own, hand, factor);
    },
    nought: (found: Quantity) => withoutRounding(found, origin.hand, factor),
  });
}

/** What is nought but for the last binary digits, beside the largest of its kind, is printed as nought. */
function withoutRounding(value: Quantity, { members }: Hand, factor: number): Quantity {
  const largest = largestOf(members, value.dimension === "moment" ? "M" : "force") * Math.abs(factor);
  return Math.abs(value.si) <= 1e-9 * largest ? quantity(0, value.dimension, value) : value;
}

/** The result of a hand whose hinges were moved; one moved onto a held base leaves no moment there. */
function askedOf({ wanted, ask }: Origin, hand: Hand): Quantity {
  if ("member" in wanted || wanted.reaction !== "moment") return ask(hand);
  const moments = hand.solved.map(
    ({ solution }) => solution.reactions.find(({ joint }) => joint === wanted.joint)?.moment ?? 0,
  );
  return quantity(
    moments.reduce((a, b) => a + b, 0),
    "moment",
  );
}

/** "M of BC, 6.30 m from its start", "greatest M of BC", "reaction A, x". */
function wordsOf(wanted: Wanted): string {
  if (!("member" in wanted)) return `reaction ${wanted.joint}, ${wanted.reaction}`;
  const { member, force, at } = wanted;
  return typeof at === "number"
    ? `${force} of ${member}, ${lengthText(at)} from its start`
    : `${at} ${force} of ${member}`;
}
