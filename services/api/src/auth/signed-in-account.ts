import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import type { Request } from 'express';
import type { Account } from './accounts.service';

/** What the local strategy found, as a parameter. */
export const SignedInAccount = createParamDecorator((_: unknown, context: ExecutionContext): Account => {
  const { userId, workspaceId } = context.switchToHttp().getRequest<Request>().user ?? {};
  if (userId === undefined || workspaceId === undefined)
    throw new Error('The local strategy gave no account.');
  return { userId, workspaceId };
});
