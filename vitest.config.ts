import { availableParallelism } from "node:os";
import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";
import { BaseSequencer, type TestSpecification } from "vitest/node";

/** The files that take longest, the longest first; begun last, they would leave the other processors idle. */
const LONG: readonly string[] = [
  "kernel/jupyter/semantics.jupyter",
  "kernel/jupyter/notebooks.jupyter",
  "record/kills",
  "kernel/jupyter/protocol.jupyter",
  "statics/random",
  "demonstration/command",
  "kernel/jupyter/fuzz",
  "report/package.browser",
  "exact/equilibrium",
  "record/issue",
  "templates/package.browser",
  "demonstration/watch",
  "statics/invariants",
  "record/verify",
  "kernel/jupyter/classic.browser",
  "kernel/semantics",
  "drawing/draw.browser",
  "exact/beams.python",
  "kernel/run",
  "record/changes",
  "templates/units",
  "record/trace",
  "demonstration/package.browser",
];

class LongestFirst extends BaseSequencer {
  override async sort(files: TestSpecification[]): Promise<TestSpecification[]> {
    const place = ({ moduleId }: TestSpecification): number => {
      const found = LONG.findIndex((name) => moduleId.endsWith(`/tests/${name}.test.ts`));
      return found < 0 ? LONG.length : found;
    };
    return (await super.sort(files)).sort((a, b) => place(a) - place(b));
  }
}

export default defineConfig({
  resolve: { alias: { hingebook: fileURLToPath(new URL("./lib/index.ts", import.meta.url)) } },
  test: {
    deps: { optimizer: { ssr: { enabled: true, include: ["mathjs", "mathjs/number", "temml"] } } },
    include: ["tests/**/*.test.ts"],
    // Modules are loaded once per process and not once per file; tests/afresh.ts puts back what files could leave behind.
    isolate: false,
    setupFiles: ["tests/afresh.ts"],
    maxWorkers: Math.max(2, availableParallelism()),
    sequence: { sequencer: LongestFirst },
    // A machine in the cloud may be several times slower than one's own, and busy besides.
    testTimeout: 180_000,
    hookTimeout: 300_000,
  },
});
