import { EntityManager } from '@mikro-orm/postgresql';
import { Injectable, Logger } from '@nestjs/common';
import { Membership, normalizeEmail, setScope, User, withScope, Workspace } from '@noonwell/persistence';
import type { DemoAccounts, Role } from '@noonwell/schema';
import { InjectSettings, type Settings } from '../config/settings';
import { notFound, unauthorized } from '../http/problem';
import { DEMO_PURPOSES } from './demo-purposes';
import { passwordFits } from './passwords';

/** An account that has shown who it is, with the workspace it signs in to. */
export interface Account {
  readonly userId: string;
  readonly workspaceId: string;
}

/** Finds the account that signs in: by address and password, or a demo account by its role. */
@Injectable()
export class AccountsService {
  private readonly log = new Logger('sign-in');

  constructor(
    private readonly em: EntityManager,
    @InjectSettings() private readonly settings: Settings,
  ) {}

  /** The same refusal, after the same work, for an unknown address, a wrong password and a disabled account. */
  async withPassword(address: string, password: string): Promise<Account> {
    const email = normalizeEmail(address);
    const user = await withScope(this.em, { signInEmail: email }, (em) => em.findOne(User, { email }));
    const fits = await passwordFits(user?.passwordHash ?? null, password);
    const account = user === null || !fits || user.disabledAt !== null ? null : await this.home(user.id);
    if (account === null) {
      this.log.warn({ userId: user?.id ?? null }, 'sign-in refused');
      throw unauthorized('The address or the password is wrong.');
    }
    return account;
  }

  /** The workspace somebody belongs to; the first one they joined where there are several. */
  private async home(userId: string): Promise<Account | null> {
    const membership = await withScope(this.em, { userId }, (em) =>
      em.findOne(Membership, { user: userId }, { filters: false, orderBy: { createdAt: 'asc', id: 'asc' } }),
    );
    return membership === null ? null : { userId, workspaceId: membership.workspaceId };
  }

  async demoAccounts(): Promise<DemoAccounts> {
    const demo = await this.demoMembers();
    if (demo === null) return { enabled: false, workspaceName: null, roles: [] };
    const firstOf = new Map<Role, Membership>();
    for (const member of demo.members) if (!firstOf.has(member.role)) firstOf.set(member.role, member);
    return {
      enabled: true,
      workspaceName: demo.workspace.name,
      roles: [...firstOf].map(([role, { user }]) => ({
        role,
        name: user.getEntity().name,
        purpose: DEMO_PURPOSES[role],
      })),
    };
  }

  async demoAccount(role: Role): Promise<Account> {
    const demo = await this.demoMembers();
    const member = demo?.members.find((candidate) => candidate.role === role);
    if (demo === null || member === undefined) throw notFound('demo account');
    return { userId: member.user.id, workspaceId: demo.workspace.id };
  }

  /** Members of the demo workspace that no password opens, in the order they were made. */
  private async demoMembers(): Promise<{ workspace: Workspace; members: Membership[] } | null> {
    if (!this.settings.demo) return null;
    return withScope(this.em, {}, async (em) => {
      const workspace = await em.findOne(Workspace, { isDemo: true });
      if (workspace === null) return null;
      await setScope(em, { workspaceId: workspace.id });
      const members = await em.find(
        Membership,
        { user: { passwordHash: null, disabledAt: null } },
        { populate: ['user'], orderBy: { createdAt: 'asc', id: 'asc' } },
      );
      return { workspace, members };
    });
  }
}
