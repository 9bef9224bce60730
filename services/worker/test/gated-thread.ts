/**
 * The engine's own run with a gate in the middle, for tests that must meet a run while it runs. It waits where
 * half of the records are done until the gate opens, or breaks off there in the way it is told to.
 */
import { RunError, createYearRun } from '@noonwell/engine';
import { workerData } from 'node:worker_threads';
import { serveThread } from '../src/jobs/run-year/serve-thread';
import { GATE, gateDataSchema } from './gate';

const gate = new Int32Array(gateDataSchema.parse(workerData).gate);

serveThread((machine, weather) => {
  const run = createYearRun(machine, weather);
  let waited = false;
  return {
    get records() {
      return run.records;
    },
    get accountsJ() {
      return run.accountsJ;
    },
    get done() {
      return run.done;
    },
    advance(records) {
      run.advance(records);
      if (waited || run.done < run.records / 2) return;
      waited = true;
      Atomics.add(gate, GATE.arrived, 1);
      Atomics.notify(gate, GATE.arrived);
      Atomics.wait(gate, GATE.open, 0);
      if (Atomics.load(gate, GATE.mode) === 1)
        throw new RunError('receiver', run.done, 'the cells reach 131 °C');
      if (Atomics.load(gate, GATE.mode) === 2) throw new Error('a fault inside Noonwell');
    },
    finish: () => run.finish(),
  };
});
