import { Module } from '@nestjs/common';
import { RunsController } from './runs.controller';
import { RunsService } from './runs.service';
import { StudyRunsController } from './study-runs.controller';

@Module({ controllers: [StudyRunsController, RunsController], providers: [RunsService] })
export class RunsModule {}
