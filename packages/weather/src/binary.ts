import { WEATHER_CHANNELS, type WeatherChannel, type WeatherYear } from '@noonwell/engine';

/**
 * A weather year as bytes for storage: little-endian, versioned, closed by a checksum, exact.
 *
 *   "NWY1" | u32 version | 4 × f64 place | u32 interval min | u32 first weekday | u32 records
 *   | start times | 7 channels in the order of WEATHER_CHANNELS | u16 flags each | u32 checksum of all before
 *
 * Start times are runs (u32 count, then f64 first start and u32 records of each), since a typical year has
 * about twelve. A channel is a u32 kind and its values: kind 0 is f64; kind s > 0 is i32 of value × s, taken
 * only where dividing by s gives back every value exactly.
 */
const MAGIC = 0x3159574e;
const VERSION = 1;
const SCALES = [1, 10, 100, 1000];
const PLAIN = 0;
const CHECKSUM_BYTES = 4;
/** A year of minutes has 527 040 records. */
const MOST_RECORDS = 600_000;

/** Stored bytes are not a weather year that this version can read: damaged, cut or from a later version. */
export class WeatherDecodeError extends Error {
  override readonly name = 'WeatherDecodeError';
}

/** Exact, compact bytes of a weather year. @throws RangeError when the columns differ in length */
export function encodeWeatherYear(year: WeatherYear): Uint8Array {
  const records = year.startLocalMs.length;
  const columns = WEATHER_CHANNELS.map((channel) => year[channel]);
  if (records > MOST_RECORDS || [...columns, year.flags].some((column) => column.length !== records)) {
    throw new RangeError(`a weather year needs columns of one length, at most ${MOST_RECORDS} records`);
  }
  const runs = runsOf(year.startLocalMs, year.intervalMinutes * 60_000);
  const scales = columns.map(scaleOf);
  const size =
    4 * 2 +
    8 * 4 +
    4 * 3 +
    4 +
    runs.length * 12 +
    records * 2 +
    4 +
    scales.reduce((sum, scale) => sum + 4 + records * (scale === PLAIN ? 8 : 4), 0);
  const bytes = new Uint8Array(size);
  const out = new Cursor(bytes);
  out.putU32(MAGIC);
  out.putU32(VERSION);
  for (const value of [year.latitudeDeg, year.longitudeDeg, year.altitudeM, year.utcOffsetHours])
    out.putF64(value);
  for (const value of [year.intervalMinutes, year.firstWeekday, records, runs.length]) out.putU32(value);
  for (const run of runs) {
    out.putF64(run.firstMs);
    out.putU32(run.count);
  }
  columns.forEach((column, at) => {
    const scale = scales[at]!;
    out.putU32(scale);
    for (const value of column) {
      if (scale === PLAIN) out.putF64(value);
      else out.putI32(Math.round(value * scale));
    }
  });
  for (const value of year.flags) out.putU16(value);
  out.putU32(checksum(bytes.subarray(0, out.at)));
  return bytes;
}

/** The year that `encodeWeatherYear` stored. @throws WeatherDecodeError on anything else */
export function decodeWeatherYear(bytes: Uint8Array): WeatherYear {
  if (bytes.length < 64)
    throw new WeatherDecodeError(`the stored weather year has only ${bytes.length} bytes`);
  const input = new Cursor(bytes);
  if (input.getU32() !== MAGIC) throw new WeatherDecodeError('the stored bytes are not a weather year');
  const version = input.getU32();
  if (version !== VERSION)
    throw new WeatherDecodeError(
      `the stored weather year has version ${version}; version ${VERSION} is read`,
    );
  const stored = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength).getUint32(
    bytes.length - CHECKSUM_BYTES,
    true,
  );
  if (stored !== checksum(bytes.subarray(0, bytes.length - CHECKSUM_BYTES))) {
    throw new WeatherDecodeError('the stored weather year is damaged: its checksum does not fit');
  }
  try {
    return readBody(input);
  } catch (error) {
    if (error instanceof WeatherDecodeError) throw error;
    throw new WeatherDecodeError('the stored weather year is cut short');
  }
}

