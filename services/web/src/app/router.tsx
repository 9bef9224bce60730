import type { ComponentType } from 'react';
import { createBrowserRouter, redirect, type RouteObject } from 'react-router-dom';
import { HydrateFallback, Root } from './root.js';
import { RouteError } from './route-error.js';
import { loadSession, requireSignedIn, requireSignedOut } from './session-loaders.js';

/** A page that is loaded when it is first opened. */
function page(load: () => Promise<{ default: ComponentType }>): Pick<RouteObject, 'lazy' | 'ErrorBoundary'> {
  return { ErrorBoundary: RouteError, lazy: async () => ({ Component: (await load()).default }) };
}

export const routes: RouteObject[] = [
  {
    Component: Root,
    ErrorBoundary: RouteError,
    HydrateFallback,
    loader: loadSession,
    // Who is signed in is known after the first load; later changes come through the session store.
    shouldRevalidate: () => false,
    children: [
      { index: true, Component: HydrateFallback, loader: () => redirect('/studies') },
      {
        path: 'sign-in',
        loader: requireSignedOut,
        ...page(() => import('../features/sign-in/sign-in-page.js')),
      },
      {
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

export function createAppRouter() {
  return createBrowserRouter(routes);
}
