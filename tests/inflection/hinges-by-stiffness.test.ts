import { expect, test } from "vitest";
import { hingesByStiffness, kneeHinge, momentDistribution, netOf } from "../../lib/inflection/index.ts";
import { portal, uniform } from "../../lib/structure/index.ts";

test("hingesByStiffness(fixed portal): the knees' hinges, and a third of the column above the base", () => {
  const frame = portal({
    span: "12 m",
    height: "4 m",
    bases: "fixed",
    sections: { columns: { E: 1, I: 1, A: 1 }, beams: { E: 1, I: 3, A: 1 } },
  });
  const net = netOf(frame, [uniform("BC", "20 kN/m")]);
  const [AB, BC, CD] = hingesByStiffness(net, momentDistribution(net, 60));
  const x = 12 * kneeHinge(1, "fixed");
  expect(BC?.at.map((a) => Number(a.toFixed(6)))).toEqual([x, 12 - x].map((a) => Number(a.toFixed(6))));
  expect(AB?.at[0]).toBeCloseTo(4 / 3, 6);
  expect(CD?.at[0]).toBeCloseTo(8 / 3, 6);
  expect([AB?.at.length, CD?.at.length]).toEqual([1, 1]);
});
