// Random structures of many kinds, weakened hinge by hinge and release by release until statics alone can solve them, with
// loads of every kind. Small, so that thousands of them run in seconds.

import fc from "fast-check";
import { quantity } from "../../lib/quantity/index.ts";
import { rankOf } from "../../lib/statics/elimination.ts";
import { equilibriumMatrix } from "../../lib/statics/equilibrium-matrix.ts";
import {
  beam,
  buildingFrame,
  checkLoads,
  type Hinge,
  type Load,
  type Member,
  panelGirder,
  portal,
  type Structure,
  type Support,
  structure,
  truss,
} from "../../lib/structure/index.ts";

export interface Case {
  readonly kind: string;
  readonly structure: Structure;
  readonly loads: readonly Load[];
}

const m = (x: number): ReturnType<typeof quantity<"length">> => quantity(x, "length");

/** Numbers drawn one after another from a list fast-check made. */
class Draw {
  private used = 0;
  private readonly numbers: readonly number[];
  constructor(numbers: readonly number[]) {
    this.numbers = numbers;
  }
  /** A whole number below n. */
  below(n: number): number {
    const next = this.numbers[this.used % this.numbers.length] ?? 0;
    this.used += 1;
    return (next + 7 * Math.floor(this.used / this.numbers.length)) % n;
  }
  /** A length, m, to the centimetre. */
  length(least: number, most: number): number {
    return Math.round(100 * (least + ((most - least) * this.below(1000)) / 1000)) / 100;
  }
  of<const T extends readonly unknown[]>(...choices: T): T[number] {
    return choices[this.below(choices.length)];
  }
}

const kinds: Readonly<Record<string, (d: Draw) => Structure>> = {
  beam: (d) => {
    const spans = Array.from({ length: 1 + d.below(4) }, () => m(d.length(2, 9)));
    const inner = spans.slice(1).map(() => d.of("roller", "roller", { y: "800 kN/m" } as const));
    return beam({
      spans,
      supports: [d.of("pinned", "fixed", "guided"), ...inner, d.of("roller", "fixed", "pinned")],
    });
  },
  portal: (d) =>
    portal({
      span: m(d.length(5, 15)),
      height: { left: m(d.length(3, 6)), right: m(d.length(3, 6)) },
      rightBase: m(d.of(0, d.length(-1, 1))),
      bases: { left: d.of("pinned", "fixed"), right: d.of("pinned", "fixed") },
      ...(d.below(2) === 0 ? {} : { rise: m(d.length(0.5, 2.5)) }),
    }),
  frame: (d) => frameOf(d),
  "frame held at its floors": (d) => {
    const frame = frameOf(d);
    const levels = [...new Set(frame.joints.map((j) => j.y))].filter((y) => y > 0);
    const held = levels.flatMap((y): Support[] => {
      const floor = frame.joints.filter((j) => j.y === y);
      const joint = d.of(floor[0], floor[floor.length - 1])?.name ?? "";
      const holds = { x: true, y: false, rotation: false };
      return d.below(4) === 0 ? [] : [{ joint, kind: "roller", holds, from: [] }];
    });
    return { ...frame, supports: [...frame.supports, ...held] };
  },
  truss: (d) =>
    truss({
      panels: Array.from({ length: 2 + d.below(3) }, () => m(d.length(1.5, 4))),
      depth: m(d.length(1, 3)),
      diagonals: d.of("rising", "falling", "falling to midspan", "rising to midspan", "zigzag", "crossed"),
    }),
  girder: (d) =>
    panelGirder({ panels: Array.from({ length: 2 }, () => m(d.length(1.5, 4))), depth: m(d.length(1, 3)) }),
  tree: (d) => {
    const names = Array.from({ length: 3 + d.below(4) }, (_, i) => `J${i}`);
    const joints = Object.fromEntries(
      names.map((name, i) => [name, [m(2.5 * i + d.length(0, 1)), m(d.length(-3, 4))] as const]),
    );
    const members: Record<string, readonly [string, string]> = {};
    names.forEach((name, i) => {
      if (i > 0) members[`M${i}`] = [names[d.below(i)] ?? "", name];
    });
    const [a, b] = [d.below(names.length), d.below(names.length)];
    const taken = Object.values(members).some(
      ([p, q]) => [p, q].includes(`J${a}`) && [p, q].includes(`J${b}`),
    );
    if (a !== b && !taken) members.X = [`J${a}`, `J${b}`];
    return structure({
      joints,
      members,
      supports: {
        J0: d.of("fixed", "pinned"),
        J1: d.of("pinned", { y: true, angle: "25 deg" }, { x: true, angle: "-40 deg" }),
        J2: d.of("roller", { rotation: true, y: true }, "pinned"),
      },
    });
  },
  arch: (d) => {
    const span = d.length(8, 16);
    const rise = d.length(2, 5);
    const at = (t: number): readonly [ReturnType<typeof m>, ReturnType<typeof m>] => [
      m(t * span),
      m(4 * rise * t * (1 - t) + 0.2 * d.below(3)),
    ];
    return structure({
      joints: { A: at(0), B: at(0.3), C: at(0.55), D: at(0.8), E: at(1) },
      members: { AB: ["A", "B"], BC: ["B", "C"], CD: ["C", "D"], DE: ["D", "E"] },
      supports: { A: d.of("pinned", "fixed"), E: d.of("pinned", "fixed") },
    });
  },
};

