import { expect, it } from 'vitest';
import { energyUnitFor, formatEnergyKwh, formatPowerW } from './energy.js';
import { formatDurationMs, MONTH_NAMES } from './date.js';
import {
  formatFixed,
  formatQuantity,
  formatShare,
  formatSignificant,
  formatSigned,
  NO_VALUE,
} from './number.js';
import { formatBytes, formatCoordinates, formatUtcOffset } from './place.js';

it.each([
  [12_345, '12,300'],
  [0.041_234, '0.0412'],
  [3.2, '3.20'],
  [-3.2, '−3.20'],
  [0, '0'],
  [999.6, '1,000'],
  [null, NO_VALUE],
  [Number.NaN, NO_VALUE],
])('writes %s with three significant figures as %s', (value, text) => {
  expect(formatSignificant(value)).toBe(text);
});

it('never writes a minus before nothing', () => {
  expect(formatFixed(-0.001, 1)).toBe('0.0');
  expect(formatFixed(-0.06, 1)).toBe('−0.1');
});

it('keeps energy in kWh and its multiples, power in W and its multiples', () => {
  expect(formatEnergyKwh(812.4)).toBe('812\u00a0kWh');
  expect(formatEnergyKwh(123_456)).toBe('123\u00a0MWh');
  expect(formatPowerW(812.4)).toBe('812\u00a0W');
  expect(formatPowerW(12_345)).toBe('12.3\u00a0kW');
});

it('chooses one unit for a whole table by its largest value', () => {
  expect(energyUnitFor([120, -250_000, null])).toEqual({ unit: 'MWh', kwhPerUnit: 1000 });
  expect(energyUnitFor([])).toEqual({ unit: 'kWh', kwhPerUnit: 1 });
});

it('leaves the unit of a pure number out and says the sign of a difference', () => {
  expect(formatQuantity(0.95, '1')).toBe('0.950');
  expect(formatQuantity(44.7, '°')).toBe('44.7°');
  expect(formatShare(0.0834)).toBe('8.34\u00a0%');
  expect(formatSigned(1234)).toBe('+1,230');
  expect(formatSigned(-0.5)).toBe('−0.500');
});

it('names places and clocks', () => {
  expect(formatCoordinates(34.85, -116.8)).toBe('34.85°\u00a0N, 116.80°\u00a0W');
  expect(formatUtcOffset(-8)).toBe('UTC−8');
  expect(formatUtcOffset(5.5)).toBe('UTC+5:30');
  expect(formatUtcOffset(-3.5)).toBe('UTC−3:30');
  expect(formatBytes(1_720_000)).toBe('1.72\u00a0MB');
});

it('names months and lengths of time', () => {
  expect(MONTH_NAMES[0]).toBe('Jan');
  expect(MONTH_NAMES).toHaveLength(12);
  expect(formatDurationMs(140)).toBe('0.1\u00a0s');
  expect(formatDurationMs(9_960)).toBe('10\u00a0s');
  expect(formatDurationMs(180_000)).toBe('3\u00a0min');
});
