// How each member end meets its joint when the structure is cut into bodies.
//
// A joint goes with the member ends that are rigid there. Where all ends are pinned it goes with the first of them that is
// not a bar, so that no joint is a body without need; the other ends meet it by a pin with two forces. A bar, pinned at both
// ends and loaded at its joints only, is no body either: it passes one force along itself. A joint where nothing but bars
// meets stands free by itself; so does one whose rotation a support holds and no member end, for on a pinned member its
// moment would be one unknown too many.

import { byName, type Load, type Member, type Release, resists, type Structure } from "../structure/index.ts";

export interface Connection {
  readonly member: string;
  readonly joint: string;
  readonly end: "start" | "end";
  /** Whether the end goes with the joint. */
  readonly joined: boolean;
  /** Whether the member passes one force along itself, and nothing else. */
  readonly bar: boolean;
  /** What the end transmits. */
  readonly moment: boolean;
  readonly shear: boolean;
  readonly axial: boolean;
}

/** All member ends, member by member, start before end. */
export function connections(structure: Structure, loads: readonly Load[]): readonly Connection[] {
  const busy = new Set([
    ...loads.flatMap((load) => (load.kind === "joint" ? [] : [load.member])),
    ...structure.hinges.map((h) => h.member),
  ]);
  const ends = structure.members.flatMap((member) => {
    const bar = !busy.has(member.name) && isPin(member.releases.start) && isPin(member.releases.end);
    return [endOf(member, "start", bar), endOf(member, "end", bar)];
  });
  const heldAgainstTurning = new Set(
    structure.supports.flatMap((s) => (resists(s, "rotation") ? [s.joint] : [])),
  );
  const owners = byName(
    structure.joints.map(({ name }) => ({
      name,
      owner: heldAgainstTurning.has(name) ? undefined : ownerOf(ends.filter((e) => e.joint === name)),
    })),
  );
  return ends.map((end) => ({
    ...end,
    joined: (end.moment && end.shear && end.axial) || owners.get(end.joint)?.owner === end,
  }));
}

type End = Omit<Connection, "joined">;

/** The end a joint goes with where none is rigid. */
function ownerOf(here: readonly End[]): End | undefined {
  if (here.some((end) => end.moment)) return undefined;
  return here.find((end) => !end.bar && end.shear && end.axial);
}

function isPin({ moment, shear, axial }: Release): boolean {
  return moment && shear !== true && axial !== true;
}

function endOf(member: Member, end: "start" | "end", bar: boolean): End {
  const { moment, shear, axial } = member.releases[end];
  return {
    member: member.name,
    joint: member[end],
    end,
    bar,
    moment: !moment,
    shear: shear !== true,
    axial: axial !== true,
  };
}
