import { useThemeMode, type ThemeMode } from './mode.js';

/**
 * Colours by meaning, the same on every screen. Each stands at least 3:1 against its ground and differs
 * from its neighbours in lightness, so that red-green blindness and grey print keep them apart; no chart
 * tells things apart by colour alone (dash, marker, pattern or label says it too).
 */
export interface MeaningColours {
  readonly sun: string;
  readonly heat: string;
  readonly power: string;
  /** Heat from the backup boiler: bought, so pale and hatched beside the dish's own. */
  readonly backup: string;
  /** Losses from the first in the path of light to the last, dark to pale. */
  readonly losses: readonly string[];
  readonly good: string;
  readonly caution: string;
  readonly text: string;
  readonly mutedText: string;
  readonly grid: string;
  readonly ground: string;
}

const light: MeaningColours = {
  sun: '#c27c00',
  heat: '#ad4a20',
  power: '#4a48c4',
  backup: '#8d8478',
  losses: ['#4b5457', '#5e686b', '#727c7f', '#869093', '#9aa3a6', '#aeb6b8'],
  good: '#1f7a4d',
  caution: '#a8470a',
  text: '#1d2527',
  mutedText: '#566164',
  grid: '#dfe5e6',
  ground: '#ffffff',
};

const dark: MeaningColours = {
  sun: '#f0b23a',
  heat: '#e2865b',
  power: '#9e9bf7',
  backup: '#b3a998',
  losses: ['#c5cdcf', '#adb6b8', '#969fa2', '#7f898c', '#6a7477', '#596366'],
  good: '#63c193',
  caution: '#f0955a',
  text: '#e8eeef',
  mutedText: '#a9b4b6',
  grid: '#364144',
  ground: '#1b2224',
};

export function meaningColours(mode: ThemeMode): MeaningColours {
  return mode === 'dark' ? dark : light;
}

export function useMeaningColours(): MeaningColours {
  return meaningColours(useThemeMode());
}

/** How a scenario is drawn wherever it appears; decided by its position in the study and nothing else. */
export interface ScenarioMark {
  readonly colour: string;
  readonly dash: 'solid' | 'dash' | 'dot' | 'dashdot' | 'longdash' | 'longdashdot';
  readonly symbol: 'circle' | 'square' | 'diamond' | 'triangle-up' | 'cross' | 'x';
  /** Hatching of bars, so that they differ in grey print. */
  readonly pattern: '' | '/' | '\\' | 'x' | '-' | '|';
}

const shapes = [
  { dash: 'solid', symbol: 'circle', pattern: '' },
  { dash: 'dash', symbol: 'square', pattern: '/' },
  { dash: 'dot', symbol: 'diamond', pattern: '\\' },
  { dash: 'dashdot', symbol: 'triangle-up', pattern: 'x' },
  { dash: 'longdash', symbol: 'cross', pattern: '-' },
  { dash: 'longdashdot', symbol: 'x', pattern: '|' },
] as const;

const scenarioColours: Readonly<Record<ThemeMode, readonly string[]>> = {
  light: ['#41505a', '#0b8a83', '#c03a72', '#6d8700', '#2f7fc1', '#8a5a2b'],
  dark: ['#b9c6cc', '#3fc4ba', '#f07fae', '#b3cc3e', '#77b7ee', '#d0a070'],
};

/** @param position slot of the scenario in its study: 0 is the baseline */
export function scenarioMark(position: number, mode: ThemeMode): ScenarioMark {
  const slot = ((position % shapes.length) + shapes.length) % shapes.length;
  return { ...shapes[slot]!, colour: scenarioColours[mode][slot]! };
}
