export { rewriteCell } from "./cell.ts";
export { rewriteModule } from "./module.ts";
export { RUNNER, type Runner } from "./names.ts";
export type { Rewritten } from "./statements.ts";
export { SyntaxRefusal } from "./strip.ts";
