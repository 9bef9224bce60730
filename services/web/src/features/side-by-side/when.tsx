import { Field, makeStyles, Select } from '@fluentui/react-components';
import { useQueries } from '@tanstack/react-query';
import type { Columns } from '../../shared/api/arrow.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { LoadingState } from '../../shared/components/loading-state.js';
import { Section } from '../../shared/components/section.js';
import { runColumnsQuery } from './api.js';
import { HoursChart } from './hours-chart.js';
import type { ViewState } from './model/address.js';
import { CHANNEL_SETS, channelsOf } from './model/channel-sets.js';
import type { Compared } from './model/compared.js';
import { daysOf, fullestWeek, weekBeside, weekFrom, type Week } from './model/weeks.js';
import { WeekChoice } from './week-choice.js';

const START = 'startLocalMs';
/** Decides which week the page opens with, so it comes along with every set. */
const BEAM = 'dniWm2';
const PANEL_HEIGHT = 124;

const useStyles = makeStyles({
  controls: { display: 'flex', flexWrap: 'wrap', alignItems: 'end', gap: '8px 24px', marginBottom: '12px' },
  set: { minWidth: '200px' },
});

interface WhenProps {
  drawn: readonly Compared[];
  view: ViewState;
  onChange: (change: Partial<ViewState>) => void;
}

/** The hours of any week of the year. */
export function When({ drawn, view, onChange }: WhenProps) {
  const styles = useStyles();
  const channels = channelsOf(view.channelSet);
  const keys = [...new Set([...channels.map(({ key }) => key), BEAM])];
  const queries = useQueries({ queries: drawn.map(({ runId }) => runColumnsQuery(runId, keys)) });
  const loaded = drawn.flatMap((one, index) => {
    const columns = queries[index]?.data;
    return columns ? [{ compared: one, columns }] : [];
  });
  const failed = queries.find(({ isError }) => isError);
  const [first] = loaded;
  const week = first ? chosenWeek(first.columns, view) : null;
  const start = first?.columns.get(START);

  return (
    <Section title="When?">
      <div className={styles.controls}>
        {week && start && (
          <WeekChoice
            days={daysOf(start)}
            week={week}
            onDay={(day) => {
              onChange({ week: day });
            }}
            onStep={(days) => {
              onChange({ week: weekBeside(start, week, days).from });
            }}
          />
        )}
        <Field label="Look at" className={styles.set}>
          <Select
            value={view.channelSet}
            onChange={(_, { value }) => {
              const set = CHANNEL_SETS.find(({ key }) => key === value);
              if (set) onChange({ channelSet: set.key });
            }}
          >
            {CHANNEL_SETS.map(({ key, label }) => (
              <option key={key} value={key}>
                {label}
              </option>
            ))}
          </Select>
        </Field>
      </div>
      {failed && (
        <ErrorState
          what="The hours could not be loaded."
          error={failed.error}
          onRetry={() => {
            for (const query of queries) if (query.isError) void query.refetch();
          }}
        />
      )}
      {week && loaded.length === drawn.length ? (
        <HoursChart channels={channels} loaded={loaded} week={week} />
      ) : (
        !failed && <LoadingState label="Loading the hours" height={PANEL_HEIGHT * channels.length} />
      )}
    </Section>
  );
}

function chosenWeek(columns: Columns, { week }: ViewState): Week | null {
  const start = columns.get(START);
  const beam = columns.get(BEAM);
  if (!start) return null;
  if (week !== null) return weekFrom(start, week);
  return beam ? fullestWeek(start, beam) : weekFrom(start, '06-21');
}
