// Random structures of the population study: two- and three-span beams, single portals, building frames, under uniform gravity
// load. Ranges are those of structures as they are built; kN and m do not matter, only ratios do.

import { type Quantity, quantity } from "../quantity/index.ts";
import {
  beam,
  buildingFrame,
  type Load,
  portal,
  type Section,
  type Structure,
  uniform,
} from "../structure/index.ts";
import type { Dice } from "./study-random.ts";

/** A structure, its loads, and per member the uniform load on it (N/m; 0 on columns). */
export interface StudyCase {
  readonly structure: Structure;
  readonly loads: readonly Load[];
  readonly w: readonly number[];
}

const m = (x: number): Quantity<"length"> => quantity(x, "length");

function caseOf(plain: Structure, sections: readonly Section[], w: readonly number[]): StudyCase {
  const members = plain.members.map((member, i) => {
    const section = sections[i];
    return section === undefined ? member : { ...member, section };
  });
  const loads = plain.members.flatMap(({ name }, i) =>
    (w[i] ?? 0) > 0 ? [uniform(name, quantity(w[i] ?? 0, "force per length"))] : [],
  );
  return { structure: { ...plain, members }, loads, w };
}

const slender = (I: number): Section => ({ E: 1, I, A: 100 * I });

/** Short span 3 to 8 m and first, long one up to 1.8 times that; loads alike or within a ratio of 1.67, EI alike or within 2. */
export function twoSpans(dice: Dice): StudyCase {
  const short = dice.even(3, 8);
  const long = short * dice.even(1, 1.8);
  const w = dice.percent(50) ? 1 : dice.ratio(0.6, 1.67);
  const I = dice.percent(70) ? 1 : dice.ratio(0.5, 2);
  return caseOf(beam({ spans: [m(short), m(long)] }), [slender(1), slender(I)], [1e4 * w, 1e4]);
}

/** Middle span 4 to 9 m, each end span 0.6 to 1.2 times that, both alike in half of the cases; loads and EI alike or each within a ratio of 1.4. */
export function threeSpans(dice: Dice): StudyCase {
  const middle = dice.even(4, 9);
  const first = dice.even(0.6, 1.2);
  const last = dice.percent(50) ? first : dice.even(0.6, 1.2);
  const spans = [middle * first, middle, middle * last];
  const three = (alike: number): number[] => {
    const same = dice.percent(alike);
    return spans.map(() => (same ? 1 : dice.ratio(0.7, 1.4)));
  };
  const w = three(50);
  const I = three(70);
  return caseOf(
    beam({ spans: spans.map(m) }),
    I.map(slender),
    w.map((q) => 1e4 * q),
  );
}

/** Height 3 to 6 m, span 4 to 15 m, EI of beam over that of column 0.5 to 4; unequal columns differ in EI by up to 2 and in height by
 *  up to a third. */
export function singlePortal(dice: Dice, bases: "pinned" | "fixed", unequal: boolean): StudyCase {
  const [h, L] = [dice.even(3, 6), dice.even(4, 15)];
  const I = dice.ratio(0.5, 4);
  const other = unequal ? { I: dice.ratio(0.5, 2), h: h * dice.even(0.75, 1.33) } : { I: 1, h };
  const [column, beamRadius] = [dice.even(0.09, 0.16), dice.even(0.12, 0.25)];
  const section = (inertia: number, r: number): Section => ({ E: 1, I: inertia, A: inertia / r ** 2 });
  const plain = portal({
    span: m(L),
    height: { left: m(h), right: m(other.h) },
    rightBase: m(h - other.h),
    bases,
  });
  return caseOf(plain, [section(1, column), section(I, beamRadius), section(other.I, column)], [0, 1e4, 0]);
}

/** What a building frame is made from; all ratios but lengths and radii in m. Forces do not depend on the scale of load and EI
 *  together, so none is needed; how much columns shorten beside bending is in the radii of gyration. */
export interface FrameShape {
  readonly bays: readonly number[];
  readonly storeys: readonly number[];
  readonly bases: "pinned" | "fixed";
  /** Radii of gyration, m; those of beams with the floor as a part of them, which makes A large. */
  readonly radius: { readonly columns: number; readonly beams: number };
  /** EI and A of each column line over those of the outer ones. */
  readonly lines: readonly number[];
  /** EI and A of each storey, columns and beams, over those of the lowest. */
  readonly taper: readonly number[];
  /** (EI/L) of beam over (EI/h) of an outer column, for a bay of mean width and an upper storey. */
  readonly stiffness: number;
  readonly roof: { readonly EI: number; readonly w: number };
}

/** 1 to 5 bays and 1 to 8 storeys, bays equal or not, inner columns up to three times the outer ones, all bases alike. */
export function frameShape(dice: Dice): FrameShape {
  const [bays, storeys] = [dice.whole(1, 5), dice.whole(1, 8)];
  const L = dice.even(4, 9);
  const equal = dice.percent(50);
  const h = dice.even(3, 4);
  const first = dice.even(1, 1.5);
  const inner = dice.percent(30) ? 1 : dice.even(1, 3);
  const step = dice.percent(70) ? dice.even(0.6, 1) : 1;
  return {
    bays: Array.from({ length: bays }, () => (equal ? L : L * dice.even(0.75, 1.25))),
    storeys: Array.from({ length: storeys }, (_, i) => (i === 0 ? h * first : h)),
    bases: dice.percent(50) ? "fixed" : "pinned",
    radius: { columns: dice.even(0.07, 0.13), beams: dice.even(0.06, 0.125) },
    lines: Array.from({ length: bays + 1 }, (_, i) => (i === 0 || i === bays ? 1 : inner)),
    taper: Array.from({ length: storeys }, (_, i) => step ** Math.floor(i / 2)),
    stiffness: dice.ratio(0.15, 3),
    roof: { EI: dice.even(0.5, 1), w: dice.even(0.5, 1) },
  };
}

/** A building frame of a shape under gravity; columns A0A1 ... and beams A1B1 ... as `buildingFrame` names them. */
export function gravityFrame(shape: FrameShape): StudyCase {
  const { bays, storeys, bases, taper, lines, radius, roof } = shape;
  const plain = buildingFrame({ bays: bays.map(m), storeys: storeys.map(m), bases });
  const top = storeys.length - 1;
  const mean = bays.reduce((sum, L) => sum + L, 0) / bays.length;
  const beam = (shape.stiffness * mean) / (storeys[top] ?? 1); // EI over that of an outer column of the storey
  const sections: Section[] = [];
  const loads: number[] = [];
  storeys.forEach((_, i) => {
    for (const line of lines) {
      const I = line * (taper[i] ?? 1);
      sections.push({ E: 1, I, A: I / radius.columns ** 2 });
      loads.push(0);
    }
    const I = beam * (taper[i] ?? 1) * (i === top ? roof.EI : 1);
    for (const _bay of bays) {
      sections.push({ E: 1, I, A: I / radius.beams ** 2 });
      loads.push(3e4 * (i === top ? roof.w : 1));
    }
  });
  return caseOf(plain, sections, loads);
}
