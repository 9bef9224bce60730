import { requireRange } from '../errors.js';
import type { CellReceiverSettings } from './settings.js';

/**
 * An inverter whose loss is a standing part and a part in proportion to its input; together they give the
 * stated efficiency at the rating. Under the standing loss it gives nothing.
 *
 * Source: two-term loss curve, common practice, no source.
 */
export class Inverter {
  readonly ratingW: number;
  /** Direct current that gives the rating [W]; an array is held back above it. */
  readonly greatestDcW: number;
  private readonly standingW: number;
  private readonly proportional: number;

  constructor(settings: CellReceiverSettings['inverter']) {
    requireRange('inverter rating [W]', settings.ratingW, 1, 1e9);
    requireRange('inverter efficiency', settings.efficiency, 0.01, 1);
    const lossAtRating = 1 / settings.efficiency - 1;
    requireRange('inverter standing loss over rating', settings.standingLossFraction, 0, lossAtRating);
    this.ratingW = settings.ratingW;
    this.greatestDcW = settings.ratingW / settings.efficiency;
    this.standingW = settings.standingLossFraction * settings.ratingW;
    this.proportional = (lossAtRating * settings.ratingW - this.standingW) / this.greatestDcW;
  }

  /** Loss at a direct-current input [W, 0 to `greatestDcW`]. */
  lossW(dcW: number): number {
    return Math.min(dcW, dcW > 0 ? this.standingW + this.proportional * dcW : 0);
  }
}
