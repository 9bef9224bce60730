import { makeStyles, ProgressBar } from '@fluentui/react-components';

const useStyles = makeStyles({
  // Its place is always kept, so that nothing moves when it appears.
  slot: { height: '2px' },
});

/** A thin bar while the next page is on its way. */
export function NavigationProgress({ active }: { active: boolean }) {
  const styles = useStyles();
  return (
    <div className={styles.slot}>
      {active && <ProgressBar thickness="medium" shape="square" aria-label="Loading the page" />}
    </div>
  );
}
