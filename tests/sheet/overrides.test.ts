import { afterEach, describe, expect, test } from "vitest";
import { quantity } from "../../lib/quantity/index.ts";
import { attachHost, forgetLedger } from "../../lib/sheet/index.ts";
import { notebook } from "./notebook.ts";

afterEach(() => {
  forgetLedger();
  attachHost();
});

describe("givens set from outside", () => {
  test("the measure set replaces the one written, which is kept beside it", () => {
    const { sheet, run } = notebook({ g: "6 kN/m" });
    run(1, (s) => {
      const g = s.given("g", "5.2 kN/m", "roof");
      expect(g).toMatchObject({ si: 6000, dimension: "force per length", from: ["g@1"] });
    });
    expect(sheet.entry("g")).toMatchObject({
      value: { si: 6000, text: "6.00 kN/m" },
      overridden: { si: 5200, text: "5.20 kN/m" },
    });
    expect(sheet.unusedOverrides()).toEqual([]);
  });

  test("an assumption with a value takes it too", () => {
    const { sheet, run } = notebook({ r_I: "4" });
    run(1, (s) => s.assume("r_I", 2.5, "two similar roofs"));
    expect(sheet.entry("r_I")).toMatchObject({
      value: { si: 4 },
      text: "r_I = 4.00",
      overridden: { si: 2.5 },
    });
  });

  test("another unit of the same dimension will do", () => {
    const { sheet, run } = notebook({ g: "0.4 klf" });
    run(1, (s) => s.given("g", "5.2 kN/m"));
    expect(sheet.lookup("g").in("klf")).toBeCloseTo(0.4, 12);
  });

  test("a part of a span is taken where the span is said, and refused with what to write elsewhere", () => {
    const { run } = notebook({ x_h: "0.2 L", r: "0.2 L", "hinge h1 (G)": "0.2 L" });
    run(1, (s) => {
      const written = quantity(1.2, "length");
      expect(s.setFromOutside("hinge h1 (G)", written, "0.1 L", quantity(12, "length")).si).toBeCloseTo(
        2.4,
        12,
      );
    });
    expect(() => run(2, (s) => s.assume("x_h", "1.2 m", "a try"))).toThrow(
      'x_h, set from outside: "0.2 L" is a part of a span, and only places of hinges are set so; x_h is a length, write one with its unit',
    );
    expect(() => run(3, (s) => s.assume("r", 0.1, "a try"))).toThrow("r is a pure number, write 0.2");
  });

  test("those that nothing took up are known", () => {
    const { sheet, run } = notebook({ g: "6 kN/m", q: "1 kN/m" });
    run(1, (s) => s.given("g", "5.2 kN/m"));
    expect(sheet.unusedOverrides()).toEqual(["q"]);
  });

  const wrong = [
    ["6 kN", 'g, set from outside: "6 kN" is a force; a force per length is wanted, e.g. "5.2 kN/m"'],
    ["6", 'g, set from outside: "6" is a pure number'],
    ["", "g, set from outside is empty"],
    [
      "0.2 L",
      'g, set from outside: "0.2 L" is a part of a span, and only places of hinges are set so; g is a force per length',
    ],
    ["6 kN/n", 'g, set from outside: "6 kN/n": "kN/n" is not a unit known here'],
  ] as const;
  test.each(wrong)("%j is refused for a line load", (text, message) => {
    const { run } = notebook({ g: text });
    expect(() => run(1, (s) => s.given("g", "5.2 kN/m"))).toThrow(message);
  });

  test("a calculated symbol cannot be set: the givens beneath it are named", () => {
    const { run } = notebook({ W: "500 cm^3" });
    run(1, (s) => {
      s.given("L", "14 m");
      s.given("w", "5.2 kN/m");
      s.given("unrelated", "1 m");
      s.assume("f", "160 MPa", "mild steel");
      s.calc("M_0 = w*L^2/8", "kN m");
    });
    expect(() => run(2, (s) => s.calc("W = M_0/f", "cm^3"))).toThrow(
      "W is calculated, not given: it stands on w, L, f; set one of those",
    );
  });

  test("nor can a result", () => {
    const { run } = notebook({ R: "5 kN" });
    run(1, (s) => s.given("H", "18 kN"));
    expect(() => run(2, (s) => s.result("R", s.lookup("H").over(2)))).toThrow(
      "R is calculated, not given: it stands on H; set one of those",
    );
  });
});
