import { describe, expect, test } from "vitest";
import { addressOf, readConnection } from "../../../kernel/jupyter/connection.ts";

const sound = {
  transport: "tcp",
  ip: "127.0.0.1",
  key: "k",
  signature_scheme: "hmac-sha256",
  shell_port: 1,
  iopub_port: 2,
  stdin_port: 3,
  control_port: 4,
  hb_port: 5,
};

describe("readConnection(text)", () => {
  test("gives the address it is told, and no other", () => {
    expect(addressOf(readConnection(JSON.stringify(sound)), "control")).toBe("tcp://127.0.0.1:4");
    expect(
      addressOf(readConnection(JSON.stringify({ ...sound, transport: "ipc", ip: "/tmp/k" })), "hb"),
    ).toBe("ipc:///tmp/k-5");
  });

  test.each([
    ["hb_port", "5", /hb_port is "5"; a port is a whole number/],
    ["shell_port", 70_000, /shell_port is 70000/],
    ["transport", "udp", /transport is "udp"; tcp and ipc are known/],
    ["signature_scheme", "hmac-md5", /signature_scheme is "hmac-md5"; hmac-sha256 is known/],
    ["key", 3, /key is 3; a text is wanted/],
    ["ip", "", /ip is ""; an address is wanted/],
  ])("refuses %s = %j in words", (field, value, words) => {
    expect(() => readConnection(JSON.stringify({ ...sound, [field]: value }))).toThrow(words);
  });

  test("refuses what is not JSON", () => expect(() => readConnection("{")).toThrow(/it is not JSON/));
});
