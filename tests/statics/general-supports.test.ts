// Supports at any angle, guided and on springs, and member ends released for shear or axial force.
import { describe, expect, test } from "vitest";
import { balance, determinacy } from "../../lib/statics/index.ts";
import { atJoint, beam, type Structure, structure, uniform } from "../../lib/structure/index.ts";

const bar = (right: Parameters<typeof structure>[0]["supports"][string], more: object = {}): Structure =>
  structure({
    joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"] },
    members: { AB: { ends: ["A", "B"], ...more } },
    supports: { A: "pinned", B: right },
  });
const fixedBar = (more: object): Structure =>
  structure({
    joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"] },
    members: { AB: { ends: ["A", "B"], ...more } },
    supports: { A: "fixed", B: "fixed" },
  });

const rows: readonly (readonly [string, Structure, verdict: string, selfStress: number, motions: number])[] =
  [
    ["a roller on a slope", bar({ y: true, angle: "30 deg" }), "determinate", 0, 0],
    [
      "a roller whose push passes through the pin",
      bar({ y: true, angle: "90 deg" }),
      "mechanism with self-stress",
      1,
      1,
    ],
    [
      "two guided supports",
      beam({ spans: ["4 m"], supports: ["guided", "guided"] }),
      "mechanism with self-stress",
      2,
      1,
    ],
    ["fixed and guided", beam({ spans: ["4 m"], supports: ["fixed", "guided"] }), "indeterminate", 2, 0],
    ["a spring upright", bar({ y: "500 kN/m" }), "determinate", 0, 0],
    [
      "a spring against rotation too",
      bar({ y: "500 kN/m", rotation: "500 kN m/rad" }),
      "indeterminate",
      1,
      0,
    ],
    ["fixed ends, shear released", fixedBar({ shearReleased: ["B"] }), "indeterminate", 2, 0],
    [
      "fixed ends, shear and axial force released",
      fixedBar({ shearReleased: ["B"], axialReleased: ["A"] }),
      "indeterminate",
      1,
      0,
    ],
    [
      "fixed ends, all but the moment at A released",
      structure({
        joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"] },
        members: { AB: { ends: ["A", "B"], released: ["B"], shearReleased: ["B"], axialReleased: ["B"] } },
        supports: { A: "fixed", B: "pinned" },
      }),
      "determinate",
      0,
      0,
    ],
  ];

describe("determinacy of general supports and ends", () => {
  test.each(rows)("%s", (_, s, verdict, selfStress, motions) => {
    const found = determinacy(s);
    expect([found.verdict, found.selfStress, found.mechanisms.length]).toEqual([
      verdict,
      selfStress,
      motions,
    ]);
    // By the count alone: degree = states of self-stress less motions.
    expect(found.count.degree).toBe(selfStress - motions);
  });

  test("a joint that only turns is a motion", () => {
    const found = determinacy(
      structure({
        joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"], C: ["7 m", "0 m"] },
        members: {
          AB: { ends: ["A", "B"], released: ["B"] },
          BC: { ends: ["B", "C"], released: ["C"], shearReleased: ["C"] },
        },
        supports: { A: "fixed", B: { y: true }, C: "pinned" },
      }),
    );
    expect(found.mechanisms).toHaveLength(1);
    const [motion] = found.mechanisms;
    expect(motion?.points.every((p) => p.ux === 0 && p.uy === 0)).toBe(true);
    expect(motion?.turns.map((t) => t.rotation !== 0)).toEqual([false, true]);
  });
});

describe("balance of general supports and ends", () => {
  test("two guided supports carry couples and forces along the beam, not a load across it", () => {
    const s = beam({ spans: ["4 m"], supports: ["guided", "guided"] });
    expect(balance(s, [uniform("AB", "1 kN/m")]).balanced).toBe(false);
    expect(balance(s, [uniform("AB", "1 kN/m", { direction: "right" })]).balanced).toBe(true);
  });

  test("an end without shear leaves the load to the other end", () => {
    const s = structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"], C: ["4 m", "3 m"] },
      members: { AB: { ends: ["A", "B"], shearReleased: ["B"] }, BC: ["B", "C"] },
      supports: { A: "fixed" },
    });
    // BC hangs on AB by axial force and moment only: it can move up and down.
    expect(determinacy(s).mechanisms).toHaveLength(1);
    expect(balance(s, [uniform("AB", "1 kN/m")]).balanced).toBe(true);
    expect(balance(s, [atJoint("C", { down: "1 kN" })]).balanced).toBe(false);
    expect(balance(s, [atJoint("C", { right: "1 kN" })]).balanced).toBe(true);
  });
});
