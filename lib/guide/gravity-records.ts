// What the sheet says of a gravity set: its assumptions, alike ones together, and the end moments they stand for.

import { asBending } from "../inflection/index.ts";
import { quantity } from "../quantity/index.ts";
import { type Ledger, shownValue, type TableCell } from "../sheet/index.ts";
import type { Hinge, Sources } from "../structure/types.ts";
import type { Floor } from "./floors.ts";
import type { Cuts } from "./gravity-cuts.ts";
import type { GravityMoments, SetPlace } from "./gravity-moments.ts";
import { and, counted, spanPart } from "./words.ts";

export interface About {
  readonly ledger: Ledger;
  readonly name: string;
  readonly because: string;
  readonly found: GravityMoments;
  readonly cuts: Cuts;
  /** As named, in the order of the cuts. */
  readonly hinges: readonly Hinge[];
}

/** What hinges at outer and at inner ends stand on, and what all of them do. */
export interface PlaceUses {
  readonly outer: Sources;
  readonly inner: Sources;
  readonly all: Sources;
}

/** Records where the hinges of the beams are taken to be, one assumption for all of a kind. */
export function recordPlaces(about: About, { place, written }: SetPlace, stiff: Sources): PlaceUses {
  const { ledger, name, because, found } = about;
  if (!("parts" in place) || !("parts" in written)) {
    const entry = ledger.put({
      kind: "assumption",
      id: `hinges (${name})`,
      uses: stiff,
      text: `Under ${name} the moment in every beam and column is zero where these end moments put it: ${found.words}`,
      because,
    });
    const use = [`${entry.id}@${entry.version}`];
    return { outer: use, inner: use, all: use };
  }
  const group = (which: "outer" | "inner"): Sources => {
    const own = about.hinges.filter((_, i) => about.cuts.hinges[i]?.why === which);
    if (own.length === 0) return [];
    const [part, was] = [place.parts[which], written.parts[which]];
    const practice = place.common ? ", common practice: 0.1 L" : "";
    const entry = ledger.put({
      kind: "assumption",
      id: `${which} hinges (${name})`,
      uses: place.from,
      value: shownValue(quantity(part, "pure number")),
      text: `Under ${name} the moment in the beams is zero at ${spanPart(part)} from their ${which} ends (${namesOf(own)})${practice}`,
      because,
      ...(part === was ? {} : { overridden: shownValue(quantity(was, "pure number")) }),
    });
    return [`${entry.id}@${entry.version}`];
  };
  const [outer, inner] = [group("outer"), group("inner")];
  return { outer, inner, all: [...outer, ...inner] };
}

const mostNamed = 8;

function namesOf(hinges: readonly Hinge[]): string {
  const names = hinges.slice(0, mostNamed).map(({ name, member }) => `${name} in ${member}`);
  const more = hinges.length - mostNamed;
  return more > 0 ? `${names.join(", ")} and ${more} more` : and(names);
}

/** Records what becomes of the beams' axial forces and of the moments they leave; answers with the entry, "id@version". */
export function recordMethod(
  { ledger, name, found }: About,
  floors: readonly Floor[],
  uses: Sources,
): string {
  const free = floors.filter(({ held }) => !held);
  const held =
    free.length === 0
      ? "supports of the frame hold every floor against sway"
      : `each floor is held against sway (at ${and(free.map(({ at }) => at))})`;
  const text =
    found.parts === undefined
      ? `Under ${name} the joints turn and do not move: ${held}; what is left at a joint is shared over its members ${found.shared}`
      : `Under ${name} the beams bring no axial force of their own: what they leave at a joint is taken by the columns above and below it ${found.shared}, half of that going on to a fixed base, the moment in every column is zero where this puts it, and ${held}`;
  const entry = ledger.put({
    kind: "assumption",
    id: `columns (${name})`,
    uses,
    text,
    because:
      "usual for gravity on building frames; with no axial force in the beams and no holding force the columns could bear no shear and so no moment",
  });
  return `${entry.id}@${entry.version}`;
}

/** Records the end moments the hinges stand for; answers with the entry, "id@version". */
export function recordEndMoments({ ledger, name, found, cuts }: About, uses: Sources): string {
  const { net, ends } = found;
  const cutAt = new Set(cuts.ends.map(({ member, end }) => `${member} ${end}`));
  const rows = asBending(net, ends).map(({ member, start, end }, i): readonly TableCell[] => {
    const own = net.members[i];
    const joint = (j: number | undefined): string => net.joints[j ?? -1]?.name ?? "";
    const cell = (moment: number): TableCell => ({ value: shownValue(quantity(moment, "moment")), uses });
    const known = (["start", "end"] as const).filter((which) => cutAt.has(`${member} ${which}`));
    return [
      member,
      joint(own?.start),
      cell(start),
      joint(own?.end),
      cell(end),
      known.map((which) => joint(which === "start" ? own?.start : own?.end)).join(", "),
    ];
  });
  const cutColumn = cuts.ends.length > 0;
  const entry = ledger.put({
    kind: "table",
    id: `end moments ${name}`,
    uses,
    caption: `End moments the hinges under ${name} stand for, floors held (M + with tension on the reference fibre): ${found.words}`,
    columns: ["member", "start", "M", "end", "M", ...(cutColumn ? ["taken as known at"] : [])],
    rows: cutColumn ? rows : rows.map((row) => row.slice(0, 5)),
  });
  return `${entry.id}@${entry.version}`;
}

/** Records that moments of cut ends are taken as known, where there are any; answers with the entry, "id@version". */
export function recordCutEnds({ ledger, name, cuts }: About, moments: string): string | undefined {
  if (cuts.ends.length === 0) return undefined;
  const ends = cuts.ends.map(({ member, joint }) => `${member} at ${joint}`);
  const entry = ledger.put({
    kind: "assumption",
    id: `known moments (${name})`,
    uses: [moments],
    text: `Under ${name} the moment at ${counted(ends.length, "member end")} is taken as known and put on as a pair of couples: ${ends.join(", ")}`,
    because:
      "the moment of these members changes sign too seldom for hinges; the end moment stands in for the missing one",
  });
  return `${entry.id}@${entry.version}`;
}
