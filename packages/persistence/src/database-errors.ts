import { DriverException } from '@mikro-orm/core';
import { z } from 'zod';

/** What PostgreSQL says of an error beside its message; pg puts it on its own errors, MikroORM copies it to its. */
const databaseErrorSchema = z.object({
  code: z.string().optional(),
  table: z.string().optional(),
  constraint: z.string().optional(),
});

/** SQLSTATE of a foreign key that does not hold: what a row stands on is gone, or something stands on the row. */
const FOREIGN_KEY_VIOLATION = '23503';

/** Whether a row could not be written or deleted because of another that it refers to, or that refers to it. */
export function isForeignKeyViolation(error: unknown): boolean {
  return databaseErrorSchema.safeParse(error).data?.code === FOREIGN_KEY_VIOLATION;
}

/** Query builder and plain statements throw errors that MikroORM has not made its own: they begin with the statement. */
const STATEMENT = /^(select|insert|update|delete|with)\s/;

/**
 * An error as it may stand in a log or on a terminal. Those of the database carry the whole statement with its
 * values in their message: a password's hash, an address, a weather file.
 */
export function loggable(error: unknown): unknown {
  if (!(error instanceof Error)) return error;
  if (!(error instanceof DriverException) && !STATEMENT.test(error.message)) return error;
  const frames = (error.stack ?? '').split('\n').filter((line) => line.startsWith('    at '));
  return {
    type: error.name,
    message: reasonOf(error.message),
    ...databaseErrorSchema.safeParse(error).data,
    stack: frames.join('\n'),
  };
}

/** The same as one line, for commands. */
export function plainMessage(error: unknown): string {
  const shown = z.object({ message: z.string() }).safeParse(loggable(error));
  return shown.success ? shown.data.message : String(error);
}

/** "statement - reason", then lines " - detail: …" and " - hint: …", which repeat values. */
function reasonOf(message: string): string {
  const [withoutDetails = ''] = message.split(/\n - (?:detail|hint): /, 1);
  return (withoutDetails.split(' - ').at(-1) ?? '').split('\n', 1)[0] ?? '';
}
