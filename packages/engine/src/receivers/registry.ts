import type { CellReceiverSettings, CoilReceiverSettings } from './settings.js';

export type ReceiverSettings = CoilReceiverSettings | CellReceiverSettings;
export type ReceiverKind = ReceiverSettings['kind'];
