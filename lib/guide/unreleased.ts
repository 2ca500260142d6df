// Holding forces that results still contain: floors held against sway and not let go.

import { printValue, type Quantity, quantity } from "../quantity/index.ts";
import type { Ledger } from "../sheet/index.ts";
import { mergeSources } from "../structure/index.ts";
import type { GravitySet, Hand, HingeSet } from "./types.ts";
import { and, counted } from "./words.ts";

/** The sets whose holding forces none of the sets lets go; those that are nought need not be. */
function unreleasedSets(sets: readonly HingeSet[]): readonly HingeSet[] {
  const released = new Set(sets.flatMap(({ cases }) => cases.flatMap(({ releases }) => releases ?? [])));
  return sets.filter(({ name, holding = [] }) => holding.length > 0 && !released.has(name));
}

/** Says on the sheet that holding forces of these sets are not let go in results of them. */
export function queryUnreleased(ledger: Ledger, sets: readonly HingeSet[]): void {
  for (const set of unreleasedSets(sets)) {
    const { release } = set as HingeSet & Partial<Pick<GravitySet, "release">>;
    if (release === undefined) continue;
    const { holding = [] } = set;
    const forces = holding.map(({ joint, force }) => `${printValue(quantity(force, "force"))} at ${joint}`);
    ledger.query(
      `Results of ${sets.map(({ name }) => name).join(" + ")}: ${set.name} holds ${counted(holding.length, "floor")} against sway (${and(forces)}) and the holding forces are not let go here, so the sway they make is left out. ` +
        `Add load case ${release.key} by a lateral method or hinges of its own, or say why it does not matter.`,
      [release.entry],
    );
  }
}

/** The holding forces a hand result still contains, to the right on the structure, with the steps that found them. */
export function unreleasedForces(
  hand: Hand,
): readonly { readonly joint: string; readonly force: Quantity<"force"> }[] {
  const live = new Set(unreleasedSets(hand.solved.map(({ set }) => set)));
  const found = new Map<string, { readonly si: number; readonly from: readonly string[] }>();
  for (const { set, solution, entries } of hand.solved) {
    if (!live.has(set)) continue;
    for (const { joint } of set.holding ?? []) {
      const reaction = solution.reactions.find((one) => one.joint === joint);
      const step = reaction?.steps.x === undefined ? undefined : entries[reaction.steps.x];
      const before = found.get(joint) ?? { si: 0, from: [] };
      found.set(joint, {
        si: before.si + (reaction?.x ?? 0),
        from: mergeSources(before.from, step === undefined ? [] : [step]),
      });
    }
  }
  return [...found].map(([joint, { si, from }]) => ({ joint, force: quantity(si, "force", { from }) }));
}
