// How the lines of the calculation are put together on the page: what concerns one body cut free stands beside its
// figure, equations left over stand in a group, and everything else stands by itself, in the notebook's order.

import type { CheckEntry, FigureEntry, StepEntry } from "../sheet/index.ts";
import type { Book, Item } from "./book.ts";

export type FigureItem = Item & { readonly entry: FigureEntry };
export type StepItem = Item & { readonly entry: StepEntry };
export type ClosureItem = Item & { readonly entry: CheckEntry };

export type Block =
  | { readonly kind: "line"; readonly item: Item }
  /** `name` is empty where the lines name no body. */
  | {
      readonly kind: "body";
      readonly name: string;
      readonly figures: readonly FigureItem[];
      readonly steps: readonly StepItem[];
    }
  | { readonly kind: "closures"; readonly items: readonly ClosureItem[] };

const isBodyFigure = (item: Item): item is FigureItem =>
  item.entry.kind === "figure" && item.entry.spec.kind === "free body";
const isStep = (item: Item): item is StepItem => item.entry.kind === "step";

/** Whether an entry is an equation of equilibrium the tool wrote as a check. */
export const isClosure = (item: Item): item is ClosureItem =>
  item.entry.kind === "check" && item.entry.closure === true;

/** The body of a free-body figure, or of a step written "body, equation"; a step's may have no comma. */
const bodyOfFigure = ({ entry }: FigureItem): string =>
  (entry.spec as { body?: { name?: string } }).body?.name ?? "";
const bodyOfStep = ({ entry }: StepItem): string => entry.body.replace(/, [^,]*$/, "");

/** The leading items that satisfy `is`, and where they end. */
function run<T extends Item>(items: readonly Item[], from: number, is: (item: Item) => item is T): T[] {
  const found: T[] = [];
  for (let item = items[from]; item !== undefined && is(item); item = items[from + found.length])
    found.push(item);
  return found;
}

/** One body from `from` on: its figures, then its steps, up to where the body changes. */
function bodyAt(items: readonly Item[], from: number): Extract<Block, { kind: "body" }> {
  const figures = run(items, from, isBodyFigure);
  const steps = run(items, from + figures.length, isStep);
  const first = steps[0] === undefined ? "" : bodyOfStep(steps[0]);
  const other = steps.findIndex((step) => bodyOfStep(step) !== first);
  const [only] = figures;
  return {
    kind: "body",
    name: figures.length === 1 && only ? bodyOfFigure(only) : first,
    figures,
    steps: other === -1 ? steps : steps.slice(0, other),
  };
}

/** The calculation in blocks, without givens and assumptions, which have sections of their own. */
export function blocksOf(book: Book): readonly Block[] {
  const items = book.items.filter(
    (item) => item.entry.kind !== "given" && item.entry.kind !== "assumption" && !isLeftEmpty(book, item),
  );
  const blocks: Block[] = [];
  for (let i = 0; i < items.length; ) {
    const item = items[i];
    if (item === undefined) break;
    if (isClosure(item)) {
      const closures = run(items, i, isClosure);
      blocks.push({ kind: "closures", items: closures });
      i += closures.length;
    } else if (isBodyFigure(item) || isStep(item)) {
      const body = bodyAt(items, i);
      blocks.push(body);
      i += body.figures.length + body.steps.length;
    } else {
      blocks.push({ kind: "line", item });
      i++;
    }
  }
  return blocks;
}

const headingLevel = (markdown: string): number => /^\s*(#{1,6})\s/.exec(markdown)?.[1]?.length ?? 0;

/** A heading and nothing else. */
const isBareHeading = (markdown: string): boolean => /^\s*#{1,6}\s[^\n]*\s*$/.test(markdown);

/** A heading whose lines all stand in the sections before the calculation, so that nothing is left beneath it here. */
function isLeftEmpty(book: Book, item: Item): boolean {
  const { entry } = item;
  if (entry.kind !== "text" || item.by.length > 0 || !isBareHeading(entry.markdown)) return false;
  const after = book.items.slice(book.items.indexOf(item) + 1);
  const next = after.findIndex(({ entry: e }) => e.kind !== "given" && e.kind !== "assumption");
  if (next === 0 || after.length === 0) return false;
  const following = after[next]?.entry;
  if (following === undefined) return true;
  const level = following.kind === "text" ? headingLevel(following.markdown) : 0;
  return level > 0 && level <= headingLevel(entry.markdown);
}
