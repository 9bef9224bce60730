import { describe, expect, it } from 'vitest';
import { findImbalance, findImbalances, partResidual } from './balance.js';
import { LEDGER_INDEX, LEDGER_LINES, LEDGER_PARTS } from './lines.js';

describe('the ledger', () => {
  it('has no line that belongs to no part, and joins parts out-to-in only', () => {
    for (const line of LEDGER_LINES) {
      const directions = Object.values(line.parts);
      expect(directions.length, line.key).toBeGreaterThan(0);
      if (directions.length === 2) expect([...directions].sort(), line.key).toEqual(['in', 'out']);
    }
  });

  it('each part has something that enters and something that leaves', () => {
    for (const part of LEDGER_PARTS) {
      const directions = LEDGER_LINES.map((line) => (line.parts as Record<string, string>)[part]);
      expect(directions, part).toContain('in');
      expect(directions, part).toContain('out');
    }
  });

  it('counts what enters, leaves and stays', () => {
    const lines = new Float64Array(LEDGER_LINES.length);
    lines[LEDGER_INDEX.heatToStore] = 10;
    lines[LEDGER_INDEX.shellLoss] = 1;
    lines[LEDGER_INDEX.heatDelivered] = 6;
    lines[LEDGER_INDEX.storeStored] = 3;
    expect(partResidual('store', lines)).toBe(0);
    expect(partResidual('load', lines)).toBe(6);
    expect(findImbalances(lines, 1e-9).map(({ part }) => part)).toEqual(['loop', 'load']);
  });

  it('never takes NaN for balanced', () => {
    const lines = new Float64Array(LEDGER_LINES.length);
    lines[LEDGER_INDEX.radiation] = NaN;
    expect(findImbalance(lines, 1e9)?.part).toBe('receiver');
  });
});
