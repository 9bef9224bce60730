/**
 * Makes an account that signs in with a password:
 *
 *   create-account --workspace NAME --name NAME --email ADDRESS --role admin < password
 *
 * The password is read from standard input, so that it stands neither in the shell's history nor in the list of
 * processes. A workspace that does not exist is made. DATABASE_URL is the app role's, as for the API.
 */
import { UniqueConstraintViolationException } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import {
  createOrm,
  Membership,
  normalizeEmail,
  plainMessage,
  User,
  withScope,
  withSystemTask,
  Workspace,
} from '@noonwell/persistence';
import { nameSchema, roleSchema, signInRequestSchema } from '@noonwell/schema';
import { randomUUID } from 'node:crypto';
import { text } from 'node:stream/consumers';
import { parseArgs } from 'node:util';
import { z } from 'zod';
import { hashPassword, newPasswordSchema } from '../auth/passwords';

const accountSchema = z.strictObject({
  workspace: nameSchema,
  name: nameSchema,
  email: signInRequestSchema.shape.email,
  role: roleSchema,
  password: newPasswordSchema,
});
export type NewAccount = z.infer<typeof accountSchema>;

/** The account cannot be made; the message says what to change. */
export class AccountError extends Error {
  override readonly name = 'AccountError';
}

/** @throws AccountError naming each option that is missing or wrong; the password is never repeated */
export function readAccount(args: readonly string[], password: string): NewAccount {
  const option = { type: 'string' } as const;
  let values;
  try {
    ({ values } = parseArgs({
      args: [...args],
      options: { workspace: option, name: option, email: option, role: option },
      strict: true,
    }));
  } catch (error) {
    throw new AccountError(error instanceof Error ? error.message : String(error));
  }
  // What ends the line is not part of the password.
  const parsed = accountSchema.safeParse({ ...values, password: password.replace(/\r?\n$/, '') });
  if (parsed.success) return parsed.data;
  throw new AccountError(
    parsed.error.issues.map(({ path, message }) => `${path.map(String).join('.')}: ${message}`).join('\n'),
  );
}

/** Makes account and membership, and the workspace where there is none of that name; all or nothing. */
export async function createAccount(
  em: EntityManager,
  account: NewAccount,
): Promise<{ userId: string; workspaceId: string; workspaceMade: boolean }> {
  const known = await withSystemTask(em, 'account-command', (inner) =>
    inner.find(Workspace, { name: account.workspace }),
  );
  if (known.length > 1) {
    throw new AccountError(`${String(known.length)} workspaces have the name "${account.workspace}".`);
  }
  if (known[0]?.isDemo === true) {
    throw new AccountError('The demo workspace has no accounts with passwords. Name another workspace.');
  }
  const workspaceId = known[0]?.id ?? randomUUID();
  const userId = randomUUID();
  const passwordHash = await hashPassword(account.password);
  try {
    await withScope(em, { workspaceId, userId }, async (inner) => {
      if (known.length === 0) inner.create(Workspace, { id: workspaceId, name: account.workspace });
      inner.create(User, {
        id: userId,
        email: normalizeEmail(account.email),
        name: account.name,
        passwordHash,
        disabledAt: null,
      });
      await inner.flush();
      inner.create(Membership, { workspaceId, user: userId, role: account.role });
      await inner.flush();
    });
  } catch (error) {
    if (!(error instanceof UniqueConstraintViolationException)) throw error;
    throw new AccountError(`There is an account with the address ${normalizeEmail(account.email)} already.`);
  }
  return { userId, workspaceId, workspaceMade: known.length === 0 };
}

async function main(): Promise<void> {
  const databaseUrl = process.env['DATABASE_URL'];
  if (databaseUrl === undefined || databaseUrl === '') throw new AccountError('DATABASE_URL is not set.');
  if (process.stdin.isTTY) process.stderr.write('Type the password, then Enter and Ctrl-D:\n');
  const account = readAccount(process.argv.slice(2), await text(process.stdin));
  const orm = await createOrm({ databaseUrl, poolMax: 1 });
  try {
    const { workspaceMade } = await createAccount(orm.em, account);
    const where = `the ${workspaceMade ? 'new ' : ''}workspace "${account.workspace}"`;
    process.stdout.write(`${normalizeEmail(account.email)} can sign in to ${where}.\n`);
  } finally {
    await orm.close(true);
  }
}

if (require.main === module) {
  main().catch((error: unknown) => {
    process.stderr.write(`${plainMessage(error)}\n`);
    process.exitCode = error instanceof AccountError ? 2 : 1;
  });
}
