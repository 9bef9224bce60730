import { Router, static as files } from 'express';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { SettingsError } from '../config/settings';

const YEAR_S = 365 * 24 * 3600;

/**
 * The built web: files under /assets carry a hash of their content in their name and are kept for good; everything
 * else is asked for again each time. An address that is no file is a page of the app, which index.html draws.
 */
export function staticWeb(folder: string): Router {
  const index = join(folder, 'index.html');
  if (!existsSync(index))
    throw new SettingsError(`NOONWELL_WEB_DIST: ${folder} holds no index.html. Build the web first.`);
  const router = Router();
  router.use(
    '/assets',
    files(join(folder, 'assets'), { immutable: true, maxAge: YEAR_S * 1000, fallthrough: true }),
  );
  router.use(
    files(folder, {
      index: false,
      setHeaders: (response) => response.setHeader('Cache-Control', 'no-cache'),
    }),
  );
  router.get('/{*page}', (request, response, next) => {
    // A missing file is a 404, not a page: a script that got HTML would fail in a puzzling way.
    const isFile = request.path.startsWith('/assets/') || /\.\w+$/.test(request.path);
    if (isFile || request.path === '/api' || request.path.startsWith('/api/')) {
      next();
      return;
    }
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(index);
  });
  return router;
}
