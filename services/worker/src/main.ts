import 'reflect-metadata';
import type { NestApplicationOptions } from '@nestjs/common';
import { NestFactory } from '@nestjs/core';
import { plainMessage } from '@noonwell/persistence';
import { Logger } from 'nestjs-pino';
import { workerSettings } from './settings';
import { WorkerModule } from './worker.module';

// eslint-disable-next-line @typescript-eslint/no-unsafe-class-instance-assignment -- Nest declares its options as a class and takes any object of that shape
const OPTIONS: NestApplicationOptions = { bufferLogs: true, abortOnError: false };

async function main(): Promise<void> {
  const app = await NestFactory.createApplicationContext(
    WorkerModule.with(workerSettings(process.env)),
    OPTIONS,
  );
  app.useLogger(app.get(Logger));
  app.flushLogs();
  app.enableShutdownHooks();
}

main().catch((error: unknown) => {
  process.stderr.write(`${plainMessage(error)}\n`);
  process.exit(1);
});
