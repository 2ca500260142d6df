// Any plane skeleton, joint by joint and member by member.

import { type Measure, readMeasure } from "../quantity/index.ts";
import { assemble } from "./assemble.ts";
import { StructureError } from "./faults.ts";
import { type HingeAt, withHinges } from "./hinges.ts";
import { plainMember } from "./plain-member.ts";
import { type Sections, withSections } from "./section.ts";
import { mergeSources } from "./sources.ts";
import { heldCount, type SupportChoice, support } from "./support.ts";
import type { Joint, Member, Release, Structure } from "./types.ts";

/** A member by its two joints, with the ends that are released (pinned to their joint) named. */
export type MemberChoice =
  | readonly [start: string, end: string]
  | {
      readonly ends: readonly [start: string, end: string];
      /** Joints at which this member's end transmits no moment. */
      readonly released?: readonly string[];
      /** The same for shear, and for axial force. */
      readonly shearReleased?: readonly string[];
      readonly axialReleased?: readonly string[];
      readonly group?: string;
      /** Hinges inside the member. */
      readonly hinges?: readonly Omit<HingeAt, "member">[];
    };

export interface StructureOptions {
  readonly joints: Readonly<Record<string, readonly [x: Measure<"length">, y: Measure<"length">]>>;
  readonly members: Readonly<Record<string, MemberChoice>>;
  readonly supports: Readonly<Record<string, SupportChoice>>;
  /** By member, by group, or for "all". */
  readonly sections?: Sections;
}

/** A structure from joints (name -> [x, y]), members (name -> its joints) and supports (joint -> kind). */
export function structure({ joints, members, supports, sections }: StructureOptions): Structure {
  const plain = assemble({
    family: "general",
    joints: Object.entries(joints).map(([name, xy]) => jointAt(name, xy)),
    members: Object.entries(members).map(([name, choice]) => memberOf(name, choice)),
    supports: Object.entries(supports)
      .map(([joint, choice]) => support(joint, choice))
      .filter((s) => heldCount(s) > 0),
    hinges: [],
  });
  const hinges = Object.entries(members).flatMap(([member, choice]) =>
    "ends" in choice ? (choice.hinges ?? []).map((hinge) => ({ ...hinge, member })) : [],
  );
  const hinged = hinges.length === 0 ? plain : withHinges(plain, hinges);
  return sections === undefined ? hinged : withSections(hinged, sections);
}

function jointAt(name: string, [x, y]: readonly [Measure<"length">, Measure<"length">]): Joint {
  const X = readMeasure(x, "length", `x of joint ${name}`);
  const Y = readMeasure(y, "length", `y of joint ${name}`);
  return { name, x: X.si, y: Y.si, fromX: X.from, fromY: Y.from, from: mergeSources(X.from, Y.from) };
}

function memberOf(name: string, choice: MemberChoice): Member {
  if (!("ends" in choice)) return plainMember(choice[0], choice[1], { name });
  const { ends, released = [], shearReleased = [], axialReleased = [], group } = choice;
  const [start, end] = ends;
  for (const joint of [...released, ...shearReleased, ...axialReleased])
    if (joint !== start && joint !== end)
      throw new StructureError({
        kind: "not on member",
        what: `a release of member ${name}`,
        joint,
        member: name,
        ends: [start, end],
      });
  const at = (joint: string): Release => ({
    moment: released.includes(joint),
    ...(shearReleased.includes(joint) ? { shear: true } : {}),
    ...(axialReleased.includes(joint) ? { axial: true } : {}),
  });
  const releases = { start: at(start), end: at(end) };
  return { name, start, end, releases, ...(group === undefined ? {} : { group }), from: [] };
}
