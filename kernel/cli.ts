#!/usr/bin/env node
// The hingebook command.
import { main } from "./main.ts";

const code = await main(process.argv.slice(2), {
  out: (text) => process.stdout.write(text),
  err: (text) => process.stderr.write(text),
});
// What a notebook has left open (a socket, a watcher) must not keep the command alive once its output is written.
process.stdout.write("", () => process.stderr.write("", () => process.exit(code)));
