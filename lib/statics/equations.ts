// Equations of equilibrium of a body, or of several joined.

import type { Closure, Point, Step, Term } from "../results/index.ts";
import type { Body } from "./bodies.ts";
import type { Push, Stands } from "./pushes.ts";

/** A point to take moments about, with what its place stands on. */
export interface Anchor {
  readonly point: Point;
  readonly place: Stands;
}

/** One push with its coefficient in an equation. */
export interface Entry {
  readonly push: Push;
  readonly coefficient: number;
}

export interface Equation {
  /** Indices of the bodies it is written for. */
  readonly bodies: readonly number[];
  readonly kind: Step["equation"];
  readonly about?: Anchor;
  /** Only those with a coefficient; forces between joined bodies cancel and are left out. */
  readonly entries: readonly Entry[];
}

/** A force found, and the index of the step that found it. */
export interface Found {
  readonly value: number;
  readonly step: number;
}

/** ΣFx, ΣFy and ΣM about each joint, hinge or cut of the bodies joined. `size` in m is the scale a lever arm is judged by. */
export function equationsOf(
  bodies: readonly Body[],
  joined: readonly number[],
  size: number,
): readonly Equation[] {
  const pushes = actingOn(bodies, joined);
  const write = (kind: Step["equation"], about?: Anchor): Equation => {
    const entries = pushes.flatMap((push) => {
      const coefficient = coefficientOf(push, kind, about, size);
      return coefficient === 0 ? [] : [{ push, coefficient }];
    });
    return about === undefined ? { bodies: joined, kind, entries } : { bodies: joined, kind, about, entries };
  };
  return [
    ...anchorsOf(bodies, joined).map((about) => write("sum M", about)),
    write("sum Fy"),
    write("sum Fx"),
  ];
}

/** Names of the forces on the joined bodies, inner ones left out. */
export function forcesOn(bodies: readonly Body[], joined: readonly number[]): readonly string[] {
  return [...new Set(actingOn(bodies, joined).flatMap((push) => push.force?.name ?? []))];
}

/** Forces of an equation not yet found. */
export function unknownsIn(equation: Equation, known: ReadonlyMap<string, Found>): readonly string[] {
  return equation.entries.flatMap(({ push: { force } }) =>
    force === undefined || known.has(force.name) ? [] : [force.name],
  );
}

/** Coefficient of a force in an equation; zero when it does not enter. */
export function coefficientIn(equation: Equation, force: string): number {
  return equation.entries.find((entry) => entry.push.force?.name === force)?.coefficient ?? 0;
}

/** The known terms of an equation, loads and forces found. */
export function termsOf(
  equation: Equation,
  known: ReadonlyMap<string, Found>,
  except?: string,
): readonly Term[] {
  return equation.entries.flatMap(({ push, coefficient }): Term[] => {
    const { source, turn, value = 0 } = push.action;
    const couple = turn === 0 ? {} : ({ couple: true } as const);
    if (!("force" in source)) return [{ coefficient, source, value, ...couple }];
    const found = known.get(source.force);
    if (found === undefined || source.force === except) return [];
    const { step, value: force } = found;
    return [{ coefficient, source: { force: source.force, step }, value: force, ...couple }];
  });
}

/** What an equation stands on: loads, joints and hinges whose position enters, steps that found its forces. */
export function usesOf(equation: Equation, terms: readonly Term[]): Step["uses"] {
  const moments = equation.kind === "sum M";
  const stands = [
    ...(equation.about === undefined ? [] : [equation.about.place]),
    ...equation.entries.flatMap(({ push }) =>
      moments && push.action.turn === 0 ? [push.place, push.size] : [push.size],
    ),
  ];
  const leverless = equation.entries.every(({ push }) => push.action.turn !== 0);
  const counted = moments && leverless ? [] : stands;
  return {
    loads: ascending(terms.flatMap((t) => ("load" in t.source ? [t.source.load] : []))),
    joints: unique(counted.flatMap((s) => s.joints)),
    steps: ascending(terms.flatMap((t) => ("force" in t.source ? [t.source.step] : []))),
    hinges: unique(counted.flatMap((s) => s.hinges)),
  };
}

