import { describe, expect, it } from 'vitest';
import { COIL_MACHINE } from '../validation/simulate/machines.js';
import { madeWeather } from '../validation/simulate/made-weather.js';
import { recordCalendar } from './calendar.js';
import { createDispatch, dispatchPower } from './electricity/dispatch.js';
import { siteUseW } from './electricity/use.js';
import { CommercialHotWater } from './load/commercial-hot-water.js';
import { hourlyShares } from './schedule.js';
import { createTankStep } from './store/stratified-tank.js';
import { waterDensityKgM3 } from './water/water.js';

const weather = madeWeather({ cloudy: 0 });
const calendar = recordCalendar(weather);

describe('the calendar', () => {
  it('counts weekdays on from the first record’s', () => {
    const fromSaturday = recordCalendar({ ...weather, firstWeekday: 5 });
    const weekend = (day: number) => fromSaturday.weekend[day * 24 + 12];
    expect([0, 1, 2, 6, 7, 8, 9].map(weekend)).toEqual([1, 1, 0, 0, 1, 1, 0]);
  });

  it('knows month, hour and day of the year', () => {
    const march1 = 59 * 24;
    expect([calendar.month[march1 - 1], calendar.month[march1]]).toEqual([1, 2]);
    expect(calendar.hour[march1 + 7]).toBe(7);
    expect(calendar.dayOfYear[march1]).toBe(60);
  });

  it('keeps weekdays running where the months come from different years', () => {
    const joined = {
      ...weather,
      startLocalMs: weather.startLocalMs.map((ms, record) => (record < 31 * 24 ? ms : ms + 365 * 86_400_000)),
    };
    expect(recordCalendar(joined).weekend).toEqual(calendar.weekend);
  });
});

describe('a schedule', () => {
  const schedule = COIL_MACHINE.load.schedule;

  it('sums to one working day’s use, to the weekend’s share, and to a month’s factor', () => {
    const shares = hourlyShares({ ...schedule, monthFactors: [2, ...Array<number>(11).fill(1)] }, calendar);
    const day = (index: number) =>
      shares.slice(index * 24, index * 24 + 24).reduce((sum, share) => sum + share, 0);
    expect(day(0)).toBeCloseTo(2, 12);
    expect(day(5)).toBeCloseTo(0.8, 12);
    expect(day(42)).toBeCloseTo(1, 12);
  });

  it('is refused without any weight or with a wrong count', () => {
    expect(() => hourlyShares({ ...schedule, hourlyWeights: Array<number>(24).fill(0) }, calendar)).toThrow(
      /hourly weights/,
    );
    expect(() => hourlyShares({ ...schedule, monthFactors: [1] }, calendar)).toThrow(/month factors/);
  });
});

describe('commercial hot water', () => {
  const mains = () => 12;
  const load = new CommercialHotWater({ ...COIL_MACHINE.load, boilerCapacityW: 5000 }, calendar, mains);

  it('asks for the day’s litres at the set point, by mass', () => {
    const step = createTankStep();
    let kg = 0;
    for (let hour = 0; hour < 24; hour++) {
      load.ask(hour, step);
      kg += (step.draw?.loadFlowKgS ?? 0) * 3600;
    }
    expect(kg).toBeCloseTo(waterDensityKgM3(82), 9);
    load.ask(3, step);
    expect(step.draw).toBeNull();
  });

  it('gives what the boiler can, calls the rest unmet, and burns fuel by its efficiency', () => {
    const step = { ...createTankStep(), dtS: 300, shortfallJ: 2_000_000 };
    load.settle(step);
    expect(load.backupJ).toBe(1_500_000);
    expect(load.unmetJ).toBe(500_000);
    expect(load.fuelJ).toBeCloseTo(1_500_000 / 0.85, 6);
  });
});

describe('electricity', () => {
  it('uses the stated kilowatt-hours in a year, and a part of it in a part', () => {
    const sum = (powers: Float64Array) => powers.reduce((total, power) => total + power * 3600, 0);
    const use = COIL_MACHINE.electricityUse;
    expect(sum(siteUseW(use, calendar, 3600))).toBeCloseTo(use.annualUseJ, -3);
    const week = recordCalendar(madeWeather({ days: 7 }));
    expect(sum(siteUseW(use, week, 3600))).toBeCloseTo((use.annualUseJ * 7) / 365, -3);
  });

  it('is used on the site first, then sold; what is missing is bought', () => {
    const out = createDispatch();
    const inverter = { lossW: (dcW: number) => 0.1 * dcW };
    dispatchPower(1000, inverter, 400, out);
    expect(out).toEqual({ acW: 900, inverterLossW: 100, ownUseW: 400, importW: 0, exportW: 500 });
    dispatchPower(1000, inverter, 1400, out);
    expect(out).toEqual({ acW: 900, inverterLossW: 100, ownUseW: 900, importW: 500, exportW: 0 });
    dispatchPower(0, null, 70, out);
    expect(out).toEqual({ acW: 0, inverterLossW: 0, ownUseW: 0, importW: 70, exportW: 0 });
  });
});
