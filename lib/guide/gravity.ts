// The verb `gravity`: a building frame under loads on its beams, by the usual assumptions or by restraint formulas: hinges in
// beams and columns, floors held against sway, and the holding forces let go as a lateral load case.

import { quantity } from "../quantity/index.ts";
import { type Ledger, shownValue } from "../sheet/index.ts";
import { determinacy } from "../statics/index.ts";
import { mergeSources, type StiffnessRatios, withHinges } from "../structure/index.ts";
import type { Hinge, Structure } from "../structure/types.ts";
import { checkCases } from "./case-loads.ts";
import { floorsOf, holdingSupports } from "./floors.ts";
import { solvedQuietly } from "./free-bodies.ts";
import { cutsOf } from "./gravity-cuts.ts";
import { coupleLoads, cutFrame } from "./gravity-frame.ts";
import {
  type GravityPlace,
  gravityMoments,
  type ReadPlace,
  readGravityPlace,
  type SetPlace,
} from "./gravity-moments.ts";
import { recordCutEnds, recordEndMoments, recordMethod, recordPlaces } from "./gravity-records.ts";
import { hingeId, setName } from "./hinge-names.ts";
import { endsOf, judge, queryOutside, recordRanges } from "./hinge-ranges.ts";
import { recordVerdict } from "./hinge-verdict.ts";
import { endMomentsOf, heldFloors, recordRelease } from "./release.ts";
import { givenRatios } from "./set-ratios.ts";
import { geometrySources, loadSources } from "./sources.ts";
import type { StiffnessOf } from "./stiffness.ts";
import type { GravitySet, HingesOptions, LoadCase } from "./types.ts";
import { lengthText, spanPart } from "./words.ts";

export interface GravityOptions extends HingesOptions {
  readonly place: GravityPlace;
  /** Stiffness by ratios, where members have no sections: "I of beams / I of columns": 2.5. By places alone they say how columns
   *  share, otherwise in equal parts. */
  readonly ratios?: StiffnessRatios;
  readonly because: string;
}

/** Records the assumptions, the hinges with their ranges, the moments they stand for, the forces that hold the floors, and those
 *  let go as a load case. Throws where the method makes no sense, saying why. */
export function recordGravity(
  ledger: Ledger,
  find: StiffnessOf,
  frame: Structure,
  cases: readonly LoadCase[],
  options: GravityOptions,
): GravitySet {
  const { place, ratios, because } = options;
  const name = setName("gravity", cases, options);
  if (typeof because !== "string" || because.trim() === "")
    throw new Error('gravity: the reason is missing; say why the hinges lie there, because: "…"');
  checkCases(frame, cases);
  const loads = cases.flatMap((loadCase) => loadCase.loads);
  const floors = floorsOf(frame);
  const read = setParts(ledger, name, readGravityPlace(place));
  const found = gravityMoments(frame, loads, read.place, ratios, find);
  const cuts = cutsOf(found.net, found.ends, found.parts);
  const plain = cutFrame(frame, holdingSupports(floors), cuts, () => []);
  const before = determinacy(frame);
  const after = determinacy(plain);
  if (after.verdict !== "determinate")
    throw new Error(
      `gravity: with two hinges in every beam, one in every column that needs it and the floors held, the frame is still ${after.words}; place its hinges by sheet.hinges`,
    );
  const ground = mergeSources(geometrySources(frame), loadSources(loads));
  const about = { ledger, name, because, found, cuts, hinges: plain.hinges };
  const placed = recordPlaces(about, read, mergeSources(found.from, ground));
  const method = recordMethod(about, floors, mergeSources(found.from, placed.all));
  const moments = recordEndMoments(about, mergeSources(placed.all, [method], ground));
  const cut = recordCutEnds(about, moments);
  const uses = cuts.hinges.map(({ why }) =>
    why === "outer" || why === "inner" ? placed[why] : mergeSources(placed.all, [method]),
  );
  const hinged = withSetHinges(ledger, name, because, plain, uses);
  const judged = hinged.hinges.map((one, i) =>
    cuts.hinges[i]?.why === "anywhere" ? undefined : judge(frame, loads, one),
  );
  const idle = cuts.hinges.map(({ why }) =>
    why === "anywhere" ? "no moment in the member: any place will do" : "",
  );
  recordRanges(ledger, name, hinged, loads, hinged.hinges, judged, idle);
  queryOutside(ledger, name, hinged.hinges, judged);
  const couples = coupleLoads(cuts.ends, cut === undefined ? [] : [cut]);
  const entries = Object.freeze(cases.map(({ entry }) => entry));
  const set = {
    name,
    frame,
    hinged,
    cases: Object.freeze([...cases]),
    determinacy: after,
    entries,
    holding: [],
    couples,
    ...givenRatios([ratios]),
    release: undefined,
  };
  // a hinge set from outside has left the moments of the method
  const ends = hinged.hinges.every(({ at }, i) => at === plain.hinges[i]?.at)
    ? found.ends
    : endMomentsOf(set, solvedQuietly(set).solution);
  const holding = heldFloors(frame, floors, ends);
  const full = recordVerdict(ledger, { ...set, holding }, loads, before, [
    `floors held against sway at ${holding.map(({ joint }) => joint).join(", ") || "no joint: supports of the frame hold them"}`,
  ]);
  const release = recordRelease(ledger, full, ends, moments);
  return Object.freeze({ ...full, release });
}

