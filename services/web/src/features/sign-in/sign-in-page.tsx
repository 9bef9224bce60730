import { makeStyles, tokens } from '@fluentui/react-components';
import { useCallback } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { returnAddress } from '../../shared/api/return-address.js';
import { PageHeader } from '../../shared/components/page-header.js';
import { DemoAccounts } from './demo-accounts.js';
import { SignInForm } from './sign-in-form.js';

const useStyles = makeStyles({
  root: {
    minHeight: '100vh',
    boxSizing: 'border-box',
    display: 'grid',
    justifyItems: 'center',
    alignContent: 'start',
    padding: '8vh 24px 24px',
    backgroundColor: tokens.colorNeutralBackground2,
    '@media (max-width: 639px)': { padding: '24px 12px' },
  },
  inner: { width: '100%', maxWidth: '920px', minWidth: 0 },
  brand: {
    display: 'flex',
    alignItems: 'center',
    gap: '10px',
    marginBottom: '24px',
    fontSize: tokens.fontSizeBase500,
    fontWeight: tokens.fontWeightBold,
  },
  columns: {
    display: 'grid',
    gridTemplateColumns: 'minmax(0, 360px) minmax(0, 1fr)',
    alignItems: 'start',
    gap: '32px',
    '@media (max-width: 767px)': { gridTemplateColumns: 'minmax(0, 1fr)', gap: '24px' },
  },
  card: {
    padding: '20px',
    backgroundColor: tokens.colorNeutralBackground1,
    border: `1px solid ${tokens.colorNeutralStroke2}`,
    borderRadius: tokens.borderRadiusLarge,
  },
  caution: {
    marginTop: '32px',
    maxWidth: '75ch',
    color: tokens.colorNeutralForeground3,
    fontSize: tokens.fontSizeBase200,
    lineHeight: tokens.lineHeightBase300,
  },
});

export default function SignInPage() {
  const styles = useStyles();
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const goOn = useCallback(() => {
    void navigate(returnAddress(search), { replace: true });
  }, [navigate, search]);
  return (
    <main className={styles.root}>
      <div className={styles.inner}>
        <div className={styles.brand}>
          <img src="/icon.svg" alt="" width={32} height={32} />
          Noonwell
        </div>
        <PageHeader title="Sign in" below="Heat and power from one dish, hour by hour." />
        <div className={styles.columns}>
          <div className={styles.card}>
            <SignInForm onSignedIn={goOn} />
          </div>
          <DemoAccounts onSignedIn={goOn} />
        </div>
        <p className={styles.caution}>
          Noonwell calculates; it does not measure. Concentrated sunlight burns and blinds, water and steam
          scald, and cells keep their voltage while the sun shines: build and operate a dish by your local
          codes and with people licensed for the work.
        </p>
      </div>
    </main>
  );
}
