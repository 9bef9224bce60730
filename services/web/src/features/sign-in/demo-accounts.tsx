import { Button, makeStyles, Spinner, tokens } from '@fluentui/react-components';
import { ROLE_LABELS } from '@noonwell/schema';
import { useMutation, useQuery } from '@tanstack/react-query';
import { demoAccountsQuery, demoSignIn } from '../../shared/api/auth.js';
import { ErrorState } from '../../shared/components/error-state.js';
import { LoadingState } from '../../shared/components/loading-state.js';
import { Section } from '../../shared/components/section.js';

const useStyles = makeStyles({
  text: { margin: '0 0 12px', color: tokens.colorNeutralForeground2, maxWidth: '60ch' },
  list: { listStyleType: 'none', margin: 0, padding: 0, display: 'grid', gap: '8px' },
  button: {
    width: '100%',
    justifyContent: 'flex-start',
    textAlign: 'start',
    padding: '10px 14px',
    gap: '12px',
  },
  words: { display: 'grid', minWidth: 0 },
  role: { fontWeight: tokens.fontWeightBold },
  purpose: { fontWeight: tokens.fontWeightRegular, color: tokens.colorNeutralForeground2 },
});

/** One button a role of the demo workspace, with what that person comes to do. Only where the server offers it. */
export function DemoAccounts({ onSignedIn }: { onSignedIn: () => void }) {
  const styles = useStyles();
  const accounts = useQuery(demoAccountsQuery);
  const entering = useMutation({ mutationFn: demoSignIn, onSuccess: onSignedIn });
  if (accounts.isPending) return <LoadingState label="Looking for a demo workspace" height={320} />;
  if (accounts.isError) {
    return (
      <ErrorState
        what="Whether there is a demo workspace could not be found out."
        error={accounts.error}
        onRetry={() => void accounts.refetch()}
      />
    );
  }
  if (!accounts.data.enabled || accounts.data.roles.length === 0) return null;
  return (
    <Section title="Or look around the demo">
      <p className={styles.text}>
        {accounts.data.workspaceName ?? 'The demo workspace'} is invented, and so is its weather. Everybody
        who can open this address can change it: keep real data out of it.
      </p>
      {entering.isError && <ErrorState what="You are not signed in." error={entering.error} />}
      <ul className={styles.list}>
        {accounts.data.roles.map(({ role, name, purpose }) => {
          const busy = entering.isPending && entering.variables.role === role;
          return (
            <li key={role}>
              <Button
                className={styles.button}
                disabledFocusable={entering.isPending}
                icon={busy ? <Spinner size="tiny" /> : null}
                onClick={() => {
                  entering.mutate({ role });
                }}
              >
                <span className={styles.words}>
                  <span>
                    <span className={styles.role}>{ROLE_LABELS[role]}</span> · {name}
                  </span>
                  <span className={styles.purpose}>{purpose}</span>
                </span>
              </Button>
            </li>
          );
        })}
      </ul>
    </Section>
  );
}
