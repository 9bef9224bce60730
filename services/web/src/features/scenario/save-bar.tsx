import { Button, makeStyles, Spinner, tokens } from '@fluentui/react-components';
import { ArrowResetRegular, SaveRegular } from '@fluentui/react-icons';

const useStyles = makeStyles({
  root: {
    position: 'sticky',
    bottom: 0,
    zIndex: 2,
    display: 'flex',
    flexWrap: 'wrap',
    alignItems: 'center',
    gap: '8px 16px',
    padding: '10px 16px',
    marginBottom: '24px',
    backgroundColor: tokens.colorNeutralBackground1,
    border: `1px solid ${tokens.colorNeutralStroke1}`,
    borderRadius: tokens.borderRadiusMedium,
    boxShadow: tokens.shadow8,
  },
  state: { flex: '1 1 160px', color: tokens.colorNeutralForeground2 },
});

interface SaveBarProps {
  version: number;
  dirty: boolean;
  saving: boolean;
  onDiscard: () => void;
}

/** Always in sight: whether something is unsaved, and how to save it. */
export function SaveBar({ version, dirty, saving, onDiscard }: SaveBarProps) {
  const styles = useStyles();
  return (
    <div className={styles.root}>
      <span className={styles.state} role="status">
        {dirty ? 'Unsaved changes' : `Version ${version} is saved`}
      </span>
      <Button icon={<ArrowResetRegular />} disabled={!dirty || saving} onClick={onDiscard}>
        Discard changes
      </Button>
      <Button
        type="submit"
        appearance="primary"
        icon={saving ? <Spinner size="tiny" /> : <SaveRegular />}
        disabledFocusable={!dirty || saving}
      >
        Save as version {version + 1}
      </Button>
    </div>
  );
}
