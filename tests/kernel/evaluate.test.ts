// Contract: what kernel/evaluate.ts leans on in V8's inspector.
import { afterEach, describe, expect, test } from "vitest";
import { Evaluator, type Outcome } from "../../kernel/evaluate.ts";

describe("Evaluator", () => {
  let evaluator: Evaluator | undefined;
  const seen: unknown[] = [];
  const open = async (): Promise<(code: string) => Promise<Outcome>> => {
    seen.length = 0;
    const opened = await Evaluator.open({ see: (value: unknown) => seen.push(value) });
    evaluator = opened;
    return (code) => opened.run(code, "hingebook:test");
  };
  afterEach(() => evaluator?.close());

  test("let follows let in one binding that earlier closures see", async () => {
    const run = await open();
    await run("let n = 1; let f = () => n");
    await run("let n = 2; see(f())");
    expect(seen).toEqual([2]);
  });

  test("the old value stays when the new initialiser throws; a name without value is not defined", async () => {
    const run = await open();
    await run("let n = 1");
    expect(await run("let n = (() => { throw 1 })()")).toMatchObject({ ok: false, thrown: 1 });
    expect(await run("let fresh = (() => { throw 1 })()")).toMatchObject({ ok: false });
    expect(await run("see(n); fresh")).toMatchObject({ ok: false });
    expect(seen).toEqual([1]);
  });

  test("strict holds at the head, also with await", async () => {
    const run = await open();
    for (const wait of ["", "await 0;"]) {
      const outcome = await run(`"use strict"; ${wait} Object.freeze({ a: 1 }).a = 2`);
      expect(outcome).toMatchObject({ ok: false });
    }
    const sloppy = await run("Object.freeze({ a: 1 }).a = 2");
    expect(sloppy).toEqual({ ok: true });
  });

  test("waits for the end and reports a rejection", async () => {
    const run = await open();
    await run("await new Promise((done) => { see('before'); Promise.resolve().then(done) }); see('after')");
    expect(seen).toEqual(["before", "after"]);
    expect(await run("await Promise.reject(7)")).toEqual({ ok: false, thrown: 7 });
  });

  test.each([
    ["a number", "throw -0", -0],
    ["not a number", "throw NaN", Number.NaN],
    ["a big integer", "throw 12345678901234567890n", 12345678901234567890n],
    ["null", "throw null", null],
    ["undefined", "throw undefined", undefined],
    ["a text", "throw 'x'", "x"],
  ])("hands over what was thrown: %s", async (_what, code, value) => {
    const run = await open();
    expect(await run(code)).toEqual({ ok: false, thrown: value });
  });

  test("hands over the very object that was thrown", async () => {
    const run = await open();
    await run("let thrown = { a: 1 }; see(thrown)");
    const outcome = await run("throw thrown");
    expect(outcome.ok === false && outcome.thrown).toBe(seen[0]);
  });

  test("stacks carry the name given; a text that does not compile has a place", async () => {
    const run = await open();
    const outcome = await run("\n  throw new Error('x')");
    expect(outcome.ok === false && (outcome.thrown as Error).stack).toMatch(/hingebook:test:2:9/);
    expect(await run("let ok = 1;\nlet a = /(?<x>a)(?<x>b)/")).toMatchObject({ ok: false, at: { line: 2 } });
  });

  test("two contexts do not share names", async () => {
    const run = await open();
    await run("let mine = 1; globalThis.other = 2");
    const second = await Evaluator.open({});
    expect(
      await second.run("if (typeof mine !== 'undefined' || 'other' in globalThis) throw 1", "x"),
    ).toEqual({ ok: true });
    second.close();
    expect("other" in globalThis).toBe(false);
  });
});
