import type { NestExpressApplication } from '@nestjs/platform-express';
import { z } from 'zod';
import { isListed, routeKey } from './route-access';

/** The part of express' router that says which routes it answers. */
const routerSchema = z.object({
  router: z.object({
    stack: z.array(
      z.object({
        route: z
          .object({ path: z.string(), methods: z.record(z.string(), z.boolean().optional()) })
          .optional(),
      }),
    ),
  }),
});

/** Nest mounts its modules' middleware as routes of every method: /api and below. */
const isMiddleware = (path: string): boolean => path === '/api' || path.includes('{*');

/** Routes that express answers, by their keys. */
export function mappedRoutes(app: NestExpressApplication): string[] {
  const instance: unknown = app.getHttpAdapter().getInstance();
  // Express is a function that carries its router.
  const router: unknown =
    typeof instance === 'function' && 'router' in instance ? instance.router : undefined;
  const stack: unknown = typeof router === 'function' && 'stack' in router ? router.stack : undefined;
  const { stack: layers } = routerSchema.shape.router.parse({ stack });
  return layers.flatMap(({ route }) =>
    route === undefined || isMiddleware(route.path)
      ? []
      : Object.keys(route.methods).map((method) => routeKey(method.toUpperCase(), route.path)),
  );
}

export function unlistedRoutes(app: NestExpressApplication): string[] {
  return mappedRoutes(app).filter((key) => !isListed(key));
}
