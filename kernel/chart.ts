// Draws a Vega-Lite chart as SVG, for front ends that cannot. Loaded when the first chart is shown.
//
// Behaviours leaned on (held by tests/kernel/chart.test.ts): `compile` gives a Vega specification or throws; `toSVG`
// needs no document; clip ids count up through the process until they are reset.
import { parse, resetSVGDefIds, View } from "vega";
import { compile, type TopLevelSpec } from "vega-lite";

function describe(spec: Readonly<Record<string, unknown>>): string {
  const { title, description } = spec;
  const text = typeof title === "object" && title !== null ? (title as { text?: unknown }).text : title;
  const said = [description, text].find((words) => typeof words === "string" && words !== "");
  return `chart${typeof said === "string" ? `: ${said}` : ""}`;
}

let drawn = 0;

/** The SVG of a Vega-Lite specification and words for those who cannot see it. Throws where it is no such chart. */
export async function drawChart(given: object): Promise<{ readonly svg: string; readonly text: string }> {
  // A copy in this realm's built-ins: the chart comes from a cell.
  const spec = JSON.parse(JSON.stringify(given)) as TopLevelSpec;
  const text = describe(spec as unknown as Record<string, unknown>);
  resetSVGDefIds();
  const view = new View(parse(compile(spec).spec), { renderer: "none" });
  try {
    const svg = await view.toSVG();
    const own = `chart${++drawn}-`;
    return {
      text,
      svg: svg
        .replaceAll(/ id="([^"]+)"/g, ` id="${own}$1"`)
        .replaceAll(/url\(#([^)]+)\)/g, `url(#${own}$1)`),
    };
  } finally {
    view.finalize();
  }
}
