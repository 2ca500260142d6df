// Contract: what kernel/jupyter/sockets.ts leans on in zeromq.
import { setTimeout as sleep } from "node:timers/promises";
import { afterEach, describe, expect, test } from "vitest";
import { Dealer, Subscriber } from "zeromq";
import type { Channel, Connection } from "../../../kernel/jupyter/connection.ts";
import { openPort, type Port } from "../../../kernel/jupyter/sockets.ts";

const ports = { shell: 0, iopub: 0, stdin: 0, control: 0, hb: 0 };
const at = (channel: Channel, port: number): Connection => ({
  transport: "tcp",
  ip: "127.0.0.1",
  key: "",
  ports: { ...ports, [channel]: port },
});

const closing: { close(): void }[] = [];
afterEach(() => {
  for (const one of closing.splice(0)) one.close();
});

/** A port of the kernel's on some free number, with the number. */
async function open(channel: Channel): Promise<{ port: Port; address: string }> {
  for (let number = 42_100 + Math.floor(process.pid % 5000); ; number++) {
    try {
      const port = await openPort(at(channel, number), channel);
      closing.push(port);
      return { port, address: `tcp://127.0.0.1:${number}` };
    } catch (error) {
      if (!String(error).includes("cannot be bound")) throw error;
    }
  }
}

describe("openPort(connection, channel)", () => {
  test("an address that is taken is named", async () => {
    const { address } = await open("shell");
    const number = Number(address.split(":").at(-1));
    await expect(openPort(at("shell", number), "shell")).rejects.toThrow(
      new RegExp(`the shell channel cannot be bound to ${address}`),
    );
  });

  test("thousands of messages sent in one turn of the event loop all arrive, in order", async () => {
    const { port, address } = await open("iopub");
    const listener = new Subscriber({ linger: 0, receiveHighWaterMark: 0 });
    closing.push(listener);
    listener.subscribe();
    listener.connect(address);
    let joined = false;
    const heard = listener.receive().then(() => {
      joined = true;
    });
    while (!joined) {
      port.send(["joining"]);
      await Promise.race([heard, sleep(20)]);
    }
    for (let i = 0; i < 5000; i++) port.send(["topic", String(i)]);
    let next = 0;
    for await (const [topic, number] of listener) {
      if (String(topic) === "joining") continue;
      expect(String(number)).toBe(String(next));
      if (++next === 5000) break;
    }
    await port.flushed();
    expect(next).toBe(5000);
  });

  test("the heartbeat's port answers whatever it gets, and sending after closing does nothing", async () => {
    const { port, address } = await open("hb");
    void (async () => {
      for await (const frames of port.receive()) port.send(frames);
    })();
    const peer = new Dealer({ linger: 0 });
    closing.push(peer);
    peer.connect(address);
    for (const frames of [["", "beat"], ["bare"], [new Uint8Array(0)]]) {
      await peer.send(frames);
      expect((await peer.receive()).map(String)).toEqual(frames.map(String));
    }
    port.close();
    expect(() => port.send(["late"])).not.toThrow();
  });
});
