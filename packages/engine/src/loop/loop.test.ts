import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { propertyRuns } from '../../validation/property-runs.js';
import { BENCH_DISH, CHECK_COIL, cellSettings } from '../../validation/receivers/machines.js';
import { CELL_MACHINE, COIL_MACHINE } from '../../validation/simulate/machines.js';
import { createReceiverStep } from '../receivers/receiver.js';
import { createReceiver } from '../receivers/registry.js';
import { waterEnthalpyJkg } from '../water/water.js';
import { Loop } from './loop.js';
import { Pipe } from './pipe.js';

const PIPE = COIL_MACHINE.loop.pipe;

function coilLoop(coilUaWK = 18) {
  const step = createReceiverStep();
  const receiver = createReceiver({ ...CHECK_COIL, coilUaWK }, BENCH_DISH, 20);
  Object.assign(step, { dtS: 300, airC: 20, windMs: 2, pressurePa: 95_000, tiltDownRad: 0.8 });
  return { step, loop: new Loop(COIL_MACHINE.loop, receiver, step, 20) };
}

function light(step: { incidentW: number; absorbedW: number }, absorbedW: number) {
  step.absorbedW = absorbedW;
  step.incidentW = absorbedW / 0.92;
}

describe('a pipe', () => {
  it('cools at night by its own time constant', () => {
    const pipe = new Pipe(PIPE, 80);
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

  it('balances whatever flows through it', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 5, noNaN: true }),
        fc.double({ min: -30, max: 150, noNaN: true }),
        fc.double({ min: -40, max: 45, noNaN: true }),
        fc.constantFrom(1, 60, 300, 3600),
        (flowKgS, inletC, airC, dtS) => {
          const pipe = new Pipe(PIPE, 40);
          pipe.solve(flowKgS, waterEnthalpyJkg(inletC), airC, dtS);
          const net = pipe.storedW + pipe.lossW + flowKgS * (pipe.outletJkg - waterEnthalpyJkg(inletC));
          expect(Math.abs(net)).toBeLessThan(2e-7 + 1e-12 * flowKgS * 6e5);
        },
      ),
      propertyRuns,
    );
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
    const loop = new Loop(CELL_MACHINE.loop, createReceiver(cellSettings(), BENCH_DISH, 20), step, 20);
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
