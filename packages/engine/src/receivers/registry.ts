import type { DishSettings } from '../optics/dish.js';
import { CellReceiver } from './cell.js';
import { CoilReceiver } from './coil.js';
import type { Receiver } from './receiver.js';
import type { CellReceiverSettings, CoilReceiverSettings } from './settings.js';

/** Every kind of receiver with its settings. A new one is a file of its own and a line in each place here. */
interface ReceiverSettingsByKind {
  coil: CoilReceiverSettings;
  cell: CellReceiverSettings;
}
export type ReceiverKind = keyof ReceiverSettingsByKind;
export type ReceiverSettings = ReceiverSettingsByKind[ReceiverKind];

type Factory<Kind extends ReceiverKind> = (
  settings: ReceiverSettingsByKind[Kind],
  dish: DishSettings,
  initialC: number,
) => Receiver;

const FACTORIES: { readonly [Kind in ReceiverKind]: Factory<Kind> } = {
  coil: (settings, dish, initialC) => new CoilReceiver(settings, dish, initialC),
  cell: (settings, dish, initialC) => new CellReceiver(settings, dish, initialC),
};

export function createReceiver<Kind extends ReceiverKind>(
  settings: ReceiverSettingsByKind[Kind] & { readonly kind: Kind },
  dish: DishSettings,
  initialC: number,
): Receiver {
  return FACTORIES[settings.kind](settings, dish, initialC);
}
