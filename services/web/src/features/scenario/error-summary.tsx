import { Link, makeStyles, MessageBar, MessageBarBody, MessageBarTitle } from '@fluentui/react-components';
import { useEffect, useRef } from 'react';
import { useFormContext, useFormState } from 'react-hook-form';
import { formatPlural } from '../../shared/format/number.js';
import { listErrors } from './model/save-problems.js';

const useStyles = makeStyles({
  root: { marginBottom: '16px', ':focus': { outlineStyle: 'none' } },
  body: { whiteSpace: 'normal', paddingBlock: '8px' },
  list: { margin: '4px 0 0', paddingInlineStart: '20px' },
});

/** What stands in the way of saving, each a link to its field. Takes the focus when saving has failed. */
export function ErrorSummary({ attempt }: { attempt: number }) {
  const styles = useStyles();
  const { setFocus } = useFormContext();
  const { errors } = useFormState();
  const root = useRef<HTMLDivElement>(null);
  const listed = listErrors(errors);
  useEffect(() => {
    if (attempt > 0) root.current?.focus();
  }, [attempt]);
  if (attempt === 0 || listed.length === 0) return null;
  return (
    <div ref={root} tabIndex={-1} role="alert" className={styles.root}>
      <MessageBar intent="error" layout="multiline">
        <MessageBarBody className={styles.body}>
          <MessageBarTitle>
            Not saved: {formatPlural(listed.length, 'field needs', 'fields need')} another value.
          </MessageBarTitle>
          <ul className={styles.list}>
            {listed.map(({ path, label, message }) => (
              <li key={path}>
                <Link
                  as="button"
                  inline
                  onClick={() => {
                    setFocus(path);
                  }}
                >
                  {label}
                </Link>
                : {message}
              </li>
            ))}
          </ul>
        </MessageBarBody>
      </MessageBar>
    </div>
  );
}
