// A member without releases, as builders make them.

import { deepFreeze } from "./freeze.ts";
import type { Member } from "./types.ts";

export interface MemberWords {
  /** Otherwise its two joints run together. */
  readonly name?: string;
  readonly group?: string;
  readonly from?: Member["from"];
  /** Both ends pinned to their joints. */
  readonly pinned?: boolean;
}

const rigid: Member["releases"] = deepFreeze({ start: { moment: false }, end: { moment: false } });
const pinnedEnds: Member["releases"] = deepFreeze({ start: { moment: true }, end: { moment: true } });

/** A member between two joints, rigidly connected unless it is pinned. */
export function plainMember(
  start: string,
  end: string,
  { name = start + end, group, from = [], pinned = false }: MemberWords = {},
): Member {
  const releases = pinned ? pinnedEnds : rigid;
  return { name, start, end, releases, ...(group === undefined ? {} : { group }), from };
}
