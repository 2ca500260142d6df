export { drawLineChart } from "./chart.ts";
export { drawSketch } from "./draw.ts";
export type * from "./spec.ts";
export { escapeXml } from "./text.ts";
