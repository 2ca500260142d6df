import { describe, expect, test } from "vitest";
import { structureName } from "../../lib/guide/words.ts";
import { beam, buildingFrame, portal, structure, withHinges } from "../../lib/structure/index.ts";
import type { Structure } from "../../lib/structure/types.ts";

const grid = { bays: ["6 m", "7 m"], storeys: ["4 m", "3.5 m", "3.5 m"], bases: "fixed" } as const;
const frame = buildingFrame(grid);

const named: readonly (readonly [string, Structure])[] = [
  ["beam ABC", beam({ spans: ["8 m", "6 m"], supports: ["pinned", "roller", "roller"] })],
  ["frame ABCD", portal({ span: "12 m", height: "5 m", bases: "pinned" })],
  ["frame of 2 bays and 3 storeys", frame],
  ["frame of 2 bays and 3 storeys", withHinges(frame, [{ member: "A1B1", from: "A1", at: "1 m" }])],
  ["frame of 1 bay and 1 storey", buildingFrame({ bays: ["6 m"], storeys: ["4 m"], bases: "pinned" })],
  ["frame of 2 bays and 3 storeys, 14 members", buildingFrame({ ...grid, without: ["B3C3"] })],
  ["frame of 2 bays and 3 storeys, 11 members", buildingFrame({ ...grid, storeysOf: [3, 1] })],
  [
    "structure ABC",
    structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"], C: ["4 m", "3 m"] },
      members: { AB: ["A", "B"], BC: ["B", "C"] },
      supports: { A: "fixed" },
    }),
  ],
];

describe("structureName", () => {
  test.each(named)("%s", (name, of) => {
    expect(structureName(of)).toBe(name);
  });
});
