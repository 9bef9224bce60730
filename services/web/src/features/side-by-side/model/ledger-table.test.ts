import { LEDGER_LINES, LEDGER_PARTS } from '@noonwell/engine';
import { describe, expect, it } from 'vitest';
import { summaryFixture } from './fixtures.js';
import { ledgerTable } from './ledger-table.js';
import { formatResidual } from './residual.js';

const total = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0);

describe('the ledger as a table', () => {
  it('has every line in every part it belongs to', () => {
    const { groups } = ledgerTable([summaryFixture()]);
    expect(groups.map(({ part }) => part)).toEqual(LEDGER_PARTS);
    for (const { part, rows } of groups) {
      expect(rows.map(({ line }) => line)).toEqual(
        LEDGER_LINES.filter(({ parts }) => part in parts).map(({ key }) => key),
      );
    }
  });

  it('adds up: the signed rows of a part give its residual', () => {
    const { groups, residualKwh } = ledgerTable([
      summaryFixture(),
      summaryFixture({ lines: { shellLoss: 41.5 } }),
    ]);
    for (const { rows, residualsKwh } of groups) {
      residualsKwh.forEach((residual, scenario) => {
        expect(total(rows.map(({ signedKwh }) => signedKwh[scenario]!))).toBeCloseTo(residual, 9);
      });
    }
    expect(residualKwh).toEqual([0, 1.5]);
  });

  it('names the part that does not balance, and by how much of the beam', () => {
    const { groups, residualOfBeam } = ledgerTable([summaryFixture({ lines: { spillage: 0.001 } })]);
    expect(groups.filter(({ residualsKwh }) => residualsKwh[0] !== 0).map(({ part }) => part)).toEqual([
      'dish',
    ]);
    expect(residualOfBeam[0]).toBeCloseTo(1e-6, 12);
  });

  it('gives energy kept a minus sign, and given back a plus', () => {
    const store = ledgerTable([summaryFixture()]).groups.find(({ part }) => part === 'store');
    expect(store?.rows.find(({ line }) => line === 'storeStored')?.signedKwh).toEqual([10]);
  });

  it('has no share of the beam where there was none', () => {
    expect(ledgerTable([summaryFixture({ summary: { beamOnApertureKwh: 0 } })]).residualOfBeam).toEqual([
      null,
    ]);
  });
});

it('writes a residual as a number, however small', () => {
  expect([3.14e-12, -2e-9, 0, null].map(formatResidual)).toEqual([
    '3.1e\u221212',
    '\u22122.0e\u22129',
    '0',
    '–',
  ]);
});
