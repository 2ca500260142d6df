// A package as a file from somewhere: its bytes, its seal, its record.
import { readFileSync, statSync } from "node:fs";
import { type Seal, sealOf } from "../../lib/report/index.ts";
import type { CalculationRecord } from "../../lib/sheet/index.ts";
import { readRecord } from "../../lib/sheet/read-record.ts";

/** A file that cannot be read as what it should be; the words say why. */
export class UnreadableError extends Error {}

export interface PackageFile {
  readonly path: string;
  readonly bytes: Uint8Array<ArrayBuffer>;
  readonly html: string;
  readonly seal: Seal;
  readonly record: CalculationRecord;
}

const LARGEST = 256_000_000;
const RECORD = /<script type="application\/json" id="record">([^<]*)<\/script>/g;

const READ_FAULTS: Readonly<Record<string, string>> = {
  ENOENT: "there is no such file",
  EISDIR: "it is a folder",
  EACCES: "it may not be read",
};

/** The bytes of a file. Throws `UnreadableError`. */
export function readBytes(path: string): Uint8Array<ArrayBuffer> {
  try {
    const { size } = statSync(path);
    if (size > LARGEST) throw new UnreadableError(`${path}: ${size} bytes; at most ${LARGEST} are read`);
    return Uint8Array.from(readFileSync(path));
  } catch (error) {
    if (error instanceof UnreadableError) throw error;
    const code = (error as { code?: string }).code ?? "";
    throw new UnreadableError(`${path}: cannot be read, ${READ_FAULTS[code] ?? code}`, { cause: error });
  }
}

/** The record inside a page, as JSON text. Throws when there is none or more than one. */
export function recordText(path: string, html: string): string {
  const found = [...html.matchAll(RECORD)];
  const [only] = found;
  if (only === undefined)
    throw new UnreadableError(
      `${path}: no package, there is no record in it; give a file that hingebook made`,
    );
  if (found.length > 1)
    throw new UnreadableError(`${path}: there are ${found.length} records in it; a package holds one`);
  return only[1] ?? "";
}

/** Read a package and check its record as a stranger's. Throws `UnreadableError` naming the file and what is wrong. */
export async function readPackage(path: string, own: string): Promise<PackageFile> {
  const bytes = readBytes(path);
  const seal = await sealOf(bytes);
  const broken =
    seal.state === "broken" ? " The file was changed after it was made: its seal is broken." : "";
  try {
    const html = new TextDecoder("utf-8", { fatal: true, ignoreBOM: true }).decode(bytes);
    const record = readRecord(recordText(path, html), own);
    return { path, bytes, html, seal, record };
  } catch (error) {
    if (error instanceof UnreadableError) throw new UnreadableError(error.message + broken);
    const words = error instanceof TypeError ? "it is not text in UTF-8" : (error as Error).message;
    throw new UnreadableError(`${path}: ${words}.${broken}`, { cause: error });
  }
}
