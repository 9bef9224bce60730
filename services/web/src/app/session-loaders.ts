import { redirect, type LoaderFunctionArgs } from 'react-router-dom';
import { ensureSessionKnown } from '../shared/api/session.js';

const HOME = '/studies';

/** Finds out once whether somebody is signed in, before any page asks for data. */
export async function loadSession(): Promise<null> {
  await ensureSessionKnown();
  return null;
}

/** Pages of the workspace: others are led to the sign-in, and back afterwards. */
export async function requireSignedIn({ request }: LoaderFunctionArgs): Promise<Response | null> {
  const session = await ensureSessionKnown();
  return session.status === 'signedIn' ? null : redirect(signInAddress(new URL(request.url)));
}

export async function requireSignedOut({ request }: LoaderFunctionArgs): Promise<Response | null> {
  const session = await ensureSessionKnown();
  if (session.status !== 'signedIn') return null;
  return redirect(returnAddress(new URL(request.url).searchParams));
}

/** The sign-in page with the way back to where somebody wanted to go. */
export function signInAddress({ pathname, search }: { pathname: string; search: string }): string {
  const wanted = `${pathname}${search}`;
  return wanted === '/' || wanted === HOME ? '/sign-in' : `/sign-in?to=${encodeURIComponent(wanted)}`;
}

/** Where to go after signing in: only ever a page of this app, whatever a link says. */
export function returnAddress(search: URLSearchParams): string {
  const wanted = search.get('to');
  if (wanted === null || !/^\/(?![/\\])/.test(wanted)) return HOME;
  const url = new URL(wanted, window.location.origin);
  return url.origin === window.location.origin ? `${url.pathname}${url.search}` : HOME;
}
