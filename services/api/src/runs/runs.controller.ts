import { Controller, Get, HttpCode, HttpStatus, Param, Post, Query, StreamableFile } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiProduces, ApiTags } from '@nestjs/swagger';
import { ARROW_STREAM_TYPE } from '@noonwell/persistence';
import type { Run } from '@noonwell/schema';
import { ZodResponse } from 'nestjs-zod';
import { CurrentPrincipal, type Principal } from '../access/principal';
import { LimitCostly } from '../http/limits';
import { IdParamsDto } from '../http/paging';
import { ColumnsQueryDto, RunDto } from './runs.dto';
import { RunsService } from './runs.service';

@ApiTags('runs')
@ApiBearerAuth()
@Controller('runs')
export class RunsController {
  constructor(private readonly runs: RunsService) {}

  @Get(':id')
  @ZodResponse({ status: HttpStatus.OK, type: RunDto })
  get(@CurrentPrincipal() principal: Principal, @Param() { id }: IdParamsDto): Promise<Run> {
    return this.runs.get(principal, id);
  }

  @Post(':id/cancel')
  @HttpCode(HttpStatus.OK)
  @ZodResponse({ status: HttpStatus.OK, type: RunDto })
  cancel(@CurrentPrincipal() principal: Principal, @Param() { id }: IdParamsDto): Promise<Run> {
    return this.runs.cancel(principal, id);
  }

  @Post(':id/retry')
  @LimitCostly()
  @HttpCode(HttpStatus.OK)
  @ZodResponse({ status: HttpStatus.OK, type: RunDto })
  retry(@CurrentPrincipal() principal: Principal, @Param() { id }: IdParamsDto): Promise<Run> {
    return this.runs.retry(principal, id);
  }

  @Get(':id/summary')
  @ApiProduces('application/json')
  @ApiOkResponse({
    description: 'The summary, the same bytes as the command line prints',
    schema: { type: 'object' },
  })
  async summary(
    @CurrentPrincipal() principal: Principal,
    @Param() { id }: IdParamsDto,
  ): Promise<StreamableFile> {
    const bytes = Buffer.from(await this.runs.summary(principal, id));
    return new StreamableFile(bytes, { type: 'application/json; charset=utf-8', length: bytes.length });
  }

  @Get(':id/columns')
  @ApiProduces(ARROW_STREAM_TYPE)
  @ApiOkResponse({
    description: 'Arrow IPC stream: startLocalMs and the channels',
    schema: { type: 'string', format: 'binary' },
  })
  async columns(
    @CurrentPrincipal() principal: Principal,
    @Param() { id }: IdParamsDto,
    @Query() { channels }: ColumnsQueryDto,
  ): Promise<StreamableFile> {
    const bytes = await this.runs.columns(principal, id, channels?.split(','));
    return new StreamableFile(bytes, { type: ARROW_STREAM_TYPE, length: bytes.length });
  }
}
