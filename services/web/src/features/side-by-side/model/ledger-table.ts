import {
  LEDGER_INDEX,
  LEDGER_LINES,
  LEDGER_PARTS,
  LEDGER_SIGN,
  partResidual,
  type LedgerDirection,
  type LedgerLine,
  type LedgerPart,
} from '@noonwell/engine';
import type { RunSummary } from '@noonwell/schema';

export interface LedgerRow {
  readonly line: LedgerLine;
  readonly label: string;
  readonly direction: LedgerDirection;
  /** One a scenario, with the sign that makes the part's column add up to its residual [kWh]. */
  readonly signedKwh: readonly number[];
}

export interface LedgerGroup {
  readonly part: LedgerPart;
  readonly rows: readonly LedgerRow[];
  /** What enters minus what leaves and stays, one a scenario, from the rows above [kWh]. */
  readonly residualsKwh: readonly number[];
}

export interface LedgerTable {
  readonly groups: readonly LedgerGroup[];
  /** Sum of the parts' residuals by size, one a scenario [kWh] … */
  readonly residualKwh: readonly number[];
  /** … and over the beam on the aperture [1]. */
  readonly residualOfBeam: readonly (number | null)[];
}

/** The ledger of each scenario by part of the machine, every part a column that adds up on its own. */
export function ledgerTable(summaries: readonly RunSummary[]): LedgerTable {
  const ledgers = summaries.map(({ ledger }) =>
    Float64Array.from(LEDGER_LINES, ({ key }) => ledger.lines[key]),
  );
  const groups = LEDGER_PARTS.map((part) => ({
    part,
    rows: rowsOf(part, ledgers),
    residualsKwh: ledgers.map((ledger) => partResidual(part, ledger)),
  }));
  const residualKwh = ledgers.map((_, scenario) =>
    groups.reduce((sum, group) => sum + Math.abs(group.residualsKwh[scenario] ?? NaN), 0),
  );
  return {
    groups,
    residualKwh,
    residualOfBeam: residualKwh.map((residual, scenario) => {
      const beam = summaries[scenario]?.beamOnApertureKwh ?? 0;
      return beam > 0 ? residual / beam : null;
    }),
  };
}

function rowsOf(part: LedgerPart, ledgers: readonly Float64Array[]): LedgerRow[] {
  return LEDGER_LINES.flatMap(({ key, label, parts }) => {
    const direction = (parts as Partial<Record<LedgerPart, LedgerDirection>>)[part];
    if (direction === undefined) return [];
    const sign = LEDGER_SIGN[direction];
    // Adding zero turns a negative zero into zero.
    const signedKwh = ledgers.map((ledger) => sign * (ledger[LEDGER_INDEX[key]] ?? NaN) + 0);
    return [{ line: key, label, direction, signedKwh }];
  });
}
