import type { RecordCalendar } from '../calendar.js';
import { CommercialHotWater, type CommercialHotWaterSettings } from './commercial-hot-water.js';
import type { Load } from './load.js';

/** Every kind of load with its settings. A new one is a file of its own and a line in each place here. */
interface LoadSettingsByKind {
  commercialHotWater: CommercialHotWaterSettings;
}
export type LoadKind = keyof LoadSettingsByKind;
export type LoadSettings = LoadSettingsByKind[LoadKind];

type Factory<Kind extends LoadKind> = (
  settings: LoadSettingsByKind[Kind],
  calendar: RecordCalendar,
  mainsC: (dayOfYear: number) => number,
) => Load;

const FACTORIES: { readonly [Kind in LoadKind]: Factory<Kind> } = {
  commercialHotWater: (settings, calendar, mainsC) => new CommercialHotWater(settings, calendar, mainsC),
};

export function createLoad<Kind extends LoadKind>(
  settings: LoadSettingsByKind[Kind] & { readonly kind: Kind },
  calendar: RecordCalendar,
  mainsC: (dayOfYear: number) => number,
): Load {
  return FACTORIES[settings.kind](settings, calendar, mainsC);
}
