import { makeStyles, Spinner } from '@fluentui/react-components';
import { useEffect, useState } from 'react';

/** Waits shorter than this show nothing, so that a quick answer does not flicker. */
const SHOW_AFTER_MS = 300;

const useStyles = makeStyles({
  root: { display: 'grid', placeItems: 'center' },
});

interface LoadingStateProps {
  /** "Loading the studies" */
  label: string;
  /** The height that the content will have, so that nothing jumps when it comes [px]. */
  height?: number;
}

/** Holds the place of what is being loaded; says so after a third of a second. */
export function LoadingState({ label, height = 240 }: LoadingStateProps) {
  const styles = useStyles();
  const [shown, setShown] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => {
      setShown(true);
    }, SHOW_AFTER_MS);
    return () => {
      clearTimeout(timer);
    };
  }, []);
  return (
    <div className={styles.root} style={{ minHeight: height }} role="status" aria-busy="true">
      {shown && <Spinner label={`${label} …`} size="small" />}
    </div>
  );
}
