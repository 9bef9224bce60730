import type { EntityManager } from '@mikro-orm/postgresql';
import { Membership, User, withScope, Workspace } from '@noonwell/persistence';
import { accessSchema, ROLES, type Role } from '@noonwell/schema';
import { randomUUID } from 'node:crypto';
import type { Agent } from 'supertest';
import { hashPassword } from '../../src/auth/passwords';
import type { TestApp } from './test-app';

export const PASSWORD = 'amber copper violet grey';
let hashed: Promise<string> | undefined;

export interface Person {
  readonly userId: string;
  readonly email: string;
  readonly name: string;
  readonly role: Role;
}
export interface Tenant {
  readonly workspaceId: string;
  readonly people: Readonly<Record<Role, Person>>;
}

/** A workspace with one member of each role, named after it. */
export async function addTenant(em: EntityManager, name: string, isDemo = false): Promise<Tenant> {
  const workspaceId = randomUUID();
  await withScope(em, { workspaceId }, async (inner) => {
    inner.create(Workspace, { id: workspaceId, name, isDemo });
    await inner.flush();
  });
  const people = {} as Record<Role, Person>;
  for (const role of ROLES)
    people[role] = await addPerson(em, workspaceId, role, `${role} of ${name}`, !isDemo);
  return { workspaceId, people };
}

export async function addPerson(
  em: EntityManager,
  workspaceId: string,
  role: Role,
  name: string,
  withPassword = true,
): Promise<Person> {
  const userId = randomUUID();
  const email = `${name.toLowerCase().replaceAll(' ', '.')}@example.test`;
  hashed ??= hashPassword(PASSWORD);
  const passwordHash = withPassword ? await hashed : null;
  await withScope(em, { workspaceId, userId }, async (inner) => {
    inner.create(User, { id: userId, email, name, passwordHash, disabledAt: null });
    await inner.flush();
    inner.create(Membership, { workspaceId, user: userId, role });
    await inner.flush();
  });
  return { userId, email, name, role };
}

/** A client that sends the person's access token. */
export async function signIn(test: TestApp, person: Person): Promise<Agent> {
  const client = test.client();
  const answer = await client
    .post('/api/auth/sign-in')
    .send({ email: person.email, password: PASSWORD })
    .expect(200);
  return client.set('Authorization', `Bearer ${accessSchema.parse(answer.body).accessToken}`);
}
