import { describe, expect, test } from "vitest";
import type { Message } from "../../../kernel/jupyter/message.ts";
import {
  charactersBefore,
  readExecute,
  readHistory,
  readPlace,
  utf16Offset,
  WrongRequest,
} from "../../../kernel/jupyter/requests.ts";

const message = (content: object, metadata: object = {}): Message => ({
  identities: [],
  header: { msg_id: "1", msg_type: "x", session: "", username: "", date: "", version: "" },
  metadata: { ...metadata },
  content: { ...content },
});

describe("readExecute(message)", () => {
  test("what is left out takes the protocol's defaults", () => {
    expect(readExecute(message({ code: "1" }))).toEqual({
      code: "1",
      silent: false,
      storeHistory: true,
      stopOnError: true,
      userExpressions: new Map(),
      cellId: undefined,
    });
  });
  test("silent keeps nothing, whatever store_history says", () => {
    expect(readExecute(message({ code: "1", silent: true, store_history: true })).storeHistory).toBe(false);
  });
  test("the front end's cell id", () => {
    expect(readExecute(message({ code: "1" }, { cellId: "abc" })).cellId).toBe("abc");
  });
  test.each([
    [{}, /code is missing; a string is wanted/],
    [{ code: 3 }, /code is 3; a string is wanted/],
    [{ code: "1", silent: "yes" }, /silent is "yes"; a boolean is wanted/],
    [{ code: "1", user_expressions: [] }, /user_expressions is \[\]; a object is wanted/],
    [{ code: "1", user_expressions: { a: 1 } }, /a is 1; a string is wanted/],
  ])("refuses %j", (content, words) => {
    expect(() => readExecute(message(content))).toThrow(words);
    expect(() => readExecute(message(content))).toThrow(WrongRequest);
  });
});

describe("places count characters", () => {
  const text = "a\u{1f6a7}b";
  test.each([
    [0, 0],
    [1, 1],
    [2, 3],
    [3, 4],
    [9, 4],
  ])("character %i is at UTF-16 unit %i", (characters, offset) => {
    expect(utf16Offset(text, characters)).toBe(offset);
    if (characters <= 3) expect(charactersBefore(text, offset)).toBe(characters);
  });
  test("without a place, the end", () => expect(readPlace(message({ code: text })).offset).toBe(4));
});

test("readHistory refuses an unknown access", () => {
  expect(() => readHistory(message({ hist_access_type: "all" }))).toThrow(/tail, range and search are known/);
});
