/** `npm run screenshots [-- --url ADDRESS]`: pictures of every screen, of an app of its own unless an address is given. */
import { join } from 'node:path';
import process from 'node:process';
import { parseArgs } from 'node:util';
import { ensureChromium } from './lib/debian.mjs';
import { show } from './lib/exec.mjs';
import { requireNode } from './lib/options.mjs';
import { ensurePackages } from './lib/packages.mjs';
import { root } from './lib/paths.mjs';
import { fail } from './lib/step.mjs';
import { startThrowAwayApp } from './lib/throw-away-app.mjs';

const { values } = parseArgs({ options: { url: { type: 'string' } } });

try {
  requireNode();
  await ensurePackages();
  const chromium = await ensureChromium();
  const app =
    values.url === undefined
      ? await startThrowAwayApp()
      : { address: values.url, stop: () => Promise.resolve() };
  try {
    process.exitCode = await show(
      process.execPath,
      [
        '--conditions=@noonwell/source',
        '--import',
        'tsx',
        join(root, 'services/web/e2e/screenshots/photograph.ts'),
        join(root, 'screenshots'),
      ],
      { ...process.env, NOONWELL_E2E_URL: app.address, NOONWELL_CHROMIUM: chromium },
    );
  } finally {
    await app.stop();
  }
} catch (error) {
  fail(error);
}
