// Files written whole or not at all.
import { link, mkdir, open, readdir, rename, rm, stat } from "node:fs/promises";
import { basename, dirname, join } from "node:path";

const WHY: Readonly<Record<string, string>> = {
  ENOSPC: "the disk is full",
  EDQUOT: "the disk quota is used up",
  EFBIG: "the file would be larger than may be written here",
  EROFS: "the folder is on a read-only disk",
  EACCES: "the folder may not be written to",
  EPERM: "the folder may not be written to",
  ENOTDIR: "a part of the path is a file, not a folder",
  EISDIR: "a folder of that name is there",
  ENOENT: "the folder is not there",
  EEXIST: "a file of that name is there already",
  ENAMETOOLONG: "the name is too long",
  EMFILE: "too many files are open",
};

const codeOf = (error: unknown): string => (error as { code?: string }).code ?? "";

/** Why a file could not be written, in words. */
export function writeFault(path: string, error: unknown): Error {
  const code = codeOf(error);
  const why = WHY[code];
  const words = why === undefined ? String((error as Error).message ?? error) : `${why} (${code})`;
  return new Error(`${path} could not be written: ${words}. What lay there before is untouched.`, {
    cause: error,
  });
}

/** Make a folder and those above it. */
export async function makeFolder(folder: string): Promise<void> {
  try {
    await mkdir(folder, { recursive: true });
  } catch (error) {
    throw writeFault(folder, error);
  }
}

/** Write a file under a temporary name and rename it, so that at every moment the old or the new one is there whole. */
export function writeWhole(path: string, text: string): Promise<void> {
  return written(path, text, rename);
}

/** Write a file that must not be there yet, whole or not at all. Throws when one is, and leaves it as it is. */
export function writeNew(path: string, text: string): Promise<void> {
  return written(path, text, place);
}

async function written(
  path: string,
  text: string,
  put: (temporary: string, path: string) => Promise<void>,
): Promise<void> {
  await makeFolder(dirname(path));
  await clearLeftovers(path);
  const temporary = join(dirname(path), `.${basename(path)}.${process.pid}.part`);
  try {
    await writeAll(temporary, text);
    await put(temporary, path);
  } catch (error) {
    throw writeFault(path, error);
  } finally {
    await rm(temporary, { force: true }).catch(() => undefined);
  }
}

/** Takes away temporary files of processes that were ended while they wrote. */
async function clearLeftovers(path: string): Promise<void> {
  const names = await readdir(dirname(path)).catch(() => []);
  for (const name of names) {
    const pid = name.startsWith(`.${basename(path)}.`) ? /\.(\d+)\.part$/.exec(name)?.[1] : undefined;
    if (pid !== undefined && !isRunning(Number(pid)))
      await rm(join(dirname(path), name), { force: true }).catch(() => undefined);
  }
}

function isRunning(pid: number): boolean {
  try {
    return process.kill(pid, 0);
  } catch (error) {
    return codeOf(error) === "EPERM";
  }
}

/** Everything written and on the disk. `writeFile` goes on where a nearly full disk takes a part at first, and then
 *  fails; one bare write would leave the part and say nothing. */
async function writeAll(path: string, text: string): Promise<void> {
  const file = await open(path, "w");
  try {
    await file.writeFile(text);
    await file.sync();
  } finally {
    await file.close();
  }
}

/** A link is made only where nothing is, in one step; where the disk knows no links, look and rename. */
async function place(temporary: string, path: string): Promise<void> {
  try {
    await link(temporary, path);
  } catch (error) {
    if (!["EPERM", "ENOTSUP", "EOPNOTSUPP", "ENOSYS"].includes(codeOf(error))) throw error;
    if (await stat(path).catch(() => undefined)) throw Object.assign(new Error("there"), { code: "EEXIST" });
    await rename(temporary, path);
  }
}
