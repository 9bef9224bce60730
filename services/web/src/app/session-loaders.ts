import { redirect, type LoaderFunctionArgs } from 'react-router-dom';
import { returnAddress, signInAddress } from '../shared/api/return-address.js';
import { ensureSessionKnown } from '../shared/api/session.js';

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
