import type { EntityManager } from '@mikro-orm/postgresql';

/** The service is connected as somebody whom row-level security does not hold. */
export class AppRoleError extends Error {
  override readonly name = 'AppRoleError';
}

interface RoleRights {
  role: string;
  strong: boolean;
  owns: boolean;
}

/**
 * For services at their start: with the address of a superuser or of the tables' owner everything would seem to
 * work, without the protection.
 * @throws AppRoleError naming the role and what to do
 */
export async function requireAppRole(em: EntityManager): Promise<void> {
  const [rights] = await em.fork().execute<RoleRights[]>(
    `select current_user as role, rolsuper or rolbypassrls as strong,
       exists (select 1 from pg_class where relowner = r.oid and relnamespace = 'public'::regnamespace) as owns
     from pg_roles r where rolname = current_user`,
  );
  if (rights === undefined || rights.strong || rights.owns) {
    throw new AppRoleError(
      `DATABASE_URL connects as "${rights?.role ?? 'an unknown role'}", which can pass row-level security. Use the app role: no superuser, no BYPASSRLS, owner of no table.`,
    );
  }
}
