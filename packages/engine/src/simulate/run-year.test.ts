import { beforeAll, describe, expect, it } from 'vitest';
import { CELL_MACHINE, COIL_MACHINE } from '../../validation/simulate/machines.js';
import { madeWeather } from '../../validation/simulate/made-weather.js';
import { DomainError, RunError } from '../errors.js';
import type { BuriedPipeSettings } from '../loop/buried-pipe.js';
import type { Machine } from '../machine.js';
import { ACCOUNTS, ACCOUNT_INDEX, type Account } from '../ledger/accounts.js';
import { partResidual } from '../ledger/balance.js';
import { LEDGER_INDEX, LEDGER_LINES, LEDGER_PARTS } from '../ledger/lines.js';
import { TRACKER_STATES } from '../tracker/states.js';
import type { RunResult } from './result.js';
import { createYearRun, runYear } from './run-year.js';

const MACHINES = { coil: COIL_MACHINE, cell: CELL_MACHINE };
const weather = madeWeather();
const of = (result: RunResult, account: Account) => result.accountsJ[ACCOUNT_INDEX[account]]!;

describe.each(['coil', 'cell'] as const)('a year with a %s receiver', (kind) => {
  let result: RunResult;
  beforeAll(() => {
    result = runYear(MACHINES[kind], weather);
  });

  it('balances in every part to 1e-9 of the beam', () => {
    const beam = of(result, 'beamOnAperture');
    expect(beam).toBeGreaterThan(0);
    for (const part of LEDGER_PARTS)
      expect(Math.abs(partResidual(part, result.accountsJ)), part).toBeLessThan(1e-9 * beam);
  });

  it('puts every second of the year into exactly one state of the tracker', () => {
    const seconds = Object.values(result.trackerSeconds).reduce((sum, value) => sum + value, 0);
    expect(seconds).toBe(365 * 24 * 3600);
  });

  it('has the beam of the weather on its aperture', () => {
    const dniJm2 = weather.dniWm2.reduce((sum, dni) => sum + dni, 0) * 3600;
    expect(of(result, 'beamOnAperture') / (dniJm2 * result.apertureAreaM2)).toBeCloseTo(1, 12);
  });

  it('has months and hours that add up to the year', () => {
    ACCOUNTS.forEach((account, index) => {
      const months = Array.from(
        { length: 12 },
        (_, month) => result.monthlyAccountsJ[month * ACCOUNTS.length + index]!,
      );
      const scale = Math.max(Math.abs(of(result, account)), 1e6);
      expect(Math.abs(months.reduce((a, b) => a + b, 0) - of(result, account)) / scale, account).toBeLessThan(
        1e-12,
      );
      const hours = result.hourly.powersW[account].reduce((sum, power) => sum + power * 3600, 0);
      expect(Math.abs(hours - of(result, account)) / scale, account).toBeLessThan(1e-11);
    });
  });

  it('meets the load from store, boiler and nothing else', () => {
    expect(of(result, 'unmetHeat')).toBe(0);
    expect(of(result, 'heatDelivered') + of(result, 'backupHeat')).toBeCloseTo(of(result, 'loadHeat'), -2);
    expect(of(result, 'boilerFuel') * 0.85).toBeCloseTo(of(result, 'backupHeat'), -2);
  });

  it('stays inside the bands of an independent calculation: 40–60 % of the beam becomes heat in the water', () => {
    // Bands of the model notes; wide, to notice gross errors.
    const share = (of(result, 'heatToFluid') + of(result, 'powerDc')) / of(result, 'beamOnAperture');
    expect(share).toBeGreaterThan(0.35);
    expect(share).toBeLessThan(0.72);
  });

  it('is the same to the last bit when run again, and in pieces', () => {
    const run = createYearRun(MACHINES[kind], weather);
    while (run.done < run.records) run.advance(997);
    const again = run.finish();
    expect(again.accountsJ).toEqual(result.accountsJ);
    expect(again.hourly.states.tankTopC).toEqual(result.hourly.states.tankTopC);
  });

  it('holds less than the limit temperatures', () => {
    expect(result.tankTopMaxC).toBeLessThan(MACHINES[kind].loop.outletLimitC + 1);
    expect(result.outletMaxC).toBeLessThanOrEqual(MACHINES[kind].loop.outletLimitC);
    if (kind === 'cell') expect(result.cellMaxC).toBeLessThanOrEqual(110);
    else expect(result.cellMaxC).toBeNull();
  });
});

