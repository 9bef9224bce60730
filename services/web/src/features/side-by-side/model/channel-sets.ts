import { HOURLY_CHANNELS, type Account, type ChannelDefinition, type StateChannel } from '@noonwell/engine';

type ChannelKey = Account | StateChannel;

interface ChannelSetDefinition {
  readonly key: string;
  readonly label: string;
  readonly channels: readonly ChannelKey[];
}

/** What the hours can be looked at for; each set is a few plots above each other with one time axis. */
export const CHANNEL_SETS = [
  {
    key: 'heat',
    label: 'Sun, store and power',
    channels: ['dniWm2', 'heatToStore', 'powerAc', 'tankTopC', 'tankBottomC'],
  },
  {
    key: 'receiver',
    label: 'Receiver',
    channels: ['dniWm2', 'trackingShare', 'faceC', 'cellC', 'outletC', 'flowKgS'],
  },
  {
    key: 'losses',
    label: 'Losses',
    channels: ['spillage', 'convection', 'radiation', 'supplyPipeLoss', 'shellLoss'],
  },
  {
    key: 'load',
    label: 'Load and backup',
    channels: ['loadHeat', 'heatDelivered', 'backupHeat', 'gridImport', 'gridExport'],
  },
  { key: 'weather', label: 'Weather', channels: ['dniWm2', 'dryBulbC', 'windMs', 'sunElevationDeg'] },
] as const satisfies readonly ChannelSetDefinition[];

export type ChannelSetKey = (typeof CHANNEL_SETS)[number]['key'];
export const CHANNEL_SET_KEYS: readonly ChannelSetKey[] = CHANNEL_SETS.map(({ key }) => key);

const DEFINITIONS = new Map(HOURLY_CHANNELS.map((channel) => [channel.key, channel]));

/** The channels of a set with the names and units that the engine gives them. */
export function channelsOf(set: ChannelSetKey): readonly ChannelDefinition[] {
  const wanted: readonly ChannelKey[] = CHANNEL_SETS.find(({ key }) => key === set)?.channels ?? [];
  return wanted.flatMap((key) => DEFINITIONS.get(key) ?? []);
}

/** Channels that belong to the weather, not to a machine: drawn once, not once a scenario. */
const OF_THE_WEATHER: ReadonlySet<string> = new Set<StateChannel>([
  'dniWm2',
  'dryBulbC',
  'windMs',
  'sunElevationDeg',
]);

export function isOfTheWeather(channel: string): boolean {
  return OF_THE_WEATHER.has(channel);
}
