import { describe, expect, test } from "vitest";
import { InputLog } from "../../../kernel/jupyter/input-log.ts";

const log = new InputLog();
for (const [index, input] of ["a + 1", "b * 2", "a + 1", "c[0]"].entries())
  log.add({ count: index + 1, input, output: input === "c[0]" ? undefined : `out ${index + 1}` });

describe("InputLog.rows(request)", () => {
  test.each([
    [
      "tail",
      { access: "tail", output: false, n: 2 },
      [
        [1, 3, "a + 1"],
        [1, 4, "c[0]"],
      ],
    ],
    ["tail of none", { access: "tail", output: false, n: 0 }, []],
    [
      "range",
      { access: "range", output: false, start: 2, stop: 4 },
      [
        [1, 2, "b * 2"],
        [1, 3, "a + 1"],
      ],
    ],
    ["range of another run", { access: "range", output: false, session: 7, start: 0, stop: 9 }, []],
    [
      "search",
      { access: "search", output: false, pattern: "a*" },
      [
        [1, 1, "a + 1"],
        [1, 3, "a + 1"],
      ],
    ],
    [
      "search, each once",
      { access: "search", output: false, pattern: "a*", unique: true },
      [[1, 3, "a + 1"]],
    ],
    [
      "search for what a pattern could mean",
      { access: "search", output: false, pattern: "c[0]" },
      [[1, 4, "c[0]"]],
    ],
    [
      "outputs",
      { access: "tail", output: true, n: 2 },
      [
        [1, 3, ["a + 1", "out 3"]],
        [1, 4, ["c[0]", null]],
      ],
    ],
  ] as const)("%s", (_what, request, rows) => expect(log.rows(request)).toEqual(rows));
});
