// Whether a structure and its loads are their own mirror image about the upright line through the middle.

import type { MemberLoads, Piecewise } from "../results/index.ts";
import { memberLoads, valueAt } from "../results/index.ts";
import { axisOf } from "../structure/index.ts";
import type { Hinge, Load, Member, Release, Section, Structure } from "../structure/types.ts";

/** Which joint and member is the image of which, and whether the image of a member runs the same way along it. */
export interface Mirror {
  /** m, of the line everything is mirrored about. */
  readonly x: number;
  readonly joints: ReadonlyMap<string, string>;
  readonly members: ReadonlyMap<string, { readonly name: string; readonly sameWay: boolean }>;
  /** What has no image, in words; empty when joints and members all have theirs. */
  readonly faults: readonly string[];
}

/** Joints and members by their images. */
export function mirrorOf(structure: Structure): Mirror {
  const { joints, members } = structure;
  const xs = joints.map(({ x }) => x);
  const x = (Math.min(...xs) + Math.max(...xs)) / 2;
  const size = Math.max(...xs) - Math.min(...xs) || 1;
  const near = (a: number, b: number): boolean => Math.abs(a - b) <= 1e-9 * size;
  const images = new Map<string, string>();
  const faults: string[] = [];
  for (const joint of joints) {
    const image = joints.find((other) => near(other.x, 2 * x - joint.x) && near(other.y, joint.y));
    if (image === undefined) faults.push(`joint ${joint.name} has no mirror image`);
    else images.set(joint.name, image.name);
  }
  const pairs = new Map<string, { name: string; sameWay: boolean }>();
  for (const member of members) {
    const [start, end] = [images.get(member.start), images.get(member.end)];
    const image = members.find(
      (other) => (other.start === start && other.end === end) || (other.start === end && other.end === start),
    );
    if (image !== undefined) pairs.set(member.name, { name: image.name, sameWay: image.start === start });
    else if (start !== undefined && end !== undefined)
      faults.push(`member ${member.name} has no mirror image between ${start} and ${end}`);
  }
  return { x, joints: images, members: pairs, faults };
}

/** The place of a hinge's mirror image: its member, and m from that member's start. */
export function imageOf(
  structure: Structure,
  mirror: Mirror,
  { member, at }: Pick<Hinge, "member" | "at">,
): { readonly member: string; readonly at: number } | undefined {
  const image = mirror.members.get(member);
  const own = structure.members.find(({ name }) => name === member);
  if (image === undefined || own === undefined) return undefined;
  return { member: image.name, at: image.sameWay ? at : axisOf(structure, own).length - at };
}

/** What is not a mirror image in the structure with its hinges: geometry, releases, sections where given, supports, hinges. */
export function structureFaults(structure: Structure, mirror: Mirror): readonly string[] {
  if (mirror.faults.length > 0) return mirror.faults;
  const faults: string[] = [];
  for (const member of structure.members) {
    const image = mirror.members.get(member.name);
    const other = structure.members.find(({ name }) => name === image?.name);
    if (image === undefined || other === undefined || member.name > other.name) continue;
    faults.push(...memberFaults(member, other, image.sameWay));
  }
  faults.push(...supportFaults(structure, mirror));
  for (const hinge of structure.hinges) {
    const image = imageOf(structure, mirror, hinge);
    const size = image === undefined ? 1 : lengthOf(structure, image.member);
    const found = structure.hinges.some(
      (other) => other.member === image?.member && Math.abs(other.at - image.at) <= 1e-6 * size,
    );
    if (!found)
      faults.push(
        `hinge ${hinge.name} in ${hinge.member} has no mirror image in ${image?.member ?? "any member"}`,
      );
  }
  return faults;
}

/** What is not a mirror image in the loads. */
export function loadFaults(structure: Structure, loads: readonly Load[], mirror: Mirror): readonly string[] {
  const faults: string[] = [];
  for (const { name } of structure.members) {
    const image = mirror.members.get(name);
    if (image === undefined || name > image.name) continue;
    const [own, other] = [name, image.name].map((member) => memberLoads(structure, loads, member));
    if (own !== undefined && other !== undefined && !sameLoads(own, other, image.sameWay))
      faults.push(
        name === image.name
          ? `the load on ${name} is not alike from both its ends`
          : `the load on ${name} is not the mirror image of that on ${image.name}`,
      );
  }
  for (const [joint, image] of mirror.joints) {
    if (joint > image) continue;
    const [own, other] = [jointForces(loads, joint), jointForces(loads, image)];
    const scale = Math.max(...[...own, ...other].map(Math.abs));
    const like = (a: number, b: number): boolean => Math.abs(a - b) <= 1e-9 * scale;
    if (!like(own[0], -other[0]) || !like(own[1], other[1]) || !like(own[2], -other[2]))
      faults.push(
        joint === image
          ? `the load at joint ${joint}, on the middle line, pushes sideways or turns it`
          : `the load at joint ${joint} is not the mirror image of that at ${image}`,
      );
  }
  return faults;
}

