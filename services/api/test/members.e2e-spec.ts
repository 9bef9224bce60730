import { problemSchema } from '@noonwell/schema';
import { addPerson, addTenant, signIn, type Tenant } from './support/people';
import { startTestApp, type TestApp } from './support/test-app';

describe('members and their roles', () => {
  let test: TestApp;
  let tenant: Tenant;
  let other: Tenant;

  beforeEach(async () => {
    test = await startTestApp();
    tenant = await addTenant(test.em, 'Copper');
    other = await addTenant(test.em, 'Amber');
  });
  afterEach(() => test.close());

  const path = (userId: string) => `/api/workspace/members/${userId}`;

  it("counts a changed role at the member's next request, and renews the session without a new sign-in", async () => {
    const admin = await signIn(test, tenant.people.admin);
    const analyst = await signIn(test, tenant.people.analyst);
    await admin.patch(path(tenant.people.analyst.userId)).send({ role: 'student' }).expect(200);
    const stale = await analyst.get('/api/auth/me').expect(401);
    expect(problemSchema.parse(stale.body).type).toBe('urn:noonwell:problem:role-changed');
    const renewed = await analyst.post('/api/auth/refresh').expect(200);
    const { accessToken } = renewed.body as { accessToken: string };
    analyst.set('Authorization', `Bearer ${accessToken}`);
    expect((await analyst.get('/api/auth/me').expect(200)).body).toMatchObject({ role: 'student' });
    await analyst.get('/api/workspace/members').expect(403);
  });

  it('lists members by name, in pages', async () => {
    const admin = await signIn(test, tenant.people.admin);
    const list = await admin.get('/api/workspace/members').query({ pageSize: 3 }).expect(200);
    expect(list.body).toMatchObject({
      total: 4,
      items: [{ role: 'admin' }, { role: 'analyst' }, { role: 'engineer' }],
    });
    expect(JSON.stringify(list.body)).not.toContain('Amber');
  });

  it('keeps one administrator at least, also when two take each other down at once', async () => {
    const admin = await signIn(test, tenant.people.admin);
    const alone = await admin.patch(path(tenant.people.admin.userId)).send({ role: 'engineer' }).expect(409);
    expect(problemSchema.parse(alone.body).type).toBe('urn:noonwell:problem:last-administrator');
    const second = await addPerson(test.em, tenant.workspaceId, 'admin', 'second admin');
    const secondAdmin = await signIn(test, second);
    const answers = await Promise.all([
      admin.patch(path(second.userId)).send({ role: 'engineer' }),
      secondAdmin.patch(path(tenant.people.admin.userId)).send({ role: 'engineer' }),
    ]);
    expect(answers.map(({ status }) => status).filter((status) => status === 200)).toHaveLength(1);
  });

  it("neither finds nor changes another workspace's members, nor unknown roles", async () => {
    const admin = await signIn(test, tenant.people.admin);
    await admin.patch(path(other.people.student.userId)).send({ role: 'admin' }).expect(404);
    await admin.patch(path(tenant.people.student.userId)).send({ role: 'owner' }).expect(400);
    await admin.patch(path(tenant.people.student.userId)).send({ role: 'admin', name: 'x' }).expect(400);
  });
});
