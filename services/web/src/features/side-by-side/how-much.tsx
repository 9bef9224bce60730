import { makeStyles, mergeClasses, Switch, tokens } from '@fluentui/react-components';
import { useState } from 'react';
import { NumberTable, type TableColumn } from '../../shared/components/number-table.js';
import { Section } from '../../shared/components/section.js';
import { formatSignificant, formatSigned } from '../../shared/format/number.js';
import type { Compared } from './model/compared.js';
import { differences, type Difference, type Verdict } from './model/differences.js';
import { FIGURES, type Figure } from './model/figures.js';
import { MonthlyCharts } from './monthly-charts.js';
import { ScenarioHeading } from './scenario-heading.js';

const FEW_DIGITS = 3;
const MORE_DIGITS = 6;

const useStyles = makeStyles({
  label: { minWidth: '180px' },
  unit: { color: tokens.colorNeutralForeground3 },
  verdict: { color: tokens.colorNeutralForeground3 },
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
  return [
    {
      key: 'figure',
      heading: 'In the year',
      kind: 'text',
      cell: ({ label, unit }) => (
        <div className={styles.label}>
          {label}
          {unit !== '1' && <span className={styles.unit}>, {unit}</span>}
        </div>
      ),
    },
    {
      key: 'baseline',
      heading: <ScenarioHeading scenario={baseline} note="baseline" />,
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
          heading: <ScenarioHeading scenario={other} />,
          kind: 'number',
          cell: ({ key }) => formatSignificant(other.summary[key], digits),
        },
        {
          key: `${other.scenarioId}-difference`,
          heading: 'Difference',
          kind: 'number',
          cell: ({ key }) => {
            const difference = byKey.get(key);
            return difference?.verdict === 'equal' ? '0' : formatSigned(difference?.absolute, digits);
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
        {
          key: `${other.scenarioId}-verdict`,
          heading: 'That is',
          kind: 'text',
          cell: ({ key }) => {
            const verdict = byKey.get(key)?.verdict ?? 'unknown';
            return (
              <span
                className={mergeClasses(
                  styles.verdict,
                  verdict === 'worse' && styles.worse,
                  verdict === 'better' && styles.better,
                )}
              >
                {VERDICT_WORDS[verdict]}
              </span>
            );
          },
        },
      ];
    }),
  ];
}
