import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { propertyRuns } from '../../validation/property-runs.js';
import { BENCH_DISH, cellSettings } from '../../validation/receivers/machines.js';
import { squareFluxDistribution } from '../optics/flux-map.js';
import { CellArray, ONE_SUN_WM2, groupingFactor } from './cell-array.js';

const even = cellSettings({
  secondary: { kind: 'mixingDuct', entrySideM: 0.28, transmittance: 1, unevenness: 0 },
});
const areaM2 = even.face.sideM ** 2;

describe('a cell array', () => {
  it('gives its reference efficiency at reference concentration and temperature', () => {
    const { cell, packingFraction } = even;
    const fluxWm2 = cell.referenceConcentration * ONE_SUN_WM2;
    const plateC = cell.referenceTemperatureC - fluxWm2 * cell.areaResistanceM2KW;
    const power = new CellArray(even, BENCH_DISH).powerW(fluxWm2 * areaM2, plateC);
    expect(power / (fluxWm2 * areaM2 * packingFraction)).toBeCloseTo(cell.referenceEfficiency, 12);
  });

  it('follows the written relation at another concentration and temperature', () => {
    // By hand: g = 3.3 × 1.380649e-23 × 298.15 / (1.602176634e-19 × 3.1) = 0.0273500; C = 200, plate 80 °C, R = 4e-5, so cell 88 °C:
    // 0.39 × (1 + 0.02735 ln 0.4) × (1 + 300/6000) × (1 − 0.0012 × 63) = 0.39 × 0.974939 × 1.05 × 0.9244 = 0.369059
    const power = new CellArray(even, BENCH_DISH).powerW(200 * ONE_SUN_WM2 * areaM2, 80);
    expect(power / (200 * ONE_SUN_WM2 * areaM2 * 0.9)).toBeCloseTo(0.36906, 4);
  });

  it('has a best concentration: more light is not always a better cell', () => {
    const array = new CellArray(even, BENCH_DISH);
    const efficiency = (suns: number) => array.powerW(suns * ONE_SUN_WM2 * areaM2, 25) / suns;
    const suns = Array.from({ length: 200 }, (_, index) => 2 + index * 10);
    const best = suns.reduce((a, b) => (efficiency(b) > efficiency(a) ? b : a));
    expect(best).toBeGreaterThan(suns[0]!);
    expect(best).toBeLessThan(suns.at(-1)!);
  });

  it('warms its brightest cell by local flux times resistance', () => {
    const uneven = cellSettings({
      secondary: { kind: 'mixingDuct', entrySideM: 0.28, transmittance: 1, unevenness: 0.2 },
    });
    const array = new CellArray(uneven, BENCH_DISH);
    const incidentW = 12_000;
    expect(array.peakRatio).toBeCloseTo(1.2, 2);
    expect(array.hottestC(incidentW, 70)).toBeCloseTo(70 + (incidentW / areaM2) * array.peakRatio * 4e-5, 9);
  });

  it('bare in the focal plane of a good mirror gives next to nothing in series', () => {
    const bare = (grouping: 'seriesString' | 'bypassedString' | 'parallel') =>
      new CellArray(cellSettings({ secondary: { kind: 'none' }, grouping }), BENCH_DISH);
    expect(bare('parallel').peakRatio).toBeGreaterThan(4);
    expect(bare('seriesString').groupingFactor).toBeLessThan(0.05);
    expect(bare('bypassedString').groupingFactor).toBeLessThan(0.6);
    expect(bare('parallel').groupingFactor).toBe(1);
  });
});

describe('an unevenly lit array', () => {
  it('gives the sum of its cells, each by the written relation', () => {
    const settings = cellSettings({ secondary: { kind: 'none' }, grouping: 'parallel' });
    const { relativeFlux } = squareFluxDistribution(BENCH_DISH, settings.face.sideM, settings.cellsPerSide);
    const { cell } = settings;
    const incidentW = 9000;
    const gain = (3.3 * 1.380649e-23 * 298.15) / (1.602176634e-19 * 3.1);
    const summed = relativeFlux.reduce((sum, ratio) => {
      const fluxWm2 = (incidentW / areaM2) * ratio;
      const suns = fluxWm2 / 1000;
      const voltage = Math.max(0, 1 + gain * Math.log(suns / cell.referenceConcentration));
      const series = Math.max(0, 1 - (suns - cell.referenceConcentration) / cell.seriesConcentration);
      const warmth = Math.max(
        0,
        1 - cell.temperatureCoefficientPerK * (70 + fluxWm2 * cell.areaResistanceM2KW - 25),
      );
      return (
        sum +
        (incidentW / relativeFlux.length) * ratio * 0.9 * cell.referenceEfficiency * voltage * series * warmth
      );
    }, 0);
    expect(new CellArray(settings, BENCH_DISH).powerW(incidentW, 70) / summed).toBeCloseTo(1, 5);
  });
});

describe('grouping of cells', () => {
  it('holds a string of equal cells to nothing', () => {
    const equal = new Float64Array(9).fill(1);
    expect(groupingFactor(equal, 'bypassedString', 2.7, 0.5)).toBeCloseTo(1, 12);
    expect(groupingFactor(equal, 'seriesString', 2.7, 0.5)).toBeCloseTo(1, 12);
  });

  it('drops one dark cell of four: 3 × 2.7 − 0.5 volts at full current', () => {
    expect(groupingFactor(Float64Array.of(1, 0, 1, 1), 'bypassedString', 2.7, 0.5)).toBeCloseTo(
      (3 * 2.7 - 0.5) / (3 * 2.7),
      12,
    );
    expect(groupingFactor(Float64Array.of(1, 0, 1, 1), 'seriesString', 2.7, 0.5)).toBe(0);
  });

  it('is never better than parallel, and bypass never worse than plain series', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0, max: 5, noNaN: true }), { minLength: 1, maxLength: 40 }),
        (currents) => {
          const ratios = Float64Array.from(currents);
          const bypassed = groupingFactor(ratios, 'bypassedString', 2.7, 0.5);
          expect(bypassed).toBeLessThanOrEqual(1 + 1e-12);
          expect(bypassed).toBeGreaterThanOrEqual(groupingFactor(ratios, 'seriesString', 2.7, 0.5) - 1e-12);
        },
      ),
      propertyRuns,
    );
  });
});
