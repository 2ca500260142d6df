// Equations of equilibrium of a body, or of several joined.

import type { Closure, ForceDirection, Point, Step, Term } from "../results/index.ts";
import type { Body } from "./bodies.ts";
import type { Place } from "./place.ts";
import type { Push } from "./pushes.ts";

/** A point to take moments about, with what its place stands on. */
export interface Anchor {
  readonly point: Point;
  readonly place: Place;
}

/** An inclined direction to sum forces along, with the member or support it goes with. */
export interface Slope {
  readonly direction: ForceDirection;
  readonly line: NonNullable<Push["line"]>;
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
  readonly along?: Slope;
  /** Only those with a coefficient; forces between joined bodies cancel and are left out. */
  readonly entries: readonly Entry[];
  /** All that acts, with a coefficient or without. */
  readonly pushes: readonly Push[];
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
  return [
    ...anchorsOf(pushes).map((about) => momentEquation(joined, pushes, about, size)),
    forceEquation(joined, pushes, "sum Fy"),
    forceEquation(joined, pushes, "sum Fx"),
  ];
}

/** ΣM about a point. */
export function momentEquation(
  joined: readonly number[],
  pushes: readonly Push[],
  about: Anchor,
  size: number,
): Equation {
  const entries = entriesOf(pushes, (push) => {
    const lever = leverOf(push, about.point);
    return push.action.turn === 0 && Math.abs(lever) < 1e-12 * size ? 0 : lever;
  });
  return { bodies: joined, kind: "sum M", about, entries, pushes };
}

/** ΣFx, ΣFy, or ΣF along a slope. */
export function forceEquation(
  joined: readonly number[],
  pushes: readonly Push[],
  kind: "sum Fx" | "sum Fy" | "sum F",
  along?: Slope,
): Equation {
  const { x, y } = along?.direction ?? (kind === "sum Fx" ? { x: 1, y: 0 } : { x: 0, y: 1 });
  const entries = entriesOf(pushes, ({ action: { direction } }) => {
    const part = direction[0] * x + direction[1] * y;
    return Math.abs(part) < 1e-12 ? 0 : part;
  });
  return { bodies: joined, kind, ...(along === undefined ? {} : { along }), entries, pushes };
}

/** Coefficient of a push in the sum of moments about a point. */
export function leverOf({ action: { at, direction, turn } }: Push, about: Point): number {
  if (turn !== 0) return turn;
  return (at.x - about.x) * direction[1] - (at.y - about.y) * direction[0];
}

function entriesOf(pushes: readonly Push[], coefficient: (push: Push) => number): readonly Entry[] {
  return pushes.flatMap((push) => {
    const found = coefficient(push);
    return found === 0 ? [] : [{ push, coefficient: found }];
  });
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

/** "beam between h1 and h2: sum M about h1". */
export function equationId({ bodies, kind, about, along }: Equation, nameOf: NameOf): string {
  const of = about === undefined ? "" : ` about ${about.point.name}`;
  return `${nameOf(bodies)}: ${kind}${of}${along === undefined ? "" : ` ${along.direction.name}`}`;
}

/** What bodies are called, alone or joined. */
export type NameOf = (bodies: readonly number[]) => string;

/** An equation left over, with its sum. */
export function closureOf(
  equation: Equation,
  known: ReadonlyMap<string, Found>,
  nameOf: NameOf,
  uses: Step["uses"],
): Closure {
  const terms = termsOf(equation, known);
  const parts = terms.map((t) => t.coefficient * t.value);
  return {
    id: equationId(equation, nameOf),
    bodies: equation.bodies,
    equation: equation.kind,
    ...writtenFor(equation),
    terms,
    uses,
    sum: parts.reduce((sum, part) => sum + part, 0),
    scale: Math.max(0, ...parts.map(Math.abs)),
  };
}

/** The point or the direction of an equation, as answers carry it. */
export function writtenFor({ about, along }: Equation): Pick<Step, "about" | "along"> {
  return {
    ...(about === undefined ? {} : { about: about.point }),
    ...(along === undefined ? {} : { along: along.direction }),
  };
}

/** All pushes on the joined bodies but the forces that act on two of them, equal and opposite. */
export function actingOn(bodies: readonly Body[], joined: readonly number[]): readonly Push[] {
  const pushes = joined.flatMap((i) => bodies[i]?.pushes ?? []);
  if (joined.length === 1) return pushes;
  const times = new Map<string, number>();
  for (const { force } of pushes)
    if (force !== undefined) times.set(force.name, (times.get(force.name) ?? 0) + 1);
  const outer = pushes.filter(({ force }) => force === undefined || times.get(force.name) === 1);
  return withWholeLoads(outer);
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
    place: one.place,
    parts: [...(one.parts ?? [one]), ...(other.parts ?? [other])],
  };
}

/** The named points of the bodies, left to right, then bottom to top. */
function anchorsOf(pushes: readonly Push[]): readonly Anchor[] {
  const anchors = new Map<string, Anchor>();
  for (const { force, action, place } of pushes)
    if (force !== undefined) anchors.set(action.at.name, { point: action.at, place });
  return [...anchors.values()].sort((a, b) => a.point.x - b.point.x || a.point.y - b.point.y);
}
