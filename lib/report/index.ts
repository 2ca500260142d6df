export { figureBundle, figureDisplay, type MediaBundle } from "./display.ts";
export { drawFigureSpec } from "./figure.ts";
export { type PackageOptions, renderPackage } from "./package.ts";
