// How a running cell is cut off from outside, and how a loop that never ends is told from one that may end.

/** Cell code may be on the stack: a loop found there may be ended by force. */
const AT_WORK = 0;
/** The number of the cell run under way; between runs, less than 0, that of the last one. */
const RUN = 1;

/** What is going on, in memory that another thread can read while this one is kept busy by a cell. */
export class Activity {
  readonly shared: SharedArrayBuffer;
  readonly #state: Int32Array;

  constructor(shared: SharedArrayBuffer = new SharedArrayBuffer(2 * Int32Array.BYTES_PER_ELEMENT)) {
    this.shared = shared;
    this.#state = new Int32Array(shared);
  }

  /** The run under way; -n after run n, until the next begins. */
  get run(): number {
    return Atomics.load(this.#state, RUN);
  }

  get atWork(): boolean {
    return Atomics.load(this.#state, AT_WORK) > 0;
  }

  begin(): void {
    Atomics.store(this.#state, RUN, Math.abs(this.run) + 1);
  }

  end(): void {
    Atomics.store(this.#state, RUN, -Math.abs(this.run));
    Atomics.store(this.#state, AT_WORK, 0);
  }

  enter(): void {
    Atomics.add(this.#state, AT_WORK, 1);
  }

  leave(): void {
    if (this.atWork) Atomics.sub(this.#state, AT_WORK, 1);
  }
}

/** One cell's chance to be interrupted. */
export class Interruption {
  readonly #settle: () => void;
  /** Settles when the cell is to be cut off. */
  readonly asked: Promise<void>;
  isAsked = false;

  constructor() {
    let settle: () => void = () => {};
    this.asked = new Promise<void>((done) => {
      settle = done;
    });
    this.#settle = settle;
  }

  ask(): void {
    this.isAsked = true;
    this.#settle();
  }
}
