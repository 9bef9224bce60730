import { makeStyles, mergeClasses, Switch, tokens } from '@fluentui/react-components';
import { useState } from 'react';
import { NumberTable, type TableColumn } from '../../shared/components/number-table.js';
import { ScenarioSwatch } from '../../shared/components/scenario-swatch.js';
import { Section } from '../../shared/components/section.js';
import { formatSignificant, formatSigned } from '../../shared/format/number.js';
import type { Compared } from './model/compared.js';
import { differences, type Difference, type Verdict } from './model/differences.js';
import { FIGURES, type Figure } from './model/figures.js';
import { MonthlyCharts } from './monthly-charts.js';

const FEW_DIGITS = 3;
const MORE_DIGITS = 6;

const useStyles = makeStyles({
  head: { display: 'inline-flex', alignItems: 'center', gap: '8px', whiteSpace: 'normal' },
  unit: { color: tokens.colorNeutralForeground3 },
  verdict: { display: 'block', fontSize: tokens.fontSizeBase200, color: tokens.colorNeutralForeground3 },
  worse: { color: tokens.colorPaletteRedForeground1 },
  better: { color: tokens.colorPaletteGreenForeground1 },
});

const VERDICT_WORDS: Readonly<Record<Verdict, string>> = {
  better: 'better',
  worse: 'worse',
  higher: 'higher',
  lower: 'lower',
  equal: 'equal',
  unknown: '',
};

interface HowMuchProps {
  baseline: Compared;
  others: readonly Compared[];
  drawn: readonly Compared[];
}

/** Yearly totals with their differences, then month by month. */
export function HowMuch({ baseline, others, drawn }: HowMuchProps) {
  const [digits, setDigits] = useState(FEW_DIGITS);
  const columns = useColumns(baseline, others, digits);
  return (
    <Section
      title="How much?"
      actions={
        <Switch
          label="More digits"
          labelPosition="before"
          checked={digits === MORE_DIGITS}
          onChange={(_, { checked }) => {
            setDigits(checked ? MORE_DIGITS : FEW_DIGITS);
          }}
        />
      }
    >
      <NumberTable
        caption={`The year's totals, and what is different from “${baseline.name}”`}
        columns={columns}
        rows={FIGURES}
        rowKey={({ key }) => key}
      />
      <MonthlyCharts drawn={drawn} />
    </Section>
  );
}

function useColumns(
  baseline: Compared,
  others: readonly Compared[],
  digits: number,
): readonly TableColumn<Figure>[] {
  const styles = useStyles();
  const heading = ({ name, position }: Compared, below: string) => (
    <span className={styles.head}>
      <ScenarioSwatch position={position} />
      <span>
        {name}
        {below}
      </span>
    </span>
  );
  return [
    {
      key: 'figure',
      heading: 'In the year',
      kind: 'text',
      cell: ({ label, unit }) => (
        <>
          {label}
          {unit !== '1' && <span className={styles.unit}>, {unit}</span>}
        </>
      ),
    },
    {
      key: 'baseline',
      heading: heading(baseline, ' (baseline)'),
      kind: 'number',
      cell: ({ key }) => formatSignificant(baseline.summary[key], digits),
    },
    ...others.flatMap((other): TableColumn<Figure>[] => {
      const byKey = new Map<string, Difference>(
        differences(baseline.summary, other.summary).map((difference) => [difference.figure.key, difference]),
      );
      return [
        {
          key: `${other.scenarioId}-value`,
          heading: heading(other, ''),
          kind: 'number',
          cell: ({ key }) => formatSignificant(other.summary[key], digits),
        },
        {
          key: `${other.scenarioId}-difference`,
          heading: 'Difference',
          kind: 'number',
          cell: ({ key }) => {
            const { absolute = null, verdict = 'unknown' } = byKey.get(key) ?? {};
            const { worse, better } = styles;
            return (
              <>
                {verdict === 'equal' ? '0' : formatSigned(absolute, digits)}
                <span
                  className={mergeClasses(
                    styles.verdict,
                    verdict === 'worse' && worse,
                    verdict === 'better' && better,
                  )}
                >
                  {VERDICT_WORDS[verdict]}
                </span>
              </>
            );
          },
        },
        {
          key: `${other.scenarioId}-share`,
          heading: 'of baseline',
          unit: '%',
          kind: 'number',
          cell: ({ key }) => {
            const difference = byKey.get(key);
            if (difference?.verdict === 'equal') return '0';
            const ratio = difference?.ratio ?? null;
            return formatSigned(ratio === null ? null : ratio * 100, digits);
          },
        },
      ];
    }),
  ];
}
