// Reads a Jupyter notebook. Source: nbformat 4 notebook format (format versions 4.0 to 4.5).
import { readFileSync } from "node:fs";
import { basename, dirname, resolve } from "node:path";

/** A cell: its place in the notebook (1-based, text cells counted), an id that survives editing, and its text. */
export interface NotebookCell {
  readonly number: number;
  readonly id: string;
  readonly kind: "code" | "markdown" | "raw";
  readonly source: string;
}

export interface Notebook {
  readonly path: string;
  readonly folder: string;
  /** File name without folder and without ".ipynb". */
  readonly name: string;
  /** File name without folder. */
  readonly fileName: string;
  /** The file as it was read. */
  readonly source: string;
  readonly cells: readonly NotebookCell[];
}

type Json = Readonly<Record<string, unknown>>;

const KINDS: readonly string[] = ["code", "markdown", "raw"];
const CELL_ID = /^[a-zA-Z0-9_-]{1,64}$/;

const isObject = (value: unknown): value is Json =>
  typeof value === "object" && value !== null && !Array.isArray(value);

const named = (value: unknown): string =>
  value === undefined ? "missing" : Array.isArray(value) ? "a list" : JSON.stringify(value);

function refuse(file: string, what: string): never {
  throw new Error(`${file}: ${what}`);
}

function parseJson(file: string, source: string): Json {
  let parsed: unknown;
  try {
    parsed = JSON.parse(source);
  } catch (cause) {
    const detail = cause instanceof Error ? cause.message : String(cause);
    throw new Error(`${file}: not a notebook, it is not JSON (${detail})`, { cause });
  }
  if (!isObject(parsed)) refuse(file, "not a notebook: a notebook is a JSON object with nbformat and cells");
  return parsed;
}

function checkFormat(file: string, notebook: Json): void {
  const { nbformat } = notebook;
  if (nbformat !== 4) {
    refuse(
      file,
      `nbformat is ${named(nbformat)}; hingebook reads notebooks of format 4 (nbformat 4.0 to 4.5)`,
    );
  }
}

function languageOf(notebook: Json): string | undefined {
  const { metadata } = notebook;
  if (!isObject(metadata)) return undefined;
  const { kernelspec, language_info } = metadata;
  const fromInfo = isObject(language_info) ? language_info.name : undefined;
  const fromKernel = isObject(kernelspec) ? kernelspec.language : undefined;
  const language = fromInfo ?? fromKernel;
  return typeof language === "string" ? language : undefined;
}

function checkLanguage(file: string, notebook: Json): void {
  const language = languageOf(notebook);
  if (language !== undefined && language.toLowerCase() !== "typescript") {
    refuse(file, `the notebook's language is "${language}"; hingebook runs TypeScript notebooks`);
  }
}

function textOf(file: string, where: string, source: unknown): string {
  if (typeof source === "string") return source;
  if (Array.isArray(source) && source.every((line) => typeof line === "string")) return source.join("");
  return refuse(file, `${where}: source is ${named(source)}; it must be text or a list of lines`);
}

function idOf(file: string, where: string, id: unknown, number: number): string {
  if (id === undefined) return `cell-${number}`;
  if (typeof id === "string" && CELL_ID.test(id)) return id;
  return refuse(
    file,
    `${where}: id is ${named(id)}; an id is 1 to 64 letters, digits, hyphens and underscores`,
  );
}

function readCell(file: string, cell: unknown, number: number): NotebookCell {
  const where = `cell ${number}`;
  if (!isObject(cell))
    refuse(file, `${where} is ${named(cell)}; a cell is an object with cell_type and source`);
  const kind = cell.cell_type;
  if (typeof kind !== "string" || !KINDS.includes(kind)) {
    refuse(file, `${where}: cell_type is ${named(kind)}; it must be "code", "markdown" or "raw"`);
  }
  return Object.freeze({
    number,
    id: idOf(file, where, cell.id, number),
    kind: kind as NotebookCell["kind"],
    source: textOf(file, where, cell.source),
  });
}

function checkIds(file: string, cells: readonly NotebookCell[]): void {
  const seen = new Map<string, number>();
  for (const { id, number } of cells) {
    const other = seen.get(id);
    if (other !== undefined) refuse(file, `cells ${other} and ${number} have the same id "${id}"`);
    seen.set(id, number);
  }
}

/** A notebook from its text. `path` is where it lies; errors name the file and what is wrong in it. */
export function parseNotebook(path: string, source: string): Notebook {
  const fileName = basename(path);
  const notebook = parseJson(fileName, source);
  checkFormat(fileName, notebook);
  checkLanguage(fileName, notebook);
  const { cells: list } = notebook;
  if (!Array.isArray(list)) refuse(fileName, `cells is ${named(list)}; it must be a list of cells`);
  const cells = Object.freeze(list.map((cell: unknown, index) => readCell(fileName, cell, index + 1)));
  checkIds(fileName, cells);
  const absolute = resolve(path);
  return Object.freeze({
    path: absolute,
    folder: dirname(absolute),
    name: fileName.replace(/\.ipynb$/i, ""),
    fileName,
    source,
    cells,
  });
}

/** Read a notebook from disk. */
export function readNotebook(path: string): Notebook {
  let source: string;
  try {
    source = readFileSync(path, "utf8");
  } catch (cause) {
    const code = (cause as { code?: string }).code;
    const why =
      code === "ENOENT"
        ? "there is no such file"
        : code === "EISDIR"
          ? "it is a folder"
          : String(code ?? cause);
    throw new Error(`${path}: cannot be read, ${why}`, { cause });
  }
  return parseNotebook(path, source);
}
