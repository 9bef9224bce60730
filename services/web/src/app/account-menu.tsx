import {
  Button,
  makeStyles,
  mergeClasses,
  Menu,
  MenuDivider,
  MenuGroup,
  MenuGroupHeader,
  MenuItem,
  MenuItemRadio,
  MenuList,
  MenuPopover,
  MenuTrigger,
  tokens,
} from '@fluentui/react-components';
import { ChevronDownRegular, SignOutRegular } from '@fluentui/react-icons';
import { ROLE_LABELS, type Me } from '@noonwell/schema';
import { useMutation } from '@tanstack/react-query';
import { signOut } from '../shared/api/auth.js';
import { setThemeChoice, THEME_CHOICES, useThemeChoice, type ThemeChoice } from '../shared/theme/mode.js';

const useStyles = makeStyles({
  button: { maxWidth: '60vw', minWidth: 0 },
  words: {
    display: 'grid',
    textAlign: 'end',
    lineHeight: tokens.lineHeightBase200,
    minWidth: 0,
    fontSize: tokens.fontSizeBase200,
  },
  cut: { overflow: 'hidden', textOverflow: 'ellipsis', whiteSpace: 'nowrap' },
  workspace: { fontWeight: tokens.fontWeightBold },
  // On a phone the role stands alone; the rest is in the menu.
  wide: { '@media (max-width: 639px)': { display: 'none' } },
  role: { color: tokens.colorNeutralForeground3, fontWeight: tokens.fontWeightRegular },
  person: { padding: '8px 12px', maxWidth: '280px', overflowWrap: 'anywhere' },
  mail: { color: tokens.colorNeutralForeground3, fontSize: tokens.fontSizeBase200 },
});

const themeLabels: Readonly<Record<ThemeChoice, string>> = {
  system: 'As the system',
  light: 'Light',
  dark: 'Dark',
};

/** Workspace and role in view; person, theme and sign-out behind them. */
export function AccountMenu({ me }: { me: Me }) {
  const styles = useStyles();
  const theme = useThemeChoice();
  const leave = useMutation({ mutationFn: signOut });
  return (
    <Menu
      checkedValues={{ theme: [theme] }}
      onCheckedValueChange={(_, { checkedItems }) => {
        const choice = THEME_CHOICES.find((item) => item === checkedItems[0]);
        if (choice !== undefined) setThemeChoice(choice);
      }}
    >
      <MenuTrigger disableButtonEnhancement>
        <Button
          appearance="subtle"
          className={styles.button}
          icon={<ChevronDownRegular />}
          iconPosition="after"
        >
          <span className={styles.words}>
            <span className={mergeClasses(styles.cut, styles.workspace, styles.wide)}>
              {me.workspace.name}
            </span>
            <span className={mergeClasses(styles.cut, styles.role)}>
              <span className={styles.wide}>{me.user.name} · </span>
              {ROLE_LABELS[me.role]}
            </span>
          </span>
        </Button>
      </MenuTrigger>
      <MenuPopover>
        <div className={styles.person}>
          <strong>{me.workspace.name}</strong>
          <div>
            {me.user.name}, {ROLE_LABELS[me.role]}
          </div>
          <div className={styles.mail}>{me.user.email}</div>
        </div>
        <MenuDivider />
        <MenuList>
          <MenuGroup>
            <MenuGroupHeader>Colours</MenuGroupHeader>
            {THEME_CHOICES.map((choice) => (
              <MenuItemRadio key={choice} name="theme" value={choice} persistOnClick>
                {themeLabels[choice]}
              </MenuItemRadio>
            ))}
          </MenuGroup>
          <MenuDivider />
          <MenuItem
            icon={<SignOutRegular />}
            onClick={() => {
              leave.mutate();
            }}
          >
            Sign out
          </MenuItem>
        </MenuList>
      </MenuPopover>
    </Menu>
  );
}
