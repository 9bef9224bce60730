import { accessSchema, type Access, type Me } from '@noonwell/schema';
import { useSyncExternalStore } from 'react';
import { ApiProblem, ContractError, NoAnswerError, problemOf } from './problem.js';

/**
 * Who is signed in. The access token lives in this module's memory and nowhere else; the refresh token is
 * an httpOnly cookie that no script sees.
 */
export type Session =
  | { readonly status: 'unknown' }
  | { readonly status: 'signedOut' }
  | { readonly status: 'signedIn'; readonly me: Me };

const REFRESH_ROUTE = 'POST /api/auth/refresh';
const SIGNED_OUT_KEY = 'noonwell.signed-out';
/** Ask for a new token this long before the old one ends, so that no request travels with a dying one. */
const RENEW_BEFORE_MS = 20_000;

let session: Session = { status: 'unknown' };
let token: { value: string; renewAtMs: number } | null = null;
let refreshing: Promise<boolean> | null = null;
const listeners = new Set<() => void>();

export function getSession(): Session {
  return session;
}

export function subscribeSession(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

export function useSession(): Session {
  return useSyncExternalStore(subscribeSession, getSession);
}

export function startSession(access: Access): void {
  token = {
    value: access.accessToken,
    renewAtMs: Date.now() + access.expiresInSeconds * 1000 - RENEW_BEFORE_MS,
  };
  change({ status: 'signedIn', me: access.me });
}

export function endSession(): void {
  token = null;
  change({ status: 'signedOut' });
}

/** Tells the other tabs of this browser that the person has signed out: storage events reach all but this one. */
export function tellOtherTabsOfSignOut(): void {
  try {
    localStorage.setItem(SIGNED_OUT_KEY, String(Date.now()));
  } catch {
    // Storage is switched off: the other tabs notice at their next renewal.
  }
}

window.addEventListener('storage', ({ key }) => {
  if (key === SIGNED_OUT_KEY && session.status === 'signedIn') endSession();
});

/** For tests: as if the page had just been opened. */
export function forgetSession(): void {
  token = null;
  refreshing = null;
  change({ status: 'unknown' });
}

/** A token that is good for the next seconds; null when nobody is signed in. */
export async function currentToken(): Promise<string | null> {
  if (token === null) return null;
  if (Date.now() >= token.renewAtMs) await refreshSession();
  return (token as { value: string } | null)?.value ?? null;
}

/** The first thing a page does: finds out by the cookie whether somebody is signed in. */
export async function ensureSessionKnown(): Promise<Session> {
  if (session.status === 'unknown') await refreshSession();
  return session;
}

/**
 * Trades the cookie for a new access token. All callers of one page share one request, and a lock shared
 * by all tabs keeps two of them from using the same cookie twice, which the server takes for theft.
 *
 * @returns whether somebody is signed in now
 * @throws NoAnswerError, ApiProblem when the server could not decide: nobody is signed out by an outage
 */
export function refreshSession(): Promise<boolean> {
  refreshing ??= withTabLock(exchangeCookie).finally(() => {
    refreshing = null;
  });
  return refreshing;
}

async function exchangeCookie(): Promise<boolean> {
  let response: Response;
  try {
    response = await fetch('/api/auth/refresh', { method: 'POST', credentials: 'same-origin' });
  } catch (error) {
    throw new NoAnswerError(REFRESH_ROUTE, error);
  }
  if (response.status === 401 || response.status === 403) {
    endSession();
    return false;
  }
  const body: unknown = await response.json().catch(() => null);
  if (!response.ok) throw new ApiProblem(problemOf(response.status, body), REFRESH_ROUTE);
  const access = accessSchema.safeParse(body);
  if (!access.success) throw new ContractError(REFRESH_ROUTE, access.error);
  startSession(access.data);
  return true;
}

async function withTabLock(task: () => Promise<boolean>): Promise<boolean> {
  // Locks exist on https and localhost only; elsewhere one tab at a time is the best there is.
  const locks = (navigator as Partial<Pick<Navigator, 'locks'>>).locks;
  if (locks === undefined) return task();
  return await locks.request('noonwell-refresh', task);
}

function change(next: Session): void {
  session = next;
  listeners.forEach((listener) => {
    listener();
  });
}
