import { makeStyles, tokens } from '@fluentui/react-components';
import type { ReactNode } from 'react';

const useStyles = makeStyles({
  list: {
    display: 'grid',
    gridTemplateColumns: 'repeat(auto-fill, minmax(150px, 1fr))',
    gap: '1px',
    margin: 0,
    border: `1px solid ${tokens.colorNeutralStroke2}`,
    borderRadius: tokens.borderRadiusMedium,
    overflow: 'hidden',
    backgroundColor: tokens.colorNeutralBackground1,
  },
  item: { padding: '10px 14px', minWidth: 0, boxShadow: `0 0 0 0.5px ${tokens.colorNeutralStroke2}` },
  name: { fontSize: tokens.fontSizeBase200, color: tokens.colorNeutralForeground3 },
  value: {
    margin: '2px 0 0',
    fontSize: tokens.fontSizeBase400,
    fontWeight: tokens.fontWeightBold,
    overflowWrap: 'anywhere',
  },
});

export interface Figure {
  readonly name: string;
  readonly value: ReactNode;
}

/** Named figures side by side: name above, value with its unit below. */
export function Figures({ figures, label }: { figures: readonly Figure[]; label: string }) {
  const styles = useStyles();
  return (
    <dl className={styles.list} aria-label={label}>
      {figures.map(({ name, value }) => (
        <div key={name} className={styles.item}>
          <dt className={styles.name}>{name}</dt>
          <dd className={styles.value}>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
