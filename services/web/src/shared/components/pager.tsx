import { Button, makeStyles, tokens } from '@fluentui/react-components';
import { ChevronLeftRegular, ChevronRightRegular } from '@fluentui/react-icons';
import { formatCount } from '../format/number.js';

const useStyles = makeStyles({
  root: { display: 'flex', alignItems: 'center', gap: '8px', flexWrap: 'wrap', marginTop: '12px' },
  text: { color: tokens.colorNeutralForeground3 },
});

interface PagerProps {
  /** What is listed, for the screen reader: "Pages of studies". */
  label: string;
  page: number;
  pageSize: number;
  total: number;
  onPage: (page: number) => void;
}

/** Pages of a list; nothing where everything stands on one page. */
export function Pager({ label, page, pageSize, total, onPage }: PagerProps) {
  const styles = useStyles();
  const last = Math.max(1, Math.ceil(total / pageSize));
  if (last === 1 && page === 1) return null;
  const first = (page - 1) * pageSize + 1;
  return (
    <nav aria-label={label} className={styles.root}>
      <Button
        icon={<ChevronLeftRegular />}
        disabled={page <= 1}
        onClick={() => {
          onPage(page - 1);
        }}
      >
        Previous
      </Button>
      <span className={styles.text} role="status">
        {first > total
          ? `Nothing on page ${formatCount(page)}`
          : `${formatCount(first)} to ${formatCount(Math.min(total, page * pageSize))} of ${formatCount(total)}`}
      </span>
      <Button
        icon={<ChevronRightRegular />}
        iconPosition="after"
        disabled={page >= last}
        onClick={() => {
          onPage(page + 1);
        }}
      >
        Next
      </Button>
    </nav>
  );
}
