import { scenarioMark } from '../theme/colours.js';
import { useThemeMode } from '../theme/mode.js';

const dashes = {
  solid: undefined,
  dash: '6 3',
  dot: '2 3',
  dashdot: '6 3 2 3',
  longdash: '9 3',
  longdashdot: '9 3 2 3',
} as const;

/** The line that stands for a scenario in every chart; said in words beside it, so it is hidden from screen readers. */
export function ScenarioSwatch({ position }: { position: number }) {
  const { colour, dash } = scenarioMark(position, useThemeMode());
  return (
    <svg width={28} height={12} aria-hidden="true" style={{ flexShrink: 0 }}>
      <line x1={1} y1={6} x2={27} y2={6} stroke={colour} strokeWidth={4} strokeDasharray={dashes[dash]} />
    </svg>
  );
}
