// Runs the cells a front end sends. Source: Messaging in Jupyter, "Execute".
import type { CellFailure } from "../failure.ts";
import type { CellName, CellResult, Session } from "../session.ts";
import { CellIdentities } from "./cell-identity.ts";
import { InputLog } from "./input-log.ts";
import type { Json } from "./message.ts";
import type { Outputs } from "./outputs.ts";
import type { ExecuteRequest } from "./requests.ts";
import { Results } from "./results.ts";

/** What an error tells a front end. The traceback holds the engineer's own lines and nothing of the kernel's. */
export function errorContent({
  kind,
  name,
  message,
  excerpt,
  traceback,
  cell,
  line,
  column,
}: CellFailure): Json {
  const place = line === undefined ? [] : [`    at cell ${cell}, line ${line}, column ${column}`];
  const [, ...further] = traceback;
  const frames = kind === "refused" ? [...place, ...further.filter((one) => one !== place[0])] : further;
  const lines = [`${name}: ${message}`, ...(excerpt === "" ? [] : ["", excerpt, ""]), ...frames];
  return { ename: name, evalue: message, traceback: lines };
}

const thrownContent = (error: unknown): Json => {
  const { name = "Error", message = String(error) } = error as { name?: string; message?: string };
  return { ename: name, evalue: message, traceback: [`${name}: ${message}`] };
};

export interface Executed {
  readonly reply: Json;
  /** Whether requests that wait are to be aborted. */
  readonly abort: boolean;
}

export class Execution {
  readonly log: InputLog = new InputLog();
  readonly #session: Session;
  readonly #outputs: Outputs;
  readonly #results: Results;
  readonly #cells = new CellIdentities();
  #count = 0;

  constructor(session: Session, outputs: Outputs, changed: (value: unknown) => readonly string[]) {
    this.#session = session;
    this.#outputs = outputs;
    this.#results = new Results(outputs, changed);
  }

  /** Run one request's code: publishes its outputs, answers the content of the reply. */
  async run(request: ExecuteRequest): Promise<Executed> {
    const { code, silent, storeHistory, cellId } = request;
    if (storeHistory) this.#count++;
    const execution_count = this.#count;
    if (!silent) this.#outputs.publish("execute_input", { code, execution_count });
    const cell = { number: execution_count, id: this.#cells.identify(code, cellId) };
    const failed = this.#shown(await this.#session.execute(code, { cell }), request, cell);
    if (!silent) this.#results.review();
    if (failed) {
      const reply = { status: "error", execution_count, ...failed, user_expressions: {}, payload: [] };
      return { reply, abort: request.stopOnError };
    }
    const user_expressions = await this.#expressions(request.userExpressions, cell);
    return { reply: { status: "ok", execution_count, user_expressions, payload: [] }, abort: false };
  }

  /** Publish how a cell came out; answers the error, if it is one. */
  #shown(
    result: CellResult,
    { code, storeHistory }: ExecuteRequest,
    { number: execution_count, id }: CellName,
  ): Json | undefined {
    const data = result.status === "ok" ? result.display : undefined;
    const text = data?.["text/plain"];
    if (storeHistory)
      this.log.add({
        count: execution_count,
        input: code,
        output: typeof text === "string" ? text : undefined,
      });
    if (result.status === "error") return this.#error(errorContent(result.error));
    if (!data) return undefined;
    try {
      this.#results.show(id, result.status === "ok" ? result.value : undefined, data, execution_count);
    } catch (error) {
      return this.#error(thrownContent(error)); // the value's own bundle cannot be written
    }
    return undefined;
  }

  #error(content: Json): Json {
    this.#outputs.publish("error", content);
    return content;
  }

  async #expressions(asked: ReadonlyMap<string, string>, { number, id }: CellName): Promise<Json> {
    const answers: [string, Json][] = [];
    for (const [name, expression] of asked) {
      const cell = { number, id: `${id}-${name}` };
      const result = await this.#session.execute(`(${expression}\n)`, { cell, keep: false });
      answers.push([
        name,
        result.status === "ok"
          ? { status: "ok", data: result.display ?? { "text/plain": "undefined" }, metadata: {} }
          : { status: "error", ...errorContent(result.error) },
      ]);
    }
    return Object.fromEntries(answers);
  }
}
