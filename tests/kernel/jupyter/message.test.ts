import { describe, expect, test } from "vitest";
import { decode, Refusal, signature, Writer } from "../../../kernel/jupyter/message.ts";

const KEY = "the key";
const bytes = (frames: readonly (Uint8Array | string)[]): Uint8Array[] =>
  frames.map((frame) => Buffer.from(frame));
const writer = (): Writer => new Writer(KEY, "k", () => "2000-01-01T00:00:00Z");
const sample = (): Uint8Array[] =>
  bytes(
    writer().frames({
      identities: ["peer"],
      type: "status",
      parent: { msg_id: "a" },
      content: { text: "λ \u{1f6a7}", big: 12n },
    }),
  );

describe("decode(frames, key)", () => {
  test("gives back what the writer wrote, in Unicode", () => {
    const { identities, header, content } = decode(sample(), KEY);
    expect(identities.map(String)).toHaveLength(1);
    expect(header).toMatchObject({ msg_type: "status", msg_id: "k_1", version: "5.3" });
    expect(content).toEqual({ text: "λ \u{1f6a7}", big: "12" });
  });

  test("half a character is replaced, so that every front end can read the message", () => {
    const frames = bytes(
      writer().frames({ identities: [], type: "x", parent: {}, content: { text: "a\ud83db" } }),
    );
    expect(decode(frames, KEY).content.text).toBe("a\ufffdb");
  });

  test.each([
    ["another key", (f: Uint8Array[]) => f, "other"],
    ["a changed content", (f: Uint8Array[]) => [...f.slice(0, -1), Buffer.from("{}")], KEY],
    ["no signature", (f: Uint8Array[]) => [...f.slice(0, 2), Buffer.from(""), ...f.slice(3)], KEY],
    [
      "a signature of another length",
      (f: Uint8Array[]) => [...f.slice(0, 2), Buffer.from("é"), ...f.slice(3)],
      KEY,
    ],
    ["a missing part", (f: Uint8Array[]) => f.slice(0, -1), KEY],
    ["no delimiter", (f: Uint8Array[]) => f.slice(2), KEY],
    ["nothing", () => [], KEY],
  ])("refuses %s", (_what, change, key) => {
    expect(() => decode(change(sample()), key)).toThrow(Refusal);
  });

  test.each([["[]"], ["null"], ["{"], ['{"msg_id": 1, "msg_type": "x"}'], ['{"msg_id": "a"}']])(
    "refuses the header %s, rightly signed",
    (header) => {
      const parts = [header, "{}", "{}", "{}"];
      expect(() => decode(bytes(["<IDS|MSG>", signature(KEY, parts), ...parts]), KEY)).toThrow(Refusal);
    },
  );
});

describe("signature(key, parts)", () => {
  test("is HMAC-SHA256 in hexadecimal digits: RFC 4231, test case 2", () => {
    expect(signature("Jefe", ["what do ya ", "want for nothing?"])).toBe(
      "5bdcc146bf60754e6a042426089575c75a003f089d2739839dec58b964ec3843",
    );
  });
  test("is empty without a key", () => expect(signature("", ["{}"])).toBe(""));
});
