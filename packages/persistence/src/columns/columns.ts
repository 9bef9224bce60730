import {
  Field,
  Float64,
  RecordBatch,
  Schema,
  Struct,
  Table,
  makeData,
  tableFromIPC,
  tableToIPC,
} from 'apache-arrow';

/** A named series of numbers as it travels and is stored. */
export interface NumberColumn {
  readonly key: string;
  /** As people write it, "W" or "°C"; kept in the field's metadata. */
  readonly unit: string;
  readonly values: Float64Array;
}

/** Media type of an Arrow IPC stream. */
export const ARROW_STREAM_TYPE = 'application/vnd.apache.arrow.stream';

/** Stored columns cannot be given: damaged, or a column is asked for that they do not hold. */
export class ColumnsError extends Error {
  override readonly name = 'ColumnsError';
}

/** Columns of one length as the bytes of an Arrow IPC stream; every value is kept exactly. */
export function encodeColumns(columns: readonly NumberColumn[]): Uint8Array {
  const length = columns[0]?.values.length ?? 0;
  const odd = columns.find((column) => column.values.length !== length);
  if (odd !== undefined) {
    throw new ColumnsError(
      `Column ${odd.key} has ${String(odd.values.length)} values; the others have ${String(length)}.`,
    );
  }
  const schema = new Schema(
    columns.map(({ key, unit }) => new Field(key, new Float64(), false, new Map([['unit', unit]]))),
  );
  const batch = new RecordBatch(
    schema,
    makeData({
      type: new Struct(schema.fields),
      length,
      nullCount: 0,
      children: columns.map(({ values }) => makeData({ type: new Float64(), data: values })),
    }),
  );
  return tableToIPC(new Table(schema, batch), 'stream');
}

/** Keys of the stored columns, in their order. */
export function columnKeys(bytes: Uint8Array): string[] {
  return readTable(bytes).schema.fields.map((field) => field.name);
}

/** The same stream with only the named columns, in the order they are named. */
export function selectColumns(bytes: Uint8Array, keys: readonly string[]): Uint8Array {
  const table = readTable(bytes);
  const held = new Set(table.schema.fields.map((field) => field.name));
  const missing = keys.find((key) => !held.has(key));
  if (missing !== undefined) throw new ColumnsError(`There is no column "${missing}" in this result.`);
  return tableToIPC(table.select([...keys]), 'stream');
}

function readTable(bytes: Uint8Array): Table {
  try {
    return tableFromIPC(bytes);
  } catch (cause) {
    throw new ColumnsError('The stored columns are damaged.', { cause });
  }
}
