import { describe, expect, test } from "vitest";
import { determinacy } from "../../lib/statics/index.ts";
import { panelGirder, truss, trussPortal } from "../../lib/structure/index.ts";

const panels = ["3 m", "3 m", "2 m", "2 m"] as const;
const names = (things: readonly { readonly name: string }[]): readonly string[] => things.map((t) => t.name);

describe("truss", () => {
  test.each([
    ["rising", ["L0U1", "L1U2", "L2U3", "L3U4"]],
    ["falling", ["U0L1", "U1L2", "U2L3", "U3L4"]],
    ["falling to midspan", ["U0L1", "U1L2", "L2U3", "L3U4"]],
    ["rising to midspan", ["L0U1", "L1U2", "U2L3", "U3L4"]],
    ["zigzag", ["L0U1", "U1L2", "L2U3", "U3L4"]],
    ["crossed", ["L0U1", "U0L1", "L1U2", "U1L2", "L2U3", "U2L3", "L3U4", "U3L4"]],
  ] as const)("diagonals %s", (diagonals, bars) => {
    const t = truss({ panels, depth: "2.5 m", diagonals });
    expect(names(t.members.filter((m) => m.group === "diagonals"))).toEqual(bars);
    expect(t.members.every((m) => m.releases.start.moment && m.releases.end.moment)).toBe(true);
    const { verdict, selfStress } = determinacy(t);
    // One diagonal per panel makes it determinate, each crossed panel redundant once.
    expect([verdict, selfStress]).toEqual(
      diagonals === "crossed" ? ["indeterminate", 4] : ["determinate", 0],
    );
  });

  test("chords, verticals, places and supports", () => {
    const t = truss({ panels, depth: "2.5 m", diagonals: "zigzag" });
    expect(names(t.members.filter((m) => m.group === "bottom chord"))).toEqual([
      "L0L1",
      "L1L2",
      "L2L3",
      "L3L4",
    ]);
    expect(names(t.members.filter((m) => m.group === "top chord"))).toEqual(["U0U1", "U1U2", "U2U3", "U3U4"]);
    expect(names(t.members.filter((m) => m.group === "verticals"))).toHaveLength(5);
    expect(t.joints.find((j) => j.name === "U3")).toMatchObject({ x: 8, y: 2.5 });
    expect(t.supports.map((s) => [s.joint, s.kind])).toEqual([
      ["L0", "pinned"],
      ["L4", "roller"],
    ]);
    const hung = truss({
      panels,
      depth: "2 m",
      diagonals: "zigzag",
      supports: { U0: "pinned", U4: "roller" },
    });
    expect(hung.supports.map((s) => s.joint)).toEqual(["U0", "U4"]);
  });

  test("what is wrong is named", () => {
    const odd = { panels, depth: "2 m", diagonals: "slanted" } as unknown as Parameters<typeof truss>[0];
    expect(() => truss(odd)).toThrow('diagonals is "slanted"; it is one of "rising", "falling"');
    expect(() => truss({ panels: [], depth: "2 m", diagonals: "rising" })).toThrow(
      "panels: 0 given, 1 wanted",
    );
    expect(() => truss({ panels, depth: "-2 m", diagonals: "rising" })).toThrow(
      "depth is -2 m; more than zero is wanted",
    );
    expect(() => truss({ panels, depth: "2 m", diagonals: "rising", supports: { L9: "pinned" } })).toThrow(
      'a support is at joint "L9", which is not defined',
    );
  });
});

describe("panelGirder", () => {
  test("rigid chords and posts: three times redundant in every panel", () => {
    const g = panelGirder({ panels, depth: "2 m" });
    expect(names(g.members.filter((m) => m.group === "posts"))).toEqual([
      "L0U0",
      "L1U1",
      "L2U2",
      "L3U3",
      "L4U4",
    ]);
    expect(determinacy(g).selfStress).toBe(12);
    expect(g.form).toBe("panel girder");
  });
});

describe("trussPortal", () => {
  test("columns run through to the top chord, bars are pinned", () => {
    const p = trussPortal({
      panels: ["3 m", "3 m"],
      depth: "2 m",
      height: "5 m",
      diagonals: "rising",
      bases: "pinned",
    });
    expect(names(p.members.filter((m) => m.group === "columns"))).toEqual(["AL0", "L0U0", "BL2", "L2U2"]);
    expect(p.joints.find((j) => j.name === "U2")).toMatchObject({ x: 6, y: 7 });
    expect(names(p.members.filter((m) => m.group === "verticals"))).toEqual(["L1U1"]);
    const { verdict, selfStress } = determinacy(p);
    expect([verdict, selfStress]).toEqual(["indeterminate", 1]);
  });

  test("bases of their own", () => {
    const p = trussPortal({
      panels: ["3 m", "3 m"],
      depth: "2 m",
      height: "5 m",
      diagonals: "rising",
      bases: { left: "fixed", right: "pinned" },
    });
    expect(p.supports.map((s) => s.kind)).toEqual(["fixed", "pinned"]);
  });
});