function frameOf(d: Draw): Structure {
  return buildingFrame({
    bays: Array.from({ length: 1 + d.below(2) }, () => m(d.length(4, 8))),
    storeys: Array.from({ length: 1 + d.below(2) }, () => m(d.length(3, 4.5))),
    bases: d.of("pinned", "fixed"),
  });
}

/** Lets go one restraint at a time, keeping only what leaves the structure stable, until nothing is redundant. */
function weakened(start: Structure, d: Draw): Structure | undefined {
  let current = start;
  for (let tries = 0; tries < 90; tries++) {
    const { matrix, unknowns, equations } = equilibriumMatrix(current);
    if (unknowns.length === equations)
      return rankOf(matrix, unknowns.length) === equations ? current : undefined;
    const next = weaker(current, d);
    if (next === undefined) continue;
    const after = equilibriumMatrix(next);
    if (rankOf(after.matrix, after.unknowns.length) === after.equations) current = next;
  }
  return undefined;
}

function weaker(of: Structure, d: Draw): Structure | undefined {
  const member = of.members[d.below(of.members.length)];
  if (member === undefined) return undefined;
  const kind = d.below(20);
  if (kind < 9) return withHinge(of, member, d);
  const end = d.of("start", "end");
  if (kind < 14) return withRelease(of, member, end, "moment");
  if (kind < 16) return withRelease(of, member, end, "shear");
  if (kind < 17) return withRelease(of, member, end, "axial");
  const support = of.supports[d.below(of.supports.length)];
  return support === undefined ? undefined : withoutHold(of, support, d.of("x", "y", "rotation"));
}

function withHinge(of: Structure, member: Member, d: Draw): Structure | undefined {
  const part = d.of(0.25, 0.5, 0.15, 0.8, 0.37);
  const [a, b] = [member.start, member.end].map((name) => of.joints.find((j) => j.name === name));
  const length = Math.hypot((a?.x ?? 0) - (b?.x ?? 0), (a?.y ?? 0) - (b?.y ?? 0));
  if (of.hinges.some((h) => h.member === member.name)) return undefined;
  const hinge: Hinge = {
    name: `h${of.hinges.length + 1}`,
    member: member.name,
    at: part * length,
    part,
    from: [],
  };
  return { ...of, hinges: [...of.hinges, hinge] };
}

