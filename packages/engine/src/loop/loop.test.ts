import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { propertyRuns } from '../../validation/property-runs.js';
import { BENCH_DISH, CHECK_COIL, cellSettings } from '../../validation/receivers/machines.js';
import { CELL_MACHINE, COIL_MACHINE } from '../../validation/simulate/machines.js';
import { createReceiverStep } from '../receivers/receiver.js';
import { createReceiver } from '../receivers/registry.js';
import { waterEnthalpyJkg } from '../water/water.js';
import { Loop } from './loop.js';
import { madeWeather } from '../../validation/simulate/made-weather.js';
import type { BuriedPipeSettings } from './buried-pipe.js';
import { createPipeSurroundings } from './pipe-registry.js';
import { Pipe } from './pipe.js';

const PIPE = COIL_MACHINE.loop.pipe;
const WEATHER = madeWeather();
const AROUND = createPipeSurroundings(PIPE, WEATHER);
const BURIED: BuriedPipeSettings = {
  kind: 'buried',
  lengthM: 8,
  boreM: 0.02,
  wallM: 0.001,
  insulationM: 0.03,
  insulationConductivityWmK: 0.04,
  depthM: 0.8,
  soilConductivityWmK: 1.5,
  soilDiffusivityM2S: 6e-7,
};

function coilLoop(coilUaWK = 18) {
  const step = createReceiverStep();
  const receiver = createReceiver({ ...CHECK_COIL, coilUaWK }, BENCH_DISH, 20);
  Object.assign(step, { dtS: 300, airC: 20, windMs: 2, pressurePa: 95_000, tiltDownRad: 0.8 });
  return { step, loop: new Loop(COIL_MACHINE.loop, receiver, step, AROUND, 20) };
}

function light(step: { incidentW: number; absorbedW: number }, absorbedW: number) {
  step.absorbedW = absorbedW;
  step.incidentW = absorbedW / 0.92;
}

describe('a pipe', () => {
  it('cools at night by its own time constant', () => {
    const pipe = new Pipe(PIPE, AROUND, 80);
    let elapsedS = 0;
    for (; elapsedS < 3600; elapsedS += 10) {
      pipe.solve(0, 0, 5, 10);
      pipe.commit();
    }
    // Capacity: water of π/4 · 0.02² · 8 m and copper of π · 0.001 · 0.021 · 8 m; exponential decay of one node.
    const capacityJK =
      998.2 * (Math.PI / 4) * 0.02 ** 2 * 8 * 4185 + 8960 * 385 * Math.PI * 0.001 * 0.021 * 8;
    const expected = 5 + 75 * Math.exp((-pipe.uaWK * elapsedS) / capacityJK);
    expect(Math.abs(pipe.nowC - expected)).toBeLessThan(0.15);
  });

  it.each([PIPE, BURIED])('balances whatever flows through it ($kind)', (settings) => {
    const around = createPipeSurroundings(settings, WEATHER);
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 5, noNaN: true }),
        fc.double({ min: -30, max: 150, noNaN: true }),
        fc.double({ min: -40, max: 45, noNaN: true }),
        fc.constantFrom(1, 60, 300, 3600),
        (flowKgS, inletC, airC, dtS) => {
          const pipe = new Pipe(settings, around, 40);
          pipe.solve(flowKgS, waterEnthalpyJkg(inletC), airC, dtS);
          const net = pipe.storedW + pipe.lossW + flowKgS * (pipe.outletJkg - waterEnthalpyJkg(inletC));
          expect(Math.abs(net)).toBeLessThan(2e-7 + 1e-12 * flowKgS * 6e5);
        },
      ),
      propertyRuns,
    );
  });
});

