import type { Permission } from '../permissions.js';

/** Who may call a route: everybody, anybody signed in, or holders of a permission (object rules come on top, in the services). */
export type RouteAccess = 'public' | 'cookie' | 'signedIn' | Permission;

/**
 * Every route of the API with who may call it: the guard reads it, the route-walking test reads it, and a
 * route of the OpenAPI document that is not listed here fails that test.
 */
export const ROUTES = {
  'GET /api/health': 'public',
  'GET /api/openapi.json': 'public',
  'GET /api/scenario-schema': 'public',
  'GET /api/auth/demo-accounts': 'public',
  'POST /api/auth/sign-in': 'public',
  'POST /api/auth/demo-sign-in': 'public',
  'POST /api/auth/refresh': 'cookie',
  'POST /api/auth/sign-out': 'cookie',
  'GET /api/auth/me': 'signedIn',
  'GET /api/workspace/members': 'members.manage',
  'PATCH /api/workspace/members/{userId}': 'members.manage',
  'GET /api/weather-years': 'weather.read',
  'POST /api/weather-years': 'weather.write',
  'GET /api/weather-years/{id}': 'weather.read',
  'GET /api/weather-years/{id}/original': 'weather.read',
  'GET /api/weather-years/{id}/columns': 'weather.read',
  'DELETE /api/weather-years/{id}': 'weather.write',
  'GET /api/studies': 'study.read',
  'POST /api/studies': 'sandbox.write',
  'GET /api/studies/{id}': 'study.read',
  'PATCH /api/studies/{id}': 'sandbox.write',
  'DELETE /api/studies/{id}': 'sandbox.write',
  'POST /api/studies/{id}/scenarios': 'sandbox.write',
  'PUT /api/studies/{id}/weather-year': 'sandbox.write',
  'POST /api/studies/{id}/runs': 'run.write',
  'GET /api/studies/{id}/runs': 'run.read',
  'GET /api/studies/{id}/events': 'run.read',
  'GET /api/scenarios/{id}': 'study.read',
  'PUT /api/scenarios/{id}': 'sandbox.write',
  'DELETE /api/scenarios/{id}': 'sandbox.write',
  'GET /api/scenarios/{id}/versions': 'study.read',
  'GET /api/scenario-versions/{id}/export': 'study.read',
  'GET /api/runs/{id}': 'run.read',
  'POST /api/runs/{id}/cancel': 'run.write',
  'POST /api/runs/{id}/retry': 'run.write',
  'GET /api/runs/{id}/summary': 'run.read',
  'GET /api/runs/{id}/columns': 'run.read',
} as const satisfies Record<string, RouteAccess>;
export type RouteKey = keyof typeof ROUTES;
