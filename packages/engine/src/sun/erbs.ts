import { requireRange } from '../errors.js';

/**
 * Share of the global horizontal irradiance that is diffuse, from the hour's clearness index.
 *
 * @param clearnessIndex - global horizontal over extraterrestrial horizontal irradiance [0 to 2: values
 *   above 1 occur beside bright clouds]
 * @returns diffuse fraction [0.165 to 1]
 * @throws DomainError for a negative index or not a number
 *
 * Source: Erbs, Klein & Duffie 1982, Solar Energy 28:293, eq. 1.
 *
 * @example
 * erbsDiffuseFraction(0.5) // 0.6592
 */
export function erbsDiffuseFraction(clearnessIndex: number): number {
  requireRange('clearness index', clearnessIndex, 0, 2);
  const kt = clearnessIndex;
  if (kt <= 0.22) return 1 - 0.09 * kt;
  if (kt <= 0.8) return 0.9511 + kt * (-0.1604 + kt * (4.388 + kt * (-16.638 + kt * 12.336)));
  return 0.165;
}
