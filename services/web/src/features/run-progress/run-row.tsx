import { Button, makeStyles, mergeClasses, ProgressBar, tokens } from '@fluentui/react-components';
import { ArrowClockwiseRegular, DismissRegular, PlayRegular } from '@fluentui/react-icons';
import type { Run, ScenarioView } from '@noonwell/schema';
import { ErrorState } from '../../shared/components/error-state.js';
import { RunStateBadge } from '../../shared/components/run-state-badge.js';
import { formatDurationMs, formatInstant } from '../../shared/format/date.js';
import { useRunAction } from './api.js';
import { isActive, shownState } from './model/run-words.js';
import { secondsLeft, timeLeftWords, type Pace } from './model/time-left.js';

const useStyles = makeStyles({
  row: {
    display: 'grid',
    gridTemplateColumns: 'minmax(160px, 1fr) minmax(180px, 2fr) 104px',
    alignItems: 'center',
    gap: '4px 16px',
    boxSizing: 'border-box',
    minHeight: '52px',
    padding: '6px 12px',
    backgroundColor: tokens.colorNeutralBackground1,
    '@media (max-width: 639px)': { gridTemplateColumns: '1fr auto' },
  },
  name: { fontWeight: tokens.fontWeightSemibold, overflowWrap: 'anywhere' },
  version: { fontWeight: tokens.fontWeightRegular, color: tokens.colorNeutralForeground3 },
  state: { display: 'flex', flexWrap: 'wrap', alignItems: 'center', gap: '4px 12px', minWidth: 0 },
  wide: { '@media (max-width: 639px)': { gridColumnStart: '1', gridColumnEnd: '-1', gridRowStart: '2' } },
  bar: { flex: '1 1 100%' },
  note: { color: tokens.colorNeutralForeground3, fontSize: tokens.fontSizeBase200 },
  failure: { flex: '1 1 100%', color: tokens.colorPaletteRedForeground1, overflowWrap: 'anywhere' },
  action: { justifySelf: 'end' },
});

interface RunRowProps {
  scenario: ScenarioView;
  /** Of the scenario's weather year, marked where it is synthetic; null without one. */
  weatherName: string | null;
  pace: Pace | undefined;
  mayRun: boolean;
  onRun: () => void;
  starting: boolean;
}

/** One scenario's newest version: its run, how far it is, and what can be done about it. */
export function RunRow({ scenario, weatherName, pace, mayRun, onRun, starting }: RunRowProps) {
  const styles = useStyles();
  const run = scenario.latestRun;
  const timeLeft = run?.state === 'running' ? timeLeftWords(secondsLeft(pace)) : null;
  const cancel = useRunAction('cancel');
  const retry = useRunAction('retry');
  const stopping = shownState(run) === 'stopping' || cancel.isPending;
  const refused = cancel.error ?? retry.error;

  return (
    <li className={styles.row} aria-label={scenario.name}>
      <span className={styles.name}>
        {scenario.name} <span className={styles.version}>version {scenario.version}</span>
      </span>
      <div className={mergeClasses(styles.state, styles.wide)}>
        <RunStateBadge state={run?.state ?? null} {...(run ? { progress: run.progress } : {})} />
        <span className={styles.note}>{note(run, weatherName, timeLeft, stopping)}</span>
        {isActive(run) && (
          <ProgressBar
            className={styles.bar}
            aria-label={`Run of ${scenario.name}`}
            {...(run?.state === 'running' ? { value: run.progress, max: 1 } : {})}
          />
        )}
        {run?.state === 'failed' && (
          <span className={styles.failure}>
            {run.failure ?? 'No reason was kept.'} Change the scenario or its weather year, or try again.
          </span>
        )}
      </div>
      <span className={styles.action}>
        {mayRun && isActive(run) && (
          <Button
            icon={<DismissRegular />}
            disabled={stopping}
            aria-label={`Cancel the run of ${scenario.name}`}
            onClick={() => {
              if (run) cancel.mutate(run.id);
            }}
          >
            Cancel
          </Button>
        )}
        {mayRun && (run?.state === 'failed' || run?.state === 'cancelled') && (
          <Button
            icon={<ArrowClockwiseRegular />}
            disabled={retry.isPending}
            aria-label={`Run ${scenario.name} again`}
            onClick={() => {
              retry.mutate(run.id);
            }}
          >
            Again
          </Button>
        )}
        {mayRun && run === null && (
          <Button
            icon={<PlayRegular />}
            disabled={starting || scenario.weatherYearId === null}
            aria-label={`Run ${scenario.name}`}
            onClick={onRun}
          >
            Run
          </Button>
        )}
      </span>
      {refused !== null && (
        <div style={{ gridColumn: '1 / -1' }}>
          <ErrorState what={`The run of “${scenario.name}” could not be changed.`} error={refused} />
        </div>
      )}
    </li>
  );
}

function note(run: Run | null, weatherName: string | null, timeLeft: string | null, stopping: boolean) {
  if (!run) return weatherName === null ? 'No weather year chosen' : `On ${weatherName}`;
  if (stopping) return 'Stopping …';
  switch (run.state) {
    case 'queued':
      return 'Waiting for its turn';
    case 'running':
      return timeLeft ?? '';
    case 'done':
      return `${formatInstant(run.finishedAt)}, computed in ${formatDurationMs(run.engineMs)}`;
    case 'failed':
    case 'cancelled':
      return formatInstant(run.finishedAt);
  }
}
