import {
  Body,
  Controller,
  Delete,
  Get,
  HttpCode,
  HttpStatus,
  Param,
  Patch,
  Post,
  Put,
  Query,
} from '@nestjs/common';
import { ApiBearerAuth, ApiNoContentResponse, ApiTags } from '@nestjs/swagger';
import {
  changeStudyRequestSchema,
  createScenarioRequestSchema,
  createStudyRequestSchema,
  pageOf,
  pointStudyAtWeatherRequestSchema,
  studySchema,
  studySummarySchema,
  type ScenarioView,
  type StudySummary,
  type StudyView,
} from '@noonwell/schema';
import { createZodDto, ZodResponse } from 'nestjs-zod';
import { CurrentPrincipal, type Principal } from '../access/principal';
import { IdParamsDto, PageQueryDto, type Page } from '../http/paging';
import { ScenarioDto } from './scenario.dto';
import { ScenariosService } from './scenarios.service';
import { StudiesService } from './studies.service';

class StudyDto extends createZodDto(studySchema) {}
class StudyPageDto extends createZodDto(pageOf(studySummarySchema)) {}
class CreateStudyDto extends createZodDto(createStudyRequestSchema) {}
class ChangeStudyDto extends createZodDto(changeStudyRequestSchema) {}
class CreateScenarioDto extends createZodDto(createScenarioRequestSchema) {}
class PointAtWeatherDto extends createZodDto(pointStudyAtWeatherRequestSchema) {}

@ApiTags('studies')
@ApiBearerAuth()
@Controller('studies')
export class StudiesController {
  constructor(
    private readonly studies: StudiesService,
    private readonly scenarios: ScenariosService,
  ) {}

  @Get()
  @ZodResponse({ status: HttpStatus.OK, type: StudyPageDto })
  list(@CurrentPrincipal() principal: Principal, @Query() query: PageQueryDto): Promise<Page<StudySummary>> {
    return this.studies.list(principal, query);
  }

  @Post()
  @ZodResponse({ status: HttpStatus.CREATED, type: StudyDto })
  create(@CurrentPrincipal() principal: Principal, @Body() body: CreateStudyDto): Promise<StudyView> {
    return this.studies.create(principal, body);
  }

  @Get(':id')
  @ZodResponse({ status: HttpStatus.OK, type: StudyDto })
  get(@CurrentPrincipal() principal: Principal, @Param() { id }: IdParamsDto): Promise<StudyView> {
    return this.studies.get(principal, id);
  }

  @Patch(':id')
  @ZodResponse({ status: HttpStatus.OK, type: StudyDto })
  change(
    @CurrentPrincipal() principal: Principal,
    @Param() { id }: IdParamsDto,
    @Body() body: ChangeStudyDto,
  ): Promise<StudyView> {
    return this.studies.change(principal, id, body);
  }

  @Delete(':id')
  @HttpCode(HttpStatus.NO_CONTENT)
  @ApiNoContentResponse({ description: 'Removed with its scenarios and runs' })
  remove(@CurrentPrincipal() principal: Principal, @Param() { id }: IdParamsDto): Promise<void> {
    return this.studies.remove(principal, id);
  }

  @Post(':id/scenarios')
  @ZodResponse({ status: HttpStatus.CREATED, type: ScenarioDto })
  addScenario(
    @CurrentPrincipal() principal: Principal,
    @Param() { id }: IdParamsDto,
    @Body() body: CreateScenarioDto,
  ): Promise<ScenarioView> {
    return this.scenarios.create(principal, id, body);
  }

  @Put(':id/weather-year')
  @ZodResponse({ status: HttpStatus.OK, type: StudyDto })
  pointAtWeather(
    @CurrentPrincipal() principal: Principal,
    @Param() { id }: IdParamsDto,
    @Body() { weatherYearId }: PointAtWeatherDto,
  ): Promise<StudyView> {
    return this.scenarios.pointAtWeather(principal, id, weatherYearId);
  }
}
