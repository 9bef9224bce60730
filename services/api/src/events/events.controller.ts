import { Controller, Get, Param, Res } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiProduces, ApiTags } from '@nestjs/swagger';
import type { Response } from 'express';
import { CurrentPrincipal, type Principal } from '../access/principal';
import { IdParamsDto } from '../http/paging';
import { EventsService } from './events.service';

@ApiTags('runs')
@ApiBearerAuth()
@Controller('studies')
export class EventsController {
  constructor(private readonly events: EventsService) {}

  @Get(':id/events')
  @ApiProduces('text/event-stream')
  @ApiOkResponse({
    description:
      'Server-sent events named "run": the present state of each active run, then every change, as runEventSchema of the schema package',
    schema: { type: 'string' },
  })
  stream(
    @CurrentPrincipal() principal: Principal,
    @Param() { id }: IdParamsDto,
    @Res() response: Response,
  ): Promise<void> {
    return this.events.stream(principal, id, response);
  }
}
