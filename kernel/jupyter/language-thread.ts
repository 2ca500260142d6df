// The thread tslab lives in: questions in, answers out, in turn.
import { parentPort, workerData } from "node:worker_threads";
import { GLOBALS_DECLARATION, OWN_GLOBALS } from "../check/globals-declaration.ts";
import type { Answer, Question } from "./language.ts";
import { startTslab, type Tslab, type TslabOptions } from "./tslab.ts";

const DECLARATIONS = OWN_GLOBALS + GLOBALS_DECLARATION;

let tslab: Tslab | undefined;

function answer(question: Question): unknown {
  tslab ??= startTslab(workerData as TslabOptions);
  switch (question.kind) {
    case "start":
      tslab.complete(DECLARATIONS, question.text, question.text.length);
      return undefined;
    case "complete":
      return tslab.complete(DECLARATIONS, question.text, question.offset);
    case "inspect":
      return tslab.inspect(DECLARATIONS, question.text, question.offset);
    case "unfinished":
      return tslab.unfinished(question.text);
  }
}

parentPort?.on("message", ({ id, question }: { id: number; question: Question }) => {
  let reply: Answer;
  try {
    reply = { id, answer: answer(question) };
  } catch (error) {
    reply = { id, error: (error as Error).message };
  }
  parentPort?.postMessage(reply);
});
