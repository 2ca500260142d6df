// Single-bay portal frames: level, sloping or pitched beam, equal or unequal columns.

import { type Measure, type Quantity, quantity, readMeasure } from "../quantity/index.ts";
import { assemble } from "./assemble.ts";
import { StructureError } from "./faults.ts";
import { positiveLength } from "./lengths.ts";
import { jointNames } from "./names.ts";
import { plainMember } from "./plain-member.ts";
import { type Sections, withSections } from "./section.ts";
import { mergeSources } from "./sources.ts";
import { support } from "./support.ts";
import type { Joint, Structure } from "./types.ts";

export type Base = "pinned" | "fixed";

export interface PortalOptions {
  /** Between the column centrelines. */
  readonly span: Measure<"length">;
  /** Base to beam centreline, of both columns or of each. */
  readonly height:
    | Measure<"length">
    | { readonly left: Measure<"length">; readonly right: Measure<"length"> };
  readonly bases: Base | { readonly left: Base; readonly right: Base };
  /** Height of the right base above the left one; otherwise level. */
  readonly rightBase?: Measure<"length">;
  /** A pitched beam: height of the ridge above the line between the knees, at `ridgeAt` from the left, else midspan. */
  readonly rise?: Measure<"length">;
  readonly ridgeAt?: Measure<"length">;
  /** Left base, left knee, (ridge,) right knee, right base; otherwise A, B, C, D(, E). */
  readonly names?: readonly string[];
  /** By member, for the groups "columns" and "beams", or for "all". */
  readonly sections?: Sections;
}

type Length = Quantity<"length">;

/** A frame of two columns and a beam: joints A (left base, at 0, 0), B, C, D and members AB going up, BC, CD going down,
 *  so that the reference fibre is the inside of the frame everywhere. A pitched beam has its ridge at C, between B and D. */
export function portal(options: PortalOptions): Structure {
  const { bases, sections = {} } = options;
  const joints = jointsOf(options);
  const names = joints.map((j) => j.name);
  const last = names.length - 1;
  const members = names.slice(1).map((name, i) => {
    const column = i === 0 || i === last - 1;
    const [start, end] = [joints[i], joints[i + 1]];
    const from = column
      ? columnSources(start, end)
      : mergeSources(...(names.length === 4 ? [spanSources(options)] : [start?.from ?? [], end?.from ?? []]));
    return plainMember(names[i] ?? "", name, { group: column ? "columns" : "beams", from });
  });
  const { left, right } = typeof bases === "string" ? { left: bases, right: bases } : bases;
  const supports = [
    support(names[0] ?? "", base(left, "left")),
    support(names[last] ?? "", base(right, "right")),
  ];
  return withSections(assemble({ family: "portal", joints, members, supports, hinges: [] }), sections);
}

function jointsOf(options: PortalOptions): readonly Joint[] {
  const L = positiveLength(options.span, "span");
  const [left, right] = heightsOf(options.height);
  const step = readMeasure(options.rightBase ?? zero, "length", "height of the right base");
  const ridge = ridgeOf(options, L);
  const called = jointNames(ridge === undefined ? 4 : 5, options.names);
  const [a = "", b = "", ...rest] = called;
  const [d = "", c = ""] = [...rest].reverse();
  const knee = step.si + right.si;
  const joints: Joint[] = [jointAt(a, [0, []], [0, []]), jointAt(b, [0, []], [left.si, left.from])];
  if (ridge !== undefined) {
    const between = left.si + ((knee - left.si) * ridge.at) / L.si;
    // with knees at one level the ridge's height does not depend on where it stands
    const level = left === right && options.rightBase === undefined;
    const along = level ? [] : [...L.from, ...ridge.fromX];
    const fromY = mergeSources(left.from, right.from, step.from, along, ridge.fromY);
    joints.push(jointAt(rest[0] ?? "", [ridge.at, ridge.fromX], [between + ridge.rise, fromY]));
  }
  joints.push(jointAt(c, [L.si, L.from], [knee, mergeSources(right.from, step.from)]));
  joints.push(jointAt(d, [L.si, L.from], [step.si, step.from]));
  return joints;
}

const zero: Length = quantity(0, "length");

function heightsOf(height: PortalOptions["height"]): readonly [Length, Length] {
  if (typeof height === "object" && "left" in height)
    return [
      positiveLength(height.left, "height of the left column"),
      positiveLength(height.right, "height of the right column"),
    ];
  const both = positiveLength(height, "height");
  return [both, both];
}

interface Ridge {
  readonly at: number;
  readonly rise: number;
  readonly fromX: readonly string[];
  readonly fromY: readonly string[];
}

type Coordinate = readonly [metres: number, from: readonly string[]];

function jointAt(name: string, [x, fromX]: Coordinate, [y, fromY]: Coordinate): Joint {
  return { name, x, y, fromX, fromY, from: mergeSources(fromX, fromY) };
}

function ridgeOf({ rise, ridgeAt }: PortalOptions, L: Length): Ridge | undefined {
  if (rise === undefined) return undefined;
  const height = readMeasure(rise, "length", "rise");
  const at = ridgeAt === undefined ? undefined : readMeasure(ridgeAt, "length", "place of the ridge");
  const x = at?.si ?? L.si / 2;
  if (!(x > 0 && x < L.si))
    throw new StructureError({
      kind: "outside",
      what: "the ridge",
      member: "beam",
      at: x,
      length: L.si,
      open: true,
    });
  return { at: x, rise: height.si, fromX: at?.from ?? L.from, fromY: height.from };
}

function columnSources(start: Joint | undefined, end: Joint | undefined): readonly string[] {
  const upper = (start?.y ?? 0) > (end?.y ?? 0) ? start : end;
  const lower = upper === start ? end : start;
  const common = new Set(lower?.from ?? []);
  return mergeSources((upper?.from ?? []).filter((mark) => !common.has(mark)));
}

function spanSources({ span }: PortalOptions): readonly string[] {
  return positiveLength(span, "span").from;
}

function base(kind: Base, side: string): Base {
  if (kind !== "pinned" && kind !== "fixed")
    throw new StructureError({
      kind: "unknown choice",
      what: `${side} base`,
      value: String(kind),
      choices: ["pinned", "fixed"],
    });
  return kind;
}
