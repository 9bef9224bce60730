import { EntityManager } from '@mikro-orm/postgresql';
import { HttpStatus, Injectable } from '@nestjs/common';
import { withWorkspace } from '@noonwell/persistence';
import type { Response } from 'express';
import { requirePermission, type Principal } from '../access/principal';
import { JwtStrategy } from '../auth/jwt.strategy';
import { ProblemException } from '../http/problem';
import { requireStudy } from '../studies/study-access';
import { EventStream } from './event-stream';
import { RunFeed } from './run-feed';

export const HEARTBEAT_MS = 15_000;
/** Pages open at once; each holds a connection. */
const MOST_STREAMS = 20;

@Injectable()
export class EventsService {
  private readonly open = new Map<string, number>();

  constructor(
    private readonly em: EntityManager,
    private readonly feed: RunFeed,
    private readonly session: JwtStrategy,
  ) {}

  /** Sends what happens to the study's runs until the client leaves or may no longer see the study. */
  async stream(principal: Principal, studyId: string, response: Response): Promise<void> {
    await this.requireSight(principal, studyId);
    const { userId, workspaceId } = principal;
    const others = this.open.get(userId) ?? 0;
    if (others >= MOST_STREAMS) {
      throw new ProblemException(
        HttpStatus.TOO_MANY_REQUESTS,
        'Too many requests',
        `You follow studies in ${String(others)} places already. Close some of those pages.`,
      );
    }
    // The client may have left while its rights were looked up.
    if (response.destroyed) return;
    this.open.set(userId, others + 1);
    const stream = new EventStream(response);
    const leave = this.feed.follow(workspaceId, studyId, stream);
    const heartbeat = setInterval(() => {
      this.requireSight(principal, studyId).then(
        () => {
          stream.beat();
        },
        () => {
          // Signed out, another role, or the study is gone or hidden: the client asks again and learns which.
          stream.end();
        },
      );
    }, HEARTBEAT_MS);
    response.once('close', () => {
      clearInterval(heartbeat);
      leave();
      const left = (this.open.get(userId) ?? 1) - 1;
      if (left > 0) this.open.set(userId, left);
      else this.open.delete(userId);
    });
  }

  private async requireSight(principal: Principal, studyId: string): Promise<void> {
    requirePermission(principal, 'run.read');
    const { userId, workspaceId, familyId, role } = principal;
    await this.session.validate({ sub: userId, workspace: workspaceId, family: familyId, role });
    await withWorkspace(this.em, workspaceId, (em) => requireStudy(em, principal, studyId, 'read'));
  }
}
