import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { propertyRuns } from '../../validation/property-runs.js';
import { DomainError } from '../errors.js';
import { waterDensityKgM3, waterEnthalpyJkg } from '../water/water.js';
import {
  createTank,
  createTankStep,
  type Tank,
  type TankSettings,
  type TankStep,
} from './stratified-tank.js';

const settings: TankSettings = {
  volumeM3: 1,
  layers: 10,
  heightM: 2,
  lossUaWK: 3,
  surroundings: { kind: 'plantRoom', temperatureC: 20 },
  effectiveConductivityWmK: 1.5,
  chargeInlet: { kind: 'matchingLayer' },
};
const tight: TankSettings = { ...settings, lossUaWK: 0, effectiveConductivityWmK: 0 };

function temperatures(tank: Tank): number[] {
  const out = new Float64Array(tank.layers);
  tank.temperaturesC(out);
  return [...out];
}

function stepOf(conditions: Partial<TankStep>): TankStep {
  return Object.assign(createTankStep(), { dtS: 300, ...conditions });
}

describe('createTank', () => {
  it('fills with water of the starting temperature', () => {
    const tank = createTank(settings, 60);
    expect(tank.massKg).toBe(waterDensityKgM3(60));
    expect(temperatures(tank).every((tC) => Math.abs(tC - 60) < 1e-9)).toBe(true);
    expect(tank.energyJ() / (tank.massKg * waterEnthalpyJkg(60))).toBeCloseTo(1, 12);
    expect(tank.topC).toBeCloseTo(60, 9);
    expect(tank.bottomC).toBeCloseTo(60, 9);
  });

  it.each<[string, Partial<TankSettings>]>([
    ['tank.volumeM3', { volumeM3: 0 }],
    ['tank.layers', { layers: 0 }],
    ['tank.layers', { layers: 41 }],
    ['tank.layers', { layers: 2.5 }],
    ['tank.heightM', { heightM: -1 }],
    ['tank.lossUaWK', { lossUaWK: Number.NaN }],
    ['tank.effectiveConductivityWmK', { effectiveConductivityWmK: -1 }],
    ['tank.chargeInlet.heightFraction', { chargeInlet: { kind: 'fixedHeight', heightFraction: 1.1 } }],
  ])('refuses %s by name', (quantity, change) => {
    expect(() => createTank({ ...settings, ...change }, 60)).toThrow(DomainError);
    expect(() => createTank({ ...settings, ...change }, 60)).toThrow(quantity);
  });

  it('refuses a step with a NaN instead of spreading it', () => {
    const tank = createTank(settings, 60);
    expect(() => {
      tank.step(stepOf({ chargeFlowKgS: 0.1, chargeEnthalpyRiseJkg: Number.NaN }));
    }).toThrow('charge enthalpy rise');
    expect(tank.topC).toBeCloseTo(60, 9);
  });
});

describe('charging', () => {
  it('puts hot water on top and leaves the bottom cold', () => {
    const tank = createTank(tight, 20);
    const io = stepOf({ chargeFlowKgS: 0.1, chargeEnthalpyRiseJkg: 60 * 4180 });
    for (let i = 0; i < 10; i++) tank.step(io);
    expect(tank.topC).toBeGreaterThan(75);
    expect(tank.bottomC).toBeLessThan(20.1);
  });

  it('mixes the whole tank above a fixed inlet at the bottom', () => {
    const tank = createTank({ ...tight, chargeInlet: { kind: 'fixedHeight', heightFraction: 0 } }, 20);
    tank.step(stepOf({ chargeFlowKgS: 0.1, chargeEnthalpyRiseJkg: 60 * 4180 }));
    const [bottom] = temperatures(tank);
    expect(bottom).toBeGreaterThan(21);
    temperatures(tank).forEach((tC) => {
      expect(tC).toBeCloseTo(bottom!, 9);
    });
  });

  it('brings a stream of middling warmth to the layers of its own warmth', () => {
    const tank = createTank(tight, 20);
    const hot = stepOf({ chargeFlowKgS: 0.1, chargeEnthalpyRiseJkg: 60 * 4180 });
    for (let i = 0; i < 12; i++) tank.step(hot);
    const before = temperatures(tank);
    const warm = stepOf({ chargeFlowKgS: 0.1, chargeEnthalpyRiseJkg: 20 * 4180 });
    tank.step(warm);
    const after = temperatures(tank);
    expect(after.at(-1)).toBeCloseTo(before.at(-1)!, 9);
    const gained = after.findIndex((tC, i) => tC > before[i]! + 0.5);
    expect(before[gained]).toBeLessThan(45);
  });
});

