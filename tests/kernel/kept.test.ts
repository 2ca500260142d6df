import { expect, test } from "vitest";
import { kept } from "../../kernel/kept.ts";

test("kept(most, make) makes a thing once while it is among the last asked for, and keeps no failure", () => {
  const made: string[] = [];
  const of = kept(2, (text) => {
    made.push(text);
    if (text === "bad") throw new Error("no");
    return { text };
  });
  const first = of("a");
  expect(of("a")).toBe(first);
  of("b");
  expect(of("a")).toBe(first);
  of("c"); // "b" is the one asked for longest ago
  expect(of("a")).toBe(first);
  of("b");
  expect(made).toEqual(["a", "b", "c", "b"]);
  for (const _ of [1, 2]) expect(() => of("bad")).toThrow("no");
  expect(made.slice(4)).toEqual(["bad", "bad"]);
});

test("kept(most, make) keeps what is undefined too", () => {
  let times = 0;
  const of = kept(2, () => void times++);
  of("a");
  of("a");
  expect(times).toBe(1);
});
