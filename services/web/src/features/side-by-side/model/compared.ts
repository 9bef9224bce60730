import type { RunSummary, Scenario } from '@noonwell/schema';

/** One scenario as it stands side by side with others: what was run, on what, and what came out. */
export interface Compared {
  readonly scenarioId: string;
  readonly runId: string;
  readonly name: string;
  /** Slot that keeps its colour in every chart. */
  readonly position: number;
  readonly version: number;
  readonly weatherYearId: string;
  readonly weatherYearName: string;
  readonly document: Scenario;
  readonly summary: RunSummary;
}
