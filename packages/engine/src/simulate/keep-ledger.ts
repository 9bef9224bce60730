import type { Dispatch } from '../electricity/dispatch.js';
import { ACCOUNT_INDEX } from '../ledger/accounts.js';
import { LEDGER_INDEX } from '../ledger/lines.js';
import type { Load } from '../load/load.js';
import type { Loop } from '../loop/loop.js';
import type { ReceiverStep } from '../receivers/receiver.js';
import type { TankStep } from '../store/stratified-tank.js';

/** Adds a solved step's receiver lines to the ledger [J]. */
export function keepReceiver(ledgerJ: Float64Array, receiver: ReceiverStep): void {
  const { dtS } = receiver;
  ledgerJ[LEDGER_INDEX.convection]! += receiver.convectionW * dtS;
  ledgerJ[LEDGER_INDEX.radiation]! += receiver.radiationW * dtS;
  ledgerJ[LEDGER_INDEX.backLoss]! += receiver.backLossW * dtS;
  ledgerJ[LEDGER_INDEX.receiverStored]! += receiver.storedW * dtS;
  ledgerJ[LEDGER_INDEX.powerDc]! += receiver.powerDcW * dtS;
  ledgerJ[LEDGER_INDEX.heatToFluid]! += receiver.heatToFluidW * dtS;
}

/** Adds a solved step's loop lines to the ledger [J]. */
export function keepLoop(ledgerJ: Float64Array, loop: Loop, dtS: number): void {
  ledgerJ[LEDGER_INDEX.returnPipeLoss]! += loop.toReceiver.lossW * dtS;
  ledgerJ[LEDGER_INDEX.supplyPipeLoss]! += loop.toTank.lossW * dtS;
  ledgerJ[LEDGER_INDEX.loopStored]! += (loop.toReceiver.storedW + loop.toTank.storedW) * dtS;
  ledgerJ[LEDGER_INDEX.heatToStore]! += loop.heatToStoreW * dtS;
}

/**
 * Adds a solved step's store and load lines to the ledger [J].
 * @param storedJ what the layers hold more than before the step
 */
export function keepStoreAndLoad(ledgerJ: Float64Array, step: TankStep, storedJ: number, load: Load): void {
  ledgerJ[LEDGER_INDEX.shellLoss]! += step.shellLossJ;
  ledgerJ[LEDGER_INDEX.storeStored]! += storedJ;
  ledgerJ[LEDGER_INDEX.heatDelivered]! += step.heatDrawnJ;
  ledgerJ[LEDGER_INDEX.loadHeat]! += step.loadNeedJ;
  ledgerJ[LEDGER_INDEX.backupHeat]! += load.backupJ;
  ledgerJ[LEDGER_INDEX.unmetHeat]! += load.unmetJ;
  ledgerJ[ACCOUNT_INDEX.boilerFuel]! += load.fuelJ;
}

/** Who uses electricity in a step [W]. */
export interface PowerUse {
  siteW: number;
  pumpW: number;
  trackerW: number;
}

/** Adds a step's electricity lines to the ledger [J]. */
export function keepPower(ledgerJ: Float64Array, use: PowerUse, dispatch: Dispatch, dtS: number): void {
  ledgerJ[LEDGER_INDEX.siteUse]! += use.siteW * dtS;
  ledgerJ[LEDGER_INDEX.pumpUse]! += use.pumpW * dtS;
  ledgerJ[LEDGER_INDEX.trackerUse]! += use.trackerW * dtS;
  ledgerJ[LEDGER_INDEX.inverterLoss]! += dispatch.inverterLossW * dtS;
  ledgerJ[LEDGER_INDEX.gridImport]! += dispatch.importW * dtS;
  ledgerJ[LEDGER_INDEX.gridExport]! += dispatch.exportW * dtS;
  ledgerJ[ACCOUNT_INDEX.powerAc]! += dispatch.acW * dtS;
  ledgerJ[ACCOUNT_INDEX.ownUse]! += dispatch.ownUseW * dtS;
}
