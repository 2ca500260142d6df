// What a kernel says about itself. Source: Messaging in Jupyter, "Kernel info".
import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import { type Json, PROTOCOL_VERSION } from "./message.ts";

function compilerVersion(): string {
  const file = createRequire(import.meta.url).resolve("typescript-native/package.json");
  return (JSON.parse(readFileSync(file, "utf8")) as { version: string }).version;
}

/** The content of a kernel_info_reply. `version` is hingebook's. */
export function kernelInfo(version: string): Json {
  return Object.freeze({
    status: "ok",
    protocol_version: PROTOCOL_VERSION,
    implementation: "hingebook",
    implementation_version: version,
    language_info: {
      name: "typescript",
      version: compilerVersion(),
      mimetype: "text/typescript",
      file_extension: ".ts",
      pygments_lexer: "typescript",
      codemirror_mode: { name: "javascript", typescript: true },
      nbconvert_exporter: "script",
    },
    banner: `hingebook ${version}: approximate analysis of beams and frames, in TypeScript`,
    help_links: [],
    debugger: false,
  });
}
