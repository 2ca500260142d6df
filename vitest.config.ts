import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

export default defineConfig({
  resolve: { alias: { hingebook: fileURLToPath(new URL("./lib/index.ts", import.meta.url)) } },
  test: {
    deps: { optimizer: { ssr: { enabled: true, include: ["mathjs", "mathjs/number", "temml"] } } },
    include: ["tests/**/*.test.ts"],
    testTimeout: 60_000,
    hookTimeout: 120_000,
  },
});
