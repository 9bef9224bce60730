import type { Agent } from 'supertest';
import { addTenant, PASSWORD, signIn, type Tenant } from './support/people';
import { startTestApp, type TestApp } from './support/test-app';

const FEW = 3;
const MANY = 1000;

describe('limits', () => {
  let test: TestApp;
  let tenant: Tenant;
  afterEach(() => test.close());

  async function start(
    limits: Partial<{ signInsPerAddress: number; signInsPerAccount: number; costlyPerPerson: number }>,
  ) {
    const all = { signInsPerAddress: MANY, signInsPerAccount: MANY, costlyPerPerson: MANY, ...limits };
    test = await startTestApp({ demo: true, limits: all });
    tenant = await addTenant(test.em, 'Copper');
  }
  const guess = (email: string, client: Agent = test.client()) =>
    client.post('/api/auth/sign-in').send({ email, password: 'wrong' });
  async function statuses(
    count: number,
    call: (at: number) => PromiseLike<{ status: number }>,
  ): Promise<number[]> {
    const found: number[] = [];
    for (let at = 0; at < count; at += 1) found.push((await call(at)).status);
    return found;
  }

  it('stops guesses at one account, whether or not it exists, and leaves other accounts alone', async () => {
    await start({ signInsPerAccount: FEW });
    const { email } = tenant.people.engineer;
    // Case and blanks do not make it another account.
    const spellings = [email, email.toUpperCase(), email, email];
    expect(await statuses(FEW + 1, (at) => guess(spellings[at] ?? email))).toEqual([401, 401, 401, 429]);
    const right = await test
      .client()
      .post('/api/auth/sign-in')
      .send({ email, password: PASSWORD })
      .expect(429);
    expect(right.headers['content-type']).toMatch(/problem\+json/);
    expect(Number(right.headers['retry-after'])).toBeGreaterThan(0);
    expect(await statuses(FEW + 1, () => guess('nobody@example.test'))).toEqual([401, 401, 401, 429]);
    await signIn(test, tenant.people.analyst);
  });

  it('stops guesses from one address over many accounts', async () => {
    await start({ signInsPerAddress: FEW });
    expect(await statuses(FEW + 1, (at) => guess(`guess${String(at)}@example.test`))).toEqual([
      401, 401, 401, 429,
    ]);
  });

  it('believes no X-Forwarded-For unless a proxy is named', async () => {
    await start({ signInsPerAddress: FEW });
    const from = (at: number) =>
      guess(`g${String(at)}@example.test`).set('X-Forwarded-For', `203.0.113.${String(at)}`);
    expect(await statuses(FEW + 1, from)).toEqual([401, 401, 401, 429]);
  });

  it('stops demo sign-ins from one address', async () => {
    await start({ signInsPerAddress: FEW });
    const demo = () => test.client().post('/api/auth/demo-sign-in').send({ role: 'student' });
    expect(await statuses(FEW + 1, demo)).toEqual([404, 404, 404, 429]);
  });

  it('stops one person from uploading without end, not a colleague', async () => {
    await start({ costlyPerPerson: FEW });
    const empty = (who: Agent) => who.post('/api/weather-years').attach('file', Buffer.alloc(0), 'empty.epw');
    const analyst = await signIn(test, tenant.people.analyst);
    expect(await statuses(FEW + 1, () => empty(analyst))).toEqual([422, 422, 422, 429]);
    await empty(await signIn(test, tenant.people.engineer)).expect(422);
  });
});
