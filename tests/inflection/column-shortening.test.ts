import { describe, expect, test } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import {
  asBending,
  columnSinking,
  jointRotations,
  netOf,
  withShortening,
} from "../../lib/inflection/index.ts";
import { valueAt } from "../../lib/results/index.ts";
import {
  atJoint,
  beam,
  buildingFrame,
  pointLoad,
  type Structure,
  uniform,
} from "../../lib/structure/index.ts";

/** Two equal bays of 6 m and storeys of 3.5 m; I 1 m⁴ everywhere in ratio, columns with a radius of gyration of 0.1 m. */
function frameOf(storeys: number): Structure {
  return buildingFrame({
    bays: ["6 m", "6 m"],
    storeys: Array.from({ length: storeys }, () => "3.5 m" as const),
    bases: "fixed",
    sections: { columns: { E: 1, I: 1, A: 100 }, beams: { E: 1, I: 3, A: "stiff" } },
  });
}
const gravity = (frame: Structure) =>
  frame.members.filter((m) => m.group === "beams").map((m) => uniform(m.name, "20 kN/m"));

describe("columnSinking", () => {
  test("sums N h / EA from the ground up, N from simple reactions and joint loads", () => {
    const frame = frameOf(2);
    const loads = [
      ...gravity(frame),
      atJoint("A2", { down: "30 kN" }),
      pointLoad("B1C1", "60 kN", { at: "2 m" }),
    ];
    const sinking = columnSinking(netOf(frame, loads));
    const at = (joint: string): number =>
      sinking[frame.joints.findIndex((j) => j.name === joint)] ?? Number.NaN;
    const EA = 100;
    expect(at("A0")).toBe(0);
    expect(at("A1")).toBeCloseTo((150e3 * 3.5) / EA, 6); // 60 + 60 + 30 kN
    expect(at("A2")).toBeCloseTo(((150e3 + 90e3) * 3.5) / EA, 6);
    expect(at("B1")).toBeCloseTo(((240e3 + 40e3) * 3.5) / EA, 6); // 40 of the 60 kN
    expect(at("C2")).toBeCloseTo(((120e3 + 20e3 + 60e3) * 3.5) / EA, 6);
  });

  test("refuses a joint that stands on nothing", () => {
    const frame = beam({
      spans: ["4 m", "4 m"],
      supports: ["fixed", "free", "fixed"],
      sections: { all: { E: 1, I: 1, A: 1 } },
    });
    expect(() => columnSinking(netOf(frame, []))).toThrow('joint "B" stands on no column');
  });
});

test("withShortening: the inner column sinks more, and end moments come near the exact ones", () => {
  const frame = frameOf(6);
  const loads = gravity(frame);
  const truth = exact(frame, loads).members;
  const net = netOf(frame, loads);
  const error = (used: typeof net): number => {
    const ends = asBending(net, jointRotations(used, 1));
    const size = Math.max(...truth.map((m) => Math.abs(valueAt(m.M, 0))));
    return Math.max(...truth.map((m, i) => Math.abs(valueAt(m.M, 0) - (ends[i]?.start ?? 0)) / size));
  };
  const [without, withIt] = [error(net), error(withShortening(net))];
  expect(without).toBeGreaterThan(0.1);
  expect(withIt).toBeLessThan(0.25 * without);
});
