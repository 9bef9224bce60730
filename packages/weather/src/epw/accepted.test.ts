import { describe, expect, it } from 'vitest';
import { WEATHER_CHANNELS, WEATHER_FLAG, type WeatherYear } from '@noonwell/engine';
import { epwFile, syntheticYear, type EpwFileOptions } from '@noonwell/testkit';
import { readEpw, standardPressurePa, type WeatherAccepted } from '../index.js';

const year = syntheticYear();

function accept(options: EpwFileOptions = {}, of: WeatherYear = year): WeatherAccepted {
  const result = readEpw(epwFile(of, options));
  if (result.kind === 'refused') throw new Error(`refused: ${JSON.stringify(result.problems[0])}`);
  return result;
}

describe('a sound EPW file', () => {
  it('gives back every value, the place, the names and the first weekday', () => {
    const result = accept({ city: 'Brackenfold, "upper" field', region: 'BF', country: 'NA', wmo: '123450' });
    expect(result.year).toEqual(year);
    expect(result.header).toEqual({
      placeName: 'Brackenfold, "upper" field, BF',
      city: 'Brackenfold, "upper" field',
      region: 'BF',
      country: '',
      source: 'synthetic',
      wmo: '123450',
    });
    expect(result.warnings).toEqual([]);
    expect(result.sunOffsetMinutes).toBe(-30);
    expect(result.summary.records).toBe(8760);
  });

  it.each(['lf', 'crlf', 'cr'] as const)('reads %s line ends alike', (lineEnd) => {
    expect(accept({ lineEnd }).year).toEqual(year);
  });

  it.each(['utf8', 'utf8-bom', 'latin1'] as const)('reads a name with an umlaut in %s', (encoding) => {
    const result = accept({ city: 'Brückenfäld', encoding });
    expect(result.header.city).toBe('Brückenfäld');
    expect(result.year).toEqual(year);
  });

  it('reports progress that rises to 1', () => {
    const seen: number[] = [];
    readEpw(epwFile(year), { onProgress: (fraction) => seen.push(fraction) });
    expect(seen.length).toBeGreaterThan(10);
    expect(seen).toEqual([...seen].sort((a, b) => a - b));
    expect(seen.at(-1)).toBe(1);
  });

  it('takes a half-hour offset, an unquoted comma in the name and cells after the elevation', () => {
    const location = 'LOCATION,Upper, Lower Field,BF,-,made up,000000,12.5,77.25,5.5,920.0';
    const result = accept({ defects: [{ kind: 'headerLine', startsWith: 'LOCATION', line: location }] });
    expect(result.year).toMatchObject({
      latitudeDeg: 12.5,
      longitudeDeg: 77.25,
      utcOffsetHours: 5.5,
      altitudeM: 920,
    });
    expect(result.header).toMatchObject({ city: 'Upper, Lower Field', source: 'made up', wmo: '000000' });

    const longer = 'LOCATION,Field,BF,-,made up,NA,12.5,77.25,5.5,920.0,extra,,';
    const second = accept({ defects: [{ kind: 'headerLine', startsWith: 'LOCATION', line: longer }] });
    expect(second.year).toMatchObject({
      latitudeDeg: 12.5,
      longitudeDeg: 77.25,
      utcOffsetHours: 5.5,
      altitudeM: 920,
    });
    expect(second.header.wmo).toBe('');
  });

  it('finds DATA PERIODS after a shorter header and takes the weekday from it, Monday when it names none', () => {
    const shorter = accept({ defects: [{ kind: 'headerLine', startsWith: 'COMMENTS 2', line: null }] });
    expect(shorter.year).toEqual(year);
    const sunday = 'DATA PERIODS,1,1,Data,Sunday, 1/ 1,12/31';
    expect(
      accept({ defects: [{ kind: 'headerLine', startsWith: 'DATA', line: sunday }] }).year.firstWeekday,
    ).toBe(6);
    const none = accept({
      defects: [{ kind: 'headerLine', startsWith: 'DATA', line: 'DATA PERIODS,1,1,Data' }],
    });
    expect(none.year.firstWeekday).toBe(0);
    expect(none.warnings.join()).toMatch(/no first weekday/);
  });

  it('stores the start of each hour in the calendar year of its line', () => {
    const result = accept({ defects: [{ kind: 'column', cell: 1, text: '2004' }] });
    // 2004 has a 29 February, which the file leaves out: 1 March follows 28 February.
    expect(result.year.startLocalMs[59 * 24 - 1]).toBe(Date.UTC(2004, 1, 28, 23));
    expect(result.year.startLocalMs[59 * 24]).toBe(Date.UTC(2004, 2, 1, 0));
    expect(result.year.startLocalMs.at(-1)).toBe(Date.UTC(2004, 11, 31, 23));
  });

  it('reads 8784 rows of a leap year', () => {
    const startLocalMs = Float64Array.from(
      { length: 8784 },
      (_, at) => Date.UTC(2020, 0, 1) + at * 3_600_000,
    );
    const longer = { ...year, startLocalMs, flags: new Uint16Array(8784) };
    for (const channel of WEATHER_CHANNELS)
      longer[channel] = Float64Array.from([...year[channel], ...year[channel].slice(0, 24)]);
    expect(accept({}, longer).year).toEqual(longer);
  });
});

