import { makeStyles, tokens } from '@fluentui/react-components';
import type { LedgerDirection } from '@noonwell/engine';
import { useMemo } from 'react';
import { NumberTable, type TableColumn } from '../../shared/components/number-table.js';
import { Section } from '../../shared/components/section.js';
import { formatFixed } from '../../shared/format/number.js';
import type { Compared } from './model/compared.js';
import { ledgerTable, type LedgerGroup } from './model/ledger-table.js';
import { formatResidual } from './model/residual.js';
import { ScenarioHeading } from './scenario-heading.js';
import { TrackerStates } from './tracker-states.js';

const useStyles = makeStyles({
  text: { margin: '0 0 12px', maxWidth: '80ch', color: tokens.colorNeutralForeground2 },
  parts: {
    display: 'grid',
    gridTemplateColumns: 'repeat(auto-fit, minmax(min(480px, 100%), 1fr))',
    alignItems: 'start',
    gap: '16px',
    marginTop: '16px',
  },
  all: { maxWidth: '640px' },
  tracker: { marginTop: '16px' },
});

const DIRECTION_WORDS: Readonly<Record<LedgerDirection, string>> = {
  in: 'enters',
  out: 'leaves',
  stored: 'kept',
};

interface Row {
  readonly key: string;
  readonly label: string;
  readonly direction: string;
  readonly values: readonly string[];
  readonly total: boolean;
}

/** The ledger: where the beam went, part by part, each a column of figures that adds up. */
export function WhereLost({ scenarios }: { scenarios: readonly Compared[] }) {
  const styles = useStyles();
  const table = useMemo(() => ledgerTable(scenarios.map(({ summary }) => summary)), [scenarios]);
  return (
    <Section title="Where lost?">
      <p className={styles.text}>
        Every line is computed by its own relation, none by subtracting others. What enters a part is
        positive, what leaves it or stays in it is negative: each column adds up to its residual, the last
        line, which is the error of the calculation and not a loss.
      </p>
      <div className={styles.all}>
        <NumberTable
          caption="Residuals of all parts by size"
          columns={[
            { key: 'name', heading: 'Scenario', kind: 'text', cell: (index) => scenarios[index]?.name },
            {
              key: 'kwh',
              heading: 'Residual',
              unit: 'kWh',
              kind: 'number',
              cell: (index) => formatResidual(table.residualKwh[index]),
            },
            {
              key: 'share',
              heading: 'Over the beam',
              kind: 'number',
              cell: (index) => formatResidual(table.residualOfBeam[index]),
            },
          ]}
          rows={scenarios.map((_, index) => index)}
          rowKey={String}
        />
      </div>
      <div className={styles.tracker}>
        <TrackerStates scenarios={scenarios} />
      </div>
      <div className={styles.parts}>
        {table.groups.map((group) => (
          <PartTable key={group.part} group={group} scenarios={scenarios} />
        ))}
      </div>
    </Section>
  );
}

function PartTable({ group, scenarios }: { group: LedgerGroup; scenarios: readonly Compared[] }) {
  const columns: TableColumn<Row>[] = [
    { key: 'line', heading: capital(group.part), kind: 'text', cell: ({ label }) => label },
    { key: 'direction', heading: 'It', kind: 'text', cell: ({ direction }) => direction },
    ...scenarios.map((scenario, index): TableColumn<Row> => ({
      key: scenario.scenarioId,
      heading: <ScenarioHeading scenario={scenario} />,
      unit: 'kWh',
      kind: 'number',
      cell: ({ values }) => values[index],
    })),
  ];
  return (
    <NumberTable
      caption={`Ledger of the ${group.part} over the year`}
      captionHidden
      columns={columns}
      rows={rowsOf(group)}
      rowKey={({ key }) => key}
      isTotal={({ total }) => total}
    />
  );
}

function rowsOf({ rows, residualsKwh }: LedgerGroup): Row[] {
  return [
    ...rows.map(({ line, label, direction, signedKwh }) => ({
      key: line,
      label,
      direction: DIRECTION_WORDS[direction],
      values: signedKwh.map((kwh) => formatFixed(kwh, 1)),
      total: false,
    })),
    {
      key: 'residual',
      label: 'Residual',
      direction: '',
      values: residualsKwh.map(formatResidual),
      total: true,
    },
  ];
}

function capital(part: string): string {
  return part.charAt(0).toUpperCase() + part.slice(1);
}
