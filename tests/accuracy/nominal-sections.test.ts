import { describe, expect, test } from "vitest";
import { hasSections, withNominalSections } from "../../lib/accuracy/index.ts";
import { exact } from "../../lib/exact/index.ts";
import { valueAt } from "../../lib/results/index.ts";
import { buildingFrame, portal, structure, truss, uniform, withSections } from "../../lib/structure/index.ts";

const bare = portal({ span: "12 m", height: "4 m", bases: "pinned" });

describe("withNominalSections", () => {
  test("I is 1 everywhere, A by radii of gyration of a fiftieth of beams and a thirty-fifth of columns", () => {
    const sized = withNominalSections(bare);
    expect(hasSections(bare)).toBe(false);
    expect(hasSections(sized)).toBe(true);
    for (const { name, section } of sized.members) {
      expect([section?.E, section?.I]).toEqual([1, 1]);
      const radius = Math.sqrt((section?.I ?? 0) / (section?.A ?? 1));
      expect(radius).toBeCloseTo(name === "BC" ? 12 / 50 : 4 / 35, 12);
    }
  });

  test("ratios by group or member; with I alone the radius stays, and members of a group have one section", () => {
    const frame = buildingFrame({ bays: ["6 m", "9 m"], storeys: ["5 m", "3.5 m"], bases: "fixed" });
    const sized = withNominalSections(frame, { beams: 3, "A0A1, A1A2": { I: 2, A: 4 } });
    const of = (name: string) => sized.members.find((m) => m.name === name)?.section;
    expect(of("A1B1")).toEqual(of("B2C2"));
    expect(of("A1B1")?.I).toBe(3);
    expect(of("A1B1")?.A).toBeCloseTo(3 * (50 / 7.5) ** 2, 9);
    expect(of("A0A1")?.I).toBe(2);
    expect((of("A0A1")?.A ?? 0) / (of("B0B1")?.A ?? 1)).toBeCloseTo(4, 12);
    expect(of("B0B1")).toEqual(of("C1C2"));
  });

  test("forces are those of any sizes in the same ratios", () => {
    const loads = [uniform("BC", "15 kN/m")];
    const sized = withNominalSections(bare, { beams: 2 });
    const members = sized.members.map((m) => {
      const { I = 1, A = 1 } = m.section ?? {};
      return { ...m, section: { E: 210e9, I: 3e-5 * I, A: 3e-5 * A } };
    });
    const M = (of: typeof bare): number => {
      const found = exact(of, loads).members.find((m) => m.member === "BC");
      return found === undefined ? Number.NaN : valueAt(found.M, 0);
    };
    expect(M({ ...sized, members }) / M(sized)).toBeCloseTo(1, 9);
  });

  test("bars have one A", () => {
    const girder = withNominalSections(truss({ panels: ["3 m", "4 m"], depth: "2 m", diagonals: "crossed" }));
    expect(new Set(girder.members.map((m) => m.section?.A)).size).toBe(1);
  });

  test("sections that are all given stay", () => {
    const sized = withSections(bare, { all: { E: "210 GPa", I: "8000 cm^4", A: "60 cm^2" } });
    expect(withNominalSections(sized)).toBe(sized);
    expect(() => withNominalSections(sized, { beams: 2 })).toThrow(
      "nominal ratios are stated for beams, but every member has a section",
    );
  });

  test("refuses sections for some, springs, ratios that are none, names that are none", () => {
    const some = withSections(bare, { columns: { E: 1, I: 1, A: 1 } });
    expect(() => withNominalSections(some)).toThrow("member BC has no section, but AB, CD has one");
    expect(() => withNominalSections(bare, { beams: -1 })).toThrow(
      "the nominal I of beams is -1 times the plain one",
    );
    expect(() => withNominalSections(bare, { beams: { A: 0 } })).toThrow("the nominal A of beams is 0");
    expect(() => withNominalSections(bare, { roof: 2 })).toThrow('"roof" is no group and no member');
    const sprung = structure({
      joints: { A: ["0 m", "0 m"], B: ["5 m", "0 m"] },
      members: { AB: ["A", "B"] },
      supports: { A: { x: true, y: true, rotation: "20000 kN m/rad" }, B: "roller" },
    });
    expect(() => withNominalSections(sprung)).toThrow("the support at A has a spring");
  });
});
