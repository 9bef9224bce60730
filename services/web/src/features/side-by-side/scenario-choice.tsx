import { Checkbox, makeStyles, Radio, RadioGroup, tokens } from '@fluentui/react-components';
import { MOST_SCENARIOS, type ScenarioView } from '@noonwell/schema';
import { useId } from 'react';
import { ScenarioSwatch } from '../../shared/components/scenario-swatch.js';
import type { ViewState } from './model/address.js';
import type { Shown } from './model/shown.js';

const useStyles = makeStyles({
  root: {
    display: 'flex',
    flexWrap: 'wrap',
    gap: '4px 40px',
    padding: '8px 0',
    marginBottom: '16px',
    borderTop: `1px solid ${tokens.colorNeutralStroke2}`,
    borderBottom: `1px solid ${tokens.colorNeutralStroke2}`,
  },
  group: { border: 'none', margin: 0, padding: 0, minWidth: 0 },
  legend: { padding: 0, fontWeight: tokens.fontWeightSemibold, fontSize: tokens.fontSizeBase200 },
  options: { display: 'flex', flexWrap: 'wrap' },
  label: { display: 'inline-flex', alignItems: 'center', gap: '8px' },
});

interface ScenarioChoiceProps {
  all: readonly ScenarioView[];
  shown: Shown;
  view: ViewState;
  onChange: (change: Partial<ViewState>) => void;
}

/** Which scenario is the baseline, which are held against it, and which of them are drawn. */
export function ScenarioChoice({ all, shown, view, onChange }: ScenarioChoiceProps) {
  const styles = useStyles();
  const baselineId = useId();
  const named = ({ name, position }: ScenarioView) => (
    <span className={styles.label}>
      <ScenarioSwatch position={position} />
      {name}
    </span>
  );
  const shownIds = shown.scenarios.map(({ id }) => id);
  return (
    <div className={styles.root}>
      <div className={styles.group}>
        <div id={baselineId} className={styles.legend}>
          Baseline
        </div>
        <RadioGroup
          layout="horizontal"
          className={styles.options}
          aria-labelledby={baselineId}
          value={shown.baseline?.id ?? ''}
          onChange={(_, { value }) => {
            onChange({ baseline: value });
          }}
        >
          {shown.scenarios.map((scenario) => (
            <Radio key={scenario.id} value={scenario.id} label={scenario.name} />
          ))}
        </RadioGroup>
      </div>
      {all.length > 2 && (
        <fieldset className={styles.group}>
          <legend className={styles.legend}>Compared</legend>
          <div className={styles.options}>
            {all.map((scenario) => (
              <Checkbox
                key={scenario.id}
                label={scenario.name}
                checked={shownIds.includes(scenario.id)}
                disabled={
                  shownIds.includes(scenario.id) ? shownIds.length === 1 : shownIds.length >= MOST_SCENARIOS
                }
                onChange={(_, { checked }) => {
                  onChange({
                    scenarios: all
                      .map(({ id }) => id)
                      .filter((id) => (id === scenario.id ? checked === true : shownIds.includes(id))),
                  });
                }}
              />
            ))}
          </div>
        </fieldset>
      )}
      <fieldset className={styles.group}>
        <legend className={styles.legend}>Drawn in the charts</legend>
        <div className={styles.options}>
          {shown.scenarios.map((scenario) => (
            <Checkbox
              key={scenario.id}
              label={named(scenario)}
              checked={!view.hidden.includes(scenario.id)}
              onChange={(_, { checked }) => {
                onChange({
                  hidden: shownIds.filter((id) =>
                    id === scenario.id ? checked !== true : view.hidden.includes(id),
                  ),
                });
              }}
            />
          ))}
        </div>
      </fieldset>
    </div>
  );
}
