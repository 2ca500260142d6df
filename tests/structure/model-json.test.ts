import { readFileSync } from "node:fs";
import { join } from "node:path";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  atJoint,
  beam,
  modelSchema,
  portal,
  structureFromJson,
  structureToJson,
  uniform,
  withHinges,
} from "../../lib/structure/index.ts";
import { anyModel, model, weakened } from "../exact/random.ts";

const frame = withHinges(
  portal({
    span: "8 m",
    height: "4 m",
    bases: { left: "fixed", right: "pinned" },
    sections: { all: { E: "210 GPa", I: "8360 cm^4", A: "53.8 cm^2" } },
  }),
  [{ member: "BC", from: "C", at: "1 m" }],
);
const loads = [uniform("BC", "5 kN/m"), atJoint("B", { right: "3 kN" })];

describe("structureToJson and structureFromJson", () => {
  test("what is written reads back as the same model, frozen", () => {
    const read = structureFromJson(structureToJson(frame, loads));
    expect(read).toEqual({ structure: frame, loads });
    expect(Object.isFrozen(read.structure.members[0])).toBe(true);
  });

  test("any model reads back as the same model", () => {
    fc.assert(
      fc.property(anyModel(weakened), (data) => {
        const { structure, loads: acting } = model(data);
        expect(structureFromJson(structureToJson(structure, acting))).toEqual({ structure, loads: acting });
      }),
      { seed: 31, numRuns: 200 },
    );
  });

  test("the least that can be said: releases, kinds, hinges, loads, labels and sources may be left out", () => {
    const { structure } = structureFromJson({
      format: "hingebook model",
      version: 1,
      joints: [
        { name: "A", x: 0, y: 0 },
        { name: "B", x: 4, y: 0 },
      ],
      members: [{ name: "AB", start: "A", end: "B" }],
      supports: [
        { joint: "A", holds: { x: true, y: true } },
        { joint: "B", holds: { y: true } },
      ],
    });
    expect(structure.supports.map((s) => s.kind)).toEqual(["pinned", "roller"]);
    expect(structure.family).toBe("general");
  });

  test("the published schema is the one that is checked against", () => {
    const published = readFileSync(
      join(import.meta.dirname, "../../lib/structure/model.schema.json"),
      "utf8",
    );
    expect(JSON.parse(published)).toEqual(modelSchema);
  });
});

type Plain = Record<string, unknown>;
const data = (): Record<string, Plain[]> =>
  JSON.parse(structureToJson(frame, loads)) as Record<string, Plain[]>;
const changed = (change: (m: Record<string, Plain[]>) => void): unknown => {
  const m = data();
  change(m);
  return m;
};
const put = (list: string, i: number, more: Plain): unknown =>
  changed((m) => Object.assign(m[list]?.[i] ?? {}, more));
const drop = (list: string, i: number, key: string): unknown =>
  changed((m) => {
    delete m[list]?.[i]?.[key];
  });

const faults: readonly (readonly [string, unknown, string])[] = [
  ["no JSON", "{ joints:", "model is no JSON"],
  ["a list", [], "model is []; an object is wanted"],
  ["nothing", null, "model is null; an object is wanted"],
  [
    "another format",
    changed((m) => Object.assign(m, { format: "other" })),
    'model.format is "other"; "hingebook model" is wanted',
  ],
  ["a later version", changed((m) => Object.assign(m, { version: 2 })), "model.version is 2; 1 is wanted"],
  [
    "no joints",
    changed((m) => Object.assign(m, { joints: [] })),
    "model.joints is []; a list of at least 1 is wanted",
  ],
  ["joints missing", changed((m) => void delete m.joints), "model.joints is missing; a value is wanted"],
  [
    "a coordinate in words",
    put("joints", 1, { x: "4 m" }),
    'model.joints[1].x is "4 m"; a finite number is wanted',
  ],
  ["a coordinate missing", drop("joints", 1, "y"), "model.joints[1].y is missing; a value is wanted"],
  [
    "a coordinate that is null (as NaN is written)",
    put("joints", 1, { x: null }),
    "model.joints[1].x is null; a finite number is wanted",
  ],
  ["an unknown key", put("joints", 0, { z: 3 }), "model.joints[0].z is unknown; one of name, x, y"],
  ["a key of every object", put("joints", 0, { constructor: 3 }), "model.joints[0].constructor is unknown"],
  ["a name twice", put("joints", 1, { name: "A" }), 'joint "A" is defined twice'],
  ["a name that breaks out", put("joints", 1, { name: "<b>" }), 'joint name "<b>" is refused'],
  [
    "an unknown joint",
    put("members", 0, { end: "Z" }),
    'member "AB" ends at joint "Z", which is not defined; joints are A, B, C, D',
  ],
  [
    "a section without I",
    put("members", 0, { section: { A: 1, E: 1 } }),
    "model.members[0].section.I is missing",
  ],
  [
    "a negative A",
    put("members", 0, { section: { A: -1, E: 1, I: 1 } }),
    "model.members[0].section.A is -1; a number more than 0 is wanted",
  ],
  [
    "a release in words",
    put("members", 0, { releases: { start: { moment: "yes" } } }),
    'model.members[0].releases.start.moment is "yes"; true or false is wanted',
  ],
  [
    "an unknown kind of support",
    put("supports", 0, { kind: "glued" }),
    'model.supports[0].kind is "glued"; one of "fixed", "pinned", "roller", "free" is wanted',
  ],
  [
    "a negative spring",
    put("supports", 1, { springs: { rotation: -3 } }),
    "model.supports[1].springs.rotation is -3; a number not below 0 is wanted",
  ],
  [
    "a spring where it is held",
    put("supports", 0, { springs: { x: 3 } }),
    "the support at A both holds x and has a spring there",
  ],
  ["a hinge outside", put("hinges", 0, { at: 11 }), "hinge h1 is at 11 m on member BC, outside it"],
  ["a hinge at a joint", put("hinges", 0, { at: 0 }), "hinge h1 on member BC is at joint B"],
  [
    "an unknown load",
    put("loads", 0, { kind: "moving" }),
    'model.loads[0].kind is "moving"; one of "distributed", "member point", "joint", "temperature", "settlement" is wanted',
  ],
  [
    "a load outside",
    put("loads", 0, { end: { metres: 9 } }),
    "load 1 (5 kN/m) is at 9 m on member BC, outside it",
  ],
  [
    "a place in two ways",
    put("loads", 0, { end: { metres: 2, fraction: 1 } }),
    "model.loads[0].end.fraction is unknown; one of metres is wanted",
  ],
  [
    "a place in neither",
    put("loads", 0, { end: {} }),
    "model.loads[0].end is {}; metres from the member's start, or a fraction of its length is wanted",
  ],
  [
    "a direction of three",
    put("loads", 0, { direction: [0, 0, 1] }),
    "model.loads[0].direction is [0,0,1]; a list of 2 is wanted",
  ],
  ["two pieces", changed((m) => m.members?.pop()), "the structure is in 2 pieces: A B C | D"],
];

describe("structureFromJson refuses what is wrong and names it", () => {
  test.each(faults)("%s", (_, json, words) => {
    expect(() => structureFromJson(json)).toThrow(words);
  });

  test("a large model is read in reasonable time", () => {
    const spans = Array.from({ length: 3000 }, () => "4 m" as const);
    const json = structureToJson(beam({ spans }));
    expect(structureFromJson(json).structure.members).toHaveLength(3000);
  });
});
