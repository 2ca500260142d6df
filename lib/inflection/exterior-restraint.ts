// Gravity on building frames, one formula per joint. The form M = FEM S / (S + b k) is the restraint of a beam end by the columns
// that frame in; the constants 0.9, 0.4 and 1.5 are our own, chosen on random frames and confirmed on fresh ones.
//   S     sum of w k over the columns at an outer joint, k = EI/h: w = 1.5 to a storey that turns too, 1 to a held base,
//         0.75 to a base free to turn
//   outer end          M = FEM S / (S + 0.9 k_beam)                  (0.5 k_beam in a single bay)
//   first inner end    FEM + 0.4 (FEM - M)
//   other ends         FEM
// then every inner joint is balanced once by stiffness, and what the beams leave is shared over the columns.

import { balanceOne, shareOverColumns } from "./balance-joints.ts";
import { lineBeams } from "./beam-lines.ts";
import { type EndMomentArray, farIsFree, heldMoments, type Net } from "./net.ts";

const beamShare = { single: 0.5, several: 0.9 } as const;
const carried = 0.4;
const storeyBeyond = 1.5;

/** End moments on all members by one restraint formula per joint; for regular frames under gravity, without sway. */
export function exteriorRestraint(net: Net): EndMomentArray {
  const { members, joints } = net;
  const fixed = heldMoments(net);
  const m = fixed.slice();
  const inner = new Set<number>();
  for (const { member: i, alone, ...places } of lineBeams(net)) {
    const beam = members[i];
    if (beam === undefined) continue;
    for (const [end, place] of [
      [0, places.start],
      [1, places.end],
    ] as const) {
      const joint = end === 0 ? beam.start : beam.end;
      if (place !== "outer") inner.add(joint);
      else if (!(end === 0 ? beam.freeStart : beam.freeEnd) && joints[joint]?.held !== true) {
        const S = columnRestraint(net, joint);
        const kept = S / (S + (alone ? beamShare.single : beamShare.several) * beam.k);
        const lost = outOfBalance(net, joint, fixed) * (1 - kept);
        m[2 * i + end] = (m[2 * i + end] ?? 0) - lost;
        if (!alone) m[2 * i + 1 - end] = (m[2 * i + 1 - end] ?? 0) - carried * lost;
      }
    }
  }
  for (const j of inner) {
    const joint = joints[j];
    if (joint !== undefined && !joint.held) balanceOne(members, joint, m);
  }
  shareOverColumns(net, m);
  return m;
}

/** What the beam and the overhangs of an outer joint bring it. */
function outOfBalance({ members, joints }: Net, joint: number, m: EndMomentArray): number {
  const at = joints[joint];
  return (at?.ends ?? []).reduce(
    (sum, { member, end }) =>
      members[member]?.column === true && members[member]?.overhang !== true
        ? sum
        : sum + (m[2 * member + end] ?? 0),
    -(at?.couple ?? 0),
  );
}

/** Weighted stiffness of the columns at a joint. */
function columnRestraint({ members, joints }: Net, joint: number): number {
  return (joints[joint]?.ends ?? []).reduce((sum, { member, end, far }) => {
    const column = members[member];
    if (column?.column !== true || column.overhang) return sum;
    const weight = farIsFree(column, end) ? 0.75 : joints[far]?.held === true ? 1 : storeyBeyond;
    return sum + weight * column.k;
  }, 0);
}
