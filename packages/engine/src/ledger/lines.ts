/**
 * The ledger: every line is an energy computed by its own relation, and each part of the machine must
 * balance on its own. A line that joins two parts leaves the one and enters the other with the same value.
 */
export const LEDGER_PARTS = ['dish', 'receiver', 'loop', 'store', 'load', 'electricity'] as const;
export type LedgerPart = (typeof LEDGER_PARTS)[number];

/** in: enters the part; out: leaves it; stored: what the part holds more at the end than at the beginning. */
export type LedgerDirection = 'in' | 'out' | 'stored';

interface LedgerLineDefinition {
  readonly key: string;
  readonly label: string;
  readonly parts: Readonly<Partial<Record<LedgerPart, LedgerDirection>>>;
}

export const LEDGER_LINES = [
  { key: 'beamOnAperture', label: 'Beam on the gross aperture', parts: { dish: 'in' } },
  { key: 'nightPark', label: 'Not collected: sun down, parked', parts: { dish: 'out' } },
  { key: 'waiting', label: 'Not collected: beam under the start threshold', parts: { dish: 'out' } },
  { key: 'windStow', label: 'Not collected: stowed for wind', parts: { dish: 'out' } },
  { key: 'outOfTravel', label: "Not collected: sun outside the tracker's travel", parts: { dish: 'out' } },
  {
    key: 'belowHorizonProfile',
    label: 'Not collected: sun behind the horizon profile',
    parts: { dish: 'out' },
  },
  { key: 'outOfService', label: 'Not collected: scheduled outage', parts: { dish: 'out' } },
  {
    key: 'defocusedStoreFull',
    label: 'Not collected: off the sun, store full (or water too hot at full flow)',
    parts: { dish: 'out' },
  },
  {
    key: 'defocusedReceiverLimit',
    label: 'Not collected: off the sun, receiver at its temperature limit',
    parts: { dish: 'out' },
  },
  { key: 'shadow', label: 'Shadow of receiver and struts', parts: { dish: 'out' } },
  { key: 'soiling', label: 'Dirt on the mirror', parts: { dish: 'out' } },
  { key: 'reflection', label: 'Absorbed by the mirror', parts: { dish: 'out' } },
  { key: 'spillage', label: 'Spilled past the receiver', parts: { dish: 'out' } },
  { key: 'secondary', label: 'Lost in the mixing duct', parts: { dish: 'out' } },
  { key: 'faceReflection', label: "Reflected by the receiver's face", parts: { dish: 'out' } },
  { key: 'absorbed', label: 'Absorbed by the receiver', parts: { dish: 'out', receiver: 'in' } },
  { key: 'convection', label: 'Receiver: convection and wind', parts: { receiver: 'out' } },
  { key: 'radiation', label: 'Receiver: radiation', parts: { receiver: 'out' } },
  { key: 'backLoss', label: 'Receiver: through the back', parts: { receiver: 'out' } },
  { key: 'receiverStored', label: 'Receiver: kept as heat', parts: { receiver: 'stored' } },
  {
    key: 'powerDc',
    label: 'Electricity from the cells, direct current',
    parts: { receiver: 'out', electricity: 'in' },
  },
  { key: 'heatToFluid', label: 'Heat to the water', parts: { receiver: 'out', loop: 'in' } },
  { key: 'returnPipeLoss', label: 'Pipe to the receiver', parts: { loop: 'out' } },
  { key: 'supplyPipeLoss', label: 'Pipe to the tank', parts: { loop: 'out' } },
  { key: 'loopStored', label: 'Pipes: kept as heat', parts: { loop: 'stored' } },
  { key: 'heatToStore', label: 'Heat to the tank', parts: { loop: 'out', store: 'in' } },
  { key: 'shellLoss', label: 'Tank: through the shell', parts: { store: 'out' } },
  { key: 'storeStored', label: 'Tank: kept as heat', parts: { store: 'stored' } },
  { key: 'heatDelivered', label: 'Solar heat to the load', parts: { store: 'out', load: 'in' } },
  { key: 'backupHeat', label: 'Heat from the backup', parts: { load: 'in' } },
  { key: 'unmetHeat', label: 'Heat wanted and not supplied', parts: { load: 'in' } },
  { key: 'loadHeat', label: 'Heat that the load needs', parts: { load: 'out' } },
  { key: 'gridImport', label: 'Electricity bought', parts: { electricity: 'in' } },
  { key: 'inverterLoss', label: 'Inverter', parts: { electricity: 'out' } },
  { key: 'siteUse', label: 'Electricity that the site uses', parts: { electricity: 'out' } },
  { key: 'pumpUse', label: 'Pump', parts: { electricity: 'out' } },
  { key: 'trackerUse', label: 'Tracker', parts: { electricity: 'out' } },
  { key: 'gridExport', label: 'Electricity sold', parts: { electricity: 'out' } },
] as const satisfies readonly LedgerLineDefinition[];

export type LedgerLine = (typeof LEDGER_LINES)[number]['key'];

/** Position of each line in a ledger array. */
export const LEDGER_INDEX = Object.fromEntries(
  LEDGER_LINES.map((line, index) => [line.key, index]),
) as Readonly<Record<LedgerLine, number>>;

export const LEDGER_SIGN: Readonly<Record<LedgerDirection, 1 | -1>> = { in: 1, out: -1, stored: -1 };
