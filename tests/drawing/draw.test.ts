import { describe, expect, it } from "vitest";
import { drawLineChart, drawSketch, type SketchSpec } from "../../lib/drawing/index.ts";
import {
  bandChart,
  beamFigure,
  crowdedFigure,
  eaveForce,
  jointFigure,
  kneeFigure,
  portal,
  portalDiagrams,
  portalFigure,
  sway,
} from "./fixtures.ts";
import { expectGolden } from "./golden.ts";

const sketches: readonly (readonly [string, SketchSpec])[] = [
  ["portal", portalFigure],
  ["beam", beamFigure],
  ["frame", crowdedFigure],
  ["sway", sway],
  ["knee", kneeFigure],
  ["joint", jointFigure],
  ["diagrams", portalDiagrams],
  ["diagrams-compression", { ...portalDiagrams, moments: "compression side", quantities: ["M"] }],
];

describe("drawSketch", () => {
  it.each(sketches)("drawSketch(%s) is the kept drawing", (name, spec) => {
    expectGolden(import.meta.url, `${name}.svg`, drawSketch(spec, "fig"));
  });

  it.each(sketches)(
    "drawSketch(%s) says what it shows, prefixes ids, and styles nothing inline",
    (_, spec) => {
      const svg = drawSketch(spec, "own");
      expect(svg).toContain('role="img"');
      expect(svg).toMatch(/<title id="own-title">[^<]+<\/title>\n<desc id="own-desc">[^<]+<\/desc>/);
      const ids = [...svg.matchAll(/ id="([^"]*)"/g)].map((m) => m[1]);
      expect(ids).toEqual(["own-title", "own-desc"]);
      expect(svg).not.toMatch(/ style=|<style|NaN|Infinity|undefined/);
      const width = Number(/viewBox="0 0 ([\d.]+) /.exec(svg)?.[1]);
      expect(width).toBeGreaterThan(100);
      expect(width).toBeLessThanOrEqual(spec.kind === "free body" ? 350.1 : 480.1);
    },
  );

  it("drawSketch(tension side) and (compression side) are mirror images about the members", () => {
    const curveOf = (moments: "tension side" | "compression side") =>
      [
        ...drawSketch({ ...portalDiagrams, quantities: ["M"], moments, marks: [] }, "f").matchAll(
          /<polyline points="([^"]+)" fill="none" stroke-linejoin="round" class="fig-curve"/g,
        ),
      ].map((m) => (m[1] ?? "").split(" ").map((p) => p.split(",").map(Number)));
    const [tension, compression] = [curveOf("tension side"), curveOf("compression side")];
    expect(tension).toHaveLength(3);
    // Beam BC: the axis is the first point's height; ordinates are mirrored about it.
    const [t = [], c = []] = [tension[1] ?? [], compression[1] ?? []];
    const midspan = (points: number[][]) => {
      const axis = points[0]?.[1] ?? Number.NaN;
      return (points[Math.floor(points.length / 2)]?.[1] ?? Number.NaN) - axis;
    };
    expect(midspan(t)).toBeGreaterThan(20);
    // Coordinates carry one decimal, and the two drawings may be scaled a little differently by their labels.
    expect(midspan(c)).toBeCloseTo(-midspan(t), 0);
  });

  it("drawSketch(known action with a negative value) turns the arrow round", () => {
    const flipped = {
      ...kneeFigure,
      body: {
        ...kneeFigure.body,
        actions: kneeFigure.body.actions.map((a) =>
          a.value === undefined
            ? a
            : { ...a, value: -a.value, direction: [-a.direction[0], -a.direction[1]] as const },
        ),
      },
    };
    expect(drawSketch(flipped, "f")).toBe(drawSketch(kneeFigure, "f"));
  });

  it("drawSketch(diagram of rounding crumbs) says zero instead of filling the panel", () => {
    const crumbs = portalDiagrams.forces.map((f) => ({
      ...f,
      N: { breaks: [0, f.length], pieces: [[1e-9]] },
    }));
    const svg = drawSketch({ ...portalDiagrams, forces: crumbs, quantities: ["N"] }, "f");
    expect(svg).toContain("zero throughout");
    expect(svg).not.toContain("fig-curve");
  });

  const wrong: readonly (readonly [string, SketchSpec, RegExp])[] = [
    [
      "load on an unknown member",
      { ...portalFigure, loads: [{ ...beamFigure.loads[0], member: "XY" }] } as SketchSpec,
      /on member "XY", which is not defined; members are AB, BC, CD/,
    ],
    [
      "load at an unknown joint",
      { ...portalFigure, loads: [{ ...eaveForce, joint: "Z" }] } as SketchSpec,
      /joint "Z", which is not defined; joints are A, B, C, D/,
    ],
    [
      "coordinate that is no number",
      {
        ...portalFigure,
        structure: {
          ...portal,
          joints: portal.joints.map((j) => (j.name === "C" ? { ...j, x: Number.NaN } : j)),
        },
      },
      /x coordinate is NaN; a finite number is wanted/,
    ],
    [
      "member without length",
      {
        ...portalFigure,
        structure: { ...portal, joints: portal.joints.map((j) => (j.name === "C" ? { ...j, x: 0 } : j)) },
      },
      /member "BC" has length 0 m; more than 0 is wanted/,
    ],
    ["texts that do not match the actions", { ...kneeFigure, texts: ["A_x"] }, /1 texts for 5 actions/],
    [
      "mechanism that leaves out a joint",
      { ...sway, mechanism: { ...sway.mechanism, points: sway.mechanism.points.slice(1) } },
      /says nothing of "A"; it names B, C, D, h1, h2/,
    ],
  ];
  it.each(wrong)("drawSketch(%s) is refused, naming it", (_, spec, message) => {
    expect(() => drawSketch(spec, "f")).toThrow(message);
  });

  it.each(["", "3", 'a"b', "a b", "a<b"])("drawSketch(prefix %j) is refused", (prefix) => {
    expect(() => drawSketch(portalFigure, prefix)).toThrow(/figure prefix .* will not do/);
  });
});

describe("drawLineChart", () => {
  it("drawLineChart(two lines) is the kept drawing, the same however many charts came before", async () => {
    await drawLineChart(bandChart, "other");
    expectGolden(import.meta.url, "chart.svg", await drawLineChart(bandChart, "fig"));
  });

  it("drawLineChart: every id and every reference carries the prefix, nothing is styled inline", async () => {
    const svg = await drawLineChart(bandChart, "own");
    const ids = [...svg.matchAll(/ id="([^"]*)"/g)].map((m) => m[1] ?? "");
    expect(ids.length).toBeGreaterThanOrEqual(2);
    expect(ids.filter((id) => !id.startsWith("own-"))).toEqual([]);
    for (const [, target = ""] of svg.matchAll(/url\(#([^)]*)\)/g)) expect(ids).toContain(target);
    expect(svg).not.toMatch(/ style=/);
  });

  it("drawLineChart(point that is no number) is refused, naming series and point", async () => {
    const spec = {
      ...bandChart,
      series: [{ name: "exact", points: [[1, 2] as const, [2, Number.NaN] as const] }],
    };
    await expect(drawLineChart(spec, "f")).rejects.toThrow(/point 2 of "exact" is \(2, NaN\)/);
  });

  it("drawLineChart(no series) is refused", async () => {
    await expect(drawLineChart({ ...bandChart, series: [] }, "f")).rejects.toThrow(/no series/);
  });
});
