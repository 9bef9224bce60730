import type { TableStatement } from '@noonwell/schema';
import { syntheticYear, tableColumn, tableFile, tableStatement } from '@noonwell/testkit';
import { describe, expect, it } from 'vitest';
import { describeProblem, inspectTable, readTable } from '../index.js';

const year = syntheticYear();
const sound = tableFile(year);
const whole = tableStatement(year);

function missingPaths(bytes: Uint8Array, statement: TableStatement): string[] {
  const result = readTable(bytes, statement);
  return result.kind === 'refused' ? (result.missing ?? []).map(({ path }) => path) : [];
}

describe('what must be stated', () => {
  it('is listed whole where nothing is stated, and nothing is read', () => {
    const result = readTable(sound, {});
    expect(result).toMatchObject({ kind: 'refused', format: 'table', problemCount: 6 });
    expect(missingPaths(sound, {})).toEqual([
      'label',
      'clock',
      'place.latitudeDeg',
      'place.longitudeDeg',
      'place.altitudeM',
      'place.utcOffsetHours',
    ]);
    expect(result.kind === 'refused' && result.problems.map(describeProblem)[1]).toMatch(
      /^statement\.clock: .*which clock.* localStandard, utc/,
    );
  });

  it('goes on with the rest, part by part', () => {
    const { clock: _, ...withoutClock } = whole;
    expect(missingPaths(sound, withoutClock)).toEqual(['clock']);
    expect(missingPaths(sound, { ...whole, place: { ...whole.place, altitudeM: undefined } })).toEqual([
      'place.altitudeM',
    ]);
    expect(missingPaths(sound, whole)).toEqual([]);
  });

  it('includes the unit of a column whose heading names none, with what its values look like', () => {
    const bytes = tableFile(year, { unitsIn: 'nowhere', units: { pressurePa: 'hPa' } });
    expect(missingPaths(bytes, whole)).toContain('columns.pressurePa.unit');
    const { missing } = readTable(bytes, whole) as { missing?: { path: string; fix: string }[] };
    expect(missing?.find(({ path }) => path === 'columns.pressurePa.unit')?.fix).toMatch(/look like hPa/);
  });

  it('includes a column that no heading names; pressure alone may be absent', () => {
    const bytes = tableFile(year, { leaveOut: ['windMs', 'pressurePa'] });
    expect(missingPaths(bytes, whole)).toEqual(['columns.windMs.column']);
    const result = readTable(tableFile(year, { leaveOut: ['pressurePa'] }), whole);
    expect(result).toMatchObject({
      kind: 'accepted',
      warnings: expect.arrayContaining([
        expect.stringMatching(/8760 records without pressure.*ISO 2533/) as string,
      ]) as string[],
    });
  });

  it('refuses one column for two channels, and a column that is not there', () => {
    const column = tableColumn('dniWm2');
    expect(missingPaths(sound, { ...whole, columns: { ghiWm2: { column } } })).toEqual([
      'columns.ghiWm2.column',
    ]);
    expect(missingPaths(sound, { ...whole, columns: { ghiWm2: { column: 90 } } })).toEqual([
      'columns.ghiWm2.column',
    ]);
  });

  it('asks for the order of day and month where the file leaves it open, and takes it as stated', () => {
    const days = (count: number) =>
      new TextDecoder()
        .decode(tableFile(year, { time: 'us' }))
        .split('\n')
        .slice(0, count * 24);
    const bytes = new TextEncoder().encode(days(11).join('\n'));
    expect(inspectTable(bytes)).toMatchObject({ time: { dateOrder: null } });
    expect(missingPaths(bytes, whole)).toEqual(['layout.dateOrder']);
    expect(missingPaths(bytes, { ...whole, layout: { dateOrder: 'monthFirst' } })).toEqual([]);
  });
});

describe('a statement that the sun contradicts', () => {
  it.each([
    [
      'start',
      /−30 min from the label; means over the hour that starts at the label fit at \+30 min\. It would fit means over the hour that ends at the label\./,
    ],
    [
      'middle',
      /−30 min from the label; means over the hour that lies about the label fit at 0 min\. It would fit means over the hour that ends/,
    ],
  ] as const)('is warned of: labels at the end, stated as %s', (label, sentence) => {
    const result = readTable(sound, { ...whole, label });
    expect(result).toMatchObject({
      kind: 'accepted',
      warnings: expect.arrayContaining([expect.stringMatching(sentence) as string]) as string[],
    });
  });

  it('is warned of: local labels stated as UTC, 2 h away', () => {
    const result = readTable(sound, { ...whole, clock: 'utc' });
    expect(result).toMatchObject({
      kind: 'accepted',
      warnings: expect.arrayContaining([
        expect.stringMatching(/fits the sun best .* or beyond/) as string,
      ]) as string[],
    });
  });

  it('is warned of: an altitude that the pressure contradicts', () => {
    const result = readTable(sound, { ...whole, place: { ...whole.place, altitudeM: 2500 } });
    expect(result).toMatchObject({
      kind: 'accepted',
      warnings: expect.arrayContaining([
        expect.stringMatching(/stated elevation is 2500 m/) as string,
      ]) as string[],
    });
  });
});

it('refuses what is no table without asking for a statement', () => {
  const prose = new TextEncoder().encode('Dear reader,\nthis file holds no numbers.\n'.repeat(50));
  expect(readTable(prose, whole)).toMatchObject({
    kind: 'refused',
    problems: [{ reason: expect.stringContaining('No table of records') as string }],
  });
  expect(inspectTable(prose)).toMatchObject({ kind: 'noTable' });
});
