import {
  extraterrestrialNormalWm2,
  WEATHER_CHANNELS,
  WEATHER_FLAG,
  type WeatherChannel,
} from '@noonwell/engine';
import { syntheticYear, tableColumn, tableFile, tableStatement, type RowDefect } from '@noonwell/testkit';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { LISTED_PROBLEMS } from '../limits.js';
import { readTable, type WeatherAccepted, type WeatherReadResult } from '../index.js';

const year = syntheticYear();
const statement = tableStatement(year);
const numRuns = Number(process.env['NOONWELL_TEST_COUNT'] ?? 40);
const seed = Number(process.env['NOONWELL_TEST_SEED'] ?? 20411);
/** 21 June, the hours from 11 to 14: a sunny noon of the invented year or not, the sun is high. */
const NOON = 171 * 24 + 11;
/** Rows begin in line 2. */
const lineOf = (row: number) => row + 2;

const read = (...defects: RowDefect[]) => readTable(tableFile(year, { defects }), statement);

function accepted(result: WeatherReadResult): WeatherAccepted {
  if (result.kind === 'refused') throw new Error(JSON.stringify(result.problems));
  return result;
}

const emptied = (channel: WeatherChannel, row: number, count: number, text = ''): RowDefect => ({
  kind: 'cell',
  row,
  column: tableColumn(channel),
  text,
  count,
});

describe('gaps of up to 3 h', () => {
  it('are filled by a straight line and marked', () => {
    const { year: filled, warnings, summary } = accepted(read(emptied('dryBulbC', NOON, 3, 'NaN')));
    const [before, after] = [year.dryBulbC[NOON - 1]!, year.dryBulbC[NOON + 3]!];
    [0, 1, 2].forEach((at) => {
      expect(filled.dryBulbC[NOON + at]).toBeCloseTo(before + ((after - before) * (at + 1)) / 4, 9);
      expect(filled.flags[NOON + at]).toBe(WEATHER_FLAG.filledDryBulb);
    });
    expect(summary.flaggedRecords).toBe(3);
    expect(warnings).toContainEqual(
      expect.stringMatching(/In 3 records the dry-bulb temperature was filled/),
    );
  });

  it('of all irradiances keep beam, diffuse and global light in agreement', () => {
    const result = accepted(
      read(emptied('dniWm2', NOON, 2), emptied('ghiWm2', NOON, 2), emptied('dhiWm2', NOON, 2)),
    );
    const { dniWm2, ghiWm2, dhiWm2, flags } = result.year;
    for (const at of [NOON, NOON + 1]) {
      // The cosine that closes the neighbour, an hour away at noon, closes the filled hour within a few percent.
      const near = at === NOON ? NOON - 1 : NOON + 2;
      const cosine = (year.ghiWm2[near]! - year.dhiWm2[near]!) / year.dniWm2[near]!;
      expect(year.dniWm2[near]).toBeGreaterThan(20);
      expect(Math.abs((ghiWm2[at]! - dhiWm2[at]!) / (dniWm2[at]! * cosine) - 1)).toBeLessThan(0.1);
      expect(dniWm2[at]).toBeLessThan(extraterrestrialNormalWm2(172));
      expect(flags[at]).toBe(WEATHER_FLAG.filledIrradiance);
    }
  });

  it('of irradiance at night are dark, and follow the sun at dawn rather than a straight line', () => {
    const midnight = 171 * 24;
    const night = accepted(read(emptied('ghiWm2', midnight, 3)));
    expect(Array.from(night.year.ghiWm2.subarray(midnight, midnight + 3))).toEqual([0, 0, 0]);
    const dawn = year.ghiWm2.findIndex((ghi, at) => at > midnight && ghi > 0);
    const filled = accepted(read(emptied('ghiWm2', dawn - 1, 3))).year.ghiWm2;
    expect(filled[dawn - 1]).toBe(0);
    expect(filled[dawn]).toBeGreaterThan(0);
    const straight = (year.ghiWm2[dawn + 2]! * 2) / 4;
    expect(filled[dawn]).toBeLessThan(straight);
  });

  it('of whole rows are filled in every channel, and the line before is named', () => {
    const { year: filled, warnings } = accepted(read({ kind: 'rowMissing', row: NOON, count: 3 }));
    expect(filled.startLocalMs).toEqual(year.startLocalMs);
    expect(WEATHER_CHANNELS.every((channel) => filled[channel].every(Number.isFinite))).toBe(true);
    expect(warnings).toContainEqual(`3 records are missing and were filled, after line ${lineOf(NOON - 1)}.`);
  });

  it('of pressure that are longer follow from the altitude', () => {
    const { year: filled } = accepted(read(emptied('pressurePa', NOON, 4)));
    expect(filled.flags[NOON]).toBe(WEATHER_FLAG.pressureFromAltitude);
    expect(Math.abs(filled.pressurePa[NOON]! / year.pressurePa[NOON]! - 1)).toBeLessThan(0.05);
  });
});

