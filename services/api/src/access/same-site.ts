import { HttpStatus } from '@nestjs/common';
import type { Request } from 'express';
import { ProblemException } from '../http/problem';

/**
 * Refuses a request that another site made the browser send. Browsers state where a request comes from
 * (Sec-Fetch-Site, or Origin in older ones) and pages cannot change it; whoever states neither is refused too.
 */
export function requireSameSite(request: Request): void {
  const site = request.get('sec-fetch-site');
  if (site === 'same-origin' || site === 'none') return;
  const origin = request.get('origin');
  if (site === undefined && origin !== undefined && hostOf(origin) === request.get('host')) return;
  throw new ProblemException(
    HttpStatus.FORBIDDEN,
    'Not from this site',
    'This request must come from a page of this address. Scripts: send an Origin header with the address they call.',
    { kind: 'cross-site' },
  );
}

function hostOf(origin: string): string | undefined {
  return URL.canParse(origin) ? new URL(origin).host : undefined;
}
