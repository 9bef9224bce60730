import { Button, InfoLabel, makeStyles, mergeClasses, tokens } from '@fluentui/react-components';
import { AddRegular, DeleteRegular } from '@fluentui/react-icons';
import type { ScenarioField } from '@noonwell/schema';
import { useRef, useState, type ClipboardEvent } from 'react';
import { useFieldArray, useFormContext } from 'react-hook-form';
import { formatPlural } from '../../../shared/format/number.js';
import { formPath } from '../model/form-values.js';
import { cellsOf, readHorizonTable, withoutHeading } from '../model/table-text.js';
import { formatRange } from './format-range.js';
import { HorizonChart } from './horizon-chart.js';
import { TableCell } from './table-cell.js';
import { TextFileButton } from './text-file-button.js';

const useStyles = makeStyles({
  root: { border: 'none', margin: 0, padding: 0, minWidth: 0, gridColumn: '1 / -1' },
  legend: { padding: 0, marginBottom: '2px' },
  hint: { margin: '0 0 6px', color: tokens.colorNeutralForeground3, fontSize: tokens.fontSizeBase200 },
  scroll: { maxHeight: '360px', overflowY: 'auto', maxWidth: '480px', marginBottom: '8px' },
  table: { width: '100%', borderCollapse: 'collapse', tableLayout: 'fixed' },
  head: {
    position: 'sticky',
    top: 0,
    zIndex: 1,
    padding: '2px 4px',
    textAlign: 'start',
    fontWeight: tokens.fontWeightRegular,
    fontSize: tokens.fontSizeBase200,
    backgroundColor: tokens.colorNeutralBackground1,
  },
  remove: { width: '40px' },
  cell: { padding: '2px 4px', verticalAlign: 'top' },
  buttons: { display: 'flex', flexWrap: 'wrap', gap: '8px' },
  note: { margin: '6px 0 0', fontSize: tokens.fontSizeBase200 },
  error: { color: tokens.colorPaletteRedForeground1 },
});

/** The field whose pairs can also come out of a file, and are drawn. */
const HORIZON = 'place.horizon';

interface Note {
  readonly text: string;
  readonly error: boolean;
}

