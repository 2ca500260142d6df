// A member without releases, as builders make them.

import type { Member, Release } from "./types.ts";

export interface MemberWords {
  /** Otherwise its two joints run together. */
  readonly name?: string;
  readonly group?: string;
  readonly from?: Member["from"];
  /** Both ends pinned to their joints. */
  readonly pinned?: boolean;
}

/** A member between two joints, rigidly connected unless it is pinned. */
export function plainMember(
  start: string,
  end: string,
  { name = start + end, group, from = [], pinned = false }: MemberWords = {},
): Member {
  const release: Release = { moment: pinned };
  const releases = { start: release, end: { ...release } };
  return { name, start, end, releases, ...(group === undefined ? {} : { group }), from };
}
