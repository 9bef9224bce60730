import { MOST_SCENARIOS, type ScenarioView } from '@noonwell/schema';
import type { ViewState } from './address.js';

export interface Shown {
  /** Baseline first, then the others in the order of the address or of the study. */
  readonly scenarios: readonly ScenarioView[];
  readonly baseline: ScenarioView | null;
  readonly others: readonly ScenarioView[];
}

/** What an address shows of a study: ids that the study lacks are left out, and an unknown baseline is its first scenario. */
export function shownScenarios(all: readonly ScenarioView[], view: ViewState): Shown {
  const inOrder = all.toSorted((a, b) => a.position - b.position);
  const named = view.scenarios.flatMap((id) => inOrder.find((scenario) => scenario.id === id) ?? []);
  const chosen = named.length > 0 ? named : inOrder;
  const baseline = chosen.find(({ id }) => id === view.baseline) ?? chosen[0] ?? null;
  const others = chosen.filter((scenario) => scenario !== baseline).slice(0, MOST_SCENARIOS - 1);
  return { scenarios: baseline ? [baseline, ...others] : [], baseline, others };
}