describe('repairs', () => {
  it('fills gaps of up to 3 hours in a straight line and flags them', () => {
    const rows = [100, 101, 102];
    const {
      year: read,
      warnings,
      summary,
    } = accept({
      defects: rows.map((row) => ({ kind: 'cell', row, cell: 7, text: '99.9' })),
    });
    const [before, after] = [year.dryBulbC[99]!, year.dryBulbC[103]!];
    rows.forEach((row, at) => {
      expect(read.dryBulbC[row]).toBeCloseTo(before + ((after - before) * (at + 1)) / 4, 12);
      expect(read.flags[row]).toBe(WEATHER_FLAG.filledDryBulb);
    });
    expect(read.flags[99]).toBe(0);
    expect(warnings).toEqual([expect.stringMatching(/^3 hours without dry-bulb/)]);
    expect(summary.flaggedRecords).toBe(3);
  });

  it('fills wind and humidity too, and holds the neighbour at the end of the year', () => {
    const { year: read } = accept({
      defects: [
        { kind: 'cell', row: 8759, cell: 22, text: '999' },
        { kind: 'cell', row: 0, cell: 9, text: '' },
      ],
    });
    expect(read.windMs[8759]).toBe(year.windMs[8758]);
    expect(read.flags[8759]).toBe(WEATHER_FLAG.filledWind);
    expect(read.relativeHumidityPct[0]).toBe(year.relativeHumidityPct[1]);
    expect(read.flags[0]).toBe(WEATHER_FLAG.filledHumidity);
  });

  it('takes missing pressure from the altitude', () => {
    const { year: read, warnings } = accept({ defects: [{ kind: 'column', cell: 10, text: '999999' }] });
    expect(read.pressurePa.every((pa) => pa === standardPressurePa(year.altitudeM))).toBe(true);
    expect(read.flags.every((flags) => flags === WEATHER_FLAG.pressureFromAltitude)).toBe(true);
    expect(warnings).toEqual([expect.stringMatching(/^8760 hours without pressure/)]);
  });

  it('sets instrument noise under 0 to 0, and humidity over 100 % to 100 %, flagged', () => {
    const { year: read, warnings } = accept({
      defects: [
        { kind: 'cell', row: 2, cell: 14, text: '-0.4' },
        { kind: 'cell', row: 3, cell: 9, text: '103' },
      ],
    });
    expect(Object.is(read.ghiWm2[2], 0)).toBe(true);
    expect(read.flags[2]).toBe(WEATHER_FLAG.clippedIrradiance);
    expect(read.relativeHumidityPct[3]).toBe(100);
    expect(read.flags[3]).toBe(WEATHER_FLAG.clippedHumidity);
    expect(warnings).toHaveLength(2);
  });
});

describe('doubts', () => {
  it('measures a clock that is an hour early, and a late one that is beyond the search', () => {
    const early = accept({ defects: [{ kind: 'shifted', hours: -1 }] });
    expect(early.sunOffsetMinutes).toBe(30);
    expect(early.warnings.join()).toMatch(/fits the sun best \+30 min .* 60 min early/);
    const late = accept({ defects: [{ kind: 'shifted', hours: 1 }] });
    expect(late.sunOffsetMinutes).toBe(-60);
    expect(late.warnings.join()).toMatch(/−60 min from the label or beyond/);
  });

  it('names a month that is shifted against the rest', () => {
    const julyStart = 181 * 24;
    const { warnings, sunOffsetMinutes } = accept({
      defects: [{ kind: 'shifted', hours: -1, fromRow: julyStart, toRow: julyStart + 31 * 24 }],
    });
    expect(sunOffsetMinutes).toBe(-30);
    expect(warnings).toEqual([expect.stringMatching(/some months differs.*: July \(\+30 min\)/)]);
  });

  it('notices a wrong time zone, by the sun and by the longitude', () => {
    const { warnings } = accept({ defects: [{ kind: 'utcOffset', hours: 2 }] });
    expect(warnings.join()).toMatch(/UTC\+2 is 4\.2 h from the sun's time/);
    expect(warnings.join()).toMatch(/fits the sun best/);
  });

  it('sees no doubt in a zone across the date line', () => {
    const moved = { ...year, longitudeDeg: 180 - 33.4 - 180 - 146.6, utcOffsetHours: 12 };
    expect(moved.longitudeDeg).toBe(-180);
    expect(accept({}, moved).warnings.join()).not.toMatch(/time zone UTC/);
  });

  it('notices an elevation that contradicts the pressure', () => {
    expect(accept({}, { ...year, altitudeM: 60 }).warnings).toEqual([
      expect.stringMatching(/stated elevation is 60 m, .* about 9\d\d m/),
    ]);
  });

  it('notices more beam than reaches the top of the atmosphere, and irradiances that do not close', () => {
    const noon = 172 * 24 + 12;
    const beam = accept({ defects: [{ kind: 'cell', row: noon, cell: 15, text: '1900' }] });
    expect(beam.warnings).toEqual([
      expect.stringMatching(/^1 record has more beam .* 1900 W\/m² on 22 June/),
    ]);
    expect(accept({}, { ...year, latitudeDeg: -year.latitudeDeg }).warnings.join()).toMatch(/miss closure/);
  });
});
