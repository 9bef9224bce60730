/** A worker as a process of its own whose runs stop at a gate that nobody opens: for being killed. */
import 'reflect-metadata';
import { join } from 'node:path';
import { NestFactory } from '@nestjs/core';
import { workerSettings } from '../src/settings';
import { WorkerModule } from '../src/worker.module';
import { Gate } from './gate';

NestFactory.createApplicationContext(
  WorkerModule.with(workerSettings(process.env), {
    file: join(__dirname, 'from-source.cjs'),
    options: { workerData: { entry: join(__dirname, 'gated-thread.ts'), gate: new Gate().buffer } },
  }),
)
  .then((app) => app.enableShutdownHooks())
  .catch((error: unknown) => {
    process.stderr.write(`${String(error)}\n`);
    process.exit(1);
  });
