import { makeStyles, mergeClasses, tokens } from '@fluentui/react-components';
import type { ReactNode } from 'react';

const useStyles = makeStyles({
  scroll: {
    overflowX: 'auto',
    maxWidth: '100%',
    borderRadius: tokens.borderRadiusMedium,
    border: `1px solid ${tokens.colorNeutralStroke2}`,
    backgroundColor: tokens.colorNeutralBackground1,
    ':focus-visible': { outline: `2px solid ${tokens.colorStrokeFocus2}`, outlineOffset: '1px' },
  },
  tall: { overflowY: 'auto', maxHeight: '420px' },
  table: {
    width: '100%',
    borderCollapse: 'collapse',
    fontSize: tokens.fontSizeBase300,
    lineHeight: tokens.lineHeightBase300,
  },
  caption: {
    textAlign: 'start',
    padding: '8px 12px',
    color: tokens.colorNeutralForeground2,
    fontWeight: tokens.fontWeightBold,
  },
  hidden: {
    position: 'absolute',
    width: '1px',
    height: '1px',
    overflow: 'hidden',
    clipPath: 'inset(50%)',
    whiteSpace: 'nowrap',
  },
  head: {
    position: 'sticky',
    top: 0,
    backgroundColor: tokens.colorNeutralBackground3,
    padding: '6px 12px',
    fontWeight: tokens.fontWeightBold,
    verticalAlign: 'bottom',
    textAlign: 'start',
  },
  cell: {
    padding: '5px 12px',
    borderTop: `1px solid ${tokens.colorNeutralStroke3}`,
    textAlign: 'start',
    fontWeight: tokens.fontWeightRegular,
    verticalAlign: 'top',
  },
  text: { minWidth: '96px' },
  number: { textAlign: 'end', fontVariantNumeric: 'tabular-nums lining-nums', whiteSpace: 'nowrap' },
  unit: { display: 'block', color: tokens.colorNeutralForeground3, fontWeight: tokens.fontWeightRegular },
  strong: { fontWeight: tokens.fontWeightBold, borderTop: `2px solid ${tokens.colorNeutralStroke1}` },
});

export interface TableColumn<Row> {
  readonly key: string;
  readonly heading: ReactNode;
  /** Unit of the whole column; stands in the heading, never in the cells. "1" is not printed. */
  readonly unit?: string;
  /** "number": right-aligned tabular figures. The first column is the row's heading. */
  readonly kind: 'text' | 'number';
  readonly cell: (row: Row) => ReactNode;
}

interface NumberTableProps<Row> {
  caption: string;
  /** Keep the caption for screen readers only, where a heading above says the same. */
  captionHidden?: boolean;
  columns: readonly TableColumn<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** Rows that sum up others. */
  isTotal?: (row: Row) => boolean;
  /** Scrolls inside itself when it is long. */
  tall?: boolean;
}

/** A table of figures. It alone may scroll sideways on a narrow screen. */
export function NumberTable<Row>({
  caption,
  captionHidden = false,
  columns,
  rows,
  rowKey,
  isTotal,
  tall = false,
}: NumberTableProps<Row>) {
  const styles = useStyles();
  return (
    // Focusable, so that it can be scrolled with the keyboard.
    <div
      className={mergeClasses(styles.scroll, tall && styles.tall)}
      role="region"
      aria-label={caption}
      tabIndex={0}
    >
      <table className={styles.table}>
        <caption className={captionHidden ? styles.hidden : styles.caption}>{caption}</caption>
        <thead>
          <tr>
            {columns.map(({ key, heading, unit, kind }) => (
              <th
                key={key}
                scope="col"
                className={mergeClasses(styles.head, kind === 'number' ? styles.number : styles.text)}
              >
                {heading}
                {unit !== undefined && unit !== '1' && unit !== '' && (
                  <span className={styles.unit}>{unit}</span>
                )}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={rowKey(row)}>
              {columns.map(({ key, kind, cell }, index) => {
                const className = mergeClasses(
                  styles.cell,
                  kind === 'number' ? styles.number : styles.text,
                  isTotal?.(row) === true && styles.strong,
                );
                return index === 0 ? (
                  <th key={key} scope="row" className={className}>
                    {cell(row)}
                  </th>
                ) : (
                  <td key={key} className={className}>
                    {cell(row)}
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
