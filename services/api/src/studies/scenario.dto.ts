import { scenarioViewSchema } from '@noonwell/schema';
import { createZodDto } from 'nestjs-zod';

export class ScenarioDto extends createZodDto(scenarioViewSchema) {}
