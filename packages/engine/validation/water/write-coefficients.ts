/** Prints src/water/coefficients.ts made anew: `tsx packages/engine/validation/water/write-coefficients.ts`. */
import { FIT_HIGH_C, FIT_LOW_C } from '../../src/water/coefficients.js';
import { type CoefficientName, fitWater } from './fit.js';

const MEANING: Record<CoefficientName, string> = {
  HEAT_CAPACITY: 'Heat capacity [J/(kg·K)] in powers of x.',
  MEAN_HEAT_CAPACITY:
    'Mean heat capacity from 0 °C to t [J/(kg·K)] in powers of x: the exact integral of HEAT_CAPACITY, over t.',
  TEMPERATURE_START:
    'Temperature [°C] in powers of y = 2h/h(200 °C) − 1, within 1e-4 K: where the exact inversion starts.',
  DENSITY: 'Density [kg/m³] in powers of x.',
  FLUIDITY: 'Fluidity, 1/viscosity [1/(Pa·s)], in powers of x.',
  CONDUCTIVITY: 'Thermal conductivity [W/(m·K)] in powers of x.',
};

const lines = [
  '/**',
  ' * Polynomials of liquid water, x = (t − 100 °C)/100 K. Made by validation/water/write-coefficients.ts from',
  ' * IAPWS-IF97 region 1, IAPWS R12-08 and R15-11 at 1 MPa, or saturation where that is higher; a test remakes them.',
  ' */',
  '',
  '/** Lowest and highest temperature of the fits [°C]. */',
  `export const FIT_LOW_C = ${FIT_LOW_C};`,
  `export const FIT_HIGH_C = ${FIT_HIGH_C};`,
];
for (const [name, coefficients] of Object.entries(fitWater())) {
  lines.push('', `/** ${MEANING[name as CoefficientName]} */`);
  lines.push(`export const ${name} = [${coefficients.join(', ')}] as const;`);
}
process.stdout.write(`${lines.join('\n')}\n`);
