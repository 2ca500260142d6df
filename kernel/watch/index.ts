export { type WatchOptions, watchNotebook } from "./watch.ts";
