import { JSDOM } from 'jsdom';
import type { RouteObject } from 'react-router-dom';

/**
 * The app's own routes, read outside a browser: its modules look for a window when they are loaded, so a simulated one
 * is there. No page is loaded, pages are lazy.
 */
export async function routesOfTheApp(): Promise<RouteObject[]> {
  const { window } = new JSDOM('', { url: 'http://app/' });
  Object.assign(globalThis, { window, document: window.document, localStorage: window.localStorage });
  const { routes } = await import('../../src/app/router.js');
  return routes;
}
