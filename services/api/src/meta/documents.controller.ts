import { Controller, Get } from '@nestjs/common';
import { ApiOkResponse, ApiTags, type OpenAPIObject } from '@nestjs/swagger';
import { fieldRegistry, newScenario, scenarioShape } from '@noonwell/schema';
import { z } from 'zod';
import { OpenApiDocument } from './openapi';

const JSON_OBJECT = { content: { 'application/json': { schema: { type: 'object' } } } } as const;

/** JSON Schema of a scenario; each field carries its label, unit, range, default, help and source. */
const SCENARIO_SCHEMA = {
  ...z.toJSONSchema(scenarioShape, { metadata: fieldRegistry }),
  default: newScenario(),
};

@ApiTags('service')
@Controller()
export class DocumentsController {
  constructor(private readonly openApi: OpenApiDocument) {}

  @Get('openapi.json')
  @ApiOkResponse({ description: 'This document', ...JSON_OBJECT })
  openApiDocument(): OpenAPIObject {
    return this.openApi.document;
  }

  @Get('scenario-schema')
  @ApiOkResponse({
    description: 'JSON Schema of a scenario, with unit, range, default, help and source',
    ...JSON_OBJECT,
  })
  scenarioSchema(): typeof SCENARIO_SCHEMA {
    return SCENARIO_SCHEMA;
  }
}
