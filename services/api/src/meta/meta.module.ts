import { Module } from '@nestjs/common';
import { DocumentsController } from './documents.controller';
import { HealthController } from './health.controller';
import { OpenApiDocument } from './openapi';

@Module({
  controllers: [DocumentsController, HealthController],
  providers: [OpenApiDocument],
  exports: [OpenApiDocument],
})
export class MetaModule {}
