import { Injectable, Logger, type CanActivate, type ExecutionContext } from '@nestjs/common';
import { AuthGuard } from '@nestjs/passport';
import type { Request } from 'express';
import { forbidden, unauthorized } from '../http/problem';
import { principalOf, requirePermission } from './principal';
import { accessOf, routeKeyOf } from './route-access';
import { requireSameSite } from './same-site';

/**
 * The first gate of every route, by the table ROUTES of @noonwell/schema: what is not listed there is refused.
 * Rules about single objects stand in the features' services.
 */
@Injectable()
export class AccessGuard extends AuthGuard('jwt') implements CanActivate {
  private readonly log = new Logger('access');

  override async canActivate(context: ExecutionContext): Promise<boolean> {
    const request = context.switchToHttp().getRequest<Request>();
    const key = routeKeyOf(request);
    const access = accessOf(key);
    if (access === undefined) {
      this.log.error({ route: key }, 'route is not listed');
      throw forbidden('This route is not open to anybody.');
    }
    if (access === 'public') return true;
    if (access === 'cookie') {
      requireSameSite(request);
      return true;
    }
    await super.canActivate(context);
    if (access !== 'signedIn') {
      const principal = principalOf(request);
      try {
        requirePermission(principal, access);
      } catch (refusal) {
        this.log.warn({ route: key, userId: principal.userId, role: principal.role }, 'refused');
        throw refusal;
      }
    }
    return true;
  }

  /** Passport's answer: an error of the strategy, or no usable token. */
  override handleRequest<Who>(error: unknown, who: Who | false): Who {
    if (error instanceof Error) throw error;
    if (who === false) throw unauthorized('Send a valid access token: Authorization: Bearer ….');
    return who;
  }
}
