import { describe, expect, it } from 'vitest';
import { syntheticYear } from '@noonwell/testkit';
import { decodeWeatherYear, encodeWeatherYear, WeatherDecodeError } from './index.js';

const year = syntheticYear();

describe('stored weather year', () => {
  it('gives back every bit, negative zero and sixteenth digits included', () => {
    const dryBulbC = year.dryBulbC.map((value) => value / 3);
    dryBulbC[7] = -0;
    const flags = year.flags.map((_, at) => at % 64);
    const startLocalMs = year.startLocalMs.slice();
    startLocalMs.subarray(31 * 24).forEach((start, at, rest) => (rest[at] = start - 86_400_000 * 365));
    const unusual = { ...year, dryBulbC, flags, startLocalMs, utcOffsetHours: 5.75, firstWeekday: 4 };
    const back = decodeWeatherYear(encodeWeatherYear(unusual));
    expect(back).toEqual(unusual);
    expect(Object.is(back.dryBulbC[7], -0)).toBe(true);
  });

  it('is smaller than plain columns and reads from the middle of a buffer', () => {
    const bytes = encodeWeatherYear(year);
    expect(bytes.length).toBeLessThan(8760 * 8 * 8 * 0.5);
    const inside = new Uint8Array(bytes.length + 11);
    inside.set(bytes, 5);
    expect(decodeWeatherYear(inside.subarray(5, 5 + bytes.length))).toEqual(year);
  });

  it('refuses columns of unequal length', () => {
    expect(() => encodeWeatherYear({ ...year, windMs: new Float64Array(3) })).toThrow(RangeError);
  });

  it.each([
    ['nothing', () => new Uint8Array(0), /only 0 bytes/],
    ['other bytes', () => new Uint8Array(500), /not a weather year/],
    ['one changed bit', (bytes: Uint8Array) => bytes.with(4000, bytes[4000]! ^ 1), /damaged/],
    ['a cut', (bytes: Uint8Array) => bytes.slice(0, -100), /damaged/],
    ['a later version', (bytes: Uint8Array) => bytes.with(4, 2), /version 2/],
  ])('refuses %s', (_, damage, message) => {
    const damaged = damage(encodeWeatherYear(year));
    expect(() => decodeWeatherYear(damaged)).toThrow(WeatherDecodeError);
    expect(() => decodeWeatherYear(damaged)).toThrow(message);
  });
});
