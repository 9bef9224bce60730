import { EntityManager } from '@mikro-orm/postgresql';
import { Injectable } from '@nestjs/common';
import { PassportStrategy } from '@nestjs/passport';
import { Membership, RefreshToken, Workspace, withScope } from '@noonwell/persistence';
import { ExtractJwt, Strategy } from 'passport-jwt';
import type { Principal } from '../access/principal';
import { InjectSettings, type Settings } from '../config/settings';
import { unauthorized } from '../http/problem';
import { accessClaimsSchema, VERIFY_OPTIONS } from './access-tokens';
import { meView } from './me';

/** The bearer's token must be ours and young, its session open, its account enabled and its role the present one. */
@Injectable()
export class JwtStrategy extends PassportStrategy(Strategy, 'jwt') {
  constructor(
    private readonly em: EntityManager,
    @InjectSettings() settings: Settings,
  ) {
    super({
      jwtFromRequest: ExtractJwt.fromAuthHeaderAsBearerToken(),
      secretOrKey: settings.jwtSecret,
      ...VERIFY_OPTIONS,
    });
  }

  async validate(payload: unknown): Promise<Principal> {
    const claims = accessClaimsSchema.safeParse(payload);
    if (!claims.success) throw unauthorized('This access token is not of this version. Sign in again.');
    const { sub: userId, workspace: workspaceId, family: familyId, role } = claims.data;
    return withScope(this.em, { userId, workspaceId }, async (em) => {
      const open = await em.count(RefreshToken, {
        familyId,
        userId,
        revokedAt: null,
        familyExpiresAt: { $gt: new Date() },
      });
      const membership = await em.findOne(Membership, { user: userId }, { populate: ['user'] });
      const workspace = await em.findOne(Workspace, { id: workspaceId });
      if (open === 0 || membership === null || workspace === null || membership.user.$.disabledAt !== null) {
        throw unauthorized('This session has ended. Sign in again.', 'session-ended');
      }
      if (membership.role !== role) {
        throw unauthorized('Your role has changed. Refresh the access token.', 'role-changed');
      }
      return { userId, workspaceId, familyId, role, me: meView(membership.user.$, workspace, role) };
    });
  }
}
