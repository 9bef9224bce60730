/** `npm run build`: compiles packages and services and bundles the web app. */
import { ensureBuilt } from './lib/build.mjs';
import { ensurePackages } from './lib/packages.mjs';
import { fail } from './lib/step.mjs';

try {
  await ensurePackages();
  await ensureBuilt({ force: true });
} catch (error) {
  fail(error);
}
