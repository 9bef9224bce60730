import type { EntityManager } from '@mikro-orm/postgresql';
import { reportProgress, withWorkspace, type RunClaim } from '@noonwell/persistence';

/** At most so often the row is written; also how long a cancelled run may go on. */
export const PROGRESS_INTERVAL_MS = 300;

/**
 * Carries progress from the thread to the row, and the wish to cancel from the row to the thread: `signal`
 * aborts, and `verdict` says why.
 */
export class ProgressWriter {
  private readonly controller = new AbortController();
  private readonly timer: NodeJS.Timeout;
  private progress = 0;
  private writing: Promise<void> | undefined;
  private verdictNow: 'go on' | 'cancel' | 'claim lost' = 'go on';

  constructor(
    private readonly em: EntityManager,
    private readonly workspaceId: string,
    private readonly claim: RunClaim,
  ) {
    this.timer = setInterval(() => {
      this.writing ??= this.write().finally(() => (this.writing = undefined));
    }, PROGRESS_INTERVAL_MS);
  }

  get signal(): AbortSignal {
    return this.controller.signal;
  }

  get verdict(): 'go on' | 'cancel' | 'claim lost' {
    return this.verdictNow;
  }

  reached(progress: number): void {
    this.progress = Math.max(this.progress, progress);
  }

  /** Stops the timer and waits for a write under way. */
  async close(): Promise<void> {
    clearInterval(this.timer);
    await this.writing;
  }

  private async write(): Promise<void> {
    try {
      this.verdictNow = await withWorkspace(this.em, this.workspaceId, (em) =>
        reportProgress(em, this.claim, this.progress),
      );
      if (this.verdictNow !== 'go on') this.controller.abort();
    } catch {
      // The next turn tries again. While the database is away nothing can be cancelled either, and storing the
      // result reports what is wrong.
    }
  }
}