describe('what is refused', () => {
  it.each<[string, RowDefect, { line: number; column?: number; reason: RegExp }]>([
    [
      '4 h without temperature',
      emptied('dryBulbC', NOON, 4),
      { line: lineOf(NOON), column: tableColumn('dryBulbC'), reason: /missing for 4 hours/ },
    ],
    [
      '4 h without beam',
      emptied('dniWm2', NOON, 4, '-9999'),
      { line: lineOf(NOON), column: tableColumn('dniWm2'), reason: /missing for 4 hours/ },
    ],
    [
      '4 absent rows',
      { kind: 'rowMissing', row: NOON, count: 4 },
      {
        line: lineOf(NOON),
        reason: /4 records are missing, from 06-21 11:00 to 06-21 14:00 \(8756 rows, 8760 needed\)/,
      },
    ],
    [
      'rows that changed places',
      { kind: 'rowsSwapped', row: NOON },
      { line: lineOf(NOON + 1), reason: /earlier than the one before/ },
    ],
    [
      'a word',
      emptied('windMs', NOON, 1, 'calm'),
      { line: lineOf(NOON), column: tableColumn('windMs'), reason: /"calm" is not a number/ },
    ],
    [
      'negative irradiance',
      emptied('dniWm2', NOON, 1, '-20'),
      { line: lineOf(NOON), column: tableColumn('dniWm2'), reason: /-20 W\/m² is negative/ },
    ],
    [
      'a value out of range',
      emptied('pressurePa', NOON, 1, '990'),
      { line: lineOf(NOON), column: tableColumn('pressurePa'), reason: /990 Pa is out of range/ },
    ],
    [
      'a decimal comma among points',
      emptied('windMs', NOON, 1, '"3,2"'),
      { line: lineOf(NOON), column: tableColumn('windMs'), reason: /"3,2" is not a number/ },
    ],
    [
      'a label of another kind',
      { kind: 'cell', row: NOON, column: 1, text: '21 June, noon' },
      { line: lineOf(NOON), column: 1, reason: /no time label/ },
    ],
    [
      'a comment between the rows',
      { kind: 'lineInserted', row: NOON, line: 'sensor cleaned' },
      { line: lineOf(NOON), column: 1, reason: /no time label/ },
    ],
    [
      'a label off the grid',
      { kind: 'cell', row: NOON, column: 1, text: '2018-06-21 12:20' },
      { line: lineOf(NOON), reason: /does not lie 60 min/ },
    ],
    [
      'a file cut in a row',
      { kind: 'truncated', row: NOON, characters: 30 },
      { line: lineOf(NOON), reason: /cut off/ },
    ],
    [
      'a file cut between rows',
      { kind: 'truncated', row: NOON, characters: 0 },
      { line: lineOf(NOON), reason: /records are missing/ },
    ],
  ])('%s', (_, defect, { line, column, reason }) => {
    const result = read(defect);
    if (result.kind === 'accepted') throw new Error('accepted');
    expect(result.problems[0]).toMatchObject({ line, ...(column === undefined ? {} : { column }) });
    expect(result.problems[0]!.reason).toMatch(reason);
  });

  it('a record that stands twice with other values; with the same values it is read once', () => {
    const twice: RowDefect = { kind: 'rowDuplicated', row: NOON };
    const same = accepted(read(twice));
    expect(same.year.dniWm2).toEqual(year.dniWm2);
    expect(same.warnings).toContainEqual(
      expect.stringMatching(`1 line stands twice.*line ${lineOf(NOON + 1)}\\.`),
    );
    expect(read(twice, emptied('windMs', NOON, 1, '99'))).toMatchObject({
      kind: 'refused',
      problems: [
        {
          line: lineOf(NOON + 1),
          reason: `This time stands already in line ${lineOf(NOON)}, with other values.`,
        },
      ],
    });
  });

  it('a second year', () => {
    const text = new TextDecoder().decode(tableFile(year));
    const [heading = '', ...rows] = text.trimEnd().split('\n');
    const second = rows.map((row) => row.replace(/^2018/, '2019'));
    const result = readTable(new TextEncoder().encode([heading, ...rows, ...second].join('\n')), statement);
    expect(result).toMatchObject({
      kind: 'refused',
      problems: [
        { reason: expect.stringMatching(/stands already in line/) as string },
        ...Array.from({ length: LISTED_PROBLEMS - 1 }, () => expect.anything() as object),
      ],
    });
  });

  it('more than 5 % of the daylight without irradiance', () => {
    const holes = Array.from({ length: 365 }, (_, day) => emptied('ghiWm2', day * 24 + 11, 2));
    expect(read(...holes)).toMatchObject({
      kind: 'refused',
      problems: [
        { reason: expect.stringMatching(/7\d\d of 4\d{3} daylight records lack irradiance/) as string },
      ],
    });
  });

  it('a line without end, without taking it into memory', () => {
    const endless = new Uint8Array(1 << 20).fill(0x31);
    expect(readTable(endless, statement)).toMatchObject({ kind: 'refused' });
    const tail = new Uint8Array(1 << 20).fill(0x31);
    const sound = tableFile(year);
    const both = new Uint8Array(sound.length + tail.length);
    both.set(sound);
    both.set(tail, sound.length);
    expect(readTable(both, statement)).toMatchObject({
      kind: 'refused',
      problems: [{ line: 8762, reason: expect.stringContaining('longer than') as string }],
    });
  });
});

