// One model, said in other ways: mirrored, walked the other way, in other units, its members in pieces.
import type { Change } from "./checks.ts";
import type { Plain, Plainload } from "./random.ts";

const flip = (place: { metres: number } | { fraction: number }, length: number) =>
  "metres" in place ? { metres: length - place.metres } : { fraction: 1 - place.fraction };

function lengthIn(data: Plain, name: string): number {
  const member = data.members.find((x) => x.name === name);
  const [a, b] = [
    data.joints.find((j) => j.name === member?.start),
    data.joints.find((j) => j.name === member?.end),
  ];
  return Math.hypot((a?.x ?? 0) - (b?.x ?? 0), (a?.y ?? 0) - (b?.y ?? 0));
}

/** Left and right exchanged. */
export function mirrored(data: Plain): Change {
  const loads = data.loads.map((load): Plainload => {
    switch (load.kind) {
      case "distributed": {
        const [dx, dy] = load.direction;
        return { ...load, direction: load.axes === "member" ? [dx, -dy] : [-dx, dy] };
      }
      case "member point":
        return load.axes === "member"
          ? { ...load, fy: -load.fy, couple: -load.couple }
          : { ...load, fx: -load.fx, couple: -load.couple };
      case "joint":
        return { ...load, fx: -load.fx, couple: -load.couple };
      case "temperature":
        return { ...load, difference: -load.difference };
      default:
        return { ...load, x: -load.x, rotation: -load.rotation };
    }
  });
  const joints = data.joints.map((j) => ({ ...j, x: -j.x }));
  const supports = data.supports.map((s) => ({
    ...s,
    ...(s.angle === undefined ? {} : { angle: -s.angle }),
  }));
  return {
    data: { ...data, joints, supports, loads },
    member: (name, x) => ({ name, x }),
    signs: [1, -1, -1],
  };
}

/** Every member walked the other way. */
export function reversed(data: Plain): Change {
  const members = data.members.map((m) => ({
    ...m,
    start: m.end,
    end: m.start,
    releases: { start: m.releases.end, end: m.releases.start },
  }));
  const hinges = data.hinges.map((h) => ({ ...h, at: lengthIn(data, h.member) - h.at }));
  const loads = data.loads.map((load): Plainload => {
    switch (load.kind) {
      case "distributed": {
        const L = lengthIn(data, load.member);
        const [dx, dy] = load.direction;
        return {
          ...load,
          begin: flip(load.end, L),
          end: flip(load.begin, L),
          q1: load.q2,
          q2: load.q1,
          direction: load.axes === "member" ? [-dx, -dy] : [dx, dy],
        };
      }
      case "member point": {
        const at = flip(load.at, lengthIn(data, load.member));
        return load.axes === "member" ? { ...load, at, fx: -load.fx, fy: -load.fy } : { ...load, at };
      }
      case "temperature":
        return { ...load, difference: -load.difference };
      default:
        return load;
    }
  });
  return {
    data: { ...data, members, hinges, loads },
    member: (name, x, length) => ({ name, x: length - x }),
    signs: [1, 1, -1],
  };
}

/** Lengths times a, forces times b. */
export function inOtherUnits(data: Plain, a: number, b: number): Change {
  const at = <P extends { metres: number } | { fraction: number }>(place: P): P =>
    ("metres" in place ? { metres: place.metres * a } : place) as P;
  const loads = data.loads.map((load): Plainload => {
    switch (load.kind) {
      case "distributed":
        return {
          ...load,
          begin: at(load.begin),
          end: at(load.end),
          q1: (load.q1 * b) / a,
          q2: (load.q2 * b) / a,
        };
      case "member point":
        return { ...load, at: at(load.at), fx: load.fx * b, fy: load.fy * b, couple: load.couple * a * b };
      case "joint":
        return { ...load, fx: load.fx * b, fy: load.fy * b, couple: load.couple * a * b };
      case "settlement":
        return { ...load, x: load.x * a, y: load.y * a };
      default:
        return load;
    }
  });
  return {
    data: {
      ...data,
      joints: data.joints.map((j) => ({ ...j, x: j.x * a, y: j.y * a })),
      hinges: data.hinges.map((h) => ({ ...h, at: h.at * a })),
      members: data.members.map((m) => ({
        ...m,
        section: {
          E: (m.section.E * b) / a ** 2,
          A: m.section.A * a ** 2,
          I: m.section.I * a ** 4,
          alpha: m.section.alpha ?? 0,
          depth: (m.section.depth ?? 1) * a,
        },
      })),
      supports: data.supports.map((s) => ({
        ...s,
        ...(s.springs === undefined
          ? {}
          : {
              springs: Object.fromEntries(
                Object.entries(s.springs).map(([axis, k]) => [
                  axis,
                  axis === "rotation" ? k * a * b : (k * b) / a,
                ]),
              ),
            }),
      })),
      loads,
    },
    member: (name, x) => ({ name, x: x * a }),
    signs: [1, 1, 1],
    scale: [b, a * b],
  };
}

/** Every member in two pieces, each load on the piece or pieces it lies on. */
export function split(data: Plain, share: number): Change {
  const halves = (name: string): readonly [string, string] => [`${name}p`, `${name}q`];
  const joints = [...data.joints];
  const members: Plain["members"] = [];
  for (const m of data.members) {
    const [a, b] = [data.joints.find((j) => j.name === m.start), data.joints.find((j) => j.name === m.end)];
    if (a === undefined || b === undefined) throw new Error("no joint");
    const middle = `${m.name}m`;
    joints.push({ name: middle, x: a.x + (b.x - a.x) * share, y: a.y + (b.y - a.y) * share });
    const [p, q] = halves(m.name);
    members.push(
      { ...m, name: p, end: middle, releases: { start: m.releases.start, end: { moment: false } } },
      { ...m, name: q, start: middle, releases: { start: { moment: false }, end: m.releases.end } },
    );
  }
  const metres = (place: { metres: number } | { fraction: number }, L: number): number =>
    "metres" in place ? place.metres : place.fraction * L;
  const loads = data.loads.flatMap((load): Plainload[] => {
    if (load.kind === "joint" || load.kind === "settlement") return [load];
    const L = lengthIn(data, load.member);
    const [p, q] = halves(load.member);
    const cut = share * L;
    if (load.kind === "temperature")
      return [
        { ...load, member: p },
        { ...load, member: q },
      ];
    if (load.kind === "member point") {
      const x = metres(load.at, L);
      return [
        x < cut ? { ...load, member: p, at: { metres: x } } : { ...load, member: q, at: { metres: x - cut } },
      ];
    }
    const [x1, x2] = [metres(load.begin, L), metres(load.end, L)];
    const at = (x: number): number => load.q1 + ((load.q2 - load.q1) * (x - x1)) / (x2 - x1);
    const parts: Plainload[] = [];
    if (x1 < cut) {
      const end = Math.min(x2, cut);
      parts.push({ ...load, member: p, begin: { metres: x1 }, end: { metres: end }, q2: at(end) });
    }
    if (x2 > cut) {
      const begin = Math.max(x1, cut);
      parts.push({
        ...load,
        member: q,
        begin: { metres: begin - cut },
        end: { metres: x2 - cut },
        q1: at(begin),
      });
    }
    return parts;
  });
  return {
    data: { ...data, joints, members, loads },
    member: (name, x, length) => {
      const cut = share * length;
      const [p, q] = halves(name);
      return x < cut ? { name: p, x } : { name: q, x: x - cut };
    },
    signs: [1, 1, 1],
  };
}
