import { Button, makeStyles } from '@fluentui/react-components';
import { useRouteError } from 'react-router-dom';
import { ErrorState } from '../shared/components/error-state.js';

const useStyles = makeStyles({ root: { padding: '24px', maxWidth: '800px' } });

/** A page that failed to load or to draw. */
export function RouteError() {
  const styles = useStyles();
  const error = useRouteError();
  return (
    <div className={styles.root}>
      <ErrorState
        what="This page could not be shown."
        error={error}
        actions={
          <Button
            onClick={() => {
              window.location.reload();
            }}
          >
            Load the page again
          </Button>
        }
      />
    </div>
  );
}
