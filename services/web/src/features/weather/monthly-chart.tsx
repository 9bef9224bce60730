import type { WeatherSummary } from '@noonwell/schema';
import type { Data, Layout } from 'plotly.js';
import { useMemo } from 'react';
import { Plot } from '../../shared/charts/plot.js';
import { NumberTable, type TableColumn } from '../../shared/components/number-table.js';
import { LONG_MONTH_NAMES, MONTH_NAMES } from '../../shared/format/date.js';
import { formatFixed, formatQuantity } from '../../shared/format/number.js';
import { useMeaningColours } from '../../shared/theme/colours.js';

interface Month {
  readonly name: string;
  readonly dni: number;
  readonly ghi: number;
  readonly dryBulb: number;
}

const columns: readonly TableColumn<Month>[] = [
  { key: 'month', heading: 'Month', kind: 'text', cell: ({ name }) => name },
  {
    key: 'dni',
    heading: 'Beam, facing the sun (DNI)',
    unit: 'kWh/m²',
    kind: 'number',
    cell: ({ dni }) => formatFixed(dni, 1),
  },
  {
    key: 'ghi',
    heading: 'All light, flat (GHI)',
    unit: 'kWh/m²',
    kind: 'number',
    cell: ({ ghi }) => formatFixed(ghi, 1),
  },
  {
    key: 'air',
    heading: 'Mean air temperature',
    unit: '°C',
    kind: 'number',
    cell: ({ dryBulb }) => formatFixed(dryBulb, 1),
  },
];

const layout: Partial<Layout> = {
  barmode: 'group',
  yaxis: { title: { text: 'kWh/m² a month' }, rangemode: 'tozero' },
  yaxis2: {
    title: { text: 'Air, °C' },
    overlaying: 'y',
    side: 'right',
    showgrid: false,
    tickmode: 'auto',
    nticks: 5,
  },
  margin: { r: 56 },
};

/** Sums of light and mean air temperature by month. */
export function MonthlyChart({ summary, height = 280 }: { summary: WeatherSummary; height?: number }) {
  const colours = useMeaningColours();
  const months = useMemo<readonly Month[]>(
    () =>
      LONG_MONTH_NAMES.map((name, month) => ({
        name,
        dni: summary.monthlyDniKwhM2[month] ?? 0,
        ghi: summary.monthlyGhiKwhM2[month] ?? 0,
        dryBulb: summary.monthlyDryBulbMeanC[month] ?? 0,
      })),
    [summary],
  );
  const traces = useMemo<Data[]>(
    () => [
      {
        type: 'bar',
        name: 'DNI',
        x: [...MONTH_NAMES],
        y: months.map(({ dni }) => dni),
        marker: { color: colours.sun },
        hovertemplate: 'DNI %{y:.1f} kWh/m²<extra></extra>',
      },
      {
        type: 'bar',
        name: 'GHI',
        x: [...MONTH_NAMES],
        y: months.map(({ ghi }) => ghi),
        marker: {
          color: colours.ground,
          line: { color: colours.sun, width: 1.5 },
          pattern: { shape: '/', fgcolor: colours.sun },
        },
        hovertemplate: 'GHI %{y:.1f} kWh/m²<extra></extra>',
      },
      {
        type: 'scatter',
        mode: 'lines+markers',
        name: 'Air',
        x: [...MONTH_NAMES],
        y: months.map(({ dryBulb }) => dryBulb),
        yaxis: 'y2',
        line: { color: colours.mutedText, width: 2, dash: 'dot' },
        hovertemplate: '%{y:.1f} °C<extra></extra>',
      },
    ],
    [months, colours],
  );
  const best = months.reduce((one, other) => (other.dni > one.dni ? other : one));
  const least = months.reduce((one, other) => (other.dni < one.dni ? other : one));
  return (
    <Plot
      title="Light and air temperature by month"
      description={`Most beam in ${best.name} (${formatQuantity(best.dni, 'kWh/m²')}), least in ${least.name} (${formatQuantity(least.dni, 'kWh/m²')}).`}
      traces={traces}
      layout={layout}
      height={height}
      table={
        <NumberTable
          caption="Light and air temperature by month"
          columns={columns}
          rows={months}
          rowKey={({ name }) => name}
        />
      }
    />
  );
}
