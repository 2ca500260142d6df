// The cells of a notebook as one module for the type checker. Cell text is kept character by character, so a place in
// the module is a place in a cell. Imports go in front. A cell that declares a name an earlier cell has declared opens
// a nested block, and the cells after it stand in that block: the name may be declared again, with another type.
import type { ImportDeclaration, Node, Statement } from "oxc-parser";
import { declaredNames, importedNames, patternNames, type Tree, walk } from "../syntax.ts";

/** A stretch of the module copied from a cell: `index` in the list of cells, `from` its offset there. */
interface Segment {
  readonly at: number;
  readonly length: number;
  readonly index: number;
  readonly from: number;
}

export interface Joined {
  readonly text: string;
  /** The cell and offset a place in the module came from. A place between cells belongs to the cell before it. */
  readonly origin: (offset: number) => { readonly index: number; readonly offset: number };
}

class Builder {
  text = "";
  readonly segments: Segment[] = [];
  add(text: string): void {
    this.text += text;
  }
  copy(text: string, index: number, from: number): void {
    this.segments.push({ at: this.text.length, length: text.length, index, from });
    this.text += text;
  }
}

/** What an import brings in under one name, to tell a repeated import from another one of the same name. */
const meaning = (node: ImportDeclaration, imported: string): string => `${node.source.value} ${imported}`;

const goesInFront = (node: Statement): boolean =>
  node.type === "ImportDeclaration" ||
  node.type === "TSImportEqualsDeclaration" ||
  node.type === "ExportAllDeclaration" ||
  (node.type === "ExportNamedDeclaration" && node.source !== null) ||
  (node.type === "TSModuleDeclaration" && (node.kind === "global" || node.id.type === "Literal"));

const blank = (text: string): string => text.replace(/[^\r\n]/g, " ");

/** Top-level `var` as `let`, so that a later cell may declare the name again; one declared twice in the cell stays. */
function freeVars(source: string, { program }: Tree): string {
  const counts = new Map<string, number>();
  walk(program, (node) => {
    if (node.type === "FunctionDeclaration" && node.id) counts.set(node.id.name, 2);
    if (
      node.type.startsWith("Function") ||
      node.type.startsWith("ArrowFunction") ||
      node.type.startsWith("Class")
    )
      return false;
    if (node.type === "VariableDeclaration" && node.kind === "var")
      for (const { id } of node.declarations)
        for (const name of patternNames(id)) counts.set(name, (counts.get(name) ?? 0) + 1);
    return true;
  });
  let text = source;
  for (const node of program.body) {
    if (node.type !== "VariableDeclaration" || node.kind !== "var" || node.declare) continue;
    const names = node.declarations.flatMap(({ id }) => patternNames(id));
    if (names.every((name) => counts.get(name) === 1))
      text = `${text.slice(0, node.start)}let${text.slice(node.start + 3)}`;
  }
  return text;
}

function withoutExport(text: string, node: Node): string {
  if (node.type === "ExportNamedDeclaration") {
    const end = node.declaration?.start ?? node.end;
    return text.slice(0, node.start) + blank(text.slice(node.start, end)) + text.slice(end);
  }
  if (node.type !== "ExportDefaultDeclaration") return text;
  const { declaration } = node;
  const head = text.slice(node.start, declaration.start);
  const named = declaration.type.endsWith("Declaration") && "id" in declaration && declaration.id;
  return (
    text.slice(0, node.start) +
    (named ? blank(head) : `void${blank(head.slice(4))}`) +
    text.slice(declaration.start)
  );
}

/** A cell's text as it stands in the module: same length, front matter blanked, `export` taken off. */
function bodyText(tree: Tree): string {
  let text = freeVars(tree.source, tree);
  for (const node of tree.program.body) {
    if (goesInFront(node))
      text = text.slice(0, node.start) + blank(text.slice(node.start, node.end)) + text.slice(node.end);
    else text = withoutExport(text, node);
  }
  return text;
}

class Joiner {
  readonly front = new Builder();
  readonly body = new Builder();
  /** What each name visible so far means: an import, or a declaration of a cell. */
  readonly visible = new Map<string, string>();
  depth = 0;

