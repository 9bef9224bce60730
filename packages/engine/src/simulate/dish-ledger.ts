import { LEDGER_INDEX } from '../ledger/lines.js';
import type { DishSettings } from '../optics/dish.js';
import type { ReceiverOptics } from '../receivers/receiver.js';

/**
 * The dish's chain from the beam to the face: each loss as its own share of the beam, found from its own
 * factor and those before it, none as what the others leave.
 */
export class DishLedger {
  /** Light on the face over beam on the gross aperture while tracking [1]. */
  readonly incidentShare: number;
  /** Absorbed over beam while tracking [1]. */
  readonly absorbedShare: number;
  private readonly shadow: number;
  private readonly soiling: number;
  private readonly reflection: number;
  private readonly spillage: number;
  private readonly secondary: number;
  private readonly faceReflection: number;

  constructor(dish: DishSettings, optics: ReceiverOptics) {
    const unshaded = 1 - dish.shadowFraction;
    const past = unshaded * dish.cleanliness;
    const reflected = past * dish.reflectance;
    const intercepted = reflected * optics.interceptFactor;
    this.shadow = dish.shadowFraction;
    this.soiling = unshaded * (1 - dish.cleanliness);
    this.reflection = past * (1 - dish.reflectance);
    this.spillage = reflected * (1 - optics.interceptFactor);
    this.secondary = intercepted * (1 - optics.secondaryTransmittance);
    this.incidentShare = intercepted * optics.secondaryTransmittance;
    this.faceReflection = this.incidentShare * (1 - optics.absorptance);
    this.absorbedShare = this.incidentShare * optics.absorptance;
  }

  /** Adds a tracking step's beam and its losses to the ledger [J]. */
  addTracking(ledgerJ: Float64Array, beamJ: number): void {
    ledgerJ[LEDGER_INDEX.shadow]! += beamJ * this.shadow;
    ledgerJ[LEDGER_INDEX.soiling]! += beamJ * this.soiling;
    ledgerJ[LEDGER_INDEX.reflection]! += beamJ * this.reflection;
    ledgerJ[LEDGER_INDEX.spillage]! += beamJ * this.spillage;
    ledgerJ[LEDGER_INDEX.secondary]! += beamJ * this.secondary;
    ledgerJ[LEDGER_INDEX.faceReflection]! += beamJ * this.faceReflection;
    ledgerJ[LEDGER_INDEX.absorbed]! += beamJ * this.absorbedShare;
  }
}
