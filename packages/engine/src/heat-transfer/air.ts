/**
 * Dry air as convection relations need it, at the film temperature (mean of surface and air). Viscosity and
 * conductivity do not depend on pressure. Made for −100…1000 °C; they go on smoothly and stay positive beyond,
 * for a solver that oversteps.
 */
import { ZERO_CELSIUS_K } from '../constants.js';

/** Specific gas constant of dry air [J/(kg·K)]. Source: US Standard Atmosphere 1976 (8314.32/28.9644). */
const AIR_GAS_CONSTANT = 287.053;

/** Colder than any film [K]: keeps the relations finite at absolute zero. */
const COLDEST_K = 1;

function kelvin(tC: number): number {
  return Math.max(COLDEST_K, tC + ZERO_CELSIUS_K);
}

/**
 * Density of dry air as an ideal gas.
 * @param tC temperature **[°C, −100…1000]**
 * @param pressurePa **[Pa, > 0]**
 * @returns **[kg/m³]**; humid air is up to 1 % lighter
 *
 * Source: ideal gas law with the gas constant of the US Standard Atmosphere 1976.
 * @example
 * airDensityKgM3(15, 101325) // 1.225
 */
export function airDensityKgM3(tC: number, pressurePa: number): number {
  return pressurePa / (AIR_GAS_CONSTANT * kelvin(tC));
}

/**
 * Dynamic viscosity of air.
 * @param tC temperature **[°C, −100…1000]**
 * @returns **[Pa·s]**, within 2.5 % of tabulated values to 900 °C
 *
 * Source: US Standard Atmosphere 1976, equation 51 (Sutherland's relation).
 * @example
 * airViscosityPas(15) // 1.789e-5
 */
export function airViscosityPas(tC: number): number {
  const t = kelvin(tC);
  return (1.458e-6 * t * Math.sqrt(t)) / (t + 110.4);
}

/**
 * Thermal conductivity of air.
 * @param tC temperature **[°C, −100…1000]**
 * @returns **[W/(m·K)]**, within 2.5 % of tabulated values to 900 °C
 *
 * Source: US Standard Atmosphere 1976, equation 53.
 * @example
 * airConductivityWmK(15) // 0.02533
 */
export function airConductivityWmK(tC: number): number {
  const t = kelvin(tC);
  return (2.64638e-3 * t * Math.sqrt(t)) / (t + 245.4 * Math.exp((-12 * Math.LN10) / t));
}

/** Characteristic temperatures of the vibration of nitrogen and oxygen [K]. Source: McQuarrie 1976, value from memory. */
const NITROGEN_VIBRATION_K = 3374;
const OXYGEN_VIBRATION_K = 2256;

/**
 * Heat capacity of dry air at constant pressure.
 *
 * Two-atomic gases turn and fly freely (7/2 R), argon only flies (5/2 R), and above some 300 °C the molecules'
 * vibration adds (x² eˣ/(eˣ − 1)² R with x = θ/T). By volume 78.09 % nitrogen, 20.95 % oxygen, 0.96 % the rest.
 * @param tC temperature **[°C, −100…1000]**
 * @returns **[J/(kg·K)]**, within 1 % of tabulated values
 *
 * Source: rigid rotor with harmonic vibration, e.g. McQuarrie 1976, Statistical Mechanics.
 * @example
 * airHeatCapacityJkgK(27) // 1004
 */
export function airHeatCapacityJkgK(tC: number): number {
  const t = kelvin(tC);
  const vibration =
    0.7809 * vibrationPart(NITROGEN_VIBRATION_K / t) + 0.2095 * vibrationPart(OXYGEN_VIBRATION_K / t);
  return AIR_GAS_CONSTANT * (3.4904 + vibration);
}

function vibrationPart(x: number): number {
  const e = Math.exp(-x);
  return (x * x * e) / ((1 - e) * (1 - e));
}

/**
 * Prandtl number of air: heat capacity × viscosity / conductivity.
 * @param tC temperature **[°C, −100…1000]**
 * @returns **[–]**, within 4 % of tabulated values to 900 °C
 * @example
 * airPrandtl(27) // 0.706
 */
export function airPrandtl(tC: number): number {
  return (airHeatCapacityJkgK(tC) * airViscosityPas(tC)) / airConductivityWmK(tC);
}

/** Air between a surface and its surroundings, all a convection relation asks for: computed once, used by several. */
export interface AirFilm {
  /** Mean of surface and air, absolute [K, ≥ 1]. */
  temperatureK: number;
  /** [W/(m·K)] */
  conductivityWmK: number;
  /** Viscosity over density [m²/s]. */
  kinematicViscosityM2S: number;
  /** [–] */
  prandtl: number;
}

/** An empty film to hand to {@link airFilm}. */
export function createAirFilm(): AirFilm {
  return { temperatureK: 0, conductivityWmK: 0, kinematicViscosityM2S: 0, prandtl: 0 };
}

/**
 * Writes the properties of the air film between a surface and the air, at the mean of both temperatures.
 * @param surfaceC **[°C]**
 * @param airC **[°C]**
 * @param pressurePa **[Pa, > 0]**
 * @param out where the properties go
 *
 * Source: film temperature as usual with the relations used here; the properties as in this file.
 */
export function airFilm(surfaceC: number, airC: number, pressurePa: number, out: AirFilm): void {
  const filmC = (surfaceC + airC) / 2;
  const conductivity = airConductivityWmK(filmC);
  const viscosity = airViscosityPas(filmC);
  out.temperatureK = kelvin(filmC);
  out.conductivityWmK = conductivity;
  out.kinematicViscosityM2S = viscosity / airDensityKgM3(filmC, pressurePa);
  out.prandtl = (airHeatCapacityJkgK(filmC) * viscosity) / conductivity;
}
