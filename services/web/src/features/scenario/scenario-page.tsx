import { Button, makeStyles, MessageBar, MessageBarBody } from '@fluentui/react-components';
import { ArrowDownloadRegular } from '@fluentui/react-icons';
import { roleMay, type ScenarioView, type StudyView } from '@noonwell/schema';
import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { useMe } from '../../shared/api/me.js';
import { studyQuery } from '../../shared/api/studies.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { LoadingState } from '../../shared/components/loading-state.js';
import { PageHeader } from '../../shared/components/page-header.js';
import { LinkButton, RouterLink } from '../../shared/components/router-link.js';
import { scenarioQuery } from './api.js';
import { ScenarioEditor } from './scenario-editor.js';
import { useExport, VersionList } from './version-list.js';

const useStyles = makeStyles({ message: { marginBottom: '16px' } });

/** One scenario: its form, its versions, and the file that the command line runs. */
export default function ScenarioPage() {
  const { studyId = '', scenarioId = '' } = useParams();
  const study = useQuery(studyQuery(studyId));
  const scenario = useQuery(scenarioQuery(scenarioId));
  if (study.isPending || scenario.isPending)
    return <LoadingState label="Loading the scenario" height={480} />;
  if (study.isError || scenario.isError) {
    return (
      <ErrorState
        what="The scenario could not be loaded."
        error={scenario.error ?? study.error}
        onRetry={() => {
          void study.refetch();
          void scenario.refetch();
        }}
        actions={<LinkButton to={`/studies/${studyId}`}>Back to the study</LinkButton>}
      />
    );
  }
  // A scenario is never shown with another one's typed changes.
  return <OneScenario key={scenario.data.id} study={study.data} scenario={scenario.data} />;
}

function OneScenario({ study, scenario }: { study: StudyView; scenario: ScenarioView }) {
  const styles = useStyles();
  const { role } = useMe();
  const fetchExport = useExport(scenario.name);
  const readOnly = !study.mayWrite;
  return (
    <>
      <PageHeader
        title={scenario.name}
        above={<RouterLink to={`/studies/${study.id}`}>{study.name}</RouterLink>}
        below={scenario.position === 0 ? 'Baseline of the study' : ''}
        actions={
          <Button
            icon={<ArrowDownloadRegular />}
            onClick={() => {
              fetchExport.mutate({ id: scenario.versionId, version: scenario.version });
            }}
          >
            Export version {scenario.version}
          </Button>
        }
      />
      {fetchExport.isError && <ErrorState what="The scenario was not exported." error={fetchExport.error} />}
      {readOnly && (
        <MessageBar intent="info" layout="multiline" className={styles.message}>
          <MessageBarBody style={{ whiteSpace: 'normal' }}>
            {roleMay(role, 'study.write')
              ? `You can read this scenario, not change it: the study belongs to ${study.ownerName}.`
              : 'You can read this scenario, not change it: it is shared with the workspace. Make a study of your own to try other values.'}
          </MessageBarBody>
        </MessageBar>
      )}
      <ScenarioEditor scenario={scenario} readOnly={readOnly} />
      <VersionList scenarioId={scenario.id} name={scenario.name} />
    </>
  );
}
