import { makeStyles, MessageBar, MessageBarBody, tokens } from '@fluentui/react-components';
import { Section } from '../../shared/components/section.js';
import { cautions, DEFER_TO_CODES } from './model/cautions.js';
import type { Compared } from './model/compared.js';

const useStyles = makeStyles({
  body: { whiteSpace: 'normal', paddingBlock: '8px', maxWidth: '110ch' },
  list: { margin: '4px 0 0', paddingInlineStart: '18px' },
  item: { marginTop: '6px' },
  title: { fontWeight: tokens.fontWeightSemibold },
});

/** What can hurt someone, beside the results that show it. */
export function CautionList({ scenarios }: { scenarios: readonly Compared[] }) {
  const styles = useStyles();
  return (
    <Section title="Cautions">
      <MessageBar intent="warning" layout="multiline">
        <MessageBarBody className={styles.body}>
          {DEFER_TO_CODES}
          <ul className={styles.list}>
            {cautions(scenarios).map(({ key, title, text }) => (
              <li key={key} className={styles.item}>
                <span className={styles.title}>{title}.</span> {text}
              </li>
            ))}
          </ul>
        </MessageBarBody>
      </MessageBar>
    </Section>
  );
}
