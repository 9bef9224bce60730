import { makeStyles } from '@fluentui/react-components';
import type { WeatherYearView } from '@noonwell/schema';
import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { pageOfAddress } from '../../shared/api/page-of-address.js';
import { weatherYearsQuery } from '../../shared/api/weather-years.js';
import { EmptyState } from '../../shared/components/empty-state.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { LoadingState } from '../../shared/components/loading-state.js';
import { NumberTable, type TableColumn } from '../../shared/components/number-table.js';
import { Pager } from '../../shared/components/pager.js';
import { RouterLink } from '../../shared/components/router-link.js';
import { Section } from '../../shared/components/section.js';
import { SyntheticBadge } from '../../shared/components/synthetic-badge.js';
import { formatInstant } from '../../shared/format/date.js';
import { formatCount, formatFixed } from '../../shared/format/number.js';
import { formatCoordinates } from '../../shared/format/place.js';

const PAGE_SIZE = 20;

const useStyles = makeStyles({
  name: { display: 'inline-flex', flexWrap: 'wrap', gap: '2px 8px', minWidth: '160px' },
  nowrap: { whiteSpace: 'nowrap' },
});

function Name({ year }: { year: WeatherYearView }) {
  return (
    <span className={useStyles().name}>
      <RouterLink to={`/weather/${year.id}`}>{year.name}</RouterLink>
      {year.synthetic && <SyntheticBadge />}
    </span>
  );
}

function OneLine({ children }: { children: string }) {
  return <span className={useStyles().nowrap}>{children}</span>;
}

const columns: readonly TableColumn<WeatherYearView>[] = [
  { key: 'name', heading: 'Weather year', kind: 'text', cell: (year) => <Name year={year} /> },
  {
    key: 'dni',
    heading: 'DNI',
    unit: 'kWh/m²',
    kind: 'number',
    cell: ({ summary }) => formatCount(summary.dniKwhM2),
  },
  {
    key: 'ghi',
    heading: 'GHI',
    unit: 'kWh/m²',
    kind: 'number',
    cell: ({ summary }) => formatCount(summary.ghiKwhM2),
  },
  {
    key: 'air',
    heading: 'Mean air',
    unit: '°C',
    kind: 'number',
    cell: ({ summary }) => formatFixed(summary.dryBulbMeanC, 1),
  },
  {
    key: 'flagged',
    heading: 'Filled or clipped',
    unit: 'records',
    kind: 'number',
    cell: ({ summary }) => formatCount(summary.flaggedRecords),
  },
  {
    key: 'place',
    heading: 'Place',
    kind: 'text',
    cell: ({ latitudeDeg, longitudeDeg }) => (
      <OneLine>{formatCoordinates(latitudeDeg, longitudeDeg)}</OneLine>
    ),
  },
  {
    key: 'altitude',
    heading: 'Altitude',
    unit: 'm',
    kind: 'number',
    cell: ({ altitudeM }) => formatCount(altitudeM),
  },
  {
    key: 'added',
    heading: 'Added',
    kind: 'text',
    cell: ({ createdAt, createdByName }) => (
      <>
        <OneLine>{formatInstant(createdAt)}</OneLine> by {createdByName}
      </>
    ),
  },
];

/** The weather years of the workspace, page by page. */
export function WeatherList({ mayAdd }: { mayAdd: boolean }) {
  const [search, setSearch] = useSearchParams();
  const page = pageOfAddress(search);
  const years = useQuery(weatherYearsQuery(page, PAGE_SIZE));
  return (
    <Section title="Weather years">
      {years.isPending && <LoadingState label="Loading the weather years" height={280} />}
      {years.isError && (
        <ErrorState
          what="The weather years could not be loaded."
          error={years.error}
          onRetry={() => void years.refetch()}
        />
      )}
      {years.isSuccess && years.data.total === 0 && (
        <EmptyState title="No weather year yet">
          {mayAdd
            ? 'Drop a weather file above. It is read in your browser first, so that you see what it holds before you accept it.'
            : 'An engineer or analyst of your workspace adds them.'}
        </EmptyState>
      )}
      {years.isSuccess && years.data.total > 0 && (
        <>
          <NumberTable
            caption="Weather years of this workspace"
            captionHidden
            columns={columns}
            rows={years.data.items}
            rowKey={({ id }) => id}
          />
          <Pager
            label="Pages of weather years"
            page={page}
            pageSize={PAGE_SIZE}
            total={years.data.total}
            onPage={(next) => {
              setSearch({ page: String(next) });
            }}
          />
        </>
      )}
    </Section>
  );
}
