import { describe, expect, test } from "vitest";
import {
  beam,
  portal,
  type SectionChoice,
  type Structure,
  selfWeight,
  withSections,
} from "../../lib/structure/index.ts";

const steel = { E: "210 GPa", I: "8360 cm^4", A: "53.8 cm^2" } as const;
const frame = portal({ span: "8 m", height: "4 m", bases: "pinned" });
const sectionOf = (s: Structure, name: string): object | undefined =>
  s.members.find((m) => m.name === name)?.section;

describe("withSections", () => {
  test("a member's own section before its group's, its group's before that of all", () => {
    const s = withSections(frame, {
      all: steel,
      columns: { ...steel, I: "100 cm^4" },
      CD: { ...steel, I: "200 cm^4" },
    });
    expect(sectionOf(s, "AB")).toEqual({ E: 210e9, I: 1e-6, A: 53.8e-4 });
    expect(sectionOf(s, "BC")).toMatchObject({ I: 8360e-8 });
    expect(sectionOf(s, "CD")).toMatchObject({ I: 2e-6 });
    expect(frame.members.every((m) => m.section === undefined)).toBe(true);
  });

  test("ratios, thermal expansion, depth, stiff members", () => {
    const s = withSections(frame, {
      beams: { E: 1, I: 3, A: "stiff", alpha: "12e-6 1/K", depth: "300 mm" },
    });
    expect(sectionOf(s, "BC")).toEqual({ E: 1, I: 3, A: (1e8 * 3) / 64, alpha: 12e-6, depth: 0.3 });
    expect(sectionOf(s, "AB")).toBeUndefined();
  });

  test("builders take them", () => {
    expect(sectionOf(beam({ spans: ["4 m"], sections: { beams: steel } }), "AB")).toMatchObject({ E: 210e9 });
  });

  test.each([
    [
      "an unknown name",
      { girders: steel },
      'the section of "girders" is no member and no group of members; there are columns, beams, AB, BC, CD',
    ],
    [
      "no E",
      { all: { I: 1, A: 1 } },
      'member "all" has no E; give E: "210 GPa", or E: 1 when ratios will do',
    ],
    ["no I", { columns: { E: 1, A: 1 } }, 'member "columns" has no I'],
    ["no A", { AB: { E: 1, I: 1 } }, 'member "AB" has no A; give A: "53.8 cm^2", or A: "stiff"'],
    ["I of zero", { all: { E: 1, I: 0, A: 1 } }, "I of all is 0 m⁴; more than zero is wanted"],
    ["negative A", { all: { ...steel, A: "-3 cm^2" } }, "A of all is -0.0003 m²; more than zero is wanted"],
    [
      "E that is no number",
      { all: { ...steel, E: Number.NaN } },
      "E of all is NaN; a finite number is wanted",
    ],
    [
      "E in metres",
      { all: { ...steel, E: "210 m" } },
      'E of all: "210 m" is a length; a force per area is wanted',
    ],
    [
      "alpha in kelvin",
      { all: { ...steel, alpha: "12 K" } },
      'alpha of all: "12 K" is a temperature change; a per temperature is wanted',
    ],
    ["no depth", { all: { ...steel, depth: "0 m" } }, "depth of all is 0 m; more than zero is wanted"],
  ])("%s is refused", (_, sections, words) => {
    expect(() => withSections(frame, sections as unknown as Record<string, SectionChoice>)).toThrow(words);
  });
});

describe("selfWeight", () => {
  const s = withSections(frame, { all: steel });
  test("area times unit weight, down, on every member or on those named", () => {
    const loads = selfWeight(s, "78.5 kN/m^3");
    expect(loads.map((l) => l.member)).toEqual(["AB", "BC", "CD"]);
    expect(loads[1]?.q1).toBeCloseTo(53.8e-4 * 78500, 9);
    expect(loads[1]?.direction).toEqual([0, -1]);
    expect(selfWeight(s, "78.5 kN/m^3", ["beams"]).map((l) => l.member)).toEqual(["BC"]);
  });
  test("what is wrong is named", () => {
    expect(() => selfWeight(frame, "78.5 kN/m^3")).toThrow(
      'member "AB" has no section; its weight needs its area',
    );
    expect(() => selfWeight(s, "0 kN/m^3")).toThrow("unit weight is 0 N/m³; more than zero is wanted");
    expect(() => selfWeight(s, "78.5 kN/m^3", ["roof"])).toThrow('self weight of "roof" is no member');
  });
});
