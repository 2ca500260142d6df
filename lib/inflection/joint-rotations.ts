// Gravity on building frames by the turns of the joints, guessed and once corrected. Slope-deflection (G. A. Maney 1915, from
// memory) with k = EI/L, U the sum of the fixed-end moments at a joint:
//   guess        θ0 = -U / (4 Σ k_beam + 6 Σ k_column)     the neighbours above and below turn alike; 4 to a held base, 3 to a
//                                                           base free to turn instead of 6. The guess is our own.
//   once more    θ  = (-U - 2 Σ k θ0_far) / (4 Σ k)          3 k where the far end is free to turn
//   ends         m  = fixed + k (4 θ + 2 θ_far)
// and what is left at a joint is shared by stiffness.

import { balanceAll } from "./balance-joints.ts";
import { type EndMomentArray, endStiffness, farIsFree, heldMoments, type Net, unbalanced } from "./net.ts";

/** End moments on all members from joint turns after so many corrections of the guess; joints do not move. */
export function jointRotations(net: Net, passes = 1): EndMomentArray {
  const { members, joints } = net;
  const fixed = heldMoments(net);
  const U = joints.map((joint) => unbalanced(joint, fixed));
  let turns = joints.map((joint, j) =>
    joint.held || guess(net, j) === 0 ? 0 : -(U[j] ?? 0) / guess(net, j),
  );
  for (let pass = 0; pass < passes; pass++) turns = corrected(net, U, turns);
  const m = fixed.slice();
  members.forEach((member, i) => {
    const [a, b] = [turns[member.start] ?? 0, turns[member.end] ?? 0];
    if (!member.freeStart)
      m[2 * i] = (m[2 * i] ?? 0) + endStiffness(member, 0) * a + (member.freeEnd ? 0 : 2 * member.k * b);
    if (!member.freeEnd)
      m[2 * i + 1] =
        (m[2 * i + 1] ?? 0) + endStiffness(member, 1) * b + (member.freeStart ? 0 : 2 * member.k * a);
  });
  balanceAll(net, m);
  return m;
}

/** 4 Σ k_beam + 6 Σ k_column, with 4 or 3 for columns to bases. */
function guess({ members, joints }: Net, j: number): number {
  return (joints[j]?.ends ?? []).reduce((sum, { member, end, far }) => {
    const found = members[member];
    if (found === undefined) return sum;
    const storey = found.column && !farIsFree(found, end) && joints[far]?.held !== true;
    return sum + (storey ? 6 * found.k : endStiffness(found, end));
  }, 0);
}

function corrected({ members, joints }: Net, U: readonly number[], turns: readonly number[]): number[] {
  return joints.map((joint, j) => {
    if (joint.held || joint.ends.length === 0) return 0;
    let [rest, stiff] = [-(U[j] ?? 0), 0];
    for (const { member, end, far } of joint.ends) {
      const found = members[member];
      if (found === undefined) continue;
      stiff += endStiffness(found, end);
      if (!farIsFree(found, end)) rest -= 2 * found.k * (turns[far] ?? 0);
    }
    return stiff === 0 ? 0 : rest / stiff;
  });
}
