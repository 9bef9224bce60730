import { useQuery } from '@tanstack/react-query';
import type { Data, Layout } from 'plotly.js';
import { useMemo } from 'react';
import { columnOf, type Columns } from '../../shared/api/arrow.js';
import { weatherColumnsQuery } from '../../shared/api/weather-years.js';
import { Plot } from '../../shared/charts/plot.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { LoadingState } from '../../shared/components/loading-state.js';
import { NumberTable, type TableColumn } from '../../shared/components/number-table.js';
import { formatWeatherDay, MONTH_NAMES } from '../../shared/format/date.js';
import { formatFixed } from '../../shared/format/number.js';
import { useSunScale } from '../../shared/theme/sun-scale.js';
import { layOutYear, type YearMap } from './year-map-data.js';

const HEIGHT = 320;

/** The beam of every hour of the year: a wrong clock or a broken month is seen at once. */
export function BeamYearMap({ weatherYearId }: { weatherYearId: string }) {
  const columns = useQuery(weatherColumnsQuery(weatherYearId));
  if (columns.isPending) return <LoadingState label="Loading the hours" height={HEIGHT} />;
  if (columns.isError) {
    return (
      <ErrorState
        what="The hours of this weather year could not be loaded."
        error={columns.error}
        onRetry={() => void columns.refetch()}
      />
    );
  }
  return <YearMapChart columns={columns.data} />;
}

interface Hour {
  readonly hour: number;
  readonly means: Float64Array;
}

const tableColumns: readonly TableColumn<Hour>[] = [
  {
    key: 'hour',
    heading: 'Hour',
    unit: 'local standard time',
    kind: 'text',
    cell: ({ hour }) => hourText(hour),
  },
  ...MONTH_NAMES.map((name, month): TableColumn<Hour> => ({
    key: name,
    heading: name,
    unit: 'W/m²',
    kind: 'number',
    cell: ({ means }) => formatFixed(means[month]),
  })),
];

function YearMapChart({ columns }: { columns: Columns }) {
  const colorscale = useSunScale();
  const map = useMemo(
    () => layOutYear(columnOf(columns, 'startLocalMs'), columnOf(columns, 'dniWm2')),
    [columns],
  );
  const traces = useMemo<Data[]>(
    () => [
      {
        type: 'heatmap',
        z: map.rows.map((row) => Array.from(row)),
        x: Array.from(map.dayMs.keys()),
        y: Array.from({ length: 24 }, (_, hour) => hour + 0.5),
        text: hoverText(map),
        colorscale,
        zmin: 0,
        hovertemplate: '%{text}: %{z:.0f} W/m²<extra></extra>',
        colorbar: { title: { text: 'W/m²' }, thickness: 12, outlinewidth: 0 },
      },
    ],
    [map, colorscale],
  );
  const layout = useMemo<Partial<Layout>>(
    () => ({
      xaxis: {
        tickvals: map.monthStarts.map(({ day }) => day),
        ticktext: map.monthStarts.map(({ month }) => MONTH_NAMES[month] ?? ''),
        showgrid: false,
        zeroline: false,
      },
      yaxis: {
        title: { text: 'Hour of the day' },
        range: [0, 24],
        tickvals: [0, 6, 12, 18, 24],
        showgrid: false,
        zeroline: false,
      },
      margin: { r: 8 },
    }),
    [map],
  );
  return (
    <Plot
      title="Beam through the year"
      description="Beam on a surface that faces the sun (DNI), by day and hour in local standard time. The bright band should lie evenly about noon."
      traces={traces}
      layout={layout}
      height={HEIGHT}
      table={
        <NumberTable
          caption="Mean beam by hour and month"
          columns={tableColumns}
          rows={map.hourByMonth.map((means, hour) => ({ hour, means }))}
          rowKey={({ hour }) => String(hour)}
        />
      }
    />
  );
}

function hoverText(map: YearMap): string[][] {
  const days = Array.from(map.dayMs, formatWeatherDay);
  return map.rows.map((_, hour) => days.map((day) => `${day}, ${hourText(hour)}`));
}

function hourText(hour: number): string {
  return `${String(hour).padStart(2, '0')}–${String(hour + 1).padStart(2, '0')} h`;
}
