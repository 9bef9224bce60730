import { EntityManager } from '@mikro-orm/postgresql';
import { Injectable, Logger } from '@nestjs/common';
import { Membership, RefreshToken, setScope, withScope, Workspace } from '@noonwell/persistence';
import type { Access } from '@noonwell/schema';
import { createHash, randomBytes, randomUUID } from 'node:crypto';
import { unauthorized } from '../http/problem';
import { ACCESS_TOKEN_SECONDS, AccessTokens } from './access-tokens';
import type { Account } from './accounts.service';
import { meView } from './me';

const DAY_MS = 24 * 3600 * 1000;
export const IDLE_MS = 7 * DAY_MS;
export const ABSOLUTE_MS = 30 * DAY_MS;
const TOKEN_BYTES = 32;

export interface OpenedSession {
  readonly access: Access;
  /** Goes into the cookie and nowhere else. */
  readonly refreshToken: string;
  readonly refreshExpiresAt: Date;
}

const ENDED = 'This session has ended. Sign in again.';
const digest = (token: string): string => createHash('sha256').update(token).digest('hex');

/** Sessions: a family of refresh tokens, each used once. */
@Injectable()
export class SessionsService {
  private readonly log = new Logger('session');

  constructor(
    private readonly em: EntityManager,
    private readonly tokens: AccessTokens,
  ) {}

  /** A new session, whatever the browser sent along. */
  open(account: Account): Promise<OpenedSession> {
    return withScope(this.em, account, async (em) => {
      // What has run out is of no more use, not even to notice that it comes back.
      await em.nativeDelete(RefreshToken, { userId: account.userId, familyExpiresAt: { $lt: new Date() } });
      const session = await this.addToken(em, account, randomUUID(), new Date(Date.now() + ABSOLUTE_MS));
      this.log.log({ userId: account.userId, workspaceId: account.workspaceId }, 'signed in');
      return session;
    });
  }

  /**
   * Uses a refresh token up and gives the next one. A token that was used before has been copied: its whole family
   * ends, for the thief and for the owner, who signs in again.
   */
  async refresh(token: string): Promise<OpenedSession> {
    const session = await this.inFamily(token, async (em, presented) => {
      const now = new Date();
      if (presented.revokedAt !== null) return null;
      if (presented.usedAt !== null) {
        this.log.warn({ userId: presented.userId, familyId: presented.familyId }, 'refresh token used twice');
        await revokeFamily(em, presented.familyId);
        return null;
      }
      if (presented.expiresAt <= now || presented.familyExpiresAt <= now) return null;
      presented.usedAt = now;
      return this.addToken(em, presented, presented.familyId, presented.familyExpiresAt);
    });
    if (session === null) throw unauthorized(ENDED, 'session-ended');
    return session;
  }

  /** Ends the session on the server; access tokens of it are refused from then on. */
  async close(token: string): Promise<void> {
    await this.inFamily(token, async (em, { familyId, userId }) => {
      await revokeFamily(em, familyId);
      this.log.log({ userId }, 'signed out');
      return null;
    });
  }

  /** Runs `work` on the token's row with its family locked; null where no such token is known. Commits in any case. */
  private inFamily<Result>(
    token: string,
    work: (em: EntityManager, presented: RefreshToken) => Promise<Result | null>,
  ): Promise<Result | null> {
    const tokenHash = digest(token);
    return withScope(this.em, { refreshTokenHash: tokenHash }, async (em) => {
      const known = await em.findOne(RefreshToken, { tokenHash });
      if (known === null) return null;
      await setScope(em, { userId: known.userId, workspaceId: known.workspaceId });
      // Two requests of one family one after the other: else a token made while the family ends would outlive it.
      await em.execute('select pg_advisory_xact_lock(hashtextextended(?, 0))', [known.familyId]);
      await em.refresh(known);
      return work(em, known);
    });
  }

  private async addToken(
    em: EntityManager,
    { userId, workspaceId }: Account,
    familyId: string,
    familyExpiresAt: Date,
  ): Promise<OpenedSession> {
    const membership = await em.findOne(Membership, { user: userId }, { populate: ['user'] });
    const workspace = await em.findOne(Workspace, { id: workspaceId });
    if (membership === null || workspace === null || membership.user.$.disabledAt !== null) {
      throw unauthorized(ENDED, 'session-ended');
    }
    const refreshToken = randomBytes(TOKEN_BYTES).toString('base64url');
    const expiresAt = new Date(Math.min(Date.now() + IDLE_MS, familyExpiresAt.getTime()));
    em.create(RefreshToken, {
      familyId,
      userId,
      workspaceId,
      tokenHash: digest(refreshToken),
      usedAt: null,
      revokedAt: null,
      expiresAt,
      familyExpiresAt,
    });
    await em.flush();
    const { role } = membership;
    return {
      access: {
        accessToken: await this.tokens.sign({ userId, workspaceId, role, familyId }),
        expiresInSeconds: ACCESS_TOKEN_SECONDS,
        me: meView(membership.user.$, workspace, role),
      },
      refreshToken,
      refreshExpiresAt: expiresAt,
    };
  }
}

async function revokeFamily(em: EntityManager, familyId: string): Promise<void> {
  await em.nativeUpdate(RefreshToken, { familyId, revokedAt: null }, { revokedAt: new Date() });
}
