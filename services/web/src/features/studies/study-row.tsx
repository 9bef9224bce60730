import { Badge, makeStyles, tokens } from '@fluentui/react-components';
import type { StudySummary } from '@noonwell/schema';
import { RouterLink } from '../../shared/components/router-link.js';
import { WeatherNames } from '../../shared/components/weather-names.js';
import { formatInstant } from '../../shared/format/date.js';
import { formatPlural } from '../../shared/format/number.js';

const useStyles = makeStyles({
  root: {
    display: 'grid',
    gridTemplateColumns: 'minmax(0, 1fr) minmax(0, 460px)',
    gap: '8px 32px',
    padding: '14px 18px',
    borderTop: `1px solid ${tokens.colorNeutralStroke3}`,
    ':first-child': { borderTopWidth: 0 },
    '@media (max-width: 899px)': { gridTemplateColumns: 'minmax(0, 1fr)' },
  },
  head: { display: 'flex', flexWrap: 'wrap', alignItems: 'baseline', gap: '4px 10px' },
  name: { margin: 0, fontSize: tokens.fontSizeBase400, overflowWrap: 'anywhere' },
  question: { margin: '2px 0 0', color: tokens.colorNeutralForeground2, overflowWrap: 'anywhere' },
  facts: {
    display: 'grid',
    gridTemplateColumns: 'minmax(0, 1fr) minmax(0, 1fr)',
    gap: '4px 20px',
    margin: 0,
    alignContent: 'start',
  },
  label: { fontSize: tokens.fontSizeBase200, color: tokens.colorNeutralForeground3 },
  value: { margin: 0, overflowWrap: 'anywhere' },
});

/** A study in the list: question, weather, last result, what is running. */
export function StudyRow({ study }: { study: StudySummary }) {
  const styles = useStyles();
  return (
    <li className={styles.root}>
      <div>
        <div className={styles.head}>
          <h2 className={styles.name}>
            <RouterLink to={`/studies/${study.id}`}>{study.name}</RouterLink>
          </h2>
          {study.activeRuns > 0 && (
            <Badge color="brand" appearance="tint">
              {formatPlural(study.activeRuns, 'run', 'runs')} under way
            </Badge>
          )}
          {study.sandbox && (
            <Badge appearance="outline" title="Seen by its owner and administrators only">
              Sandbox
            </Badge>
          )}
        </div>
        {study.question !== '' && <p className={styles.question}>{study.question}</p>}
      </div>
      <dl className={styles.facts}>
        <div>
          <dt className={styles.label}>Weather</dt>
          <dd className={styles.value}>
            <WeatherNames years={study.weatherYears} none="None chosen" />
          </dd>
        </div>
        <div>
          <dt className={styles.label}>Last result</dt>
          <dd className={styles.value}>
            {study.lastRunFinishedAt === null ? 'Not run yet' : formatInstant(study.lastRunFinishedAt)}
          </dd>
        </div>
        <div>
          <dt className={styles.label}>Scenarios</dt>
          <dd className={styles.value}>{study.scenarioCount}</dd>
        </div>
        <div>
          <dt className={styles.label}>Owner</dt>
          <dd className={styles.value}>{study.ownerName}</dd>
        </div>
      </dl>
    </li>
  );
}
