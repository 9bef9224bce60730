import {
  Button,
  makeStyles,
  Menu,
  MenuItem,
  MenuList,
  MenuPopover,
  MenuTrigger,
  tokens,
} from '@fluentui/react-components';
import {
  AddRegular,
  DeleteRegular,
  DocumentArrowDownRegular,
  MoreHorizontalRegular,
} from '@fluentui/react-icons';
import {
  fieldRegistry,
  MOST_SCENARIOS,
  receiverSchema,
  type ScenarioView,
  type StudyView,
} from '@noonwell/schema';
import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { download } from '../../shared/api/download.js';
import { ConfirmDialog } from '../../shared/components/confirm-dialog.js';
import { EmptyState } from '../../shared/components/empty-state.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { NumberTable, type TableColumn } from '../../shared/components/number-table.js';
import { RouterLink } from '../../shared/components/router-link.js';
import { RunStateBadge } from '../../shared/components/run-state-badge.js';
import { ScenarioSwatch } from '../../shared/components/scenario-swatch.js';
import { Section } from '../../shared/components/section.js';
import { WeatherNames } from '../../shared/components/weather-names.js';
import { energyUnitFor } from '../../shared/format/energy.js';
import { formatSignificant } from '../../shared/format/number.js';
import { NewScenarioDialog } from './new-scenario-dialog.js';
import { useCreateScenario, useDeleteScenario } from './scenario-mutations.js';

const useStyles = makeStyles({
  name: { display: 'inline-flex', alignItems: 'center', gap: '8px', minWidth: '180px' },
  base: { color: tokens.colorNeutralForeground3, fontSize: tokens.fontSizeBase200 },
});

/** The scenarios of a study with their newest results, in the order of their colours. */
export function ScenarioSection({ study }: { study: StudyView }) {
  const styles = useStyles();
  const navigate = useNavigate();
  const [adding, setAdding] = useState(false);
  const [doomed, setDoomed] = useState<ScenarioView | null>(null);
  const create = useCreateScenario(study);
  const remove = useDeleteScenario(study.id);
  const fetchExport = useMutation({
    mutationFn: ({ versionId, name, version }: ScenarioView) =>
      download(
        'GET /api/scenario-versions/{id}/export',
        { params: { id: versionId } },
        `${name} v${version}.json`,
      ),
  });
  const columns = useColumns(study, fetchExport.mutate, (scenario) => {
    remove.reset();
    setDoomed(scenario);
  });
  const full = study.scenarios.length >= MOST_SCENARIOS;
  const addButton = study.mayWrite && !full && (
    <Button
      icon={<AddRegular />}
      onClick={() => {
        create.reset();
        setAdding(true);
      }}
    >
      Add a scenario
    </Button>
  );
  return (
    <Section title="Scenarios" actions={study.scenarios.length > 0 && addButton}>
      {fetchExport.isError && <ErrorState what="The scenario was not exported." error={fetchExport.error} />}
      {study.scenarios.length === 0 ? (
        <EmptyState title="No scenario yet" action={addButton}>
          A scenario is a machine with its store and loads. The first one is the baseline that the others are
          compared with.
        </EmptyState>
      ) : (
        <NumberTable
          caption="Scenarios with the result of their newest version"
          captionHidden
          columns={columns}
          rows={study.scenarios}
          rowKey={({ id }) => id}
        />
      )}
      {study.mayWrite && full && (
        <p className={styles.base}>
          A study holds at most {MOST_SCENARIOS} scenarios: so many stand side by side.
        </p>
      )}
      {adding && (
        <NewScenarioDialog
          busy={create.isPending}
          error={create.error}
          onClose={() => {
            setAdding(false);
          }}
          onSubmit={(values) => {
            create.mutate(values, {
              onSuccess: ({ id }) => void navigate(`/studies/${study.id}/scenarios/${id}`),
            });
          }}
        />
      )}
      <ConfirmDialog
        open={doomed !== null}
        title={`Delete "${doomed?.name ?? ''}"?`}
        confirmLabel="Delete scenario"
        busy={remove.isPending}
        error={remove.error && { what: 'The scenario was not deleted.', error: remove.error }}
        onCancel={() => {
          setDoomed(null);
        }}
        onConfirm={() => {
          if (doomed === null) return;
          remove.mutate(doomed.id, {
            onSuccess: () => {
              setDoomed(null);
            },
          });
        }}
      >
        All its versions and results go with it.
      </ConfirmDialog>
    </Section>
  );
}

