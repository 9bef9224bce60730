/**
 * Makes the coefficients of src/water/coefficients.ts from the IAPWS references, so that they can be remade and
 * tested: Chebyshev interpolation on the fit's range, rewritten as powers of x.
 */
import type * as Coefficients from '../../src/water/coefficients.js';
import { FIT_HIGH_C, FIT_LOW_C } from '../../src/water/coefficients.js';
import { fitPressureMPa, region1 } from './if97-region1.js';
import { iapwsConductivityWmK, iapwsViscosityPas } from './transport.js';

/** Names of the coefficient lists in src/water/coefficients.ts. */
export type CoefficientName = Exclude<keyof typeof Coefficients, 'FIT_LOW_C' | 'FIT_HIGH_C'>;

/** Reference properties of the engine's water at a temperature [°C], on the fits' pressure line. */
export const reference = {
  densityKgM3: (tC: number): number => 1 / state(tC).v,
  heatCapacityJkgK: (tC: number): number => 1000 * state(tC).cp,
  viscosityPas: (tC: number): number => iapwsViscosityPas(tC + 273.15, 1 / state(tC).v),
  conductivityWmK: (tC: number): number => iapwsConductivityWmK(tC + 273.15, 1 / state(tC).v),
};

function state(tC: number): ReturnType<typeof region1> {
  const temperatureK = tC + 273.15;
  return region1(temperatureK, fitPressureMPa(temperatureK));
}

/**
 * Coefficients c of the polynomial Σ c_k x^k that equals f at the Chebyshev nodes of [low, high], where
 * x = −1 at low and +1 at high.
 */
export function chebyshevFit(
  f: (value: number) => number,
  low: number,
  high: number,
  degree: number,
): number[] {
  const count = degree + 1;
  const nodes = Array.from({ length: count }, (_, k) => Math.cos((Math.PI * (k + 0.5)) / count));
  const values = nodes.map((x) => f(low + ((x + 1) / 2) * (high - low)));
  const coefficients = new Array<number>(count).fill(0);
  let previous = [0];
  let current = [1];
  for (let j = 0; j < count; j++) {
    const weight =
      ((j === 0 ? 1 : 2) / count) *
      values.reduce((sum, value, k) => sum + value * Math.cos((j * Math.PI * (k + 0.5)) / count), 0);
    current.forEach((c, power) => {
      coefficients[power]! += weight * c;
    });
    // T_{j+1} = 2 x T_j − T_{j−1}, except T_1 = x T_0.
    const next = [0, ...current.map((c) => (j === 0 ? c : 2 * c))];
    if (j > 0) {
      previous.forEach((c, power) => {
        next[power]! -= c;
      });
    }
    previous = current;
    current = next;
  }
  return coefficients;
}

/** Degrees of the fits: the lowest that meet the errors stated in src/water/water.ts. */
const DEGREES = { heatCapacity: 7, density: 5, fluidity: 5, conductivity: 5, temperature: 8 };

/** Value of Σ c_k x^k. */
export function polynomial(coefficients: readonly number[], x: number): number {
  return coefficients.reduceRight((sum, c) => sum * x + c, 0);
}

/** All coefficients of src/water/coefficients.ts, made anew from the references. */
export function fitWater(): Record<CoefficientName, number[]> {
  const fit = (f: (tC: number) => number, degree: number): number[] =>
    chebyshevFit(f, FIT_LOW_C, FIT_HIGH_C, degree);
  const heatCapacity = fit(reference.heatCapacityJkgK, DEGREES.heatCapacity);
  const mean = meanFromZero(heatCapacity);
  const enthalpy = (tC: number): number => tC * polynomial(mean, (tC - 100) / 100);
  const highest = enthalpy(FIT_HIGH_C);
  return {
    HEAT_CAPACITY: heatCapacity,
    MEAN_HEAT_CAPACITY: mean,
    TEMPERATURE_START: chebyshevFit((h) => bisect(enthalpy, h), 0, highest, DEGREES.temperature),
    DENSITY: fit(reference.densityKgM3, DEGREES.density),
    FLUIDITY: fit((tC) => 1 / reference.viscosityPas(tC), DEGREES.fluidity),
    CONDUCTIVITY: fit(reference.conductivityWmK, DEGREES.conductivity),
  };
}

/** Coefficients of (1/t) ∫ c dt from 0 to t, given those of c, both in powers of x = (t − 100)/100. */
function meanFromZero(c: readonly number[]): number[] {
  // The integral over x from −1 has the root x = −1; divide it by (x + 1) = t/100 by Horner's rule.
  const integral = [0, ...c.map((value, k) => value / (k + 1))];
  const quotient = new Array<number>(c.length).fill(0);
  let carried = 0;
  for (let k = c.length; k > 0; k--) {
    carried = integral[k]! - carried;
    quotient[k - 1] = carried;
  }
  return quotient;
}

/** The temperature [°C] whose enthalpy is h, to the last bit, by halving. */
function bisect(enthalpy: (tC: number) => number, h: number): number {
  let low = FIT_LOW_C - 1;
  let high = FIT_HIGH_C + 1;
  for (;;) {
    const middle = (low + high) / 2;
    if (middle <= low || middle >= high) return middle;
    if (enthalpy(middle) < h) low = middle;
    else high = middle;
  }
}
