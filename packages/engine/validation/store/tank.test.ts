import { describe, expect, it } from 'vitest';
import {
  createTank,
  createTankStep,
  type TankFluid,
  type TankSettings,
} from '../../src/store/stratified-tank.js';
import { waterEnthalpyJkg } from '../../src/water/water.js';
import { DAY_CASES, type DayCase } from './day-cases.js';
import { pythonWithScipy, solveStiff, storedFigures } from './stiff-solver.js';

/** A liquid of constant properties, for checks that have a closed form. */
const constant: TankFluid = {
  densityKgM3: () => 990,
  enthalpyJkg: (tC) => 4182 * tC,
  temperatureC: (enthalpyJkg) => enthalpyJkg / 4182,
  temperatureNearC: (enthalpyJkg) => enthalpyJkg / 4182,
};

const plain: TankSettings = {
  volumeM3: 1,
  layers: 1,
  heightM: 1.5,
  lossUaWK: 0,
  surroundings: { kind: 'outdoors' },
  effectiveConductivityWmK: 0,
  chargeInlet: { kind: 'matchingLayer' },
};

describe('closed forms', () => {
  it('mixed tank, 1 m³, ρ 990, c 4182, UA 3 W/K, 60 °C in 20 °C air for 24 h: 57.5725 °C ± 1e-3 K (analytic)', () => {
    const tank = createTank({ ...plain, lossUaWK: 3 }, 60, { fluid: constant });
    const io = Object.assign(createTankStep(), { dtS: 300, surroundingsC: 20 });
    for (let i = 0; i < 288; i++) tank.step(io);
    expect(Math.abs(tank.topC - 57.5725)).toBeLessThan(1e-3);
    expect(Math.abs(tank.topC - (20 + 40 * Math.exp((-3 * 86400) / (990 * 4182))))).toBeLessThan(1e-9);
  });

  it.each([1, 3, 10, 40])(
    '%d stirred layers in series answer a cold inflow by the Erlang distribution',
    (layers) => {
      // Constant flow upwards and no loss: the top is e^(−Nτ) Σ (Nτ)^k/k! of the way from mains to start (analytic,
      // e.g. Levenspiel, Chemical Reaction Engineering, tanks in series). Enthalpy is exact in water too.
      const tank = createTank({ ...plain, layers }, 60);
      const draw = { loadFlowKgS: 0.1, setPointC: 95, mainsC: 10 };
      const io = Object.assign(createTankStep(), { dtS: 300, surroundingsC: 20, draw });
      const startJkg = waterEnthalpyJkg(60);
      const mainsJkg = waterEnthalpyJkg(10);
      for (let step = 1; step <= 48; step++) {
        tank.step(io);
        const throughLayers = (0.1 * 300 * step * layers) / tank.massKg;
        let term = Math.exp(-throughLayers);
        let sum = 0;
        for (let k = 0; k < layers; k++) {
          sum += term;
          term *= throughLayers / (k + 1);
        }
        const topJkg = mainsJkg + sum * (startJkg - mainsJkg);
        expect(Math.abs(waterEnthalpyJkg(tank.topC) - topJkg) / 4180).toBeLessThan(0.005);
      }
    },
  );
});

/** Layer temperatures of the engine's tank at the end of each hour [°C]. */
function runDay(day: DayCase): number[][] {
  const tank = createTank(day.tank, day.initialC);
  const io = Object.assign(createTankStep(), { dtS: day.stepS });
  const draw = { loadFlowKgS: 0, setPointC: day.setPointC, mainsC: day.mainsC };
  return Array.from({ length: 24 }, (_, hour) => {
    io.chargeFlowKgS = day.chargeFlowKgS[hour]!;
    io.chargeEnthalpyRiseJkg = day.chargeEnthalpyRiseJkg[hour]!;
    draw.loadFlowKgS = day.loadFlowKgS[hour]!;
    io.draw = draw;
    for (let i = 0; i < 3600 / day.stepS; i++) tank.step(io);
    const layersC = new Float64Array(tank.layers);
    tank.temperaturesC(layersC);
    return [...layersC];
  });
}

/** Largest difference between two days of layer temperatures [K]. */
function furthest(a: readonly (readonly number[])[], b: readonly (readonly number[])[]): number {
  return Math.max(...a.flatMap((layers, hour) => layers.map((tC, i) => Math.abs(tC - b[hour]![i]!))));
}

describe('a day of charge and draw in 10 layers against a stiff solver', () => {
  const stored = storedFigures();
  const python = pythonWithScipy();

  it.each(DAY_CASES)('$name: each layer within 0.05 K each hour of the stored figures of scipy', (day) => {
    const figures = stored.find((candidate) => candidate.case.name === day.name);
    // The figures belong to these inputs: after a change of either, run write-stiff-figures.ts.
    expect(figures?.case).toEqual(day);
    const engine = runDay(day);
    expect(furthest(engine, figures!.hourlyC)).toBeLessThan(0.05);
    // The day is worth comparing: the layers are far apart.
    const noon = engine[11]!;
    expect(noon.at(-1)! - noon[0]!).toBeGreaterThan(25);
  });

  it.skipIf(python === undefined).each(DAY_CASES)(
    '$name: the stored figures are what scipy finds (skipped without Debian’s python3-scipy)',
    (day) => {
      const fresh = solveStiff(python!, day);
      const figures = stored.find((candidate) => candidate.case.name === day.name);
      // Versions of scipy may step differently; a tenth of the tolerance above is left to them.
      expect(furthest(fresh.hourlyC, figures!.hourlyC)).toBeLessThan(5e-3);
    },
    120_000,
  );
});
