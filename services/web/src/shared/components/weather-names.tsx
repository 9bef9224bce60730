import { Fragment } from 'react';
import type { StudySummary } from '@noonwell/schema';
import { RouterLink } from './router-link.js';
import { SyntheticBadge } from './synthetic-badge.js';

interface WeatherNamesProps {
  years: StudySummary['weatherYears'];
  /** What stands there when there are none. */
  none: string;
  linked?: boolean;
}

/** Names of weather years one after another, each synthetic one marked. */
export function WeatherNames({ years, none, linked = false }: WeatherNamesProps) {
  if (years.length === 0) return <>{none}</>;
  return years.map(({ id, name, synthetic }, index) => (
    <Fragment key={id}>
      {index > 0 && ', '}
      {linked ? <RouterLink to={`/weather/${id}`}>{name}</RouterLink> : name}
      {synthetic && (
        <>
          {' '}
          <SyntheticBadge />
        </>
      )}
    </Fragment>
  ));
}
