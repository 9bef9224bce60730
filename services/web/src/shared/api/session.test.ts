import '../../test/browser.js';
import { pageOf, studySummarySchema } from '@noonwell/schema';
import { beforeEach, expect, it, vi } from 'vitest';
import { FakeApi, problem } from '../../test/fake-api.js';
import { access, page } from '../../test/fixtures.js';
import { request } from './client.js';
import { ApiProblem, ContractError, NoAnswerError } from './problem.js';
import { ensureSessionKnown, forgetSession, getSession, startSession } from './session.js';

const studies = () => request('GET /api/studies', pageOf(studySummarySchema));
const ROUTE = 'POST /api/auth/refresh';

beforeEach(() => {
  forgetSession();
});

/** Takes one token and refuses every other one. */
function apiThatTakes(token: string): FakeApi {
  return new FakeApi()
    .install()
    .on('GET /api/studies', (call) =>
      call.token === token ? { body: page([]) } : problem(401, 'Token ended'),
    );
}

it('renews a refused token once for all requests that are under way and sends them again', async () => {
  const api = apiThatTakes('token-2').on(ROUTE, { body: access('engineer', 'token-2') });
  startSession(access('engineer', 'token-1'));
  const answers = await Promise.all([studies(), studies(), studies()]);
  expect(answers.map(({ total }) => total)).toEqual([0, 0, 0]);
  expect(api.callsOf(ROUTE)).toHaveLength(1);
  expect(api.callsOf('GET /api/studies').map(({ token }) => token)).toEqual([
    'token-1',
    'token-1',
    'token-1',
    'token-2',
    'token-2',
    'token-2',
  ]);
});

it('renews a token that is about to end before it is used', async () => {
  const api = apiThatTakes('token-2').on(ROUTE, { body: access('engineer', 'token-2') });
  startSession({ ...access('engineer', 'token-1'), expiresInSeconds: 5 });
  await studies();
  expect(api.callsOf('GET /api/studies').map(({ token }) => token)).toEqual(['token-2']);
});

it('ends the session when the cookie is refused too', async () => {
  apiThatTakes('none').on(ROUTE, problem(401, 'Cookie ended'));
  startSession(access());
  await expect(studies()).rejects.toBeInstanceOf(ApiProblem);
  expect(getSession().status).toBe('signedOut');
});

it('does not go round in circles when even the new token is refused', async () => {
  const api = apiThatTakes('none').on(ROUTE, { body: access('engineer', 'token-2') });
  startSession(access());
  await expect(studies()).rejects.toMatchObject({ status: 401 });
  expect(api.callsOf(ROUTE)).toHaveLength(1);
  expect(getSession().status).toBe('signedOut');
});

it('signs nobody out because the server is away', async () => {
  vi.stubGlobal('fetch', () => Promise.reject(new TypeError('network')));
  startSession({ ...access(), expiresInSeconds: 0 });
  await expect(studies()).rejects.toBeInstanceOf(NoAnswerError);
  expect(getSession().status).toBe('signedIn');
});

it('asks the cookie once, however many ask who is signed in', async () => {
  const api = new FakeApi().install().on(ROUTE, { body: access('analyst') });
  const sessions = await Promise.all([ensureSessionKnown(), ensureSessionKnown()]);
  expect(sessions.map(({ status }) => status)).toEqual(['signedIn', 'signedIn']);
  expect(api.callsOf(ROUTE)).toHaveLength(1);
});

it('refuses an answer that breaks the contract and names the route', async () => {
  new FakeApi().install().on('GET /api/studies', { body: { items: [{ id: 'no uuid' }] } });
  startSession(access());
  await expect(studies()).rejects.toSatisfy(
    (error) => error instanceof ContractError && error.route === 'GET /api/studies',
  );
});

it('follows a sign-out in another tab of the browser', () => {
  startSession(access());
  window.dispatchEvent(new StorageEvent('storage', { key: 'noonwell.theme' }));
  expect(getSession().status).toBe('signedIn');
  window.dispatchEvent(new StorageEvent('storage', { key: 'noonwell.signed-out', newValue: '1' }));
  expect(getSession().status).toBe('signedOut');
});
