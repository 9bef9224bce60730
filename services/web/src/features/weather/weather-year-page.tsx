import {
  Button,
  makeStyles,
  MessageBar,
  MessageBarBody,
  MessageBarTitle,
  Spinner,
  tokens,
} from '@fluentui/react-components';
import { ArrowDownloadRegular, DeleteRegular } from '@fluentui/react-icons';
import type { WeatherYearView } from '@noonwell/schema';
import { useMutation, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import { download } from '../../shared/api/download.js';
import { useMay } from '../../shared/api/me.js';
import { useDeleteWeatherYear, weatherYearQuery } from '../../shared/api/weather-years.js';
import { ConfirmDialog } from '../../shared/components/confirm-dialog.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { Figures } from '../../shared/components/figures.js';
import { LoadingState } from '../../shared/components/loading-state.js';
import { PageHeader } from '../../shared/components/page-header.js';
import { RouterLink } from '../../shared/components/router-link.js';
import { Section } from '../../shared/components/section.js';
import { SyntheticBadge } from '../../shared/components/synthetic-badge.js';
import { formatInstant } from '../../shared/format/date.js';
import { formatFixed } from '../../shared/format/number.js';
import { formatBytes, formatCoordinates, formatUtcOffset } from '../../shared/format/place.js';
import { MonthlyChart } from './monthly-chart.js';
import { weatherFigures } from './weather-figures.js';
import { BeamYearMap } from './year-map.js';

const useStyles = makeStyles({
  body: { whiteSpace: 'normal', paddingBottom: '8px' },
  hash: {
    fontFamily: tokens.fontFamilyMonospace,
    fontSize: tokens.fontSizeBase100,
    fontWeight: tokens.fontWeightRegular,
  },
  list: { margin: '4px 0 0', paddingInlineStart: '20px' },
});

export default function WeatherYearPage() {
  const { weatherYearId = '' } = useParams();
  const query = useQuery(weatherYearQuery(weatherYearId));
  if (query.isSuccess) return <LoadedYear year={query.data} />;
  return (
    <>
      <PageHeader title="Weather year" above={<RouterLink to="/weather">Weather</RouterLink>} />
      {query.isPending ? (
        <LoadingState label="Loading the weather year" height={480} />
      ) : (
        <ErrorState
          what="This weather year could not be loaded."
          error={query.error}
          onRetry={() => void query.refetch()}
        />
      )}
    </>
  );
}

function LoadedYear({ year }: { year: WeatherYearView }) {
  const styles = useStyles();
  return (
    <>
      <PageHeader
        title={year.name}
        above={<RouterLink to="/weather">Weather</RouterLink>}
        below={
          <>
            {formatCoordinates(year.latitudeDeg, year.longitudeDeg)}, {formatFixed(year.altitudeM)}&nbsp;m,{' '}
            {formatUtcOffset(year.utcOffsetHours)} {year.synthetic && <SyntheticBadge />}
          </>
        }
        actions={<YearActions year={year} />}
      />
      {year.synthetic && (
        <Section title="Made, not measured">
          <MessageBar intent="warning" layout="multiline">
            <MessageBarBody className={styles.body}>
              Noonwell generated this year for an invented place. Use it to try things, never to judge a site.
            </MessageBarBody>
          </MessageBar>
        </Section>
      )}
      <Section title="The year">
        <Figures label="The year" figures={weatherFigures(year.summary)} />
      </Section>
      {year.warnings.length > 0 && (
        <Section title="Remarks">
          <MessageBar intent="warning" layout="multiline">
            <MessageBarBody className={styles.body}>
              <MessageBarTitle>Found when the file was read</MessageBarTitle>
              <ul className={styles.list}>
                {year.warnings.map((warning) => (
                  <li key={warning}>{warning}</li>
                ))}
              </ul>
            </MessageBarBody>
          </MessageBar>
        </Section>
      )}
      <Section title="Every hour">
        <BeamYearMap weatherYearId={year.id} />
      </Section>
      <Section title="By month">
        <MonthlyChart summary={year.summary} />
      </Section>
      <Section title="The file">
        <Figures
          label="The file"
          figures={[
            { name: 'Name', value: year.originalFileName },
            { name: 'Format', value: year.format.toUpperCase() },
            { name: 'Size', value: formatBytes(year.originalBytes) },
            { name: 'SHA-256', value: <span className={styles.hash}>{year.originalSha256}</span> },
            { name: 'Added', value: `${formatInstant(year.createdAt)} by ${year.createdByName}` },
          ]}
        />
      </Section>
    </>
  );
}

/** The original file back, byte for byte; and deleting. */
function YearActions({ year }: { year: WeatherYearView }) {
  const navigate = useNavigate();
  const mayDelete = useMay('weather.write');
  const [asking, setAsking] = useState(false);
  const remove = useDeleteWeatherYear();
  const original = useMutation({
    mutationFn: () =>
      download('GET /api/weather-years/{id}/original', { params: { id: year.id } }, year.originalFileName),
  });
  return (
    <>
      <Button
        icon={original.isPending ? <Spinner size="tiny" /> : <ArrowDownloadRegular />}
        disabledFocusable={original.isPending}
        onClick={() => {
          original.mutate();
        }}
      >
        Original file
      </Button>
      {mayDelete && (
        <Button
          icon={<DeleteRegular />}
          onClick={() => {
            remove.reset();
            setAsking(true);
          }}
        >
          Delete
        </Button>
      )}
      {original.isError && <ErrorState what="The original was not downloaded." error={original.error} />}
      <ConfirmDialog
        open={asking}
        title={`Delete "${year.name}"?`}
        confirmLabel="Delete weather year"
        busy={remove.isPending}
        error={remove.error && { what: 'The weather year was not deleted.', error: remove.error }}
        onCancel={() => {
          setAsking(false);
        }}
        onConfirm={() => {
          remove.mutate(year.id, { onSuccess: () => void navigate('/weather') });
        }}
      >
        The original file goes with it. A year that scenarios point at cannot be deleted.
      </ConfirmDialog>
    </>
  );
}