it('sets readings just under 0 at night to 0 and marks them', () => {
  const { year: clipped } = accepted(read(emptied('ghiWm2', 0, 1, '-3.1')));
  expect(clipped.ghiWm2[0]).toBe(0);
  expect(clipped.flags[0]).toBe(WEATHER_FLAG.clippedIrradiance);
});

it('puts a table that begins in July into calendar order and says so', () => {
  const text = new TextDecoder().decode(tableFile(year, { label: 'start' }));
  const [heading = '', ...rows] = text.trimEnd().split('\n');
  const july = 181 * 24;
  const next = rows.slice(0, july).map((row) => row.replace(/^2018/, '2019'));
  const bytes = new TextEncoder().encode([heading, ...rows.slice(july), ...next].join('\n'));
  const result = accepted(readTable(bytes, { ...statement, label: 'start' }));
  expect(result.year.ghiWm2).toEqual(year.ghiWm2);
  expect(new Date(result.year.startLocalMs[0]!).toISOString()).toBe('2019-01-01T00:00:00.000Z');
  expect(result.warnings).toContainEqual(expect.stringMatching(/calendar order/));
});

describe('any damage', () => {
  const sound = tableFile(year);
  const damage = fc.array(
    fc.record({
      at: fc.oneof(fc.nat(2000), fc.nat(sound.length - 1)),
      remove: fc.nat(400),
      insert: fc.uint8Array({ maxLength: 12 }),
    }),
    { minLength: 1, maxLength: 4 },
  );
  it('is refused with reasons, or leaves a whole year of numbers; it never throws', () => {
    fc.assert(
      fc.property(damage, (pieces) => {
        let bytes = Buffer.from(sound);
        for (const { at, remove, insert } of pieces) {
          bytes = Buffer.concat([bytes.subarray(0, at), insert, bytes.subarray(at + remove)]);
        }
        const result = readTable(bytes, statement);
        if (result.kind === 'refused') {
          expect(result.problems.length).toBeGreaterThan(0);
          expect(result.problems.length).toBeLessThanOrEqual(LISTED_PROBLEMS);
          expect(result.problems.every(({ reason, fix }) => reason !== '' && fix !== '')).toBe(true);
          return;
        }
        for (const channel of WEATHER_CHANNELS) {
          expect(result.year[channel]).toHaveLength(8760);
          expect(result.year[channel].every(Number.isFinite)).toBe(true);
        }
      }),
      { numRuns, seed },
    );
  }, 600_000);
});
