import { EntityManager } from '@mikro-orm/postgresql';
import { HttpStatus, Injectable, type OnApplicationBootstrap, type OnModuleDestroy } from '@nestjs/common';
import { withWorkspace } from '@noonwell/persistence';
import type { Response } from 'express';
import { requirePermission, type Principal } from '../access/principal';
import { JwtStrategy } from '../auth/jwt.strategy';
import { ProblemException } from '../http/problem';
import { requireStudy } from '../studies/study-access';
import { EventStream } from './event-stream';
import { RunFeed } from './run-feed';

/** How often a line shows that it lives, and the right to it is looked at again. */
const HEARTBEAT_MS = 15_000;
/** Pages of one person at once; each holds a connection. */
const MOST_STREAMS = 20;

interface OpenStream {
  readonly principal: Principal;
  readonly studyId: string;
  readonly stream: EventStream;
}

@Injectable()
export class EventsService implements OnApplicationBootstrap, OnModuleDestroy {
  private readonly open = new Set<OpenStream>();
  private timer: NodeJS.Timeout | undefined;

  constructor(
    private readonly em: EntityManager,
    private readonly feed: RunFeed,
    private readonly session: JwtStrategy,
  ) {}

  onApplicationBootstrap(): void {
    this.timer = setInterval(() => void this.checkAll(), HEARTBEAT_MS);
  }

  /** The HTTP server closes only when its last answer has ended. */
  onModuleDestroy(): void {
    clearInterval(this.timer);
    for (const { stream } of this.open) stream.end();
  }

  get openStreams(): number {
    return this.open.size;
  }

  /** Sends what happens to the study's runs until the client leaves or may no longer see the study. */
  async stream(principal: Principal, studyId: string, response: Response): Promise<void> {
    await this.requireSight(principal, studyId);
    const own = [...this.open].filter((other) => other.principal.userId === principal.userId);
    if (own.length >= MOST_STREAMS) {
      throw new ProblemException(
        HttpStatus.TOO_MANY_REQUESTS,
        'Too many requests',
        `You follow studies in ${String(own.length)} places already. Close some of those pages.`,
      );
    }
    // The client may have left while its rights were looked up.
    if (response.destroyed) return;
    const opened = { principal, studyId, stream: new EventStream(response) };
    this.open.add(opened);
    const leave = this.feed.follow(principal.workspaceId, studyId, opened.stream);
    response.once('close', () => {
      leave();
      this.open.delete(opened);
    });
  }

  /** Beats for every stream whose person may still see the study, and ends the others: their clients ask again and learn why. */
  async checkAll(): Promise<void> {
    for (const { principal, studyId, stream } of [...this.open]) {
      try {
        await this.requireSight(principal, studyId);
        stream.beat();
      } catch {
        stream.end();
      }
    }
  }

  private async requireSight(principal: Principal, studyId: string): Promise<void> {
    requirePermission(principal, 'run.read');
    const { userId, workspaceId, familyId, role } = principal;
    await this.session.validate({ sub: userId, workspace: workspaceId, family: familyId, role });
    await withWorkspace(this.em, workspaceId, (em) => requireStudy(em, principal, studyId, 'read'));
  }
}
