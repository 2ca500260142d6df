// The process's own standard streams while a kernel is served: what packages print goes to the notebook, and nobody
// waits for input that cannot come.
import { Readable } from "node:stream";

type Write = (stream: "stdout" | "stderr", text: string) => void;

const asText = (chunk: unknown): string =>
  typeof chunk === "string" ? chunk : Buffer.from(chunk as Uint8Array).toString("utf8");

function divert(stream: "stdout" | "stderr", write: Write): () => void {
  const { [stream]: target } = process;
  const before = target.write;
  target.write = ((chunk: unknown, ...more: unknown[]) => {
    write(stream, asText(chunk));
    const done = more.find((one) => typeof one === "function") as (() => void) | undefined;
    if (done) queueMicrotask(done);
    return true;
  }) as typeof target.write;
  return () => {
    target.write = before;
  };
}

/** Standard input that fails whoever reads it. */
const noInput = (): Readable =>
  new Readable({
    read() {
      this.destroy(
        new Error(
          "a notebook's kernel has no standard input; write the value in a cell, or read it from a file",
        ),
      );
    },
  });

/** Divert standard output and error to `write`, and refuse standard input. Answers what undoes it. */
export function guardStreams(write: Write): () => void {
  const input = Object.getOwnPropertyDescriptor(process, "stdin");
  Object.defineProperty(process, "stdin", { configurable: true, get: noInput });
  const undo = [divert("stdout", write), divert("stderr", write)];
  return () => {
    for (const one of undo) one();
    if (input) Object.defineProperty(process, "stdin", input);
  };
}
