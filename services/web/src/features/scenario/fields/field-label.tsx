import { InfoLabel, makeStyles, tokens, type FieldProps, type LabelProps } from '@fluentui/react-components';
import type { ScenarioField } from '@noonwell/schema';
import { formatRange } from './format-range.js';

const useStyles = makeStyles({
  source: { display: 'block', marginTop: '4px', color: tokens.colorNeutralForeground3 },
});

/** Name of a field with its help, range and source behind the sign beside it. */
export function fieldLabel(field: ScenarioField): FieldProps['label'] {
  return {
    children: (_: unknown, props: LabelProps) => (
      <InfoLabel {...props} info={<FieldInfo field={field} />}>
        {field.label}
      </InfoLabel>
    ),
  };
}

function FieldInfo({ field }: { field: ScenarioField }) {
  const styles = useStyles();
  const range = formatRange(field);
  return (
    <>
      {field.help}
      {range !== null && <span className={styles.source}>Range: {range}</span>}
      {field.source !== '' && <span className={styles.source}>Source: {field.source}</span>}
    </>
  );
}
