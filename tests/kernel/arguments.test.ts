import { describe, expect, test } from "vitest";
import { readArguments, UsageError } from "../../kernel/arguments.ts";

describe("readArguments", () => {
  test("run takes files, a folder and givens, in any order", () => {
    expect(
      readArguments(["run", "a.ipynb", "--set", "g=6 kN/m", "--out=packages", "b.ipynb", "--set=h = 4 m"]),
    ).toEqual({
      command: "run",
      files: ["a.ipynb", "b.ipynb"],
      out: "packages",
      overrides: new Map([
        ["g", "6 kN/m"],
        ["h", "4 m"],
      ]),
      sensitivity: false,
      watch: false,
    });
    expect(readArguments(["run", "--", "-odd.ipynb"])).toMatchObject({ files: ["-odd.ipynb"], out: "out" });
  });

  test("help and version", () => {
    expect(readArguments(["--help"])).toEqual({ command: "help" });
    expect(readArguments(["run", "--help"])).toEqual({ command: "help" });
    expect(readArguments(["--version"])).toEqual({ command: "version" });
  });

  test.each([
    [[], /say what to do/],
    [["rum"], /"rum" is not a command of hingebook; did you mean "run"\?/],
    [["--verson"], /"--verson" is not an option of hingebook; did you mean "--version"\?/],
    [["--vers"], /did you mean "--version"\?/],
    [["run"], /run needs a notebook/],
    [["run", "a", "--outt", "x"], /"--outt" is not an option of run; did you mean "--out"\?/],
    [["run", "a", "--out"], /--out needs a folder/],
    [["run", "a", "--set"], /--set needs a symbol and a measure/],
    [["run", "a", "--set", "g"], /--set "g" is not SYMBOL="MEASURE"/],
    [["run", "a", "--set", "=5 m"], /is not SYMBOL="MEASURE"/],
    [["run", "a", "--set", "g="], /is not SYMBOL="MEASURE"/],
    [["run", "a", "--set", "g=1 m", "--set", "g=2 m"], /--set g is given twice/],
  ])("%j is refused", (words, message) => {
    expect(() => readArguments(words)).toThrow(UsageError);
    expect(() => readArguments(words)).toThrow(message);
  });
});
