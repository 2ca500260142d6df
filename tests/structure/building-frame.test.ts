import { describe, expect, test } from "vitest";
import { buildingFrame, StructureError } from "../../lib/structure/index.ts";

const two = { bays: ["6 m", "5 m"], storeys: ["4 m", "3.5 m", "3.5 m"] } as const;
const names = (things: readonly { readonly name: string }[]): readonly string[] => things.map((t) => t.name);

describe("buildingFrame", () => {
  test("joints by line and level, columns going up, beams left to right", () => {
    const frame = buildingFrame({ ...two, bases: "fixed" });
    expect(names(frame.joints)).toEqual([
      "A0",
      "B0",
      "C0",
      "A1",
      "B1",
      "C1",
      "A2",
      "B2",
      "C2",
      "A3",
      "B3",
      "C3",
    ]);
    expect(frame.joints.find((j) => j.name === "C2")).toMatchObject({ x: 11, y: 7.5 });
    expect(names(frame.members.filter((m) => m.group === "columns")).slice(0, 4)).toEqual([
      "A0A1",
      "B0B1",
      "C0C1",
      "A1A2",
    ]);
    expect(names(frame.members.filter((m) => m.group === "beams"))).toEqual([
      "A1B1",
      "B1C1",
      "A2B2",
      "B2C2",
      "A3B3",
      "B3C3",
    ]);
    expect(frame.supports.map((s) => [s.joint, s.kind])).toEqual([
      ["A0", "fixed"],
      ["B0", "fixed"],
      ["C0", "fixed"],
    ]);
    expect(frame.form).toBe("building frame");
  });

  test("set-backs: a bay of one storey leaves its outer line one storey high", () => {
    const frame = buildingFrame({ ...two, bases: "pinned", storeysOf: [3, 1] });
    expect(names(frame.joints)).toEqual(["A0", "B0", "C0", "A1", "B1", "C1", "A2", "B2", "A3", "B3"]);
    expect(names(frame.members)).not.toContain("B2C2");
    expect(names(frame.members)).not.toContain("C1C2");
  });

  test("members left out; a joint without members goes with them, and so does its support", () => {
    const frame = buildingFrame({ ...two, bases: "fixed", without: ["B1C1", "C0C1"] });
    expect(names(frame.members)).not.toContain("B1C1");
    expect(names(frame.joints)).not.toContain("C0");
    expect(frame.supports.map((s) => s.joint)).toEqual(["A0", "B0"]);
  });

  test("bases of their own per line, names of the office, many lines", () => {
    const frame = buildingFrame({
      bays: ["6 m"],
      storeys: ["4 m"],
      bases: ["fixed", { x: true, y: true, rotation: "8000 kN m/rad" }],
      lines: ["P", "Q"],
      levels: ["G", "R"],
    });
    expect(names(frame.members)).toEqual(["PGPR", "QGQR", "PRQR"]);
    expect(frame.supports[1]).toMatchObject({ joint: "QG", kind: "pinned", springs: { rotation: 8e6 } });
    const wide = buildingFrame({
      bays: Array.from({ length: 27 }, () => "5 m" as const),
      storeys: ["3 m"],
      bases: "fixed",
    });
    expect(names(wide.joints).slice(24, 28)).toEqual(["Y0", "Z0", "AA0", "AB0"]);
  });

  test.each([
    ["no bays", { bays: [], storeys: ["3 m"], bases: "fixed" }, "bays: 0 given, 1 wanted"],
    [
      "a bay of no width",
      { bays: ["0 m"], storeys: ["3 m"], bases: "fixed" },
      "bay 1 is 0 m; more than zero is wanted",
    ],
    [
      "a bay in kN",
      { bays: ["3 kN"], storeys: ["3 m"], bases: "fixed" },
      'bay 1: "3 kN" is a force; a length is wanted',
    ],
    [
      "an unknown member left out",
      { ...two, bases: "fixed", without: ["B9C9"] },
      'what is left out is on member "B9C9", which is not defined',
    ],
    [
      "too many storeys in a bay",
      { ...two, bases: "fixed", storeysOf: [3, 4] },
      "the number of storeys of bay 2 is 4; a whole number from 0 to 3 is wanted",
    ],
    ["too few bases", { ...two, bases: ["fixed", "fixed"] }, "bases: 2 given, 3 wanted"],
    ["an unknown base", { ...two, bases: ["fixed", "glued", "fixed"] }, 'support at B0 is "glued"'],
  ])("%s is refused", (_, options, words) => {
    expect(() => buildingFrame(options as unknown as Parameters<typeof buildingFrame>[0])).toThrow(words);
  });

  test("two bays that touch only in the ground are two pieces", () => {
    const make = (): unknown =>
      buildingFrame({ bays: ["6 m", "6 m", "6 m"], storeys: ["4 m"], bases: "fixed", storeysOf: [1, 0, 1] });
    expect(make).toThrow(StructureError);
    expect(make).toThrow(/2 pieces: A0 A1 B0 B1|2 pieces/);
  });
});
