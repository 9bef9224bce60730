import type { LoadSettings } from '@noonwell/engine';
import type { CrossFieldProblem } from '../problem.js';

/** What a kind of load brings besides its fields. */
export interface LoadDefinition<Document> {
  /** From the document's units to the engine's. */
  toSettings(document: Document): LoadSettings;
  /** Problems that no single field can see; `path` is the load's own place in the scenario. */
  problems(document: Document, path: string, tankLitres: number): CrossFieldProblem[];
}