describe('what stands around a pipe', () => {
  it('is the air of the record for an exposed one', () => {
    expect(AROUND.outsideC(-7, 200)).toBe(-7);
  });

  it('is the ground for a buried one: late, damped, and blind to the hour', () => {
    const around = createPipeSurroundings(BURIED, WEATHER);
    const days = Array.from({ length: 365 }, (_, day) => around.outsideC(50, day + 1));
    // The made weather swings by 10 K about 15 °C, coldest on 1 January: over 0.8 m of this soil by
    // exp(−0.8 √(2π/365/86 400/(2 · 6e-7))) = 0.722, and 19 days later.
    expect(Math.max(...days)).toBeCloseTo(15 + 10 * 0.722, 1);
    expect(Math.min(...days)).toBeCloseTo(15 - 10 * 0.722, 1);
    expect(days.indexOf(Math.min(...days)) + 1).toBeGreaterThan(16);
    expect(days.indexOf(Math.min(...days)) + 1).toBeLessThan(23);
  });

  it('reaches the loop with the record: warmer ground, less loss', () => {
    const step = createReceiverStep();
    Object.assign(step, { dtS: 300, airC: 0, windMs: 2, pressurePa: 95_000, tiltDownRad: 0.8 });
    const receiver = createReceiver({ ...CHECK_COIL, coilUaWK: 18 }, BENCH_DISH, 20);
    const around = createPipeSurroundings(BURIED, WEATHER);
    const loop = new Loop({ ...COIL_MACHINE.loop, pipe: BURIED }, receiver, step, around, 60);
    const lossOn = (day: number): number => {
      loop.beginRecord(day);
      loop.solve(20);
      return loop.toReceiver.lossW;
    };
    const winterW = lossOn(20);
    const summerW = lossOn(200);
    expect(summerW).toBeLessThan(winterW);
    expect(winterW).toBeGreaterThan(0);
    const gone = loop.toReceiver.uaWK * (loop.toReceiver.outletC - around.outsideC(0, 200));
    expect(summerW).toBeCloseTo(gone, 9);
  });
});

describe('the loop', () => {
  it('holds the set point while the flow is between its limits', () => {
    const { step, loop } = coilLoop();
    light(step, 11_000);
    for (let index = 0; index < 30; index++) {
      loop.solve(40);
      loop.commit();
    }
    expect(step.outletC).toBeCloseTo(93, 3);
    expect(loop.flowKgS).toBeGreaterThan(0.01);
    expect(loop.flowKgS).toBeLessThan(0.3);
  });

  it('what the water takes up is lost, kept in the pipes or brought to the tank', () => {
    const { step, loop } = coilLoop();
    for (const absorbedW of [2000, 9000, 12_000, 500, 0, 0, 7000]) {
      light(step, absorbedW);
      loop.solve(30);
      const pipes = [loop.toReceiver, loop.toTank];
      const gone = pipes.reduce((sum, pipe) => sum + pipe.lossW + pipe.storedW, loop.heatToStoreW);
      expect(gone).toBeCloseTo(step.heatToFluidW, 5);
      loop.commit();
    }
  });

  it('does not start for a face that is barely warmer than the tank, starts in the sun, and stops at dusk', () => {
    const { step, loop } = coilLoop();
    light(step, 60);
    loop.solve(60);
    expect(loop.flowKgS).toBe(0);
    light(step, 9000);
    loop.solve(60);
    expect(loop.flowKgS).toBeGreaterThan(0);
    loop.commit();
    light(step, 0);
    for (let index = 0; index < 10; index++) {
      loop.solve(60);
      loop.commit();
    }
    expect(loop.flowKgS).toBe(0);
    expect(loop.pumpW).toBe(0);
  });

  it('runs at full flow and says so when the returning water is too hot for the limit', () => {
    const { step, loop } = coilLoop(200);
    light(step, 13_000);
    loop.solve(94);
    expect(loop.flowKgS).toBe(0.3);
    expect(loop.outletOverLimit).toBe(true);
  });

  it('cools cells whenever they are lit, however little', () => {
    const step = createReceiverStep();
    Object.assign(step, { dtS: 300, airC: 20, windMs: 2, pressurePa: 95_000, tiltDownRad: 0.8 });
    const loop = new Loop(
      CELL_MACHINE.loop,
      createReceiver(cellSettings(), BENCH_DISH, 20),
      step,
      AROUND,
      20,
    );
    light(step, 50);
    loop.solve(70);
    expect(loop.flowKgS).toBe(CELL_MACHINE.loop.minFlowKgS);
    light(step, 0);
    loop.solve(70);
    expect(loop.flowKgS).toBe(0);
  });

  it('needs the hydraulic power over the pump’s efficiency at full flow', () => {
    const { step, loop } = coilLoop(200);
    light(step, 13_000);
    loop.solve(94);
    // 0.3 kg/s × 60 kPa / (962.7 kg/m³ × 0.25); density of water at 94 °C, IAPWS-IF97.
    expect(loop.pumpW).toBeCloseTo((0.3 * 60_000) / (962.7 * 0.25), 0);
  });
});
