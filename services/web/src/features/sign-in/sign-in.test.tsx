import { screen, waitFor, within } from '@testing-library/react';
import { expect, it } from 'vitest';
import { problem } from '../../test/fake-api.js';
import { access, page, study } from '../../test/fixtures.js';
import { apiFor, renderApp } from '../../test/render-app.js';

const demo = {
  enabled: true,
  workspaceName: 'Demo workspace',
  roles: [
    { role: 'engineer', name: 'Ines Hollander', purpose: 'Judge the upgrade of a receiver' },
    { role: 'student', name: 'Pia Norden', purpose: 'See what concentration does' },
  ],
};
const noDemo = { enabled: false, workspaceName: null, roles: [] };

it('signs in to a demo role and moves the focus to the page it leads to', async () => {
  const api = apiFor(null)
    .on('GET /api/auth/demo-accounts', { body: demo })
    .on('POST /api/auth/demo-sign-in', { body: access('student', 'demo-token') })
    .on('GET /api/studies', { body: page([]) });
  const { user } = renderApp('/sign-in');
  const button = await screen.findByRole('button', { name: /Student/ });
  expect(button).toHaveTextContent('See what concentration does');
  await user.click(button);

  const heading = await screen.findByRole('heading', { level: 1, name: 'Studies' });
  expect(api.callsOf('POST /api/auth/demo-sign-in')[0]?.body).toEqual({ role: 'student' });
  await waitFor(() => {
    expect(heading).toHaveFocus();
  });
  expect(document.title).toBe('Studies · Noonwell');
  expect(api.callsOf('GET /api/studies')[0]?.token).toBe('demo-token');
});

it('offers no demo role where the server offers none', async () => {
  const api = apiFor(null).on('GET /api/auth/demo-accounts', { body: noDemo });
  renderApp('/sign-in');
  await screen.findByRole('button', { name: 'Sign in' });
  await waitFor(() => {
    expect(api.callsOf('GET /api/auth/demo-accounts')).toHaveLength(1);
  });
  expect(screen.queryByText(/look around the demo/)).not.toBeInTheDocument();
  expect(screen.getAllByRole('button')).toHaveLength(1);
});

it('asks for what is missing before it asks the server', async () => {
  const api = apiFor(null).on('GET /api/auth/demo-accounts', { body: noDemo });
  const { user } = renderApp('/sign-in');
  await user.type(await screen.findByLabelText(/E-mail address/), 'nobody');
  await user.click(screen.getByRole('button', { name: 'Sign in' }));
  expect(await screen.findByText(/such as name@example.org/)).toBeInTheDocument();
  expect(screen.getByText('Enter your password.')).toBeInTheDocument();
  expect(screen.getByLabelText(/E-mail address/)).toBeInvalid();
  expect(api.callsOf('POST /api/auth/sign-in')).toHaveLength(0);
});

it('says what to do after a wrong password and lets the next try in', async () => {
  const api = apiFor(null)
    .on('GET /api/auth/demo-accounts', { body: noDemo })
    .on('POST /api/auth/sign-in', problem(401, 'E-mail address or password is wrong'))
    .on('GET /api/studies', { body: page([]) });
  const { user, router } = renderApp('/sign-in');
  await user.type(await screen.findByLabelText(/E-mail address/), 'ines@demo.invalid');
  await user.type(screen.getByLabelText(/Password/), 'not this one');
  await user.click(screen.getByRole('button', { name: 'Sign in' }));
  const alert = await screen.findByRole('alert');
  expect(alert).toHaveTextContent('E-mail address or password is wrong');
  expect(alert).toHaveTextContent('Check both and try again');

  api.on('POST /api/auth/sign-in', { body: access() });
  await user.click(screen.getByRole('button', { name: 'Sign in' }));
  await screen.findByRole('heading', { level: 1, name: 'Studies' });
  expect(router.state.location.pathname).toBe('/studies');
});

it('leads nobody to the sign-in and back to the page that was wanted', async () => {
  apiFor(null)
    .on('GET /api/auth/demo-accounts', { body: demo })
    .on('POST /api/auth/demo-sign-in', { body: access('engineer') })
    .on('GET /api/weather-years', { body: page([]) });
  const { user, router } = renderApp('/weather?page=1');
  await user.click(await screen.findByRole('button', { name: /Engineer/ }));
  await screen.findByRole('heading', { level: 1, name: 'Weather' });
  expect(`${router.state.location.pathname}${router.state.location.search}`).toBe('/weather?page=1');
});

it.each(['//elsewhere.invalid/x', '/\\elsewhere.invalid', 'https://elsewhere.invalid/'])(
  'stays in the app when a link wants to lead to %s',
  async (wanted) => {
    apiFor('engineer').on('GET /api/studies', { body: page([]) });
    const { router } = renderApp(`/sign-in?to=${encodeURIComponent(wanted)}`);
    await screen.findByRole('heading', { level: 1, name: 'Studies' });
    expect(router.state.location.pathname).toBe('/studies');
  },
);

it('signs out and shows the next person nothing of the last one', async () => {
  const api = apiFor('engineer')
    .on('GET /api/studies', { body: page([study()]) })
    .on('POST /api/auth/sign-out', { status: 204 })
    .on('GET /api/auth/demo-accounts', { body: demo })
    .on('POST /api/auth/demo-sign-in', { body: access('student') });
  const { user } = renderApp('/studies');
  await user.click(await screen.findByRole('button', { name: /Demo workspace/ }));
  await user.click(await screen.findByRole('menuitem', { name: 'Sign out' }));
  await screen.findByRole('heading', { level: 1, name: 'Sign in' });
  expect(api.callsOf('POST /api/auth/sign-out')).toHaveLength(1);

  api.on('GET /api/studies', { body: page([]) });
  await user.click(await screen.findByRole('button', { name: /Student/ }));
  await screen.findByText('No study yet');
  expect(screen.queryByText('Brackenfold Creamery')).not.toBeInTheDocument();
});

it('keeps the chosen colours', async () => {
  apiFor('engineer').on('GET /api/studies', { body: page([]) });
  const { user } = renderApp('/studies');
  await user.click(await screen.findByRole('button', { name: /Demo workspace/ }));
  const menu = await screen.findByRole('menu');
  await user.click(within(menu).getByRole('menuitemradio', { name: 'Dark' }));
  await waitFor(() => {
    expect(document.documentElement.dataset['theme']).toBe('dark');
  });
  expect(localStorage.getItem('noonwell.theme')).toBe('dark');
});
