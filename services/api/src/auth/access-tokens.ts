import { Injectable } from '@nestjs/common';
import { JwtService, type JwtSignOptions, type JwtVerifyOptions } from '@nestjs/jwt';
import { idSchema, roleSchema, type Role } from '@noonwell/schema';
import { z } from 'zod';

export const ACCESS_TOKEN_SECONDS = 10 * 60;

const ISSUER = 'noonwell';
const AUDIENCE = 'noonwell-api';
export const SIGN_OPTIONS = {
  algorithm: 'HS256',
  expiresIn: ACCESS_TOKEN_SECONDS,
  issuer: ISSUER,
  audience: AUDIENCE,
} as const satisfies JwtSignOptions;
export const VERIFY_OPTIONS = {
  algorithms: ['HS256'],
  issuer: ISSUER,
  audience: AUDIENCE,
} satisfies JwtVerifyOptions;

/** What an access token says. The role is there to notice that it changed, not to decide by it. */
export const accessClaimsSchema = z.object({
  sub: idSchema,
  workspace: idSchema,
  role: roleSchema,
  /** The session. */
  family: idSchema,
});

@Injectable()
export class AccessTokens {
  constructor(private readonly jwt: JwtService) {}

  sign(session: { userId: string; workspaceId: string; role: Role; familyId: string }): Promise<string> {
    const claims: z.infer<typeof accessClaimsSchema> = {
      sub: session.userId,
      workspace: session.workspaceId,
      role: session.role,
      family: session.familyId,
    };
    return this.jwt.signAsync(claims);
  }
}
