import { makeStyles, tokens } from '@fluentui/react-components';
import type { ReactNode } from 'react';

const useStyles = makeStyles({
  root: {
    display: 'flex',
    flexDirection: 'column',
    alignItems: 'flex-start',
    gap: '12px',
    padding: '24px',
    border: `1px dashed ${tokens.colorNeutralStroke1}`,
    borderRadius: tokens.borderRadiusLarge,
    backgroundColor: tokens.colorNeutralBackground1,
  },
  title: { margin: 0, fontSize: tokens.fontSizeBase400, fontWeight: tokens.fontWeightBold },
  text: { margin: 0, maxWidth: '65ch', color: tokens.colorNeutralForeground2 },
});

interface EmptyStateProps {
  title: string;
  /** What to do to fill it. */
  children: ReactNode;
  action?: ReactNode;
}

/** Says that there is nothing yet and what to do about it. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  const styles = useStyles();
  return (
    <div className={styles.root}>
      <h2 className={styles.title}>{title}</h2>
      <p className={styles.text}>{children}</p>
      {action}
    </div>
  );
}
