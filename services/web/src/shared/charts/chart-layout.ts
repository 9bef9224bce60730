import type { Config, Data, Layout, TraceType } from 'plotly.js';
import type { MeaningColours } from '../theme/colours.js';

/** Kinds of trace that are drawn as SVG. Those that need WebGL also need `unsafe-eval`, which our pages refuse. */
const SVG_TRACES: readonly TraceType[] = ['scatter', 'bar', 'heatmap', 'contour', 'scatterpolar', 'sankey'];

/** @throws Error for a trace that would be drawn with WebGL */
export function requireSvg(traces: readonly Data[]): void {
  for (const { type = 'scatter' } of traces as readonly { type?: TraceType }[]) {
    if (!SVG_TRACES.includes(type))
      throw new Error(`charts of the kind "${type}" are not drawn here: SVG only`);
  }
}

export const chartConfig: Partial<Config> = {
  displaylogo: false,
  responsive: true,
  // The buttons cover the chart on a phone; zoom is by dragging, reset by a double click.
  displayModeBar: false,
  showTips: false,
};

/** Ground, grid, type and margins of every chart; a chart's own layout is laid over it. */
export function baseLayout(colours: MeaningColours, height: number): Partial<Layout> {
  const axis = {
    gridcolor: colours.grid,
    linecolor: colours.grid,
    zerolinecolor: colours.grid,
    tickfont: { color: colours.mutedText },
    automargin: true,
  };
  return {
    height,
    autosize: true,
    font: { family: 'Lato, "Segoe UI", system-ui, sans-serif', size: 13, color: colours.text },
    paper_bgcolor: 'rgba(0,0,0,0)',
    plot_bgcolor: 'rgba(0,0,0,0)',
    margin: { l: 56, r: 16, t: 12, b: 40 },
    xaxis: axis,
    yaxis: axis,
    legend: { orientation: 'h', y: 1.02, yanchor: 'bottom', x: 0 },
    hoverlabel: { font: { family: 'Lato, "Segoe UI", system-ui, sans-serif' } },
    separators: '.,',
  };
}

/** Lays a chart's own layout over the base; axes are merged key by key, so that a title does not lose the grid. */
export function mergeLayout(base: Partial<Layout>, own: Partial<Layout>): Partial<Layout> {
  const merged: Partial<Layout> = { ...base, ...own };
  for (const key of Object.keys(own).filter(isAxis)) {
    merged[key] = { ...(key.startsWith('x') ? base.xaxis : base.yaxis), ...own[key] };
  }
  merged.margin = { ...base.margin, ...own.margin };
  merged.legend = { ...base.legend, ...own.legend };
  return merged;
}

type AxisKey = Extract<keyof Layout, `${'x' | 'y'}axis${'' | 2 | 3 | 4 | 5 | 6 | 7 | 8 | 9}`>;

function isAxis(key: string): key is AxisKey {
  return /^[xy]axis[2-9]?$/.test(key);
}
