import { ROLES, roleMay, ROUTES, type RouteKey } from '@noonwell/schema';
import { z } from 'zod';
import { mappedRoutes } from '../src/access/unlisted-routes';
import { addPerson, addTenant, signIn, type Person, type Tenant } from './support/people';
import { ROUTE_CALLS } from './support/route-calls';
import { addBelongings, type Belongings } from './support/route-fixture';
import { startTestApp, type TestApp } from './support/test-app';

const documentSchema = z.object({ paths: z.record(z.string(), z.record(z.string(), z.unknown())) });
const tokenSchema = z.object({ accessToken: z.string() });
const LISTED = (Object.keys(ROUTES) as RouteKey[]).sort();

/**
 * Every route of the OpenAPI document, called as nobody, as each role, as a member of another workspace and around
 * a student's sandbox. What must come out follows from ROUTES and PERMISSIONS, which the API decides by too, and
 * from the rules for objects in `RouteCall`.
 */
describe('every route', () => {
  let test: TestApp;
  let address: string;
  let tenant: Tenant;
  let other: Tenant;
  /** A student whose sandboxes are looked at; the quota of the other student stays untouched. */
  let apprentice: Person;
  const tokens = new Map<Person, string>();

  beforeAll(async () => {
    test = await startTestApp({ demo: true });
    address = await test.app.getUrl();
    tenant = await addTenant(test.em, 'Copper');
    other = await addTenant(test.em, 'Amber');
    await addTenant(test.em, 'Demo', true);
    apprentice = await addPerson(test.em, tenant.workspaceId, 'student', 'apprentice');
    for (const person of [apprentice, ...Object.values(tenant.people), ...Object.values(other.people)]) {
      const client = await signIn(test, person);
      const renewed = await client.post('/api/auth/refresh').expect(200);
      tokens.set(person, tokenSchema.parse(renewed.body).accessToken);
    }
  });
  afterAll(() => test.close());

  interface Answer {
    readonly status: number;
    readonly type: string;
    readonly text: string;
  }

  /** Calls the route as somebody, or as nobody (null), on the given belongings. */
  async function call(key: RouteKey, as: Person | null, on: Belongings): Promise<Answer> {
    const route = ROUTE_CALLS[key];
    const [method = '', path = ''] = key.split(' ');
    const body = route.body?.(on, as ?? tenant.people.engineer);
    const headers = new Headers({ origin: address });
    const token = as === null ? undefined : tokens.get(as);
    if (token !== undefined) headers.set('authorization', `Bearer ${token}`);
    if (body !== undefined && !(body instanceof FormData)) headers.set('content-type', 'application/json');
    const answer = await fetch(address + path.replace(/\{\w+\}/, route.object?.(on) ?? ''), {
      method,
      headers,
      ...(body === undefined ? {} : { body: body instanceof FormData ? body : JSON.stringify(body) }),
    });
    const type = answer.headers.get('content-type') ?? '';
    if (type.startsWith('text/event-stream')) {
      // It does not end by itself; what it says has tests of its own.
      await answer.body?.cancel();
      return { status: answer.status, type, text: '' };
    }
    return { status: answer.status, type, text: await answer.text() };
  }

  const shared = () => addBelongings(test.em, tenant.workspaceId, tenant.people.engineer, false);
  const sandbox = () => addBelongings(test.em, tenant.workspaceId, apprentice, true);
  function expectStatus(key: RouteKey, who: string, answer: Answer, status: number): void {
    expect({ key, who, status: answer.status }).toEqual({ key, who, status });
    if (status >= 400) expect(`${key} ${who}: ${answer.type}`).toMatch(/: application\/problem\+json/);
  }

  it('is listed, documented and answered: the three lists are one', async () => {
    const answer = await call('GET /api/openapi.json', null, await shared());
    const { paths } = documentSchema.parse(JSON.parse(answer.text));
    const documented = Object.entries(paths).flatMap(([path, operations]) =>
      Object.keys(operations).map((method) => `${method.toUpperCase()} ${path}`),
    );
    expect(documented.sort()).toEqual(LISTED);
    expect(mappedRoutes(test.app).sort()).toEqual(LISTED);
  });

  describe.each(LISTED)('%s', (key) => {
    const access = ROUTES[key];
    const open = access === 'public' || access === 'cookie';
    const route = ROUTE_CALLS[key];

    it('as nobody', async () => {
      expectStatus(key, 'nobody', await call(key, null, await shared()), open ? route.allowed : 401);
    });

    it.each(ROLES)('as %s', async (role) => {
      const mayCall = open || access === 'signedIn' || roleMay(role, access);
      // Rights over the shared study itself: who may not change studies of others may still read them.
      const mayChange = route.writesStudy === undefined || roleMay(role, 'study.write');
      const expected = mayCall && mayChange ? route.allowed : 403;
      expectStatus(key, role, await call(key, tenant.people[role], await shared()), expected);
    });

    it('as the administrator of another workspace', async () => {
      const theirs = await shared();
      const answer = await call(key, other.people.admin, theirs);
      expectStatus(key, 'stranger', answer, route.object === undefined ? route.allowed : 404);
      const told = Object.values(theirs).filter((id: string) => answer.text.includes(id));
      // The path stands in the problem; it is what the stranger sent.
      expect(told.filter((id) => id !== route.object?.(theirs))).toEqual([]);
      expect(answer.text).not.toContain(tenant.workspaceId);
    });

    if (route.ofStudy) {
      it("around a student's sandbox: its owner and administrators, for others it does not exist", async () => {
        const { student, admin, engineer, analyst } = tenant.people;
        expectStatus(key, 'owner', await call(key, apprentice, await sandbox()), route.allowed);
        expectStatus(key, 'admin', await call(key, admin, await sandbox()), route.allowed);
        expectStatus(key, 'engineer', await call(key, engineer, await sandbox()), 404);
        expectStatus(key, 'analyst', await call(key, analyst, await sandbox()), 404);
        expectStatus(key, 'another student', await call(key, student, await sandbox()), 404);
      });
    }
  });

  it('refuses what is no route without saying more', async () => {
    for (const path of ['/api', '/api/nothing', '/api/studies/x/y/z']) {
      const answer = await fetch(address + path);
      expect(answer.status).toBe(404);
      expect(answer.headers.get('content-type')).toMatch(/^application\/problem\+json/);
    }
  });
});
