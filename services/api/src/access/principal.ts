import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import { PERMISSIONS, ROLE_LABELS, roleMay, type Me, type Permission, type Role } from '@noonwell/schema';
import type { Request } from 'express';
import { forbidden } from '../http/problem';

/** Who asks: read from the database at each request, so that a changed role or an ended session counts at once. */
export interface Principal {
  readonly userId: string;
  readonly workspaceId: string;
  readonly role: Role;
  /** The session's chain of refresh tokens. */
  readonly familyId: string;
  readonly me: Me;
}

declare global {
  // Passport types what a strategy returned as Express.User; this names what ours return.
  // eslint-disable-next-line @typescript-eslint/no-namespace -- the declaration that passport's types extend
  namespace Express {
    // eslint-disable-next-line @typescript-eslint/no-empty-object-type -- merges into passport's interface
    interface User extends Partial<Principal> {}
  }
}

/** @throws Error where a route without a signed-in person asks for one: a fault of ours */
export function principalOf(request: Request): Principal {
  const { userId, workspaceId, role, familyId, me } = request.user ?? {};
  if (
    userId === undefined ||
    workspaceId === undefined ||
    role === undefined ||
    familyId === undefined ||
    me === undefined
  ) {
    throw new Error('This route has no signed-in person.');
  }
  return { userId, workspaceId, role, familyId, me };
}

/** The signed-in person, as a parameter of a controller's method. */
export const CurrentPrincipal = createParamDecorator((_: unknown, context: ExecutionContext) =>
  principalOf(context.switchToHttp().getRequest<Request>()),
);

/** @throws ProblemException 403 naming the roles that may */
export function requirePermission(principal: Principal, permission: Permission): void {
  if (roleMay(principal.role, permission)) return;
  const roles = PERMISSIONS[permission].map((role) => ROLE_LABELS[role]).join(', ');
  throw forbidden(`The role ${ROLE_LABELS[principal.role]} may not do this. Roles that may: ${roles}.`);
}
