// Moment distribution: every joint balanced at once, half carried over, again and again.
// Source: H. Cross, Analysis of continuous frames by distributing fixed-end moments, Trans. ASCE 96 (1932), from memory.

import { balanceAll } from "./balance-joints.ts";
import { type EndMomentArray, farIsFree, heldMoments, type Net } from "./net.ts";

/** End moments after so many cycles; a cycle balances every joint, and between two cycles half of what was shared is carried to
 *  the far ends. Far ends free to turn count with three quarters of their stiffness and get nothing. One cycle is exact where only
 *  one joint turns. */
export function momentDistribution(net: Net, cycles: number): EndMomentArray {
  const m = heldMoments(net);
  const before = new Float64Array(m.length);
  for (let cycle = 0; cycle < cycles; cycle++) {
    if (cycle > 0) carryOver(net, m, before);
    before.set(m);
    balanceAll(net, m);
  }
  return m;
}

/** Adds half of what each end got since `before` to the other end. */
function carryOver({ members }: Net, m: EndMomentArray, before: EndMomentArray): void {
  members.forEach((member, i) => {
    const got = [0, 1].map((end) => (m[2 * i + end] ?? 0) - (before[2 * i + end] ?? 0));
    for (const end of [0, 1] as const)
      if (!farIsFree(member, end)) m[2 * i + 1 - end] = (m[2 * i + 1 - end] ?? 0) + (got[end] ?? 0) / 2;
  });
}
