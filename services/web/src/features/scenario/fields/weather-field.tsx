import { Field, Select } from '@fluentui/react-components';
import { useQuery } from '@tanstack/react-query';
import { MOST_LISTED, weatherYearsQuery } from '../../../shared/api/weather-years.js';
import { RouterLink } from '../../../shared/components/router-link.js';
import { useText } from './use-text.js';

interface WeatherFieldProps {
  /** The year that the saved version points at, in case the list is too long to hold it. */
  present: { readonly id: string; readonly name: string } | null;
  readOnly: boolean;
}

/** The weather year that this scenario runs on. */
export function WeatherField({ present, readOnly }: WeatherFieldProps) {
  const { ref, text, setText, onBlur, message } = useText('weatherYearId');
  const years = useQuery(weatherYearsQuery(1, MOST_LISTED));
  const listed = (years.data?.items ?? []).map(({ id, name, synthetic }) => ({
    id,
    name: synthetic ? `${name} (synthetic)` : name,
  }));
  const offered = present && !listed.some(({ id }) => id === present.id) ? [present, ...listed] : listed;
  return (
    <Field
      label="Weather year"
      hint={
        <>
          Scenarios that are held against each other need the same one; the study page changes it for all at
          once.{' '}
          <RouterLink to="/weather" inline>
            Add a weather year
          </RouterLink>
        </>
      }
      {...(message !== null ? { validationMessage: message } : {})}
      {...(years.isError
        ? {
            validationState: 'warning' as const,
            validationMessage: 'The list of weather years could not be loaded.',
          }
        : {})}
    >
      <Select
        ref={ref}
        value={text}
        onChange={(_, { value }) => {
          setText(value);
        }}
        onBlur={onBlur}
        disabled={readOnly || years.isPending}
      >
        <option value="">None yet</option>
        {offered.map(({ id, name }) => (
          <option key={id} value={id}>
            {name}
          </option>
        ))}
      </Select>
    </Field>
  );
}
