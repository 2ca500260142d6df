import { describe, expect, it } from "vitest";
import { StructureError, structure } from "../../lib/structure/index.ts";

type Options = Parameters<typeof structure>[0];

const good: Options = {
  joints: { A: ["0 m", "0 m"], B: ["0 m", "4 m"], C: ["6 m", "4 m"], D: ["6 m", "0 m"] },
  members: { AB: ["A", "B"], BC: ["B", "C"], CD: ["C", "D"] },
  supports: { A: "pinned", D: { x: true, y: true } },
};

describe("structure", () => {
  it("joints, members and supports are taken as given", () => {
    const made = structure(good);
    expect(made.joints).toHaveLength(4);
    expect(made.supports.map((s) => s.kind)).toEqual(["pinned", "pinned"]);
  });

  it("a support may be given by what it holds: a roller on a wall", () => {
    const made = structure({ ...good, supports: { A: "pinned", D: { x: true } } });
    expect(made.supports[1]).toMatchObject({ kind: "roller", holds: { x: true, y: false, rotation: false } });
  });

  it("member ends may be released and hinges put in", () => {
    const BC = { ends: ["B", "C"], released: ["C"], hinges: [{ from: "B", at: "0.25 L" }] } as const;
    const made = structure({ ...good, members: { ...good.members, BC } });
    expect(made.members[1]?.releases).toMatchObject({ start: { moment: false }, end: { moment: true } });
    expect(made.hinges).toMatchObject([{ name: "h1", member: "BC", at: 1.5 }]);
  });

  const refused: readonly (readonly [string, Partial<Options>, string, string])[] = [
    [
      "a member to an unknown joint",
      { members: { ...good.members, AB: ["A", "E"] } },
      "unknown joint",
      'member "AB" ends at joint "E", which is not defined; joints are A, B, C, D',
    ],
    [
      "a member from an unknown joint",
      { members: { ...good.members, AB: ["E", "B"] } },
      "unknown joint",
      'member "AB" starts at joint "E"',
    ],
    [
      "a support at an unknown joint",
      { supports: { A: "pinned", Z: "fixed" } },
      "unknown joint",
      'a support is at joint "Z", which is not defined; joints are A, B, C, D',
    ],
    [
      "a member of no length",
      { joints: { ...good.joints, B: ["0 m", "0 m"] } },
      "zero length",
      'member "AB" has no length: joints A and B are at the same place',
    ],
    [
      "two members between the same joints",
      { members: { ...good.members, BA: ["B", "A"] } },
      "same joints",
      "both join",
    ],
    [
      "no supports",
      { supports: {} },
      "no supports",
      "the structure has no supports; support at least one joint",
    ],
    [
      "two pieces",
      { members: { AB: ["A", "B"], CD: ["C", "D"] } },
      "pieces",
      "the structure is in 2 pieces: A B | C D",
    ],
    [
      "a joint without a member",
      { joints: { ...good.joints, E: ["9 m", "0 m"] } },
      "pieces",
      "2 pieces: A B C D | E",
    ],
    [
      "a release at a joint of another member",
      { members: { ...good.members, AB: { ends: ["A", "B"], released: ["C"] } } },
      "not on member",
      "which is not an end of member AB; its ends are A and B",
    ],
    [
      "a fixed support where every end is released",
      {
        members: { ...good.members, AB: { ends: ["A", "B"], released: ["A"] } },
        supports: { A: "fixed", D: "pinned" },
      },
      "spinning support",
      "the support at A holds rotation, but every member end there is released",
    ],
  ];
  it.each(refused)("refuses %s", (_, change, kind, words) => {
    const make = (): unknown => structure({ ...good, ...change });
    expect(make).toThrow(words);
    try {
      make();
    } catch (error) {
      expect(error).toBeInstanceOf(StructureError);
      expect((error as StructureError).fault.kind).toBe(kind);
    }
  });

  it("refuses a coordinate that is not finite", () => {
    const joints = { ...good.joints, B: ["0 m", "Infinity m"] } as unknown as Options["joints"];
    expect(() => structure({ ...good, joints })).toThrow("y of joint B");
  });
});