/** A table of any length: rows are added, removed, pasted from a spreadsheet, and for the horizon read from a file. */
export function TableField({ field, readOnly }: { field: ScenarioField; readOnly: boolean }) {
  const styles = useStyles();
  const name = formPath(field.path);
  const { getValues, trigger } = useFormContext();
  const { fields: rows, append, remove, replace } = useFieldArray({ name });
  const [note, setNote] = useState<Note | null>(null);
  const addButton = useRef<HTMLButtonElement>(null);
  const columns = (field.columns ?? []).map((column) => ({
    ...column,
    key: column.path.slice(column.path.lastIndexOf('.') + 1),
  }));
  const mostRows = field.mostRows ?? 0;
  const isHorizon = field.path === HORIZON;

  const rowOf = (cells: readonly string[], before: Readonly<Record<string, string>> = {}) =>
    Object.fromEntries(columns.map(({ key }, at) => [key, cells[at] ?? before[key] ?? '']));
  const put = (next: readonly Record<string, string>[], text: string) => {
    replace([...next]);
    setNote({ text, error: false });
    void trigger(name);
  };

  const paste = (row: number, column: number, event: ClipboardEvent<HTMLElement>) => {
    const pasted = cellsOf(event.clipboardData.getData('text/plain'));
    const cells = columns.some(({ kind }) => kind === 'monthDay') ? pasted : withoutHeading(pasted);
    if (cells.length < 2 && (cells[0]?.length ?? 0) < 2) return;
    event.preventDefault();
    const next = [...((getValues(name) as Record<string, string>[] | undefined) ?? [])];
    const fitting = cells.slice(0, mostRows - row);
    fitting.forEach((line, offset) => {
      const shifted = [...Array<string>(column), ...line];
      next[row + offset] = rowOf(shifted, next[row + offset]);
    });
    const dropped = cells.length - fitting.length;
    put(
      next,
      `${formatPlural(fitting.length, 'row', 'rows')} pasted from row ${row + 1} on.${
        dropped > 0 ? ` ${formatPlural(dropped, 'row', 'rows')} more than fit were left out.` : ''
      }`,
    );
  };

  const readFile = (text: string, file: string) => {
    const table = readHorizonTable(
      text,
      columns.map(({ label }) => label),
      mostRows,
    );
    if (!table.ok) {
      setNote({ text: `${file} was not read, and nothing was changed. ${table.problem}`, error: true });
      return;
    }
    put(
      table.rows.map((cells) => rowOf(cells)),
      `${formatPlural(table.rows.length, 'pair', 'pairs')} read from ${file}, in place of what stood here.`,
    );
  };

  return (
    <fieldset className={styles.root}>
      <legend className={styles.legend}>
        <InfoLabel
          info={[
            field.help,
            ...columns.map(({ label, help }) => `${label}: ${help}`),
            `Source: ${field.source}`,
          ].join(' ')}
        >
          {field.label}
        </InfoLabel>
      </legend>
      <p className={styles.hint}>
        {rows.length === 0 && (isHorizon ? 'None: a level horizon. ' : 'None. ')}
        {isHorizon
          ? columns.map((column) => `${column.label}: ${formatRange(column) ?? ''}`).join('; ')
          : 'Month and day: 03-01 is 1 March'}
        . {`At most ${mostRows} rows`}
        {readOnly ? '.' : '; cells of a spreadsheet can be pasted into any row.'}
      </p>
      {rows.length > 0 && (
        <div className={styles.scroll} role="region" aria-label={`Rows of ${field.label}`} tabIndex={0}>
          <table className={styles.table}>
            <thead>
              <tr>
                {columns.map(({ key, label, unit }) => (
                  <th key={key} scope="col" className={styles.head}>
                    {unit === '' ? label : `${label} [${unit}]`}
                  </th>
                ))}
                {!readOnly && <td className={mergeClasses(styles.head, styles.remove)} />}
              </tr>
            </thead>
            <tbody>
              {rows.map(({ id }, row) => (
                <tr key={id}>
                  {columns.map(({ key, label, kind }, column) => (
                    <td key={key} className={styles.cell}>
                      <TableCell
                        name={`${name}.${row}.${key}`}
                        label={`${label}, row ${row + 1}`}
                        numeric={kind !== 'monthDay'}
                        readOnly={readOnly}
                        onPaste={(event) => {
                          if (!readOnly) paste(row, column, event);
                        }}
                      />
                    </td>
                  ))}
                  {!readOnly && (
                    <td className={styles.cell}>
                      <Button
                        size="small"
                        appearance="subtle"
                        icon={<DeleteRegular />}
                        aria-label={`Remove row ${row + 1}`}
                        onClick={() => {
                          remove(row);
                          setNote(null);
                          addButton.current?.focus();
                          void trigger(name);
                        }}
                      />
                    </td>
                  )}
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      {!readOnly && (
        <div className={styles.buttons}>
          <Button
            ref={addButton}
            size="small"
            icon={<AddRegular />}
            disabledFocusable={rows.length >= mostRows}
            onClick={() => {
              append(rowOf([]));
              setNote(null);
            }}
          >
            Add a row
          </Button>
          {isHorizon && (
            <TextFileButton
              label="Read a CSV file"
              onText={readFile}
              onProblem={(text) => {
                setNote({ text, error: true });
              }}
            />
          )}
        </div>
      )}
      <p
        className={mergeClasses(styles.note, note?.error === true && styles.error)}
        role={note?.error === true ? 'alert' : 'status'}
      >
        {note?.text}
      </p>
      {isHorizon && <HorizonChart name={name} />}
    </fieldset>
  );
}
