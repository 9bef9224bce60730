import {
  Button,
  Field,
  makeStyles,
  MessageBar,
  MessageBarActions,
  MessageBarBody,
  MessageBarTitle,
  ProgressBar,
} from '@fluentui/react-components';
import type { WeatherYearView } from '@noonwell/schema';
import { useEffect, useRef } from 'react';
import { ApiProblem } from '../../shared/api/problem.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { LinkButton } from '../../shared/components/router-link.js';
import { Section } from '../../shared/components/section.js';
import { formatFixed } from '../../shared/format/number.js';
import { formatBytes } from '../../shared/format/place.js';
import { useWeatherAcceptance, type Acceptance } from './accept-weather.js';
import { DropZone } from './drop-zone.js';
import { ProblemTable } from './problem-table.js';
import { WeatherPreviewPanel } from './weather-preview.js';

const useStyles = makeStyles({
  root: { display: 'grid', gap: '16px', gridTemplateColumns: 'minmax(0, 1fr)' },
  body: { whiteSpace: 'normal', paddingBottom: '8px', overflowWrap: 'anywhere' },
});

/** From a file to a weather year: drop, look at what was read, accept. */
export function AcceptancePanel() {
  const styles = useStyles();
  const { state, onFile, onSend, onReset } = useWeatherAcceptance();
  return (
    <Section title="Add a weather year">
      <div className={styles.root}>
        <DropZone onFile={(file) => void onFile(file)} />
        <div className={styles.root} aria-live="polite">
          <Progress state={state} onStop={onReset} />
        </div>
        <Outcome state={state} onSend={(file, name) => void onSend(file, name)} onReset={onReset} />
      </div>
    </Section>
  );
}

function Progress({ state, onStop }: { state: Acceptance; onStop: () => void }) {
  if (state.step === 'reading') {
    return (
      <>
        <ProgressLine
          label={`Reading "${state.file.name}" (${formatBytes(state.file.size)}) in this browser`}
          fraction={state.fraction}
        />
        <div>
          <Button onClick={onStop}>Stop</Button>
        </div>
      </>
    );
  }
  if (state.step === 'sending') {
    return state.fraction < 1 ? (
      <ProgressLine label={`Sending "${state.file.name}"`} fraction={state.fraction} />
    ) : (
      <ProgressLine label={`"${state.file.name}" has arrived; the server reads and checks it`} />
    );
  }
  return null;
}

/** @param fraction 0 … 1; none while the length of the wait is unknown */
function ProgressLine({ label, fraction }: { label: string; fraction?: number }) {
  return (
    <Field
      label={fraction === undefined ? label : `${label}: ${formatFixed(fraction * 100)}\u00a0%`}
      validationState="none"
    >
      <ProgressBar thickness="large" {...(fraction === undefined ? {} : { value: fraction })} />
    </Field>
  );
}

interface OutcomeProps {
  state: Acceptance;
  onSend: (file: File, name: string) => void;
  onReset: () => void;
}

function Outcome({ state, onSend, onReset }: OutcomeProps) {
  switch (state.step) {
    case 'none':
    case 'reading':
      return null;
    case 'unreadable':
      return (
        <ErrorState what={`"${state.file.name}" could not be read in this browser.`} error={state.error} />
      );
    case 'accepted':
      return <Accepted year={state.year} />;
    case 'read':
    case 'sending': {
      const { preview, file } = state;
      if (preview.kind === 'refused') return <ProblemTable fileName={file.name} {...preview} />;
      const error = state.step === 'read' ? state.error : null;
      const places = error instanceof ApiProblem ? (error.problem.errors ?? []) : [];
      // The server's reading is the truth: where it names places, they are shown like the browser's own.
      if (places.length > 0) {
        return <ProblemTable fileName={file.name} problems={places} problemCount={places.length} />;
      }
      return (
        <WeatherPreviewPanel
          key={`${file.name} ${file.lastModified}`}
          preview={preview}
          busy={state.step === 'sending'}
          error={error}
          onAccept={(name) => {
            onSend(file, name);
          }}
          onDiscard={onReset}
        />
      );
    }
  }
}

/** The form is gone with the button that had the focus: the focus comes here. */
function Accepted({ year }: { year: WeatherYearView }) {
  const styles = useStyles();
  const bar = useRef<HTMLDivElement>(null);
  useEffect(() => {
    bar.current?.focus();
  }, []);
  return (
    <MessageBar ref={bar} tabIndex={-1} intent="success" layout="multiline" role="status">
      <MessageBarBody className={styles.body}>
        <MessageBarTitle>"{year.name}" is a weather year of this workspace now.</MessageBarTitle>
        Open a study to point it at this year.
      </MessageBarBody>
      <MessageBarActions>
        <LinkButton to={`/weather/${year.id}`}>Look at it</LinkButton>
        <LinkButton to="/studies">Go to the studies</LinkButton>
      </MessageBarActions>
    </MessageBar>
  );
}
