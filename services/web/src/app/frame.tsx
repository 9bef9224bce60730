import { makeStyles, tokens } from '@fluentui/react-components';
import { useEffect } from 'react';
import { NavLink, Outlet, useLocation, useNavigate, useNavigation } from 'react-router-dom';
import { signInAddress } from '../shared/api/return-address.js';
import { useSession } from '../shared/api/session.js';
import { AccountMenu } from './account-menu.js';
import { NavigationProgress } from './navigation-progress.js';

const MAIN_ID = 'main';

const useStyles = makeStyles({
  root: {
    minHeight: '100vh',
    display: 'flex',
    flexDirection: 'column',
    backgroundColor: tokens.colorNeutralBackground2,
  },
  skip: {
    position: 'absolute',
    insetInlineStart: '8px',
    top: '-60px',
    zIndex: 10,
    padding: '8px 12px',
    backgroundColor: tokens.colorNeutralBackground1,
    color: tokens.colorBrandForegroundLink,
    ':focus': { top: '8px' },
  },
  bar: {
    display: 'flex',
    flexWrap: 'wrap',
    alignItems: 'stretch',
    columnGap: '24px',
    paddingInline: '24px',
    backgroundColor: tokens.colorNeutralBackground1,
    borderBottom: `1px solid ${tokens.colorNeutralStroke2}`,
    '@media (max-width: 639px)': { paddingInline: '12px', columnGap: '8px' },
  },
  brand: {
    display: 'flex',
    alignItems: 'center',
    gap: '8px',
    height: '48px',
    fontWeight: tokens.fontWeightBold,
    fontSize: tokens.fontSizeBase400,
    color: tokens.colorNeutralForeground1,
    textDecorationLine: 'none',
  },
  // On a phone the mark stands alone; its name stays for screen readers.
  brandName: {
    '@media (max-width: 479px)': {
      position: 'absolute',
      width: '1px',
      height: '1px',
      overflow: 'hidden',
      clipPath: 'inset(50%)',
    },
  },
  nav: { display: 'flex', alignItems: 'stretch', gap: '4px' },
  link: {
    display: 'flex',
    alignItems: 'center',
    minHeight: '44px',
    paddingInline: '12px',
    color: tokens.colorNeutralForeground2,
    textDecorationLine: 'none',
    borderBottom: '3px solid transparent',
    borderTop: '3px solid transparent',
    ':hover': { color: tokens.colorNeutralForeground1, backgroundColor: tokens.colorSubtleBackgroundHover },
    '&[aria-current="page"]': {
      color: tokens.colorNeutralForeground1,
      fontWeight: tokens.fontWeightBold,
      borderBottomColor: tokens.colorCompoundBrandStroke,
    },
  },
  account: { marginInlineStart: 'auto', display: 'flex', alignItems: 'center' },
  main: {
    flexGrow: 1,
    width: '100%',
    maxWidth: '1440px',
    boxSizing: 'border-box',
    margin: '0 auto',
    padding: '24px',
    '@media (max-width: 639px)': { padding: '16px 12px' },
  },
  caution: {
    padding: '12px 24px',
    color: tokens.colorNeutralForeground3,
    fontSize: tokens.fontSizeBase200,
    '@media (max-width: 639px)': { paddingInline: '12px' },
  },
});

/** Around every page of the workspace: where one can go, who one is, and the way out. */
export default function Frame() {
  const styles = useStyles();
  const session = useSession();
  const navigate = useNavigate();
  const navigation = useNavigation();
  const { pathname, search } = useLocation();

  // The session can end while a page is open (signed out in another tab, cookie run out).
  useEffect(() => {
    if (session.status === 'signedOut') void navigate(signInAddress({ pathname, search }), { replace: true });
  }, [session.status, navigate, pathname, search]);

  if (session.status !== 'signedIn') return null;
  return (
    <div className={styles.root}>
      <a href={`#${MAIN_ID}`} className={styles.skip}>
        Skip to the content
      </a>
      <header className={styles.bar}>
        <NavLink to="/studies" className={styles.brand} end>
          <img src="/icon.svg" alt="" width={24} height={24} />
          <span className={styles.brandName}>Noonwell</span>
        </NavLink>
        <nav className={styles.nav} aria-label="Main">
          <NavLink to="/studies" className={styles.link}>
            Studies
          </NavLink>
          <NavLink to="/weather" className={styles.link}>
            Weather
          </NavLink>
        </nav>
        <div className={styles.account}>
          <AccountMenu me={session.me} />
        </div>
      </header>
      <NavigationProgress active={navigation.state === 'loading'} />
      <main id={MAIN_ID} className={styles.main} tabIndex={-1}>
        <Outlet />
      </main>
    </div>
  );
}
