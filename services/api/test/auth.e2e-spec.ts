import { accessSchema, meSchema, problemSchema, type Access } from '@noonwell/schema';
import type { Response } from 'supertest';
import { queryAsAdmin } from './support/admin-query';
import { addTenant, PASSWORD, signIn, type Tenant } from './support/people';
import { startTestApp, type TestApp } from './support/test-app';

describe('sign-in and sessions', () => {
  let test: TestApp;
  let tenant: Tenant;

  beforeAll(async () => {
    test = await startTestApp({ demo: true });
    tenant = await addTenant(test.em, 'Copper');
  });
  afterAll(() => test.close());

  const cookies = (answer: Response): string[] => [answer.headers['set-cookie'] ?? []].flat();
  /** "noonwell-refresh=…" as the browser sends it back. */
  const refreshCookie = (answer: Response): string => cookies(answer)[0]?.split(';', 1)[0] ?? '';
  const opened = (answer: Response): Access => accessSchema.parse(answer.body);
  const engineer = () => ({ email: tenant.people.engineer.email, password: PASSWORD });

  async function open(): Promise<{ cookie: string; access: Access }> {
    const answer = await test.client().post('/api/auth/sign-in').send(engineer()).expect(200);
    return { cookie: refreshCookie(answer), access: opened(answer) };
  }
  const refresh = (cookie: string) => test.client().post('/api/auth/refresh').set('Cookie', cookie);
  const me = (access: Access) =>
    test.client().get('/api/auth/me').set('Authorization', `Bearer ${access.accessToken}`);

  it('answers with an access token, who is signed in, and a cookie that scripts and other sites cannot use', async () => {
    const answer = await test.client().post('/api/auth/sign-in').send(engineer()).expect(200);
    const { people, workspaceId } = tenant;
    expect(opened(answer).me).toEqual({
      user: { id: people.engineer.userId, name: people.engineer.name, email: people.engineer.email },
      workspace: { id: workspaceId, name: 'Copper', isDemo: false },
      role: 'engineer',
    });
    expect(cookies(answer)).toEqual([
      expect.stringMatching(
        /^noonwell-refresh=[\w-]{43}; Path=\/api\/auth; Expires=[^;]+; HttpOnly; SameSite=Strict$/,
      ),
    ]);
    expect(JSON.stringify(answer.body)).not.toContain(refreshCookie(answer).split('=')[1]);
    expect(meSchema.parse((await me(opened(answer)).expect(200)).body)).toEqual(opened(answer).me);
  });

  it('takes the address in any case and refuses everything else in the same words', async () => {
    await test
      .client()
      .post('/api/auth/sign-in')
      .send({ ...engineer(), email: engineer().email.toUpperCase() })
      .expect(200);
    const wrong = await test
      .client()
      .post('/api/auth/sign-in')
      .send({ ...engineer(), password: 'wrong' })
      .expect(401);
    const unknown = await test
      .client()
      .post('/api/auth/sign-in')
      .send({ email: 'nobody@example.test', password: PASSWORD })
      .expect(401);
    expect(unknown.body).toEqual(wrong.body);
    expect(problemSchema.parse(wrong.body).detail).toBe('The address or the password is wrong.');
  });

  it('names the failing fields of a body it cannot take, without their values', async () => {
    const answer = await test
      .client()
      .post('/api/auth/sign-in')
      .send({ email: 'not an address', password: 'a secret', role: 'admin' })
      .expect(400)
      .expect('Content-Type', /^application\/problem\+json/);
    expect(problemSchema.parse(answer.body).errors?.map(({ path }) => path)).toEqual(['email', '']);
    expect(JSON.stringify(answer.body)).not.toContain('a secret');
    await test
      .client()
      .post('/api/auth/sign-in')
      .send({ email: { $ne: '' }, password: 'x' })
      .expect(400);
    await test
      .client()
      .post('/api/auth/sign-in')
      .set('Content-Type', 'application/json')
      .send('{')
      .expect(400);
  });

  it('renews the session with each refresh and refuses the token that was used up', async () => {
    const first = await open();
    const second = await refresh(first.cookie).expect(200);
    expect(refreshCookie(second)).not.toBe(first.cookie);
    await me(opened(second)).expect(200);
    const third = await refresh(refreshCookie(second)).expect(200);
    expect(opened(third).me).toEqual(first.access.me);
  });

  it('ends the whole family when a used token comes back, and leaves other sessions alone', async () => {
    const other = await open();
    const stolen = await open();
    const owners = await refresh(stolen.cookie).expect(200);
    const reuse = await refresh(stolen.cookie).expect(401);
    expect(problemSchema.parse(reuse.body).type).toBe('urn:noonwell:problem:session-ended');
    expect(cookies(reuse)[0]).toMatch(/^noonwell-refresh=; .*Expires=Thu, 01 Jan 1970/);
    await refresh(refreshCookie(owners)).expect(401);
    await me(opened(owners)).expect(401);
    await refresh(other.cookie).expect(200);
    await me(other.access).expect(200);
  });

  it('gives one of two simultaneous refreshes at most', async () => {
    const { cookie } = await open();
    const answers = await Promise.all([refresh(cookie), refresh(cookie)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 401]);
    const winner = answers.find(({ status }) => status === 200);
    // The other one looked like a thief, so the family is over.
    if (winner !== undefined) await refresh(refreshCookie(winner)).expect(401);
  });

  it('ends a session at sign-out, its access token too', async () => {
    const { cookie, access } = await open();
    await test.client().post('/api/auth/sign-out').set('Cookie', cookie).expect(204);
    await refresh(cookie).expect(401);
    await me(access).expect(401);
    await test.client().post('/api/auth/sign-out').expect(204);
  });

  it('ends a session that was idle or open too long', async () => {
    for (const column of ['expires_at', 'family_expires_at']) {
      const { cookie, access } = await open();
      await queryAsAdmin(
        test.database,
        `update refresh_tokens set ${column} = now() - interval '1 second' where used_at is null`,
      );
      await refresh(cookie).expect(401);
      // What was signed before lives its ten minutes at the longest, and not beyond the absolute limit.
      await me(access).expect(column === 'family_expires_at' ? 401 : 200);
    }
  });

  it('keeps the cookie of a session that could not be renewed because of a fault of ours', async () => {
    const { cookie } = await open();
    await queryAsAdmin(test.database, 'alter table memberships rename to memberships_hidden');
    try {
      const answer = await refresh(cookie).expect(500);
      expect(cookies(answer)).toEqual([]);
    } finally {
      await queryAsAdmin(test.database, 'alter table memberships_hidden rename to memberships');
    }
    await refresh(cookie).expect(200);
  });

  it('lets a disabled account neither in nor go on', async () => {
    const analyst = await signIn(test, tenant.people.analyst);
    await analyst.get('/api/auth/me').expect(200);
    await queryAsAdmin(
      test.database,
      `update users set disabled_at = now() where id = '${tenant.people.analyst.userId}'`,
    );
    await analyst.get('/api/auth/me').expect(401);
    await analyst.post('/api/auth/refresh').expect(401);
    const again = { email: tenant.people.analyst.email, password: PASSWORD };
    await test.client().post('/api/auth/sign-in').send(again).expect(401);
  });

  it('refuses tokens that are missing, foreign, unsigned or changed', async () => {
    const { access } = await open();
    const [head = '', claims = '', signature = ''] = access.accessToken.split('.');
    const none = Buffer.from(JSON.stringify({ alg: 'none', typ: 'JWT' })).toString('base64url');
    const admin = Buffer.from(
      JSON.stringify({
        ...(JSON.parse(Buffer.from(claims, 'base64url').toString()) as object),
        role: 'admin',
      }),
    ).toString('base64url');
    for (const token of ['', 'x.y.z', `${none}.${claims}.`, `${head}.${admin}.${signature}`]) {
      const answer = await test
        .client()
        .get('/api/auth/me')
        .set('Authorization', `Bearer ${token}`)
        .expect(401);
      expect(answer.headers['content-type']).toMatch(/problem\+json/);
    }
    await test.client().get('/api/auth/me').expect(401);
  });

  it('refuses sign-in, refresh and sign-out that come from another site, or do not say from where', async () => {
    const { cookie } = await open();
    const calls = [
      () => test.client().post('/api/auth/sign-in').send(engineer()),
      () => refresh(cookie),
      () => test.client().post('/api/auth/sign-out').set('Cookie', cookie),
    ];
    for (const call of calls) {
      await call().set('Origin', 'https://elsewhere.example').expect(403);
      await call().set('Sec-Fetch-Site', 'cross-site').expect(403);
      await call().set('Sec-Fetch-Site', 'same-site').expect(403);
      await call().set('Origin', '').expect(403);
    }
    await refresh(cookie).set('Sec-Fetch-Site', 'same-origin').expect(200);
  });
});
