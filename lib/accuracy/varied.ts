// A frame made ready once, to be solved with many stiffnesses; and what is kept of it each time.
//
// The state of a load case is the end forces of all segments (see `endForces`), six each, followed by the force on the structure along
// each displacement that a support holds or springs. Everything asked of a frame is read from its state.

import {
  endForces,
  type Prepared,
  prepare,
  roomFor,
  type Solved,
  type Stiffness,
  solve,
  stiffnessOf,
} from "../exact/index.ts";
import { axisOf } from "../structure/index.ts";
import type { Imposed, Load, Structure } from "../structure/types.ts";
import { almostFixed, withSprungBases } from "./sprung-bases.ts";
import { eachUnknown, type Unknown, type Unknowns } from "./unknowns.ts";

export interface Varied {
  readonly prepared: Prepared;
  readonly unknowns: readonly Unknown[];
  /** Numbers in the state of one load case. */
  readonly size: number;
  readonly supports: readonly SupportPlace[];
  /** Rigidities as given. */
  readonly nominal: Stiffness;
  /** Rooms that are written over at every solution. */
  readonly stiffness: Stiffness;
  readonly solved: Solved;
  readonly ends: Float64Array;
  readonly bases: readonly Base[];
}

/** A displacement a support holds (spring -1) or springs, with its axis: 0 and 1 along the support's own axes, 2 rotation. */
export interface SupportPlace {
  readonly joint: string;
  readonly axis: 0 | 1 | 2;
  readonly place: number;
  readonly spring: number;
}

/** A base whose fixity is an unknown: its spring, and the members that stand on it with their lengths. */
interface Base {
  readonly unknown: number;
  readonly spring: number;
  readonly members: Int32Array;
  readonly lengths: Float64Array;
}

/** Makes a frame and its load cases ready. Every member needs a (nominal) section. */
export function variedOf(
  structure: Structure,
  cases: readonly (readonly (Load | Imposed)[])[],
  unknowns: Unknowns,
): Varied {
  const each = eachUnknown(structure, unknowns);
  const prepared = prepare(withSprungBases(structure, each), ...cases);
  const nominal = stiffnessOf(prepared);
  const supports = supportPlaces(prepared);
  return {
    prepared,
    unknowns: each,
    size: 6 * prepared.segments.count + supports.length,
    supports,
    nominal,
    stiffness: { EA: nominal.EA.slice(), EI: nominal.EI.slice(), springs: nominal.springs.slice() },
    solved: roomFor(prepared),
    ends: new Float64Array(6 * prepared.segments.count),
    bases: each.flatMap((unknown, i) => unknown.joints.map((joint) => baseAt(prepared, joint, i))),
  };
}

function supportPlaces({ structure, numbering, springs }: Prepared): readonly SupportPlace[] {
  return structure.supports.flatMap((support) =>
    (["x", "y", "rotation"] as const).flatMap((name, k): SupportPlace[] => {
      const place = numbering.places[3 * (numbering.node.get(support.joint) ?? -1) + k] ?? -1;
      const axis = k as 0 | 1 | 2; // three names
      if (support.holds[name]) return [{ joint: support.joint, axis, place, spring: -1 }];
      if (support.springs?.[name] === undefined) return [];
      return [{ joint: support.joint, axis, place, spring: springs.findIndex((p) => p.place === place) }];
    }),
  );
}

function baseAt(prepared: Prepared, joint: string, unknown: number): Base {
  const { members } = prepared.structure;
  const standing = members.flatMap((m, i) => {
    const held =
      (m.start === joint && !m.releases.start.moment) || (m.end === joint && !m.releases.end.moment);
    return held ? [i] : [];
  });
  const lengths = standing.map((i) => {
    const member = members[i];
    return member === undefined ? 0 : axisOf(prepared.structure, member).length;
  });
  const spring = prepared.springs.findIndex((s) => s.joint === joint && s.axis === "rotation");
  return { unknown, spring, members: Int32Array.from(standing), lengths: Float64Array.from(lengths) };
}

/** Solves the frame with one value per unknown (multiples of nominal stiffness, fixities) and writes the states of all load
 *  cases into `into` from `begin` on. */
export function solveVaried(varied: Varied, values: Float64Array, into: Float64Array, begin = 0): void {
  const { prepared, stiffness, solved, ends, supports, size } = varied;
  setStiffness(varied, values);
  solve(prepared, stiffness, { refinements: 0, room: solved });
  for (let i = 0; i < solved.cases.length; i++) {
    const { u, r } = solved.cases[i] as Solved["cases"][number]; // i is within the length
    const ground = prepared.loadCases[i]?.ground;
    const at = begin + i * size;
    into.set(endForces(prepared, solved, i, ends), at);
    for (let k = 0; k < supports.length; k++) {
      const { place, spring } = supports[k] as SupportPlace; // k is within the length
      const moved = (u[place] ?? 0) - (ground?.[place] ?? 0);
      into[at + ends.length + k] = spring < 0 ? -(r[place] ?? 0) : -(stiffness.springs[spring] ?? 0) * moved;
    }
  }
}

function setStiffness({ unknowns, nominal, stiffness, bases }: Varied, values: Float64Array): void {
  const { EA, EI, springs } = stiffness;
  EA.set(nominal.EA);
  EI.set(nominal.EI);
  for (let k = 0; k < unknowns.length; k++) {
    const { kind, members } = unknowns[k] as Unknown; // k is within the length
    if (kind === "fixity") continue;
    const rigidity = kind === "I" ? EI : EA;
    for (let j = 0; j < members.length; j++) {
      const i = members[j] as number;
      rigidity[i] = (rigidity[i] as number) * (values[k] as number);
    }
  }
  for (let b = 0; b < bases.length; b++) {
    const { unknown, spring, members, lengths } = bases[b] as Base; // b is within the length
    const r = Math.min(values[unknown] as number, almostFixed);
    let k = 0;
    for (let j = 0; j < members.length; j++)
      k += (3 * (EI[members[j] as number] as number)) / (lengths[j] as number);
    springs[spring] = (k * r) / (1 - r);
  }
}

/** The values of the unknowns at which nothing differs from what is given: multiples 1 (or the nearest in the range), fixities
 *  in the middle of their range. */
export function nominalValues(unknowns: readonly Unknown[]): Float64Array {
  return Float64Array.from(unknowns, ({ kind, least, most }) =>
    kind === "fixity" ? (least + most) / 2 : Math.min(Math.max(1, least), most),
  );
}
