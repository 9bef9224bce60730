import { makeStyles, MessageBar, MessageBarBody, tokens } from '@fluentui/react-components';
import type { StudyView } from '@noonwell/schema';
import { useMemo } from 'react';
import { useParams } from 'react-router-dom';
import { EmptyState } from '../../shared/components/empty-state.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { LoadingState } from '../../shared/components/loading-state.js';
import { PageHeader } from '../../shared/components/page-header.js';
import { LinkButton, RouterLink } from '../../shared/components/router-link.js';
import { useWatchedStudy } from './api.js';
import { CautionList } from './caution-list.js';
import { HowMuch } from './how-much.js';
import { shownScenarios } from './model/shown.js';
import { PlainWords } from './plain-words.js';
import { ScenarioChoice } from './scenario-choice.js';
import { useCompared } from './use-compared.js';
import { useView } from './use-view.js';
import { When } from './when.js';
import { WhereLost } from './where-lost.js';

const useStyles = makeStyles({
  notes: { display: 'flex', flexDirection: 'column', gap: '8px', marginBottom: '12px' },
  note: { margin: 0, color: tokens.colorNeutralForeground3, fontSize: tokens.fontSizeBase200 },
});

/** Two to six scenarios of a study against one of them, arranged by question. */
export default function SideBySidePage() {
  const { studyId = '' } = useParams();
  const study = useWatchedStudy(studyId);
  if (study.isPending) return <LoadingState label="Loading the study" height={480} />;
  if (study.isError) {
    return (
      <ErrorState
        what="The study could not be loaded."
        error={study.error}
        onRetry={() => {
          void study.refetch();
        }}
        actions={<LinkButton to="/studies">All studies</LinkButton>}
      />
    );
  }
  return <Comparison study={study.data} />;
}

function Comparison({ study }: { study: StudyView }) {
  const styles = useStyles();
  const [view, change] = useView();
  const shown = useMemo(() => shownScenarios(study.scenarios, view), [study.scenarios, view]);
  const { compared, without, loading, error, retry } = useCompared(shown.scenarios, study.weatherYears);
  const baseline = compared.find(({ scenarioId }) => scenarioId === shown.baseline?.id) ?? compared[0];
  const others = compared.filter((one) => one !== baseline);
  const drawn = compared.filter(({ scenarioId }) => !view.hidden.includes(scenarioId));
  const studyAddress = `/studies/${study.id}`;

  return (
    <>
      <PageHeader
        title="Side by side"
        above={<RouterLink to={studyAddress}>{study.name}</RouterLink>}
        below={study.question}
      />
      {loading && <LoadingState label="Loading the results" height={160} />}
      {error !== null && <ErrorState what="A result could not be loaded." error={error} onRetry={retry} />}
      {!loading && !baseline && error === null && (
        <EmptyState
          title="No result yet"
          action={
            <LinkButton to={studyAddress} appearance="primary">
              Go to the study and run it
            </LinkButton>
          }
        >
          The newest versions of these scenarios have not been run. Choose a weather year in the study, run
          all scenarios, and come back: what one gains and gives up against the other stands here.
        </EmptyState>
      )}
      {baseline && (
        <>
          <PlainWords baseline={baseline} others={others} />
          <div className={styles.notes}>
            {without.length > 0 && (
              <MessageBar intent="info" layout="multiline">
                <MessageBarBody>
                  Without a result of the newest version: {without.map(({ name }) => name).join(', ')}.{' '}
                  <RouterLink to={studyAddress}>Run it in the study</RouterLink>
                </MessageBarBody>
              </MessageBar>
            )}
            {others.length === 0 && without.length === 0 && (
              <MessageBar intent="info" layout="multiline">
                <MessageBarBody>
                  There is nothing to hold “{baseline.name}” against.{' '}
                  <RouterLink to={studyAddress}>Add a second scenario to the study</RouterLink>
                </MessageBarBody>
              </MessageBar>
            )}
            <p className={styles.note}>
              {compared.map(({ name, version }) => `${name}: version ${version}`).join(' · ')} · model version{' '}
              {[...new Set(compared.map(({ summary }) => summary.modelVersion))].join(', ')} · steps of{' '}
              {[...new Set(compared.map(({ summary }) => summary.stepMinutes))].join(', ')} min
            </p>
          </div>
          <ScenarioChoice all={study.scenarios} shown={shown} view={view} onChange={change} />
          <HowMuch baseline={baseline} others={others} drawn={drawn} />
          <CautionList scenarios={compared} />
          <When drawn={drawn} view={view} onChange={change} />
          <WhereLost scenarios={[baseline, ...others]} />
        </>
      )}
    </>
  );
}
