import { Button, makeStyles, tokens } from '@fluentui/react-components';
import { AddRegular } from '@fluentui/react-icons';
import { ROLE_LABELS, STUDENT_QUOTA } from '@noonwell/schema';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { useMay, useMe } from '../../shared/api/me.js';
import { pageOfAddress } from '../../shared/api/page-of-address.js';
import { studiesQuery, useCreateStudy } from '../../shared/api/studies.js';
import { EmptyState } from '../../shared/components/empty-state.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { LoadingState } from '../../shared/components/loading-state.js';
import { PageHeader } from '../../shared/components/page-header.js';
import { Pager } from '../../shared/components/pager.js';
import { StudyDialog } from './study-dialog.js';
import { StudyRow } from './study-row.js';

const PAGE_SIZE = 20;

const useStyles = makeStyles({
  list: {
    listStyleType: 'none',
    margin: 0,
    padding: 0,
    display: 'grid',
    borderRadius: tokens.borderRadiusLarge,
    border: `1px solid ${tokens.colorNeutralStroke2}`,
    backgroundColor: tokens.colorNeutralBackground1,
    overflow: 'hidden',
  },
  stale: { opacity: 0.6 },
});

export default function StudiesPage() {
  const styles = useStyles();
  const me = useMe();
  const navigate = useNavigate();
  const [search, setSearch] = useSearchParams();
  const page = pageOfAddress(search);
  const studies = useQuery(studiesQuery(page, PAGE_SIZE));
  const [creating, setCreating] = useState(false);
  const create = useCreateStudy();
  const mayShare = useMay('study.write');
  const mayCreate = useMay('sandbox.write');

  const newStudy = mayCreate && (
    <Button
      appearance="primary"
      icon={<AddRegular />}
      onClick={() => {
        create.reset();
        setCreating(true);
      }}
    >
      New study
    </Button>
  );
  return (
    <>
      <PageHeader
        title="Studies"
        below={
          mayShare
            ? 'A study asks one question: which machine, at which place, for which load?'
            : `As a ${ROLE_LABELS[me.role].toLowerCase()} you read the workspace's studies and keep up to ${STUDENT_QUOTA.studies} of your own, which only you and the administrators see.`
        }
        actions={newStudy}
      />
      {studies.isPending && <LoadingState label="Loading the studies" height={320} />}
      {studies.isError && (
        <ErrorState
          what="The studies could not be loaded."
          error={studies.error}
          onRetry={() => void studies.refetch()}
        />
      )}
      {studies.isSuccess && studies.data.total === 0 && (
        <EmptyState title="No study yet" action={newStudy}>
          {mayCreate
            ? 'Start one with the question you have to answer. You give it scenarios and a weather year next, then press run.'
            : 'Nobody has shared a study with this workspace yet.'}
        </EmptyState>
      )}
      {studies.isSuccess && studies.data.total > 0 && (
        <>
          <ul className={`${styles.list} ${studies.isPlaceholderData ? styles.stale : ''}`}>
            {studies.data.items.map((study) => (
              <StudyRow key={study.id} study={study} />
            ))}
          </ul>
          <Pager
            label="Pages of studies"
            page={page}
            pageSize={PAGE_SIZE}
            total={studies.data.total}
            onPage={(next) => {
              setSearch({ page: String(next) });
            }}
          />
        </>
      )}
      {creating && (
        <StudyDialog
          title="New study"
          submitLabel="Create study"
          failure="The study was not created."
          busy={create.isPending}
          error={create.error}
          onClose={() => {
            setCreating(false);
          }}
          onSubmit={(values) => {
            create.mutate(values, { onSuccess: (study) => void navigate(`/studies/${study.id}`) });
          }}
        />
      )}
    </>
  );
}