  cell(tree: Tree, index: number): void {
    const declared = declaredNames(tree.program);
    const imports = tree.program.body.filter((node) => node.type === "ImportDeclaration");
    const again = [...declared].some((name) => this.visible.has(name));
    const aliased = imports.some((node) => this.#clashes(node));
    // On a line of their own: a comment after them on the same line would not be the cell's documentation.
    this.body.add(again || aliased ? "\n;{\n" : "\n;\n");
    if (again || aliased) this.depth++;
    for (const node of tree.program.body) if (goesInFront(node)) this.#inFront(tree, node, index);
    this.body.copy(bodyText(tree), index, 0);
    for (const name of declared) this.visible.set(name, `cell ${index}`);
  }

  #clashes(node: ImportDeclaration): boolean {
    return importedNames(node).some(({ local, imported }) => {
      const before = this.visible.get(local);
      return before !== undefined && before !== meaning(node, imported);
    });
  }

  #inFront(tree: Tree, node: Statement, index: number): void {
    if (node.type !== "ImportDeclaration") {
      this.front.copy(tree.source.slice(node.start, node.end), index, node.start);
      this.front.add("\n");
      return;
    }
    this.#importInFront(tree, node, index);
  }

  #importInFront(tree: Tree, node: ImportDeclaration, index: number): void {
    const names = importedNames(node);
    const fresh = names.every(({ local }) => !this.visible.has(local));
    if (names.length === 0 || fresh) {
      this.front.copy(tree.source.slice(node.start, node.end), index, node.start);
      this.front.add("\n");
    } else {
      for (const { local, imported, typeOnly } of names) {
        if (this.visible.get(local) !== meaning(node, imported))
          this.#importOne(node, index, { local, imported, typeOnly });
      }
    }
    for (const { local, imported } of names) this.visible.set(local, meaning(node, imported));
  }

  /** One name of an import: as it is when the name is new, under another name and set in the block when it is not. */
  #importOne(
    node: ImportDeclaration,
    index: number,
    { local, imported, typeOnly }: { local: string; imported: string; typeOnly: boolean },
  ): void {
    const inFront = this.visible.has(local) ? `__${index}_${local}` : local;
    const clause =
      imported === "*"
        ? `* as ${inFront}`
        : imported === "default"
          ? inFront
          : `{ ${JSON.stringify(imported)} as ${inFront} }`;
    this.front.copy("", index, node.start);
    this.front.add(`import ${typeOnly ? "type " : ""}${clause} from ${JSON.stringify(node.source.value)};\n`);
    if (inFront !== local) this.body.add(`${typeOnly ? "type" : "const"} ${local} = ${inFront};`);
  }
}

/** Join parsed cells, none with faults, into one module. */
export function join(trees: readonly Tree[]): Joined {
  const joiner = new Joiner();
  for (const [index, tree] of trees.entries()) joiner.cell(tree, index);
  const { front, body } = joiner;
  const text = `${front.text}${body.text}\n${"}".repeat(joiner.depth)}\nexport {};\n`;
  const segments = [
    ...front.segments,
    ...body.segments.map((segment) => ({ ...segment, at: segment.at + front.text.length })),
  ];
  const origin = (offset: number): { index: number; offset: number } => {
    const segment = segments.findLast(({ at }) => at <= offset);
    if (!segment) return { index: 0, offset: 0 };
    return { index: segment.index, offset: segment.from + Math.min(offset - segment.at, segment.length) };
  };
  return { text, origin };
}

/** Cells followed by a text that is being written, for questions about a place in it. */
export interface JoinedDraft {
  readonly text: string;
  /** Where an offset of the draft stands in the text. */
  readonly place: (offset: number) => number;
}

/** An import, also one that has not been written to its end. */
const IMPORT = /^[ \t]*import\b(?!\s*[(.])[^;"'`]*?(?:["'][^"'\n]*["']?;?|$)/gm;

const OPEN = "\n;{\n";

/** Join parsed cells, none with faults, and a draft, which may be anything. Its imports go in front. */
export function joinDraft(trees: readonly Tree[], draft: string): JoinedDraft {
  const joiner = new Joiner();
  for (const [index, tree] of trees.entries()) joiner.cell(tree, index);
  const { front, body, depth } = joiner;
  const moved: Segment[] = [];
  const rest = draft.replace(IMPORT, (found, from: number) => {
    moved.push({ at: front.text.length, length: found.length, index: trees.length, from });
    front.add(`${found}\n`);
    return blank(found);
  });
  const start = front.text.length + body.text.length + OPEN.length;
  const place = (offset: number): number => {
    const segment = moved.find(({ from, length }) => offset > from && offset <= from + length);
    return segment ? segment.at + offset - segment.from : start + offset;
  };
  return { text: `${front.text}${body.text}${OPEN}${rest}\n}${"}".repeat(depth)}\nexport {};\n`, place };
}
