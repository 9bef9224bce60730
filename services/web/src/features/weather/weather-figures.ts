import type { WeatherSummary } from '@noonwell/schema';
import type { Figure } from '../../shared/components/figures.js';
import { formatCount, formatFixed, formatQuantity } from '../../shared/format/number.js';

const TENTHS = 1;

/** The sums and means that say whether a year can be right. */
export function weatherFigures(summary: WeatherSummary): readonly Figure[] {
  const celsius = (value: number) => `${formatFixed(value, TENTHS)}\u00a0°C`;
  return [
    { name: 'Beam, facing the sun (DNI)', value: sum(summary.dniKwhM2) },
    { name: 'All light, flat (GHI)', value: sum(summary.ghiKwhM2) },
    { name: 'Diffuse light, flat (DHI)', value: sum(summary.dhiKwhM2) },
    { name: 'Air, mean', value: celsius(summary.dryBulbMeanC) },
    { name: 'Air, lowest', value: celsius(summary.dryBulbMinC) },
    { name: 'Air, highest', value: celsius(summary.dryBulbMaxC) },
    { name: 'Wind, mean', value: formatQuantity(summary.windMeanMs, 'm/s') },
    {
      name: 'Records',
      value: `${formatCount(summary.records)} of ${formatCount(summary.intervalMinutes)}\u00a0min`,
    },
    { name: 'Filled or clipped records', value: formatCount(summary.flaggedRecords) },
  ];
}

function sum(kwhM2: number): string {
  return `${formatCount(kwhM2)}\u00a0kWh/m²`;
}
