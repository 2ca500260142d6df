// The cells a session has run, as the type checker is to see them.
import { offsetAt, type Position } from "./position.ts";
import { declaredNames, parse } from "./syntax.ts";

interface Entry {
  readonly id: string;
  readonly source: string;
  readonly names: ReadonlySet<string>;
  readonly imports: boolean;
}

function entry(id: string, source: string): Entry {
  const { program } = parse(source);
  const imports = program.body.some((node) => node.type === "ImportDeclaration");
  return { id, source, names: declaredNames(program), imports };
}

/** The part of a failed cell that has run: the statements before the one that threw. */
export function completedPart(source: string, failedAt: Position | undefined): string {
  if (!failedAt) return "";
  const offset = offsetAt(source, failedAt);
  const done = parse(source).program.body.filter((node) => node.end <= offset);
  return source.slice(0, done.at(-1)?.end ?? 0);
}

/** From so many cells on, those that declare nothing are dropped: no other can see anything of them. */
const MANY = 100;

export class History {
  #entries: readonly Entry[] = [];

  /** Sources in the order they ran. */
  get sources(): string[] {
    return this.#entries.map(({ source }) => source);
  }

  /** Add a cell that has run. An earlier run of the same cell is dropped once nothing of it can be seen any more. */
  add(id: string, source: string): void {
    const added = entry(id, source);
    const later = [...this.#entries, added];
    const many = later.length > MANY;
    this.#entries = later.filter((old, index) => {
      if (index === later.length - 1) return true;
      if (many && old.names.size === 0 && !old.imports) return false;
      if (old.id !== id) return true;
      const shadowed = (name: string): boolean => later.slice(index + 1).some(({ names }) => names.has(name));
      return old.imports || ![...old.names].every(shadowed);
    });
  }
}
