// What an equation stands on: how its coefficients and resultants change with each coordinate and each hinge.

import type { Step, Term } from "../results/index.ts";
import { byName, type Structure } from "../structure/index.ts";
import type { Equation, Found } from "./equations.ts";
import { leverOf } from "./equations.ts";
import { type Gradient, ofLength, ofPlace, ofStop, ofTurn, weighted } from "./place.ts";
import type { Push } from "./pushes.ts";

/** Loads, coordinates, hinges and earlier steps of an equation. A coordinate that only moves along with others of the same
 *  value and source, so that every lever arm stays, does not count; one that meets a lever arm of zero by chance does. */
export function usesOf(
  structure: Structure,
  equation: Equation,
  terms: readonly Term[],
  known: ReadonlyMap<string, Found>,
): Step["uses"] {
  const acting = equation.pushes.filter((push) => !isIdle(push, known));
  const keys = new Set(acting.flatMap((push) => keysOf(structure, partsOf(structure, equation, push))));
  const joints = byName(structure.joints);
  const coordinates = structure.joints.flatMap(({ name: joint }) =>
    (["x", "y"] as const).flatMap((axis) => (keys.has(`${axis} ${joint}`) ? [{ joint, axis }] : [])),
  );
  const supports = unique([
    ...acting.flatMap((push) =>
      push.line !== undefined && "support" in push.line ? [push.line.support] : [],
    ),
    ...(equation.along !== undefined && "support" in equation.along.line
      ? [equation.along.line.support]
      : []),
  ]);
  return {
    loads: ascending(terms.flatMap((t) => ("load" in t.source ? [t.source.load] : []))),
    places: ascending(
      [...keys].flatMap((key) => (key.startsWith("on ") ? [Number.parseInt(key.slice(3), 10)] : [])),
    ),
    joints: unique(coordinates.flatMap(({ joint }) => (joints.has(joint) ? [joint] : []))),
    coordinates,
    steps: ascending(terms.flatMap((t) => ("force" in t.source ? [t.source.step] : []))),
    hinges: structure.hinges.map((h) => h.name).filter((name) => keys.has(`at ${name}`)),
    ...(supports.length === 0 ? {} : { supports }),
  };
}

/** What several equations stand on together. */
export function mergedUses(uses: readonly Step["uses"][]): Step["uses"] {
  const all = <T>(pick: (u: Step["uses"]) => readonly T[]): readonly T[] => unique(uses.flatMap(pick));
  const seen = new Set<string>();
  const coordinates = uses
    .flatMap((u) => u.coordinates ?? [])
    .filter(({ joint, axis }) => !seen.has(`${axis} ${joint}`) && seen.add(`${axis} ${joint}`));
  const supports = all((u) => u.supports ?? []);
  return {
    loads: all((u) => u.loads),
    places: all((u) => u.places ?? []),
    joints: all((u) => u.joints),
    coordinates,
    steps: all((u) => u.steps),
    hinges: all((u) => u.hinges),
    ...(supports.length === 0 ? {} : { supports }),
  };
}

/** A force found to be zero brings nothing into an equation, wherever it acts. */
function isIdle({ force }: Push, known: ReadonlyMap<string, Found>): boolean {
  return force !== undefined && known.get(force.name)?.value === 0;
}

/** Changes of coefficient times value, part by part. */
function partsOf(structure: Structure, equation: Equation, push: Push): readonly Gradient[] {
  if (push.parts !== undefined) return push.parts.flatMap((part) => partsOf(structure, equation, part));
  const { action, stretch } = push;
  const value = action.value ?? 1;
  const coefficient = coefficientOf(equation, push);
  const change = weighted([value, ofCoefficient(structure, equation, push)]);
  if (stretch === undefined) return [change];
  const { member, from, to, per } = stretch;
  const length = weighted([1, ofStop(structure, member, to)], [-1, ofStop(structure, member, from)]);
  const size = per === undefined ? length : projected(structure, push, length);
  return [change, weighted([coefficient, size])];
}

function coefficientOf({ about, along, kind }: Equation, push: Push): number {
  if (about !== undefined) return leverOf(push, about.point);
  const { x, y } = along?.direction ?? (kind === "sum Fx" ? { x: 1, y: 0 } : { x: 0, y: 1 });
  return push.action.direction[0] * x + push.action.direction[1] * y;
}

/** Per metre of projection the whole length counts by its projection; where part of it only is loaded, by both. */
function projected(structure: Structure, { stretch }: Push, length: Gradient): Gradient {
  if (stretch === undefined) return length;
  const { member, from, to, per } = stretch;
  if (per !== undefined && "part" in from && "part" in to)
    return weighted([to.part - from.part, ofLength(structure, member, per)]);
  return weighted([1, length], [1, per === undefined ? new Map() : ofLength(structure, member, per)]);
}

function ofCoefficient(structure: Structure, { about, along, kind }: Equation, push: Push): Gradient {
  const { at, direction, turn } = push.action;
  if (turn !== 0) return new Map();
  const [dx, dy] = direction;
  const turning =
    push.line !== undefined && "member" in push.line ? ofTurn(structure, push.line.member) : new Map();
  if (about === undefined) {
    const { x, y } = along?.direction ?? (kind === "sum Fx" ? { x: 1, y: 0 } : { x: 0, y: 1 });
    const own =
      along !== undefined && "member" in along.line ? ofTurn(structure, along.line.member) : new Map();
    // d . e with d turned by dθ: (-dy, dx) . e; with e turned: d . (-ey, ex)
    return weighted([-dy * x + dx * y, turning], [-dx * y + dy * x, own]);
  }
  const [px, py] = ofPlace(structure, push.place);
  const [ax, ay] = ofPlace(structure, about.place);
  const [rx, ry] = [at.x - about.point.x, at.y - about.point.y];
  return weighted([dy, px], [-dy, ax], [-dx, py], [dx, ay], [rx * dx + ry * dy, turning]);
}

/** The keys left when those that share value and source are put together. */
function keysOf(structure: Structure, parts: readonly Gradient[]): readonly string[] {
  const joints = byName(structure.joints);
  const total = weighted(...parts.map((part) => [1, part] as const));
  const size = Math.max(0, ...parts.flatMap((part) => [...part.values()].map(Math.abs)));
  const groups = new Map<string, { sum: number; keys: string[] }>();
  for (const [key, value] of total) {
    const [axis = "", name = ""] = key.split(" ");
    const joint = joints.get(name);
    const of =
      axis === "at" || axis === "on" || joint === undefined
        ? key
        : axis === "x"
          ? `x ${joint.x} ${(joint.fromX ?? joint.from).join(" ")}`
          : `y ${joint.y} ${(joint.fromY ?? joint.from).join(" ")}`;
    const group = groups.get(of) ?? { sum: 0, keys: [] };
    group.sum += value;
    if (Math.abs(value) > 1e-9 * size) group.keys.push(key);
    groups.set(of, group);
  }
  return [...groups.values()].flatMap(({ sum, keys }) => (Math.abs(sum) > 1e-9 * size ? keys : []));
}

function unique<T>(values: readonly T[]): readonly T[] {
  return [...new Set(values)];
}

function ascending(indices: readonly number[]): readonly number[] {
  return [...unique(indices)].sort((a, b) => a - b);
}
