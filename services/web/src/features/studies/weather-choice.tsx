import {
  Button,
  Dropdown,
  Field,
  makeStyles,
  MessageBar,
  MessageBarBody,
  Option,
  Spinner,
  tokens,
} from '@fluentui/react-components';
import type { StudyView, WeatherYearView } from '@noonwell/schema';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { usePointStudyAtWeather } from '../../shared/api/studies.js';
import { MOST_LISTED, weatherYearsQuery } from '../../shared/api/weather-years.js';
import { EmptyState } from '../../shared/components/empty-state.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { LoadingState } from '../../shared/components/loading-state.js';
import { LinkButton } from '../../shared/components/router-link.js';
import { WeatherNames } from '../../shared/components/weather-names.js';
import { formatCount, formatQuantity } from '../../shared/format/number.js';
import { markedWeatherName } from '../../shared/format/weather-name.js';

const useStyles = makeStyles({
  present: { margin: '0 0 12px', display: 'flex', flexWrap: 'wrap', gap: '4px 8px', alignItems: 'center' },
  row: { display: 'flex', flexWrap: 'wrap', gap: '8px', alignItems: 'end' },
  field: { flex: '1 1 260px', maxWidth: '480px', minWidth: 0 },
  dropdown: { minWidth: 0, width: '100%' },
  message: { marginTop: '12px' },
  note: { color: tokens.colorNeutralForeground3, fontSize: tokens.fontSizeBase200 },
});

/** Which weather year the scenarios point at, and pointing all of them at another. */
export function WeatherChoice({ study }: { study: StudyView }) {
  const styles = useStyles();
  const years = useQuery(weatherYearsQuery(1, MOST_LISTED));
  if (years.isPending) return <LoadingState label="Loading the weather years" height={96} />;
  if (years.isError) {
    return (
      <ErrorState
        what="The weather years could not be loaded."
        error={years.error}
        onRetry={() => void years.refetch()}
      />
    );
  }
  const { items, total } = years.data;
  return (
    <>
      <PresentYears study={study} />
      {total === 0 ? (
        <EmptyState
          title="No weather year yet"
          action={
            <LinkButton to="/weather" appearance="primary">
              Go to the weather page
            </LinkButton>
          }
        >
          A run needs a weather year. Drop a weather file on the weather page first.
        </EmptyState>
      ) : (
        study.mayWrite && <PointAtYear study={study} years={items} />
      )}
      {total > items.length && (
        <p className={styles.note}>
          The newest {formatCount(items.length)} of {formatCount(total)} weather years are offered here.
        </p>
      )}
    </>
  );
}

function PresentYears({ study }: { study: StudyView }) {
  const styles = useStyles();
  const years = study.weatherYears;
  const without = study.scenarios.filter(({ weatherYearId }) => weatherYearId === null).length;
  if (years.length === 0) {
    return <div className={styles.present}>No scenario points at a weather year yet; a run needs one.</div>;
  }
  return (
    <div className={styles.present}>
      <span>
        {years.length === 1 && without === 0 ? 'All scenarios run on ' : 'Scenarios run on '}
        <WeatherNames years={years} none="" linked />
        {without > 0 && `, and ${formatCount(without)} on none yet`}
        {years.length > 1 && ' (compare scenarios on one weather year only)'}
      </span>
    </div>
  );
}

function PointAtYear({ study, years }: { study: StudyView; years: readonly WeatherYearView[] }) {
  const styles = useStyles();
  const point = usePointStudyAtWeather(study.id);
  const present = study.scenarios[0]?.weatherYearId ?? null;
  const [chosenId, setChosenId] = useState<string | null>(null);
  const chosen = years.find(({ id }) => id === (chosenId ?? present));
  const waiting = study.scenarios.some(({ latestRun }) => latestRun === null);
  const same = study.scenarios.every(({ weatherYearId }) => weatherYearId === chosen?.id);
  return (
    <>
      <div className={styles.row}>
        <Field label="Weather year of all scenarios" className={styles.field}>
          <Dropdown
            className={styles.dropdown}
            placeholder="Choose a weather year"
            value={chosen === undefined ? '' : yearText(chosen)}
            selectedOptions={chosen === undefined ? [] : [chosen.id]}
            onOptionSelect={(_, { optionValue }) => {
              point.reset();
              setChosenId(optionValue ?? null);
            }}
          >
            {years.map((year) => (
              <Option key={year.id} value={year.id} text={yearText(year)}>
                {yearText(year)}
              </Option>
            ))}
          </Dropdown>
        </Field>
        <Button
          disabledFocusable={chosen === undefined || same || point.isPending}
          icon={point.isPending ? <Spinner size="tiny" /> : null}
          onClick={() => {
            if (chosen !== undefined) point.mutate(chosen.id);
          }}
        >
          Point the study at it
        </Button>
      </div>
      {point.isError && (
        <div className={styles.message}>
          <ErrorState what="The study still points where it did." error={point.error} />
        </div>
      )}
      {point.isSuccess && same && waiting && (
        <MessageBar intent="success" className={styles.message}>
          <MessageBarBody>
            All scenarios point at it now, each in a new version. Press run for results on it.
          </MessageBarBody>
        </MessageBar>
      )}
    </>
  );
}

function yearText(year: WeatherYearView): string {
  return `${markedWeatherName(year)}, DNI ${formatQuantity(year.summary.dniKwhM2, 'kWh/m²')}`;
}
