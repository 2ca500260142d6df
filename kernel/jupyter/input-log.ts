// The inputs of one kernel, for front ends that look back. Source: Messaging in Jupyter, "History".

export interface LoggedInput {
  readonly count: number;
  readonly input: string;
  readonly output: string | undefined;
}

export type HistoryRow = readonly [
  session: number,
  line: number,
  input: string | readonly [input: string, output: string | null],
];

/** What a front end asks for. `session` 0 is this kernel's run, as is 1; nothing earlier is kept. */
export interface HistoryRequest {
  readonly access: "tail" | "range" | "search";
  readonly output: boolean;
  readonly n?: number;
  readonly start?: number;
  readonly stop?: number;
  readonly pattern?: string;
  readonly unique?: boolean;
  readonly session?: number;
}

const SESSION = 1;
const MOST = 10_000;

/** A pattern with * and ? as a regular expression for the whole text. */
function glob(pattern: string): RegExp {
  const source = pattern
    .replace(/[\\^$.|+()[\]{}]/g, "\\$&")
    .replaceAll("*", ".*")
    .replaceAll("?", ".");
  return new RegExp(`^${source}$`, "su");
}

export class InputLog {
  #inputs: LoggedInput[] = [];

  add(input: LoggedInput): void {
    this.#inputs.push(input);
    if (this.#inputs.length > MOST) this.#inputs = this.#inputs.slice(-MOST / 2);
  }

  #chosen({ access, n, start = 0, stop, pattern = "*", unique, session = 0 }: HistoryRequest): LoggedInput[] {
    if (access === "tail") return n === undefined ? this.#inputs : n > 0 ? this.#inputs.slice(-n) : [];
    if (access === "range") {
      if (session > SESSION || session < 0) return [];
      return this.#inputs.filter(({ count }) => count >= start && count < (stop ?? Number.POSITIVE_INFINITY));
    }
    const wanted = glob(pattern);
    let found = this.#inputs.filter(({ input }) => wanted.test(input));
    if (unique === true) {
      const lastOf = new Map(found.map((one) => [one.input, one]));
      found = found.filter((one) => lastOf.get(one.input) === one);
    }
    return n === undefined ? found : n > 0 ? found.slice(-n) : [];
  }

  /** The inputs asked for, oldest first. */
  rows(request: HistoryRequest): HistoryRow[] {
    return this.#chosen(request).map(({ count, input, output }) => [
      SESSION,
      count,
      request.output ? ([input, output ?? null] as const) : input,
    ]);
  }
}
