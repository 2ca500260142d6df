import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { drawSketch, type FreeBodyFigure } from "../../lib/drawing/index.ts";
import { type HingeSet, hinge, openSheet, type Sheet } from "../../lib/guide/index.ts";
import { forgetLedger } from "../../lib/sheet/index.ts";
import { atJoint, beam, buildingFrame, pointLoad, truss, uniform } from "../../lib/structure/index.ts";
import type { Load, Structure } from "../../lib/structure/types.ts";
import { head, ofKind, started, twoHinges } from "./solved.ts";

beforeEach(() => forgetLedger());
afterEach(() => forgetLedger());

interface Recorded {
  readonly sheet: Sheet;
  readonly hinged: Structure;
  readonly loads: readonly Load[];
}

function recordedFrom(sheet: Sheet, set: HingeSet): Recorded {
  const [solved] = sheet.freeBodies(set).solved;
  return { sheet, hinged: set.hinged, loads: solved?.loads ?? [] };
}

function portalRecorded(): Recorded {
  const begun = started();
  const set = twoHinges(begun);
  return recordedFrom(begun.sheet, set);
}

function frameRecorded(bays: number, storeys: number): Recorded {
  const sheet = openSheet(head);
  const frame = buildingFrame({
    bays: Array.from({ length: bays }, (_, i) => `${6 + i} m` as const),
    storeys: Array.from({ length: storeys }, () => "3.6 m" as const),
    bases: "fixed",
  });
  const beams = frame.members.filter(({ group }) => group === "beams");
  const G = sheet.loadCase("G", "permanent", ...beams.map(({ name }) => uniform(name, "20 kN/m")));
  const set = sheet.gravity(frame, [G], { place: "common practice", because: "joints rigid" });
  return recordedFrom(sheet, set);
}

/** The deepest load is on the left column, across it, and is drawn with none of the other bodies. */
function windRecorded(): Recorded {
  const { sheet, frame } = started();
  const W = sheet.loadCase(
    "W",
    "wind",
    uniform("AB", "30 kN/m", { direction: "across" }),
    uniform("BC", "4 kN/m"),
  );
  const set = sheet.hinges(frame, [W], [hinge("BC", { from: "B", at: "0.5 L", because: "usual" })]);
  return recordedFrom(sheet, set);
}

function beamRecorded(): Recorded {
  const sheet = openSheet(head);
  const frame = beam({ spans: ["8 m", "6 m", "2 m"], supports: ["pinned", "roller", "roller", "free"] });
  const G = sheet.loadCase(
    "G",
    "permanent",
    uniform("AB", "9 kN/m"),
    pointLoad("CD", "12 kN", { at: "2 m" }),
  );
  const set = sheet.hinges(frame, [G], [hinge("AB", { from: "B", at: "0.25 L", because: "usual" })]);
  return recordedFrom(sheet, set);
}

function trussRecorded(): Recorded {
  const sheet = openSheet(head);
  const frame = truss({
    panels: ["3 m", "3 m", "3 m", "3 m"],
    depth: "1.5 m",
    diagonals: "falling to midspan",
  });
  const wind = sheet.loadCase("W", "wind", atJoint("U1", { right: "10 kN" }));
  const set = sheet.hinges(frame, [wind], []);
  return recordedFrom(sheet, set);
}

/** The figure of the whole structure and all its loads that one of a body stands for. */
function whole(spec: FreeBodyFigure, { hinged, loads }: Recorded): FreeBodyFigure {
  const texts = loads.map((load) => JSON.stringify(load));
  const actions = spec.body.actions.map((action) => {
    if (!("load" in action.source)) return action;
    const load = texts.indexOf(JSON.stringify(spec.loads[action.source.load]));
    expect(load).toBeGreaterThanOrEqual(0);
    return { ...action, source: { load } };
  });
  return { ...spec, structure: hinged, loads, body: { ...spec.body, actions } };
}

const bodies = ({ sheet }: Recorded): readonly FreeBodyFigure[] =>
  ofKind(sheet, "figure").flatMap(({ spec }) =>
    spec.kind === "free body" ? [spec as unknown as FreeBodyFigure] : [],
  );

describe("figures of bodies", () => {
  test.each([
    ["portal", portalRecorded],
    ["2 bays, 3 storeys", () => frameRecorded(2, 3)],
    ["beam on three supports with an overhang", beamRecorded],
    ["truss", trussRecorded],
    ["portal in the wind", windRecorded],
  ])("%s: drawn from the members around them as from the whole structure", (_, recorded) => {
    const made = recorded();
    const drawn = bodies(made);
    expect(drawn.length).toBeGreaterThan(2);
    for (const spec of drawn) expect(drawSketch(spec, "f")).toBe(drawSketch(whole(spec, made), "f"));
  });

  test("carry no more of a larger frame", () => {
    const most = (bays: number, storeys: number): number => {
      forgetLedger();
      return Math.max(
        ...bodies(frameRecorded(bays, storeys)).map(
          ({ structure, loads }) => structure.members.length + loads.length,
        ),
      );
    };
    expect(most(3, 4)).toBe(most(2, 2));
  });

  test("one equation more of a body that stands drawn above has no second figure", () => {
    const made = frameRecorded(2, 3);
    const seen = new Set<string>();
    const again = bodies(made).filter(({ body, sought }) => {
      const known = seen.has(body.name);
      seen.add(body.name);
      return known && sought?.length === 1;
    });
    expect(again).toEqual([]);
    // and every step is of a body that is drawn
    const steps = ofKind(made.sheet, "step").filter(({ id }) => !/holding|nothing acts/.test(id));
    expect(steps.length).toBeGreaterThan(30);
    for (const { body } of steps) expect([...seen]).toContain(body.replace(/, [^,]*$/, ""));
  });
});
