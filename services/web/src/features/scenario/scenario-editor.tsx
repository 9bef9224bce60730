import { zodResolver } from '@hookform/resolvers/zod';
import {
  makeStyles,
  MessageBar,
  MessageBarActions,
  MessageBarBody,
  tokens,
} from '@fluentui/react-components';
import { scenarioFields, type ScenarioView } from '@noonwell/schema';
import { useState } from 'react';
import { FormProvider, useForm } from 'react-hook-form';
import { ApiProblem } from '../../shared/api/problem.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { isVersionConflict, useSaveScenario } from './api.js';
import { ErrorSummary } from './error-summary.js';
import { NameField } from './fields/name-field.js';
import { WeatherField } from './fields/weather-field.js';
import { HeadingSection } from './heading-section.js';
import { LeaveGuard } from './leave-guard.js';
import { LoadNewest } from './load-newest.js';
import { formSchema, formValues, type FormValues, type SavedValues } from './model/form-values.js';
import { headingsOf } from './model/headings.js';
import { problemsByField } from './model/save-problems.js';
import { SaveBar } from './save-bar.js';

const HEADINGS = headingsOf(scenarioFields());

const useStyles = makeStyles({
  nav: { display: 'flex', flexWrap: 'wrap', gap: '4px 16px', margin: '0 0 16px' },
  name: { maxWidth: '480px', marginBottom: '16px' },
  message: { marginBottom: '16px' },
  jump: {
    border: 'none',
    padding: '4px 0',
    backgroundColor: 'transparent',
    color: tokens.colorBrandForegroundLink,
    cursor: 'pointer',
    font: 'inherit',
    ':hover': { textDecorationLine: 'underline' },
  },
});

interface ScenarioEditorProps {
  /** The newest version that is known of. */
  scenario: ScenarioView;
  readOnly: boolean;
}

/** The form of one scenario: what is saved is a new version, made from the one that was loaded. */
export function ScenarioEditor({ scenario: newest, readOnly }: ScenarioEditorProps) {
  const styles = useStyles();
  const [base, setBase] = useState(newest);
  const [attempt, setAttempt] = useState(0);
  const save = useSaveScenario(newest.id);
  const form = useForm<FormValues, unknown, SavedValues>({
    defaultValues: formValues(base),
    resolver: zodResolver(formSchema),
    mode: 'onTouched',
    shouldFocusError: false,
  });
  const { isDirty } = form.formState;

  const load = (scenario: ScenarioView) => {
    setBase(scenario);
    setAttempt(0);
    save.reset();
    form.reset(formValues(scenario));
  };
  const submit = form.handleSubmit(
    (values) => {
      save.mutate(
        { ...values, basedOnVersion: base.version },
        {
          onSuccess: load,
          onError: (error) => {
            if (!(error instanceof ApiProblem)) return;
            for (const { path, message } of problemsByField(error.problem)) {
              if (path !== '') form.setError(path as 'document', { type: 'server', message });
            }
            setAttempt((before) => before + 1);
          },
        },
      );
    },
    () => {
      setAttempt((before) => before + 1);
    },
  );
  const outdated = newest.version > base.version;
  const conflict = isVersionConflict(save.error) || outdated;

  return (
    <FormProvider {...form}>
      <form
        noValidate
        onSubmit={(event) => {
          void submit(event);
        }}
      >
        <ErrorSummary attempt={attempt} />
        {conflict && (
          <MessageBar intent="warning" layout="multiline" className={styles.message} role="alert">
            <MessageBarBody style={{ whiteSpace: 'normal' }}>
              Somebody has saved a newer version since you opened version {base.version}. Nothing of yours was
              saved over it. Load the newest version and enter your changes again; what is typed here is lost
              by that.
            </MessageBarBody>
            <MessageBarActions>
              <LoadNewest scenarioId={newest.id} onLoaded={load} />
            </MessageBarActions>
          </MessageBar>
        )}
        {save.error !== null && !conflict && !isPlaced(save.error) && (
          <div className={styles.message}>
            <ErrorState what={`“${base.name}” was not saved.`} error={save.error} />
          </div>
        )}
        <nav aria-label="Parts of the scenario" className={styles.nav}>
          {HEADINGS.map(({ key, label }) => (
            <button
              key={key}
              type="button"
              className={styles.jump}
              onClick={() => {
                const heading = document.getElementById(`heading-${key}`);
                heading?.scrollIntoView();
                heading?.focus({ preventScroll: true });
              }}
            >
              {label}
            </button>
          ))}
        </nav>
        <NameField readOnly={readOnly} className={styles.name} />
        {HEADINGS.map((heading) => (
          <HeadingSection key={heading.key} heading={heading} readOnly={readOnly}>
            {heading.key === 'place' ? (
              <WeatherField
                readOnly={readOnly}
                present={
                  base.weatherYearId === null
                    ? null
                    : { id: base.weatherYearId, name: base.weatherYearName ?? base.weatherYearId }
                }
              />
            ) : undefined}
          </HeadingSection>
        ))}
        {!readOnly && (
          <SaveBar
            version={base.version}
            dirty={isDirty}
            saving={save.isPending}
            onDiscard={() => {
              load(base);
            }}
          />
        )}
      </form>
      <LeaveGuard dirty={isDirty && !readOnly} />
    </FormProvider>
  );
}

/** Whether a refusal names fields: then it stands at them and in the summary. */
function isPlaced(error: Error): boolean {
  return error instanceof ApiProblem && problemsByField(error.problem).some(({ path }) => path !== '');
}
