// The kernel as Jupyter finds it: a folder with a kernel.json and a logo. Source: Jupyter client documentation, "Kernel
// specs", and Jupyter core documentation, "Data files".
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { homedir } from "node:os";
import { delimiter, join, resolve } from "node:path";
import { logoPng, logoSvg } from "./logo.ts";

export const KERNEL_NAME = "hingebook";

/** Where the kernel goes: for this user, or below a prefix such as /usr/local or an environment's folder. */
export type Place = { readonly kind: "user" } | { readonly kind: "prefix"; readonly folder: string };

export interface System {
  readonly platform: NodeJS.Platform;
  readonly env: Readonly<Record<string, string | undefined>>;
  readonly home: string;
}

export interface Installed {
  readonly folder: string;
  /** The command's file the kernel starts, and whether it is there. */
  readonly command: string;
  readonly works: boolean;
}

export const thisSystem: System = { platform: process.platform, env: process.env, home: homedir() };

/** The user's Jupyter data folder. */
export function userData({ platform, env, home }: System): string {
  if (env.JUPYTER_DATA_DIR !== undefined && env.JUPYTER_DATA_DIR !== "") return env.JUPYTER_DATA_DIR;
  if (platform === "darwin") return join(home, "Library", "Jupyter");
  if (platform === "win32") return join(env.APPDATA ?? join(home, "AppData", "Roaming"), "jupyter");
  return join(env.XDG_DATA_HOME ?? join(home, ".local", "share"), "jupyter");
}

const dataFolder = (place: Place, system: System): string =>
  place.kind === "user" ? userData(system) : join(resolve(place.folder), "share", "jupyter");

export const kernelFolder = (place: Place, system: System = thisSystem): string =>
  join(dataFolder(place, system), "kernels", KERNEL_NAME);

export interface Starter {
  readonly node: string;
  /** The hingebook command's own file. */
  readonly command: string;
  readonly version: string;
}

/** How a kernel is started. The first flag lets a timer's endless callback be interrupted without ending the process;
 *  the second keeps the memory of short-lived objects small. */
export const kernelCommandLine = (node: string, command: string, connectionFile: string): string[] => [
  node,
  "--no-force-async-hooks-checks",
  "--max-semi-space-size=8",
  command,
  "kernel",
  "serve",
  connectionFile,
];

/** The content of kernel.json. */
export function kernelSpec({ node, command, version }: Starter): object {
  return {
    argv: kernelCommandLine(node, command, "{connection_file}"),
    display_name: "hingebook",
    language: "typescript",
    interrupt_mode: "message",
    metadata: { hingebook: version },
  };
}

interface Found {
  readonly argv: readonly string[];
}

/** Our kernel.json in a folder; nothing where there is none or it is somebody else's. */
function found(folder: string): Found | undefined {
  const file = join(folder, "kernel.json");
  if (!existsSync(file)) return undefined;
  try {
    const spec = JSON.parse(readFileSync(file, "utf8")) as {
      argv?: unknown;
      metadata?: { hingebook?: unknown };
    };
    if (typeof spec.metadata?.hingebook !== "string" || !Array.isArray(spec.argv)) return undefined;
    return { argv: spec.argv.map(String) };
  } catch {
    return undefined;
  }
}

/** Install the kernel; what was there of ours is replaced. Answers its folder. */
export function installKernel(place: Place, starter: Starter, system: System = thisSystem): string {
  const folder = kernelFolder(place, system);
  if (existsSync(folder) && !found(folder))
    throw new Error(`${folder} is there and is not hingebook's; move it away first`);
  mkdirSync(folder, { recursive: true });
  writeFileSync(join(folder, "kernel.json"), `${JSON.stringify(kernelSpec(starter), undefined, 2)}\n`);
  for (const size of [32, 64]) writeFileSync(join(folder, `logo-${size}x${size}.png`), logoPng(size));
  writeFileSync(join(folder, "logo-svg.svg"), logoSvg());
  return folder;
}

/** Remove the kernel. Answers its folder. Throws where it is not installed. */
export function removeKernel(place: Place, system: System = thisSystem): string {
  const folder = kernelFolder(place, system);
  if (!existsSync(folder))
    throw new Error(`there is no kernel in ${folder}; hingebook kernel list tells where`);
  if (!found(folder)) throw new Error(`${folder} is not hingebook's and is left as it is`);
  rmSync(folder, { recursive: true });
  return folder;
}

/** The folders Jupyter looks for kernels in, first come first served. */
export function searched(system: System = thisSystem): string[] {
  const { platform, env } = system;
  const named = (env.JUPYTER_PATH ?? "").split(delimiter).filter((path) => path !== "");
  const common =
    platform === "win32"
      ? [join(env.PROGRAMDATA ?? "C:\\ProgramData", "jupyter")]
      : ["/usr/local/share/jupyter", "/usr/share/jupyter"];
  const environment = env.VIRTUAL_ENV ?? env.CONDA_PREFIX;
  const own = environment === undefined ? [] : [join(environment, "share", "jupyter")];
  return [...new Set([...named, userData(system), ...own, ...common])].map((path) => join(path, "kernels"));
}

/** Every hingebook kernel Jupyter would find, wherever it was installed. */
export function installedKernels(system: System = thisSystem): Installed[] {
  return searched(system).flatMap((kernels) => {
    const names = existsSync(kernels) ? readdirSync(kernels).sort() : [];
    return names.flatMap((name) => {
      const folder = join(kernels, name);
      const ours = found(folder);
      if (!ours) return [];
      const [node = ""] = ours.argv;
      const command = ours.argv.find((word) => word.endsWith(".js")) ?? "";
      return [{ folder, command, works: existsSync(node) && existsSync(command) }];
    });
  });
}
