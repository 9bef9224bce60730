import {
  accessSchema,
  demoAccountsSchema,
  type demoSignInRequestSchema,
  type SignInRequest,
} from '@noonwell/schema';
import { queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { request, requestRaw } from './client.js';
import { endSession, startSession, tellOtherTabsOfSignOut } from './session.js';

export const demoAccountsQuery = queryOptions({
  queryKey: ['demo-accounts'],
  queryFn: ({ signal }) => request('GET /api/auth/demo-accounts', demoAccountsSchema, { signal }),
  staleTime: Infinity,
});

export async function signIn(body: SignInRequest): Promise<void> {
  startSession(await request('POST /api/auth/sign-in', accessSchema, { body }));
}

export async function demoSignIn(body: z.infer<typeof demoSignInRequestSchema>): Promise<void> {
  startSession(await request('POST /api/auth/demo-sign-in', accessSchema, { body }));
}

/** Ends the session here in any case; a server out of reach forgets it when the cookie runs out. */
export async function signOut(): Promise<void> {
  try {
    await requestRaw('POST /api/auth/sign-out');
  } finally {
    endSession();
    tellOtherTabsOfSignOut();
  }
}
