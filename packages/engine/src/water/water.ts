/**
 * Liquid water from 0 to 200 °C, kept liquid: at 1 MPa, or at saturation pressure where that is higher (above
 * 179.9 °C). Pressure changes these properties by less than 0.1 % per MPa, so they hold for any open or
 * pressurised store. Polynomials fitted to IAPWS-IF97 region 1 (density, heat capacity), IAPWS R12-08
 * (viscosity) and IAPWS R15-11 (conductivity).
 *
 * Outside 0–200 °C each property keeps its value at that end and the enthalpy goes on straight, so that a solver
 * that oversteps meets a smooth, growing function. NaN in, NaN out: inputs are checked where they enter a step.
 */
import {
  CONDUCTIVITY,
  DENSITY,
  FIT_HIGH_C,
  FIT_LOW_C,
  FLUIDITY,
  HEAT_CAPACITY,
  MEAN_HEAT_CAPACITY,
  TEMPERATURE_START,
} from './coefficients.js';

// Horner's rule is written out term by term: these run in every stage of every step.
const [C0, C1, C2, C3, C4, C5, C6, C7] = HEAT_CAPACITY;
const [M0, M1, M2, M3, M4, M5, M6, M7] = MEAN_HEAT_CAPACITY;
const [T0, T1, T2, T3, T4, T5, T6, T7, T8] = TEMPERATURE_START;
const [D0, D1, D2, D3, D4, D5] = DENSITY;
const [F0, F1, F2, F3, F4, F5] = FLUIDITY;
const [K0, K1, K2, K3, K4, K5] = CONDUCTIVITY;

/** Heat capacity at the ends of the fit [J/(kg·K)] and enthalpy at the upper end [J/kg]. */
const LOW_HEAT_CAPACITY = heatCapacityAt(-1);
const HIGH_HEAT_CAPACITY = heatCapacityAt(1);
const HIGH_ENTHALPY = FIT_HIGH_C * meanHeatCapacityAt(1);

function heatCapacityAt(x: number): number {
  return C0 + x * (C1 + x * (C2 + x * (C3 + x * (C4 + x * (C5 + x * (C6 + x * C7))))));
}

function meanHeatCapacityAt(x: number): number {
  return M0 + x * (M1 + x * (M2 + x * (M3 + x * (M4 + x * (M5 + x * (M6 + x * M7))))));
}

/** The fits' variable: −1 at 0 °C, +1 at 200 °C, held there beyond. */
function scaled(tC: number): number {
  return tC <= FIT_LOW_C ? -1 : tC >= FIT_HIGH_C ? 1 : (tC - 100) * 0.01;
}

/**
 * Heat capacity of liquid water at constant pressure.
 * @param tC temperature **[°C, 0…200; the end's value beyond]**
 * @returns **[J/(kg·K)]**, within 0.03 % of the source
 *
 * Source: fit to IAPWS R7-97(2012), region 1.
 * @example
 * waterHeatCapacityJkgK(50) // 4177.7
 */
export function waterHeatCapacityJkgK(tC: number): number {
  return heatCapacityAt(scaled(tC));
}

/**
 * Specific enthalpy of liquid water above 0 °C: the exact integral of {@link waterHeatCapacityJkgK} over
 * temperature. Heat carried by any stream is mass × a difference of these, so that balances close.
 * @param tC temperature **[°C, 0…200; straight on beyond]**
 * @returns **[J/kg]**, 0 at 0 °C, growing with tC
 *
 * Source: analytic integral of the fit to IAPWS R7-97(2012), region 1.
 * @example
 * waterEnthalpyJkg(100) // 418800.2
 */
export function waterEnthalpyJkg(tC: number): number {
  if (tC <= FIT_LOW_C) return LOW_HEAT_CAPACITY * tC;
  if (tC >= FIT_HIGH_C) return HIGH_ENTHALPY + HIGH_HEAT_CAPACITY * (tC - FIT_HIGH_C);
  return tC * meanHeatCapacityAt((tC - 100) * 0.01);
}