function lengthOf(structure: Structure, member: string): number {
  const found = structure.members.find(({ name }) => name === member);
  return found === undefined ? 1 : axisOf(structure, found).length;
}

function memberFaults(member: Member, other: Member, sameWay: boolean): readonly string[] {
  const [start, end] = sameWay
    ? [other.releases.start, other.releases.end]
    : [other.releases.end, other.releases.start];
  const alike = sameRelease(member.releases.start, start) && sameRelease(member.releases.end, end);
  return [
    ...(alike ? [] : [`the end releases of ${member.name} and ${other.name} are not mirror images`]),
    ...(sameSection(member.section, other.section)
      ? []
      : [`the sections of ${member.name} and ${other.name} differ`]),
  ];
}

function sameRelease(a: Release, b: Release): boolean {
  return (
    a.moment === b.moment &&
    (a.shear ?? false) === (b.shear ?? false) &&
    (a.axial ?? false) === (b.axial ?? false)
  );
}

function sameSection(a: Section | undefined, b: Section | undefined): boolean {
  if (a === undefined || b === undefined) return a === b;
  const like = (x: number, y: number): boolean =>
    Math.abs(x - y) <= 1e-9 * Math.max(Math.abs(x), Math.abs(y));
  return like(a.E * a.I, b.E * b.I) && like(a.E * a.A, b.E * b.A);
}

/** Along a straight level beam it does not matter which support holds it lengthwise. */
function supportFaults(structure: Structure, mirror: Mirror): readonly string[] {
  const level = structure.joints.every(({ y }) => y === structure.joints[0]?.y);
  return structure.supports.flatMap((support): readonly string[] => {
    const image = mirror.joints.get(support.joint);
    const other = structure.supports.find(({ joint }) => joint === image);
    if (other === undefined)
      return [`the support at ${support.joint} has no mirror image at ${image ?? "?"}`];
    if (support.joint > other.joint) return [];
    const axes = level ? (["y", "rotation"] as const) : (["x", "y", "rotation"] as const);
    const alike =
      axes.every(
        (axis) =>
          support.holds[axis] === other.holds[axis] &&
          (support.springs?.[axis] ?? 0) === (other.springs?.[axis] ?? 0),
      ) && Math.abs((support.angle ?? 0) + (other.angle ?? 0)) <= 1e-12;
    return alike
      ? []
      : [
          `the support at ${support.joint} (${support.kind}) is not the mirror image of that at ${other.joint} (${other.kind})`,
        ];
  });
}

function jointForces(loads: readonly Load[], joint: string): readonly [number, number, number] {
  const sum: [number, number, number] = [0, 0, 0];
  for (const load of loads)
    if (load.kind === "joint" && load.joint === joint) {
      sum[0] += load.fx;
      sum[1] += load.fy;
      sum[2] += load.couple;
    }
  return sum;
}

/** Mirroring turns couples round. Walked the same way the fibre of the image lies on the other side, so that loads across
 *  change sign; walked the other way those along do. */
function sameLoads(own: MemberLoads, other: MemberLoads, sameWay: boolean): boolean {
  const L = own.length;
  const [across, along] = sameWay ? [-1, 1] : [1, -1];
  const place = (x: number): number => (sameWay ? x : L - x);
  const scale = Math.max(
    1e-9,
    ...own.across.pieces.flat().map(Math.abs),
    ...own.along.pieces.flat().map(Math.abs),
  );
  const stops = [
    ...own.across.breaks,
    ...own.along.breaks,
    ...[...other.across.breaks, ...other.along.breaks].map(place),
  ];
  const sorted = [...new Set(stops)]
    .sort((a, b) => a - b)
    .filter((x, i, all) => i === 0 || x - (all[i - 1] ?? 0) > 1e-9 * L);
  const like = (a: Piecewise, b: Piecewise, sign: number): boolean =>
    sorted.slice(1).every((to, i) => {
      const from = sorted[i] ?? 0; // loads are straight lines between stops
      return [0.25, 0.75].every((t) => {
        const x = from + t * (to - from);
        return Math.abs(valueAt(b, place(x), "right") - sign * valueAt(a, x, "right")) <= 1e-6 * scale;
      });
    });
  if (!like(own.across, other.across, across) || !like(own.along, other.along, along)) return false;
  const sums = (points: MemberLoads["points"], at: number, to: (x: number) => number): readonly number[] =>
    (["across", "along", "couple"] as const).map((key) =>
      points.reduce((total, p) => (Math.abs(to(p.x) - at) <= 1e-6 * L ? total + p[key] : total), 0),
    );
  const places = [...own.points.map(({ x }) => x), ...other.points.map(({ x }) => place(x))];
  return places.every((x) => {
    const [a, b] = [sums(own.points, x, (p) => p), sums(other.points, x, place)];
    const size = Math.max(...[...a, ...b].map(Math.abs));
    const signs = [across, along, -1];
    return a.every((value, i) => Math.abs((b[i] ?? 0) - (signs[i] ?? 1) * value) <= 1e-9 * size);
  });
}
