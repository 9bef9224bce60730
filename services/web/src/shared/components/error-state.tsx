import {
  Button,
  makeStyles,
  MessageBar,
  MessageBarActions,
  MessageBarBody,
  MessageBarTitle,
  tokens,
} from '@fluentui/react-components';
import type { ReactNode } from 'react';
import { ApiProblem, describeError } from '../api/problem.js';

const useStyles = makeStyles({
  body: { whiteSpace: 'normal', paddingBottom: '8px', overflowWrap: 'anywhere' },
  line: { display: 'block' },
  reference: { fontFamily: tokens.fontFamilyMonospace, overflowWrap: 'anywhere' },
  places: { margin: '4px 0 0', paddingInlineStart: '20px' },
});

interface ErrorStateProps {
  /** What was being done, to what: "The study list could not be loaded." */
  what: string;
  error: unknown;
  /** Better advice than the usual one for a status of the answer. */
  nextByStatus?: Readonly<Record<number, string>>;
  onRetry?: () => void;
  actions?: ReactNode;
}

/** What happened, to what, what to do next, and the reference into the log. */
export function ErrorState({ what, error, nextByStatus, onRetry, actions }: ErrorStateProps) {
  const styles = useStyles();
  const { title, detail, next: usualNext, reference, places } = describeError(error);
  const next = (error instanceof ApiProblem ? nextByStatus?.[error.status] : undefined) ?? usualNext;
  return (
    <MessageBar intent="error" layout="multiline" role="alert">
      <MessageBarBody className={styles.body}>
        <MessageBarTitle>{what}</MessageBarTitle>
        <span className={styles.line}>
          {title} {detail}
        </span>
        {places.length > 0 && (
          <ul className={styles.places}>
            {places.map((place, index) => (
              <li key={index}>
                {place.path !== undefined && `${place.path}: `}
                {place.reason} {place.fix}
              </li>
            ))}
          </ul>
        )}
        <span className={styles.line}>{next}</span>
        {reference !== null && (
          <span className={styles.line}>
            Reference: <span className={styles.reference}>{reference}</span>
          </span>
        )}
      </MessageBarBody>
      {(onRetry !== undefined || actions !== undefined) && (
        <MessageBarActions>
          {onRetry !== undefined && <Button onClick={onRetry}>Try again</Button>}
          {actions}
        </MessageBarActions>
      )}
    </MessageBar>
  );
}
