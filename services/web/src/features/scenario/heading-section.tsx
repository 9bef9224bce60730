import { makeStyles, MessageBar, MessageBarBody, tokens } from '@fluentui/react-components';
import { scenarioField, type ScenarioField } from '@noonwell/schema';
import type { ReactNode } from 'react';
import { useWatch } from 'react-hook-form';
import { ChoiceField } from './fields/choice-field.js';
import { ListField } from './fields/list-field.js';
import { NumberField } from './fields/number-field.js';
import { TableField } from './fields/table-field.js';
import { LoopAdvice } from './loop-advice.js';
import { DECIDING_PATHS, isShown } from './model/draft.js';
import { formPath } from './model/form-values.js';
import type { FieldGroup, Heading } from './model/headings.js';

const useStyles = makeStyles({
  root: { marginBottom: '32px', scrollMarginTop: '16px' },
  title: { margin: 0, fontSize: tokens.fontSizeBase600, lineHeight: tokens.lineHeightBase600 },
  purpose: { margin: '0 0 12px', color: tokens.colorNeutralForeground3 },
  group: {
    border: `1px solid ${tokens.colorNeutralStroke2}`,
    borderRadius: tokens.borderRadiusMedium,
    backgroundColor: tokens.colorNeutralBackground1,
    margin: '0 0 12px',
    padding: '4px 16px 16px',
    minWidth: 0,
  },
  groupTitle: { margin: '8px 0', fontSize: tokens.fontSizeBase400, lineHeight: tokens.lineHeightBase400 },
  grid: {
    display: 'grid',
    gridTemplateColumns: 'repeat(auto-fill, minmax(min(240px, 100%), 1fr))',
    alignItems: 'start',
    gap: '12px 20px',
  },
  warning: { gridColumn: '1 / -1' },
  body: { whiteSpace: 'normal', paddingBlock: '6px' },
});

const SECONDARY = 'catch.receiver.secondary.kind';
const BARE = 'none';

interface HeadingSectionProps {
  heading: Heading;
  readOnly: boolean;
  /** Before the groups: the weather year under Place. */
  children?: ReactNode;
}

export function HeadingSection({ heading, readOnly, children }: HeadingSectionProps) {
  const styles = useStyles();
  const id = `heading-${heading.key}`;
  return (
    <section aria-labelledby={id} className={styles.root}>
      <h2 id={id} className={styles.title} tabIndex={-1}>
        {heading.label}
      </h2>
      <p className={styles.purpose}>{heading.purpose}</p>
      {children !== undefined && (
        <div className={styles.group}>
          <h3 className={styles.groupTitle}>Weather</h3>
          <div className={styles.grid}>{children}</div>
        </div>
      )}
      {heading.groups.map((group) => (
        <Group key={group.path} group={group} readOnly={readOnly} />
      ))}
    </section>
  );
}

function Group({ group, readOnly }: { group: FieldGroup; readOnly: boolean }) {
  const styles = useStyles();
  const values: unknown[] = useWatch({ name: DECIDING_PATHS.map(formPath) });
  const chosen = (path: string) => {
    const value = values[DECIDING_PATHS.indexOf(path)];
    return typeof value === 'string' ? value : undefined;
  };
  const shown = group.fields.filter((field) => isShown(field, chosen));
  const bare = shown.some(({ path }) => path === SECONDARY) && chosen(SECONDARY) === BARE;
  return (
    <div className={styles.group}>
      <h3 className={styles.groupTitle}>{group.label}</h3>
      <div className={styles.grid}>
        {bare && (
          <MessageBar intent="warning" layout="multiline" className={styles.warning}>
            <MessageBarBody className={styles.body}>{scenarioField(SECONDARY)?.help}</MessageBarBody>
          </MessageBar>
        )}
        {group.path === 'carryAndKeep.pump' && !readOnly && <LoopAdvice className={styles.warning} />}
        {shown.map((field) => (
          <OneField key={field.path} field={field} readOnly={readOnly} />
        ))}
      </div>
    </div>
  );
}

function OneField(props: { field: ScenarioField; readOnly: boolean }) {
  switch (props.field.kind) {
    case 'number':
    case 'integer':
      return <NumberField {...props} />;
    case 'numberList':
      return <ListField {...props} />;
    case 'choice':
    case 'numberChoice':
      return <ChoiceField {...props} />;
    case 'table':
      return <TableField {...props} />;
    case 'monthDay':
      // Only a column of a table.
      return null;
  }
}
