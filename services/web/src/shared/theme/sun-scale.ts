import type { ColorScale } from 'plotly.js';
import { useThemeMode, type ThemeMode } from './mode.js';

/** From no sun to full sun, evenly growing in lightness difference from the ground, so that grey print reads the same. */
const scales: Readonly<Record<ThemeMode, ColorScale>> = {
  light: [
    [0, '#eef1f1'],
    [0.25, '#f6dfae'],
    [0.5, '#eab754'],
    [0.75, '#c27c00'],
    [1, '#6e3d00'],
  ],
  dark: [
    [0, '#20292b'],
    [0.25, '#5a3a0c'],
    [0.5, '#9c6410'],
    [0.75, '#e0a02c'],
    [1, '#fff0c4'],
  ],
};

export function useSunScale(): ColorScale {
  return scales[useThemeMode()];
}
