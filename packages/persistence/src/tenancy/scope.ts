import type { EntityManager } from '@mikro-orm/postgresql';
import { WORKSPACE_FILTER } from './tenant.js';

/**
 * Named rights of system work that has no workspace of its own. Each opens only what its policy names:
 * the relay the outbox, the reconciler the reading of runs, the account command the reading of workspaces.
 */
export const SYSTEM_TASKS = ['outbox-relay', 'reconciler', 'account-command'] as const;
export type SystemTask = (typeof SYSTEM_TASKS)[number];

/** What the policies of row-level security look at; nothing set means that nothing is visible. */
export interface AccessScope {
  readonly workspaceId?: string;
  /** The person's own rows: account, memberships, sessions. */
  readonly userId?: string;
  /** Finds one account before anybody is known. */
  readonly signInEmail?: string;
  /** Finds one session before anybody is known: SHA-256 of the refresh token. */
  readonly refreshTokenHash?: string;
  readonly systemTask?: SystemTask;
}

/** Names of the settings in PostgreSQL; the policies in the migrations read the same. */
export const SCOPE_SETTINGS = {
  workspaceId: 'noonwell.workspace_id',
  userId: 'noonwell.user_id',
  signInEmail: 'noonwell.sign_in_email',
  refreshTokenHash: 'noonwell.refresh_token_hash',
  systemTask: 'noonwell.system_task',
} as const satisfies Record<keyof AccessScope, string>;

const SCOPE_KEYS = Object.keys(SCOPE_SETTINGS) as (keyof AccessScope)[];

/**
 * Sets the scope of the running transaction, whole: what is not named is taken away. It ends with the
 * transaction (set_config's third argument is SET LOCAL), also when that fails.
 */
export async function setScope(em: EntityManager, scope: AccessScope): Promise<void> {
  if (!em.isInTransaction()) throw new Error('A scope lives in a transaction only.');
  const calls = SCOPE_KEYS.map((key) => `set_config('${SCOPE_SETTINGS[key]}', ?, true)`);
  await em.execute(
    `select ${calls.join(', ')}`,
    SCOPE_KEYS.map((key) => scope[key] ?? ''),
  );
  em.setFilterParams(WORKSPACE_FILTER, { workspaceId: scope.workspaceId ?? null });
}

/** One transaction on a fresh EntityManager with the given scope. */
export function withScope<Result>(
  em: EntityManager,
  scope: AccessScope,
  work: (em: EntityManager) => Promise<Result>,
): Promise<Result> {
  return em.fork({ clear: true }).transactional(async (inner) => {
    await setScope(inner, scope);
    return work(inner);
  });
}

/** One transaction that sees and changes rows of one workspace only. */
export function withWorkspace<Result>(
  em: EntityManager,
  workspaceId: string,
  work: (em: EntityManager) => Promise<Result>,
): Promise<Result> {
  return withScope(em, { workspaceId }, work);
}

/** One transaction with a named system right; queries on tenant entities need `filters: { workspace: false }`. */
export function withSystemTask<Result>(
  em: EntityManager,
  systemTask: SystemTask,
  work: (em: EntityManager) => Promise<Result>,
): Promise<Result> {
  return withScope(em, { systemTask }, work);
}
