import { Module } from '@nestjs/common';
import { AuthModule } from '../auth/auth.module';
import { EventsController } from './events.controller';
import { EventsService } from './events.service';
import { RunFeed } from './run-feed';

@Module({ imports: [AuthModule], controllers: [EventsController], providers: [EventsService, RunFeed] })
export class EventsModule {}
