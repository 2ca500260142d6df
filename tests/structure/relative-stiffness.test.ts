import { describe, expect, test } from "vitest";
import { quantity } from "../../lib/quantity/index.ts";
import {
  beam,
  buildingFrame,
  membersCalled,
  portal,
  ratioSources,
  type StiffnessRatios,
  structure,
  withRelativeStiffness,
} from "../../lib/structure/index.ts";
import type { Structure } from "../../lib/structure/types.ts";

const frame = portal({ span: "12 m", height: "5 m", bases: "pinned" });
const inertias = (ratios: StiffnessRatios, of: Structure = frame): readonly (number | undefined)[] =>
  withRelativeStiffness(of, ratios).members.map(({ section }) =>
    section === undefined ? undefined : section.E * section.I,
  );

describe("withRelativeStiffness", () => {
  test.each<[string, StiffnessRatios, readonly number[]]>([
    ["nothing stated", {}, [1, 1, 1]],
    ["beam to columns", { "I of beam / I of columns": 2.5 }, [1, 2.5, 1]],
    ["a member to another", { "I of CD / I of AB": 3 }, [1, 1, 3]],
    ["a group by itself", { "I of columns": 0.5 }, [0.5, 1, 0.5]],
    ["a chain in any order", { "I of BC / I of CD": 4, "I of CD / I of AB": 3 }, [1, 12, 3]],
  ])("%s", (_, ratios, wanted) => {
    expect(inertias(ratios)).toEqual(wanted);
  });

  test("puts ratios in place of sections, hardly shortening, and keeps what the ratios came from", () => {
    const r = quantity(2, "pure number", { from: ["r_I@1"] });
    const found = withRelativeStiffness(frame, { "I of beam / I of columns": r });
    expect(found.members.map(({ from }) => from.includes("r_I@1"))).toEqual([false, true, false]);
    expect(ratioSources({ "I of beam / I of columns": r })).toEqual(["r_I@1"]);
    for (const { section } of found.members)
      expect((section?.A ?? 0) / (section?.I ?? 1)).toBeGreaterThan(1e5);
  });

  test.each<[string, StiffnessRatios, RegExp]>([
    [
      "a key it cannot read",
      { "beam to column": 2 },
      /"beam to column" cannot be read; write "I of beams \/ I of columns"/,
    ],
    [
      "unknown members",
      { "I of rafters": 2 },
      /the stiffness of "rafters" is no member and no group.*columns, beams, AB, BC, CD/,
    ],
    ["a ratio of nought", { "I of beam / I of columns": 0 }, /is 0; a number more than zero/],
    ["a member twice", { "I of beam": 2, "I of BC": 3 }, /"I of BC" sets the I of member "BC" a second time/],
    ["a circle", { "I of AB / I of CD": 2, "I of CD / I of AB": 2 }, /are measured by each other/],
    [
      "unlike measures",
      { "I of AB": 2, "I of beam / I of columns": 2 },
      /measured by members of unlike I \(AB, CD\)/,
    ],
  ])("refuses %s", (_, ratios, words) => {
    expect(() => withRelativeStiffness(frame, ratios)).toThrow(words);
  });

  test("refuses a length as a ratio", () => {
    const ratios = { "I of beam": quantity(2, "length") } as unknown as StiffnessRatios;
    expect(() => withRelativeStiffness(frame, ratios)).toThrow(/is 2.* m; a number more than zero is wanted/);
  });
});

describe("membersCalled", () => {
  test("knows members, groups and the trade's words, with and without builders", () => {
    const plain = structure({
      joints: { P: ["0 m", "0 m"], Q: ["0 m", "4 m"], R: ["6 m", "4 m"] },
      members: { PQ: ["P", "Q"], QR: ["Q", "R"] },
      supports: { P: "fixed", R: "roller" },
    });
    const tower = buildingFrame({ bays: ["6 m"], storeys: ["3 m"], bases: "fixed" });
    expect(membersCalled(plain, "columns")).toEqual(["PQ"]);
    expect(membersCalled(plain, "beam")).toEqual(["QR"]);
    expect(membersCalled(tower, "column")).toEqual(["A0A1", "B0B1"]);
    expect(membersCalled(beam({ spans: ["5 m", "6 m"] }), "BC")).toEqual(["BC"]);
  });
});
