import { readSettings, SettingsError } from './config/settings';
import { createApp } from './create-app';

async function main(): Promise<void> {
  const settings = readSettings(process.env);
  const app = await createApp(settings);
  await app.listen(settings.port, settings.host);
}

main().catch((error: unknown) => {
  // Before the logger stands, or after it has gone.
  process.stderr.write(
    error instanceof SettingsError
      ? `${error.message}\n`
      : `The API did not start: ${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
  );
  process.exitCode = 1;
});
