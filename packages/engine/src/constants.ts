/** Physical constants used by more than one module; each with unit and source. */

/** Stefan–Boltzmann constant [W/(m²·K⁴)]. Source: CODATA 2018 (exact in the 2019 SI). */
export const STEFAN_BOLTZMANN = 5.670374419e-8;

/** Boltzmann constant [J/K]. Source: SI 2019, exact. */
export const BOLTZMANN = 1.380649e-23;

/** Elementary charge [C]. Source: SI 2019, exact. */
export const ELEMENTARY_CHARGE = 1.602176634e-19;

/** Standard acceleration of gravity [m/s²]. Source: 3rd CGPM 1901, exact. */
export const GRAVITY = 9.80665;

/** Zero of the Celsius scale [K]. Source: SI, exact. */
export const ZERO_CELSIUS_K = 273.15;

/** Pressure of the standard atmosphere at sea level [Pa]. Source: ISO 2533:1975. */
export const STANDARD_PRESSURE_PA = 101325;

/** Total solar irradiance at 1 au [W/m²]. Source: Kopp & Lean 2011, Geophys. Res. Lett. 38, L01706. */
export const SOLAR_CONSTANT_WM2 = 1361;

/** Joules in a kilowatt-hour [J/kWh]. Exact. */
export const JOULES_PER_KWH = 3.6e6;
