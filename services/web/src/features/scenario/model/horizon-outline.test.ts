import { expect, it } from 'vitest';
import { horizonOutline } from './horizon-outline.js';

const typed = (...pairs: (readonly [string, string])[]) =>
  pairs.map(([azimuthDeg, elevationDeg]) => ({ azimuthDeg, elevationDeg }));

it('crosses north on the line between the last pair and the first', () => {
  const outline = horizonOutline(typed(['20', '10'], ['350', '4']));
  expect(outline?.map(({ azimuthDeg }) => azimuthDeg)).toEqual([0, 20, 350, 360]);
  expect(outline?.[0]?.elevationDeg).toBeCloseTo(6, 10);
  expect(outline?.[3]?.elevationDeg).toBeCloseTo(6, 10);
});

it('is level at the height of a single pair', () => {
  expect(horizonOutline(typed(['90', '12']))?.map(({ elevationDeg }) => elevationDeg)).toEqual([12, 12, 12]);
});

it('is not drawn without a pair, or while one is being typed', () => {
  for (const none of [undefined, [], typed(['90', '']), typed(['90', '12'], ['400', '1'])]) {
    expect(horizonOutline(none)).toBeNull();
  }
});