function readBody(input: Cursor): WeatherYear {
  const [latitudeDeg, longitudeDeg, altitudeM, utcOffsetHours] = [
    input.getF64(),
    input.getF64(),
    input.getF64(),
    input.getF64(),
  ];
  const [intervalMinutes, firstWeekday, records, runCount] = [
    input.getU32(),
    input.getU32(),
    input.getU32(),
    input.getU32(),
  ];
  if (records > MOST_RECORDS || runCount > records)
    throw new WeatherDecodeError('the stored weather year states an impossible length');
  const startLocalMs = new Float64Array(records);
  let filled = 0;
  for (let run = 0; run < runCount; run += 1) {
    const firstMs = input.getF64();
    const count = input.getU32();
    if (filled + count > records)
      throw new WeatherDecodeError('the stored start times do not fit the record count');
    for (let at = 0; at < count; at += 1) startLocalMs[filled + at] = firstMs + at * intervalMinutes * 60_000;
    filled += count;
  }
  if (filled !== records) throw new WeatherDecodeError('the stored start times do not fit the record count');
  const channel = (): Float64Array => {
    const scale = input.getU32();
    return Float64Array.from({ length: records }, () =>
      scale === PLAIN ? input.getF64() : input.getI32() / scale,
    );
  };
  const empty = new Float64Array(0);
  const channels: Record<WeatherChannel, Float64Array> = {
    dniWm2: empty,
    ghiWm2: empty,
    dhiWm2: empty,
    dryBulbC: empty,
    windMs: empty,
    relativeHumidityPct: empty,
    pressurePa: empty,
  };
  for (const name of WEATHER_CHANNELS) channels[name] = channel();
  const flags = Uint16Array.from({ length: records }, () => input.getU16());
  if (input.at !== input.length - CHECKSUM_BYTES)
    throw new WeatherDecodeError('the stored weather year has bytes left over');
  return {
    latitudeDeg,
    longitudeDeg,
    altitudeM,
    utcOffsetHours,
    intervalMinutes,
    firstWeekday,
    startLocalMs,
    ...channels,
    flags,
  };
}

interface Run {
  firstMs: number;
  count: number;
}

/** Start times as runs of records that follow each other without a jump. */
function runsOf(startLocalMs: Float64Array, intervalMs: number): Run[] {
  const runs: Run[] = [];
  for (const start of startLocalMs) {
    const run = runs.at(-1);
    if (run !== undefined && start === run.firstMs + run.count * intervalMs) run.count += 1;
    else runs.push({ firstMs: start, count: 1 });
  }
  return runs;
}

/** The smallest scale at which whole numbers give back every value exactly; PLAIN where none does. */
function scaleOf(column: Float64Array): number {
  const fits = (scale: number) =>
    column.every((value) => {
      const whole = Math.round(value * scale);
      return whole === (whole | 0) && Object.is(whole / scale, value);
    });
  return SCALES.find(fits) ?? PLAIN;
}

/** FNV-1a, 32 bit. Source: Fowler, Noll & Vo, public domain. */
function checksum(bytes: Uint8Array): number {
  let hash = 0x811c9dc5;
  for (const byte of bytes) hash = Math.imul(hash ^ byte, 0x01000193);
  return hash >>> 0;
}

/** Writes and reads little-endian numbers one after another. */
class Cursor {
  at = 0;
  readonly length: number;
  private readonly view: DataView;

  constructor(bytes: Uint8Array) {
    this.view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
    this.length = bytes.byteLength;
  }

  private advance(size: number): number {
    const at = this.at;
    this.at += size;
    return at;
  }

  putU16(value: number): void {
    this.view.setUint16(this.advance(2), value, true);
  }
  putU32(value: number): void {
    this.view.setUint32(this.advance(4), value, true);
  }
  putI32(value: number): void {
    this.view.setInt32(this.advance(4), value, true);
  }
  putF64(value: number): void {
    this.view.setFloat64(this.advance(8), value, true);
  }
  getU16(): number {
    return this.view.getUint16(this.advance(2), true);
  }
  getU32(): number {
    return this.view.getUint32(this.advance(4), true);
  }
  getI32(): number {
    return this.view.getInt32(this.advance(4), true);
  }
  getF64(): number {
    return this.view.getFloat64(this.advance(8), true);
  }
}
