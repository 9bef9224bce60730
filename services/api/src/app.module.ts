import { MikroOrmModule } from '@mikro-orm/nestjs';
import { PostgreSqlDriver } from '@mikro-orm/postgresql';
import { Global, Module, type DynamicModule } from '@nestjs/common';
import { APP_FILTER, APP_GUARD, APP_INTERCEPTOR, APP_PIPE } from '@nestjs/core';
import { ThrottlerModule } from '@nestjs/throttler';
import { ormOptions } from '@noonwell/persistence';
import { LoggerModule } from 'nestjs-pino';
import { ZodSerializerInterceptor } from 'nestjs-zod';
import { AccessGuard } from './access/access.guard';
import { AuthModule } from './auth/auth.module';
import { SETTINGS, type Settings } from './config/settings';
import { EventsModule } from './events/events.module';
import { throttlerOptions } from './http/limits';
import { loggerOptions, type LogTarget } from './http/logging';
import { ProblemFilter } from './http/problem.filter';
import { StrictValidationPipe } from './http/strict-validation.pipe';
import { MembersModule } from './members/members.module';
import { MetaModule } from './meta/meta.module';
import { RunsModule } from './runs/runs.module';
import { StudiesModule } from './studies/studies.module';
import { WeatherModule } from './weather/weather.module';

@Global()
@Module({})
export class AppModule {
  static with(settings: Settings, logTo: LogTarget): DynamicModule {
    return {
      module: AppModule,
      imports: [
        LoggerModule.forRoot(loggerOptions(settings, logTo)),
        MikroOrmModule.forRoot({
          ...ormOptions({ databaseUrl: settings.databaseUrl }),
          driver: PostgreSqlDriver,
          // Each service opens its own transaction, with the workspace set: there is no shared manager to leak.
          registerRequestContext: false,
          forRoutesPath: '{*path}',
        }),
        ThrottlerModule.forRoot(throttlerOptions(settings)),
        AuthModule,
        MembersModule,
        WeatherModule,
        StudiesModule,
        RunsModule,
        EventsModule,
        MetaModule,
      ],
      providers: [
        { provide: SETTINGS, useValue: settings },
        { provide: APP_GUARD, useClass: AccessGuard },
        { provide: APP_PIPE, useClass: StrictValidationPipe },
        { provide: APP_INTERCEPTOR, useClass: ZodSerializerInterceptor },
        { provide: APP_FILTER, useClass: ProblemFilter },
      ],
      exports: [SETTINGS],
    };
  }
}
