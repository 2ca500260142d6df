// Messages no front end should send, ten thousand of them, and a thousand cells: the kernel stays up and as large as it was.
import { randomFillSync } from "node:crypto";
import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import fc from "fast-check";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { Dealer } from "zeromq";
import { type Json, signature } from "../../../kernel/jupyter/message.ts";
import { Client, printed, textOf } from "./client.ts";

const SEED = 20_311;
const MESSAGES = 10_000;
const DELIMITER = "<IDS|MSG>";

/** Resident memory of a process, MB. Source: proc(5), VmRSS. */
function memory(pid: number): number {
  const found = /VmRSS:\s+(\d+) kB/.exec(readFileSync(`/proc/${pid}/status`, "utf8"));
  return Number(found?.[1]) / 1024;
}

const types = fc.constantFrom(
  "execute_request",
  "complete_request",
  "inspect_request",
  "is_complete_request",
  "history_request",
  "kernel_info_request",
  "comm_info_request",
  "comm_open",
  "comm_msg",
  "wobble_request",
  "execute_reply",
  "input_reply",
  "",
  "__proto__",
);

const odd = fc.jsonValue({ maxDepth: 2 });

/** Contents with the right field names and any values in them. */
const content = fc.oneof(
  odd,
  fc.record(
    {
      code: fc.oneof(odd, fc.constantFrom("1 + 1", "let a = (", "a b", "throw 1", "'\u{1f6a7}'", "")),
      cursor_pos: fc.oneof(odd, fc.integer()),
      silent: odd,
      store_history: odd,
      user_expressions: odd,
      hist_access_type: fc.oneof(odd, fc.constantFrom("tail", "range", "search")),
      pattern: fc.oneof(odd, fc.string()),
      n: fc.oneof(odd, fc.integer()),
      comm_id: odd,
      target_name: odd,
    },
    { requiredKeys: [] },
  ),
);

const header = fc.oneof(
  { weight: 8, arbitrary: fc.record({ msg_id: fc.uuid(), msg_type: types, session: fc.string() }) },
  { weight: 1, arbitrary: odd },
);

type Made = {
  readonly kind: number;
  readonly header: unknown;
  readonly content: unknown;
  readonly bytes: Uint8Array;
};

const made: fc.Arbitrary<Made> = fc.record({
  kind: fc.integer({ min: 0, max: 7 }),
  header,
  content,
  bytes: fc.uint8Array({ maxLength: 64 }),
});

/** Frames of a message: most signed as they should be, the others wrong in one way or another. */
function frames({ kind, header: head, content: body, bytes }: Made, key: string): (string | Uint8Array)[] {
  const parts = [head, {}, {}, body].map((part) => JSON.stringify(part) ?? "null");
  const signed = [DELIMITER, signature(key, parts), ...parts];
  switch (kind) {
    case 0:
      return [DELIMITER, signature("another key", parts), ...parts];
    case 1:
      return [bytes];
    case 2:
      return signed.slice(0, bytes.length % 6);
    case 3: {
      const broken = [parts[0] ?? "", "{}", "{}", bytes];
      return [DELIMITER, signature(key, broken), ...broken];
    }
    case 4:
      return [...signed, bytes, bytes];
    default:
      return signed;
  }
}

describe("a kernel under messages no front end sends", () => {
  let client: Client;
  let folder = "";
  beforeAll(async () => {
    folder = mkdtempSync(join(tmpdir(), "hingebook-fuzz-"));
    client = await Client.start(folder);
  });
  afterAll(async () => {
    await client?.close();
    rmSync(folder, { recursive: true, force: true });
  });
  const alive = async (): Promise<void> => {
    let ran = await client.execute("6 * 7");
    // Cells among the messages fail and have what waits behind them aborted.
    while (ran.reply.status === "aborted") ran = await client.execute("6 * 7");
    expect(textOf(ran, "execute_result")).toBe("42");
  };

  test(`${MESSAGES} random and malformed messages on shell, control and heartbeat`, async () => {
    await alive();
    const ports = ["shell", "control", "hb"].map((channel) => {
      const socket = new Dealer({ linger: 0, sendHighWaterMark: 0 });
      socket.connect(`tcp://127.0.0.1:${client.ports[channel]}`);
      return socket;
    });
    const messages = fc.sample(made, { numRuns: MESSAGES, seed: SEED });
    expect(messages).toHaveLength(MESSAGES);
    for (const [index, message] of messages.entries()) {
      // Most go where the work is done; a control channel obeys whoever has the key, so it gets unsigned ones.
      const where = index % 8 === 0 ? 1 : index % 8 === 1 ? 2 : 0;
      const kind = where === 0 ? message.kind : message.kind % 3;
      await ports[where]?.send(frames({ ...message, kind }, client.key));
      if (index % 500 === 499) await alive();
    }
    await alive();
    for (const port of ports) port.close();
    expect(client.process.exitCode).toBeNull();
  });

  test("frames larger than any notebook's end the connection they come over, and nothing else", async () => {
    const socket = new Dealer({ linger: 0 });
    const cutOff = new Promise((settle) => socket.events.on("disconnect", settle));
    socket.connect(`tcp://127.0.0.1:${client.ports.shell}`);
    const huge = new Uint8Array(70 * 1024 * 1024);
    randomFillSync(huge.subarray(0, 1024));
    await socket.send([DELIMITER, huge]);
    await cutOff;
    socket.close();
    await alive();
  });

  test("1000 executions: as large as after the first hundred, within a fifth", async () => {
    const sources = [
      (i: number) => `const value${i % 20} = ${i};\nvalue${i % 20} * 2`,
      (i: number) => `console.log("line ${i}")`,
      (i: number) => `const list = Array.from({ length: 1000 }, (_, k) => k + ${i});\nlist.length`,
      (i: number) => `throw new Error("number ${i}")`,
      () => "({ toHtml: () => '<b>' + 'x'.repeat(1000) + '</b>' })",
      (i: number) => `const wrong: string = ${i}`,
    ];
    const kernel = client.process.pid ?? 0;
    let after100 = 0;
    const sizes: number[] = [];
    for (let i = 1; i <= 1000; i++) {
      const kind = i % sources.length;
      const ran = await client.execute(sources[kind]?.(i) ?? "", { stop_on_error: false } satisfies Json);
      if (kind === 1) expect(printed(ran)).toBe(`line ${i}\n`);
      else expect(ran.reply.status).toBe(kind === 3 || kind === 5 ? "error" : "ok");
      if (i === 100) after100 = memory(kernel);
      if (i > 900) sizes.push(memory(kernel));
    }
    const mean = sizes.reduce((sum, size) => sum + size, 0) / sizes.length;
    process.stdout.write(
      `kernel: ${after100.toFixed(0)} MB after 100 cells, ${mean.toFixed(0)} MB after 1000\n`,
    );
    expect(mean).toBeLessThan(after100 * 1.2);
    await alive();
  });
});
