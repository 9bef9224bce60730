import type { CommercialHotWaterSettings } from './commercial-hot-water.js';

/** A later load joins this union with a file of its own. */
export type LoadSettings = CommercialHotWaterSettings;
