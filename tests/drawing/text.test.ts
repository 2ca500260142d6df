import { describe, expect, it } from "vitest";
import { drawLineChart, drawSketch, type SketchSpec } from "../../lib/drawing/index.ts";
import { escapeXml, runs, textContent, textWidth } from "../../lib/drawing/text.ts";
import { bandChart, kneeFigure, portalDiagrams, portalFigure, sway } from "./fixtures.ts";

const HOSTILE = `</text></svg><script>alert(1)</script><img src=x onerror="alert(2)">&'\u0000\u0008\ud800`;

/** The same value with every text in it made hostile, keys and words of the format aside. */
function poisoned<T>(value: T, keep: ReadonlySet<string>): T {
  if (typeof value === "string") return (keep.has(value) ? value : HOSTILE + value) as T;
  if (Array.isArray(value)) return value.map((v) => poisoned(v, keep)) as T;
  if (typeof value !== "object" || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([k, v]) => [k, poisoned(v, keep)])) as T;
}

const WORDS = new Set(
  "structure,mechanism,free body,diagrams,line chart,distributed,member point,joint,fixed,pinned,roller,free,portal,beam,general,x,y,N,V,M,end,extreme,jump,zero,tension side,compression side".split(
    ",",
  ),
);

/** Nothing but the drawing's own elements may be in it. */
function onlyOwnElements(svg: string): void {
  const names = new Set([...svg.matchAll(/<\/?([A-Za-z!?][\w:-]*)/g)].map((m) => m[1]));
  const own = "svg,title,desc,rect,g,line,polyline,polygon,path,circle,text,tspan,defs,clipPath".split(",");
  expect([...names].filter((n) => !own.includes(n ?? ""))).toEqual([]);
  expect(/<[^>]*\son[a-z]+="/i.test(svg.replace(/>[^<]*</g, "><"))).toBe(false);
  // biome-ignore lint/suspicious/noControlCharactersInRegex: the very characters that must be gone
  expect(/[\u0000-\u0008]|\p{Cs}/u.test(svg)).toBe(false);
}

describe("escaping", () => {
  it.each([
    ["structure", portalFigure],
    ["mechanism", sway],
    ["free body", kneeFigure],
    ["diagrams", portalDiagrams],
  ] as const)("drawSketch(%s with hostile texts everywhere) holds no markup but its own", (_, spec) => {
    const svg = drawSketch(poisoned(spec, WORDS) as SketchSpec, "f");
    expect(svg).toContain("&lt;script&gt;");
    onlyOwnElements(svg);
  });

  it("drawLineChart(hostile texts) holds no markup but its own", async () => {
    const svg = await drawLineChart(poisoned(bandChart, new Set(["line chart"])), "f");
    expect(svg).toContain("&lt;script&gt;");
    onlyOwnElements(svg);
  });

  it("escapeXml replaces what XML forbids", () => {
    expect(escapeXml("a\u0001<b>\ud800&\"'")).toBe("a\ufffd&lt;b&gt;\ufffd&amp;&quot;&#39;");
  });
});

describe("subscripts", () => {
  it.each([
    [
      "A_x",
      [
        ["A", false],
        ["x", true],
      ],
    ],
    [
      "X_{h1} = 3 kN",
      [
        ["X", false],
        ["h1", true],
        [" = 3 kN", false],
      ],
    ],
    [
      "M_{BC,B}",
      [
        ["M", false],
        ["BC,B", true],
      ],
    ],
    ["roof_beam", [["roof_beam", false]]],
    [
      "A0_x and AB12_M",
      [
        ["A0", false],
        ["x", true],
        [" and AB12", false],
        ["M", true],
      ],
    ],
    ["12.8 kN/m", [["12.8 kN/m", false]]],
  ] as const)("runs(%s)", (text, expected) => {
    expect(runs(text).map((r) => [r.text, r.lowered])).toEqual(expected);
  });

  it("textContent comes back to the line after a subscript", () => {
    const shifts = [...textContent("A_x + B_y = 0", 14).matchAll(/dy="([^"]+)"/g)].map((m) => Number(m[1]));
    expect(shifts).toHaveLength(4);
    expect(shifts.reduce((a, b) => a + b, 0)).toBe(0);
  });

  it("textWidth counts a subscript smaller", () => {
    expect(textWidth("A_x", 14)).toBeLessThan(textWidth("Ax", 14));
  });
});
