import 'reflect-metadata';
import { createYearRun } from '@noonwell/engine';
import { createOrm, plainMessage } from '@noonwell/persistence';
import { seedDemoWorkspace } from './demo/seed-demo-workspace';
import { workerSettings } from './settings';

/** Makes the demo unless it is there or NOONWELL_DEMO is "off". */
async function main(): Promise<void> {
  if (process.env['NOONWELL_DEMO'] === 'off') {
    process.stdout.write('Demo: left out (NOONWELL_DEMO=off)\n');
    return;
  }
  const { databaseUrl } = workerSettings(process.env);
  const orm = await createOrm({ databaseUrl, poolMax: 1 });
  try {
    const made = await seedDemoWorkspace(orm.em, createYearRun, (line) => process.stdout.write(`${line}\n`));
    process.stdout.write(made ? 'Demo: ready\n' : 'Demo: already there\n');
  } finally {
    await orm.close();
  }
}

main().catch((error: unknown) => {
  process.stderr.write(`The demo could not be made: ${plainMessage(error)}\n`);
  process.exitCode = 1;
});
