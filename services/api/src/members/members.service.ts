import { LockMode } from '@mikro-orm/core';
import { EntityManager } from '@mikro-orm/postgresql';
import { Injectable, Logger } from '@nestjs/common';
import { Membership, withWorkspace } from '@noonwell/persistence';
import type { Member, PageQuery, Role } from '@noonwell/schema';
import { requirePermission, type Principal } from '../access/principal';
import { pageOfRows, window, type Page } from '../http/paging';
import { conflict, notFound } from '../http/problem';

@Injectable()
export class MembersService {
  private readonly log = new Logger('members');

  constructor(private readonly em: EntityManager) {}

  async list(principal: Principal, query: PageQuery): Promise<Page<Member>> {
    requirePermission(principal, 'members.manage');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const rows = await em.findAndCount(
        Membership,
        {},
        { populate: ['user'], orderBy: { user: { name: 'asc' }, id: 'asc' }, ...window(query) },
      );
      return pageOfRows(query, rows, memberView);
    });
  }

  /** Counts at the member's next request; their access tokens name the old role and must be renewed. */
  async changeRole(principal: Principal, userId: string, role: Role): Promise<Member> {
    requirePermission(principal, 'members.manage');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      // Locked together: two administrators must not take each other's role at once.
      const administrators = await em.find(
        Membership,
        { role: 'admin' },
        { lockMode: LockMode.PESSIMISTIC_WRITE },
      );
      const member = await em.findOne(Membership, { user: userId }, { populate: ['user'] });
      if (member === null) throw notFound('member');
      if (member.role === 'admin' && role !== 'admin' && administrators.length === 1) {
        throw conflict(
          'last-administrator',
          'This is the only administrator. Make somebody else an administrator first.',
        );
      }
      const before = member.role;
      member.role = role;
      await em.flush();
      this.log.log({ by: principal.userId, userId, before, after: role }, 'role changed');
      return memberView(member);
    });
  }
}

function memberView({ user, role }: Membership): Member {
  return { userId: user.id, name: user.getEntity().name, email: user.getEntity().email, role };
}
