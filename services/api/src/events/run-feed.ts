import { EntityManager } from '@mikro-orm/postgresql';
import { Injectable, Logger, type OnApplicationBootstrap, type OnModuleDestroy } from '@nestjs/common';
import {
  RUNS_CHANNEL,
  RunRow,
  listen,
  loggable,
  runSignalSchema,
  withWorkspace,
  type Listener,
} from '@noonwell/persistence';
import { ACTIVE_RUN_STATES, type RunEvent } from '@noonwell/schema';
import { InjectSettings, type Settings } from '../config/settings';

export interface Receiver {
  receive(event: RunEvent): void;
}

/** What is followed of one study, once for all who watch it. */
interface Followed {
  readonly workspaceId: string;
  readonly studyId: string;
  readonly receivers: Set<Receiver>;
  /** Runs last seen active: after a gap they are read again, to learn how they ended. */
  readonly active: Set<string>;
  /** Runs that changed since they were read. */
  readonly changed: Set<string>;
  readAll: boolean;
  reading: boolean;
}

/**
 * Changes of runs as they happen, in whichever process: the rows themselves signal them through PostgreSQL, and
 * one session in each API process listens. A signal says only which run changed; its row is read under
 * row-level security, once for all who watch the study.
 */
@Injectable()
export class RunFeed implements OnApplicationBootstrap, OnModuleDestroy {
  private readonly log = new Logger('run feed');
  private readonly followed = new Map<string, Followed>();
  private listener: Listener | undefined;

  constructor(
    private readonly em: EntityManager,
    @InjectSettings() private readonly settings: Settings,
  ) {}

  onApplicationBootstrap(): void {
    this.listener = listen({
      databaseUrl: this.settings.databaseUrl,
      channel: RUNS_CHANNEL,
      onSignal: (payload) => {
        this.onSignal(payload);
      },
      onConnected: () => {
        for (const study of this.followed.values()) this.readAll(study);
      },
      onError: (error) => {
        this.log.warn({ err: error }, 'not hearing of changed runs at the moment');
      },
    });
  }

  async onModuleDestroy(): Promise<void> {
    await this.listener?.close();
  }

  /**
   * Begins with the present state of every active run. The caller has made sure that the person may see the study.
   * @returns what ends it
   */
  follow(workspaceId: string, studyId: string, receiver: Receiver): () => void {
    const study = this.followed.get(studyId) ?? {
      workspaceId,
      studyId,
      receivers: new Set(),
      active: new Set(),
      changed: new Set(),
      readAll: false,
      reading: false,
    };
    this.followed.set(studyId, study);
    study.receivers.add(receiver);
    this.readAll(study);
    return () => {
      study.receivers.delete(receiver);
      if (study.receivers.size === 0) this.followed.delete(studyId);
    };
  }

  private onSignal(payload: string): void {
    const { workspaceId, studyId, runId } = runSignalSchema.parse(JSON.parse(payload));
    const study = this.followed.get(studyId);
    if (study?.workspaceId !== workspaceId) return;
    study.changed.add(runId);
    void this.read(study);
  }

  private readAll(study: Followed): void {
    study.readAll = true;
    void this.read(study);
  }

  /** One reading after the other, so that an older state never arrives behind a newer one. */
  private async read(study: Followed): Promise<void> {
    if (study.reading) return;
    study.reading = true;
    try {
      while (study.receivers.size > 0 && (study.readAll || study.changed.size > 0)) {
        const ids = [...study.changed, ...(study.readAll ? study.active : [])];
        const states = study.readAll ? [...ACTIVE_RUN_STATES] : [];
        study.changed.clear();
        study.readAll = false;
        for (const event of await this.events(study, ids, states)) tell(study, event);
      }
    } catch (error) {
      // Whoever watches misses a change until the next one, or until the session is back.
      this.log.error({ err: loggable(error), studyId: study.studyId }, 'changed runs could not be read');
    } finally {
      study.reading = false;
    }
  }

  private async events(
    study: Followed,
    ids: readonly string[],
    states: readonly RunRow['state'][],
  ): Promise<RunEvent[]> {
    const runs = await withWorkspace(this.em, study.workspaceId, (em) =>
      em.find(
        RunRow,
        { study: study.studyId, $or: [{ id: { $in: [...ids] } }, { state: { $in: [...states] } }] },
        {
          fields: ['id', 'scenario', 'state', 'progress', 'failure'],
          orderBy: { createdAt: 'asc', id: 'asc' },
        },
      ),
    );
    return runs.map((run) => ({
      runId: run.id,
      scenarioId: run.scenario.id,
      state: run.state,
      progress: run.progress,
      failure: run.failure ?? null,
    }));
  }
}

function tell(study: Followed, event: RunEvent): void {
  if (ACTIVE_RUN_STATES.includes(event.state)) study.active.add(event.runId);
  else study.active.delete(event.runId);
  for (const receiver of study.receivers) receiver.receive(event);
}