/**
 * Temperature of liquid water of a given specific enthalpy: the inverse of {@link waterEnthalpyJkg}.
 * @param enthalpyJkg above 0 °C **[J/kg, 0…852 000; straight on beyond]**
 * @returns **[°C]**; waterEnthalpyJkg of it gives enthalpyJkg back within 1e-12
 *
 * Method: a polynomial start within 1e-4 K and one Newton step, whose error is (start's error)² × c′/2c < 1e-11 K;
 * a second step takes it to the last bits.
 * @example
 * waterTemperatureC(418800.2) // 100
 */
export function waterTemperatureC(enthalpyJkg: number): number {
  if (enthalpyJkg <= 0) return enthalpyJkg / LOW_HEAT_CAPACITY;
  if (enthalpyJkg >= HIGH_ENTHALPY) {
    return FIT_HIGH_C + (enthalpyJkg - HIGH_ENTHALPY) / HIGH_HEAT_CAPACITY;
  }
  const start = temperatureStart(enthalpyJkg);
  const x = (start - 100) * 0.01;
  const next = start - (start * meanHeatCapacityAt(x) - enthalpyJkg) / heatCapacityAt(x);
  const nextX = (next - 100) * 0.01;
  return next - (next * meanHeatCapacityAt(nextX) - enthalpyJkg) / heatCapacityAt(nextX);
}

/**
 * Temperature of liquid water of a given specific enthalpy without the Newton steps: for conduction and losses
 * inside a store, which need no more.
 * @param enthalpyJkg above 0 °C **[J/kg, 0…852 000; straight on beyond]**
 * @returns **[°C]**, within 1e-4 K of {@link waterTemperatureC}
 */
export function waterTemperatureNearC(enthalpyJkg: number): number {
  if (enthalpyJkg <= 0) return enthalpyJkg / LOW_HEAT_CAPACITY;
  if (enthalpyJkg >= HIGH_ENTHALPY) {
    return FIT_HIGH_C + (enthalpyJkg - HIGH_ENTHALPY) / HIGH_HEAT_CAPACITY;
  }
  return temperatureStart(enthalpyJkg);
}

function temperatureStart(enthalpyJkg: number): number {
  const y = (2 / HIGH_ENTHALPY) * enthalpyJkg - 1;
  return T0 + y * (T1 + y * (T2 + y * (T3 + y * (T4 + y * (T5 + y * (T6 + y * (T7 + y * T8)))))));
}

/**
 * Density of liquid water.
 * @param tC temperature **[°C, 0…200; the end's value beyond]**
 * @returns **[kg/m³]**, within 0.01 % of the source
 *
 * Source: fit to IAPWS R7-97(2012), region 1.
 * @example
 * waterDensityKgM3(20) // 998.6
 */
export function waterDensityKgM3(tC: number): number {
  const x = scaled(tC);
  return D0 + x * (D1 + x * (D2 + x * (D3 + x * (D4 + x * D5))));
}

/**
 * Dynamic viscosity of liquid water.
 * @param tC temperature **[°C, 0…200; the end's value beyond]**
 * @returns **[Pa·s]**, within 0.03 % of the source
 *
 * Source: fit to IAPWS R12-08.
 * @example
 * waterViscosityPas(25) // 0.00089
 */
export function waterViscosityPas(tC: number): number {
  const x = scaled(tC);
  return 1 / (F0 + x * (F1 + x * (F2 + x * (F3 + x * (F4 + x * F5)))));
}

/**
 * Thermal conductivity of liquid water.
 * @param tC temperature **[°C, 0…200; the end's value beyond]**
 * @returns **[W/(m·K)]**, within 0.1 % of the source without its critical enhancement, which adds under 0.5 %
 *
 * Source: fit to IAPWS R15-11.
 * @example
 * waterConductivityWmK(25) // 0.607
 */
export function waterConductivityWmK(tC: number): number {
  const x = scaled(tC);
  return K0 + x * (K1 + x * (K2 + x * (K3 + x * (K4 + x * K5))));
}

/**
 * Prandtl number of liquid water: heat capacity × viscosity / conductivity.
 * @param tC temperature **[°C, 0…200; the end's value beyond]**
 * @returns **[–]**
 * @example
 * waterPrandtl(25) // 6.127
 */
export function waterPrandtl(tC: number): number {
  return (waterHeatCapacityJkgK(tC) * waterViscosityPas(tC)) / waterConductivityWmK(tC);
}
