import { ROUTES, type RouteAccess, type RouteKey } from '@noonwell/schema';
import type { Request } from 'express';
import { z } from 'zod';

const routeSchema = z.object({ path: z.string() });

/** "GET /api/studies/{id}" of a request that express has matched to a route. */
export function routeKeyOf(request: Request): string {
  const route: unknown = request.route;
  return routeKey(request.method, routeSchema.parse(route).path);
}

/** The same from express' own writing of a path ("/api/studies/:id"). */
export function routeKey(method: string, path: string): string {
  // Express answers HEAD by the GET route.
  const verb = method === 'HEAD' ? 'GET' : method;
  return `${verb} ${path.replaceAll(/:(\w+)/g, '{$1}')}`;
}

export function isListed(key: string): key is RouteKey {
  return Object.hasOwn(ROUTES, key);
}

/** Undefined for a route that is not listed: nobody may call it. */
export function accessOf(key: string): RouteAccess | undefined {
  return isListed(key) ? ROUTES[key] : undefined;
}
