// Resultants of line loads over a stretch of a member.

import { integralOver, type MemberLoads, piecewise, product } from "../results/index.ts";

/** Along and across resultants in N, and the moment of the across part about `begin`, clockwise, N·m. */
export function resultantsOn(
  own: MemberLoads,
  begin: number,
  end: number,
): { readonly along: number; readonly across: number; readonly moment: number } {
  const lever = piecewise([0, own.length], [[-begin, 1]]);
  return {
    along: integralOver(own.along, begin, end),
    across: integralOver(own.across, begin, end),
    moment: integralOver(product(own.across, lever), begin, end),
  };
}
