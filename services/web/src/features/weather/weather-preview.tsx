import {
  Button,
  Field,
  Input,
  makeStyles,
  MessageBar,
  MessageBarBody,
  MessageBarTitle,
} from '@fluentui/react-components';
import { nameSchema } from '@noonwell/schema';
import { useState } from 'react';
import { ErrorState } from '../../shared/components/error-state.js';
import { Figures } from '../../shared/components/figures.js';
import { formatFixed, formatPlural } from '../../shared/format/number.js';
import { formatCoordinates, formatUtcOffset } from '../../shared/format/place.js';
import type { WeatherPreview } from '../../workers/read-for-preview.js';
import { MonthlyChart } from './monthly-chart.js';
import { weatherFigures } from './weather-figures.js';

const useStyles = makeStyles({
  root: { display: 'grid', gap: '16px', gridTemplateColumns: 'minmax(0, 1fr)' },
  form: { display: 'flex', flexWrap: 'wrap', gap: '8px', alignItems: 'end' },
  field: { flex: '1 1 240px', maxWidth: '480px' },
  body: { whiteSpace: 'normal', paddingBottom: '8px' },
  list: { margin: '4px 0 0', paddingInlineStart: '20px' },
});

interface WeatherPreviewPanelProps {
  preview: Extract<WeatherPreview, { kind: 'accepted' }>;
  busy: boolean;
  /** Of the last try to send it. */
  error: unknown;
  onAccept: (name: string) => void;
  onDiscard: () => void;
}

/** What was read in the browser, before anything is sent. */
export function WeatherPreviewPanel({ preview, busy, error, onAccept, onDiscard }: WeatherPreviewPanelProps) {
  const styles = useStyles();
  const [name, setName] = useState(preview.header.placeName);
  const checked = nameSchema.safeParse(name);
  const nameError = checked.success ? undefined : checked.error.issues[0]?.message;
  const {
    header,
    latitudeDeg,
    longitudeDeg,
    altitudeM,
    utcOffsetHours,
    summary,
    sunOffsetMinutes,
    warnings,
  } = preview;
  return (
    <div className={styles.root}>
      <Figures
        label="Place"
        figures={[
          { name: 'Place', value: header.placeName === '' ? 'Not named' : header.placeName },
          { name: 'Coordinates', value: formatCoordinates(latitudeDeg, longitudeDeg) },
          { name: 'Altitude', value: `${formatFixed(altitudeM)}\u00a0m` },
          { name: 'Clock', value: formatUtcOffset(utcOffsetHours) },
          { name: 'Origin of the data', value: header.source === '' ? 'Not named' : header.source },
        ]}
      />
      <Figures label="The year" figures={weatherFigures(summary)} />
      {warnings.length > 0 && (
        <MessageBar intent="warning" layout="multiline">
          <MessageBarBody className={styles.body}>
            <MessageBarTitle>
              It can be read, with {formatPlural(warnings.length, 'remark', 'remarks')}.
            </MessageBarTitle>
            <ul className={styles.list}>
              {warnings.map((warning) => (
                <li key={warning}>{warning}</li>
              ))}
            </ul>
          </MessageBarBody>
        </MessageBar>
      )}
      {sunOffsetMinutes !== null && <span>{clockCheck(sunOffsetMinutes)}</span>}
      <MonthlyChart summary={summary} height={240} />
      {error !== null && <ErrorState what="The file was not accepted; nothing was saved." error={error} />}
      <form
        className={styles.form}
        aria-label="Accept the weather year"
        onSubmit={(event) => {
          event.preventDefault();
          if (checked.success) onAccept(checked.data);
        }}
      >
        <Field label="Name in the list" required className={styles.field} validationMessage={nameError}>
          <Input
            value={name}
            disabled={busy}
            onChange={(_, { value }) => {
              setName(value);
            }}
          />
        </Field>
        <Button type="submit" appearance="primary" disabledFocusable={busy || !checked.success}>
          Accept as a weather year
        </Button>
        <Button onClick={onDiscard}>{busy ? 'Stop' : 'Discard'}</Button>
      </form>
    </div>
  );
}

/** Where the sun must stand for beam, diffuse and global light to agree: half an hour before an hour's end, if the clock is right. */
function clockCheck(minutesAfterLabel: number): string {
  const size = formatFixed(Math.abs(minutesAfterLabel));
  const side = minutesAfterLabel < 0 ? 'before' : 'after';
  return `Clock check: beam, diffuse and global light agree best with the sun ${size} min ${side} the time that each record carries.`;
}
