/**
 * Viscosity and conductivity of water by IAPWS: references that the engine's fits are made from and tested
 * against. Coefficients are values from memory, verified by the releases' own check values (transport.test.ts).
 */

/** Critical-point temperature [K] and density [kg/m³] that both releases reduce by. */
const CRITICAL_TEMPERATURE_K = 647.096;
const CRITICAL_DENSITY_KGM3 = 322;

/** Rows i, j, H of the residual viscosity (R12-08, Table 2). */
const VISCOSITY_TABLE_2: readonly (readonly [i: number, j: number, h: number])[] = [
  [0, 0, 5.20094e-1],
  [1, 0, 8.50895e-2],
  [2, 0, -1.08374],
  [3, 0, -2.89555e-1],
  [0, 1, 2.22531e-1],
  [1, 1, 9.99115e-1],
  [2, 1, 1.88797],
  [3, 1, 1.26613],
  [5, 1, 1.20573e-1],
  [0, 2, -2.81378e-1],
  [1, 2, -9.06851e-1],
  [2, 2, -7.72479e-1],
  [3, 2, -4.89837e-1],
  [4, 2, -2.5704e-1],
  [0, 3, 1.61913e-1],
  [1, 3, 2.57399e-1],
  [0, 4, -3.25372e-2],
  [3, 4, 6.98452e-2],
  [4, 5, 8.72102e-3],
  [3, 6, -4.35673e-3],
  [5, 6, -5.93264e-4],
];

/**
 * Dynamic viscosity of water [Pa·s], without the critical enhancement (nil below 200 °C).
 * Source: IAPWS R12-08, "Release on the IAPWS Formulation 2008 for the Viscosity of Ordinary Water Substance".
 */
export function iapwsViscosityPas(temperatureK: number, densityKgM3: number): number {
  const t = temperatureK / CRITICAL_TEMPERATURE_K;
  const d = densityKgM3 / CRITICAL_DENSITY_KGM3;
  const dilute = (100 * Math.sqrt(t)) / (1.67752 + 2.20462 / t + 0.6366564 / t ** 2 - 0.241605 / t ** 3);
  let sum = 0;
  for (const [i, j, h] of VISCOSITY_TABLE_2) sum += h * (1 / t - 1) ** i * (d - 1) ** j;
  return 1e-6 * dilute * Math.exp(d * sum);
}

/** L_ij of the residual conductivity (R15-11, Table 2): rows i = 0…4, columns j = 0…5. */
const CONDUCTIVITY_TABLE_2: readonly (readonly number[])[] = [
  [1.60397357, -0.646013523, 0.111443906, 0.102997357, -0.0504123634, 0.00609859258],
  [2.33771842, -2.78843778, 1.53616167, -0.463045512, 0.0832827019, -0.00719201245],
  [2.19650529, -4.54580785, 3.55777244, -1.40944978, 0.275418278, -0.0205938816],
  [-1.21051378, 1.60812989, -0.621178141, 0.0716373224, 0, 0],
  [-2.720337, 4.57586331, -3.18369245, 1.1168348, -0.19268305, 0.012913842],
];

/**
 * Thermal conductivity of water [W/(m·K)], without the critical enhancement (below 0.5 % in this range).
 * Source: IAPWS R15-11, "Release on the IAPWS Formulation 2011 for the Thermal Conductivity of Ordinary Water
 * Substance".
 */
export function iapwsConductivityWmK(temperatureK: number, densityKgM3: number): number {
  const t = temperatureK / CRITICAL_TEMPERATURE_K;
  const d = densityKgM3 / CRITICAL_DENSITY_KGM3;
  const dilute =
    Math.sqrt(t) /
    (2.443221e-3 + 1.323095e-2 / t + 6.770357e-3 / t ** 2 - 3.454586e-3 / t ** 3 + 4.096266e-4 / t ** 4);
  let sum = 0;
  CONDUCTIVITY_TABLE_2.forEach((row, i) => {
    row.forEach((l, j) => {
      sum += l * (1 / t - 1) ** i * (d - 1) ** j;
    });
  });
  return 1e-3 * dilute * Math.exp(d * sum);
}