/** "beam between h1 and h2: sum M about h1". */
export function equationId(equation: Equation, names: readonly string[]): string {
  const about = equation.about === undefined ? "" : ` about ${equation.about.point.name}`;
  return `${equation.bodies.map((i) => names[i] ?? "").join(" + ")}: ${equation.kind}${about}`;
}

/** An equation left over, with its sum. */
export function closureOf(
  equation: Equation,
  known: ReadonlyMap<string, Found>,
  names: readonly string[],
): Closure {
  const terms = termsOf(equation, known);
  const parts = terms.map((t) => t.coefficient * t.value);
  return {
    id: equationId(equation, names),
    bodies: equation.bodies,
    equation: equation.kind,
    ...(equation.about === undefined ? {} : { about: equation.about.point }),
    terms,
    sum: parts.reduce((sum, part) => sum + part, 0),
    scale: Math.max(0, ...parts.map(Math.abs)),
  };
}

/** All pushes on the joined bodies but the forces that act on two of them, equal and opposite. */
function actingOn(bodies: readonly Body[], joined: readonly number[]): readonly Push[] {
  const pushes = joined.flatMap((i) => bodies[i]?.pushes ?? []);
  const times = new Map<string, number>();
  for (const { force } of pushes)
    if (force !== undefined) times.set(force.name, (times.get(force.name) ?? 0) + 1);
  const outer = pushes.filter(({ force }) => force === undefined || times.get(force.name) === 1);
  return joined.length === 1 ? outer : withWholeLoads(outer);
}

/** Parts of one spread load on neighbouring bodies put together again, as a person would take them on the joined body. */
function withWholeLoads(pushes: readonly Push[]): readonly Push[] {
  const whole = new Map<string, Push>();
  pushes.forEach((push, i) => {
    const { source, direction, turn } = push.action;
    const key = "load" in source && turn === 0 ? `${source.load}: ${direction}` : `push ${i}`;
    const before = whole.get(key);
    whole.set(key, before === undefined ? push : together(before, push));
  });
  return [...whole.values()];
}

function together(one: Push, other: Push): Push {
  const [P, Q] = [one.action.value ?? 0, other.action.value ?? 0];
  const [a, b] = [one.action.at, other.action.at];
  const at = { name: a.name, x: (P * a.x + Q * b.x) / (P + Q), y: (P * a.y + Q * b.y) / (P + Q) };
  return {
    action: { ...one.action, at, value: P + Q },
    place: outside(one.place, other.place),
    size: outside(one.size, other.size),
  };
}

/** The hinge between two parts no longer matters to the whole. */
function outside(one: Stands, other: Stands): Stands {
  const hinges = [...one.hinges, ...other.hinges].filter(
    (h) => !(one.hinges.includes(h) && other.hinges.includes(h)),
  );
  return { joints: unique([...one.joints, ...other.joints]), hinges };
}

/** The named points of the bodies, left to right, then bottom to top. */
function anchorsOf(bodies: readonly Body[], joined: readonly number[]): readonly Anchor[] {
  const anchors = new Map<string, Anchor>();
  for (const { force, action, place } of actingOn(bodies, joined))
    if (force !== undefined) anchors.set(action.at.name, { point: action.at, place });
  return [...anchors.values()].sort((a, b) => a.point.x - b.point.x || a.point.y - b.point.y);
}

function coefficientOf(
  { action }: Push,
  kind: Step["equation"],
  about: Anchor | undefined,
  size: number,
): number {
  const [dx, dy] = action.direction;
  if (kind === "sum Fx") return Math.abs(dx) < 1e-12 ? 0 : dx;
  if (kind === "sum Fy") return Math.abs(dy) < 1e-12 ? 0 : dy;
  if (about === undefined) return 0;
  if (action.turn !== 0) return action.turn;
  const lever = (action.at.x - about.point.x) * dy - (action.at.y - about.point.y) * dx;
  return Math.abs(lever) < 1e-12 * size ? 0 : lever;
}

function unique<T>(values: readonly T[]): readonly T[] {
  return [...new Set(values)];
}

function ascending(indices: readonly number[]): readonly number[] {
  return [...unique(indices)].sort((a, b) => a - b);
}