/** The parts of the span set from outside, under the names of their assumptions. */
function setParts(ledger: Ledger, set: string, written: ReadPlace): SetPlace {
  if (!("parts" in written)) return { place: written, written };
  const part = (which: "outer" | "inner"): number =>
    ledger.setFromOutside(
      `${which} hinges (${set})`,
      quantity(written.parts[which], "pure number"),
      spanPart(written.parts[which]),
      quantity(1, "pure number"),
    ).si;
  const parts = { outer: part("outer"), inner: part("inner") };
  for (const [which, value] of Object.entries(parts))
    if (!(value > 0 && value < 0.5))
      throw new Error(
        `${which} hinges (${set}), set from outside, is ${value}; a part of the span between 0 and 0.5 is wanted`,
      );
  const same = parts.outer === written.parts.outer && parts.inner === written.parts.inner;
  return { place: same ? written : { ...written, parts, common: false }, written };
}

/** The structure with what each hinge stands on; a hinge set from outside is moved, alone, and stands on that. */
function withSetHinges(
  ledger: Ledger,
  set: string,
  because: string,
  plain: Structure,
  uses: readonly (readonly string[])[],
): Structure {
  const places = plain.hinges.map((one) => {
    const written = quantity(one.at, "length");
    const span = quantity(endsOf(plain, one.member).length, "length");
    const at = ledger.setFromOutside(hingeId(one.name, set), written, lengthText(one.at), span);
    return at === written ? undefined : at;
  });
  const moved: Structure = places.every((at) => at === undefined)
    ? plain
    : withHinges(
        { ...plain, hinges: [] },
        plain.hinges.map(({ name, member, at }, i) => ({
          name,
          member,
          from: endsOf(plain, member).start,
          at: places[i] ?? `${at} m`,
        })),
      );
  const hinges = moved.hinges.map((one, i): Hinge => {
    if (places[i] === undefined) return Object.freeze({ ...one, from: uses[i] ?? [] });
    const { start, length } = endsOf(plain, one.member);
    const entry = ledger.put({
      kind: "assumption",
      id: hingeId(one.name, set),
      uses: uses[i] ?? [],
      value: shownValue(quantity(one.at, "length")),
      overridden: shownValue(quantity(plain.hinges[i]?.at ?? one.at, "length")),
      text: `Under ${set} the moment is zero at ${one.name}, in ${one.member}, ${lengthText(one.at)} from ${start} (${spanPart(one.at / length)}); the other hinges stay`,
      because,
    });
    return Object.freeze({ ...one, from: Object.freeze([`${entry.id}@${entry.version}`]) });
  });
  return Object.freeze({ ...moved, hinges: Object.freeze(hinges) });
}
