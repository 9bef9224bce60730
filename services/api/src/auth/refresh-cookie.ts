import type { CookieOptions, Request, Response } from 'express';
import { z } from 'zod';
import type { Settings } from '../config/settings';
import type { OpenedSession } from './sessions.service';

/** With TLS the __Host- prefix keeps other hosts of the domain from planting one; it wants path "/". */
function cookie({ secureCookies }: Settings): { name: string; options: CookieOptions } {
  const shared = { httpOnly: true, sameSite: 'strict' } as const;
  return secureCookies
    ? { name: '__Host-noonwell-refresh', options: { ...shared, secure: true, path: '/' } }
    : { name: 'noonwell-refresh', options: { ...shared, secure: false, path: '/api/auth' } };
}

export function setRefreshCookie(response: Response, settings: Settings, session: OpenedSession): void {
  const { name, options } = cookie(settings);
  response.cookie(name, session.refreshToken, { ...options, expires: session.refreshExpiresAt });
}

export function clearRefreshCookie(response: Response, settings: Settings): void {
  const { name, options } = cookie(settings);
  response.clearCookie(name, options);
}

/** The token that the browser sent, if any. */
export function readRefreshCookie(request: Request, settings: Settings): string | undefined {
  const cookies: unknown = request.cookies;
  return z.record(z.string(), z.string()).safeParse(cookies).data?.[cookie(settings).name];
}
