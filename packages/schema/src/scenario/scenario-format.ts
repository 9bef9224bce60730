export const SCENARIO_FORMAT = 'noonwell-scenario';
/** Raised with a step in `upgradeScenario` whenever an older document needs one. */
export const SCENARIO_FORMAT_VERSION = 2;
