// The kernel against Debian's jupyter_kernel_test and further claims of the messaging protocol, by Jupyter's own client.
import { spawnSync } from "node:child_process";
import { join } from "node:path";
import { afterAll, describe, expect, test } from "vitest";
import { hasJupyter, installed, python } from "./jupyter.ts";

interface Line {
  readonly name: string;
  readonly outcome: "passed" | "failed" | "skipped";
  readonly words?: string;
}

/** Tests in Debian's suite; those of ours are counted below. */
const IN_SUITE = 12;
const FURTHER = 30;

describe.skipIf(!hasJupyter)("hingebook kernel serve, seen by jupyter_client", () => {
  const jupyter = hasJupyter ? installed() : undefined;
  afterAll(() => jupyter?.remove());

  test("passes jupyter_kernel_test and our own tests of the protocol, but for the pager, which it has not", () => {
    const done = spawnSync(python, [join(import.meta.dirname, "protocol_suite.py")], {
      encoding: "utf8",
      ...(jupyter ? { env: jupyter.env } : {}),
    });
    const lines = done.stdout
      .split("\n")
      .filter((line) => line.startsWith("{"))
      .map((line) => JSON.parse(line) as Line);
    const failed = lines.filter(({ outcome }) => outcome === "failed");
    expect(
      failed,
      `${failed.map(({ name, words }) => `${name}\n${words}`).join("\n")}\n${done.stderr}`,
    ).toEqual([]);
    expect(lines.filter(({ outcome }) => outcome === "skipped").map(({ name }) => name)).toEqual([
      "Suite.test_pager",
    ]);
    expect(lines.filter(({ name }) => name.startsWith("Suite."))).toHaveLength(IN_SUITE);
    expect(lines.filter(({ name }) => !name.startsWith("Suite.")).length).toBeGreaterThanOrEqual(FURTHER);
  });
});
