import type { RouteKey } from '@noonwell/schema';
import { requestRaw, type RouteCall } from './client.js';
import { ContractError } from './problem.js';

const ARROW_TYPE = 'application/vnd.apache.arrow.stream';

/** Numeric columns by name, as typed arrays that charts take without copying. */
export type Columns = ReadonlyMap<string, Float64Array | Float32Array>;

type ColumnsRoute = Extract<RouteKey, `GET ${string}/columns`>;

/** Fetches hourly columns as an Arrow stream; the reader is loaded with the first one. */
export async function requestColumns(route: ColumnsRoute, call: RouteCall<ColumnsRoute>): Promise<Columns> {
  const [response, { tableFromIPC }] = await Promise.all([
    requestRaw(route, { ...call, headers: { accept: `${ARROW_TYPE}, application/problem+json` } }),
    import('apache-arrow'),
  ]);
  try {
    const table = tableFromIPC(new Uint8Array(await response.arrayBuffer()));
    return new Map(
      table.schema.fields.map(({ name }) => [name, toFloats(table.getChild(name)?.toArray())] as const),
    );
  } catch (error) {
    throw new ContractError(route, error);
  }
}

/** @throws ContractError when the server left a column out */
export function columnOf(columns: Columns, name: string): Float64Array | Float32Array {
  const column = columns.get(name);
  if (column === undefined) throw new ContractError(`column ${name}`, null);
  return column;
}

function toFloats(values: unknown): Float64Array | Float32Array {
  if (values instanceof Float64Array || values instanceof Float32Array) return values;
  if (values instanceof BigInt64Array || values instanceof BigUint64Array)
    return Float64Array.from(values, Number);
  if (ArrayBuffer.isView(values) && !(values instanceof DataView)) {
    return Float64Array.from(values as Int32Array);
  }
  throw new TypeError('the column is not numeric');
}
