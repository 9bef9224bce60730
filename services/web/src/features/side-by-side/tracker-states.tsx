import { NumberTable, type TableColumn } from '../../shared/components/number-table.js';
import { formatFixed } from '../../shared/format/number.js';
import type { Compared } from './model/compared.js';
import { trackerTable, type TrackerRow } from './model/tracker-table.js';
import { ScenarioHeading } from './scenario-heading.js';

/** What the tracker did with the year: hours in each state, and the share of the beam met in it. */
export function TrackerStates({ scenarios }: { scenarios: readonly Compared[] }) {
  const columns: TableColumn<TrackerRow>[] = [
    { key: 'state', heading: 'The dish is', kind: 'text', cell: ({ label }) => label },
    ...scenarios.flatMap((scenario, index): TableColumn<TrackerRow>[] => [
      {
        key: `${scenario.scenarioId}-hours`,
        heading: <ScenarioHeading scenario={scenario} note="time" />,
        unit: 'h',
        kind: 'number',
        cell: ({ hours }) => formatFixed(hours[index], 0),
      },
      {
        key: `${scenario.scenarioId}-beam`,
        heading: 'of the beam',
        unit: '%',
        kind: 'number',
        cell: ({ shareOfBeam }) => {
          const share = shareOfBeam[index];
          return formatFixed(share == null ? share : share * 100, 1);
        },
      },
    ]),
  ];
  return (
    <NumberTable
      caption="States of the tracker: hours in the year, and share of the beam on the aperture met in them"
      columns={columns}
      rows={trackerTable(scenarios.map(({ summary }) => summary))}
      rowKey={({ state }) => state}
    />
  );
}
