import { EntityManager } from '@mikro-orm/postgresql';
import type { NestApplicationOptions } from '@nestjs/common';
import { NestFactory } from '@nestjs/core';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { requireAppRole } from '@noonwell/persistence';
import cookieParser from 'cookie-parser';
import { Logger } from 'nestjs-pino';
import { unlistedRoutes } from './access/unlisted-routes';
import { AppModule } from './app.module';
import type { Settings } from './config/settings';
import type { LogTarget } from './http/logging';
import { noStore, securityHeaders } from './http/security-headers';
import { staticWeb } from './http/static-web';
import { OpenApiDocument } from './meta/openapi';

/** A scenario is about 6 kB. */
const JSON_LIMIT = '256kb';

// eslint-disable-next-line @typescript-eslint/no-unsafe-class-instance-assignment -- Nest declares its options as a class and takes any object of that shape
const OPTIONS: NestApplicationOptions = { bufferLogs: true, bodyParser: false, abortOnError: false };

/**
 * The whole API, ready to listen.
 * @throws AppRoleError when the database role can pass row-level security
 * @throws Error when a route is not listed in ROUTES: it would be refused to everybody
 */
export async function createApp(settings: Settings, logTo?: LogTarget): Promise<NestExpressApplication> {
  const app = await NestFactory.create<NestExpressApplication>(AppModule.with(settings, logTo), OPTIONS);
  try {
    await configure(app, settings);
    return app;
  } catch (error) {
    // Else its connections would keep the process alive.
    await app.close();
    throw error;
  }
}

async function configure(app: NestExpressApplication, settings: Settings): Promise<void> {
  app.useLogger(app.get(Logger));
  app.flushLogs();
  app.enableShutdownHooks();
  app.setGlobalPrefix('api');
  app.set('trust proxy', settings.trustedProxies);
  app.set('query parser', 'simple');
  app.disable('x-powered-by');
  app.use(securityHeaders(settings));
  app.use('/api', noStore);
  app.use(cookieParser());
  app.useBodyParser('json', { limit: JSON_LIMIT, strict: true });
  if (settings.webDist !== undefined) app.use(staticWeb(settings.webDist));
  app.get(OpenApiDocument).make(app);
  await requireAppRole(app.get(EntityManager));
  await app.init();
  const unlisted = unlistedRoutes(app);
  if (unlisted.length > 0) {
    throw new Error(`These routes are not listed in ROUTES of @noonwell/schema: ${unlisted.join(', ')}`);
  }
}
