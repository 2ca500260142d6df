import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { canonicalDigest, canonicalJson, sha256 } from "../../lib/sheet/index.ts";

describe("canonicalJson", () => {
  test("writes the sample of RFC 8785, section 3.2 (from memory)", () => {
    const sample = JSON.parse(
      '{"numbers":[333333333.33333329,1E30,4.50,2e-3,0.000000000000000000000000001],"string":"\\u20ac$\\u000F\\u000aA\'\\u0042\\u0022\\u005c\\\\\\"\\/","literals":[null,true,false]}',
    );
    expect(canonicalJson(sample)).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    );
  });

  test("sorts by UTF-16 code units, as RFC 8785, section 3.2.3 has it (from memory)", () => {
    const keys = { "\u20ac": 1, "\r": 2, "\ufb33": 3, "1": 4, "\ud83d\ude00": 5, "\u0080": 6, "\u00f6": 7 };
    expect(Object.values(JSON.parse(canonicalJson(keys))).join("")).toHaveLength(7);
    expect(canonicalJson(keys).match(/\d(?=[,}])/g)).toEqual(["2", "4", "6", "7", "1", "5", "3"]);
  });

  test("the order fields were written in does not matter, their values do", async () => {
    expect(await canonicalDigest({ a: 1, b: [2, { d: 3, c: 4 }] })).toBe(
      await canonicalDigest({ b: [2, { c: 4, d: 3 }], a: 1 }),
    );
    expect(await canonicalDigest({ a: 1 })).not.toBe(await canonicalDigest({ a: 1.0000000000000002 }));
  });

  test("reads back as what it was, and is the same written again", () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        const text = canonicalJson(value);
        expect(JSON.parse(text)).toEqual(JSON.parse(JSON.stringify(value)));
        expect(canonicalJson(JSON.parse(text))).toBe(text);
      }),
      { seed: 71 },
    );
  });

  test.each([
    [{ a: [0, Number.NaN] }, /record\.a\[1\] is NaN; a finite number is wanted/],
    [{ a: Number.POSITIVE_INFINITY }, /record\.a is Infinity/],
    [{ a: "\ud800" }, /record\.a holds half a character/],
    [{ a: () => 0 }, /record\.a is function/],
  ])("%o is refused, naming the place", (value, words) => {
    expect(() => canonicalJson(value)).toThrow(words);
  });
});

describe("sha256", () => {
  test("abc gives the digest of FIPS 180-4's example", async () => {
    expect(await sha256("abc")).toBe("ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad");
  });
});
