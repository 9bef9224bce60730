import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { DomainError } from '../errors.js';
import { documentedExamples, evaluateExample } from '../../validation/documented-examples.js';
import { propertyRuns } from '../../validation/property-runs.js';
import * as air from './air.js';
import { buriedPipeConductanceWmK } from './buried-pipe.js';
import { counterFlowEffectiveness } from './epsilon-ntu.js';
import { flatFaceConvectionWm2K } from './flat-face-losses.js';
import * as natural from './flat-natural-convection.js';
import { flatWindConvectionWm2K } from './flat-wind-convection.js';
import { pipeConductanceWmK } from './pipe-insulation.js';
import { netRadiationWm2 } from './radiation.js';
import { clearSkyTemperatureK } from './sky-temperature.js';
import { stagnationTemperatureC, type StagnationInput } from './stagnation.js';

const SEA_LEVEL_PA = 101325;
const DOWN = Math.PI / 2;

describe('documented examples', () => {
  const scope = {
    ...air,
    ...natural,
    buriedPipeConductanceWmK,
    counterFlowEffectiveness,
    flatFaceConvectionWm2K,
    flatWindConvectionWm2K,
    pipeConductanceWmK,
    netRadiationWm2,
    clearSkyTemperatureK,
    stagnationTemperatureC,
  };
  const examples = documentedExamples(new URL('.', import.meta.url));

  it.each(examples)('$file: $expression', (example) => {
    expect(Math.abs(evaluateExample(example, scope) - example.promised)).toBeLessThanOrEqual(
      example.halfUnit,
    );
  });

  it('are there for every relation', () => {
    expect(examples.length).toBeGreaterThanOrEqual(14);
  });
});

const pipe = {
  boreM: 0.02,
  wallM: 0.001,
  insulationM: 0.05,
  insulationConductivityWmK: 0.035,
  outsideFilmWm2K: 15,
};
const dark: StagnationInput = {
  concentration: 254,
  dniWm2: 900,
  opticalEfficiency: 0.81,
  emittance: 0.9,
  lossWm2K: 20,
  ambientC: 20,
};

describe('convection from a face', () => {
  const face = fc.record({
    faceC: fc.double({ min: -20, max: 1400, noNaN: true }),
    airC: fc.double({ min: -40, max: 50, noNaN: true }),
    windMs: fc.double({ min: 0, max: 20, noNaN: true }),
    tiltDownRad: fc.double({ min: 0, max: DOWN, noNaN: true }),
    sideM: fc.double({ min: 0.05, max: 1, noNaN: true }),
  });

  it('lies between its stronger part and the sum of both, for any face', () => {
    fc.assert(
      fc.property(face, ({ faceC, airC, windMs, tiltDownRad, sideM }) => {
        const both = flatFaceConvectionWm2K(faceC, airC, windMs, tiltDownRad, sideM, SEA_LEVEL_PA);
        const still = natural.flatNaturalConvectionWm2K(faceC, airC, tiltDownRad, sideM, SEA_LEVEL_PA);
        const wind = flatWindConvectionWm2K(faceC, airC, windMs, sideM, SEA_LEVEL_PA);
        expect(both).toBeGreaterThanOrEqual(Math.max(still, wind) * (1 - 1e-12));
        expect(both).toBeLessThanOrEqual(still + wind);
      }),
      propertyRuns,
    );
  });

  it('loses more heat the hotter it is, which a solver of its balance relies on', () => {
    fc.assert(
      fc.property(face, fc.double({ min: 1e-3, max: 200, noNaN: true }), (f, rise) => {
        const lossWm2 = (faceC: number): number =>
          flatFaceConvectionWm2K(faceC, f.airC, f.windMs, f.tiltDownRad, f.sideM, SEA_LEVEL_PA) *
          (faceC - f.airC);
        expect(lossWm2(f.faceC + rise)).toBeGreaterThan(lossWm2(f.faceC));
      }),
      propertyRuns,
    );
  });

  it('stays finite far outside its range, where a solver may look', () => {
    for (const faceC of [-273.15, 20, 5_000, 50_000]) {
      const value = flatFaceConvectionWm2K(faceC, 20, 0, 0.5, 0.3, SEA_LEVEL_PA);
      expect(value).toBeGreaterThan(0);
      expect(Number.isFinite(value)).toBe(true);
    }
  });

  it('is weaker the more the face looks down, and weaker in thin air', () => {
    const at = (tilt: number, pressurePa = SEA_LEVEL_PA): number =>
      flatFaceConvectionWm2K(300, 20, 0, tilt, 0.3, pressurePa);
    expect(at(0)).toBeGreaterThan(at(0.8));
    expect(at(0.8)).toBeGreaterThan(at(DOWN));
    expect(at(0, 80_000)).toBeLessThan(at(0));
  });

  it('takes the relation for a face looking down where the upright one would fall to conduction', () => {
    const straightDown = natural.flatNaturalConvectionWm2K(300, 20, DOWN, 0.3, SEA_LEVEL_PA);
    const conductionOnly = (0.825 ** 2 * air.airConductivityWmK(160)) / 0.3;
    expect(straightDown).toBeGreaterThan(10 * conductionOnly);
  });

  it('refuses a face that looks up', () => {
    expect(() => flatFaceConvectionWm2K(300, 20, 0, -0.2, 0.3, SEA_LEVEL_PA)).toThrow(DomainError);
    expect(() => flatFaceConvectionWm2K(300, 20, 0, Number.NaN, 0.3, SEA_LEVEL_PA)).toThrow(
      'tilt of the face',
    );
  });

  it('grows with the root of the wind', () => {
    const one = flatWindConvectionWm2K(100, 20, 1, 0.3, SEA_LEVEL_PA);
    expect(flatWindConvectionWm2K(100, 20, 4, 0.3, SEA_LEVEL_PA) / one).toBeCloseTo(2, 12);
    expect(flatWindConvectionWm2K(100, 20, 0, 0.3, SEA_LEVEL_PA)).toBe(0);
  });
});

