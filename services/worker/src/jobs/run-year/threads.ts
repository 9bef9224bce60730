import type { RunOutcome } from '@noonwell/persistence';
import { join } from 'node:path';
import { Worker, type WorkerOptions } from 'node:worker_threads';
import { RunRefused, type RunInput } from './calculate-run';
import type { ThreadMessage } from './serve-thread';

export interface ThreadEntry {
  readonly file: string;
  readonly options?: WorkerOptions;
}

const RUN_THREAD: ThreadEntry = { file: join(__dirname, 'thread.js') };

/** The engine needs a few tens of megabytes; a runaway run must not take the machine down. */
const RESOURCE_LIMITS = { maxOldGenerationSizeMb: 1024 };

/** The run was given up by whoever asked for it. */
export class RunAborted extends Error {
  override readonly name = 'RunAborted';
}

/**
 * Threads for the arithmetic, so that the process itself stays free to renew locks and write progress. A thread
 * that finished its run is kept for the next; one that is stopped in the middle is thrown away.
 */
export class RunThreads {
  private readonly idle: Worker[] = [];
  private readonly busy = new Set<Worker>();

  constructor(private readonly entry: ThreadEntry = RUN_THREAD) {}

  /**
   * Runs one year in a thread.
   * @throws RunRefused when it can never succeed; RunAborted when the signal stopped it
   */
  run(input: RunInput, signal: AbortSignal, onProgress: (progress: number) => void): Promise<RunOutcome> {
    if (signal.aborted) return Promise.reject(new RunAborted());
    const thread = this.idle.pop() ?? this.start();
    this.busy.add(thread);
    thread.ref();
    return new Promise<RunOutcome>((resolve, reject) => {
      const end = (settle: () => void, keep: boolean) => {
        thread.off('message', hear);
        thread.off('error', crash);
        thread.off('exit', exit);
        signal.removeEventListener('abort', abort);
        this.busy.delete(thread);
        if (keep) this.keep(thread);
        settle();
      };
      const hear = (message: ThreadMessage) => {
        switch (message.kind) {
          case 'progress':
            onProgress(message.progress);
            return;
          case 'done':
            end(() => {
              resolve(message.outcome);
            }, true);
            return;
          case 'refused':
            end(() => {
              reject(new RunRefused(message.sentence));
            }, true);
            return;
          case 'error':
            end(() => {
              reject(message.error);
            }, true);
        }
      };
      const crash = (error: Error) => {
        end(() => {
          reject(error);
        }, false);
      };
      const exit = (code: number) => {
        end(() => {
          reject(new Error(`The run's thread ended with code ${String(code)}.`));
        }, false);
      };
      const abort = () => {
        end(() => {
          reject(new RunAborted());
        }, false);
        void thread.terminate();
      };
      thread.on('message', hear);
      thread.on('error', crash);
      thread.on('exit', exit);
      signal.addEventListener('abort', abort);
      thread.postMessage(input);
    });
  }

  /** Ends all threads, also those that work. */
  async close(): Promise<void> {
    await Promise.all([...this.idle.splice(0), ...this.busy].map((thread) => thread.terminate()));
  }

  private start(): Worker {
    const thread = new Worker(this.entry.file, { resourceLimits: RESOURCE_LIMITS, ...this.entry.options });
    // Also while it is idle: an error that nobody listens to would end the process.
    for (const end of ['error', 'exit'])
      thread.on(end, () => {
        this.forget(thread);
      });
    return thread;
  }

  private keep(thread: Worker): void {
    // An idle thread keeps no process alive.
    thread.unref();
    this.idle.push(thread);
  }

  private forget(thread: Worker): void {
    const at = this.idle.indexOf(thread);
    if (at >= 0) this.idle.splice(at, 1);
  }
}
