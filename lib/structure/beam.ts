// A straight beam of one or more spans.

import type { Measure } from "../quantity/index.ts";
import { assemble } from "./assemble.ts";
import { StructureError } from "./faults.ts";
import { positiveLength } from "./lengths.ts";
import { jointNames } from "./names.ts";
import { plainMember } from "./plain-member.ts";
import { type Sections, withSections } from "./section.ts";
import { mergeSources } from "./sources.ts";
import { heldCount, type SupportChoice, support } from "./support.ts";
import type { Joint, Structure } from "./types.ts";

export interface BeamOptions {
  /** Lengths of the spans, left to right. */
  readonly spans: readonly Measure<"length">[];
  /** One per joint, left to right; otherwise pinned at the first joint and rollers at the others. */
  readonly supports?: readonly SupportChoice[];
  /** Joint names, left to right; otherwise A, B, C ... */
  readonly names?: readonly string[];
  /** By member, for the group "beams", or for "all". */
  readonly sections?: Sections;
}

/** A beam along y = 0: joints A, B, C ... left to right and members AB, BC ... between them; the reference fibre is the lower side. */
export function beam({ spans, supports, names, sections = {} }: BeamOptions): Structure {
  if (spans.length === 0)
    throw new StructureError({ kind: "wrong number", what: "spans", wanted: 1, got: 0 });
  const lengths = spans.map((span, i) => positiveLength(span, spans.length === 1 ? "span" : `span ${i + 1}`));
  const called = jointNames(spans.length + 1, names);
  const kinds: readonly SupportChoice[] = supports ?? called.map((_, i) => (i === 0 ? "pinned" : "roller"));
  if (kinds.length !== called.length)
    throw new StructureError({
      kind: "wrong number",
      what: "supports",
      wanted: called.length,
      got: kinds.length,
    });
  const joints = called.map((name, i): Joint => {
    const before = lengths.slice(0, i);
    const from = mergeSources(...before.map((l) => l.from));
    return { name, x: before.reduce((x, l) => x + l.si, 0), y: 0, fromX: from, fromY: [], from };
  });
  const members = lengths.map((length, i) =>
    plainMember(called[i] ?? "", called[i + 1] ?? "", { group: "beams", from: length.from }),
  );
  const held = kinds.map((kind, i) => support(called[i] ?? "", kind)).filter((s) => heldCount(s) > 0);
  return withSections(assemble({ family: "beam", joints, members, supports: held, hinges: [] }), sections);
}
