export { figureBundle, figureDisplay, type MediaBundle } from "./display.ts";
export { drawFigureSpec } from "./figure.ts";
export { type JobRow, renderIndex } from "./job-index.ts";
export { type PackageOptions, renderPackage } from "./package.ts";
export { type PromptsLeft, promptsLeft, promptsLeftWords } from "./prompts.ts";
export { type Seal, sealed, sealOf } from "./seal.ts";