describe('drawing', () => {
  it('meets a set point below the tank by mixing and needs no backup', () => {
    const tank = createTank(tight, 90);
    const io = stepOf({ draw: { loadFlowKgS: 0.2, setPointC: 50, mainsC: 10 } });
    tank.step(io);
    expect(io.shortfallJ).toBe(0);
    expect(io.heatDrawnJ / io.loadNeedJ).toBeCloseTo(1, 12);
    const fraction = waterEnthalpyJkg(50) - waterEnthalpyJkg(10);
    expect(io.drawnKg).toBeCloseTo((0.2 * 300 * fraction) / (waterEnthalpyJkg(90) - waterEnthalpyJkg(10)), 6);
  });

  it('sends everything through a tank that is too cold and counts what is missing', () => {
    const tank = createTank(tight, 40);
    const io = stepOf({ draw: { loadFlowKgS: 0.2, setPointC: 82, mainsC: 10 } });
    tank.step(io);
    expect(io.drawnKg).toBeCloseTo(60, 9);
    expect(io.shortfallJ).toBeCloseTo(60 * (waterEnthalpyJkg(82) - waterEnthalpyJkg(40)), 0);
  });

  it('draws nothing for a set point at mains temperature', () => {
    const tank = createTank(tight, 40);
    const before = tank.energyJ();
    const io = stepOf({ draw: { loadFlowKgS: 0.2, setPointC: 12, mainsC: 12 } });
    tank.step(io);
    expect([io.loadNeedJ, io.heatDrawnJ, io.shortfallJ, io.drawnKg]).toEqual([0, 0, 0, 0]);
    expect(tank.energyJ() / before).toBeCloseTo(1, 14);
  });

  it('pushes the cold water up from the bottom', () => {
    const tank = createTank(tight, 80);
    const io = stepOf({ draw: { loadFlowKgS: 0.1, setPointC: 80, mainsC: 10 } });
    for (let i = 0; i < 10; i++) tank.step(io);
    expect(tank.bottomC).toBeLessThan(15);
    expect(tank.topC).toBeGreaterThan(78);
  });
});

describe('losing heat', () => {
  it('takes the plant room before the outdoor air, and the outdoor air outdoors', () => {
    const room = createTank(settings, 20);
    const roomStep = stepOf({ surroundingsC: -30 });
    room.step(roomStep);
    expect(roomStep.shellLossJ).toBeCloseTo(0, 1);
    const outdoors = createTank({ ...settings, surroundings: { kind: 'outdoors' } }, 20);
    const coldStep = stepOf({ surroundingsC: -30 });
    outdoors.step(coldStep);
    expect(coldStep.shellLossJ).toBeCloseTo(3 * 50 * 300, -2);
  });
});

/** A tank and a day of random flows. */
const anyTank = fc.record({
  layers: fc.integer({ min: 1, max: 40 }),
  volumeM3: fc.double({ min: 0.5, max: 5, noNaN: true }),
  heightM: fc.double({ min: 1, max: 3, noNaN: true }),
  lossUaWK: fc.double({ min: 0, max: 10, noNaN: true }),
  surroundings: fc.constant({ kind: 'outdoors' } as const),
  effectiveConductivityWmK: fc.double({ min: 0, max: 5, noNaN: true }),
  chargeInlet: fc.oneof(
    fc.constant({ kind: 'matchingLayer' } as const),
    fc.record({
      kind: fc.constant('fixedHeight' as const),
      heightFraction: fc.double({ min: 0, max: 1, noNaN: true }),
    }),
  ),
});
const anySteps = fc.array(
  fc.record({
    chargeFlowKgS: fc.oneof(fc.constant(0), fc.double({ min: 0, max: 0.3, noNaN: true })),
    chargeEnthalpyRiseJkg: fc.double({ min: -5 * 4180, max: 50 * 4180, noNaN: true }),
    surroundingsC: fc.double({ min: -10, max: 40, noNaN: true }),
    draw: fc.option(
      fc.record({
        loadFlowKgS: fc.double({ min: 0, max: 0.3, noNaN: true }),
        setPointC: fc.double({ min: 5, max: 95, noNaN: true }),
        mainsC: fc.double({ min: 2, max: 25, noNaN: true }),
      }),
    ),
  }),
  { minLength: 1, maxLength: 48 },
);
const anyStart = fc.double({ min: 5, max: 85, noNaN: true });

describe('for any tank and any flows', () => {
  it('energy is exact to round-off in every step, and need is what was drawn and what is missing', () => {
    fc.assert(
      fc.property(anyTank, anyStart, anySteps, (anySettings, startC, steps) => {
        const tank = createTank(anySettings, startC);
        const io = createTankStep();
        for (const conditions of steps) {
          const before = tank.energyJ();
          tank.step(Object.assign(io, { dtS: 300, ...conditions }));
          const scale = tank.massKg * 5e5;
          const residual = tank.energyJ() - before - (io.heatInJ - io.heatDrawnJ - io.shellLossJ);
          expect(Math.abs(residual)).toBeLessThan(3e-14 * scale);
          expect(Math.abs(io.loadNeedJ - io.heatDrawnJ - io.shortfallJ)).toBeLessThan(1e-13 * scale);
        }
      }),
      propertyRuns,
    );
  });

  it('no layer is warmer than the one above it', () => {
    fc.assert(
      fc.property(anyTank, anyStart, anySteps, (anySettings, startC, steps) => {
        const tank = createTank(anySettings, startC);
        const io = createTankStep();
        for (const conditions of steps) {
          tank.step(Object.assign(io, { dtS: 300, ...conditions }));
          const layers = temperatures(tank);
          layers.slice(1).forEach((tC, i) => {
            expect(tC - layers[i]!).toBeGreaterThan(-1e-9);
          });
        }
      }),
      propertyRuns,
    );
  });

  it('halving the inner step moves no layer by more than 0.05 K', () => {
    fc.assert(
      fc.property(anyTank, anyStart, anySteps, (anySettings, startC, steps) => {
        const coarse = createTank(anySettings, startC);
        const fine = createTank(anySettings, startC, { halvings: 1 });
        const io = createTankStep();
        for (const conditions of steps) {
          coarse.step(Object.assign(io, { dtS: 300, ...conditions }));
          fine.step(io);
          const fineC = temperatures(fine);
          temperatures(coarse).forEach((tC, i) => {
            expect(Math.abs(tC - fineC[i]!)).toBeLessThan(0.05);
          });
        }
      }),
      propertyRuns,
    );
  });
});
