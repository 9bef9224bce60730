import { newScenario, scenarioFields, type ReceiverKind } from '@noonwell/schema';
import { draftText, toDraft, type Draft } from './draft.js';

export interface SuggestedChange {
  readonly path: string;
  readonly label: string;
  readonly unit: string;
  readonly from: string;
  readonly to: string;
}

/**
 * Settings outside the receiver that a new scenario of this receiver has otherwise: cells want cooler water
 * than a coil, and a receiver that is switched in the form keeps the loop that it finds.
 */
export function loopAdvice(draft: Draft, receiver: ReceiverKind, other: ReceiverKind): SuggestedChange[] {
  const suited = toDraft(newScenario(receiver));
  const unsuited = toDraft(newScenario(other));
  return scenarioFields().flatMap(({ path, label, unit }) => {
    if (path.startsWith('catch.receiver.')) return [];
    const to = draftText(suited, path);
    const from = draftText(draft, path);
    // Only what still has the other receiver's default: a value that somebody chose is theirs.
    return to !== undefined && from !== undefined && from !== to && from === draftText(unsuited, path)
      ? [{ path, label, unit, from, to }]
      : [];
  });
}
