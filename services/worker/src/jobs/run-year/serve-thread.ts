import type { RunOutcome } from '@noonwell/persistence';
import { parentPort } from 'node:worker_threads';
import { RunRefused, calculateRun, type RunInput, type StartYear } from './calculate-run';

/** What the thread says; what it is told is a RunInput. */
export type ThreadMessage =
  | { readonly kind: 'progress'; readonly progress: number }
  | { readonly kind: 'done'; readonly outcome: RunOutcome }
  | { readonly kind: 'refused'; readonly sentence: string }
  | { readonly kind: 'error'; readonly error: Error };

/** Calculates one run after another for the thread that started this one. */
export function serveThread(startYear: StartYear): void {
  const port = parentPort;
  if (port === null) throw new Error('This file is the entry of a worker thread.');
  const say = (message: ThreadMessage, transfer: ArrayBuffer[] = []) => {
    port.postMessage(message, transfer);
  };
  port.on('message', (input: RunInput) => {
    try {
      const outcome = calculateRun(input, startYear, (progress) => {
        say({ kind: 'progress', progress });
      });
      // A copy of its own, so that the buffer can be handed over whatever it was cut from.
      const columns = Uint8Array.from(outcome.columns);
      say({ kind: 'done', outcome: { ...outcome, columns } }, [columns.buffer]);
    } catch (error) {
      if (error instanceof RunRefused) say({ kind: 'refused', sentence: error.message });
      else say({ kind: 'error', error: error instanceof Error ? error : new Error(String(error)) });
    }
  });
}
