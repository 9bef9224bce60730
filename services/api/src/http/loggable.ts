import { DriverException } from '@mikro-orm/core';
import { z } from 'zod';

const databaseErrorSchema = z.object({
  code: z.string().optional(),
  table: z.string().optional(),
  constraint: z.string().optional(),
});

/**
 * An error as it may stand in the log. Those of the database carry the whole statement with its values in their
 * message: a password's hash, an address, a weather file.
 */
export function loggable(error: unknown): unknown {
  if (!(error instanceof DriverException)) return error;
  const reason = error.message.split(' - ').at(-1) ?? '';
  const frames = (error.stack ?? '').split('\n').filter((line) => line.startsWith('    at '));
  return {
    type: error.name,
    message: reason.split('\n', 1)[0],
    ...databaseErrorSchema.safeParse(error).data,
    stack: frames.join('\n'),
  };
}
