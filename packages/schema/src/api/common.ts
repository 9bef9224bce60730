import { z } from 'zod';

/** In lower case, as PostgreSQL gives it back: two writings of one id must not look like two. */
export const idSchema = z.uuid().toLowerCase();
export const instantSchema = z.iso.datetime();
/** A name that a person types: trimmed, one line, no control characters. */
export const nameSchema = z
  .string()
  .trim()
  .min(1, { error: 'a name is needed' })
  .max(120, { error: 'a name has at most 120 characters' })
  .regex(/^[^\p{Cc}]*$/u, { error: 'a name holds no control characters' });

export const pageQuerySchema = z.strictObject({
  page: z.coerce.number().int().min(1).max(100_000).default(1),
  pageSize: z.coerce.number().int().min(1).max(200).default(50),
});
export type PageQuery = z.infer<typeof pageQuerySchema>;

export function pageOf<Item extends z.ZodType>(item: Item) {
  return z.object({ items: z.array(item), page: z.int(), pageSize: z.int(), total: z.int() });
}

/** Problem details, RFC 9457, with the failing places of the input and a reference into the log. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string().optional(),
  instance: z.string().optional(),
  reference: z.string().optional(),
  errors: z
    .array(
      z.object({
        /** Path into the request body, or into a scenario: "catch.dish.apertureDiameterM". */
        path: z.string().optional(),
        line: z.int().nullable().optional(),
        column: z.int().nullable().optional(),
        columnName: z.string().nullable().optional(),
        value: z.string().nullable().optional(),
        reason: z.string(),
        fix: z.string().optional(),
      }),
    )
    .optional(),
});
export type Problem = z.infer<typeof problemSchema>;
