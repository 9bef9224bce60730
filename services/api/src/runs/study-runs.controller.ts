import { Body, Controller, Get, HttpCode, HttpStatus, Param, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiTags } from '@nestjs/swagger';
import type { Run } from '@noonwell/schema';
import { ZodResponse } from 'nestjs-zod';
import { CurrentPrincipal, type Principal } from '../access/principal';
import { LimitCostly } from '../http/limits';
import { IdParamsDto, PageQueryDto, type Page } from '../http/paging';
import { RunPageDto, StartRunsDto, StartedRunsDto } from './runs.dto';
import { RunsService } from './runs.service';

@ApiTags('runs')
@ApiBearerAuth()
@Controller('studies')
export class StudyRunsController {
  constructor(private readonly runs: RunsService) {}

  @Post(':id/runs')
  @LimitCostly()
  @HttpCode(HttpStatus.OK)
  @ZodResponse({ status: HttpStatus.OK, type: StartedRunsDto })
  start(
    @CurrentPrincipal() principal: Principal,
    @Param() { id }: IdParamsDto,
    @Body() { scenarioIds }: StartRunsDto,
  ): Promise<{ runs: Run[] }> {
    return this.runs.start(principal, id, scenarioIds);
  }

  @Get(':id/runs')
  @ZodResponse({ status: HttpStatus.OK, type: RunPageDto })
  list(
    @CurrentPrincipal() principal: Principal,
    @Param() { id }: IdParamsDto,
    @Query() query: PageQueryDto,
  ): Promise<Page<Run>> {
    return this.runs.list(principal, id, query);
  }
}
