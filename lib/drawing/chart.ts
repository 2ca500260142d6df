// x-y charts through Vega-Lite, loaded when the first one is drawn.

import type { TopLevelSpec } from "vega-lite";
import { ACCENT, INK } from "./scene.ts";
import type { LineChartFigure } from "./spec.ts";
import { openSvg } from "./svg.ts";
import { allowedInXml } from "./text.ts";

const DASHES = [[], [7, 4], [2, 3], [9, 3, 2, 3], [1, 2], [5, 2]];
const axis = {
  domainColor: INK,
  tickColor: INK,
  gridColor: "#c9c6bf",
  labelColor: INK,
  titleColor: INK,
  labelFontSize: 13,
  titleFontSize: 14,
  titleFontWeight: "normal" as const,
};

function rowsOf(spec: LineChartFigure): { x: number; y: number; series: string; order: number }[] {
  return spec.series.flatMap((series) =>
    series.points.map(([x, y], order) => {
      if (Number.isFinite(x) && Number.isFinite(y)) return { x, y, series: allowedInXml(series.name), order };
      throw new Error(
        `line chart: point ${order + 1} of "${series.name}" is (${x}, ${y}); finite numbers are wanted`,
      );
    }),
  );
}

function chartSpec(spec: LineChartFigure): TopLevelSpec {
  if (spec.series.length === 0) throw new Error("line chart: no series; at least one line is wanted");
  const names = spec.series.map((s) => allowedInXml(s.name));
  const dashes = names.map((_, i) => DASHES[i % DASHES.length] ?? []);
  return {
    width: 380,
    height: 230,
    padding: 8,
    data: { values: rowsOf(spec) },
    mark: { type: "line", strokeWidth: 1.8 },
    encoding: {
      x: { field: "x", type: "quantitative", title: allowedInXml(spec.x), scale: { nice: true } },
      y: { field: "y", type: "quantitative", title: allowedInXml(spec.y) },
      order: { field: "order", type: "quantitative" },
      strokeDash: { field: "series", type: "nominal", title: null, scale: { domain: names, range: dashes } },
      color: {
        field: "series",
        type: "nominal",
        title: null,
        scale: { domain: names, range: names.map((_, i) => (i === 0 ? ACCENT : INK)) },
      },
    },
    config: {
      font: "Helvetica Neue, Arial, Liberation Sans, sans-serif",
      axis,
      view: { stroke: null },
      legend: {
        labelFontSize: 13,
        labelLimit: 420,
        labelColor: INK,
        orient: "top",
        symbolSize: 900,
        symbolType: "stroke",
      },
    },
  };
}

/** Ids made the figure's own and numbered from 1; the chart library counts them up through the whole process. */
function ownIds(svg: string, prefix: string): string {
  const ids = [...new Set([...svg.matchAll(/ id="([^"]+)"/g)].map((m) => m[1] ?? ""))];
  return ids.reduce(
    (text, id, i) =>
      text
        .replaceAll(` id="${id}"`, ` id="${prefix}-clip${i + 1}"`)
        .replaceAll(`url(#${id})`, `url(#${prefix}-clip${i + 1})`),
    svg,
  );
}

/** An x-y chart as one SVG element with ids that start with `prefix`. Loads Vega on first use. */
export async function drawLineChart(spec: LineChartFigure, prefix: string): Promise<string> {
  const [vega, { compile }] = await Promise.all([import("vega"), import("vega-lite")]);
  const view = new vega.View(vega.parse(compile(chartSpec(spec)).spec), { renderer: "none" });
  try {
    const drawn = await view.toSVG();
    const size = /viewBox="0 0 ([\d.]+) ([\d.]+)"/.exec(drawn);
    if (!size) throw new Error("line chart: the chart library gave no viewBox");
    const inside = drawn
      .replace(/^<svg[^>]*>/, "")
      .replace(/<\/svg>\s*$/, "")
      .replace(/ (?:role|aria-[a-z]+|style|pointer-events)="[^"]*"/g, "");
    const open = openSvg(spec, prefix, Number(size[1]), Number(size[2]));
    // The library anchors its own texts; the figure's default would shift those it leaves at the start.
    return `${open}\n<g text-anchor="start">${ownIds(inside, prefix)}</g>\n</svg>\n`;
  } finally {
    view.finalize();
  }
}
