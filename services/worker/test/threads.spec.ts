import { newScenario } from '@noonwell/schema';
import { syntheticYear } from '@noonwell/testkit';
import { encodeWeatherYear } from '@noonwell/weather';
import type { Worker } from 'node:worker_threads';
import { RunThreads } from '../src/jobs/run-year/threads';
import { Gate } from './gate';
import { firstRecords, gatedThread } from './stage';

const mockStarted: Worker[] = [];
jest.mock('node:worker_threads', () => {
  const actual = jest.requireActual<typeof import('node:worker_threads')>('node:worker_threads');
  class SeenWorker extends actual.Worker {
    constructor(...given: ConstructorParameters<typeof actual.Worker>) {
      super(...given);
      mockStarted.push(this);
    }
  }
  return { ...actual, Worker: SeenWorker };
});

describe('threads of runs', () => {
  it('are used again and again without gathering listeners', async () => {
    const gate = new Gate();
    gate.open();
    const threads = new RunThreads(gatedThread(gate));
    const input = {
      document: newScenario(),
      weatherBytes: encodeWeatherYear(firstRecords(syntheticYear(), 2)),
    };
    const listeners = (): number[] =>
      mockStarted.flatMap((thread) => ['message', 'error', 'exit'].map((name) => thread.listenerCount(name)));
    const signal = new AbortController().signal;
    try {
      await threads.run(input, signal, () => undefined);
      const first = listeners();
      for (let again = 0; again < 3; again += 1) await threads.run(input, signal, () => undefined);
      expect(mockStarted).toHaveLength(1);
      expect(listeners()).toEqual(first);
    } finally {
      await threads.close();
    }
  }, 60_000);
});
