// Building frames: bays and storeys, set-backs, beams and columns left out.

import { type Measure, type Quantity, quantity } from "../quantity/index.ts";
import { assemble } from "./assemble.ts";
import { StructureError } from "./faults.ts";
import { positiveLength } from "./lengths.ts";
import { plainMember } from "./plain-member.ts";
import type { Base } from "./portal.ts";
import { type Sections, withSections } from "./section.ts";
import { mergeSources } from "./sources.ts";
import { heldCount, type SupportChoice, support } from "./support.ts";
import type { Joint, Member, Structure } from "./types.ts";

export interface BuildingFrameOptions {
  /** Bay widths, left to right. */
  readonly bays: readonly Measure<"length">[];
  /** Storey heights, from the ground up. */
  readonly storeys: readonly Measure<"length">[];
  /** The same for all column bases, or one per column line. */
  readonly bases: Base | readonly SupportChoice[];
  /** Set-backs: how many storeys each bay has; otherwise all. A column line is as high as the higher bay beside it. */
  readonly storeysOf?: readonly number[];
  /** Members left out, by name: "B1C1", "C1C2". */
  readonly without?: readonly string[];
  /** Names of the column lines; otherwise A, B, C ... Z, AA, AB ... */
  readonly lines?: readonly string[];
  /** Names of the levels, ground first; otherwise 0, 1, 2 ... */
  readonly levels?: readonly string[];
  /** By member, for the groups "columns" and "beams", or for "all". */
  readonly sections?: Sections;
}

interface Grid {
  readonly lines: readonly Place[];
  readonly levels: readonly Place[];
  /** Storeys of each column line and of each bay. */
  readonly heightOf: readonly number[];
  readonly storeysOf: readonly number[];
}

interface Place {
  readonly name: string;
  readonly at: Quantity<"length">;
}

/** A frame on a grid: joints by line and level (B2 is line B, level 2), columns going up (A0A1, group "columns") and
 *  beams left to right (A1B1, group "beams"), so that the reference fibre is the lower side of beams and the right side of columns. */
export function buildingFrame(options: BuildingFrameOptions): Structure {
  const grid = gridOf(options);
  const members = membersOf(grid, options.without ?? []);
  const used = new Set(members.flatMap((m) => [m.start, m.end]));
  const joints = jointsOf(grid).filter((j) => used.has(j.name));
  const supports = basesOf(grid, options.bases).filter((s) => used.has(s.joint) && heldCount(s) > 0);
  const frame = assemble({
    family: "general",
    form: "building frame",
    joints,
    members,
    supports,
    hinges: [],
  });
  return withSections(frame, options.sections ?? {});
}

function gridOf({ bays, storeys, storeysOf, lines, levels }: BuildingFrameOptions): Grid {
  if (bays.length === 0) throw new StructureError({ kind: "wrong number", what: "bays", wanted: 1, got: 0 });
  if (storeys.length === 0)
    throw new StructureError({ kind: "wrong number", what: "storeys", wanted: 1, got: 0 });
  const wide = bays.map((bay, i) => positiveLength(bay, `bay ${i + 1}`));
  const high = storeys.map((storey, i) => positiveLength(storey, `storey ${i + 1}`));
  const count = storeysOf ?? bays.map(() => storeys.length);
  checkCount("storeysOf", bays.length, count.length);
  count.forEach((n, i) => {
    if (!Number.isInteger(n) || n < 0 || n > storeys.length)
      throw new StructureError({
        kind: "not a model",
        where: `the number of storeys of bay ${i + 1}`,
        found: String(n),
        wanted: `a whole number from 0 to ${storeys.length}`,
      });
  });
  const heightOf = Array.from({ length: bays.length + 1 }, (_, i) =>
    Math.max(count[i - 1] ?? 0, count[i] ?? 0),
  );
  return {
    lines: placesOf(
      wide,
      lines ?? Array.from({ length: bays.length + 1 }, (_, i) => lineLetters(i)),
      "lines",
    ),
    levels: placesOf(
      high,
      levels ?? Array.from({ length: storeys.length + 1 }, (_, i) => String(i)),
      "levels",
    ),
    heightOf,
    storeysOf: count,
  };
}

function placesOf(
  steps: readonly Quantity<"length">[],
  names: readonly string[],
  what: string,
): readonly Place[] {
  checkCount(what, steps.length + 1, names.length);
  let at: Quantity<"length"> = quantity(0, "length");
  return names.map((name, i) => {
    const step = steps[i - 1];
    if (step !== undefined) at = at.plus(step);
    return { name, at };
  });
}

function checkCount(what: string, wanted: number, got: number): void {
  if (wanted !== got) throw new StructureError({ kind: "wrong number", what, wanted, got });
}

/** A ... Z, AA, AB ... */
function lineLetters(i: number): string {
  const last = String.fromCharCode(65 + (i % 26));
  return i < 26 ? last : lineLetters(Math.floor(i / 26) - 1) + last;
}

function jointsOf({ lines, levels, heightOf }: Grid): readonly Joint[] {
  return levels.flatMap((level, k) =>
    lines.flatMap((line, i): Joint[] => {
      if (k > (heightOf[i] ?? 0)) return [];
      const from = mergeSources(line.at.from, level.at.from);
      const [fromX, fromY] = [line.at.from, level.at.from];
      return [{ name: line.name + level.name, x: line.at.si, y: level.at.si, fromX, fromY, from }];
    }),
  );
}

function membersOf(
  { lines, levels, heightOf, storeysOf }: Grid,
  without: readonly string[],
): readonly Member[] {
  const name = (line: Place | undefined, level: Place | undefined): string =>
    `${line?.name ?? ""}${level?.name ?? ""}`;
  const all = levels.slice(1).flatMap((level, k) => {
    const columns = lines.flatMap((line, i) =>
      k < (heightOf[i] ?? 0)
        ? [plainMember(name(line, levels[k]), name(line, level), { group: "columns", from: level.at.from })]
        : [],
    );
    const beams = storeysOf.flatMap((n, i) =>
      k < n
        ? [
            plainMember(name(lines[i], level), name(lines[i + 1], level), {
              group: "beams",
              from: lines[i + 1]?.at.from ?? [],
            }),
          ]
        : [],
    );
    return [...columns, ...beams];
  });
  const known = new Set(all.map((m) => m.name));
  for (const member of without)
    if (!known.has(member))
      throw new StructureError({
        kind: "unknown member",
        what: "what is left out",
        member,
        known: [...known],
      });
  return all.filter((m) => !without.includes(m.name));
}

function basesOf(
  { lines, levels }: Grid,
  bases: BuildingFrameOptions["bases"],
): readonly ReturnType<typeof support>[] {
  const each = typeof bases === "string" ? lines.map(() => bases) : bases;
  checkCount("bases", lines.length, each.length);
  return lines.map((line, i) => support(`${line.name}${levels[0]?.name ?? ""}`, each[i] ?? "free"));
}
