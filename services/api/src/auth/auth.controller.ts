import { Body, Controller, Get, HttpCode, HttpStatus, Post, Req, Res, UseGuards } from '@nestjs/common';
import { ApiBearerAuth, ApiBody, ApiNoContentResponse, ApiTags } from '@nestjs/swagger';
import {
  accessSchema,
  demoAccountsSchema,
  demoSignInRequestSchema,
  meSchema,
  signInRequestSchema,
  type Access,
  type DemoAccounts,
  type Me,
} from '@noonwell/schema';
import type { Request, Response } from 'express';
import { createZodDto, ZodResponse } from 'nestjs-zod';
import { CurrentPrincipal, type Principal } from '../access/principal';
import { requireSameSite } from '../access/same-site';
import { InjectSettings, type Settings } from '../config/settings';
import { LimitByAddress, LimitSignIn } from '../http/limits';
import { ProblemException, unauthorized } from '../http/problem';
import { AccountsService, type Account } from './accounts.service';
import { PasswordGuard } from './local.strategy';
import { clearRefreshCookie, readRefreshCookie, setRefreshCookie } from './refresh-cookie';
import { SessionsService } from './sessions.service';
import { SignedInAccount } from './signed-in-account';

class AccessDto extends createZodDto(accessSchema) {}
class DemoAccountsDto extends createZodDto(demoAccountsSchema) {}
class DemoSignInDto extends createZodDto(demoSignInRequestSchema) {}
class MeDto extends createZodDto(meSchema) {}
class SignInDto extends createZodDto(signInRequestSchema) {}

@ApiTags('auth')
@Controller('auth')
export class AuthController {
  constructor(
    private readonly accounts: AccountsService,
    private readonly sessions: SessionsService,
    @InjectSettings() private readonly settings: Settings,
  ) {}

  @Get('demo-accounts')
  @ZodResponse({ status: HttpStatus.OK, type: DemoAccountsDto })
  demoAccounts(): Promise<DemoAccounts> {
    return this.accounts.demoAccounts();
  }

  @Post('sign-in')
  // Decorators apply from the last line up: the limit counts before a password is looked at.
  @UseGuards(PasswordGuard)
  @LimitSignIn()
  @ApiBody({ type: SignInDto })
  @ZodResponse({ status: HttpStatus.OK, type: AccessDto })
  signIn(
    @SignedInAccount() account: Account,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<Access> {
    return this.begin(account, request, response);
  }

  @Post('demo-sign-in')
  @LimitByAddress()
  @ZodResponse({ status: HttpStatus.OK, type: AccessDto })
  async demoSignIn(
    @Body() { role }: DemoSignInDto,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<Access> {
    return this.begin(await this.accounts.demoAccount(role), request, response);
  }

  @Post('refresh')
  @ZodResponse({ status: HttpStatus.OK, type: AccessDto })
  async refresh(@Req() request: Request, @Res({ passthrough: true }) response: Response): Promise<Access> {
    const token = readRefreshCookie(request, this.settings);
    if (token === undefined)
      throw unauthorized('There is no session to go on with. Sign in.', 'session-ended');
    try {
      const session = await this.sessions.refresh(token);
      setRefreshCookie(response, this.settings, session);
      return session.access;
    } catch (error) {
      // A fault of ours, the database being away, is no reason to end the session.
      if (error instanceof ProblemException) clearRefreshCookie(response, this.settings);
      throw error;
    }
  }

  @Post('sign-out')
  @HttpCode(HttpStatus.NO_CONTENT)
  @ApiNoContentResponse({ description: 'The session has ended, if there was one' })
  async signOut(@Req() request: Request, @Res({ passthrough: true }) response: Response): Promise<void> {
    const token = readRefreshCookie(request, this.settings);
    if (token !== undefined) await this.sessions.close(token);
    clearRefreshCookie(response, this.settings);
  }

  @Get('me')
  @ApiBearerAuth()
  @ZodResponse({ status: HttpStatus.OK, type: MeDto })
  me(@CurrentPrincipal() principal: Principal): Me {
    return principal.me;
  }

  private async begin(account: Account, request: Request, response: Response): Promise<Access> {
    // Else another site could sign a visitor in to an account of its own.
    requireSameSite(request);
    const session = await this.sessions.open(account);
    setRefreshCookie(response, this.settings, session);
    return session.access;
  }
}
