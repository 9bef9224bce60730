import './browser.js';
import { render } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import type { Role } from '@noonwell/schema';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { AppProviders } from '../app/providers.js';
import { routes } from '../app/router.js';
import { createQueryClient } from '../shared/api/query-client.js';
import { forgetSession } from '../shared/api/session.js';
import { FakeApi, problem } from './fake-api.js';
import { access } from './fixtures.js';

/** An API where the cookie belongs to a person of the given role, or to nobody. */
export function apiFor(role: Role | null): FakeApi {
  const api = new FakeApi().install();
  return api.on(
    'POST /api/auth/refresh',
    role === null ? problem(401, 'Not signed in') : { body: access(role) },
  );
}

/** The whole app with its real router, stores and cache, opened at an address. */
export function renderApp(address: string) {
  forgetSession();
  const router = createMemoryRouter(routes, { initialEntries: [address] });
  const user = userEvent.setup();
  render(
    <AppProviders queryClient={createQueryClient()}>
      <RouterProvider router={router} />
    </AppProviders>,
  );
  return { router, user };
}
