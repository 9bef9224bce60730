import { makeStyles } from '@fluentui/react-components';
import type { Data, Layout } from 'plotly.js';
import { useMemo } from 'react';
import { Plot } from '../../shared/charts/plot.js';
import { NumberTable, type TableColumn } from '../../shared/components/number-table.js';
import { LONG_MONTH_NAMES, MONTH_NAMES } from '../../shared/format/date.js';
import { formatSignificant } from '../../shared/format/number.js';
import { scenarioMark, useMeaningColours } from '../../shared/theme/colours.js';
import { useThemeMode } from '../../shared/theme/mode.js';
import type { Compared } from './model/compared.js';

const useStyles = makeStyles({
  pair: {
    display: 'grid',
    gridTemplateColumns: 'repeat(auto-fit, minmax(min(420px, 100%), 1fr))',
    gap: '16px',
    marginTop: '16px',
  },
});

type MonthlyKey = keyof Compared['summary']['monthly'];

/** Heat and electricity month by month. Colour says what it is, hatching which scenario. */
export function MonthlyCharts({ drawn }: { drawn: readonly Compared[] }) {
  const styles = useStyles();
  const colours = useMeaningColours();
  const mode = useThemeMode();
  const heat = useMemo(
    () =>
      drawn.flatMap((one): Data[] => [
        bars(
          one,
          'heatDeliveredKwh',
          `${one.name}: solar heat`,
          colours.heat,
          scenarioMark(one.position, mode).pattern,
        ),
        {
          ...bars(
            one,
            'backupHeatKwh',
            `${one.name}: backup`,
            colours.backup,
            scenarioMark(one.position, mode).pattern,
          ),
          // Stands on the solar heat of its own scenario.
          base: one.summary.monthly.heatDeliveredKwh,
        },
      ]),
    [drawn, colours, mode],
  );
  const power = useMemo(
    () =>
      drawn
        .filter(({ summary }) => summary.powerAcKwh > 0)
        .map((one) =>
          bars(one, 'powerAcKwh', one.name, colours.power, scenarioMark(one.position, mode).pattern),
        ),
    [drawn, colours, mode],
  );
  return (
    <div className={styles.pair}>
      <Plot
        title="Heat month by month"
        description="Solar heat that the load receives, and on top of it what the backup adds. Hatched by scenario."
        traces={heat}
        layout={monthLayout('Heat, kWh')}
        table={
          <MonthTable
            drawn={drawn}
            keys={['heatDeliveredKwh', 'backupHeatKwh']}
            caption="Heat month by month"
          />
        }
      />
      <Plot
        title="Electricity month by month"
        description={
          power.length === 0
            ? 'None of the scenarios drawn makes electricity.'
            : 'Electricity behind the inverter. Hatched by scenario.'
        }
        traces={power}
        layout={monthLayout('Electricity, kWh')}
        table={
          <MonthTable drawn={drawn} keys={['powerAcKwh', 'ownUseKwh']} caption="Electricity month by month" />
        }
      />
    </div>
  );
}

function bars(
  { summary, scenarioId }: Compared,
  key: MonthlyKey,
  name: string,
  colour: string,
  pattern: '' | '/' | '\\' | 'x' | '-' | '|',
): Partial<Data> & { type: 'bar' } {
  return {
    type: 'bar',
    name,
    x: [...MONTH_NAMES],
    y: summary.monthly[key],
    offsetgroup: scenarioId,
    marker: { color: colour, pattern: { shape: pattern, fillmode: 'overlay', size: 6 } },
    hovertemplate: `%{x}: %{y:.3~s}Wh<extra>${name}</extra>`,
  };
}

function monthLayout(title: string): Partial<Layout> {
  return {
    barmode: 'group',
    // Also with one scenario drawn: whose bars they are is not said elsewhere.
    showlegend: true,
    bargap: 0.25,
    xaxis: { type: 'category' },
    yaxis: { title: { text: title }, rangemode: 'tozero' },
  };
}

interface MonthTableProps {
  drawn: readonly Compared[];
  keys: readonly MonthlyKey[];
  caption: string;
}

const KEY_WORDS: Readonly<Partial<Record<MonthlyKey, string>>> = {
  heatDeliveredKwh: 'solar heat',
  backupHeatKwh: 'backup',
  powerAcKwh: 'electricity',
  ownUseKwh: 'used on the site',
};

function MonthTable({ drawn, keys, caption }: MonthTableProps) {
  const columns: TableColumn<number>[] = [
    { key: 'month', heading: 'Month', kind: 'text', cell: (month) => LONG_MONTH_NAMES[month] },
    ...drawn.flatMap((one) =>
      keys.map((key): TableColumn<number> => ({
        key: `${one.scenarioId}-${key}`,
        heading: `${one.name}: ${KEY_WORDS[key] ?? key}`,
        unit: 'kWh',
        kind: 'number',
        cell: (month) => formatSignificant(one.summary.monthly[key][month]),
      })),
    ),
  ];
  return (
    <NumberTable
      caption={caption}
      columns={columns}
      rows={MONTH_NAMES.map((_, month) => month)}
      rowKey={(month) => String(month)}
    />
  );
}
