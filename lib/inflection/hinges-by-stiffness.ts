// Hinges of all members from the end moments a method gives: where each moment changes sign.

import { hingesFromEndMoments } from "./hinged-spans.ts";
import { asBending, type EndMomentArray, type Net } from "./net.ts";

/** A member, its length in m, and where its moment changes sign, m from its start, ascending. */
export interface MemberHinges {
  readonly member: string;
  readonly length: number;
  readonly at: readonly number[];
}

/** Places of zero moment inside every member of a net, from end moments on it (of `jointRotations`, `momentDistribution` and so on). */
export function hingesByStiffness(net: Net, m: EndMomentArray): readonly MemberHinges[] {
  const ends = asBending(net, m);
  return Object.freeze(
    net.members.map(({ name, length, span }, i) => {
      const at = hingesFromEndMoments(span, { left: ends[i]?.start ?? 0, right: ends[i]?.end ?? 0 });
      return Object.freeze({ member: name, length, at: Object.freeze([...at]) });
    }),
  );
}
