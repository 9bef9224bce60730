import { makeStyles, mergeClasses, tokens } from '@fluentui/react-components';
import { ArrowTrendingRegular, EqualCircleRegular, WarningRegular } from '@fluentui/react-icons';
import { useMeaningColours } from '../../shared/theme/colours.js';
import type { Compared } from './model/compared.js';
import { plainSentences, type Tone } from './model/plain-sentence.js';

const useStyles = makeStyles({
  card: {
    display: 'flex',
    flexDirection: 'column',
    gap: '8px',
    padding: '16px 20px',
    marginBottom: '12px',
    backgroundColor: tokens.colorNeutralBackground1,
    border: `1px solid ${tokens.colorNeutralStroke2}`,
    borderRadius: tokens.borderRadiusMedium,
    '@media (max-width: 639px)': { padding: '12px' },
  },
  line: { display: 'grid', gridTemplateColumns: '24px 1fr', gap: '8px', margin: 0, maxWidth: '1040px' },
  first: {
    fontSize: tokens.fontSizeBase500,
    lineHeight: tokens.lineHeightBase500,
    '@media (max-width: 639px)': { fontSize: tokens.fontSizeBase400, lineHeight: tokens.lineHeightBase400 },
  },
  icon: { fontSize: '20px', lineHeight: 1, paddingTop: '3px' },
});

const ICONS = { worse: WarningRegular, better: ArrowTrendingRegular, even: EqualCircleRegular } as const;

/** What is gained, what is given up, on which condition: in words, before any table or chart. */
export function PlainWords({ baseline, others }: { baseline: Compared; others: readonly Compared[] }) {
  const styles = useStyles();
  const colours = useMeaningColours();
  const colourOf: Readonly<Record<Tone, string>> = {
    worse: colours.caution,
    better: colours.good,
    even: colours.mutedText,
  };
  return others.map((other) => (
    <div key={other.scenarioId} className={styles.card}>
      {plainSentences(baseline, other).map(({ tone, text }, index) => {
        const Icon = ICONS[tone];
        return (
          <p key={text} className={mergeClasses(styles.line, index === 0 && styles.first)}>
            <Icon className={styles.icon} style={{ color: colourOf[tone] }} aria-hidden="true" />
            <span>{text}</span>
          </p>
        );
      })}
    </div>
  ));
}
