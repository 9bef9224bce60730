import type { ComponentType } from 'react';
import { createBrowserRouter, matchRoutes, redirect, type RouteObject } from 'react-router-dom';
import { signInAddress } from '../shared/api/return-address.js';
import { ensureSessionKnown } from '../shared/api/session.js';
import { HydrateFallback, Root } from './root.js';
import { RouteError } from './route-error.js';
import { loadSession, requireSignedIn, requireSignedOut } from './session-loaders.js';

/** A page that is loaded when it is first opened. */
function page(load: () => Promise<{ default: ComponentType }>): Pick<RouteObject, 'lazy' | 'ErrorBoundary'> {
  return { ErrorBoundary: RouteError, lazy: async () => ({ Component: (await load()).default }) };
}

/** A mark of routes that lead nobody but signed-in people anywhere. */
const members = { handle: { members: true } } as const;

export const routes: RouteObject[] = [
  {
    Component: Root,
    ErrorBoundary: RouteError,
    HydrateFallback,
    loader: loadSession,
    // Who is signed in is known after the first load; later changes come through the session store.
    shouldRevalidate: () => false,
    children: [
      { ...members, index: true, Component: HydrateFallback, loader: () => redirect('/studies') },
      {
        path: 'sign-in',
        loader: requireSignedOut,
        ...page(() => import('../features/sign-in/sign-in-page.js')),
      },
      {
        ...members,
        loader: requireSignedIn,
        ...page(() => import('./frame.js')),
        children: [
          { path: 'studies', ...page(() => import('../features/studies/studies-page.js')) },
          { path: 'studies/:studyId', ...page(() => import('./study-route.js')) },
          {
            path: 'studies/:studyId/scenarios/:scenarioId',
            ...page(() => import('../features/scenario/scenario-page.js')),
          },
          {
            path: 'studies/:studyId/side-by-side',
            ...page(() => import('../features/side-by-side/side-by-side-page.js')),
          },
          { path: 'weather', ...page(() => import('../features/weather/weather-page.js')) },
          {
            path: 'weather/:weatherYearId',
            ...page(() => import('../features/weather/weather-year-page.js')),
          },
        ],
      },
      { path: '*', ...page(() => import('./not-found-page.js')) },
    ],
  },
];

/**
 * The router, opened at the sign-in page where nobody is signed in: a redirect inside the router comes only
 * after it has begun to load the page that is not going to be shown.
 */
export async function createAppRouter() {
  // Where the server does not answer, the router's own loader says so.
  const session = await ensureSessionKnown().catch(() => null);
  const { location } = window;
  const isForMembers = matchRoutes(routes, location)?.some(({ route }) => route.handle === members.handle);
  if (session?.status === 'signedOut' && isForMembers === true) {
    window.history.replaceState(null, '', signInAddress(location));
  }
  return createBrowserRouter(routes);
}
