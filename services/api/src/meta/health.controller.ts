import { Controller, Get, HttpStatus } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { EntityManager } from '@mikro-orm/postgresql';
import { createZodDto, ZodResponse } from 'nestjs-zod';
import { z } from 'zod';
import { ProblemException } from '../http/problem';

const healthSchema = z.object({ status: z.literal('ok') });
class HealthDto extends createZodDto(healthSchema) {}

@ApiTags('service')
@Controller('health')
export class HealthController {
  constructor(private readonly em: EntityManager) {}

  /** Says no more than whether requests can be answered: anybody may ask. */
  @Get()
  @ZodResponse({ status: HttpStatus.OK, type: HealthDto })
  async health(): Promise<z.infer<typeof healthSchema>> {
    if (await this.em.getConnection().isConnected()) return { status: 'ok' };
    throw new ProblemException(
      HttpStatus.SERVICE_UNAVAILABLE,
      'The database does not answer',
      'Try again in a moment; if it stays, tell your administrator.',
      { retryAfterS: 5 },
    );
  }
}
