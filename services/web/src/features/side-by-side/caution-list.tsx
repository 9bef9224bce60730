import { makeStyles, MessageBar, MessageBarBody, MessageBarTitle } from '@fluentui/react-components';
import { Section } from '../../shared/components/section.js';
import { cautions } from './model/cautions.js';
import type { Compared } from './model/compared.js';

const useStyles = makeStyles({
  list: { display: 'flex', flexDirection: 'column', gap: '8px' },
  body: { whiteSpace: 'normal', paddingBlock: '6px' },
});

/** What can hurt someone, beside the results that show it. */
export function CautionList({ scenarios }: { scenarios: readonly Compared[] }) {
  const styles = useStyles();
  return (
    <Section title="Cautions">
      <div className={styles.list}>
        {cautions(scenarios).map(({ key, title, text }) => (
          <MessageBar key={key} intent="warning" layout="multiline">
            <MessageBarBody className={styles.body}>
              <MessageBarTitle>{title}.</MessageBarTitle> {text}
            </MessageBarBody>
          </MessageBar>
        ))}
      </div>
    </Section>
  );
}
