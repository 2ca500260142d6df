import { describe, expect, test } from "vitest";
import { readArguments } from "../../../kernel/arguments.ts";

describe("readArguments(kernel …)", () => {
  test.each([
    [["kernel", "install"], { command: "kernel install", place: { kind: "user" } }],
    [
      ["kernel", "install", "--prefix=/p"],
      { command: "kernel install", place: { kind: "prefix", folder: "/p" } },
    ],
    [
      ["kernel", "remove", "--prefix", "/p"],
      { command: "kernel remove", place: { kind: "prefix", folder: "/p" } },
    ],
    [["kernel", "list"], { command: "kernel list" }],
    [["kernel", "serve", "c.json"], { command: "kernel serve", connectionFile: "c.json" }],
    [["kernel", "--help"], { command: "help" }],
    [["run", "a.ipynb", "--watch"], { command: "run", files: ["a.ipynb"], watch: true }],
  ])("%j", (words, asked) => expect(readArguments(words)).toMatchObject(asked));

  test.each([
    [["kernel"], /kernel needs a verb: install, remove or list/],
    [["kernel", "instal"], /"instal" is not a verb of kernel; did you mean "install"\?/],
    [["kernel", "install", "--perfix", "x"], /"--perfix" is not known here; did you mean "--prefix"\?/],
    [["kernel", "install", "--prefix"], /--prefix needs a folder/],
    [["kernel", "install", "--user", "--prefix", "x"], /once/],
    [["kernel", "list", "more"], /takes no more words/],
    [["kernel", "serve"], /needs one connection file/],
    [["run", "a.ipynb", "b.ipynb", "--watch"], /--watch takes one notebook/],
  ])("refuses %j in words", (words, said) => expect(() => readArguments(words)).toThrow(said));
});
