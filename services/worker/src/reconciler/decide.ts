import type { RunRow } from '@noonwell/persistence';
import type { JobState } from 'bullmq';

/** What is looked at of an active run's row, which is the truth. */
export type ActiveRun = Pick<RunRow, 'id' | 'workspaceId' | 'state' | 'cancelRequested' | 'claimToken'>;

export type Repair =
  'none' | 'send to the queue' | 'give back to the queue' | 'end as cancelled' | 'end as failed';

/** What an active run needs, given the state of its job; 'unknown' where the queue has no such job. */
export function decideRepair(run: ActiveRun, job: JobState | 'unknown'): Repair {
  switch (job) {
    case 'active':
    case 'waiting':
    case 'delayed':
    case 'prioritized':
    case 'waiting-children':
      // Somebody works on it or will. A job whose worker died is the queue's to give to another.
      return 'none';
    case 'completed':
    case 'failed':
    case 'unknown':
      if (run.state === 'queued') return 'send to the queue';
      if (run.cancelRequested) return 'end as cancelled';
      return job === 'failed' ? 'end as failed' : 'give back to the queue';
  }
}
