import { applyDecorators, HttpStatus, Injectable, UseGuards, type ExecutionContext } from '@nestjs/common';
import {
  SkipThrottle,
  ThrottlerGuard,
  type ThrottlerLimitDetail,
  type ThrottlerModuleOptions,
} from '@nestjs/throttler';
import { normalizeEmail } from '@noonwell/persistence';
import { z } from 'zod';
import { principalOf } from '../access/principal';
import type { Settings } from '../config/settings';
import { ProblemException } from './problem';
import type { Request } from 'express';

const MINUTE_MS = 60_000;
const namedAccountSchema = z.object({ email: z.string() });

/**
 * Three limits; a route names those it wants by a decorator below. Counted in this process: with several
 * processes each counts its own.
 */
export function throttlerOptions({ limits }: Settings): ThrottlerModuleOptions {
  return {
    setHeaders: false,
    throttlers: [
      { name: 'address', ttl: 5 * MINUTE_MS, limit: limits.signInsPerAddress },
      {
        name: 'account',
        ttl: 15 * MINUTE_MS,
        limit: limits.signInsPerAccount,
        getTracker: (request) => {
          const named = namedAccountSchema.safeParse(request['body']);
          // A request that names no account is refused later; it must not share a count with one that does.
          return named.success ? `account ${normalizeEmail(named.data.email)}` : 'no account';
        },
      },
      {
        name: 'costly',
        ttl: 5 * MINUTE_MS,
        limit: limits.costlyPerPerson,
        getTracker: (_, context) => principalOf(context.switchToHttp().getRequest<Request>()).userId,
      },
    ],
  };
}

@Injectable()
export class LimitGuard extends ThrottlerGuard {
  protected override throwThrottlingException(
    _: ExecutionContext,
    detail: ThrottlerLimitDetail,
  ): Promise<void> {
    const retryAfterS = detail.timeToBlockExpire;
    throw new ProblemException(
      HttpStatus.TOO_MANY_REQUESTS,
      'Too many requests',
      `Wait ${String(retryAfterS)} s, then try again.`,
      { retryAfterS },
    );
  }
}

/** Password sign-in: by address and by account, whether or not the account exists. */
export const LimitSignIn = (): MethodDecorator =>
  applyDecorators(UseGuards(LimitGuard), SkipThrottle({ costly: true }));
/** Anything else that anybody may call and that opens a session. */
export const LimitByAddress = (): MethodDecorator =>
  applyDecorators(UseGuards(LimitGuard), SkipThrottle({ costly: true, account: true }));
/** Calls that cost much memory or time, by person. */
export const LimitCostly = (): MethodDecorator =>
  applyDecorators(UseGuards(LimitGuard), SkipThrottle({ address: true, account: true }));
