import { makeStyles, MessageBar, MessageBarBody, MessageBarTitle } from '@fluentui/react-components';
import type { PlaceOfError } from '../../shared/api/problem.js';
import { NumberTable, type TableColumn } from '../../shared/components/number-table.js';
import { formatCount, formatPlural, NO_VALUE } from '../../shared/format/number.js';

const useStyles = makeStyles({
  root: { display: 'grid', gap: '12px', gridTemplateColumns: 'minmax(0, 1fr)' },
  body: { whiteSpace: 'normal', paddingBottom: '8px', overflowWrap: 'anywhere' },
  reason: { minWidth: '220px', display: 'block' },
});

const columns: readonly TableColumn<PlaceOfError>[] = [
  {
    key: 'line',
    heading: 'Line',
    kind: 'number',
    cell: ({ line }) => (line == null ? NO_VALUE : formatCount(line)),
  },
  {
    key: 'column',
    heading: 'Column',
    kind: 'text',
    cell: ({ column, columnName }) =>
      [column, columnName].filter((part) => part != null).join(' · ') || 'Whole file',
  },
  { key: 'value', heading: 'Stands there', kind: 'text', cell: ({ value }) => value ?? NO_VALUE },
  {
    key: 'reason',
    heading: 'Why it cannot stay',
    kind: 'text',
    cell: ({ reason }) => <Words>{reason}</Words>,
  },
  { key: 'fix', heading: 'What to do', kind: 'text', cell: ({ fix }) => <Words>{fix ?? NO_VALUE}</Words> },
];

function Words({ children }: { children: string }) {
  return <span className={useStyles().reason}>{children}</span>;
}

interface ProblemTableProps {
  fileName: string;
  problems: readonly PlaceOfError[];
  /** All that were found, listed or not. */
  problemCount: number;
}

/** Why a file is refused: place, value, reason and remedy of each fault. */
export function ProblemTable({ fileName, problems, problemCount }: ProblemTableProps) {
  const styles = useStyles();
  return (
    <div className={styles.root}>
      <MessageBar intent="error" layout="multiline" role="alert">
        <MessageBarBody className={styles.body}>
          <MessageBarTitle>"{fileName}" was refused; nothing was saved.</MessageBarTitle>
          {formatPlural(problemCount, 'fault stands', 'faults stand')} in its way
          {problemCount > problems.length && `; the first ${formatCount(problems.length)} are listed`}. Mend
          the file as the table says and choose it again.
        </MessageBarBody>
      </MessageBar>
      <NumberTable
        caption={`Faults of ${fileName}`}
        captionHidden
        columns={columns}
        rows={problems}
        rowKey={(problem) => String(problems.indexOf(problem))}
      />
    </div>
  );
}