describe('a ledger that does not add up', () => {
  it.each(LEDGER_LINES.map((line) => [line.key, Object.keys(line.parts)] as const))(
    'fails the run and names the part when %s is off by a millionth of the beam',
    (key, parts) => {
      const run = createYearRun(CELL_MACHINE, madeWeather({ days: 4, firstDay: 170 }));
      run.advance(run.records);
      run.accountsJ[LEDGER_INDEX[key]]! += 1e-6 * run.accountsJ[LEDGER_INDEX.beamOnAperture]!;
      expect(() => run.finish()).toThrow(RunError);
      try {
        run.finish();
      } catch (error) {
        if (!(error instanceof RunError)) throw error;
        expect(error.part.split(' and ').sort()).toEqual([...parts].sort());
      }
    },
  );

  it('does not fail untouched', () => {
    const run = createYearRun(CELL_MACHINE, madeWeather({ days: 4, firstDay: 170 }));
    run.advance(run.records);
    expect(() => run.finish()).not.toThrow();
  });
});

describe('what decides the result', () => {
  it('halving the step from 5 to 2.5 minutes changes yearly heat and power by less than 0.3 %', () => {
    for (const machine of [COIL_MACHINE, CELL_MACHINE]) {
      const coarse = runYear(machine, weather);
      const fine = runYear({ ...machine, stepS: 150 }, weather);
      for (const account of [
        'heatToFluid',
        'heatDelivered',
        ...(machine === CELL_MACHINE ? (['powerAc'] as const) : []),
      ] as const) {
        expect(Math.abs(of(fine, account) / of(coarse, account) - 1), account).toBeLessThan(0.003);
      }
    }
  });

  it('a wind above the stow wind all year keeps the dish stowed, and its whole daytime beam stands in that line', () => {
    const stormy = madeWeather({ days: 10 });
    stormy.windMs.fill(20);
    const result = runYear(COIL_MACHINE, stormy);
    expect(result.trackerSeconds.tracking).toBe(0);
    expect(of(result, 'windStow')).toBeCloseTo(of(result, 'beamOnAperture'), -3);
    expect(of(result, 'absorbed')).toBe(0);
  });

  it('no load fills the store, and the dish turns off the sun', () => {
    const idle = { ...COIL_MACHINE, load: { ...COIL_MACHINE.load, volumePerDayM3: 0 } };
    const result = runYear(idle, madeWeather({ days: 30, firstDay: 160 }));
    expect(of(result, 'defocusedStoreFull')).toBeGreaterThan(0.4 * of(result, 'beamOnAperture'));
    expect(of(result, 'loadHeat')).toBe(0);
    expect(result.tankTopMaxC).toBeGreaterThan(90);
  });

  it('a boiler too small leaves heat unmet', () => {
    const small = { ...COIL_MACHINE, load: { ...COIL_MACHINE.load, boilerCapacityW: 1000 } };
    const result = runYear(small, madeWeather({ days: 20, cloudy: 1 }));
    expect(of(result, 'unmetHeat')).toBeGreaterThan(0);
    expect(of(result, 'backupHeat')).toBeLessThanOrEqual(1000 * 20 * 86_400);
  });

  it('cells that are too hot turn the dish off the sun, counted apart from a full store', () => {
    const cool = CELL_MACHINE.receiver.kind === 'cell' ? CELL_MACHINE.receiver : null;
    const strict = {
      ...CELL_MACHINE,
      receiver: { ...cool!, cell: { ...cool!.cell, temperatureLimitC: 90 } },
    };
    const result = runYear(strict, madeWeather({ days: 10, firstDay: 160 }));
    expect(result.trackerSeconds.defocusedReceiverLimit).toBeGreaterThan(3600);
    expect(of(result, 'defocusedReceiverLimit')).toBeGreaterThan(0);
    expect(result.cellMaxC).toBeLessThanOrEqual(90);
  });

  it('own use comes before export, and every watt is used, sold or lost', () => {
    const frugal = { ...CELL_MACHINE, electricityUse: { ...CELL_MACHINE.electricityUse, annualUseJ: 0 } };
    const seller = runYear(frugal, madeWeather({ days: 10, firstDay: 160 }));
    const user = runYear(CELL_MACHINE, madeWeather({ days: 10, firstDay: 160 }));
    expect(of(user, 'gridExport')).toBeLessThan(of(seller, 'gridExport'));
    expect(of(user, 'ownUse')).toBeGreaterThan(of(seller, 'ownUse'));
    expect(of(user, 'powerDc')).toBe(of(seller, 'powerDc'));
  });
});