function useColumns(
  study: StudyView,
  onExport: (scenario: ScenarioView) => void,
  onDelete: (scenario: ScenarioView) => void,
): readonly TableColumn<ScenarioView>[] {
  const styles = useStyles();
  const summaries = study.scenarios.map(({ latestRun }) => latestRun?.summary ?? null);
  const unit = energyUnitFor(
    summaries.flatMap((summary) =>
      summary === null ? [] : [summary.heatDeliveredKwh, summary.powerAcKwh, summary.loadHeatKwh],
    ),
  );
  const energy = (kwh: number | undefined) =>
    formatSignificant(kwh === undefined ? null : kwh / unit.kwhPerUnit);
  const receivers = fieldRegistry.get(receiverSchema)?.choices ?? {};
  return [
    {
      key: 'name',
      heading: 'Scenario',
      kind: 'text',
      cell: (scenario) => (
        <span className={styles.name}>
          <ScenarioSwatch position={scenario.position} />
          <span>
            <RouterLink to={`/studies/${study.id}/scenarios/${scenario.id}`}>{scenario.name}</RouterLink>
            {scenario.position === 0 && <div className={styles.base}>Baseline</div>}
          </span>
        </span>
      ),
    },
    {
      key: 'receiver',
      heading: 'Receiver',
      kind: 'text',
      cell: ({ document }) => receivers[document.catch.receiver.kind] ?? document.catch.receiver.kind,
    },
    {
      key: 'weather',
      heading: 'Weather year',
      kind: 'text',
      cell: ({ weatherYearId }) => (
        <WeatherNames years={study.weatherYears.filter(({ id }) => id === weatherYearId)} none="None" />
      ),
    },
    { key: 'version', heading: 'Version', kind: 'number', cell: ({ version }) => version },
    {
      key: 'run',
      heading: 'Newest run',
      kind: 'text',
      cell: ({ latestRun }) => (
        <RunStateBadge state={latestRun?.state ?? null} progress={latestRun?.progress} />
      ),
    },
    {
      key: 'heat',
      heading: 'Solar heat delivered',
      unit: `${unit.unit} a year`,
      kind: 'number',
      cell: ({ latestRun }) => energy(latestRun?.summary?.heatDeliveredKwh),
    },
    {
      key: 'power',
      heading: 'Electricity',
      unit: `${unit.unit} a year`,
      kind: 'number',
      cell: ({ latestRun }) => energy(latestRun?.summary?.powerAcKwh),
    },
    {
      key: 'more',
      heading: 'More',
      kind: 'text',
      cell: (scenario) => (
        <Menu>
          <MenuTrigger disableButtonEnhancement>
            <Button
              size="small"
              appearance="subtle"
              icon={<MoreHorizontalRegular />}
              aria-label={`More for ${scenario.name}`}
            />
          </MenuTrigger>
          <MenuPopover>
            <MenuList>
              <MenuItem
                icon={<DocumentArrowDownRegular />}
                onClick={() => {
                  onExport(scenario);
                }}
              >
                Export as a file
              </MenuItem>
              {study.mayWrite && (
                <MenuItem
                  icon={<DeleteRegular />}
                  onClick={() => {
                    onDelete(scenario);
                  }}
                >
                  Delete
                </MenuItem>
              )}
            </MenuList>
          </MenuPopover>
        </Menu>
      ),
    },
  ];
}
