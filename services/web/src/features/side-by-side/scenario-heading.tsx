import { makeStyles, tokens } from '@fluentui/react-components';
import { ScenarioSwatch } from '../../shared/components/scenario-swatch.js';
import type { Compared } from './model/compared.js';

const useStyles = makeStyles({
  root: { display: 'inline-flex', flexDirection: 'column', alignItems: 'flex-end', whiteSpace: 'normal' },
  note: { color: tokens.colorNeutralForeground3, fontWeight: tokens.fontWeightRegular },
});

/** Heading of a scenario's column of numbers: the line of the charts above the name. */
export function ScenarioHeading({ scenario, note }: { scenario: Compared; note?: string }) {
  const styles = useStyles();
  return (
    <span className={styles.root}>
      <ScenarioSwatch position={scenario.position} />
      {scenario.name}
      {note !== undefined && <span className={styles.note}>{note}</span>}
    </span>
  );
}
