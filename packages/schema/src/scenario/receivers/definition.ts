import type { ReceiverSettings } from '@noonwell/engine';
import type { CrossFieldProblem } from '../problem.js';

/** What a kind of receiver brings besides its fields. */
export interface ReceiverDefinition<Document> {
  /** From the document's units to the engine's. */
  toSettings(document: Document): ReceiverSettings;
  /** Problems that no single field can see. */
  problems(document: Document, apertureDiameterM: number): CrossFieldProblem[];
  /** Pump settings of a new scenario that suit this receiver better than the pump's own defaults. */
  readonly pumpDefaults: { readonly setPointC?: number; readonly outletLimitC?: number };
}
