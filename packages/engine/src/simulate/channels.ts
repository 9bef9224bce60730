import { EXTRA_ACCOUNTS } from '../ledger/accounts.js';
import { LEDGER_LINES } from '../ledger/lines.js';

export interface ChannelDefinition {
  readonly key: string;
  readonly label: string;
  readonly unit: string;
}

/** States and conditions recorded for each weather record. */
export const STATE_CHANNELS = [
  { key: 'dniWm2', label: 'Direct normal irradiance', unit: 'W/m²' },
  { key: 'dryBulbC', label: 'Air temperature', unit: '°C' },
  { key: 'windMs', label: 'Wind in the file', unit: 'm/s' },
  { key: 'sunElevationDeg', label: "Sun's elevation at the middle of the record", unit: '°' },
  { key: 'trackingShare', label: 'Share of the record on the sun', unit: '1' },
  { key: 'flowKgS', label: 'Mean flow through the receiver', unit: 'kg/s' },
  { key: 'faceC', label: "Receiver's face, hottest in the record", unit: '°C' },
  {
    key: 'cellC',
    label: "Hottest cell in the record; the face's temperature where there are no cells",
    unit: '°C',
  },
  {
    key: 'outletC',
    label: 'Water leaving the receiver, hottest in the record; 0 while the pump stands',
    unit: '°C',
  },
  { key: 'tankTopC', label: "Tank's top layer at the end of the record", unit: '°C' },
  { key: 'tankBottomC', label: "Tank's bottom layer at the end of the record", unit: '°C' },
] as const satisfies readonly ChannelDefinition[];
export type StateChannel = (typeof STATE_CHANNELS)[number]['key'];

/** Each account as mean power over the record, then the states. */
export const HOURLY_CHANNELS: readonly ChannelDefinition[] = [
  ...[...LEDGER_LINES, ...EXTRA_ACCOUNTS].map(({ key, label }) => ({ key, label, unit: 'W' })),
  ...STATE_CHANNELS,
];
