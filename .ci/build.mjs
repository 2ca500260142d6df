// Sources -> dist/: one bundle each for the library and the command line (shared parts in common chunks, so that the
// library exists once per process), and one self-contained declaration file.
import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { build } from "esbuild";
import { rollup } from "rollup";
import { dts } from "rollup-plugin-dts";

const top = new URL("..", import.meta.url).pathname;
const { dependencies, version } = JSON.parse(readFileSync(join(top, "package.json"), "utf8"));

/** Bundled because they load several times faster as the few functions used. */
const bundled = new Set(["mathjs", "temml", "markdown-it", "fastest-levenshtein"]);
const external = Object.keys(dependencies)
  .filter((name) => !bundled.has(name))
  .flatMap((name) => [name, `${name}/*`]);

/** Threads are files of their own, beside the parts that start them. */
const entries = {
  hingebook: "lib/index.ts",
  cli: "kernel/cli.ts",
  "parts/lifeline-thread": "kernel/jupyter/lifeline-thread.ts",
  "parts/language-thread": "kernel/jupyter/language-thread.ts",
};
/** Where the build goes, from the top folder. */
const folder = process.argv[2] ?? "dist";

// Built aside and put in place at the end, so that a build that fails leaves the last good one.
const aside = join(top, `out/build-${process.pid}`);
process.on("exit", () => rmSync(aside, { recursive: true, force: true }));
mkdirSync(aside, { recursive: true });
await build({
  absWorkingDir: top,
  entryPoints: entries,
  outdir: aside,
  bundle: true,
  splitting: true,
  chunkNames: "parts/[name]-[hash]",
  format: "esm",
  platform: "node",
  target: "node20",
  external,
  define: { HINGEBOOK_VERSION: JSON.stringify(version) },
  // mathjs and markdown-it reach for require in places that are never run; ESM output needs one to be there.
  banner: {
    js: 'import { createRequire as __createRequire } from "node:module"; const require = __createRequire(import.meta.url);',
  },
  logLevel: "warning",
});

const declarations = await rollup({
  input: join(top, "lib/index.ts"),
  plugins: [
    dts({ tsconfig: join(top, "tsconfig.json"), compilerOptions: { stripInternal: true, paths: {} } }),
  ],
  onwarn: (warning) => {
    throw new Error(`declaration file: ${warning.message}`);
  },
});
const { output } = await declarations.generate({ format: "es" });
await declarations.close();
const text = output[0].code;
const foreign = /from ['"]([^.'"][^'"]*)['"]/.exec(text);
if (foreign)
  throw new Error(`declaration file: ${foreign[1]} shows in a public signature; only our own types may`);
writeFileSync(join(aside, "hingebook.d.ts"), text);

const dist = join(top, folder);
const before = `${aside}-before`;
if (existsSync(dist)) renameSync(dist, before);
renameSync(aside, dist);
rmSync(before, { recursive: true, force: true });
