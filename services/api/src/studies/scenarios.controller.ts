import {
  Body,
  Controller,
  Delete,
  Get,
  HttpCode,
  HttpStatus,
  Param,
  Put,
  Query,
  StreamableFile,
} from '@nestjs/common';
import { ApiBearerAuth, ApiNoContentResponse, ApiOkResponse, ApiTags } from '@nestjs/swagger';
import {
  pageOf,
  saveScenarioRequestSchema,
  scenarioVersionSchema,
  type ScenarioVersionView,
  type ScenarioView,
} from '@noonwell/schema';
import { createZodDto, ZodResponse } from 'nestjs-zod';
import { CurrentPrincipal, type Principal } from '../access/principal';
import { attachment } from '../http/attachment';
import { IdParamsDto, PageQueryDto, type Page } from '../http/paging';
import { ScenarioDto } from './scenario.dto';
import { ScenariosService } from './scenarios.service';

class SaveScenarioDto extends createZodDto(saveScenarioRequestSchema) {}
class ScenarioVersionPageDto extends createZodDto(pageOf(scenarioVersionSchema)) {}

@ApiTags('scenarios')
@ApiBearerAuth()
@Controller()
export class ScenariosController {
  constructor(private readonly scenarios: ScenariosService) {}

  @Get('scenarios/:id')
  @ZodResponse({ status: HttpStatus.OK, type: ScenarioDto })
  get(@CurrentPrincipal() principal: Principal, @Param() { id }: IdParamsDto): Promise<ScenarioView> {
    return this.scenarios.get(principal, id);
  }

  @Put('scenarios/:id')
  @ZodResponse({ status: HttpStatus.OK, type: ScenarioDto })
  save(
    @CurrentPrincipal() principal: Principal,
    @Param() { id }: IdParamsDto,
    @Body() body: SaveScenarioDto,
  ): Promise<ScenarioView> {
    return this.scenarios.save(principal, id, body);
  }

  @Delete('scenarios/:id')
  @HttpCode(HttpStatus.NO_CONTENT)
  @ApiNoContentResponse({ description: 'Removed with its versions and runs' })
  remove(@CurrentPrincipal() principal: Principal, @Param() { id }: IdParamsDto): Promise<void> {
    return this.scenarios.remove(principal, id);
  }

  @Get('scenarios/:id/versions')
  @ZodResponse({ status: HttpStatus.OK, type: ScenarioVersionPageDto })
  versions(
    @CurrentPrincipal() principal: Principal,
    @Param() { id }: IdParamsDto,
    @Query() query: PageQueryDto,
  ): Promise<Page<ScenarioVersionView>> {
    return this.scenarios.versions(principal, id, query);
  }

  @Get('scenario-versions/:id/export')
  @ApiOkResponse({
    description: 'The scenario as the command line reads it',
    content: { 'application/json': { schema: { type: 'object' } } },
  })
  async export(
    @CurrentPrincipal() principal: Principal,
    @Param() { id }: IdParamsDto,
  ): Promise<StreamableFile> {
    const { fileName, text } = await this.scenarios.export(principal, id);
    return new StreamableFile(Buffer.from(text), {
      type: 'application/json',
      disposition: attachment(fileName),
    });
  }
}
