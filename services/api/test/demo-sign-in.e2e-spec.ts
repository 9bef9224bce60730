import { demoAccountsSchema, ROLES } from '@noonwell/schema';
import { addTenant } from './support/people';
import { startTestApp, type TestApp } from './support/test-app';

const OFF = { enabled: false, workspaceName: null, roles: [] };

describe('demo sign-in', () => {
  let test: TestApp;
  afterEach(() => test.close());

  const accounts = async () =>
    (await test.client().get('/api/auth/demo-accounts').expect(200)).body as unknown;
  const enter = (role: string) => test.client().post('/api/auth/demo-sign-in').send({ role });

  it('signs in to the demo workspace in each role, without a password', async () => {
    test = await startTestApp({ demo: true });
    await addTenant(test.em, 'Copper');
    const demo = await addTenant(test.em, 'Show', true);
    const shown = demoAccountsSchema.parse(await accounts());
    expect(shown).toMatchObject({ enabled: true, workspaceName: 'Show' });
    expect(shown.roles.map(({ role }) => role)).toEqual(ROLES);
    for (const role of ROLES) {
      const answer = await enter(role).expect(200);
      expect(answer.body).toMatchObject({ me: { workspace: { id: demo.workspaceId, isDemo: true }, role } });
    }
    await enter('owner').expect(400);
  });

  it('cannot be opened with any password', async () => {
    test = await startTestApp({ demo: true });
    const { people } = await addTenant(test.em, 'Show', true);
    for (const password of ['stand-in for accounts that do not exist', 'null', ' ']) {
      await test.client().post('/api/auth/sign-in').send({ email: people.admin.email, password }).expect(401);
    }
  });

  it('is off without a demo workspace, and off where it is switched off', async () => {
    test = await startTestApp({ demo: true });
    await addTenant(test.em, 'Copper');
    expect(await accounts()).toEqual(OFF);
    await enter('admin').expect(404);
    await test.close();
    test = await startTestApp({ demo: false });
    await addTenant(test.em, 'Show', true);
    expect(await accounts()).toEqual(OFF);
    await enter('admin').expect(404);
  });
});
