import { makeStyles, tokens } from '@fluentui/react-components';
import { useEffect, useRef, type ReactNode } from 'react';
import { useFocusOnArrival } from './focus-on-arrival.js';

const useStyles = makeStyles({
  root: {
    display: 'flex',
    flexWrap: 'wrap',
    alignItems: 'flex-end',
    justifyContent: 'space-between',
    gap: '8px 24px',
    marginBottom: '20px',
  },
  words: { minWidth: 0, maxWidth: '80ch', flex: '1 1 320px' },
  above: { fontSize: tokens.fontSizeBase200, color: tokens.colorNeutralForeground3, marginBottom: '2px' },
  title: {
    margin: 0,
    fontSize: tokens.fontSizeHero700,
    lineHeight: tokens.lineHeightHero700,
    fontWeight: tokens.fontWeightBold,
    letterSpacing: '-0.01em',
    overflowWrap: 'anywhere',
    '@media (max-width: 639px)': { fontSize: tokens.fontSizeBase600, lineHeight: tokens.lineHeightBase600 },
    ':focus': { outlineStyle: 'none' },
  },
  below: {
    margin: '4px 0 0',
    color: tokens.colorNeutralForeground2,
    fontSize: tokens.fontSizeBase400,
    lineHeight: tokens.lineHeightBase400,
    overflowWrap: 'anywhere',
  },
  actions: { display: 'flex', flexWrap: 'wrap', gap: '8px' },
});

interface PageHeaderProps {
  title: string;
  /** Way back, above the title. */
  above?: ReactNode;
  /** One sentence below the title. */
  below?: ReactNode;
  actions?: ReactNode;
}

/** The page's only h1. Names the browser tab and takes the focus when the reader has come from another page. */
export function PageHeader({ title, above, below, actions }: PageHeaderProps) {
  const styles = useStyles();
  const heading = useRef<HTMLHeadingElement>(null);
  const focusOnArrival = useFocusOnArrival();
  useEffect(() => {
    document.title = `${title} · Noonwell`;
  }, [title]);
  useEffect(() => {
    focusOnArrival(heading.current);
  }, [focusOnArrival]);
  return (
    <header className={styles.root}>
      <div className={styles.words}>
        {above !== undefined && <div className={styles.above}>{above}</div>}
        <h1 ref={heading} tabIndex={-1} className={styles.title}>
          {title}
        </h1>
        {below !== undefined && below !== '' && <div className={styles.below}>{below}</div>}
      </div>
      {actions !== undefined && <div className={styles.actions}>{actions}</div>}
    </header>
  );
}
