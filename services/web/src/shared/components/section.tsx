import { makeStyles, tokens } from '@fluentui/react-components';
import { useId, type ReactNode } from 'react';

const useStyles = makeStyles({
  root: { marginBottom: '28px' },
  head: {
    display: 'flex',
    flexWrap: 'wrap',
    alignItems: 'center',
    justifyContent: 'space-between',
    gap: '8px 16px',
    marginBottom: '10px',
  },
  title: { margin: 0, fontSize: tokens.fontSizeBase500, lineHeight: tokens.lineHeightBase500 },
});

interface SectionProps {
  title: string;
  actions?: ReactNode;
  children: ReactNode;
}

/** A part of a page under an h2. */
export function Section({ title, actions, children }: SectionProps) {
  const styles = useStyles();
  const id = useId();
  return (
    <section className={styles.root} aria-labelledby={id}>
      <div className={styles.head}>
        <h2 id={id} className={styles.title}>
          {title}
        </h2>
        {actions}
      </div>
      {children}
    </section>
  );
}
