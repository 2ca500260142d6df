export { drawLineChart } from "./chart.ts";
export { drawSketch } from "./draw.ts";
export { diagramMarks, type MarkTexts } from "./marks.ts";
export type * from "./spec.ts";
export { escapeXml } from "./text.ts";
