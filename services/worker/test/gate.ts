import { z } from 'zod';

/** Places in the shared array. */
export const GATE = { open: 0, arrived: 1, mode: 2 } as const;

/** How a run goes on behind the gate. */
export const MODES = { finish: 0, fail: 1, fault: 2 } as const;

export const gateDataSchema = z.object({ gate: z.instanceof(SharedArrayBuffer) });

/** Shared with the threads of one worker; see gated-thread.ts. */
export class Gate {
  readonly buffer = new SharedArrayBuffer(3 * Int32Array.BYTES_PER_ELEMENT);
  private readonly view = new Int32Array(this.buffer);

  /** Lets the runs at the gate go on, and all that come later. */
  open(mode: keyof typeof MODES = 'finish'): void {
    Atomics.store(this.view, GATE.mode, MODES[mode]);
    Atomics.store(this.view, GATE.open, 1);
    Atomics.notify(this.view, GATE.open);
  }

  close(): void {
    Atomics.store(this.view, GATE.open, 0);
  }

  get arrived(): number {
    return Atomics.load(this.view, GATE.arrived);
  }
}
