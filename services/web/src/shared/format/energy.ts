import { formatQuantity } from './number.js';

/** A unit of energy with the divisor that turns kWh into it. Energy is never shown in kW, nor power in kWh. */
export interface EnergyUnit {
  readonly unit: 'kWh' | 'MWh' | 'GWh';
  readonly kwhPerUnit: number;
}

const KWH: EnergyUnit = { unit: 'kWh', kwhPerUnit: 1 };
const MWH: EnergyUnit = { unit: 'MWh', kwhPerUnit: 1000 };
const GWH: EnergyUnit = { unit: 'GWh', kwhPerUnit: 1e6 };

/** One unit for a whole table or axis, chosen by its largest value [kWh]. */
export function energyUnitFor(valuesKwh: Iterable<number | null>): EnergyUnit {
  let largest = 0;
  for (const value of valuesKwh) largest = Math.max(largest, Math.abs(value ?? 0));
  if (largest >= 1e7) return GWH;
  return largest >= 1e5 ? MWH : KWH;
}

/** A single energy with its unit. @param kwh [kWh] */
export function formatEnergyKwh(kwh: number | null | undefined, digits = 3): string {
  if (kwh == null) return formatQuantity(kwh, 'kWh', digits);
  const { unit, kwhPerUnit } = energyUnitFor([kwh]);
  return formatQuantity(kwh / kwhPerUnit, unit, digits);
}

/** A single power with its unit. @param watt [W] */
export function formatPowerW(watt: number | null | undefined, digits = 3): string {
  if (watt == null || Math.abs(watt) < 1000) return formatQuantity(watt, 'W', digits);
  return formatQuantity(watt / 1000, 'kW', digits);
}
