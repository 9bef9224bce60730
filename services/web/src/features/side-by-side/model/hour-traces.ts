import type { ChannelDefinition, StateChannel } from '@noonwell/engine';
import type { Data, Layout } from 'plotly.js';
import type { Columns } from '../../../shared/api/arrow.js';
import type { MeaningColours, ScenarioMark } from '../../../shared/theme/colours.js';
import { isOfTheWeather } from './channel-sets.js';
import { weekOf, type Column, type Week } from './weeks.js';

/** The hours of one scenario, ready to be drawn. */
export interface DrawnHours {
  readonly name: string;
  readonly mark: ScenarioMark;
  readonly columns: Columns;
  readonly week: Week;
}

/** Energies come as mean power in W; they are drawn in kW. */
export function shownUnit({ unit }: ChannelDefinition): { unit: string; factor: number } {
  return unit === 'W' ? { unit: 'kW', factor: 1e-3 } : { unit, factor: 1 };
}

/** The week's entries in the unit shown; a view of the year where the unit is its own. */
export function shownWeek(column: Column, week: Week, channel: ChannelDefinition): Column {
  const { factor } = shownUnit(channel);
  const view = weekOf(column, week);
  return factor === 1 ? view : view.map((value) => value * factor);
}

const AT_THE_END: ReadonlySet<string> = new Set<StateChannel>(['tankTopC', 'tankBottomC']);

/** Share of the figure's height between two panels. */
const GAP = 0.055;

/**
 * A panel a channel above each other with one time axis: zooming one zooms all. What belongs to the weather
 * is drawn once, what belongs to a machine once a scenario with the scenario's colour and dash.
 */
export function hourFigure(
  channels: readonly ChannelDefinition[],
  drawn: readonly DrawnHours[],
  colours: MeaningColours,
): { traces: Data[]; layout: Partial<Layout> } {
  const traces: Data[] = [];
  const panel = (1 - GAP * (channels.length - 1)) / channels.length;
  const layout: Partial<Layout> = {
    xaxis: {
      type: 'date',
      tickformat: '%-d %b',
      hoverformat: '%-d %b, %H:%M',
      anchor: 'free',
      position: 0,
      showspikes: true,
      spikemode: 'across',
      spikethickness: 1,
    },
    hovermode: 'x',
    legend: { orientation: 'h', y: 1.04, yanchor: 'bottom', x: 0 },
    annotations: [],
  };
  const named = new Set<string>();
  channels.forEach((channel, index) => {
    const top = 1 - index * (panel + GAP);
    const axis = axisName(index);
    layout[axis] = {
      domain: [Math.max(0, top - panel), top],
      rangemode: channel.unit === '°C' ? 'normal' : 'tozero',
      nticks: 4,
    };
    layout.annotations?.push({
      text: `<b>${channel.label}</b>, ${shownUnit(channel).unit}`.replace(/, 1$/, ''),
      xref: 'paper',
      yref: 'paper',
      x: 0,
      y: top,
      xanchor: 'left',
      yanchor: 'bottom',
      showarrow: false,
      font: { size: 12, color: colours.mutedText },
    });
    const once = isOfTheWeather(channel.key);
    // A record's mean holds from its start to the next one's; a store's temperature is taken at its end.
    const atEnd = AT_THE_END.has(channel.key);
    for (const { name, mark, columns, week } of once ? drawn.slice(0, 1) : drawn) {
      const column = columns.get(channel.key);
      const start = columns.get('startLocalMs');
      if (!column || !start) continue;
      traces.push({
        type: 'scatter',
        mode: 'lines',
        name: once ? channel.label : name,
        legendgroup: once ? channel.key : name,
        showlegend: !once && !named.has(name),
        x: nominalTimes(start, week, atEnd ? 1 : 0),
        y: shownWeek(column, week, channel),
        yaxis: index === 0 ? 'y' : `y${index + 1}`,
        line: {
          shape: atEnd ? 'linear' : 'hv',
          width: once ? 1.5 : 2,
          color: once ? (channel.key === 'dniWm2' ? colours.sun : colours.mutedText) : mark.colour,
          dash: once ? 'solid' : mark.dash,
        },
      });
      if (!once) named.add(name);
    }
  });
  return { traces, layout };
}

/**
 * Times of the week that run on evenly: a typical year joins months of different years, and a week across
 * the joint must not be torn apart.
 */
export function nominalTimes(start: Column, week: Week, recordsLater = 0): Float64Array {
  const first = start[week.start]!;
  const interval = week.end - week.start > 1 ? start[week.start + 1]! - first : 0;
  return Float64Array.from(
    { length: week.end - week.start },
    (_, index) => first + (index + recordsLater) * interval,
  );
}

type AxisName = `yaxis${'' | 2 | 3 | 4 | 5 | 6 | 7 | 8 | 9}`;
const AXES: readonly AxisName[] = [
  'yaxis',
  'yaxis2',
  'yaxis3',
  'yaxis4',
  'yaxis5',
  'yaxis6',
  'yaxis7',
  'yaxis8',
  'yaxis9',
];

function axisName(index: number): AxisName {
  const name = AXES[index];
  if (name === undefined) throw new RangeError(`no more than ${AXES.length} panels in a figure`);
  return name;
}