describe('the place', () => {
  const days = 20;
  const place = (horizon: Machine['place']['horizon']): Machine => ({ ...COIL_MACHINE, place: { horizon } });

  it('behind a wall of 90° all round collects nothing: its whole daytime beam stands in that line', () => {
    const walled = runYear(place([{ azimuthRad: 0, elevationRad: Math.PI / 2 }]), madeWeather({ days }));
    expect(walled.trackerSeconds.tracking).toBe(0);
    expect(of(walled, 'belowHorizonProfile')).toBe(of(walled, 'beamOnAperture'));
    expect(of(walled, 'absorbed')).toBe(0);
  });

  it('costs the mornings, not the evenings, with a hill in the east', () => {
    const east = [
      { azimuthRad: 0.3, elevationRad: 0 },
      { azimuthRad: Math.PI / 2, elevationRad: 0.5 },
      { azimuthRad: 3, elevationRad: 0 },
    ];
    const open = runYear(COIL_MACHINE, madeWeather({ days }));
    const hilly = runYear(place(east), madeWeather({ days }));
    const lost = (result: RunResult, from: number, to: number) =>
      result.hourly.powersW.belowHorizonProfile
        .filter((_, record) => record % 24 >= from && record % 24 < to)
        .reduce((sum, power) => sum + power, 0);
    expect(lost(open, 0, 24)).toBe(0);
    expect(lost(hilly, 0, 12)).toBeGreaterThan(0);
    expect(lost(hilly, 12, 24)).toBe(0);
    expect(of(hilly, 'heatToFluid')).toBeLessThan(of(open, 'heatToFluid'));
  });
});

describe('a scheduled outage', () => {
  it('of five days counts five times 24 hours and their beam, and nothing else moves', () => {
    const outages = [{ from: { month: 1, day: 4 }, to: { month: 1, day: 8 } }];
    const made = madeWeather({ days: 20 });
    const result = runYear({ ...COIL_MACHINE, outages }, made);
    expect(result.trackerSeconds.outOfService).toBe(5 * 86_400);
    const beamJm2 = made.dniWm2.slice(3 * 24, 8 * 24).reduce((sum, dni) => sum + dni * 3600, 0);
    expect(of(result, 'outOfService') / (beamJm2 * result.apertureAreaM2)).toBeCloseTo(1, 12);
    expect(result.hourly.states.trackingShare.slice(3 * 24, 8 * 24).every((share) => share === 0)).toBe(true);
    const whole = runYear(COIL_MACHINE, madeWeather({ days: 20 }));
    expect(result.hourly.powersW.absorbed.slice(0, 3 * 24)).toEqual(
      whole.hourly.powersW.absorbed.slice(0, 3 * 24),
    );
  });

  it('of the whole year leaves the load to the boiler', () => {
    const outages = [{ from: { month: 1, day: 1 }, to: { month: 12, day: 31 } }];
    const result = runYear({ ...COIL_MACHINE, outages }, madeWeather({ days: 10 }));
    expect(of(result, 'outOfService')).toBe(of(result, 'beamOnAperture'));
    expect(result.trackerSeconds.outOfService).toBe(10 * 86_400);
    expect(of(result, 'heatToFluid')).toBeLessThanOrEqual(0);
  });
});