function withRelease(
  of: Structure,
  member: Member,
  end: "start" | "end",
  what: "moment" | "shear" | "axial",
): Structure | undefined {
  const { start, end: far } = member.releases;
  const sliding = [start, far].some((r) => r.shear === true || r.axial === true);
  if (member.releases[end][what] === true || (what !== "moment" && sliding)) return undefined;
  if (what === "shear" && (start.moment || far.moment)) return undefined;
  if (what === "moment" && sliding) return undefined;
  const releases = { ...member.releases, [end]: { ...member.releases[end], [what]: true } };
  return { ...of, members: of.members.map((x) => (x === member ? { ...x, releases } : x)) };
}

function withoutHold(of: Structure, support: Support, axis: "x" | "y" | "rotation"): Structure | undefined {
  if (!support.holds[axis]) return undefined;
  const supports = of.supports.map((s) =>
    s === support ? { ...s, holds: { ...s.holds, [axis]: false } } : s,
  );
  return { ...of, supports };
}

function loadOn(of: Structure, d: Draw): Load {
  const size = (): number => 500 * (1 + d.below(40)) * d.of(1, 1, 1, -1);
  const member = of.members[d.below(of.members.length)]?.name ?? "";
  const words = { label: "", from: [] };
  const angle = d.of(-Math.PI / 2, -Math.PI / 2, 0, d.below(63) / 10);
  const direction = [
    Math.round(1e9 * Math.cos(angle)) / 1e9,
    Math.round(1e9 * Math.sin(angle)) / 1e9,
  ] as const;
  const own = d.below(4) === 0 ? { axes: "member" as const } : {};
  switch (d.below(4)) {
    case 0:
    case 1: {
      const [a, b] = d.of([0, 1], [0, 1], [0.1, 0.7], [0.3, 0.95]);
      const [q1, q2] = d.below(2) === 0 ? [size(), size()] : [4000, 4000];
      const places = { begin: { fraction: a }, end: { fraction: b } };
      return { kind: "distributed", member, ...places, q1, q2, direction, ...own, ...words };
    }
    case 2: {
      const at = { fraction: d.of(0.45, 0.61, 0.9, 0.08) };
      const couple = d.of(0, 0, size());
      return { kind: "member point", member, at, fx: d.of(0, size()), fy: -size(), couple, ...own, ...words };
    }
    default: {
      const joint = of.joints[d.below(of.joints.length)]?.name ?? "";
      const couple = memberTakesMoment(of, joint) ? d.of(0, 0, size()) : 0;
      return { kind: "joint", joint, fx: d.of(0, size()), fy: d.of(0, -size()), couple, ...words };
    }
  }
}

function memberTakesMoment(of: Structure, joint: string): boolean {
  return of.members.some(
    (x) => (x.start === joint && !x.releases.start.moment) || (x.end === joint && !x.releases.end.moment),
  );
}

/** Joints whose rotation only a support holds: every member end there is released. */
export function heldAlone(of: Structure): readonly string[] {
  return of.supports
    .filter(({ joint, holds }) => {
      const ends = of.members.flatMap((x) => [
        ...(x.start === joint ? [x.releases.start] : []),
        ...(x.end === joint ? [x.releases.end] : []),
      ]);
      return holds.rotation && ends.every((end) => end.moment);
    })
    .map((s) => s.joint);
}

/** A determinate structure with one to four loads, or nothing where the weakening came to no end. */
function caseOf(numbers: readonly number[]): Case | undefined {
  const d = new Draw(numbers);
  const kind = d.of(
    "beam",
    "portal",
    "frame",
    "frame held at its floors",
    "truss",
    "girder",
    "tree",
    "arch",
    "portal",
    "tree",
  );
  const whole = kinds[kind]?.(d);
  if (whole === undefined) throw new Error(`no kind ${kind}`);
  const of = weakened(whole, d);
  if (of === undefined) return undefined;
  const loads = Array.from({ length: 1 + d.below(4) }, () => loadOn(of, d));
  checkLoads(of, loads);
  return { kind, structure: of, loads };
}

/** Random determinate structures of all kinds. */
export const cases: fc.Arbitrary<Case> = fc
  .array(fc.nat(9999), { minLength: 60, maxLength: 60 })
  .map(caseOf)
  .filter((found) => found !== undefined)
  .map((found) => found as Case);
