// Balancing joints: what is out of balance shared over the members that meet.

import {
  type EndMomentArray,
  endStiffness,
  type Net,
  type NetJoint,
  type NetMember,
  unbalanced,
} from "./net.ts";

/** Shares what is out of balance at every joint that turns over its members by their stiffness, once, without carrying over.
 *  Changes `m`. */
export function balanceAll(net: Net, m: EndMomentArray): void {
  for (const joint of net.joints) if (!joint.held) balanceOne(net.members, joint, m);
}

/** The same at one joint; `among` picks the members that take part. */
export function balanceOne(
  members: readonly NetMember[],
  joint: NetJoint,
  m: EndMomentArray,
  among: (member: NetMember) => boolean = () => true,
): void {
  const rest = unbalanced(joint, m);
  const stiff = ({ member, end }: NetJoint["ends"][number]): number => {
    const found = members[member];
    return found !== undefined && among(found) ? endStiffness(found, end) : 0;
  };
  const sum = joint.ends.reduce((total, end) => total + stiff(end), 0);
  if (sum === 0) return;
  for (const end of joint.ends) {
    const at = 2 * end.member + end.end;
    m[at] = (m[at] ?? 0) - (rest * stiff(end)) / sum;
  }
}

/** Shares what the beams leave at every joint over its columns by their stiffness, and carries half of it to bases that are held.
 *  Moments of columns are set anew; beams stay. */
export function shareOverColumns(net: Net, m: EndMomentArray): void {
  const { members, joints } = net;
  members.forEach((member, i) => {
    if (member.column && !member.overhang) [m[2 * i], m[2 * i + 1]] = [0, 0];
  });
  for (const joint of joints) if (!joint.held) balanceOne(members, joint, m, (member) => member.column);
  carryToHeld(net, m);
}

/** Half of the moment at a column's near end goes to its far end where that is held. */
function carryToHeld({ joints, members }: Net, m: EndMomentArray): void {
  for (const joint of joints)
    if (joint.held)
      for (const { member, end } of joint.ends)
        if (members[member]?.column === true && members[member]?.overhang !== true)
          m[2 * member + end] = (m[2 * member + 1 - end] ?? 0) / 2;
}
