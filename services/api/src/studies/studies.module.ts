import { Module } from '@nestjs/common';
import { ScenariosController } from './scenarios.controller';
import { ScenariosService } from './scenarios.service';
import { StudiesController } from './studies.controller';
import { StudiesService } from './studies.service';

@Module({
  controllers: [StudiesController, ScenariosController],
  providers: [ScenariosService, StudiesService],
})
export class StudiesModule {}
