// The frame a gravity set is solved on: floors held, members cut at hinges and at ends whose moment is known.

import { mergeSources, withHinges } from "../structure/index.ts";
import type { Load, Sources, Structure, Support } from "../structure/types.ts";
import type { CutEnd, Cuts } from "./gravity-cuts.ts";

/** The frame with holding supports, cut ends and hinges; `from` is what each hinge stands on. */
export function cutFrame(
  frame: Structure,
  holding: readonly Support[],
  { hinges, ends }: Cuts,
  from: (hinge: Cuts["hinges"][number]) => Sources,
): Structure {
  const released = frame.members.map((member) => {
    const own = ends.filter((cut) => cut.member === member.name);
    if (own.length === 0) return member;
    const releases = { ...member.releases };
    for (const { end } of own) releases[end] = Object.freeze({ ...releases[end], moment: true });
    return Object.freeze({ ...member, releases: Object.freeze(releases) });
  });
  const supports = frame.supports.map((support) => {
    const hold = holding.find(({ joint }) => joint === support.joint);
    return hold === undefined ? support : Object.freeze({ ...support, holds: { ...support.holds, x: true } });
  });
  const added = holding.filter(({ joint }) => !frame.supports.some((support) => support.joint === joint));
  const held: Structure = {
    ...frame,
    members: Object.freeze(released),
    supports: Object.freeze([...supports, ...added]),
  };
  return withHinges(
    held,
    hinges.map((hinge) => ({
      member: hinge.member,
      from: frame.members.find(({ name }) => name === hinge.member)?.start ?? "",
      at: `${hinge.at} m`,
      sources: from(hinge),
    })),
  );
}

/** The known moments of cut ends as couples on the member, and turned round on the joint. */
export function coupleLoads(ends: readonly CutEnd[], from: Sources): readonly Load[] {
  const frozen = mergeSources(from);
  return Object.freeze(
    ends
      .filter(({ moment }) => moment !== 0)
      .flatMap(({ member, end, joint, moment }): readonly Load[] => {
        const label = `moment of ${member} at ${joint}`;
        const own = { fx: 0, fy: 0, label, from: frozen };
        const at = Object.freeze({ fraction: end === "start" ? 0 : 1 });
        return [
          Object.freeze({ ...own, kind: "member point" as const, member, at, couple: moment }),
          Object.freeze({ ...own, kind: "joint" as const, joint, couple: -moment }),
        ];
      }),
  );
}
