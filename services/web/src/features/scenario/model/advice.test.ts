import { newScenario } from '@noonwell/schema';
import { expect, it } from 'vitest';
import { loopAdvice } from './advice.js';
import { toDraft } from './draft.js';

it('asks for cooler water when cells take the place of a coil', () => {
  const advice = loopAdvice(toDraft(newScenario('coil')), 'cell', 'coil');
  expect(advice.map(({ path }) => path)).toEqual([
    'carryAndKeep.pump.setPointC',
    'carryAndKeep.pump.outletLimitC',
  ]);
  const cell = newScenario('cell').carryAndKeep.pump;
  expect(advice.map(({ to }) => to)).toEqual([String(cell.setPointC), String(cell.outletLimitC)]);
});

it('leaves alone what somebody chose, and what suits already', () => {
  const chosen = newScenario('coil');
  chosen.carryAndKeep.pump.setPointC = 88;
  chosen.carryAndKeep.pump.outletLimitC = 95;
  expect(loopAdvice(toDraft(chosen), 'cell', 'coil')).toEqual([]);
  expect(loopAdvice(toDraft(newScenario('cell')), 'cell', 'coil')).toEqual([]);
});