describe('netRadiationWm2', () => {
  it('changes sign with the direction and is nil in balance', () => {
    expect(netRadiationWm2(0.9, 20, 20)).toBe(0);
    expect(netRadiationWm2(0.9, 20, 100)).toBeCloseTo(-netRadiationWm2(0.9, 100, 20), 9);
  });
});

describe('counterFlowEffectiveness', () => {
  it('is continuous at balanced flow and for a constant side', () => {
    expect(counterFlowEffectiveness(3, 1)).toBe(0.75);
    expect(counterFlowEffectiveness(3, 1 - 1e-8)).toBeCloseTo(0.75, 7);
    expect(counterFlowEffectiveness(3, 0)).toBeCloseTo(1 - Math.exp(-3), 14);
    expect(counterFlowEffectiveness(0, 0.5)).toBe(0);
  });

  it('grows with size, falls with the capacity ratio and never passes 1', () => {
    const ntu = fc.double({ min: 0, max: 100, noNaN: true });
    const ratio = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(ntu, ratio, (n, r) => {
        const value = counterFlowEffectiveness(n, r);
        expect(value).toBeLessThanOrEqual(1);
        expect(counterFlowEffectiveness(n + 0.1, r)).toBeGreaterThanOrEqual(value);
        expect(counterFlowEffectiveness(n, r / 2)).toBeGreaterThanOrEqual(value - 1e-9);
      }),
      propertyRuns,
    );
  });

  it('refuses a ratio above 1 and a negative size', () => {
    expect(() => counterFlowEffectiveness(1, 1.1)).toThrow('capacity ratio');
    expect(() => counterFlowEffectiveness(-1, 0.5)).toThrow('NTU');
  });
});

describe('pipeConductanceWmK', () => {
  it('is the film alone without insulation', () => {
    expect(pipeConductanceWmK({ ...pipe, insulationM: 0 })).toBeCloseTo(Math.PI * 0.022 * 15, 12);
  });

  it('shows the critical radius: a thin layer on a thin pipe loses more than none', () => {
    // k/h = 0.5/5 = 0.1 m, far outside the bare pipe's 0.011 m.
    const poor = { ...pipe, insulationConductivityWmK: 0.5, outsideFilmWm2K: 5 };
    expect(pipeConductanceWmK({ ...poor, insulationM: 0.01 })).toBeGreaterThan(
      pipeConductanceWmK({ ...poor, insulationM: 0 }),
    );
  });

  it('refuses a negative thickness by name', () => {
    expect(() => pipeConductanceWmK({ ...pipe, insulationM: -0.01 })).toThrow('pipe insulation');
  });
});

describe('stagnationTemperatureC', () => {
  it('closes its balance for any face', () => {
    const input = fc.record({
      concentration: fc.double({ min: 1, max: 10_000, noNaN: true }),
      dniWm2: fc.double({ min: 1, max: 1100, noNaN: true }),
      opticalEfficiency: fc.double({ min: 0.01, max: 1, noNaN: true }),
      emittance: fc.double({ min: 0.01, max: 1, noNaN: true }),
      lossWm2K: fc.double({ min: 0, max: 100, noNaN: true }),
      ambientC: fc.double({ min: -40, max: 50, noNaN: true }),
    });
    fc.assert(
      fc.property(input, (face) => {
        const faceC = stagnationTemperatureC(face);
        const absorbed = face.concentration * face.dniWm2 * face.opticalEfficiency;
        const lost =
          netRadiationWm2(face.emittance, faceC, face.ambientC) + face.lossWm2K * (faceC - face.ambientC);
        expect(Math.abs(lost / absorbed - 1)).toBeLessThan(1e-9);
      }),
      propertyRuns,
    );
  });

  it('is ambient without sun, and linear without radiation', () => {
    expect(stagnationTemperatureC({ ...dark, dniWm2: 0 })).toBeCloseTo(20, 9);
    expect(stagnationTemperatureC({ ...dark, emittance: 0 })).toBeCloseTo(20 + (254 * 900 * 0.81) / 20, 6);
  });

  it('refuses a face that cannot lose heat', () => {
    expect(() => stagnationTemperatureC({ ...dark, emittance: 0, lossWm2K: 0 })).toThrow('loss of the face');
  });
});
