/**
 * Liquid water by IAPWS-IF97, region 1: the reference that the engine's fits are made from and tested against.
 * Not used by the engine itself, which needs an enthalpy that inverts fast and exactly.
 *
 * Source: IAPWS R7-97(2012), "Revised Release on the IAPWS Industrial Formulation 1997", equation 7 and
 * Table 2. Coefficients are values from memory, verified by every row of Table 5 (if97.test.ts): one wrong
 * digit moves a row by more than the 1e-8 allowed.
 */

/** Rows of Table 2: exponent I of pressure, exponent J of temperature, coefficient n. */
const TABLE_2: readonly (readonly [I: number, J: number, n: number])[] = [
  [0, -2, 0.14632971213167],
  [0, -1, -0.84548187169114],
  [0, 0, -0.3756360367204e1],
  [0, 1, 0.33855169168385e1],
  [0, 2, -0.95791963387872],
  [0, 3, 0.15772038513228],
  [0, 4, -0.16616417199501e-1],
  [0, 5, 0.81214629983568e-3],
  [1, -9, 0.28319080123804e-3],
  [1, -7, -0.60706301565874e-3],
  [1, -1, -0.18990068218419e-1],
  [1, 0, -0.32529748770505e-1],
  [1, 1, -0.21841717175414e-1],
  [1, 3, -0.5283835796993e-4],
  [2, -3, -0.47184321073267e-3],
  [2, 0, -0.30001780793026e-3],
  [2, 1, 0.47661393906987e-4],
  [2, 3, -0.44141845330846e-5],
  [2, 17, -0.72694996297594e-15],
  [3, -4, -0.31679644845054e-4],
  [3, 0, -0.28270797985312e-5],
  [3, 6, -0.85205128120103e-9],
  [4, -5, -0.22425281908e-5],
  [4, -2, -0.65171222895601e-6],
  [4, 10, -0.14341729937924e-12],
  [5, -8, -0.40516996860117e-6],
  [8, -11, -0.12734301741641e-8],
  [8, -6, -0.17424871230634e-9],
  [21, -29, -0.68762131295531e-18],
  [23, -31, 0.14478307828521e-19],
  [29, -38, 0.26335781662795e-22],
  [30, -39, -0.11947622640071e-22],
  [31, -40, 0.18228094581404e-23],
  [32, -41, -0.93537087292458e-25],
];

/** Specific gas constant of water [kJ/(kg·K)], equation 1 of the release. */
const GAS_CONSTANT_KJ_KGK = 0.461526;
const REDUCING_PRESSURE_MPA = 16.53;
const REDUCING_TEMPERATURE_K = 1386;

/** One state of liquid water, in the units of the release's Table 5. */
export interface Region1State {
  /** Specific volume [m³/kg]. */
  readonly v: number;
  /** Specific enthalpy [kJ/kg]. */
  readonly h: number;
  /** Specific internal energy [kJ/kg]. */
  readonly u: number;
  /** Specific entropy [kJ/(kg·K)]. */
  readonly s: number;
  /** Isobaric heat capacity [kJ/(kg·K)]. */
  readonly cp: number;
  /** Speed of sound [m/s]. */
  readonly w: number;
}

/**
 * State of liquid water at temperature and pressure.
 * @param temperatureK [K, 273.15…623.15]
 * @param pressureMPa [MPa, saturation…100]
 */
export function region1(temperatureK: number, pressureMPa: number): Region1State {
  const pi = pressureMPa / REDUCING_PRESSURE_MPA;
  const tau = REDUCING_TEMPERATURE_K / temperatureK;
  const a = 7.1 - pi;
  const b = tau - 1.222;
  let gamma = 0;
  let gammaPi = 0;
  let gammaPiPi = 0;
  let gammaTau = 0;
  let gammaTauTau = 0;
  let gammaPiTau = 0;
  for (const [i, j, n] of TABLE_2) {
    const bj = b ** j;
    const bj1 = j * b ** (j - 1);
    gamma += n * a ** i * bj;
    gammaPi -= n * i * a ** (i - 1) * bj;
    gammaPiPi += n * i * (i - 1) * a ** (i - 2) * bj;
    gammaTau += n * a ** i * bj1;
    gammaTauTau += n * a ** i * j * (j - 1) * b ** (j - 2);
    gammaPiTau -= n * i * a ** (i - 1) * bj1;
  }
  const rt = GAS_CONSTANT_KJ_KGK * temperatureK;
  return {
    v: (pi * gammaPi * rt) / (pressureMPa * 1000),
    h: rt * tau * gammaTau,
    u: rt * (tau * gammaTau - pi * gammaPi),
    s: GAS_CONSTANT_KJ_KGK * (tau * gammaTau - gamma),
    cp: -GAS_CONSTANT_KJ_KGK * tau * tau * gammaTauTau,
    w: Math.sqrt(
      (1000 * rt * gammaPi * gammaPi) /
        ((gammaPi - tau * gammaPiTau) ** 2 / (tau * tau * gammaTauTau) - gammaPiPi),
    ),
  };
}

/** Coefficients n1…n10 of the saturation line (release, Table 34). */
const TABLE_34 = [
  0.11670521452767e4, -0.72421316703206e6, -0.17073846940092e2, 0.1202082470247e5, -0.32325550322333e7,
  0.1491510861353e2, -0.48232657361591e4, 0.40511340542057e6, -0.23855557567849, 0.65017534844798e3,
] as const;

/**
 * Saturation pressure of water [MPa].
 * Source: IAPWS R7-97(2012), equation 30; verified by Table 35.
 * @param temperatureK [K, 273.15…647.096]
 */
export function saturationPressureMPa(temperatureK: number): number {
  const [n1, n2, n3, n4, n5, n6, n7, n8, n9, n10] = TABLE_34;
  const theta = temperatureK + n9 / (temperatureK - n10);
  const a = theta * theta + n1 * theta + n2;
  const b = n3 * theta * theta + n4 * theta + n5;
  const c = n6 * theta * theta + n7 * theta + n8;
  return ((2 * c) / (-b + Math.sqrt(b * b - 4 * a * c))) ** 4;
}

/**
 * Pressure at which the engine's water fits hold [MPa]: 1 MPa, or saturation where that is higher
 * (above 179.9 °C), so that the water stays liquid over the whole range.
 */
export function fitPressureMPa(temperatureK: number): number {
  return Math.max(1, saturationPressureMPa(temperatureK));
}
