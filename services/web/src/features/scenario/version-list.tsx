import { Button } from '@fluentui/react-components';
import { ArrowDownloadRegular } from '@fluentui/react-icons';
import type { scenarioVersionSchema } from '@noonwell/schema';
import { useMutation, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { z } from 'zod';
import { download } from '../../shared/api/download.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { LoadingState } from '../../shared/components/loading-state.js';
import { NumberTable, type TableColumn } from '../../shared/components/number-table.js';
import { Pager } from '../../shared/components/pager.js';
import { Section } from '../../shared/components/section.js';
import { formatInstant } from '../../shared/format/date.js';
import { VERSIONS_ON_A_PAGE, versionsQuery } from './api.js';

type Version = z.infer<typeof scenarioVersionSchema>;

/** Saves a version as the file that the command line runs, byte for byte. */
export function useExport(scenarioName: string) {
  return useMutation({
    mutationFn: ({ id, version }: Pick<Version, 'id' | 'version'>) =>
      download(
        'GET /api/scenario-versions/{id}/export',
        { params: { id } },
        `${scenarioName} v${version}.json`,
      ),
  });
}

/** Every version that was saved; none of them ever changes. */
export function VersionList({ scenarioId, name }: { scenarioId: string; name: string }) {
  const [page, setPage] = useState(1);
  const versions = useQuery(versionsQuery(scenarioId, page));
  const fetchExport = useExport(name);
  const columns: TableColumn<Version>[] = [
    { key: 'version', heading: 'Version', kind: 'text', cell: ({ version }) => version },
    { key: 'saved', heading: 'Saved', kind: 'text', cell: ({ createdAt }) => formatInstant(createdAt) },
    { key: 'by', heading: 'By', kind: 'text', cell: ({ createdByName }) => createdByName },
    {
      key: 'export',
      heading: 'File',
      kind: 'text',
      cell: (version) => (
        <Button
          size="small"
          appearance="subtle"
          icon={<ArrowDownloadRegular />}
          aria-label={`Export version ${version.version}`}
          onClick={() => {
            fetchExport.mutate(version);
          }}
        >
          Export
        </Button>
      ),
    },
  ];
  return (
    <Section title="Versions">
      {fetchExport.isError && <ErrorState what="The version was not exported." error={fetchExport.error} />}
      {versions.isPending && <LoadingState label="Loading the versions" height={120} />}
      {versions.isError && (
        <ErrorState
          what="The versions could not be loaded."
          error={versions.error}
          onRetry={() => {
            void versions.refetch();
          }}
        />
      )}
      {versions.data && (
        <>
          <NumberTable
            caption="Versions, the newest first"
            captionHidden
            columns={columns}
            rows={versions.data.items}
            rowKey={({ id }) => id}
          />
          <Pager
            label="Pages of versions"
            page={page}
            pageSize={VERSIONS_ON_A_PAGE}
            total={versions.data.total}
            onPage={setPage}
          />
        </>
      )}
    </Section>
  );
}
