import { Button, makeStyles, MessageBar, MessageBarBody, tokens } from '@fluentui/react-components';
import { PlayRegular } from '@fluentui/react-icons';
import type { ScenarioView, StudyView } from '@noonwell/schema';
import { useMay } from '../../shared/api/me.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { Section } from '../../shared/components/section.js';
import { markedWeatherName } from '../../shared/format/weather-name.js';
import { useStartRuns } from './api.js';
import { isActive, STATE_WORDS, shownState, whyNotRunnable } from './model/run-words.js';
import { RunRow } from './run-row.js';
import { useStudyEvents } from './use-study-events.js';

const useStyles = makeStyles({
  actions: { display: 'flex', flexWrap: 'wrap', gap: '8px' },
  list: {
    listStyleType: 'none',
    margin: 0,
    padding: 0,
    display: 'flex',
    flexDirection: 'column',
    gap: '1px',
    border: `1px solid ${tokens.colorNeutralStroke2}`,
    borderRadius: tokens.borderRadiusMedium,
    overflow: 'hidden',
    backgroundColor: tokens.colorNeutralStroke2,
  },
  note: { margin: '8px 0 0', color: tokens.colorNeutralForeground3, fontSize: tokens.fontSizeBase200 },
  heard: { position: 'absolute', width: '1px', height: '1px', overflow: 'hidden', clipPath: 'inset(50%)' },
});

/** Runs of a study: start, watch, stop, try again, and on to the comparison. */
export function RunPanel({ study }: { study: StudyView }) {
  const styles = useStyles();
  const { line, paces } = useStudyEvents(study.id);
  const start = useStartRuns(study.id);
  const roleMayRun = useMay('run.write');
  const mayRun = roleMayRun && study.mayWrite;
  const { scenarios } = study;
  const hindrance = whyNotRunnable(scenarios);
  const active = scenarios.some(({ latestRun }) => isActive(latestRun));
  const done = scenarios.filter(({ latestRun }) => latestRun?.state === 'done').length;
  const complete = done === scenarios.length && done > 0;

  return (
    <Section
      title="Runs"
      actions={
        <div className={styles.actions}>
          {mayRun && (
            <Button
              appearance={complete ? 'secondary' : 'primary'}
              icon={<PlayRegular />}
              disabled={hindrance !== null || active || complete || start.isPending}
              onClick={() => {
                start.mutate(undefined);
              }}
            >
              Run all scenarios
            </Button>
          )}
        </div>
      }
    >
      {hindrance !== null && (
        <MessageBar intent="info" layout="multiline">
          <MessageBarBody>{hindrance}</MessageBarBody>
        </MessageBar>
      )}
      {start.error !== null && (
        <ErrorState what={`The runs of “${study.name}” were not started.`} error={start.error} />
      )}
      {scenarios.length > 0 && (
        <ul className={styles.list} aria-label="Runs by scenario">
          {scenarios.map((scenario) => (
            <RunRow
              key={scenario.id}
              scenario={scenario}
              weatherName={weatherNameOf(study, scenario)}
              pace={scenario.latestRun ? paces[scenario.latestRun.id] : undefined}
              mayRun={mayRun}
              starting={start.isPending}
              onRun={() => {
                start.mutate([scenario.id]);
              }}
            />
          ))}
        </ul>
      )}
      <p className={styles.note}>
        {complete
          ? 'Every scenario has its result: nothing is computed twice. Change a scenario or its weather year to run again.'
          : 'A run works through the whole weather year in steps of minutes. You can leave this page meanwhile.'}
        {!mayRun && ' Only people who may change this study can start runs.'}
        {line === 'waiting' && ' The connection was lost; it is being made again.'}
      </p>
      {/* States are told to screen readers as they change; the percentages are not. */}
      <div role="status" className={styles.heard}>
        {scenarios.map(({ name, latestRun }) => `${name}: ${STATE_WORDS[shownState(latestRun)]}.`).join(' ')}
      </div>
    </Section>
  );
}

function weatherNameOf({ weatherYears }: StudyView, { weatherYearId }: ScenarioView): string | null {
  const year = weatherYears.find(({ id }) => id === weatherYearId);
  return year ? markedWeatherName(year) : null;
}
