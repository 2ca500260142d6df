// A frame made ready once, to be tried out with many stiffnesses.

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
import { type Reading, read, readingOf, type Wanted } from "./wanted.ts";

/** A result of one load case, counted from 0 (the only one when absent). */
export type WantedInCase = { readonly wanted: Wanted; readonly loadCase?: number };

export interface Trial {
  readonly prepared: Prepared;
  readonly unknowns: readonly Unknown[];
  readonly readings: readonly Reading[];
  /** Rigidities as given. */
  readonly nominal: Stiffness;
  /** Rooms that are written over at every try. */
  readonly stiffness: Stiffness;
  readonly solved: Solved;
  readonly ends: readonly Float64Array[];
  readonly bases: readonly Base[];
}

/** A base whose fixity is an unknown: its spring, and the members that stand on it with their lengths. */
interface Base {
  readonly unknown: number;
  readonly spring: number;
  readonly members: Int32Array;
  readonly lengths: Float64Array;
}

/** Makes a frame, its load cases and the results wanted ready. Every member needs a (nominal) section. */
export function trialOf(
  structure: Structure,
  cases: readonly (readonly (Load | Imposed)[])[],
  wanted: readonly WantedInCase[],
  unknowns: Unknowns,
): Trial {
  const each = eachUnknown(structure, unknowns);
  const prepared = prepare(withSprungBases(structure, each), ...cases);
  const nominal = stiffnessOf(prepared);
  return {
    prepared,
    unknowns: each,
    readings: wanted.map((w) => readingOf(prepared, w.wanted, w.loadCase ?? 0)),
    nominal,
    stiffness: { EA: nominal.EA.slice(), EI: nominal.EI.slice(), springs: nominal.springs.slice() },
    solved: roomFor(prepared),
    ends: cases.map(() => new Float64Array(6 * prepared.segments.count)),
    bases: each.flatMap((unknown, i) => unknown.joints.map((joint) => baseAt(prepared, joint, i))),
  };
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

/** Solves the frame with one value per unknown (multiples of nominal stiffness, fixities) and writes the results wanted into
 *  `out` from `begin` on, `stride` apart. */
export function tryOut(trial: Trial, values: Float64Array, out: Float64Array, begin = 0, stride = 1): void {
  const { prepared, stiffness, solved, ends, readings } = trial;
  setStiffness(trial, values);
  solve(prepared, stiffness, { refinements: 0, room: solved });
  for (let i = 0; i < ends.length; i++) endForces(prepared, solved, i, ends[i] as Float64Array);
  for (let k = 0; k < readings.length; k++) {
    const reading = readings[k] as Reading; // k is within the length
    out[begin + k * stride] = read(reading, ends[reading.loadCase] as Float64Array, solved, stiffness);
  }
}

function setStiffness({ unknowns, nominal, stiffness, bases }: Trial, values: Float64Array): void {
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
