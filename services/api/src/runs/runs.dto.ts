import { pageOf, runSchema, startRunsRequestSchema, startRunsResponseSchema } from '@noonwell/schema';
import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';

export class RunDto extends createZodDto(runSchema) {}
export class RunPageDto extends createZodDto(pageOf(runSchema)) {}
export class StartRunsDto extends createZodDto(startRunsRequestSchema) {}
export class StartedRunsDto extends createZodDto(startRunsResponseSchema) {}

const MOST_CHANNEL_LETTERS = 4000;

/** Keys of columns with commas between them; all columns where it is left out. */
export class ColumnsQueryDto extends createZodDto(
  z.strictObject({
    channels: z
      .string()
      .max(MOST_CHANNEL_LETTERS)
      .regex(/^\w+(,\w+)*$/, { error: 'write keys of channels with commas between them' })
      .optional(),
  }),
) {}
