import { Injectable } from '@nestjs/common';
import { PassportStrategy } from '@nestjs/passport';
import { signInRequestSchema } from '@noonwell/schema';
import type { Request } from 'express';
import { ZodValidationException } from 'nestjs-zod';
import { Strategy } from 'passport-local';
import { AccountsService, type Account } from './accounts.service';

/** Address and password in the body. The body is checked here, because guards run before the pipes that check others. */
@Injectable()
export class LocalStrategy extends PassportStrategy(Strategy, 'local') {
  constructor(private readonly accounts: AccountsService) {
    super({ usernameField: 'email', passReqToCallback: true });
  }

  validate(request: Request): Promise<Account> {
    const body = signInRequestSchema.safeParse(request.body);
    if (!body.success) throw new ZodValidationException(body.error);
    return this.accounts.withPassword(body.data.email, body.data.password);
  }
}
