import { makeStyles } from '@fluentui/react-components';
import { useLocation } from 'react-router-dom';
import { EmptyState } from '../shared/components/empty-state.js';
import { PageHeader } from '../shared/components/page-header.js';
import { LinkButton } from '../shared/components/router-link.js';

const useStyles = makeStyles({ root: { padding: '24px', maxWidth: '800px', margin: '0 auto' } });

export default function NotFoundPage() {
  const styles = useStyles();
  const { pathname } = useLocation();
  return (
    <main className={styles.root}>
      <PageHeader title="No such page" />
      <EmptyState
        title={`Nothing stands at ${pathname}`}
        action={
          <LinkButton to="/studies" appearance="primary">
            Go to the studies
          </LinkButton>
        }
      >
        The address may be mistyped, or the link may be older than this version of Noonwell.
      </EmptyState>
    </main>
  );
}
