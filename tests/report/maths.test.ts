import { describe, expect, it } from "vitest";
import { breakable, maths, threeLines, uprightSubscripts } from "../../lib/report/maths.ts";

describe("breakable", () => {
  const long =
    "(1.75\\,\\mathrm{m})(67.2\\,\\mathrm{kN}) - (0.875\\,\\mathrm{m})(22.4\\,\\mathrm{kN}) + (5.50\\,\\mathrm{m}) X_{h1} = 0";
  it.each([
    ["a short formula", "M = w L + 3", ["M = w L + 3"]],
    [
      "a long sum",
      long,
      [
        "(1.75\\,\\mathrm{m})(67.2\\,\\mathrm{kN})",
        "- (0.875\\,\\mathrm{m})(22.4\\,\\mathrm{kN})",
        "+ (5.50\\,\\mathrm{m}) X_{h1} = 0",
      ],
    ],
    [
      "signs inside brackets and braces",
      "\\frac{a+b+c+d+e+f+g+h+i+j+k+l}{2} \\left(m+n+o+p+q+r+s+t+u+v+w\\right)",
      ["\\frac{a+b+c+d+e+f+g+h+i+j+k+l}{2} \\left(m+n+o+p+q+r+s+t+u+v+w\\right)"],
    ],
    [
      "a sign after a relation or a product",
      "= -aaaaaaaaaaaaaaaaaaaaaaaaaaa \\cdot -bbbbbbbbbbbbbbbbbbbbbbbbbb",
      ["= -aaaaaaaaaaaaaaaaaaaaaaaaaaa \\cdot -bbbbbbbbbbbbbbbbbbbbbbbbbb"],
    ],
  ])("breakable(%s)", (_, tex, pieces) => {
    expect(breakable(tex)).toEqual(pieces);
  });

  it("breakable loses nothing", () => {
    expect(breakable(long).join(" ")).toBe(long);
  });
});

describe("maths", () => {
  it("maths(TeX that cannot be read) shows it as it is, escaped", () => {
    expect(maths("\\frac{<b>").html).toBe("<code>\\frac{&lt;b&gt;</code>");
  });
});

describe("uprightSubscripts", () => {
  it.each([
    ["M_{\\mathrm{BC},B} = 0", "M_{\\mathrm{BC,B}} = 0"],
    ["X_{a,b}", "X_{\\mathrm{a,b}}"],
    ["X_{\\mathrm{h1}} + A_x", "X_{\\mathrm{h1}} + A_x"],
    ["\\sum M_{A}", "\\sum M_{A}"],
  ])("uprightSubscripts(%s) is %s", (tex, expected) => {
    expect(uprightSubscripts(tex)).toBe(expected);
  });
});

describe("threeLines", () => {
  const link = (html: { html: string }) => ({ html: `<a>${html.html}</a>` });
  it("threeLines writes a left side that repeats only once", () => {
    const { html } = threeLines({ symbols: "w = g + s", numbers: "w = 6 + 7", result: "w = 13" }, link);
    expect(html.match(/<mi>w<\/mi>/g)).toHaveLength(1);
    expect(html).toMatch(/<a><math[^>]*><mrow><mo>=<\/mo><mn>13<\/mn>/);
  });

  it("threeLines prints numbers and result once where they are the same", () => {
    const { html } = threeLines({ symbols: "a \\le b", numbers: "1 \\le 2", result: "1 \\le 2" }, link);
    expect(html.match(/<math/g)).toHaveLength(2);
  });
});