describe('buried pipe', () => {
  const pipe: BuriedPipeSettings = {
    kind: 'buried',
    lengthM: 30,
    boreM: 0.02,
    wallM: 0.001,
    insulationM: 0.03,
    insulationConductivityWmK: 0.04,
    depthM: 0.8,
    soilConductivityWmK: 1.5,
    soilDiffusivityM2S: 6e-7,
  };
  const buried = { ...COIL_MACHINE, loop: { ...COIL_MACHINE.loop, pipe } };

  it('balances over the year and never freezes in ground that does not', () => {
    const cold = madeWeather({ meanC: 8 });
    const result = runYear(buried, cold);
    for (const part of LEDGER_PARTS)
      expect(Math.abs(partResidual(part, result.accountsJ)), part).toBeLessThan(
        1e-9 * of(result, 'beamOnAperture'),
      );
    expect(of(result, 'supplyPipeLoss')).toBeGreaterThan(0);
    expect(result.pipeFreezeSeconds).toBe(0);
    const open = { ...COIL_MACHINE.loop.pipe, lengthM: 30 };
    const exposed = runYear({ ...COIL_MACHINE, loop: { ...COIL_MACHINE.loop, pipe: open } }, cold);
    expect(exposed.pipeFreezeSeconds).toBeGreaterThan(0);
  });
});

describe('exposed pipe', () => {
  it('of 4 m with 50 mm of insulation conducts away less than 1 % of the yearly heat', () => {
    // Common practice, no source: such a pipe loses far less than a flat collector's own piping. The night's cool-down comes on top.
    const pipe = { ...COIL_MACHINE.loop.pipe, lengthM: 4, insulationM: 0.05 };
    const result = runYear({ ...COIL_MACHINE, loop: { ...COIL_MACHINE.loop, pipe } }, weather);
    const { powersW } = result.hourly;
    const whileRunning = result.hourly.states.flowKgS.reduce(
      (sum, flow, hour) =>
        flow > 0 ? sum + (powersW.returnPipeLoss[hour]! + powersW.supplyPipeLoss[hour]!) * 3600 : sum,
      0,
    );
    expect(whileRunning).toBeGreaterThan(0);
    expect(whileRunning).toBeLessThan(0.01 * of(result, 'heatToFluid'));
  });
});

describe('input that is refused', () => {
  it('a step that does not divide the weather’s interval', () => {
    expect(() => createYearRun({ ...COIL_MACHINE, stepS: 420 }, weather)).toThrow(DomainError);
    expect(() => createYearRun({ ...COIL_MACHINE, stepS: 7200 }, weather)).toThrow(/whole number of steps/);
  });

  it('weather with a hole, naming channel and record', () => {
    const holed = madeWeather({ days: 2 });
    holed.dniWm2[13] = NaN;
    expect(() => createYearRun(COIL_MACHINE, holed)).toThrow(/dniWm2 in weather record 14/);
  });

  it('a result asked for too early', () => {
    const run = createYearRun(COIL_MACHINE, madeWeather({ days: 2 }));
    run.advance(5);
    expect(() => run.finish()).toThrow(/records run is 5/);
  });

  it('every state of the tracker has a line in the ledger or the chain of losses', () => {
    const keys: readonly string[] = LEDGER_LINES.map((line) => line.key);
    for (const state of TRACKER_STATES) if (state !== 'tracking') expect(keys).toContain(state);
  });
});
