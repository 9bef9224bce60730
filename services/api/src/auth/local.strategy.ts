import { Injectable, type ExecutionContext } from '@nestjs/common';
import { AuthGuard, PassportStrategy } from '@nestjs/passport';
import { signInRequestSchema } from '@noonwell/schema';
import type { Request } from 'express';
import { ZodValidationException } from 'nestjs-zod';
import { Strategy } from 'passport-local';
import { AccountsService, type Account } from './accounts.service';

/** Address and password in the body. */
@Injectable()
export class LocalStrategy extends PassportStrategy(Strategy, 'local') {
  constructor(private readonly accounts: AccountsService) {
    super({ usernameField: 'email' });
  }

  validate(email: string, password: string): Promise<Account> {
    return this.accounts.withPassword(email, password);
  }
}

/** Guards run before the pipes that check other bodies, so this one checks the body itself. */
@Injectable()
export class PasswordGuard extends AuthGuard('local') {
  override async canActivate(context: ExecutionContext): Promise<boolean> {
    const body = signInRequestSchema.safeParse(context.switchToHttp().getRequest<Request>().body);
    if (!body.success) throw new ZodValidationException(body.error);
    await super.canActivate(context);
    return true;
  }
}
