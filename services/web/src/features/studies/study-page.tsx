import { Button, makeStyles, MessageBar, MessageBarBody } from '@fluentui/react-components';
import { DeleteRegular, EditRegular } from '@fluentui/react-icons';
import type { StudyView } from '@noonwell/schema';
import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import { studyQuery, useChangeStudy, useDeleteStudy } from '../../shared/api/studies.js';
import { ConfirmDialog } from '../../shared/components/confirm-dialog.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { LoadingState } from '../../shared/components/loading-state.js';
import { PageHeader } from '../../shared/components/page-header.js';
import { LinkButton, RouterLink } from '../../shared/components/router-link.js';
import { Section } from '../../shared/components/section.js';
import { ScenarioSection } from './scenario-section.js';
import { StudyDialog } from './study-dialog.js';
import { WeatherChoice } from './weather-choice.js';

const useStyles = makeStyles({ notice: { marginBottom: '20px' } });

interface StudyPageProps {
  /** What starts, shows and stops the runs; another feature's. */
  renderRunPanel: (study: StudyView) => ReactNode;
}

export function StudyPage({ renderRunPanel }: StudyPageProps) {
  const { studyId = '' } = useParams();
  const query = useQuery(studyQuery(studyId));
  const back = <RouterLink to="/studies">Studies</RouterLink>;
  if (query.isPending) {
    return (
      <>
        <PageHeader title="Study" above={back} />
        <LoadingState label="Loading the study" height={480} />
      </>
    );
  }
  if (query.isError) {
    return (
      <>
        <PageHeader title="Study" above={back} />
        <ErrorState
          what="This study could not be loaded."
          error={query.error}
          onRetry={() => void query.refetch()}
        />
      </>
    );
  }
  return <LoadedStudy study={query.data} back={back} runPanel={renderRunPanel(query.data)} />;
}

function LoadedStudy({ study, back, runPanel }: { study: StudyView; back: ReactNode; runPanel: ReactNode }) {
  const styles = useStyles();
  const compared = study.scenarios.filter(({ latestRun }) => latestRun?.state === 'done').length;
  return (
    <>
      <PageHeader
        title={study.name}
        above={back}
        below={study.question}
        actions={
          <>
            {compared >= 2 && (
              <LinkButton to={`/studies/${study.id}/side-by-side`} appearance="primary">
                Side by side
              </LinkButton>
            )}
            {study.mayWrite && <StudyActions study={study} />}
          </>
        }
      />
      {!study.mayWrite && (
        <MessageBar className={styles.notice} layout="multiline">
          <MessageBarBody>
            You read this study of {study.ownerName}'s; your role does not change studies shared with the
            workspace. Start a study of your own to try something.
          </MessageBarBody>
        </MessageBar>
      )}
      {study.scenarios.length > 0 && (
        <>
          <Section title="Weather year">
            <WeatherChoice study={study} />
          </Section>
          {runPanel}
        </>
      )}
      <ScenarioSection study={study} />
    </>
  );
}

/** Rename and delete. */
function StudyActions({ study }: { study: StudyView }) {
  const navigate = useNavigate();
  const [open, setOpen] = useState<'rename' | 'delete' | null>(null);
  const change = useChangeStudy(study.id);
  const remove = useDeleteStudy();
  const close = () => {
    setOpen(null);
  };
  return (
    <>
      <Button
        icon={<EditRegular />}
        onClick={() => {
          change.reset();
          setOpen('rename');
        }}
      >
        Rename
      </Button>
      <Button
        icon={<DeleteRegular />}
        onClick={() => {
          remove.reset();
          setOpen('delete');
        }}
      >
        Delete
      </Button>
      {open === 'rename' && (
        <StudyDialog
          title="Name and question"
          submitLabel="Save"
          failure="The study was not changed."
          initial={{ name: study.name, question: study.question }}
          busy={change.isPending}
          error={change.error}
          onClose={close}
          onSubmit={(values) => {
            change.mutate(values, { onSuccess: close });
          }}
        />
      )}
      <ConfirmDialog
        open={open === 'delete'}
        title={`Delete "${study.name}"?`}
        confirmLabel="Delete study"
        busy={remove.isPending}
        error={remove.error && { what: 'The study was not deleted.', error: remove.error }}
        onCancel={close}
        onConfirm={() => {
          remove.mutate(study.id, { onSuccess: () => void navigate('/studies') });
        }}
      >
        Its scenarios with all their versions and results go with it. Weather years stay.
      </ConfirmDialog>
    </>
  );
}
