import compression from 'compression';
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
  const compress = compression();
  router.use((request, response, next) => {
    // Not the API: an event stream must not wait in a compressor, and columns hardly shrink.
    if (isApi(request.path)) next();
    else compress(request, response, next);
  });
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
    if (isFile || isApi(request.path)) {
      next();
      return;
    }
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(index);
  });
  return router;
}

function isApi(path: string): boolean {
  return path === '/api' || path.startsWith('/api/');
}
