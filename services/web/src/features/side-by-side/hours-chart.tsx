import type { ChannelDefinition } from '@noonwell/engine';
import { useMemo } from 'react';
import type { Columns } from '../../shared/api/arrow.js';
import { Plot } from '../../shared/charts/plot.js';
import { NumberTable, type TableColumn } from '../../shared/components/number-table.js';
import { formatWeatherDay } from '../../shared/format/date.js';
import { formatSignificant } from '../../shared/format/number.js';
import { scenarioMark, useMeaningColours } from '../../shared/theme/colours.js';
import { useThemeMode } from '../../shared/theme/mode.js';
import { isOfTheWeather } from './model/channel-sets.js';
import type { Compared } from './model/compared.js';
import { hourFigure, nominalTimes, shownUnit, shownWeek } from './model/hour-traces.js';
import { weekFrom, type CalendarDay, type Week } from './model/weeks.js';

const PANEL_HEIGHT = 124;
const LEGEND_AND_AXIS_HEIGHT = 96;

interface LoadedHours {
  readonly compared: Compared;
  readonly columns: Columns;
}

interface HoursChartProps {
  channels: readonly ChannelDefinition[];
  loaded: readonly LoadedHours[];
  week: Week;
}

/** A week, channel below channel, on one time axis. */
export function HoursChart({ channels, loaded, week }: HoursChartProps) {
  const colours = useMeaningColours();
  const mode = useThemeMode();
  const hours = useMemo(
    () =>
      loaded.flatMap(({ compared: { name, position }, columns }) => {
        // Each on its own records: another weather year may have other intervals.
        const own = ownWeek(columns, week.from);
        return own ? [{ name, mark: scenarioMark(position, mode), columns, week: own }] : [];
      }),
    [loaded, week.from, mode],
  );
  const figure = useMemo(() => hourFigure(channels, hours, colours), [channels, hours, colours]);
  const height = channels.length * PANEL_HEIGHT + LEGEND_AND_AXIS_HEIGHT;
  return (
    <Plot
      title="Hours of the week"
      description={`${dayWords(week.from)} to ${dayWords(week.to)}, local standard time. Each step is the mean of a weather record. Drag to look closer, press twice to see the whole week again.`}
      traces={figure.traces}
      layout={{ ...figure.layout, margin: { t: 44 } }}
      height={height}
      table={<HoursTable channels={channels} loaded={loaded} week={week} />}
    />
  );
}

function HoursTable({ channels, loaded, week }: HoursChartProps) {
  const start = loaded[0]?.columns.get('startLocalMs');
  if (!start) return null;
  const times = nominalTimes(start, week);
  const columns: TableColumn<number>[] = [
    {
      key: 'time',
      heading: 'From',
      kind: 'text',
      cell: (index) => {
        const at = times[index] ?? 0;
        return `${formatWeatherDay(at)}, ${new Date(at).toISOString().slice(11, 16)}`;
      },
    },
    ...channels.flatMap((channel) =>
      (isOfTheWeather(channel.key) ? loaded.slice(0, 1) : loaded).flatMap(
        ({ compared, columns: read }): TableColumn<number>[] => {
          const column = read.get(channel.key);
          const own = ownWeek(read, week.from);
          if (!column || !own) return [];
          const values = shownWeek(column, own, channel);
          return [
            {
              key: `${compared.scenarioId}-${channel.key}`,
              heading: isOfTheWeather(channel.key) ? channel.label : `${compared.name}: ${channel.label}`,
              unit: shownUnit(channel).unit,
              kind: 'number',
              cell: (index) => formatSignificant(values[index]),
            },
          ];
        },
      ),
    ),
  ];
  return (
    <NumberTable
      caption="Hours of the week"
      columns={columns}
      rows={Array.from(times, (_, index) => index)}
      rowKey={String}
      tall
    />
  );
}

function ownWeek(columns: Columns, from: CalendarDay): Week | null {
  const start = columns.get('startLocalMs');
  return start ? weekFrom(start, from) : null;
}

function dayWords(day: CalendarDay): string {
  return formatWeatherDay(Date.UTC(2000, Number(day.slice(0, 2)) - 1, Number(day.slice(3))));
}
